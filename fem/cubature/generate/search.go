package main

import (
	"math"
	"math/rand/v2"
)

// A system is the moment equations of one structure in unknowns that cannot
// leave the triangle or make a weight negative: a weight is e^y, a point on a
// median has a = 1/(2(1+e^−y)), a general point the coordinates e^y : e^z : 1.
type system struct {
	moments *moments
	shape   structure
	m, n    int // equations, unknowns

	residual []float64
	jacobian []float64 // m × n
	raw, phi [][3]float64
}

func newSystem(degree int, shape structure) *system {
	s := &system{moments: newMoments(degree), shape: shape, n: shape.unknowns()}
	s.m = len(s.moments.powers)
	s.residual = make([]float64, s.m)
	s.jacobian = make([]float64, s.m*s.n)
	s.raw, s.phi = make([][3]float64, s.m), make([][3]float64, s.m)
	return s
}

// start draws a first guess. Good nodes spread like a multivariate arcsine law,
// which is even on the octant of a sphere x with λ_k = x_k²; so each orbit is
// the best of some candidates there, the one farthest from all others. An even
// share of the sphere is an area of the triangle in proportion to x_0 x_1 x_2,
// and that is the weight.
func (s *system) start(seed uint64) []float64 {
	rng := rand.New(rand.NewPCG(seed, 20))
	var taken [][3]float64
	place := func(median bool) [3]float64 {
		var best [3]float64
		far := -1.0
		for range 8 {
			x := octant(rng, median)
			if d := nearest(x, taken, median); d > far {
				best, far = x, d
			}
		}
		taken = append(taken, images(best)...)
		return best
	}
	var medians, generals [][3]float64
	if s.shape.centroid > 0 {
		taken = append(taken, [3]float64{math.Sqrt(1. / 3), math.Sqrt(1. / 3), math.Sqrt(1. / 3)})
	}
	for _, i := range rng.Perm(s.shape.median + s.shape.general) {
		if i < s.shape.median {
			medians = append(medians, place(true))
		} else {
			generals = append(generals, place(false))
		}
	}
	size := func(x [3]float64) float64 { return x[0] * x[1] * x[2] }
	total := float64(s.shape.centroid) * math.Pow(3, -1.5)
	for _, x := range medians {
		total += 3 * size(x)
	}
	for _, x := range generals {
		total += 6 * size(x)
	}
	weight := func(share float64) float64 { return math.Log(share/total) + 0.1*rng.NormFloat64() }
	var y []float64
	for range s.shape.centroid {
		y = append(y, weight(math.Pow(3, -1.5)))
	}
	for _, x := range medians {
		a := 2 * x[0] * x[0]
		y = append(y, weight(size(x)), math.Log(a/(1-a)))
	}
	for _, x := range generals {
		y = append(y, weight(size(x)), 2*math.Log(x[0]/x[2]), 2*math.Log(x[1]/x[2]))
	}
	return y
}

// octant draws a point of the sphere's positive octant, a little off its edges;
// on a median the first two coordinates are equal.
func octant(rng *rand.Rand, median bool) [3]float64 {
	for {
		x := [3]float64{math.Abs(rng.NormFloat64()), math.Abs(rng.NormFloat64()), math.Abs(rng.NormFloat64())}
		if median {
			u := math.Pi / 2 * rng.Float64()
			x = [3]float64{math.Sin(u) * math.Sqrt2 / 2, math.Sin(u) * math.Sqrt2 / 2, math.Cos(u)}
		}
		n := math.Sqrt(x[0]*x[0] + x[1]*x[1] + x[2]*x[2])
		for k := range x {
			x[k] /= n
		}
		if min(x[0], x[1], x[2]) > 0.05 {
			return x
		}
	}
}

func images(x [3]float64) [][3]float64 {
	a, b, c := x[0], x[1], x[2]
	return [][3]float64{{a, b, c}, {b, c, a}, {c, a, b}, {b, a, c}, {a, c, b}, {c, b, a}}
}

// nearest gives the distance of a point from those taken, and from its own
// images unless they are one with it.
func nearest(x [3]float64, taken [][3]float64, median bool) float64 {
	least := math.Inf(1)
	others := images(x)[1:]
	if median {
		others = others[:2]
	}
	for _, list := range [][][3]float64{taken, others} {
		for _, y := range list {
			dx, dy, dz := x[0]-y[0], x[1]-y[1], x[2]-y[2]
			least = min(least, dx*dx+dy*dy+dz*dz)
		}
	}
	return least
}

