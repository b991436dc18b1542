package fem

// On a straight triangle the Jacobian is constant, and the integrals of a pair
// of nodes are fixed sums of integrals over the reference triangle, tabulated
// once per order: with m, n the reference directions ξ, η and λ_c the
// barycentric coordinates,
//
//	plane    ∫ ∂_m φ_i ∂_n φ_j
//	revolved ∫ λ_c ∂_m φ_i ∂_n φ_j (the radius is Σ y_c λ_c), ∫ ∂_m φ_i φ_j
//
// (the radius cancels in the second kind). Only ∫ φ_i φ_j / y is left to
// cubature. Few triangles of a mesh are bent; all others take this way.
type affineTable struct {
	plane    [][4]float64    // by pair i ≥ j: ξξ, ξη, ηξ, ηη
	weighted [][3][4]float64 // the same by corner
	mixed    [][4]float64    // ∫∂_ξφ_i φ_j, ∫∂_ηφ_i φ_j, ∫∂_ξφ_j φ_i, ∫∂_ηφ_j φ_i
}

// newAffineTable integrates with a rule of degree 2p−1 or more, exact for all.
func newAffineTable(t *table, n int, revolved bool, points [][2]float64) *affineTable {
	pairs := n * (n + 1) / 2
	tab := &affineTable{}
	if revolved {
		tab.weighted, tab.mixed = make([][3][4]float64, pairs), make([][4]float64, pairs)
	} else {
		tab.plane = make([][4]float64, pairs)
	}
	nq := t.points
	pair := 0
	for i := range n {
		xi, ei, fi := t.dxi[i*nq:][:nq], t.de[i*nq:][:nq], t.phi[i*nq:][:nq]
		for j := 0; j <= i; j++ {
			xj, ej, fj := t.dxi[j*nq:][:nq], t.de[j*nq:][:nq], t.phi[j*nq:][:nq]
			for q, w := range t.weights {
				grads := [4]float64{xi[q] * xj[q], xi[q] * ej[q], ei[q] * xj[q], ei[q] * ej[q]}
				if !revolved {
					for m, g := range grads {
						tab.plane[pair][m] += float64(w * g)
					}
					continue
				}
				corner := [3]float64{1 - points[q][0] - points[q][1], points[q][0], points[q][1]}
				for c, l := range corner {
					for m, g := range grads {
						tab.weighted[pair][c][m] += float64(w * l * g)
					}
				}
				for m, g := range [4]float64{xi[q] * fj[q], ei[q] * fj[q], xj[q] * fi[q], ej[q] * fi[q]} {
					tab.mixed[pair][m] += float64(w * g)
				}
			}
			pair++
		}
	}
	return tab
}

// affineBlock turns the tabulated integrals of a pair into one entry of its
// block: coefficients for the gradient products, the two mixed kinds, and
// ∫ φ_i φ_j / y.
type affineBlock struct {
	grad        [4]float64
	left, right [2]float64
	mass        float64
}

// affineBlocks finds the coefficients of one straight triangle.
func (a *assembler) affineBlocks(j11, j12, j21, j22, det float64) (blocks [3][3]affineBlock) {
	j := [2][2]float64{{j11, j12}, {j21, j22}} // ∂(ξ, η)/∂(x, y)
	for c := range a.unknowns {
		for d := range a.unknowns {
			m := &a.coupling[c][d]
			b := &blocks[c][d]
			for s := range 2 {
				for t := range 2 {
					sum := 0.0
					for k := range 2 {
						for l := range 2 {
							sum += float64(m[k*strainOperators+l] * j[s][k] * j[t][l])
						}
					}
					b.grad[s*2+t] = det * sum
				}
				b.left[s] = det * (float64(m[overY]*j[s][0]) + float64(m[strainOperators+overY]*j[s][1]))
				b.right[s] = det * (float64(m[overY*strainOperators]*j[s][0]) + float64(m[overY*strainOperators+1]*j[s][1]))
			}
			b.mass = m[overY*strainOperators+overY]
		}
	}
	return blocks
}

