package specimen

import (
	"fmt"
	"math"
	"strconv"
	"strings"

	"gonum.org/v1/gonum/spatial/r2"

	"notchproof/mesh/outline"
	"notchproof/scf"
)

// A Section is where the nominal stress of an outline is taken: straight across
// the part at one x, or, in whole bars, along the straight line between two
// points.
type Section struct {
	Across   bool   // at x = From.X; else from From to To
	From, To r2.Vec // what of this line is material is the section
	// Fibre is the y at which the nominal stress of bending (and, in a shaft, of
	// torsion) is taken; bending puts it in tension. nil: of the ends of the
	// material in the section the one nearest to the notch, of equals the one
	// farthest from the centroid.
	Fibre *float64
}

// A crossSection is a section with its properties. Positions are measured along
// the cut from its start: y in sections straight across.
type crossSection struct {
	start, along r2.Vec
	cut          []outline.Interval // of a mirrored bar with its image
	area         float64            // of a bar of thickness 1, of a shaft turned about the axis
	centroid     float64
	second       float64 // about the centroid, of a shaft about a diameter
	lo, hi       float64
}

func (c *crossSection) point(at float64) r2.Vec { return r2.Add(c.start, r2.Scale(at, c.along)) }

// modulus is the second moment over the distance of a fibre; a shaft's polar
// moment is twice its second moment.
func (c *crossSection) modulus(fibre float64) float64 {
	return c.second / math.Abs(fibre-c.centroid)
}

// crossSection measures a cut.
func (o *Drawing) crossSection(start, along r2.Vec, cut []outline.Interval) crossSection {
	c := crossSection{start: start, along: along, cut: cut}
	if o.Kind == scf.Shaft {
		s := outline.Shaft(cut)
		c.area, c.second, c.lo, c.hi = s.Area, s.SecondMoment, s.Inner, s.Outer
		return c
	}
	if o.Mirror {
		c.cut = withImage(cut)
	}
	s := outline.Bar(c.cut)
	c.area, c.centroid, c.second, c.lo, c.hi = s.Area, s.Centroid, s.SecondMoment, s.Lo, s.Hi
	if o.Mirror {
		c.centroid = 0 // but for rounding
	}
	return c
}

// withImage completes a cut above y = 0 by its image below.
func withImage(cut []outline.Interval) []outline.Interval {
	var both []outline.Interval
	for i := len(cut) - 1; i >= 0; i-- {
		both = append(both, outline.Interval{Lo: -cut[i].Hi, Hi: -cut[i].Lo})
	}
	for _, iv := range cut {
		if n := len(both); n > 0 && both[n-1].Hi >= iv.Lo {
			both[n-1].Hi = iv.Hi
			continue
		}
		both = append(both, iv)
	}
	return both
}

// across is the section straight across at x.
func (o *Drawing) across(r *outline.Region, x float64) crossSection {
	return o.crossSection(r2.Vec{X: x}, r2.Vec{Y: 1}, r.CutX(x))
}

// size is what sections are compared by: their area.
func (o *Drawing) size(cut []outline.Interval) float64 {
	if o.Kind == scf.Shaft {
		return outline.Shaft(cut).Area
	}
	return outline.Bar(cut).Area
}

// smallest finds the smallest section along the notch.
func (o *Drawing) smallest(p *Part) (x float64, err error) {
	from, to := p.notchRange()
	if to-from <= slack(p.Region) {
		return from, nil
	}
	s, err := p.Region.SmallestSection(from, to, o.size)
	if err != nil {
		return 0, drawingFault("nominal", "", "no smallest section found: "+err.Error(), `give the nominal section, {"x": …}`)
	}
	return s.From + (s.To-s.From)/2, nil
}

// largest finds the gross section: the largest of the part.
func (o *Drawing) largest(p *Part) (crossSection, error) {
	b := p.Region.Bounds()
	s, err := p.Region.SmallestSection(b.Min.X, b.Max.X, func(cut []outline.Interval) float64 { return -o.size(cut) })
	if err != nil {
		return crossSection{}, drawingFault("outline", "", err.Error(), endHint)
	}
	return o.crossSection(r2.Vec{X: s.From}, r2.Vec{Y: 1}, s.Cut), nil
}

