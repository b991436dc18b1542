package verify

import (
	"math"

	"gonum.org/v1/gonum/stat"
)

// fitLine gives the slope of the least-squares line through points and its
// standard error.
func fitLine(xs, ys []float64) (slope, standardError float64) {
	offset, slope := stat.LinearRegression(xs, ys, nil, false)
	mean := stat.Mean(xs, nil)
	left, spread := 0.0, 0.0
	for i, x := range xs {
		miss := ys[i] - offset - slope*x
		left += float64(miss * miss)
		spread += float64((x - mean) * (x - mean))
	}
	return slope, math.Sqrt(left / float64(len(xs)-2) / spread)
}
