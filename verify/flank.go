package verify

import (
	"math"

	"gonum.org/v1/gonum/spatial/r2"

	"notchproof/fem"
	"notchproof/mesh/outline"
	"notchproof/verify/specimen"
)

// A flank is a free side of a corner, on which the stress is read at a distance
// from it.
type flank struct {
	solution *fem.Solution
	corner   r2.Vec
	edges    []int // outwards
	outward  bool  // the boundary runs away from the corner
}

// flanks gives the free sides of a corner; on the line of symmetry of a half
// model it has but one.
func flanks(p *specimen.Part, s *fem.Solution, c outline.Corner) []flank {
	var list []flank
	for _, side := range []int{c.Before, c.After} {
		curve := p.Region.Sides()[side].Curve
		if p.Half && curve.At(0).Y == 0 && curve.At(1).Y == 0 {
			continue
		}
		f := flank{solution: s, corner: c.At, outward: side == c.After}
		for i, e := range s.Problem.Shape.Mesh.Boundary {
			if int(e.Side) == side {
				f.edges = append(f.edges, i)
			}
		}
		if !f.outward {
			for i, j := 0, len(f.edges)-1; i < j; i, j = i+1, j-1 {
				f.edges[i], f.edges[j] = f.edges[j], f.edges[i]
			}
		}
		list = append(list, f)
	}
	return list
}

// at reads the flank at a distance from the corner.
func (f flank) at(distance float64) fem.SurfacePoint {
	gap := func(edge int, s float64) float64 {
		if !f.outward {
			s = 1 - s
		}
		return r2.Norm(r2.Sub(f.solution.Surface(edge, s).At, f.corner))
	}
	edge := 0
	for edge < len(f.edges)-1 && gap(f.edges[edge], 1) < distance {
		edge++
	}
	lo, hi := 0.0, 1.0
	for range 50 {
		if mid := (lo + hi) / 2; gap(f.edges[edge], mid) < distance {
			lo = mid
		} else {
			hi = mid
		}
	}
	s := (lo + hi) / 2
	if !f.outward {
		s = 1 - s
	}
	return f.solution.Surface(f.edges[edge], s)
}

// stress is what grows: the stress along the flank, in torsion the shear. The
// shear is counted along the boundary, that is inwards on one flank and outwards
// on the other.
func stress(l *specimen.Load, p fem.SurfacePoint) float64 {
	if l.Shear {
		return p.Shear
	}
	return p.Tangential
}

// places is the number of places at which each flank is read.
const cornerPlaces = 25

// read fits the growth to what the flanks show; what a solution of an order less
// has shown before tells its error. The sum of both flanks holds the
// symmetric solutions of the wedge alone (in torsion the antisymmetric ones,
// counted along the boundary), the difference the others. Differences from
// one place to the next drop a constant, such as the stress that the strain
// around a shaft puts into its flanks.
func (c *Corner) read(list []flank, l *specimen.Load) {
	if c.To == 0 {
		return // no room
	}
	ratio := math.Pow(c.To/c.From, 1/float64(cornerPlaces-1))
	var sum, difference []float64
	for i := range cornerPlaces {
		r := c.From * math.Pow(ratio, float64(i))
		first := stress(l, list[0].at(r))
		second := first
		if len(list) == 2 {
			second = stress(l, list[1].at(r))
		}
		sum = append(sum, (first+second)/2)
		difference = append(difference, (first-second)/2)
	}
	// What symmetry rules out is there as an error of the solution; the stronger
	// part at the nearest place is what can be measured.
	values, mode := sum, c.Mode
	if len(list) == 2 {
		mode = bothFlanks(l)
	}
	if math.Abs(sum[0]) < math.Abs(difference[0]) {
		values, mode = difference, mode.other()
	}
	before := c.Measured
	c.Measured, c.Uncertainty = growth(ratio, values)
	if !math.IsNaN(before) {
		c.Uncertainty += math.Abs(c.Measured - before)
	}
	c.Mode, c.Wedge = mode, mode.exponent(c.Degrees)
}

// vague is the uncertainty of an exponent from which on it says nothing.
const vague = 0.1

// settle drops an exponent that was not found.
func (c *Corner) settle() {
	if !(c.Uncertainty < vague) {
		c.Measured, c.Uncertainty = math.NaN(), math.Inf(1)
	}
}

// growth is the exponent of values at distances that grow by a fixed ratio. It
// is fitted to the differences over the inner third of the places; how far the
// fits over the other thirds are off, and how far the differences scatter about
// the fits, are its uncertainty.
func growth(ratio float64, values []float64) (exponent, uncertainty float64) {
	const parts = 3
	n := (len(values) - 1) / parts
	spread := 0.0
	for k := range parts {
		fit, scatter := slope(ratio, values[k*n:(k+1)*n+1])
		if k == 0 {
			exponent = fit
		}
		spread = math.Max(spread, math.Abs(fit-exponent)+2*scatter)
	}
	return exponent, spread
}

// slope fits a line to the logarithms of the differences of values; scatter is
// the standard error of its slope.
func slope(ratio float64, values []float64) (slope, scatter float64) {
	var xs, ys []float64
	for i := 1; i < len(values); i++ {
		d := math.Abs(values[i] - values[i-1])
		if d == 0 {
			return math.NaN(), math.Inf(1)
		}
		xs, ys = append(xs, float64(i)*math.Log(ratio)), append(ys, math.Log(d))
	}
	return fitLine(xs, ys)
}
