package mesh

import (
	"fmt"

	"gonum.org/v1/gonum/spatial/r2"

	"notchproof/mesh/predicate"
)

// cutSegment cuts a segment in the middle of its curve's parameter, or half way
// to a sharp corner at its end. The new vertex lies on the true curve, on either
// side of the chord. It reports false if the segment is too short to be cut, at a sharp
// corner unless it is for the sake of a large triangle.
func (r *refiner) cutSegment(seg int32, large bool, depth int) (bool, error) {
	s := r.segs[seg]
	if dist2(r.point(s.a), r.point(s.b)) < r.shortest2 {
		return false, nil
	}
	t, corner := r.middle(&s)
	if corner >= 0 && !large && dist(r.point(s.a), r.point(s.b)) < 2*r.least[corner] {
		return false, nil
	}
	p := r.outline.sides[s.side].Curve.At(t)
	i, k := r.edge(s.a, s.b)
	ring, ok := r.open(i, k, seg, p)
	if !ok {
		r.constrain(i, k, seg)
		if ring >= 0 && depth < 40 {
			// Another curve's chord is in the way.
			if other := r.cavity.ring[ring].seg; other >= 0 && r.segs[other].curved {
				if done, err := r.cutSegment(other, large, depth+1); err != nil || !done {
					return false, err
				}
				return r.cutSegment(seg, large, depth+1)
			}
		}
		return false, fmt.Errorf("side %d (%q) touches or crosses another near (%g, %g)", s.side, r.outline.sides[s.side].Name, p.X, p.Y)
	}
	v := r.addVertex(p)
	r.shell[v] = corner
	r.bound[v] = true
	r.fill(v)
	r.halve(seg, v, t)
	for _, f := range r.cavity.tris {
		r.judge(f)
	}
	return true, nil
}

// middle gives the parameter to cut a segment at, and the sharp corner on whose
// shell that is, or -1.
func (r *refiner) middle(s *segment) (t float64, corner int32) {
	c := r.outline.sides[s.side].Curve
	half := dist(r.point(s.a), r.point(s.b)) / 2
	switch a, b := r.least[s.a] > 0, r.least[s.b] > 0; {
	case a && !b:
		return shellParameter(c, s.t0, s.t1, half), s.a
	case b && !a:
		return shellParameter(c, s.t1, s.t0, half), s.b
	}
	return (s.t0 + s.t1) / 2, -1
}

// open lifts the constraint on a segment, edge k of triangle i, and finds the
// cavity of p, which must take in the whole chord. If it does not, it gives the
// edge of the ring that is in the way, or -1.
func (r *refiner) open(i int32, k int, seg int32, p r2.Vec) (ring int, ok bool) {
	n := r.tris[i].n[k]
	r.constrain(i, k, -1)
	begin := i
	if !r.conflicts(i, p) {
		begin = n
	}
	r.find(p, begin)
	if ring, ok = r.sound(p); !ok {
		return ring, false
	}
	// Nothing may lie between the chord and the point.
	s := &r.segs[seg]
	a, b := r.point(s.a), r.point(s.b)
	if side := predicate.Orient(a, b, p); side != 0 {
		for _, e := range r.cavity.ring {
			if e.a == s.a || e.a == s.b {
				continue
			}
			q := r.point(e.a)
			if predicate.Orient(a, b, q) == side && predicate.Orient(b, p, q) == side && predicate.Orient(p, a, q) == side {
				return -1, false
			}
		}
	}
	return -1, true
}

// halve constrains the two halves of a segment cut at vertex v, whose fan has
// just been made, and says which of the fan's triangles are inside: those passed
// when going around counter-clockwise from the segment's end to its begin.
func (r *refiner) halve(seg, v int32, t float64) {
	s := &r.segs[seg]
	second := *s
	second.a, second.t0 = v, t
	id := int32(len(r.segs))
	end := s.b
	s.b, s.t1, s.next = v, t, id
	begin := s.a
	r.segs = append(r.segs, second)

	ring, fan := r.cavity.ring, r.cavity.tris
	at := 0
	for ring[at].a != end {
		at++
	}
	inside := true
	for j := range ring {
		m := (at + j) % len(ring)
		switch ring[m].a {
		case end:
			r.constrain(fan[m], 1, id)
		case begin:
			r.constrain(fan[m], 1, seg)
			inside = false
		}
		r.tris[fan[m]].inside = inside
	}
}
