package lagrange

import "math"

// modal evaluates the orthogonal polynomials of the triangle,
//
//	ψ_ij = Q_i(ξ, η) P_j^(2i+1,0)(2η−1),   i + j ≤ order,
//
// numbered by i, then j, where Q_i = (1−η)^i P_i((2ξ+η−1)/(1−η)) is a scaled
// Legendre polynomial and P^(α,β) a Jacobi polynomial. (Proriol, C. R. Acad.
// Sci. Paris 245 (1957) 2459; Koornwinder, in: Theory and Application of
// Special Functions (1975) 435; Dubiner, J. Sci. Comput. 6 (1991) 345;
// all cited from memory.)
//
// Every recurrence is in ξ and η themselves, without the quotient, so that the
// corner η = 1 is as good a point as any other.
type modal struct {
	order  int
	jacobi [][3]float64 // a, b, c of P_(j+1) = (a x + b) P_j − c P_(j−1), numbered as ψ_ij
}

func newModal(order int) modal {
	m := modal{order, make([][3]float64, 0, (order+1)*(order+2)/2)}
	for i := 0; i <= order; i++ {
		al := float64(2*i + 1)
		for j := 0; j <= order-i; j++ {
			// Szegő, Orthogonal Polynomials, eq. (4.5.1) (from memory), with β = 0;
			// TestModesAreOrthonormal holds it.
			n := float64(j)
			s := 2*n + al
			den := 2 * (n + 1) * (n + al + 1)
			m.jacobi = append(m.jacobi, [3]float64{
				(s + 1) * (s + 2) / den,
				al * al * (s + 1) / (den * s),
				2 * (n + al) * n * (s + 2) / (den * s),
			})
		}
	}
	return m
}

// norms gives the factors that make the ψ_ij orthonormal over the triangle:
// the integral of ψ_ij² is 1/(2 (2i+1) (i+j+1)).
func (m modal) norms() []float64 {
	norms := make([]float64, 0, len(m.jacobi))
	for i := 0; i <= m.order; i++ {
		for j := 0; j <= m.order-i; j++ {
			norms = append(norms, math.Sqrt(float64(2*(2*i+1)*(i+j+1))))
		}
	}
	return norms
}

// values sets psi to ψ_ij(ξ, η).
func (m modal) values(xi, eta float64, psi *[MaxCount]float64) {
	var (
		a, b = 2*xi + eta - 1, 1 - eta
		bb   = b * b
		x    = 2*eta - 1

		q, q1 = 1.0, 0.0 // Q_i, Q_(i−1)
		k     = 0
	)
	for i := 0; i <= m.order; i++ {
		p, p1 := q, 0.0 // Q_i P_j, Q_i P_(j−1)
		for j := 0; j <= m.order-i; j++ {
			psi[k] = p
			c := &m.jacobi[k]
			p, p1 = float64((float64(c[0]*x)+c[1])*p)-float64(c[2]*p1), p
			k++
		}
		f, g := float64(2*i+1)/float64(i+1), float64(i)/float64(i+1)
		q, q1 = float64(f*a*q)-float64(g*bb*q1), q
	}
}

// gradients sets psi as values does, and dx, de to the derivatives of ψ_ij
// with respect to ξ and η: the same recurrences, differentiated.
func (m modal) gradients(xi, eta float64, psi, dx, de *[MaxCount]float64) {
	var (
		a, b = 2*xi + eta - 1, 1 - eta
		bb   = b * b
		x    = 2*eta - 1

		q, q1   = 1.0, 0.0 // Q_i, Q_(i−1)
		qx, qx1 = 0.0, 0.0 // their derivatives with respect to ξ
		qe, qe1 = 0.0, 0.0 // and to η
		k       = 0
	)
	for i := 0; i <= m.order; i++ {
		p, p1 := q, 0.0
		px, px1 := qx, 0.0
		pe, pe1 := qe, 0.0
		for j := 0; j <= m.order-i; j++ {
			psi[k], dx[k], de[k] = p, px, pe
			c := &m.jacobi[k]
			l := float64(c[0]*x) + c[1]
			pe, pe1 = float64(l*pe)-float64(c[2]*pe1)+float64(2*c[0]*p), pe
			px, px1 = float64(l*px)-float64(c[2]*px1), px
			p, p1 = float64(l*p)-float64(c[2]*p1), p
			k++
		}
		f, g := float64(2*i+1)/float64(i+1), float64(i)/float64(i+1)
		qe, qe1 = float64(f*(float64(a*qe)+q))-float64(g*(float64(bb*qe1)-float64(2*b*q1))), qe
		qx, qx1 = float64(f*(float64(a*qx)+2*q))-float64(g*bb*qx1), qx
		q, q1 = float64(f*a*q)-float64(g*bb*q1), q
	}
}