// affineStiffness writes the lower triangle of the matrix of a straight triangle.
func (a *assembler) affineStiffness(tri int, k []float64) {
	t := a.tables.straight
	n, nq, u := a.shape.Element.Count, t.points, a.unknowns
	nodes := a.shape.Triangle(tri)
	a.jacobians(t, nodes, true)
	det := a.weight[0] / t.weights[0]
	blocks := a.affineBlocks(a.j11[0], a.j12[0], a.j21[0], a.j22[0], det)
	var y [3]float64
	if a.revolved {
		y = [3]float64{a.shape.Nodes[nodes[0]].Y, a.shape.Nodes[nodes[1]].Y, a.shape.Nodes[nodes[2]].Y}
		a.weighPhi(t, nodes)
	}
	ld := n * u
	pair := 0
	var mass [maxNodes]float64
	for i := range n {
		if a.revolved {
			productRow(mass[:i+1], a.w0[i*nq:][:nq], t.phi, nq)
		}
		for j := 0; j <= i; j++ {
			if a.revolved {
				w, mix := &a.tables.affine.weighted[pair], &a.tables.affine.mixed[pair]
				var g [4]float64
				for m := range g {
					g[m] = float64(y[0]*w[0][m]) + float64(y[1]*w[1][m]) + float64(y[2]*w[2][m])
				}
				for c := range u {
					row := k[(i*u+c)*ld+j*u:]
					for d := range u {
						b := &blocks[c][d]
						row[d] = float64(b.grad[0]*g[0]) + float64(b.grad[1]*g[1]) + float64(b.grad[2]*g[2]) + float64(b.grad[3]*g[3]) +
							float64(b.left[0]*mix[0]) + float64(b.left[1]*mix[1]) +
							float64(b.right[0]*mix[2]) + float64(b.right[1]*mix[3]) +
							float64(b.mass*mass[j])
					}
				}
			} else {
				g := &a.tables.affine.plane[pair]
				for c := range u {
					row := k[(i*u+c)*ld+j*u:]
					for d := range u {
						b := &blocks[c][d]
						row[d] = float64(b.grad[0]*g[0]) + float64(b.grad[1]*g[1]) + float64(b.grad[2]*g[2]) + float64(b.grad[3]*g[3])
					}
				}
			}
			pair++
		}
	}
}

// weighPhi fills w0 with the basis times weight over radius.
func (a *assembler) weighPhi(t *table, nodes []int32) {
	nq := t.points
	a.radii(t, nodes)
	weight, radius := a.weight[:nq], a.radius[:nq]
	for q := range weight {
		radius[q] = weight[q] / radius[q]
	}
	for i := range nodes {
		phi, w0 := t.phi[i*nq:][:nq], a.w0[i*nq:][:nq]
		for q := range w0 {
			w0[q] = phi[q] * radius[q]
		}
	}
}

// productRow fills out[j] with the product of left and row j of phi, four rows
// at a time.
func productRow(out, left, phi []float64, nq int) {
	j := 0
	for ; j+4 <= len(out); j += 4 {
		p0, p1, p2, p3 := phi[j*nq:][:nq], phi[(j+1)*nq:][:nq], phi[(j+2)*nq:][:nq], phi[(j+3)*nq:][:nq]
		var s0, s1, s2, s3 float64
		for q, l := range left[:nq] {
			s0 += float64(l * p0[q])
			s1 += float64(l * p1[q])
			s2 += float64(l * p2[q])
			s3 += float64(l * p3[q])
		}
		out[j], out[j+1], out[j+2], out[j+3] = s0, s1, s2, s3
	}
	for ; j < len(out); j++ {
		s := 0.0
		p := phi[j*nq:][:nq]
		for q, l := range left[:nq] {
			s += float64(l * p[q])
		}
		out[j] = s
	}
}
