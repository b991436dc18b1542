package fem

import (
	"math"

	"notchproof/mesh"
)

// An assembler makes element matrices and element forces. One assembler serves
// one goroutine.
//
// All models come down to nine integrals for a pair of nodes i, j,
//
//	G_kl = ∫ (operator k of φ_i) (operator l of φ_j) dV,   k, l ∈ {∂x, ∂y, 1/y},
//
// from which the block of the element matrix follows as
//
//	K_ab = Σ_kl G_kl Σ_cd Strain[c][a][k] Elasticity[c][d] Strain[d][b][l].
//
// The inner sum is constant and found once, so that the number of stress
// components never enters the loop over cubature points.
type assembler struct {
	shape    *mesh.Curved
	tables   tables
	unknowns int
	revolved bool
	kin      Kinematics
	elastic  Elasticity
	coupling [3][3][strainOperators * strainOperators]float64

	weight     []float64 // cubature weight × Jacobian × radius, by point
	gx, gy, g0 []float64 // operators of the basis, node by node
	wx, wy, w0 []float64 // the same times the weight
	radius     []float64
	j11, j12   []float64 // inverse Jacobian by point: ∂ξ/∂x, ∂ξ/∂y
	j21, j22   []float64 // ∂η/∂x, ∂η/∂y
	local      []float64
}

func newAssembler(shape *mesh.Curved, model Model, mat Material, t tables) *assembler {
	a := &assembler{
		shape: shape, tables: t,
		unknowns: model.Unknowns(), revolved: model.Revolved(),
		kin: model.Kinematics(), elastic: model.Elasticity(mat),
	}
	a.coupling = coupling(&a.kin, &a.elastic, a.unknowns)
	nq := max(t.straight.points, t.bent.points)
	size := shape.Element.Count * nq
	buffer := make([]float64, 6*size+6*nq+shape.Element.Count*a.unknowns)
	cut := func(n int) []float64 {
		s := buffer[:n:n]
		buffer = buffer[n:]
		return s
	}
	a.gx, a.gy, a.g0 = cut(size), cut(size), cut(size)
	a.wx, a.wy, a.w0 = cut(size), cut(size), cut(size)
	a.weight, a.radius = cut(nq), cut(nq)
	a.j11, a.j12, a.j21, a.j22 = cut(nq), cut(nq), cut(nq), cut(nq)
	a.local = cut(shape.Element.Count * a.unknowns)
	return a
}

func coupling(kin *Kinematics, d *Elasticity, unknowns int) (m [3][3][9]float64) {
	for a := range unknowns {
		for b := range unknowns {
			for k := range strainOperators {
				for l := range strainOperators {
					sum := 0.0
					for c := range components {
						for e := range components {
							sum += kin.Strain[c][a][k] * d[c][e] * kin.Strain[e][b][l]
						}
					}
					m[a][b][k*strainOperators+l] = sum
				}
			}
		}
	}
	return m
}

// operators fills gx, gy, g0 and the weights for one triangle and returns the
// table used.
func (a *assembler) operators(tri int) *table {
	shape := a.shape
	n := shape.Element.Count
	nodes := shape.Triangle(tri)
	t := a.tables.bent
	straight := shape.Straight[tri]
	if straight {
		t = a.tables.straight
	}
	nq := t.points
	a.jacobians(t, nodes, straight)
	if a.revolved {
		a.radii(t, nodes)
		for q := range nq {
			a.weight[q] *= a.radius[q]
			a.radius[q] = 1 / a.radius[q]
		}
	}
	j11, j12, j21, j22 := a.j11[:nq], a.j12[:nq], a.j21[:nq], a.j22[:nq]
	inv := a.radius[:nq]
	for i := range n {
		dxi, de, phi := t.dxi[i*nq:][:nq], t.de[i*nq:][:nq], t.phi[i*nq:][:nq]
		gx, gy, g0 := a.gx[i*nq:][:nq], a.gy[i*nq:][:nq], a.g0[i*nq:][:nq]
		for q := range gx {
			gx[q] = float64(j11[q]*dxi[q]) + float64(j21[q]*de[q])
			gy[q] = float64(j12[q]*dxi[q]) + float64(j22[q]*de[q])
		}
		if a.revolved {
			for q := range g0 {
				g0[q] = phi[q] * inv[q]
			}
		}
	}
	return t
}

