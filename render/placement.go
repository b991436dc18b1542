package render

import (
	"math"

	"gonum.org/v1/gonum/spatial/r2"

	"notchproof/mesh/outline"
	"notchproof/render/number"
	"notchproof/scf"
	"notchproof/verify/specimen"
)

// How a dimension is drawn.
type placementKind int

const (
	acrossLeft   placementKind = iota + 1 // extension lines to the left, dimension line beside the part
	acrossRight                           // to the right
	acrossInside                          // the dimension line stands between the two points
	alongBelow                            // extension lines downwards, below the part
	leaderTo                              // an arrow at the first point, coming from the second
)

// A placement says where and how one dimension of a family is drawn. At gives
// two points of the whole part; for a leader the point pointed at and one that
// it is seen from. Skip tells that the dimension is not drawn for these sizes;
// Text is the lettering, nil: the value, with Ø for the diameters of shafts.
type placement struct {
	Dim  string
	Kind placementKind
	At   func(g geometry) (a, b r2.Vec)
	Text func(d scf.Dims) string
	Skip func(d scf.Dims) bool
}

// geometry is what a placement is found from.
type geometry struct {
	d           scf.Dims
	part        *specimen.Part
	left, right float64 // where the drawn part is broken off
	extent
}

// side gives the curve of the first side with a name.
func (g geometry) side(name string) outline.Curve {
	for _, s := range g.part.Region.Sides() {
		if s.Name == name {
			return s.Curve
		}
	}
	panic("render: placement names a side that the family does not have")
}

// placements lists the dimensions of each family in the order of drawing.
func placements() map[string][]placement {
	return map[string][]placement{
		"bar-shoulder":      shoulderPlacements(),
		"bar-notch":         notchPlacements(),
		"bar-edge-notch":    edgeNotchPlacements(),
		"bar-hole":          holePlacements(),
		"bar-ellipse":       ellipsePlacements(),
		"bar-collar":        collarPlacements(),
		"shaft-shoulder":    shoulderPlacements(),
		"shaft-groove":      notchPlacements(),
		"shaft-ring-groove": ringGroovePlacements(),
		"shaft-collar":      collarPlacements(),
	}
}

// placementsOf gives the dimensions that are drawn of a part.
func placementsOf(part *specimen.Part) []placement {
	if list, ok := placements()[part.Name]; ok {
		return list
	}
	return outlinePlacements(part)
}

// centerOf gives the centre of a circular or elliptic arc.
func centerOf(c outline.Curve) (r2.Vec, bool) {
	switch a := c.(type) {
	case outline.Arc:
		return a.Center, true
	case outline.EllipticArc:
		return a.Center, true
	}
	return r2.Vec{}, false
}

// radiusBelow points at the middle of an arc from the side of its centre, in
// the lower half, which the quills leave free.
func radiusBelow(name string) func(g geometry) (a, b r2.Vec) {
	return func(g geometry) (a, b r2.Vec) {
		if corner, from, ok := g.sharp(); ok {
			return mirrored(corner), mirrored(from)
		}
		arc := g.side(name)
		tip := arc.At(0.5)
		center, ok := centerOf(arc)
		if !ok {
			center = r2.Add(tip, r2.Vec{X: 1, Y: 1})
		}
		return mirrored(tip), mirrored(center)
	}
}

// dimensionRow is the distance of dimension lines below the part, in units.
const dimensionRow = 34

// annotate draws all dimensions of a part in a view; named puts before each the
// name that it goes by on the command line.
func (s *sheet) annotate(v *view, part *specimen.Part, left, right float64, named bool) {
	g := geometry{part.Dims, part, left, right, extentOf(part)}
	material := v.loops(part)
	below, above := 0, 0
	for _, p := range placementsOf(part) {
		if p.Skip != nil && p.Skip(part.Dims) {
			continue
		}
		a, b := p.At(g)
		text := lettered(p, part, a, b)
		if named && p.Dim != "" {
			text = p.Dim + ": " + text
		}
		switch p.Kind {
		case acrossLeft:
			s.across(v, a, b, v.bounds().X0-s.u(dimensionOff), text)
		case acrossRight:
			s.across(v, a, b, v.bounds().X1+s.u(dimensionOff), text)
		case acrossInside:
			s.across(v, a, b, v.at(a).X, text)
		case alongBelow:
			if v.half && a.Y < 0 { // in the half that is left out
				s.along(v, mirrored(a), mirrored(b), v.bounds().Y0-s.u(aboveQuills+dimensionRow*float64(above)), text)
				above++
				continue
			}
			s.along(v, a, b, v.bounds().Y1+s.u(30+dimensionRow*float64(below)), text)
			below++
		case leaderTo:
			if v.half && a.Y < 0 {
				a, b = mirrored(a), mirrored(b)
			}
			p, q := v.at(a), v.at(b)
			away := point{0.6, 0.8} // where there is no direction to come from
			if l := distance(p, q); l > 0 {
				away = point{(q.X - p.X) / l, (q.Y - p.Y) / l}
			}
			s.leader(p, away, text, material)
		}
	}
}

// aboveQuills is the distance of a dimension line above the part, in units.
const aboveQuills = 82

// dimensionRows counts the dimension lines along the part, above it and below.
func dimensionRows(v *view, part *specimen.Part) (rows [2]int) {
	g := geometry{part.Dims, part, 0, 0, extentOf(part)}
	for _, p := range placementsOf(part) {
		if p.Kind != alongBelow || p.Skip != nil && p.Skip(part.Dims) {
			continue
		}
		if a, _ := p.At(g); v.half && a.Y < 0 {
			rows[0]++
		} else {
			rows[1]++
		}
	}
	return rows
}

// lettered is the text of a dimension: its value, or what is measured between
// the two points where it has no name.
func lettered(p placement, part *specimen.Part, a, b r2.Vec) string {
	if p.Text != nil {
		return p.Text(part.Dims)
	}
	text := number.Length(part.Dims[p.Dim], "")
	if p.Dim == "" {
		text = number.Compact(math.Abs(a.Y-b.Y), 6)
	}
	switch {
	case p.Kind == leaderTo:
		return "R" + text
	case p.Kind == alongBelow || !round(part):
		return text
	}
	return "Ø" + text
}
