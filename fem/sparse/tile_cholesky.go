package sparse

import "math"

// factorTile replaces the lower triangle of c with its Cholesky factor, of
// which only the leading n rows and columns count. The factor's diagonal is
// stored inverted, so that solving multiplies. The columns beyond n get zeros,
// which makes solving with them harmless.
func factorTile(c *tile, n int, diagonal []float64, first int32, j *judge) {
	for k := range n {
		d := c[5*k]
		for m := range k {
			d -= float64(c[4*m+k] * c[4*m+k])
		}
		d = j.accept(d, diagonal[k], first+int32(k))
		inverse := 1 / math.Sqrt(d)
		c[5*k] = inverse
		for i := k + 1; i < n; i++ {
			s := c[4*k+i]
			for m := range k {
				s -= float64(c[4*m+i] * c[4*m+k])
			}
			c[4*k+i] = float64(s * inverse)
		}
	}
	for k := n; k < edge; k++ {
		for i := range edge {
			c[4*k+i] = 0
			c[4*i+k] = 0
		}
	}
}

// solveTile replaces c with c·l⁻ᵀ for a tile l that factorTile has left.
func solveTile(c, l *tile) {
	l10, l20, l30, l21, l31, l32 := l[1], l[2], l[3], l[6], l[7], l[11]
	d0, d1, d2, d3 := l[0], l[5], l[10], l[15]
	for i := range edge {
		x0 := float64(c[i&3] * d0)
		x1 := float64((c[i&3+4] - float64(x0*l10)) * d1)
		x2 := float64((c[i&3+8] - float64(x0*l20) - float64(x1*l21)) * d2)
		x3 := float64((c[i&3+12] - float64(x0*l30) - float64(x1*l31) - float64(x2*l32)) * d3)
		c[i&3], c[i&3+4], c[i&3+8], c[i&3+12] = x0, x1, x2, x3
	}
}
