package lagrange

import "math"

// interpolation returns the coefficients of the Lagrange basis at the nodes:
// row n expands the function that is 1 at node n in the modes. It is the
// transposed inverse of the Vandermonde matrix V[k][m] = ψ_m(node k), taken in
// the orthonormal modes, where its condition number is of the order of the
// Lebesgue constant times the number of nodes.
func (m modal) interpolation(nodes [][2]float64) []float64 {
	n := len(nodes)
	norms := m.norms()
	v := make([]float64, n*n)
	var psi [MaxCount]float64
	for k, x := range nodes {
		m.values(x[0], x[1], &psi)
		for j := range n {
			v[j*n+k] = psi[j] * norms[j]
		}
	}
	invert(v, n)
	for k := range n {
		for j := range n {
			v[k*n+j] *= norms[j]
		}
	}
	return v
}

// invert replaces the n×n row-major matrix a by its inverse: Gauss-Jordan
// elimination in place, with the largest pivot of each column. The matrices of
// this package are regular by construction; their order of summation is fixed.
func invert(a []float64, n int) {
	row := func(i int) []float64 { return a[i*n : i*n+n] }
	pivots := make([]int, n)
	for k := range n {
		p := k
		for i := k + 1; i < n; i++ {
			if math.Abs(a[i*n+k]) > math.Abs(a[p*n+k]) {
				p = i
			}
		}
		pivots[k] = p
		pivot := row(k)
		if p != k {
			for j, other := range row(p) {
				a[p*n+j], pivot[j] = pivot[j], other
			}
		}
		d := 1 / pivot[k]
		pivot[k] = 1
		for j := range pivot {
			pivot[j] *= d
		}
		for i := range n {
			if i == k {
				continue
			}
			target := row(i)[:len(pivot)]
			f := target[k]
			target[k] = 0
			if f == 0 {
				continue
			}
			for j, v := range pivot {
				target[j] -= float64(f * v)
			}
		}
	}
	// Exchanged rows come back as exchanged columns, last exchange first.
	for k := n - 1; k >= 0; k-- {
		if p := pivots[k]; p != k {
			for i := range n {
				a[i*n+k], a[i*n+p] = a[i*n+p], a[i*n+k]
			}
		}
	}
}
