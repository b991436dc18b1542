package mesh

import (
	"math"

	"gonum.org/v1/gonum/spatial/r2"

	"notchproof/mesh/predicate"
)

// Chords stand for curves while a mesh grows. Here is checked that they may.

// lens lists the curved segments to be cut if something lies between a segment's
// chord and its curve: then a later cut of the segment would put that on the
// wrong side.
func (t *triangulation) lens(b *boundary, seg int32) []int32 {
	s := &t.segs[seg]
	if !s.curved {
		return nil
	}
	p := b.sides[s.side].Curve.At((s.t0 + s.t1) / 2)
	i, k := t.edge(s.a, s.b)
	from, to := t.points[s.a], t.points[s.b]
	switch predicate.Orient(from, to, p) {
	case 0:
		return nil
	case -1:
		n := t.tris[i].n[k]
		i, k = n, t.entry(n, i)
		from, to = to, from
	}
	// The circle through a, p, b stands for the curve.
	if predicate.InCircle(from, to, p, t.points[t.tris[i].v[k]]) > 0 {
		return []int32{seg}
	}
	tri, wall := t.walk(i, p)
	if wall < 0 {
		return nil
	}
	if other := t.tris[tri].s[wall]; other >= 0 {
		return crossing{seg, other, -1}.of(t)
	}
	return []int32{seg}
}

// foldedCorners lists the curved segments at corners where the curves leave in
// the opposite order of their chords. If the curves do so on any scale, they cross
// there. A corner of just no or a full turn has no order to speak of.
func (t *triangulation) foldedCorners(b *boundary) []int32 {
	var coarse []int32
	for side, next := range b.next {
		before, behind := b.last[side], b.first[next]
		s, o := &t.segs[before], &t.segs[behind]
		if !s.curved && !o.curved {
			continue
		}
		curve := cornerTurn(b.sides[next].Curve.Deriv(0), r2.Scale(-1, b.sides[side].Curve.Deriv(1)))
		chord := cornerTurn(r2.Sub(t.points[o.b], t.points[o.a]), r2.Sub(t.points[s.a], t.points[s.b]))
		if math.Min(curve, 2*math.Pi-curve) > 1e-6 && math.Abs(curve-chord) > math.Pi {
			coarse = append(coarse, crossing{before, behind, -1}.of(t)...)
		}
	}
	return coarse
}

// cornerTurn is the angle, from 0 to 2π, by which w must turn counter-clockwise
// to point along u.
func cornerTurn(w, u r2.Vec) float64 {
	angle := math.Atan2(cross(w, u), dot(w, u))
	if angle < 0 {
		angle += 2 * math.Pi
	}
	return angle
}

// unbend cuts a curved side of triangle i, which is to keep its small angles, if
// the curve leaves the chord at more than two thirds of one of them: such a
// triangle could fold over when it is bent.
func (r *refiner) unbend(i int32) error {
	tr := &r.tris[i]
	for k, seg := range tr.s {
		if seg < 0 || !r.segs[seg].curved {
			continue
		}
		s := &r.segs[seg]
		a, b, c := r.point(s.a), r.point(s.b), r.point(tr.v[k])
		p := r.outline.sides[s.side].Curve.At((s.t0 + s.t1) / 2)
		// An arc leaves its chord at twice the angle under which its middle
		// is seen from an end.
		if area2(a, b, p) > 0 && 3*cornerAngle(a, b, p) > min(cornerAngle(a, b, c), cornerAngle(b, c, a)) {
			_, err := r.cutSegment(seg, false, 0)
			return err
		}
	}
	return nil
}
