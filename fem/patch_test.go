package fem

import (
	"fmt"
	"slices"
	"testing"

	"notchproof/mesh"
	"notchproof/mesh/outline"
)

// patchParts are posed with displacements on curved sides, where a traction
// would need the normal of the polynomial edge, and on one or two straight ones;
// with tractions on another straight side. In a body of revolution side 0 is
// left to the axis, or held when it is clear of it.
func patchParts(m Model, curved bool) []part {
	var parts []part
	for _, lift := range []float64{0, 0.7} {
		shapes := []part{{name: "crooked", region: crooked(lift), held: []int{1, 3}, loaded: []int{2, 4}}}
		if curved {
			shapes = append(shapes,
				part{name: "domed", region: domed(lift), held: []int{1, 2, 3}, loaded: []int{4}},
				part{name: "vaulted", region: vaulted(lift), held: []int{1, 2}, loaded: []int{3}})
		}
		for _, s := range shapes {
			s.name = fmt.Sprintf("%s lifted %g", s.name, lift)
			if lift > 0 || !m.Revolved() {
				s.held = append(s.held, 0)
			}
			parts = append(parts, s)
		}
	}
	return parts
}

// constantStress gives, for each model, the fields that are linear in x and y,
// in equilibrium without body force and as general as that allows.
func constantStress(m Model) field {
	one := constant(1)
	switch m.(type) {
	case Axisymmetric: // uniform strain along the axis and across it, a shift
		return alongMeridian(func(x [3]jet) jet { return x[0].scaled(0.5).plus(constant(0.2)) }, func([3]jet) jet { return one.scaled(0.3) })
	case Torsion: // a turn about the axis: there is no linear field with stress
		return aroundAxis(func([3]jet) jet { return one.scaled(0.4) })
	case Bending: // uniform transverse shear, a shift and a turn
		return bent(func([3]jet) jet { return one.scaled(0.7) }, func(x [3]jet) jet { return x[0].scaled(0.4).plus(constant(0.1)) }, func([3]jet) jet { return jet{} })
	}
	return func(x [3]jet) [3]jet {
		return [3]jet{
			x[0].scaled(0.5).plus(x[1].scaled(-0.2)).plus(constant(0.3)),
			x[0].scaled(0.7).plus(x[1].scaled(0.4)).plus(constant(-0.1)),
		}
	}
}

// Bounds of patch tests: rounding, magnified by the condition of the system and,
// for stresses, by differentiation. Both grow with the order; measured are
// 9e-14 and 2e-12 at most.
const (
	patchDisplacement = 1e-12
	patchStress       = 2e-11
	patchResidual     = 1e-12
	// On bent triangles of a body of revolution the virtual work of a constant
	// stress, ∂φ·σ·y·det J, is of degree 3p−2; the rule there is exact to 2p+2,
	// which is less from order 5 on. Measured is 3e-11 on edges that turn by 45°.
	patchIntegrated = 1e-10
)

func checkPatch(t *testing.T, e *exact, on part, m *mesh.Mesh, order int) {
	t.Helper()
	shape := m.Curve(order)
	s := e.problem(shape, on).mustSolve(t)
	du, ds := e.deviation(s)
	bound := patchStress
	if order >= 5 && e.model.Revolved() && slices.Contains(shape.Straight, false) {
		bound = patchIntegrated
	}
	if !(du <= patchDisplacement) || !(ds <= bound) {
		t.Errorf("%s, %s, %s, order %d: displacement off by %.2g, stress by %.2g", e.name, e.model.Name(), on.name, order, du, ds)
	}
	// Without stress there are no forces that a residual could be a share of.
	if _, size := difference(Stress{}, e.at(pt(1.3, 0.8)).stress); size < 1e-9 {
		return
	}
	if r := s.Balance().Residual; !(r < patchResidual) {
		t.Errorf("%s, %s, %s, order %d: residual %.2g", e.name, e.model.Name(), on.name, order, r)
	}
}

