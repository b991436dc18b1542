package lagrange

// Bernstein returns the Count×Count row-major matrix that takes a polynomial's
// nodal values to its Bernstein coefficients: with
//
//	B_α = order!/(α0! α1! α2!) λ_0^α0 λ_1^α1 λ_2^α2,   α0 + α1 + α2 = order,
//
// row BernsteinIndex(order, α1, α2) gives the coefficient of B_α. The B_α are
// positive and sum to 1, so a polynomial lies between its least and its largest
// coefficient everywhere in the triangle, and a map inside the hull of its.
//
// It is computed once; the caller must not change it.
func (t *Triangle) Bernstein() []float64 {
	t.once.Do(func() {
		n := t.Count
		t.bernstein = make([]float64, n*n)
		for k, x := range t.Nodes {
			bernstein(t.Order, x[0], x[1], t.bernstein[k*n:][:n])
		}
		invert(t.bernstein, n)
	})
	return t.bernstein
}

// BernsteinIndex numbers the Bernstein polynomials of one order: those without
// λ_2 first, and within them those without λ_1 first.
func BernsteinIndex(order, a1, a2 int) int {
	return a2*(order+1) - a2*(a2-1)/2 + a1
}

// bernstein sets b to the values of the Bernstein polynomials of an order.
func bernstein(order int, xi, eta float64, b []float64) {
	var p0, p1, p2 [MaxOrder + 1]float64
	p0[0], p1[0], p2[0] = 1, 1, 1
	for i := range order {
		p0[i+1], p1[i+1], p2[i+1] = p0[i]*(1-xi-eta), p1[i]*xi, p2[i]*eta
	}
	k := 0
	across := 1.0 // order over a2
	for a2 := 0; a2 <= order; a2++ {
		along := across // order over (a0, a1, a2)
		for a1 := 0; a1 <= order-a2; a1++ {
			b[k] = along * p0[order-a1-a2] * p1[a1] * p2[a2]
			along = along * float64(order-a2-a1) / float64(a1+1)
			k++
		}
		across = across * float64(order-a2) / float64(a2+1)
	}
}
