package main

import (
	"math"

	"gonum.org/v1/gonum/integrate/quad"
)

// moments are the conditions on a rule of one degree: the orthonormal
// invariant polynomials φ_k, φ_0 = 1, must have the sums 1, 0, 0, … In that
// basis the residuals are comparable and the equations well conditioned.
type moments struct {
	powers [][2]int
	top    [2]int      // highest exponents of u and v
	coef   [][]float64 // φ_k = Σ_j coef[k][j] T_i(2u−1) T_j(2v−1), triangular
}

func newMoments(degree int) *moments {
	m := &moments{powers: exponents(degree)}
	for _, p := range m.powers {
		m.top[0], m.top[1] = max(m.top[0], p[0]), max(m.top[1], p[1])
	}
	// Gram-Schmidt, twice for full orthogonality, on the values at the points of
	// a product rule that is exact for the products.
	x, w := make([]float64, degree+1), make([]float64, degree+1)
	quad.Legendre{}.FixedLocations(x, w, 0, 1)
	n := len(m.powers)
	values := make([][]float64, n)
	raw := make([][3]float64, n)
	var weights []float64
	for j, y := range x {
		for i := range x {
			m.raw(orbit{a: x[i] * (1 - y), b: y}, raw)
			for k := range n {
				values[k] = append(values[k], raw[k][0])
			}
			weights = append(weights, 2*w[i]*w[j]*(1-y))
		}
	}
	for k := range n {
		row := make([]float64, n)
		row[k] = 1
		for range 2 {
			for j := range k {
				var dot float64
				for q, w := range weights {
					dot += w * values[k][q] * values[j][q]
				}
				for q := range values[k] {
					values[k][q] -= dot * values[j][q]
				}
				for i := range row {
					row[i] -= dot * m.coef[j][i]
				}
			}
		}
		var norm float64
		for q, w := range weights {
			norm += w * values[k][q] * values[k][q]
		}
		norm = 1 / math.Sqrt(norm)
		for q := range values[k] {
			values[k][q] *= norm
		}
		for i := range row {
			row[i] *= norm
		}
		m.coef = append(m.coef, row)
	}
	return m
}

// raw evaluates the products of Chebyshev polynomials at a point, with their
// derivatives with respect to a and b.
func (m *moments) raw(o orbit, out [][3]float64) {
	u, v, ua, ub, va, vb := o.invariants()
	var tu, du, tv, dv [32]float64
	chebyshev(2*u-1, tu[:m.top[0]+1], du[:])
	chebyshev(2*v-1, tv[:m.top[1]+1], dv[:])
	for k, p := range m.powers {
		i, j := p[0], p[1]
		fu, fv := 2*du[i]*tv[j], 2*tu[i]*dv[j]
		out[k] = [3]float64{tu[i] * tv[j], fu*ua + fv*va, fu*ub + fv*vb}
	}
}

func chebyshev(x float64, t, d []float64) {
	t[0], d[0] = 1, 0
	if len(t) > 1 {
		t[1], d[1] = x, 1
	}
	for n := 2; n < len(t); n++ {
		t[n] = 2*x*t[n-1] - t[n-2]
		d[n] = 2*t[n-1] + 2*x*d[n-1] - d[n-2]
	}
}

// at evaluates the φ_k and their derivatives with respect to a and b.
func (m *moments) at(o orbit, raw, out [][3]float64) {
	m.raw(o, raw)
	for k, row := range m.coef {
		var f [3]float64
		for j, c := range row[:k+1] {
			f[0] += c * raw[j][0]
			f[1] += c * raw[j][1]
			f[2] += c * raw[j][2]
		}
		out[k] = f
	}
}