// nominal settles the nominal section and says in words which it is.
func (o *Drawing) nominal(p *Part) (c crossSection, words string, err error) {
	switch s := o.Nominal; {
	case s == nil:
		x, err := o.smallest(p)
		if err != nil {
			return c, "", err
		}
		c, words = o.across(p.Region, x), "net, at "+coordinate("x", x, o.Unit)+", the smallest section along the notch"
		p.Section = &Section{Across: true, From: r2.Vec{X: x}}
	case s.Across:
		c, words = o.across(p.Region, s.From.X), "net, at "+coordinate("x", s.From.X, o.Unit)+", as given"
		p.Section = &Section{Across: true, From: s.From}
	default:
		if c, err = o.between(p.Region, s.From, s.To); err != nil {
			return c, "", err
		}
		words = fmt.Sprintf("net, from (%s) to (%s), as given", point(s.From, o.Unit), point(s.To, o.Unit))
		p.Section = &Section{From: s.From, To: s.To}
	}
	if !(c.area > 0) {
		return c, "", drawingFault("nominal", "", "no material in the nominal section", "lay it across the part")
	}
	return c, words, nil
}

// between is the section between two points.
func (o *Drawing) between(r *outline.Region, from, to r2.Vec) (crossSection, error) {
	if from.Y > to.Y {
		from, to = to, from
	}
	way := r2.Sub(to, from)
	upright := math.Abs(way.X) <= sameShape*math.Abs(way.Y)
	switch {
	case !(way.Y > 1e-3*math.Abs(way.X)):
		return crossSection{}, drawingFault("nominal.to", "", "section that runs along the part", "give two points on either side of the material")
	case !upright && (o.Kind == scf.Shaft || o.Mirror):
		return crossSection{}, drawingFault("nominal.to", "", "slanting section of a shaft or a mirrored bar", `give {"x": …}, or two points at the same x`)
	case !upright:
		return o.crossSection(from, r2.Unit(way), r.CutSegment(from, to)), nil
	}
	var cut []outline.Interval
	for _, iv := range r.CutX(from.X) {
		iv = outline.Interval{Lo: math.Max(iv.Lo, from.Y), Hi: math.Min(iv.Hi, to.Y)}
		if iv.Lo < iv.Hi {
			cut = append(cut, iv)
		}
	}
	return o.crossSection(r2.Vec{X: from.X}, r2.Vec{Y: 1}, cut), nil
}

// fibre is where along the nominal section the stress of bending is taken.
func (o *Drawing) fibre(p *Part, c *crossSection) (at float64, words string, err error) {
	near := slack(p.Region)
	if o.Nominal != nil && o.Nominal.Fibre != nil {
		y := *o.Nominal.Fibre
		if at = (y - c.start.Y) / c.along.Y; math.Abs(at-c.centroid) <= near || math.IsInf(at, 0) {
			return 0, "", drawingFault("nominal.fibre", text(y), "the fibre lies in the section's centroid, where bending gives no stress", "name one at the edge of the section")
		}
		return at, "as given", nil
	}
	least := math.Inf(1)
	for _, iv := range c.cut {
		for _, end := range [2]float64{iv.Lo, iv.Hi} {
			if p.Half && end <= 0 {
				continue // the axis, or the image of a fibre above it
			}
			gap := p.distanceToNotch(c.point(end))
			farther := math.Abs(end-c.centroid) >= math.Abs(at-c.centroid)-near
			if gap < least-near || gap <= least+near && farther {
				least, at = gap, end
			}
		}
	}
	if math.IsInf(least, 1) || math.Abs(at-c.centroid) <= near {
		return 0, "", drawingFault("nominal", "", "no fibre of the section bears bending", `name one with "fibre"`)
	}
	return at, "the end of the section nearest to the notch", nil
}

// distanceToNotch is how far a point is from the notch.
func (p *Part) distanceToNotch(q r2.Vec) float64 {
	sides := p.Region.Sides()
	least := math.Inf(1)
	for _, i := range p.Notch {
		c := sides[i].Curve
		least = math.Min(least, r2.Norm(r2.Sub(c.At(c.Nearest(q)), q)))
	}
	return least
}

// text writes a number the way people read it.
func text(x float64) string { return strconv.FormatFloat(x, 'g', 6, 64) }

// coordinate writes x = 12.5 mm.
func coordinate(name string, x float64, unit string) string {
	if unit != "" {
		unit = " " + unit
	}
	number := text(x)
	if size, negative := strings.CutPrefix(number, "-"); negative {
		number = "−" + size
	}
	return name + " = " + number + unit
}

func point(q r2.Vec, unit string) string {
	if unit != "" {
		unit = " " + unit
	}
	return text(q.X) + ", " + text(q.Y) + unit
}
