package specimen

import (
	"math"

	"gonum.org/v1/gonum/spatial/r2"

	"notchproof/mesh/outline"
)

// How straight a bend and how equal two circles must be to be one: what
// coordinates of nine digits can promise.
const sameShape = 1e-9

// joined undoes what a drawing may cut without meaning it, so that the same
// shape gives the same mesh: straight lines in several pieces, and arcs that
// path data cannot hold in one piece (outline.FormatPath writes arcs near 180°
// and near 360° in two or three equal parts). Points within rounding of y = 0
// are put there.
func (s sheet) joined() sheet {
	near := slack(s.region())
	for k, loop := range s {
		for i := range loop {
			if l, ok := loop[i].Curve.(outline.Line); ok {
				loop[i].Curve = outline.Line{A: ontoAxis(l.A, near), B: ontoAxis(l.B, near)}
			}
		}
		s[k] = joinLoop(loop)
	}
	return s
}

func ontoAxis(p r2.Vec, near float64) r2.Vec {
	if math.Abs(p.Y) <= near {
		p.Y = 0
	}
	return p
}

// joinLoop joins neighbours until nothing more can be joined.
func joinLoop(loop []drawnSide) []drawnSide {
	for i := 0; i < len(loop) && len(loop) > 2; {
		j := (i + 1) % len(loop)
		line, ok := oneLine(loop[i], loop[j])
		if !ok {
			i++
			continue
		}
		loop[i].Curve = line
		loop = append(loop[:j:j], loop[j+1:]...)
		if j == 0 {
			break // the side that was last is now joined with the first
		}
	}
	for i := 0; i < len(loop); i++ {
		for _, parts := range []int{3, 2} {
			if i+parts > len(loop) {
				continue
			}
			if arc, ok := oneArc(loop[i : i+parts]); ok {
				loop[i].Curve = arc
				loop = append(loop[:i+1:i+1], loop[i+parts:]...)
				break
			}
		}
	}
	return loop
}

// oneLine joins two straight sides along one line.
func oneLine(a, b drawnSide) (outline.Line, bool) {
	p, ok := a.Curve.(outline.Line)
	q, too := b.Curve.(outline.Line)
	if !ok || !too || a.notch != b.notch {
		return outline.Line{}, false
	}
	if turn := angleBetween(r2.Sub(p.B, p.A), r2.Sub(q.B, q.A)); math.Abs(turn) > sameShape {
		return outline.Line{}, false
	}
	return outline.Line{A: p.A, B: q.B}, true
}

// oneArc joins the equal parts of one arc.
func oneArc(parts []drawnSide) (outline.Curve, bool) {
	first, ok := arcOf(parts[0].Curve)
	if !ok {
		return nil, false
	}
	whole := first
	whole.Sweep = 0
	for _, part := range parts {
		e, ok := arcOf(part.Curve)
		if !ok || part.notch != parts[0].notch || !samePart(first, e) {
			return nil, false
		}
		whole.Sweep += e.Sweep
	}
	if !writtenInParts(math.Abs(whole.Sweep)/math.Pi, len(parts)) {
		return nil, false
	}
	if full := math.Copysign(2*math.Pi, whole.Sweep); math.Abs(whole.Sweep-full) <= sameShape {
		whole.Sweep = full
	}
	if whole.A == whole.B {
		return outline.Arc{Center: whole.Center, Radius: whole.A, Start: whole.Start, Sweep: whole.Sweep}, true
	}
	return whole, true
}

// writtenInParts tells whether an arc of so many half turns has to be written
// in so many parts.
func writtenInParts(halfTurns float64, parts int) bool {
	switch parts {
	case 2:
		return halfTurns > 0.9 && halfTurns < 1.1 && math.Abs(halfTurns-1) > sameShape
	case 3:
		return halfTurns > 1.8 && halfTurns < 2+sameShape
	}
	return false
}

// arcOf sees circular and elliptic arcs alike.
func arcOf(c outline.Curve) (outline.EllipticArc, bool) {
	switch c := c.(type) {
	case outline.Arc:
		return outline.EllipticArc{Center: c.Center, A: c.Radius, B: c.Radius, Start: c.Start, Sweep: c.Sweep}, true
	case outline.EllipticArc:
		return outline.EllipticArc{Center: c.Center, A: c.A, B: c.B, Tilt: c.Tilt, Start: c.Start, Sweep: c.Sweep}, true
	}
	return outline.EllipticArc{}, false
}

// samePart tells whether two arcs are equal parts of one ellipse.
func samePart(a, b outline.EllipticArc) bool {
	size := math.Max(a.A, a.B)
	near := func(x, y, scale float64) bool { return math.Abs(x-y) <= sameShape*scale }
	return near(a.A, b.A, size) && near(a.B, b.B, size) && near(a.Tilt, b.Tilt, 1) && near(a.Sweep, b.Sweep, 1) &&
		near(a.Center.X, b.Center.X, size) && near(a.Center.Y, b.Center.Y, size)
}
