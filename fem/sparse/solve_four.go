package sparse

// fourSides treats four right-hand sides at once: a block is a tile with a
// side in each row.
var fourSides = kernels{
	width:              edge,
	subtractProduct:    func(c, a, b []float64) { subtractProduct((*tile)(c), a, b) },
	solve:              func(c, l []float64) { solveTile((*tile)(c), (*tile)(l)) },
	subtractTransposed: subtractTransposed,
	solveTransposed:    func(c, l []float64) { solveTileTransposed((*tile)(c), (*tile)(l)) },
}

// subtractTransposed sets each tile c of a row to c − x·l, where l is the
// corresponding tile of another row. Two sides at a time keep their part of x
// in registers.
func subtractTransposed(row, x, l []float64) {
	for h := 0; h < edge; h += 2 {
		y := (*tile)(x)
		x00, x01, x02, x03 := y[h&2], y[h&2+4], y[h&2+8], y[h&2+12]
		x10, x11, x12, x13 := y[h&2+1], y[h&2+5], y[h&2+9], y[h&2+13]
		r, m := row, l
		for len(r) >= edge && len(m) >= edge {
			c, b := (*[edge]float64)(r), (*[edge]float64)(m)
			c[h&2] -= float64(x00*b[0]) + float64(x01*b[1]) + (float64(x02*b[2]) + float64(x03*b[3]))
			c[h&2+1] -= float64(x10*b[0]) + float64(x11*b[1]) + (float64(x12*b[2]) + float64(x13*b[3]))
			r, m = r[edge:], m[edge:]
		}
	}
}

// solveTileTransposed replaces c with c·l⁻¹ for a tile l that factorTile has
// left.
func solveTileTransposed(c, l *tile) {
	l10, l20, l30, l21, l31, l32 := l[1], l[2], l[3], l[6], l[7], l[11]
	d0, d1, d2, d3 := l[0], l[5], l[10], l[15]
	for i := range edge {
		x3 := float64(c[i&3+12] * d3)
		x2 := float64((c[i&3+8] - float64(x3*l32)) * d2)
		x1 := float64((c[i&3+4] - float64(x3*l31) - float64(x2*l21)) * d1)
		x0 := float64((c[i&3] - float64(x3*l30) - float64(x2*l20) - float64(x1*l10)) * d0)
		c[i&3], c[i&3+4], c[i&3+8], c[i&3+12] = x0, x1, x2, x3
	}
}
