package render

import (
	"sync"

	"gonum.org/v1/gonum/mat"

	"notchproof/mesh/lagrange"
)

// An expansion takes polynomials on the reference triangle from their values at
// an element's nodes to powers of
//
//	u = (3ξ − 1)/2,   v = (3η − 1)/2,
//
// which vanish at the triangle's middle and stay within [−1/2, 1]. Nested
// multiplication then gives a value with one product a coefficient, where the
// Lagrange basis takes one a node for each node. In these powers the nodes'
// matrix has a condition of 1e7 at order 8: the values are good to 1e-9, far
// below a level of grey.
type expansion struct {
	order int
	count int
	to    []float64 // count × count: row by coefficient, in the order of evaluation
}

// expansions are made once an order.
var expansions [lagrange.MaxOrder + 1]struct {
	once sync.Once
	made *expansion
}

func expansionOf(el *lagrange.Triangle) *expansion {
	e := &expansions[el.Order]
	e.once.Do(func() { e.made = newExpansion(el) })
	return e.made
}

func newExpansion(el *lagrange.Triangle) *expansion {
	n := el.Count
	powers := mat.NewDense(n, n, nil)
	for row, at := range el.Nodes {
		u, v := centred(at[0]), centred(at[1])
		k := 0
		for i := el.Order; i >= 0; i-- {
			for j := el.Order - i; j >= 0; j-- {
				powers.Set(row, k, power(u, i)*power(v, j))
				k++
			}
		}
	}
	var inverse mat.Dense
	if err := inverse.Inverse(powers); err != nil && inverse.IsEmpty() {
		panic("render: nodes of an element that determine no polynomial")
	}
	return &expansion{el.Order, n, inverse.RawMatrix().Data}
}

func centred(x float64) float64 { return 1.5*x - 0.5 }

func power(x float64, n int) float64 {
	p := 1.0
	for range n {
		p *= x
	}
	return p
}

// coefficients gives the powers' factors of four polynomials at once.
func (e *expansion) coefficients(nodal [][4]float64) [][4]float64 {
	out := make([][4]float64, e.count)
	for k := range out {
		var sum [4]float64
		for n, w := range e.to[k*e.count : (k+1)*e.count] {
			v := &nodal[n]
			sum[0] += w * v[0]
			sum[1] += w * v[1]
			sum[2] += w * v[2]
			sum[3] += w * v[3]
		}
		out[k] = sum
	}
	return out
}

// at evaluates four polynomials at a point of the reference triangle.
func (e *expansion) at(c [][4]float64, xi, eta float64) [4]float64 {
	u, v := centred(xi), centred(eta)
	var s0, s1, s2, s3 float64
	k := 0
	for width := 1; width <= e.order+1; width++ { // by falling powers of u
		row := c[k : k+width]
		k += width
		t := row[0]
		t0, t1, t2, t3 := t[0], t[1], t[2], t[3]
		for i := 1; i < len(row); i++ {
			a := &row[i]
			t0 = t0*v + a[0]
			t1 = t1*v + a[1]
			t2 = t2*v + a[2]
			t3 = t3*v + a[3]
		}
		s0 = s0*u + t0
		s1 = s1*u + t1
		s2 = s2*u + t2
		s3 = s3*u + t3
	}
	return [4]float64{s0, s1, s2, s3}
}
