package outline

import (
	"math"

	"gonum.org/v1/gonum/spatial/r2"
)

// Contains tells whether p lies in the material of a valid region. Within
// rounding of the boundary either answer may come.
func (r *Region) Contains(p r2.Vec) bool {
	if winding(r.Outer.pieces(0, 0), p) == 0 {
		return false
	}
	for _, h := range r.Holes {
		if winding(h.pieces(0, 0), p) != 0 {
			return false
		}
	}
	return true
}

// winding counts how often a loop goes round p counter-clockwise: the angle
// under which its pieces pass by, over a full turn.
func winding(ps []piece, p r2.Vec) int {
	sum := 0.0
	for i := range ps {
		sum += ps[i].angleFrom(p, 60)
	}
	return int(math.Round(sum / (2 * math.Pi)))
}

// angleFrom is the angle by which the direction from q to a point of the piece
// turns while the point runs along it. From outside the strip around the chord
// that is the angle of the chord, because the two can be drawn into each other
// without touching q; from inside, halve.
func (p *piece) angleFrom(q r2.Vec, depth int) float64 {
	a, b := r2.Sub(p.a, q), r2.Sub(p.b, q)
	l := Line{p.a, p.b}
	if depth == 0 || p.h == 0 || r2.Norm(r2.Sub(l.At(l.Nearest(q)), q)) > p.h {
		return math.Atan2(cross(a, b), dot(a, b))
	}
	l0, l1 := p.halve()
	return l0.angleFrom(q, depth-1) + l1.angleFrom(q, depth-1)
}
