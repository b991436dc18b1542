package render

import (
	"math"
	"sort"

	"gonum.org/v1/gonum/spatial/r2"

	"notchproof/mesh/outline"
	"notchproof/render/number"
	"notchproof/verify"
	"notchproof/verify/specimen"
)

// detail is the magnified view of the place where the factor sits: a circle
// about the root, so large that the notch's curve there fills about half of it.
// Its scale is a round multiple of the main view's.
func detail(part *specimen.Part, peak r2.Vec, main *view, center point, radius float64) (v *view, times float64) {
	about, reach := root(part, peak)
	// Less would show little more than the main view, and its circle would
	// leave the room that the main view has.
	const least = 3
	if times = roundScale(radius / reach / main.scale); times < least {
		times, about = least, peak
	}
	v = &view{scale: times * main.scale, window: circle(center, radius)}
	v.origin = point{center.X - v.scale*about.X, center.Y + v.scale*about.Y}
	// Near the axis of a half model the mirror image comes into view.
	if v.mirror = part.Half && about.Y < radius/v.scale; v.mirror {
		v.origin.Y = math.Round(v.origin.Y)
	}
	return v, times
}

// root gives the middle and the radius of the neighbourhood of a peak: what is
// within one and a half radii of curvature of it, the curve's whole extent at
// most.
func root(part *specimen.Part, at r2.Vec) (about r2.Vec, reach float64) {
	var curve outline.Curve
	best := math.Inf(1)
	for _, i := range part.Notch {
		c := part.Region.Sides()[i].Curve
		if gap := r2.Norm(r2.Sub(c.At(c.Nearest(at)), at)); gap < best {
			best, curve = gap, c
		}
	}
	b := curve.Bounds()
	about, reach = at, 0.75*r2.Norm(r2.Sub(b.Max, b.Min))
	if k := math.Abs(outline.Curvature(curve, curve.Nearest(at))); k > 0 && 1.5/k < reach {
		return at, 1.5 / k
	}
	return r2.Scale(0.5, r2.Add(b.Min, b.Max)), reach
}

// magnified marks a detail in the main view and joins it to its circle.
func (s *sheet) magnified(main, v *view, material [][]point, letter string) {
	b := v.bounds()
	cx, cy := b.middle()
	radius := b.width() / 2
	mid := main.at(v.model(point{cx, cy}))
	r := math.Max(radius*main.scale/v.scale, s.u(7))
	s.pen(ink, narrow)
	s.dc.DrawCircle(mid.X, mid.Y, r)
	s.dc.Stroke()
	s.take(box{mid.X - r, mid.Y - r, mid.X + r, mid.Y + r})
	for _, through := range [2]bool{false, true} { // the air first, then the material
		for reach := r + s.u(14); reach < r+s.u(90); reach += s.u(10) {
			for _, degrees := range [12]float64{-60, -90, -120, -30, -150, 0, 180, 60, 120, 30, 150, 90} {
				sin, cos := math.Sincos(degrees * math.Pi / 180)
				dir := point{cos, sin}
				at := mid.toward(dir, reach)
				b := s.place(at, 0.5, 0.5, letter, head)
				if !s.free(b.grown(s.u(4))) || !s.open(mid.toward(dir, r+s.u(4)), mid.toward(dir, reach-s.u(14))) {
					continue
				}
				on := touches(b, material)
				if on != through {
					continue
				}
				s.pen(ink, narrow)
				s.line(mid.toward(dir, r), mid.toward(dir, reach-s.u(13)))
				if on {
					s.island(b)
				}
				s.text(at, 0.5, 0.5, letter, head, ink)
				return
			}
		}
	}
}

