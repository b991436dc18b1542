package fem

import (
	"fmt"
	"math"
	"slices"
	"testing"

	"gonum.org/v1/gonum/mat"

	"notchproof/mesh"
)

// Every model reads displacements and stresses of any polynomial field from its
// nodal values as the definitions in space have them, inside elements and on
// the axis, without anything being solved.
func TestModelsReadFields(t *testing.T) {
	const rounding = 1e-11 // order 4, degree 4; near the axis quotients of small numbers
	for _, model := range models {
		for _, lift := range []float64{0, 0.7} {
			shape := generate(t, crooked(lift), mesh.Sizing{Largest: 1}).Curve(4)
			e := &exact{"", model, steel, polynomial(model, 4, lift == 0 && model.Revolved(), 3)}
			if du, ds := e.deviation(e.sampled(shape)); !(du < rounding) || !(ds < rounding) {
				t.Errorf("%s lifted %g: displacement off by %.2g, stress by %.2g", model.Name(), lift, du, ds)
			}
		}
	}
}

// The stress on the drawn plane is that of the body in space at θ = 0, all six
// parts of it, and the surface stress is what it comes to on a surface.
func TestDrawnPlane(t *testing.T) {
	const rounding = 1e-11
	for _, model := range models {
		shape := generate(t, crooked(0.7), mesh.Sizing{Largest: 1}).Curve(4)
		e := &exact{"", model, steel, polynomial(model, 4, false, 13)}
		s := e.sampled(shape)
		for tri := range shape.Mesh.Triangles {
			p := shape.At(tri, 0.2, 0.5)
			q := e.space(p.X, p.Y, 0).stress
			want := Stress{q[0][0], q[1][1], q[2][2], q[0][1], q[0][2], q[1][2]}
			if d, size := difference(s.Stress(tri, 0.2, 0.5), want); !(d < rounding*size) {
				t.Errorf("%s at %v: %v, want %v", model.Name(), p, s.Stress(tri, 0.2, 0.5), want)
			}
		}
		if _, ok := model.(Bending); ok {
			for i := range shape.Mesh.Boundary {
				if p := s.Surface(i, 0.3); p.Shear != 0 {
					t.Errorf("%s: shear stress %g around the surface at θ = 0", model.Name(), p.Shear)
				}
			}
		}
	}
}

// On the axis and close to it stresses are those of the limit, though what is
// divided by the radius loses its digits there.
func TestStressNearAxis(t *testing.T) {
	const lost = 3e-8 // of the largest stress, where rounding and the error of the derivative meet
	for _, model := range []Model{Axisymmetric{}, Torsion{}, Bending{}} {
		m := generate(t, crooked(0), mesh.Sizing{Largest: 1})
		e := &exact{"", model, steel, polynomial(model, 4, true, 5)}
		s := e.sampled(m.Curve(4))
		_, size := difference(Stress{}, e.at(pt(1.3, 0.5)).stress)
		for _, r := range []float64{0, 1e-15, 1e-12, 1e-9, 1e-7, 1e-6, 1e-5, 1e-3} {
			p := pt(1.37, r)
			tri, xi, eta, ok := s.Find(p)
			if !ok {
				t.Fatalf("%v not found", p)
			}
			want := e.at(pt(1.37, math.Max(r, 1e-12))).stress
			if d, _ := difference(s.Amplitude(tri, xi, eta), want); !(d < lost*size) {
				t.Errorf("%s at radius %g: %v, want %v", model.Name(), r, s.Amplitude(tri, xi, eta), want)
			}
		}
	}
}

// What every model must be: named, with one to three unknowns, an elasticity
// that is symmetric and stores energy in any strain that the model can have, and
// axis conditions on just those unknowns that strains hold divided by the radius.
func TestModelsAreSound(t *testing.T) {
	names := make(map[string]bool)
	for _, model := range models {
		u := model.Unknowns()
		if names[model.Name()] || model.Name() == "" || u < 1 || u > 3 {
			t.Errorf("%q with %d unknowns", model.Name(), u)
		}
		names[model.Name()] = true
		var divided []int
		kin := model.Kinematics()
		for c := range u {
			if slices.ContainsFunc(kin.Strain[:], func(s [3][strainOperators]float64) bool { return s[c][overY] != 0 }) {
				divided = append(divided, c)
			}
		}
		if !slices.Equal(model.Axis(), divided) || (len(divided) > 0) != model.Revolved() {
			t.Errorf("%s: axis conditions on %v, divided by the radius are %v", model.Name(), model.Axis(), divided)
		}
		for _, nu := range []float64{-0.9, 0, 0.3, 0.499} {
			checkElasticity(t, model, Material{E: 1, Nu: nu})
		}
	}
}

// checkElasticity holds Elasticity against Hooke's law the other way round, the
// strains that stresses cause: ε_xx = (σ_xx − ν (σ_yy + σ_zz))/E, γ = τ/G.
func checkElasticity(t *testing.T, model Model, m Material) {
	t.Helper()
	where := fmt.Sprintf("%s, ν = %g", model.Name(), m.Nu)
	d := model.Elasticity(m)
	full := mat.NewSymDense(components, nil)
	for i := range components {
		for j := range components {
			if d[i][j] != d[j][i] {
				t.Errorf("%s: not symmetric at %d, %d", where, i, j)
			}
			full.SetSym(i, j, d[i][j])
		}
	}
	var eigen mat.EigenSym
	if !eigen.Factorize(full, false) || eigen.Values(nil)[0] < 0 {
		t.Errorf("%s: energy of a strain below zero", where)
	}
	strain := [components]float64{0.3, -0.5, 0.2, 0.7, -0.4, 0.6}
	_, thin := model.(PlaneStress)
	if thin {
		strain[xz], strain[yz] = 0, 0
	}
	s := d.times(strain)
	for i := range components {
		back := s[i] * 2 * (1 + m.Nu) / m.E
		if i <= zz {
			back = (s[i]*(1+m.Nu) - m.Nu*(s[xx]+s[yy]+s[zz])) / m.E
			if i == zz && thin {
				back = strain[zz] // left to the thickness
			}
		}
		if !(math.Abs(back-strain[i]) < 1e-12) {
			t.Errorf("%s: strain %d comes back as %g, want %g", where, i, back, strain[i])
		}
	}
}
