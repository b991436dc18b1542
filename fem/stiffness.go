package fem

// stiffness writes the lower triangle of the element matrix of a triangle,
// row-major, unknowns running within nodes.
func (a *assembler) stiffness(tri int, k []float64) {
	if a.shape.Straight[tri] {
		a.affineStiffness(tri, k)
		return
	}
	a.bentStiffness(tri, k)
}

// bentStiffness does so by cubature, for any triangle.
func (a *assembler) bentStiffness(tri int, k []float64) {
	t := a.operators(tri)
	n, nq, u := a.shape.Element.Count, t.points, a.unknowns
	weight := a.weight[:nq]
	for i := range n {
		gx, gy, g0 := a.gx[i*nq:][:nq], a.gy[i*nq:][:nq], a.g0[i*nq:][:nq]
		wx, wy, w0 := a.wx[i*nq:][:nq], a.wy[i*nq:][:nq], a.w0[i*nq:][:nq]
		for q, w := range weight {
			wx[q], wy[q], w0[q] = w*gx[q], w*gy[q], w*g0[q]
		}
	}
	ld := n * u
	var g [strainOperators * strainOperators]float64
	for i := range n {
		wx, wy, w0 := a.wx[i*nq:][:nq], a.wy[i*nq:][:nq], a.w0[i*nq:][:nq]
		for j := 0; j <= i; j++ {
			gx, gy, g0 := a.gx[j*nq:][:nq], a.gy[j*nq:][:nq], a.g0[j*nq:][:nq]
			if a.revolved {
				products9(&g, wx, wy, w0, gx, gy, g0)
			} else {
				products4(&g, wx, wy, gx, gy)
			}
			for c := range u {
				row := k[(i*u+c)*ld+j*u:]
				for d := range u {
					m := &a.coupling[c][d]
					row[d] = float64(m[0]*g[0]) + float64(m[1]*g[1]) + float64(m[2]*g[2]) +
						float64(m[3]*g[3]) + float64(m[4]*g[4]) + float64(m[5]*g[5]) +
						float64(m[6]*g[6]) + float64(m[7]*g[7]) + float64(m[8]*g[8])
				}
			}
		}
	}
}

func products9(g *[9]float64, wx, wy, w0, gx, gy, g0 []float64) {
	n := len(wx)
	if len(wy) < n || len(w0) < n || len(gx) < n || len(gy) < n || len(g0) < n {
		panic("fem: operator rows of unequal length")
	}
	var s0, s1, s2, s3, s4, s5, s6, s7, s8 float64
	for q := range n {
		x, y, z := gx[q], gy[q], g0[q]
		w := wx[q]
		s0 += float64(w * x)
		s1 += float64(w * y)
		s2 += float64(w * z)
		w = wy[q]
		s3 += float64(w * x)
		s4 += float64(w * y)
		s5 += float64(w * z)
		w = w0[q]
		s6 += float64(w * x)
		s7 += float64(w * y)
		s8 += float64(w * z)
	}
	*g = [9]float64{s0, s1, s2, s3, s4, s5, s6, s7, s8}
}

func products4(g *[9]float64, wx, wy, gx, gy []float64) {
	n := len(wx)
	if len(wy) < n || len(gx) < n || len(gy) < n {
		panic("fem: operator rows of unequal length")
	}
	var s0, s1, s3, s4 float64
	for q := range n {
		x, y := gx[q], gy[q]
		w := wx[q]
		s0 += float64(w * x)
		s1 += float64(w * y)
		w = wy[q]
		s3 += float64(w * x)
		s4 += float64(w * y)
	}
	*g = [9]float64{s0, s1, 0, s3, s4}
}