// The map of an element holds x and y themselves, so that fields linear in them
// are exact at every order and on curved sides.
func TestPatchLinear(t *testing.T) {
	for _, model := range models {
		e := &exact{"linear", model, steel, constantStress(model)}
		for _, on := range patchParts(model, true) {
			m := generate(t, on.region, mesh.Sizing{Largest: 1.2})
			for order := 1; order <= 8; order++ {
				checkPatch(t, e, on, m, order)
			}
		}
	}
}

// pureBending is the exact field of a bar bent by moments at its ends,
// σ_xx = E κ y and no other stress: u_x = κ x y, u_y = −κ/2 (x² + ν (y² − z²)),
// u_z = −κ ν y z (Saint-Venant; Timoshenko & Goodier, Theory of Elasticity,
// art. 102). Its plane counterpart has no z.
func pureBending(m Model, mat Material) field {
	k, nu := 0.3, mat.Nu
	switch m.(type) {
	case PlaneStress:
	case PlaneStrain: // by the moduli of the plane state: ν/(1−ν) in place of ν
		nu /= 1 - nu
	}
	return func(x [3]jet) [3]jet {
		xx, yy, zz := x[0].times(x[0]), x[1].times(x[1]), x[2].times(x[2])
		u := [3]jet{x[0].times(x[1]), xx.plus(yy.minus(zz).scaled(nu)).scaled(-0.5), x[1].times(x[2]).scaled(-nu)}
		if !m.Revolved() {
			u[1], u[2] = xx.plus(yy.scaled(nu)).scaled(-0.5), jet{}
		}
		for i := range u {
			u[i] = u[i].scaled(k)
		}
		return u
	}
}

// quadratic gives, for each model, a field of degree 2 in equilibrium.
func quadratic(m Model, mat Material) field {
	switch m.(type) {
	case Axisymmetric: // the bar hung up by one end: σ_xx = E·0.2 x, held by a body force
		nu := mat.Nu
		return func(x [3]jet) [3]jet {
			q := x[1].times(x[1]).plus(x[2].times(x[2]))
			return [3]jet{
				x[0].times(x[0]).plus(q.scaled(nu)).scaled(0.1),
				x[0].times(x[1]).scaled(-0.2 * nu), x[0].times(x[2]).scaled(-0.2 * nu)}
		}
	case Torsion: // uniform twist
		return aroundAxis(func(x [3]jet) jet { return x[0].scaled(0.4) })
	}
	return pureBending(m, mat)
}

// Quadratic fields are exact from order 2 on straight triangles. On curved ones
// x and y are polynomials of the degree d of the curve's map, and the field is
// one of degree 2d in the reference coordinates: exact from order 2d on, which
// is 4 on a parabola, and never on an arc, whose map is of the element's order.
func TestPatchQuadratic(t *testing.T) {
	for _, model := range models {
		e := &exact{"quadratic", model, steel, quadratic(model, steel)}
		for _, on := range patchParts(model, true) {
			from := 2
			switch on.region.Outer[2].Curve.(type) {
			case outline.Bezier:
				from = 4
			case outline.EllipticArc:
				continue
			}
			m := generate(t, on.region, mesh.Sizing{Largest: 1.2})
			for order := from; order <= 8; order++ {
				checkPatch(t, e, on, m, order)
			}
		}
	}
}

// Any polynomial of the element's order, with the body force that holds it in
// equilibrium, is exact on straight triangles: this puts every term of the
// element matrices and of the loads to the test.
func TestPatchPolynomial(t *testing.T) {
	for _, model := range models {
		for order := 1; order <= 8; order++ {
			for i, on := range patchParts(model, false) {
				axis := i == 0 && model.Revolved()
				e := &exact{fmt.Sprintf("degree %d", order), model, steel, polynomial(model, order, axis, uint64(order))}
				checkPatch(t, e, on, generate(t, on.region, mesh.Sizing{Largest: 1.2}), order)
			}
		}
	}
}
