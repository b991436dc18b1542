package fem

import (
	"fmt"
	"math"
	"testing"

	"gonum.org/v1/gonum/mat"

	"notchproof/mesh"
)

// rigidMotions gives the motions without strain that a model holds.
func rigidMotions(m Model) map[string]field {
	one, none := constant(1), func([3]jet) jet { return jet{} }
	unit := func([3]jet) jet { return one }
	along := func(x [3]jet) jet { return x[0] }
	switch m.(type) {
	case Axisymmetric:
		return map[string]field{"shift along the axis": alongMeridian(unit, none)}
	case Torsion:
		return map[string]field{"turn about the axis": aroundAxis(unit)}
	case Bending:
		return map[string]field{
			"shift across the axis": bent(none, unit, none),
			"turn of the axis":      bent(func([3]jet) jet { return constant(-1) }, along, none),
		}
	}
	return map[string]field{
		"shift along x": func(x [3]jet) [3]jet { return [3]jet{one, {}} },
		"shift along y": func(x [3]jet) [3]jet { return [3]jet{{}, one} },
		"turn":          func(x [3]jet) [3]jet { return [3]jet{x[1].scaled(-1), x[0]} },
	}
}

// Rigid motions raise no forces, at any order and on curved triangles: the share
// of the forces that displacements of the same size can raise is rounding.
func TestRigidMotions(t *testing.T) {
	const rounding = 2e-12 // 9e-13 at order 8
	m := generate(t, domed(0), mesh.Sizing{Largest: 1})
	for _, model := range models {
		stretch := exact{model: model, mat: steel, u: wavy(model)}
		for order := 1; order <= 8; order++ {
			shape := m.Curve(order)
			p := &Problem{Shape: shape, Model: model, Material: steel}
			a := newAssembler(shape, model, steel, newTables(shape.Element, model.Revolved()))
			size := norm(p.internal(stretch.interpolate(shape), a)) / norm(stretch.interpolate(shape))
			for name, u := range rigidMotions(model) {
				e := exact{model: model, mat: steel, u: u}
				values := e.interpolate(shape)
				if share := norm(p.internal(values, a)) / norm(values) / size; !(share < rounding) {
					t.Errorf("%s, %s, order %d: forces %.2g of what a stretch raises", model.Name(), name, order, share)
				}
			}
		}
	}
}

// Element matrices have exactly as many zero eigenvalues as the model has rigid
// motions, none below zero and none near zero: no triangle, straight or bent,
// can deform without energy, so integration spends points enough. The matrix
// agrees with the forces found by way of the stresses.
func TestElementMatrix(t *testing.T) {
	const (
		zero = 1e-12 // of the largest eigenvalue: rounding
		gap  = 1e-7  // the least stiff deformation of a triangle of order 8 has 2e-6
	)
	m := generate(t, domed(0.7), mesh.Sizing{Largest: 1.2})
	for _, model := range models {
		for order := 1; order <= 8; order++ {
			shape := m.Curve(order)
			p := &Problem{Shape: shape, Model: model, Material: steel}
			a := newAssembler(shape, model, steel, newTables(shape.Element, model.Revolved()))
			for _, tri := range oneOfEach(shape) {
				where := fmt.Sprintf("%s, order %d, straight %t", model.Name(), order, shape.Straight[tri])
				n := shape.Element.Count * model.Unknowns()
				k := make([]float64, n*n)
				a.stiffness(tri, k)
				full := mat.NewSymDense(n, nil)
				for i := range n {
					for j := range i + 1 {
						full.SetSym(i, j, k[i*n+j])
					}
				}
				var eigen mat.EigenSym
				if !eigen.Factorize(full, false) {
					t.Fatalf("%s: eigenvalues not found", where)
				}
				values := eigen.Values(nil)
				rigid := len(rigidMotions(model))
				if top := values[n-1]; !(math.Abs(values[0]) < zero*top && values[rigid-1] < zero*top && values[rigid] > gap*top) {
					t.Errorf("%s: eigenvalues %.2g of the largest, want %d zeros", where, scaled(values[:rigid+2], 1/top), rigid)
				}
				p.compareForces(t, where, a, tri, full)
			}
		}
	}
}

// oneOfEach gives a straight and a bent triangle; at order 1 all are straight.
func oneOfEach(shape *mesh.Curved) (list []int) {
	for _, straight := range []bool{true, false} {
		for tri, s := range shape.Straight {
			if s == straight {
				list = append(list, tri)
				break
			}
		}
	}
	return list
}

func scaled(v []float64, k float64) []float64 {
	s := make([]float64, len(v))
	for i := range v {
		s[i] = k * v[i]
	}
	return s
}

// compareForces multiplies the matrix with unknowns that wobble from node to node
// and compares with the forces by way of the stresses.
func (p *Problem) compareForces(t *testing.T, where string, a *assembler, tri int, k *mat.SymDense) {
	t.Helper()
	u := p.Model.Unknowns()
	values := make([]float64, len(p.Shape.Nodes)*u)
	for i := range values {
		values[i] = math.Sin(float64(3*i + 1))
	}
	forces := make([]float64, len(values))
	a.addForces(tri, values, forces)
	n, _ := k.Dims()
	x, want := mat.NewVecDense(n, nil), mat.NewVecDense(n, nil)
	for i, node := range p.Shape.Triangle(tri) {
		for c := range u {
			x.SetVec(i*u+c, values[int(node)*u+c])
		}
	}
	want.MulVec(k, x)
	miss := 0.0
	for i, node := range p.Shape.Triangle(tri) {
		for c := range u {
			miss = max(miss, math.Abs(forces[int(node)*u+c]-want.AtVec(i*u+c)))
		}
	}
	if size := mat.Norm(want, 2); !(miss < 1e-13*size) {
		t.Errorf("%s: forces by the matrix and by the stresses differ by %.2g of %.2g", where, miss, size)
	}
}
