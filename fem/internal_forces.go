package fem

import "math"

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