// orbits turns unknowns into orbits. Da and db are the derivatives of a and b
// with respect to the orbit's one or two unknowns of position.
func (s *system) orbits(y []float64) (list []orbit, da, db [][2]float64) {
	add := func(o orbit, a, b [2]float64) {
		list, da, db = append(list, o), append(da, a), append(db, b)
	}
	for range s.shape.centroid {
		add(orbit{1, math.Exp(y[0]), 1. / 3, 1. / 3}, [2]float64{}, [2]float64{})
		y = y[1:]
	}
	for range s.shape.median {
		h := 1 / (1 + math.Exp(-y[1]))
		d := [2]float64{h * (1 - h) / 2}
		add(orbit{3, math.Exp(y[0]), h / 2, h / 2}, d, d)
		y = y[2:]
	}
	for range s.shape.general {
		p, q := math.Exp(y[1]), math.Exp(y[2])
		a, b := p/(1+p+q), q/(1+p+q)
		add(orbit{6, math.Exp(y[0]), a, b}, [2]float64{a * (1 - a), -a * b}, [2]float64{-a * b, b * (1 - b)})
		y = y[3:]
	}
	return list, da, db
}

// evaluate sets residual and jacobian, and returns the squared residual.
func (s *system) evaluate(y []float64) float64 {
	clear(s.residual)
	s.residual[0] = -1
	list, da, db := s.orbits(y)
	col := 0
	for i, o := range list {
		s.moments.at(o, s.raw, s.phi)
		f := float64(o.size) * o.w
		positions := map[int]int{1: 0, 3: 1, 6: 2}[o.size]
		for k, p := range s.phi {
			s.residual[k] += f * p[0]
			row := s.jacobian[k*s.n+col:]
			row[0] = f * p[0]
			for j := range positions {
				row[1+j] = f * (p[1]*da[i][j] + p[2]*db[i][j])
			}
		}
		col += 1 + positions
	}
	var sum float64
	for _, r := range s.residual {
		sum += r * r
	}
	return sum
}

// solve runs Levenberg's and Marquardt's method from a start and reports
// whether the moments vanish to rounding. (Marquardt, J. SIAM 11 (1963)
// 431-441, cited from memory.)
func (s *system) solve(y []float64) ([]float64, bool) {
	const (
		steps = 300
		zero  = 1e-22 // squared residual; rounding leaves some 1e-25
	)
	damping := 1e-2
	current := s.evaluate(y)
	normal, gradient := make([]float64, s.n*s.n), make([]float64, s.n)
	trial, step, work := make([]float64, s.n), make([]float64, s.n), make([]float64, s.n*s.n)
	checked := current
	for it := range steps {
		if current < zero {
			return y, true
		}
		// A start that has not got far in thirty steps seldom ever does.
		if it%30 == 29 {
			if current > 0.2*checked && current > 1e-12 {
				return y, false
			}
			checked = current
		}
		s.normalEquations(normal, gradient)
		for {
			copy(work, normal)
			for i := range s.n {
				work[i*s.n+i] += damping * (1e-6 + normal[i*s.n+i])
			}
			if cholesky(work, gradient, step, s.n) {
				for i := range trial {
					trial[i] = y[i] - max(-1, min(1, step[i]))
				}
				if next := s.evaluate(trial); next < current {
					copy(y, trial)
					current = next
					damping = max(damping/5, 1e-15)
					break
				}
			}
			damping *= 4
			if damping > 1e8 {
				return y, current < zero
			}
		}
	}
	return y, current < zero
}

func (s *system) normalEquations(normal, gradient []float64) {
	clear(normal)
	clear(gradient)
	for k, r := range s.residual {
		row := s.jacobian[k*s.n:][:s.n]
		for i, p := range row {
			gradient[i] += p * r
			target := normal[i*s.n:][:i+1]
			for j, q := range row[:i+1] {
				target[j] += p * q
			}
		}
	}
}

// cholesky solves a x = b, a positive definite and given by its lower half,
// which is overwritten.
func cholesky(a, b, x []float64, n int) bool {
	for i := range n {
		for j := 0; j <= i; j++ {
			sum := a[i*n+j]
			for k := range j {
				sum -= a[i*n+k] * a[j*n+k]
			}
			if i > j {
				a[i*n+j] = sum / a[j*n+j]
			} else if !(sum > 0) {
				return false
			} else {
				a[i*n+i] = math.Sqrt(sum)
			}
		}
	}
	for i := range n {
		sum := b[i]
		for k := range i {
			sum -= a[i*n+k] * x[k]
		}
		x[i] = sum / a[i*n+i]
	}
	for i := n - 1; i >= 0; i-- {
		sum := x[i]
		for k := i + 1; k < n; k++ {
			sum -= a[k*n+i] * x[k]
		}
		x[i] = sum / a[i*n+i]
	}
	return true
}

// usable refuses solutions that have wandered to where a rule should not be:
// nearly on an edge, with a vanishing weight, or with two orbits in one place.
func usable(list []orbit) bool {
	for i, o := range list {
		if min(o.a, o.b, 1-o.a-o.b) < 1e-3 || o.w < 1e-5 {
			return false
		}
		for _, p := range list[:i] {
			u, v, _, _, _, _ := o.invariants()
			x, y, _, _, _, _ := p.invariants()
			if math.Hypot(u-x, v-y) < 1e-6 {
				return false
			}
		}
	}
	return true
}
