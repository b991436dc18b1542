package outline

import (
	"math"
	"slices"

	"gonum.org/v1/gonum/spatial/r2"
)

// findMeeting looks for two pieces of a region's boundary that come closer
// than tol anywhere but at the joint that neighbours share. Loops are given by
// their pieces; the numbers of the sides and the place of the first meeting
// found are returned.
func findMeeting(loops [][]piece, tol float64) (sides [2]int, where r2.Vec, found bool) {
	type boxed struct {
		*piece
		box        r2.Box
		loop, rank int
	}
	var all []boxed
	for k, ps := range loops {
		for i := range ps {
			all = append(all, boxed{&ps[i], ps[i].box(), k, i})
		}
	}
	// In the order of their left edges, a box need only be compared until the
	// first that begins right of it.
	slices.SortStableFunc(all, func(p, q boxed) int {
		switch {
		case p.box.Min.X < q.box.Min.X:
			return -1
		case p.box.Min.X > q.box.Min.X:
			return 1
		}
		return 0
	})
	for i, p := range all {
		for _, q := range all[i+1:] {
			if q.box.Min.X > p.box.Max.X+tol {
				break
			}
			if q.box.Min.Y > p.box.Max.Y+tol || p.box.Min.Y > q.box.Max.Y+tol {
				continue
			}
			n := len(loops[p.loop])
			test := func(tol float64) (r2.Vec, bool) { return meet(p.piece, q.piece, tol) }
			switch {
			case p.loop == q.loop && (p.rank+1)%n == q.rank:
				test = func(tol float64) (r2.Vec, bool) { return meetBesideJoint(p.piece, q.piece, tol, 40) }
			case p.loop == q.loop && (q.rank+1)%n == p.rank:
				test = func(tol float64) (r2.Vec, bool) { return meetBesideJoint(q.piece, p.piece, tol, 40) }
			}
			if where, found := sharpest(test, tol); found {
				return [2]int{min(p.side, q.side), max(p.side, q.side)}, where, true
			}
		}
	}
	return sides, where, false
}

// sharpest repeats a successful test with smaller tolerances, because a place
// where curves run beside each other is only known to about √tol.
func sharpest(test func(tol float64) (r2.Vec, bool), tol float64) (where r2.Vec, found bool) {
	where, found = test(tol)
	for range 2 { // a ten-thousandth of 1e-9 is still above rounding
		if !found {
			break
		}
		tol /= 100
		closer, again := test(tol)
		if !again {
			break
		}
		where = closer
	}
	return where, found
}

// meet decides whether two pieces come closer than tol (to a quarter of it).
// While the strips around the chords may touch, the one with the higher strip
// is halved. Heights fall fourfold with each halving, so that the depth is
// about log2(size/tol)/2, and few pairs survive at each depth unless the
// curves run beside each other within a few tol.
func meet(p, q *piece, tol float64) (where r2.Vec, found bool) {
	where, d := closest(p.a, p.b, q.a, q.b)
	if d > p.h+q.h+tol {
		return where, false
	}
	const finest = 0x1p-48 // of a parameter interval: rounding is near
	pFlat, qFlat := p.h <= tol/8 || p.t1-p.t0 < finest, q.h <= tol/8 || q.t1-q.t0 < finest
	if pFlat && qFlat {
		return where, true
	}
	if pFlat || !qFlat && p.h < q.h {
		p, q = q, p
	}
	l, r := p.halve()
	if where, found = meet(&l, q, tol); found {
		return where, true
	}
	return meet(&r, q, tol)
}

// meetBesideJoint does the same for p that ends where q begins, leaving out
// that joint itself. Let u and v be the directions in which p and q leave the
// joint, and φ the angle between them. If p's directions stay within τp of u
// and q's within τq of v, both below 90°, and τp+τq < φ, then some straight
// line through the joint has all of p strictly on one side and all of q on the
// other: both run away from it monotonically. Otherwise halve, until the ends
// at the joint are short enough to satisfy this.
func meetBesideJoint(p, q *piece, tol float64, depth int) (where r2.Vec, found bool) {
	const margin = 1e-9
	phi := angleBetween(r2.Scale(-1, p.tb), q.ta)
	turnP, turnQ := p.turning(), q.turning()
	if depth == 0 || max(turnP, turnQ) < math.Pi/2-margin && turnP+turnQ < phi-margin {
		return r2.Vec{}, false
	}
	p0, p1 := p.halve()
	q0, q1 := q.halve()
	for _, pair := range [3][2]*piece{{&p0, &q0}, {&p0, &q1}, {&p1, &q1}} {
		if where, found = meet(pair[0], pair[1], tol); found {
			return where, true
		}
	}
	return meetBesideJoint(&p1, &q0, tol, depth-1)
}

// closest gives the distance of the segments ab and cd, and the middle between
// their closest points.
func closest(a, b, c, d r2.Vec) (r2.Vec, float64) {
	if side(a, b, c)*side(a, b, d) < 0 && side(c, d, a)*side(c, d, b) < 0 {
		// They cross: where cd's ends weigh out their distances from ab.
		sc, sd := side(a, b, c), side(a, b, d)
		return mix(c, d, sc/(sc-sd)), 0
	}
	where, least := r2.Vec{}, math.Inf(1)
	for _, k := range [4][3]r2.Vec{{a, c, d}, {b, c, d}, {c, a, b}, {d, a, b}} {
		l := Line{k[1], k[2]}
		foot := l.At(l.Nearest(k[0]))
		if dist := r2.Norm(r2.Sub(foot, k[0])); dist < least {
			where, least = mix(foot, k[0], 0.5), dist
		}
	}
	return where, least
}

// side is twice the area of the triangle abc, positive if c is left of ab.
func side(a, b, c r2.Vec) float64 { return cross(r2.Sub(b, a), r2.Sub(c, a)) }
