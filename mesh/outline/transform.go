package outline

import "gonum.org/v1/gonum/spatial/r2"

// Scaled gives the region with all lengths multiplied by factor, which must be
// positive.
func (r *Region) Scaled(factor float64) *Region {
	if !(factor > 0) {
		panic("outline: scale factor is not positive")
	}
	return r.mapped(func(c Curve) Curve { return similar(c, factor, r2.Vec{}) })
}

// Translated gives the region moved by d.
func (r *Region) Translated(d r2.Vec) *Region {
	return r.mapped(func(c Curve) Curve { return similar(c, 1, d) })
}

// Mirrored gives the image of the region in the line y = 0. Its loops run the
// right way again: each begins in the image of the same corner and has the
// sides in reverse order.
func (r *Region) Mirrored() *Region {
	m := r.mapped(mirrored)
	m.Outer = m.Outer.reverse()
	for k := range m.Holes {
		m.Holes[k] = m.Holes[k].reverse()
	}
	return m
}

// mapped applies a change to every curve.
func (r *Region) mapped(change func(Curve) Curve) *Region {
	loop := func(l Loop) Loop {
		var m Loop
		for _, s := range l {
			m = append(m, Side{s.Name, change(s.Curve)})
		}
		return m
	}
	m := &Region{Outer: loop(r.Outer)}
	for _, h := range r.Holes {
		m.Holes = append(m.Holes, loop(h))
	}
	return m
}

const foreignCurve = "outline: curve of a kind from elsewhere cannot be transformed"

// similar multiplies by f, then moves by d. The ends of arcs are pinned to
// the images of their ends, so that joints stay closed to the last bit.
func similar(c Curve, f float64, d r2.Vec) Curve {
	to := func(p r2.Vec) r2.Vec {
		return r2.Vec{X: float64(f*p.X) + d.X, Y: float64(f*p.Y) + d.Y}
	}
	ends := pinned(to(c.At(0)), to(c.At(1)))
	switch c := c.(type) {
	case Line:
		return Line{to(c.A), to(c.B)}
	case Bezier:
		return Bezier{[4]r2.Vec{to(c.P[0]), to(c.P[1]), to(c.P[2]), to(c.P[3])}}
	case Arc:
		return Arc{to(c.Center), f * c.Radius, c.Start, c.Sweep, ends}
	case EllipticArc:
		return EllipticArc{to(c.Center), f * c.A, f * c.B, c.Tilt, c.Start, c.Sweep, ends}
	}
	panic(foreignCurve)
}

// mirrored gives the image in y = 0, run through from the image of the same
// end.
func mirrored(c Curve) Curve {
	to := func(p r2.Vec) r2.Vec { return r2.Vec{X: p.X, Y: 0 - p.Y} }
	ends := pinned(to(c.At(0)), to(c.At(1)))
	switch c := c.(type) {
	case Line:
		return Line{to(c.A), to(c.B)}
	case Bezier:
		return Bezier{[4]r2.Vec{to(c.P[0]), to(c.P[1]), to(c.P[2]), to(c.P[3])}}
	case Arc:
		return Arc{to(c.Center), c.Radius, -c.Start, -c.Sweep, ends}
	case EllipticArc:
		return EllipticArc{to(c.Center), c.A, c.B, -c.Tilt, -c.Start, -c.Sweep, ends}
	}
	panic(foreignCurve)
}

// part gives the stretch of c from t0 to t1 with a and b for its exact ends.
func part(c Curve, t0, t1 float64, a, b r2.Vec) Curve {
	if t0 == 0 && t1 == 1 && a == c.At(0) && b == c.At(1) {
		return c
	}
	switch c := c.(type) {
	case Line:
		return Line{a, b}
	case Bezier:
		_, c = c.split(t0)
		c, _ = c.split((t1 - t0) / (1 - t0))
		c.P[0], c.P[3] = a, b
		return c
	case Arc:
		return Arc{c.Center, c.Radius, c.Start + float64(t0*c.Sweep), (t1 - t0) * c.Sweep, pinned(a, b)}
	case EllipticArc:
		return EllipticArc{c.Center, c.A, c.B, c.Tilt, c.Start + float64(t0*c.Sweep), (t1 - t0) * c.Sweep, pinned(a, b)}
	}
	panic(foreignCurve)
}
