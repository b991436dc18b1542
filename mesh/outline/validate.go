package outline

import (
	"math"

	"gonum.org/v1/gonum/spatial/r2"
)

// Bounds of what Validate lets pass, as fractions of the region's size (the
// diagonal of its box), and an angle in radians.
const (
	jointTolerance    = 1e-9 // gap between the end of a side and the start of the next
	touchTolerance    = 1e-9 // distance below which sides count as touching
	shortestSide      = 1e-8 // length of a side
	sharpestCuspAngle = 1e-3 // angle between two sides at a joint, from either side
)

// Validate checks that r is what the mesh needs: every side finite and of some
// length, the sides of a loop joined end to start, loops that neither cross
// nor touch themselves or one another, the outer loop counter-clockwise and
// the holes clockwise, the holes inside the outer loop and not in one another.
// It returns nil or the first fault found, a *Fault.
//
// A joint may have a gap of 1e-9 of the region's size (the diagonal of its
// box); the start of the later side counts as the corner. Sides closer than
// the same 1e-9 touch. Sides joining at less than 0.001 rad (0.06°), measured
// in the material or outside it, form a cusp. Smooth joints are fine.
func (r *Region) Validate() error {
	loops := r.loops()
	if err := r.checkSides(loops); err != nil {
		return err
	}
	size := r.size()
	if err := r.checkJoints(loops, size); err != nil {
		return err
	}
	pieces := make([][]piece, len(loops))
	first := 0
	for k, l := range loops {
		pieces[k] = l.pieces(first, shortestSide*size)
		first += len(l)
	}
	if who, where, found := findMeeting(pieces, touchTolerance*size); found {
		names := []string{r.sideName(who[0])}
		if who[1] != who[0] {
			names = append(names, r.sideName(who[1]))
		}
		return &Fault{Kind: Meeting, Sides: names, Where: where}
	}
	return checkNesting(loops, pieces)
}

// size is the diagonal of the box around the region.
func (r *Region) size() float64 {
	b := r.Bounds()
	return math.Hypot(b.Max.X-b.Min.X, b.Max.Y-b.Min.Y)
}

// Bounds gives the box around all loops of r, which must not be empty.
func (r *Region) Bounds() r2.Box {
	var b r2.Box
	for i, s := range r.Sides() {
		c := s.Curve.Bounds()
		if i == 0 {
			b = c
		}
		b = grow(grow(b, c.Min), c.Max)
	}
	return b
}

// checkSides looks at each side by itself.
func (r *Region) checkSides(loops []Loop) error {
	for k, l := range loops {
		if len(l) == 0 {
			return &Fault{Kind: NoSides, Sides: []string{loopName(k)}}
		}
	}
	sides := r.Sides()
	for i, s := range sides {
		if kind := shapeFault(s.Curve); kind != 0 {
			f := &Fault{Kind: kind, Sides: []string{r.sideName(i)}}
			if kind != NotFinite {
				f.Where = s.Curve.At(0)
			}
			return f
		}
	}
	size := r.size()
	if !finite(size) {
		return &Fault{Kind: NotFinite, Sides: []string{outerName}}
	}
	for i, s := range sides {
		b := s.Curve.Bounds()
		if !(math.Hypot(b.Max.X-b.Min.X, b.Max.Y-b.Min.Y) > shortestSide*size) {
			return &Fault{Kind: NoLength, Sides: []string{r.sideName(i)}, Where: s.Curve.At(0)}
		}
		// Between breaks a cubic's tangent turns by 90° at most, so it can
		// stand still only at a break.
		for _, t := range breaks(s.Curve) {
			if d := s.Curve.Deriv(t); !(math.Hypot(d.X, d.Y) > shortestSide*size) {
				return &Fault{Kind: Stall, Sides: []string{r.sideName(i)}, Where: s.Curve.At(t)}
			}
		}
	}
	return nil
}

// shapeFault checks the numbers of a curve of our own kinds.
func shapeFault(c Curve) FaultKind {
	arc := func(rmin, sweep float64) FaultKind {
		switch {
		case !(rmin > 0):
			return NoRadius
		case sweep == 0:
			return NoLength
		case math.Abs(sweep) > 2*math.Pi*(1+1e-15):
			return FullTurn
		}
		return 0
	}
	a, b := c.At(0), c.At(1)
	if !finite(a.X, a.Y, b.X, b.Y) {
		return NotFinite
	}
	switch c := c.(type) {
	case Arc:
		if !finite(c.Center.X, c.Center.Y, c.Radius, c.Start, c.Sweep) {
			return NotFinite
		}
		return arc(c.Radius, c.Sweep)
	case EllipticArc:
		if !finite(c.Center.X, c.Center.Y, c.A, c.B, c.Tilt, c.Start, c.Sweep) {
			return NotFinite
		}
		return arc(min(c.A, c.B), c.Sweep)
	case Bezier:
		if !finite(c.P[1].X, c.P[1].Y, c.P[2].X, c.P[2].Y) {
			return NotFinite
		}
	}
	return 0
}

// checkJoints looks at what happens between each side and the next.
func (r *Region) checkJoints(loops []Loop, size float64) error {
	first := 0
	for _, l := range loops {
		for i, s := range l {
			j := (i + 1) % len(l)
			next := l[j].Curve
			end, start := s.Curve.At(1), next.At(0)
			var names []string
			fault := func(kind FaultKind, gap float64) error {
				names = []string{r.sideName(first + i)}
				if j != i {
					names = append(names, r.sideName(first+j))
				}
				return &Fault{Kind: kind, Sides: names, Where: end, Gap: gap}
			}
			if gap := r2.Norm(r2.Sub(start, end)); gap > jointTolerance*size {
				return fault(Gap, gap)
			}
			back := r2.Scale(-1, tangent(s.Curve, 1))
			if angleBetween(back, tangent(next, 0)) < sharpestCuspAngle {
				return fault(Cusp, 0)
			}
		}
		first += len(l)
	}
	return nil
}

// checkNesting looks at the sense of the loops and at what is inside what,
// knowing that no two of them meet: one point of a loop tells for all of it.
func checkNesting(loops []Loop, pieces [][]piece) error {
	for k, l := range loops {
		if (l.area() > 0) != (k == 0) {
			return &Fault{Kind: WrongWay, Sides: []string{loopName(k)}, Where: l[0].Curve.At(0)}
		}
	}
	for k := 1; k < len(loops); k++ {
		p := loops[k][0].Curve.At(0)
		if winding(pieces[0], p) == 0 {
			return &Fault{Kind: Outside, Sides: []string{loopName(k)}, Where: p}
		}
		for j := 1; j < len(loops); j++ {
			if j != k && winding(pieces[j], p) != 0 {
				return &Fault{Kind: Nested, Sides: []string{loopName(k), loopName(j)}, Where: p}
			}
		}
	}
	return nil
}