// markPeak marks the place of the factor in the magnified view by a ring on the
// surface, and says outside the circle what is there and where.
func (p *plate) markPeak(v *view) {
	at := v.at(p.peak)
	p.pen(p.look.mark(), 2)
	p.dc.DrawCircle(at.X, at.Y, p.u(6))
	p.dc.Stroke()
	p.dc.SetColor(p.look.mark())
	p.dc.DrawCircle(at.X, at.Y, p.u(2.2))
	p.dc.Fill()
	texts := p.peakTexts()
	b := v.bounds()
	cx, cy := b.middle()
	center, radius := point{cx, cy}, b.width()/2
	p.take(box{at.X, at.Y, at.X, at.Y}.grown(p.u(8)))
	for _, place := range p.around(v, at) {
		clear := true
		for i, t := range texts {
			b := p.place(place.line(p.sheet, i, len(texts)), place.anchor, 0, t, strong).grown(p.u(3))
			clear = clear && p.free(b) && outside(b, center, radius)
		}
		if !clear {
			continue
		}
		p.pen(p.look.mark(), narrow)
		p.line(at.toward(place.dir, p.u(8)), place.at)
		for i, t := range texts {
			p.text(place.line(p.sheet, i, len(texts)), place.anchor, 0, t, strong, ink)
		}
		return
	}
}

// A callout is a place for a few lines of lettering beside a circle.
type callout struct {
	dir    point   // from the peak outwards
	at     point   // end of the leader, just outside the circle
	anchor float64 // 0: the lettering is to the right of it, 1: to the left
	cost   float64
}

// line is where line i of n begins, or ends.
func (c callout) line(s *sheet, i, n int) point {
	high := s.u(strong.Size + 1)
	return c.at.plus(s.u(6)*(1-2*c.anchor), high*(float64(i)-float64(n)/2))
}

// around lists places for a callout all round a circle, seen from a point in it:
// the nearest first, those through the material after those through the air.
func (p *plate) around(v *view, from point) []callout {
	const places = 48
	b := v.bounds()
	x, y := b.middle()
	radius := b.width()/2 + p.u(14)
	var list []callout
	for k := range places {
		sin, cos := math.Sincos(2 * math.Pi * float64(k) / places)
		at := point{x, y}.plus(radius*cos, radius*sin)
		d := distance(from, at)
		c := callout{dir: point{(at.X - from.X) / d, (at.Y - from.Y) / d}, at: at, cost: d}
		if cos < 0 {
			c.anchor = 1
		}
		if p.part.Region.Contains(v.model(from.toward(c.dir, p.u(10)))) {
			c.cost += 4 * radius
		}
		list = append(list, c)
	}
	sort.SliceStable(list, func(i, j int) bool { return list[i].cost < list[j].cost })
	return list
}

// outside tells whether a box keeps clear of a circle.
func outside(b box, center point, radius float64) bool {
	x := math.Max(b.X0, math.Min(b.X1, center.X))
	y := math.Max(b.Y0, math.Min(b.Y1, center.Y))
	return distance(point{x, y}, center) > radius
}

// topEstimate is what is known of the largest value of the field that is drawn.
// Of other fields than these two no ladder was climbed.
func (p *plate) topEstimate() (verify.Estimate, bool) {
	c := &p.finding.Computed
	if p.plain() {
		return c.Factor, true
	}
	mises := p.options.Field == FieldMises && p.options.Style != StyleFringe && len(p.options.Terms) == 0
	return c.VonMises, mises && math.Abs(p.top-c.VonMises.Value) <= c.VonMises.Uncertainty
}

// peakTexts is the value at the peak, and the angle at which it sits.
func (p *plate) peakTexts() []string {
	e := p.finding.Computed.Factor
	texts := []string{number.Decimal(p.top, 3)}
	if len(p.options.Terms) == 0 {
		texts[0] = "about " + number.Significant(p.top, 3)
	}
	if !e.Status.Settled() { // no number stands without a bound on its error
		return []string{"no factor"}
	}
	if f, ok := p.look.(*fringes); ok {
		texts[0] = "order " + f.order(p.top)
	}
	if top, known := p.topEstimate(); known {
		v, bar := number.UncertainParts(top.Value, top.Uncertainty)
		texts = []string{v}
		if bar != "" {
			texts = append(texts, "± "+bar)
		}
	}
	if len(p.options.Terms) == 0 {
		texts = append(texts, "at "+number.Decimal(p.finding.Computed.Peak.ArcDegrees, 1)+"°")
	}
	return texts
}
