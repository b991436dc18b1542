package outline

import (
	"math"
	"slices"

	"gonum.org/v1/gonum/spatial/r2"
)

// CutX gives the material on the line x = const as intervals of y, ascending
// and disjoint. The material counts as closed: on a face along the line the
// cut is that of the thicker side, and single points on the line are left out.
func (r *Region) CutX(x float64) []Interval {
	before, after := r.cutter(axisX).both(x)
	return union(before, after)
}

// CutSegment gives the material on the segment from p to q as intervals of the
// distance from p, ascending and disjoint, none of them below zero or beyond q.
// There is none on a segment without length.
func (r *Region) CutSegment(p, q r2.Vec) []Interval {
	d := r2.Sub(q, p)
	l := math.Hypot(d.X, d.Y)
	if l == 0 {
		return nil
	}
	d = r2.Vec{X: d.X / l, Y: d.Y / l}
	n := r2.Vec{X: d.Y, Y: -d.X} // square to the right, as x is to y
	before, after := r.cutter(n).both(dot(p, n))
	from := dot(p, d)
	var cut []Interval
	for _, iv := range union(before, after) {
		if iv = (Interval{max(0, iv.Lo-from), min(l, iv.Hi-from)}); iv.Lo < iv.Hi {
			cut = append(cut, iv)
		}
	}
	return cut
}

// A cutter cuts a region by lines square to one direction n. Positions along n
// are called depths. It holds the boundary in stretches along which the depth
// only rises or only falls, so that a line meets each at most once.
type cutter struct {
	n, along  r2.Vec
	near      float64 // depths closer than this are the same
	stretches []stretch
}

// sameDepth is a fraction of the region's size: a face whose corners' depths
// differ by rounding lies along the line all the same.
const sameDepth = 1e-13

type stretch struct {
	c      Curve
	t0, t1 float64
	d0, d1 float64 // depths at t0 and t1
}

func (r *Region) cutter(n r2.Vec) *cutter {
	k := &cutter{n: n, along: r2.Vec{X: -n.Y, Y: n.X}, near: sameDepth * r.size()}
	for _, l := range r.loops() {
		for i, s := range l {
			// Neighbours share the very number of their corner's depth, and
			// stretches of a side that of their break: no line can slip
			// through between them, or meet both.
			t0, d0 := 0.0, k.depth(s.Curve.At(0))
			end := k.depth(l[(i+1)%len(l)].Curve.At(0))
			for _, t := range append(turningPoints(s.Curve, n), 1) {
				d := end
				if t < 1 {
					d = k.depth(s.Curve.At(t))
				}
				k.stretches = append(k.stretches, stretch{s.Curve, t0, t, d0, d})
				t0, d0 = t, d
			}
		}
	}
	return k
}

func (k *cutter) depth(p r2.Vec) float64 { return dot(p, k.n) }

// turningPoints lists the parameters inside a curve at which it runs square to
// n.
func turningPoints(c Curve, n r2.Vec) []float64 {
	if s, ok := c.(stationer); ok {
		return s.stationary(n)
	}
	var ts []float64
	bs := breaks(c)
	for i, t := range bs[1:] {
		f := func(t float64) (y, slope float64) { return dot(c.Deriv(t), n), dot(c.Second(t), n) }
		a, _ := f(bs[i])
		if b, _ := f(t); a < 0 != (b < 0) {
			ts = append(ts, bracketedRoot(f, bs[i], t, a < 0))
		}
	}
	return ts
}

// both gives the limits of the cut from below and from above a depth. They
// differ only where the boundary has a face or a turning point just there.
func (k *cutter) both(depth float64) (before, after []Interval) {
	return k.cut(depth, true), k.cut(depth, false)
}

// cut pairs up the places where stretches cross a depth. A stretch from d0 to
// d1 crosses the line just above a depth d if d0 <= d < d1 or the other way
// round, the line just below it if d0 < d <= d1; every closed loop then crosses
// an even number of times, whatever the rounding.
func (k *cutter) cut(depth float64, below bool) []Interval {
	var at []float64
	for _, s := range k.stretches {
		s.d0, s.d1 = k.snap(s.d0, depth), k.snap(s.d1, depth)
		lo, hi := min(s.d0, s.d1), max(s.d0, s.d1)
		if below && lo < depth && depth <= hi || !below && lo <= depth && depth < hi {
			at = append(at, dot(s.at(depth, k.n), k.along))
		}
	}
	slices.Sort(at)
	var cut []Interval
	for i := 0; i+1 < len(at); i += 2 {
		if at[i] < at[i+1] {
			cut = append(cut, Interval{at[i], at[i+1]})
		}
	}
	return union(cut, nil)
}

// snap takes a depth for another if it is as good as that.
func (k *cutter) snap(d, to float64) float64 {
	if math.Abs(d-to) <= k.near {
		return to
	}
	return d
}

// at finds the point of a stretch at a depth between those of its ends.
func (s *stretch) at(depth float64, n r2.Vec) r2.Vec { return s.c.At(s.param(depth, n)) }

func (s *stretch) param(depth float64, n r2.Vec) float64 {
	switch depth {
	case s.d0:
		return s.t0
	case s.d1:
		return s.t1
	}
	if _, ok := s.c.(Line); ok {
		return (depth - s.d0) / (s.d1 - s.d0)
	}
	f := func(t float64) (y, slope float64) {
		return dot(s.c.At(t), n) - depth, dot(s.c.Deriv(t), n)
	}
	return bracketedRoot(f, s.t0, s.t1, s.d1 > s.d0)
}
