package fem

import (
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
	buffer := make([]float64, 6*size+6*nq)
	cut := func(n int) []float64 {
		s := buffer[:n:n]
		buffer = buffer[n:]
		return s
	}
	a.gx, a.gy, a.g0 = cut(size), cut(size), cut(size)
	a.wx, a.wy, a.w0 = cut(size), cut(size), cut(size)
	a.weight, a.radius = cut(nq), cut(nq)
	a.j11, a.j12, a.j21, a.j22 = cut(nq), cut(nq), cut(nq), cut(nq)
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