// jacobians fills the inverse Jacobian and the weights at the points of t.
func (a *assembler) jacobians(t *table, nodes []int32, straight bool) {
	nq := t.points
	if straight {
		p0, p1, p2 := a.shape.Nodes[nodes[0]], a.shape.Nodes[nodes[1]], a.shape.Nodes[nodes[2]]
		xa, ya, xb, yb := p1.X-p0.X, p1.Y-p0.Y, p2.X-p0.X, p2.Y-p0.Y
		det := float64(xa*yb) - float64(xb*ya)
		for q := range nq {
			a.weight[q] = t.weights[q] * det
			a.j11[q], a.j12[q], a.j21[q], a.j22[q] = yb/det, -xb/det, -ya/det, xa/det
		}
		return
	}
	xa, ya, xb, yb := a.j11[:nq], a.j12[:nq], a.j21[:nq], a.j22[:nq]
	clear(xa)
	clear(ya)
	clear(xb)
	clear(yb)
	for i, node := range nodes {
		p := a.shape.Nodes[node]
		dxi, de := t.dxi[i*nq:][:nq], t.de[i*nq:][:nq]
		for q := range xa {
			xa[q] += float64(dxi[q] * p.X)
			ya[q] += float64(dxi[q] * p.Y)
			xb[q] += float64(de[q] * p.X)
			yb[q] += float64(de[q] * p.Y)
		}
	}
	for q := range xa {
		det := float64(xa[q]*yb[q]) - float64(xb[q]*ya[q])
		a.weight[q] = t.weights[q] * det
		xa[q], ya[q], xb[q], yb[q] = yb[q]/det, -xb[q]/det, -ya[q]/det, xa[q]/det
	}
}

// radii fills the radius at the points of t.
func (a *assembler) radii(t *table, nodes []int32) {
	nq := t.points
	radius := a.radius[:nq]
	clear(radius)
	for i, node := range nodes {
		y := a.shape.Nodes[node].Y
		phi := t.phi[i*nq:][:nq]
		for q := range radius {
			radius[q] += float64(phi[q] * y)
		}
	}
}

// stiffness writes the lower triangle of the element matrix of a triangle,
// row-major, unknowns running within nodes.
func (a *assembler) stiffness(tri int, k []float64) {
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

// addForces adds the forces that the displacements x (all unknowns, node by
// node) exert on the nodes of one triangle, by way of the stresses and without
// the element matrix: what is left of them at a free node is the residual, at a
// supported node the reaction.
func (a *assembler) addForces(tri int, x, forces []float64) {
	t := a.operators(tri)
	n, nq, u := a.shape.Element.Count, t.points, a.unknowns
	nodes := a.shape.Triangle(tri)
	for q := range nq {
		var grad [3][strainOperators]float64
		for i := range n {
			at := i*nq + q
			for c := range u {
				v := x[int(nodes[i])*u+c]
				grad[c][alongX] += float64(a.gx[at] * v)
				grad[c][alongY] += float64(a.gy[at] * v)
				grad[c][overY] += float64(a.g0[at] * v)
			}
		}
		flux := a.flux(&grad)
		w := a.weight[q]
		for i := range n {
			at := i*nq + q
			for c := range u {
				f := &flux[c]
				forces[int(nodes[i])*u+c] += w * (float64(f[0]*a.gx[at]) + float64(f[1]*a.gy[at]) + float64(f[2]*a.g0[at]))
			}
		}
	}
}

// flux turns operators of the unknowns into what they do work with: the
// stresses, each sent back through the strain that it belongs to.
func (a *assembler) flux(grad *[3][strainOperators]float64) (f [3][strainOperators]float64) {
	stress := a.elastic.times(a.kin.strains(grad, a.unknowns))
	for c := range components {
		for u := range a.unknowns {
			for k := range strainOperators {
				f[u][k] += float64(a.kin.Strain[c][u][k] * stress[c])
			}
		}
	}
	return f
}

// strains evaluates the strains from the operators of the unknowns.
func (k *Kinematics) strains(grad *[3][strainOperators]float64, unknowns int) (e [components]float64) {
	for c := range components {
		for u := range unknowns {
			for o := range strainOperators {
				e[c] += float64(k.Strain[c][u][o] * grad[u][o])
			}
		}
	}
	return e
}

func (d *Elasticity) times(e [components]float64) (s [components]float64) {
	for i := range components {
		for j := range components {
			s[i] += float64(d[i][j] * e[j])
		}
	}
	return s
}

func norm(v []float64) float64 {
	sum := 0.0
	for _, x := range v {
		sum += x * x
	}
	return math.Sqrt(sum)
}
