package mesh

import (
	"gonum.org/v1/gonum/spatial/r2"

	"notchproof/mesh/predicate"
)

// smooth moves vertices inside the region so that the smallest angle of the
// triangles about each grows (after Freitag, Jones and Plassmann 1995), and after
// every move flips edges until the triangulation is constrained Delaunay again,
// which never lowers the smallest angle. Vertices go one after the other in the
// order of their making. Those without an angle below 35° are left alone.
func (r *refiner) smooth() {
	var ring []int32
	var fresh []edgeName
	for range smoothSweeps {
		moved := false
		for v := r.free; v < int32(len(r.points)); v++ {
			if r.bound[v] {
				continue
			}
			ring = r.ring(v, ring[:0])
			p := r.points[v]
			if r.points[v] = r.better(p, ring); r.points[v] == p {
				continue
			}
			moved = true
			fresh = fresh[:0]
			for i, a := range ring {
				fresh = append(fresh, edgeName{a, ring[(i+1)%len(ring)]}, edgeName{v, a})
			}
			r.legalise(fresh)
		}
		if !moved {
			return
		}
	}
}

const (
	smoothSweeps = 3
	fairSin2     = 0.32898992833716556 // sin² 35°
)

// ring lists the vertices around an inner vertex, counter-clockwise.
func (r *refiner) ring(v int32, ring []int32) []int32 {
	start := r.at[v]
	for i := start; ; {
		k := r.corner(i, v)
		ring = append(ring, r.tris[i].v[after[k]])
		if i = r.tris[i].n[after[k]]; i == start {
			return ring
		}
	}
}

// better looks around p for a better hub of the ring: a compass search from a
// quarter of an edge down to a thirtieth.
func (r *refiner) better(p r2.Vec, ring []int32) r2.Vec {
	worst := r.worst(p, ring, -1)
	if worst > fairSin2 {
		return p
	}
	const d = 0.7
	compass := [8]r2.Vec{{X: 1}, {X: d, Y: d}, {Y: 1}, {X: -d, Y: d}, {X: -1}, {X: -d, Y: -d}, {Y: -1}, {X: d, Y: -d}}
	size := dist(p, r.points[ring[0]])
	for step := size / 4; step > size/33; step /= 2 {
		from := p
		for _, u := range compass {
			q := shifted(from, step, u)
			if w := r.worst(q, ring, worst); w > worst && r.fits(q, ring) {
				p, worst = q, w
			}
		}
	}
	return p
}

// worst gives sin² of the smallest angle of the triangles from p over the ring.
// Where that is not above a bound, or a triangle is not counter-clockwise, it may
// stop early and give any number not above the bound.
func (r *refiner) worst(p r2.Vec, ring []int32, bound float64) float64 {
	worst := 1.0
	a := r.points[ring[len(ring)-1]]
	la := dist2(a, p)
	for _, w := range ring {
		b := r.points[w]
		lb, lp := dist2(b, p), dist2(a, b)
		area := area2(a, b, p)
		// The smallest angle is opposite the shortest edge, between the others.
		x, y := area*area*min(la, lb, lp), la*lb*lp
		if !(area > 0) || x <= bound*y {
			return bound
		}
		if x < worst*y {
			worst = x / y
		}
		a, la = b, lb
	}
	return worst
}

// fits tells whether the exact signs and the sizes wished for allow p as the hub
// of the ring.
func (r *refiner) fits(p r2.Vec, ring []int32) bool {
	for i, w := range ring {
		q := r.points[w]
		if predicate.Orient(q, r.points[ring[(i+1)%len(ring)]], p) <= 0 {
			return false
		}
		limit := min(oversize*r.field.at(midpoint(p, q)), r.field.largest)
		if dist2(p, q) > limit*limit {
			return false
		}
	}
	return true
}
