package chart

import (
	"math"

	"gonum.org/v1/gonum/interp"
)

// smoothness is the number of straight pieces between two points of a curve.
const smoothness = 16

// Smooth gives the curve for the eye: a monotone cubic (F. N. Fritsch, J.
// Butland, SIAM J. Sci. Stat. Comput. 5 (1984) 300) through the settled points,
// in pieces where others lie between them. A point alone makes no piece.
func (t *Table) Smooth(k int) (pieces [][]Point) {
	var run []Point
	for _, p := range t.Curve(k) {
		if p.Status == Settled {
			run = append(run, p)
			continue
		}
		pieces, run = t.piece(pieces, run), nil
	}
	return t.piece(pieces, run)
}

func (t *Table) piece(pieces [][]Point, run []Point) [][]Point {
	if len(run) < 2 {
		return pieces
	}
	if len(run) == 2 {
		return append(pieces, run)
	}
	place := func(x float64) float64 {
		if t.Question.Along.Log {
			return math.Log(x)
		}
		return x
	}
	xs, ks := make([]float64, len(run)), make([]float64, len(run))
	for i, p := range run {
		xs[i], ks[i] = place(p.X), p.Factor
	}
	var cubic interp.FritschButland
	if cubic.Fit(xs, ks) != nil {
		return append(pieces, run)
	}
	var line []Point
	for i := 1; i < len(run); i++ {
		for s := range smoothness {
			x := between(run[i-1].X, run[i].X, float64(s)/smoothness, t.Question.Along.Log)
			line = append(line, Point{X: x, Y: run[i].Y, Factor: cubic.Predict(place(x))})
		}
	}
	return append(pieces, append(line, run[len(run)-1]))
}
