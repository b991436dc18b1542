package specimen

import (
	"math"
	"strconv"

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
			switch c := loop[i].Curve.(type) {
			case outline.Line:
				loop[i].Curve = outline.Line{A: ontoAxis(c.A, near), B: ontoAxis(c.B, near)}
			case outline.Arc:
				loop[i].Curve = aboutCentre(c, c.At(0), c.At(1))
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

// aboutCentre gives an arc the bits that it has when it is drawn about its
// centre between its ends, as the families' arcs are.
func aboutCentre(c outline.Arc, from, to r2.Vec) outline.Curve {
	arc, err := outline.NewArc(from, to, c.Center, c.Sweep > 0)
	if err != nil {
		return c
	}
	return arc
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
	from, to := parts[0].Curve.At(0), parts[len(parts)-1].Curve.At(1)
	if whole.A == whole.B {
		whole.Center = r2.Vec{X: decimal(whole.Center.X, whole.A), Y: decimal(whole.Center.Y, whole.A)}
		return aboutCentre(outline.Arc{Center: whole.Center, Radius: whole.A, Start: whole.Start, Sweep: whole.Sweep}, from, to), true
	}
	if from == to {
		whole.Sweep = math.Copysign(2*math.Pi, whole.Sweep)
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

// decimal rounds a coordinate to twelve digits behind the first of a length:
// each part of an arc knows the centre but for rounding, and drawings have it
// at a number of few digits.
func decimal(x, length float64) float64 {
	places := 12 - int(math.Floor(math.Log10(length)))
	if places < 0 {
		return x
	}
	rounded, err := strconv.ParseFloat(strconv.FormatFloat(x, 'f', places, 64), 64)
	if err != nil {
		return x
	}
	return rounded + 0 // no minus zero
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
