package mesh

import (
	"math"

	"gonum.org/v1/gonum/spatial/r2"

	"notchproof/mesh/outline"
)

// Two sides that meet at less than 60° cannot both be cut in their middles
// forever: each cut would encroach upon the other side and ask for the next. The
// pieces next to such a corner are instead cut at common distances from it, on
// "concentric shells" (Ruppert 1995), and a small angle that only reflects the
// corner's own is left alone (Miller, Pav and Walkington 2003).

// sharpAngle is the corner angle below which all this is needed.
const sharpAngle = math.Pi / 3

// sharpCorner tells whether the material's angle between the end of one side and
// the begin of the next is sharp.
func sharpCorner(before, next outline.Curve) bool {
	u, w := r2.Scale(-1, before.Deriv(1)), next.Deriv(0)
	// The material's angle runs counter-clockwise from the next side to the
	// one before. Sides that fold back onto each other by less than rounding
	// count as sharp.
	angle := math.Atan2(cross(w, u), dot(w, u))
	return angle > -1e-9 && angle < sharpAngle
}

// foldsBack tells whether two straight sides meet at no angle to speak of.
func foldsBack(before, next outline.Curve) bool {
	u, w := before.Deriv(1), next.Deriv(0)
	return straight(before) && straight(next) && dot(u, w) < 0 && math.Abs(cross(u, w)) < 1e-9*norm(u)*norm(w)
}

// shellCuts gives the sides that meet in a sharp corner equal first pieces.
func shellCuts(region *outline.Region, cuts [][]float64) {
	first := 0
	for _, loop := range loops(region) {
		for j := range loop {
			k := (j + 1) % len(loop)
			if !sharpCorner(loop[j].Curve, loop[k].Curve) {
				continue
			}
			end := shellSide{curve: loop[j].Curve.Reverse(), cuts: reversed(cuts[first+j])}
			begin := shellSide{curve: loop[k].Curve, cuts: cuts[first+k]}
			if j == k { // a loop of one side: both ends are the same list
				begin.cuts = cuts[first+j]
				r := min(end.radius(), begin.radius())
				cuts[first+j] = reversed(end.cut(r))
				begin.cuts = cuts[first+j]
				cuts[first+j] = begin.cut(r)
				continue
			}
			r := min(end.radius(), begin.radius())
			cuts[first+j] = reversed(end.cut(r))
			cuts[first+k] = begin.cut(r)
		}
		first += len(loop)
	}
}

// A shellSide is a side seen from a sharp corner at its begin.
type shellSide struct {
	curve outline.Curve
	cuts  []float64
}

func reversed(ts []float64) []float64 {
	out := make([]float64, len(ts))
	for i, t := range ts {
		out[len(ts)-1-i] = 1 - t
	}
	return out
}

// radius is that of the shell that suits the side: the end of its first piece,
// or the middle if there is but one.
func (s shellSide) radius() float64 {
	r := dist(s.curve.At(0), s.curve.At(s.cuts[1]))
	if len(s.cuts) == 2 {
		r /= 2
	}
	return r
}

// cut gives the side's cuts with one on the shell: the first cut moves if it is
// near, else there is one more.
func (s shellSide) cut(r float64) []float64 {
	t := shellParameter(s.curve, 0, s.cuts[1], r)
	if d := dist(s.curve.At(0), s.curve.At(s.cuts[1])); len(s.cuts) > 2 && d < 1.5*r {
		ts := append([]float64(nil), s.cuts...)
		ts[1] = t
		return ts
	}
	return append([]float64{0, t}, s.cuts[1:]...)
}

// shellParameter finds where the curve is at distance r from its point at t0,
// between t0 and t1; the distance grows along so short a piece. t0 may be the
// greater.
func shellParameter(c outline.Curve, t0, t1, r float64) float64 {
	center := c.At(t0)
	if straight(c) {
		return t0 + float64((t1-t0)*min(1, r/dist(center, c.At(t1))))
	}
	for range 60 {
		tm := (t0 + t1) / 2
		if dist(center, c.At(tm)) < r {
			t0 = tm
		} else {
			t1 = tm
		}
	}
	return t1
}

// markShells finds the sharp corners and the vertices at the ends of the pieces
// that begin or end there.
func (r *refiner) markShells() {
	r.least = make([]float64, len(r.points))
	r.shell = make([]int32, len(r.points))
	for i := range r.shell {
		r.shell[i] = -1
	}
	for side, next := range r.outline.next {
		if !sharpCorner(r.outline.sides[side].Curve, r.outline.sides[next].Curve) {
			continue
		}
		before, behind := &r.segs[r.outline.last[side]], &r.segs[r.outline.first[next]]
		corner := before.b
		r.shell[before.a] = corner
		r.shell[behind.b] = corner
		r.least[corner] = smallestShell * r.room(behind)
	}
}

// smallestShell is the radius of the smallest shell made for the sake of angles,
// as a part of the room about the corner. In a cusp shells would otherwise grow
// smaller without end, as the angle between the shells' ends does.
const smallestShell = 1.0 / 64

// room is the distance from the begin of a segment, a corner, to the nearest
// vertex joined to it and to the segments across the triangles there.
func (r *refiner) room(s *segment) float64 {
	corner := r.point(s.a)
	room := math.Inf(1)
	i, k := r.edge(s.a, s.b) // k+1 is the corner, k+2 and k the other two
	for {
		tr := &r.tris[i]
		k1, k2 := after[k], after[after[k]]
		p, q := r.point(tr.v[k2]), r.point(tr.v[k])
		room = min(room, dist(corner, p), dist(corner, q))
		if tr.s[k1] >= 0 {
			piece := sizePiece{a: p, u: r2.Sub(q, p), uu: dist2(p, q)}
			room = piece.lower(corner, 1, room)
		}
		if tr.s[k2] >= 0 {
			return room
		}
		n := tr.n[k2]
		i, k = n, r.entry(n, i)
	}
}

// excused tells whether an edge spans a sharp corner from one side to the other
// on a shell: then it is as short as the corner makes it.
func (r *refiner) excused(u, v int32) bool {
	corner := r.shell[u]
	if corner < 0 || r.shell[v] != corner {
		return false
	}
	du, dv := dist(r.point(u), r.point(corner)), dist(r.point(v), r.point(corner))
	return math.Abs(du-dv) <= 1e-6*du
}
