package outline

import (
	"fmt"
	"math"

	"gonum.org/v1/gonum/spatial/r2"
)

// finish turns the subpath read so far into a loop. at is the byte of what
// ends it, Z or another.
func (p *pathReader) finish(at int, closed bool) error {
	segs := p.subpath
	p.subpath = nil
	if len(segs) == 0 {
		if closed {
			return p.fail(at, "nothing to close", "draw something between M and Z")
		}
		return nil // a move that is followed by another
	}
	last := &segs[len(segs)-1]
	points := boxOf(p.start)
	for _, s := range segs {
		points = grow(points, s.to)
	}
	extent := math.Hypot(points.Max.X-points.Min.X, points.Max.Y-points.Min.Y)
	const rounding = 1e-9
	switch gap := r2.Norm(r2.Sub(last.to, p.start)); {
	case gap <= rounding*extent:
		last.to = p.start
		if last.pointlike() {
			segs = segs[:len(segs)-1]
		}
	case closed:
		p.sides++
		segs = append(segs, segment{at: at, from: last.to, to: p.start, letter: 'L'})
	default:
		return p.fail(at, fmt.Sprintf("subpath from byte %d is not closed: it ends at %s, %.3g from its start",
			p.opened, place(last.to), gap), "end it with Z")
	}
	p.cur = p.start
	loop, err := p.loop(segs)
	if err != nil {
		return err
	}
	p.loops = append(p.loops, loop)
	return nil
}

// loop makes the curves and turns the outer loop counter-clockwise, the others
// clockwise.
func (p *pathReader) loop(segs []segment) (Loop, error) {
	number := p.sides - len(segs)
	var loop Loop
	for i, s := range segs {
		c, err := p.curve(&s)
		if err != nil {
			return nil, err
		}
		loop = append(loop, Side{fmt.Sprintf("%c%d", s.letter, number+i+1), c})
	}
	r := Region{Outer: loop}
	area := 0.0
	if len(loop) > 0 {
		area = loop.area()
	}
	// Below this the sign of the area would be a matter of rounding.
	const flat = 1e-10
	if len(loop) == 0 || !(math.Abs(area) > flat*r.size()*r.size()) {
		return nil, p.fail(min(p.opened, len(p.data)), "subpath encloses no area", "an outline goes round its material once, without crossing itself")
	}
	if (area > 0) != (len(p.loops) == 0) {
		loop = loop.reverse()
	}
	return loop, nil
}

func (p *pathReader) curve(s *segment) (Curve, error) {
	switch s.letter {
	case 'L':
		return Line{s.from, s.to}, nil
	case 'C':
		return Bezier{[4]r2.Vec{s.from, s.control[0], s.control[1], s.to}}, nil
	}
	c, err := EndpointArc(s.from, s.to, s.rx, s.ry, radians(s.degrees), s.large, s.ccw)
	if e, ok := c.(EllipticArc); ok && !(max(e.A, e.B) <= largestPathNumber) || err != nil {
		return nil, p.fail(s.at, "arc cannot be drawn", "its radii are out of all proportion to its ends")
	}
	return c, nil
}

// radians of an angle in degrees, reduced to a full turn exactly.
func radians(degrees float64) float64 { return math.Mod(degrees, 360) * (math.Pi / 180) }

// reverse runs through a loop backwards from the same first corner.
func (l Loop) reverse() Loop {
	r := make(Loop, len(l))
	for i, s := range l {
		r[len(l)-1-i] = Side{s.Name, s.Curve.Reverse()}
	}
	return r
}
