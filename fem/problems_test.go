package fem

import (
	"context"
	"math"
	"testing"

	"gonum.org/v1/gonum/spatial/r2"

	"notchproof/mesh"
	"notchproof/mesh/outline"
)

// A field is a displacement vector in Cartesian coordinates of space. Bodies of
// revolution have x as their axis. Plane fields depend on x and y alone.
type field func(x [3]jet) [3]jet

// An exact is a field taken for the solution of a problem, with the loads that
// make it so. All of it comes from Hooke's law and the equations of
// equilibrium of solid bodies in Cartesian coordinates, so that nothing of the
// reductions to two dimensions, of cylindrical coordinates or of harmonics
// that fem rests on can have crept in.
type exact struct {
	name  string
	model Model
	mat   Material
	u     field
}

// lame gives λ and μ. In plane stress σ_zz = 0 makes ε_zz = −λ/(λ+2μ)(ε_xx+ε_yy),
// and λ + λ·(−λ/(λ+2μ)) = 2λμ/(λ+2μ) stands in for λ in the plane.
func (e *exact) lame() (lambda, mu float64) {
	mu = e.mat.E / (2 * (1 + e.mat.Nu))
	lambda = e.mat.E * e.mat.Nu / ((1 + e.mat.Nu) * (1 - 2*e.mat.Nu))
	if _, ok := e.model.(PlaneStress); ok {
		lambda = 2 * lambda * mu / (lambda + 2*mu)
	}
	return lambda, mu
}

// A state is what a field means at one point of space.
type state struct {
	u      [3]float64
	stress [3][3]float64
	body   [3]float64
}

// space evaluates Hooke's law σ_ij = λ δ_ij u_k,k + μ (u_i,j + u_j,i) and Navier's
// equation f_i = −(λ+μ) u_k,ki − μ u_i,kk.
func (e *exact) space(x, y, z float64) (s state) {
	lambda, mu := e.lame()
	u := e.u(coordinates(x, y, z))
	trace := u[0].d[0] + u[1].d[1] + u[2].d[2]
	for i := range 3 {
		s.u[i] = u[i].v
		for j := range 3 {
			s.stress[i][j] = mu * (u[i].d[j] + u[j].d[i])
			s.body[i] -= (lambda+mu)*u[j].h[j][i] + mu*u[i].h[j][j]
		}
		s.stress[i][i] += lambda * trace
	}
	if _, ok := e.model.(PlaneStress); ok {
		s.stress[2][2] = 0
	}
	return s
}

// An amplitude is what a field means in the terms of fem: the displacements,
// stresses and forces along x, y (the radius) and z (the circumference).
type amplitude struct {
	u      [3]float64
	stress Stress
	body   [3]float64
}

// at reads the amplitudes. In a body of revolution those of cosθ, and what does
// not vary with θ, are found at θ = 0, where the radius is y and the
// circumference runs along z; those of sinθ, and what is circumferential
// without varying, at θ = 90°, where the radius is z and the circumference runs
// along −y.
func (e *exact) at(p r2.Vec) (a amplitude) {
	_, torsion := e.model.(Torsion)
	_, bending := e.model.(Bending)
	if !torsion {
		s := e.space(p.X, p.Y, 0)
		t := &s.stress
		a = amplitude{s.u, Stress{XX: t[0][0], YY: t[1][1], ZZ: t[2][2], XY: t[0][1]}, s.body}
	}
	if torsion || bending {
		s := e.space(p.X, 0, p.Y)
		a.u[2], a.body[2] = -s.u[1], -s.body[1]
		a.stress.XZ, a.stress.YZ = -s.stress[0][1], -s.stress[1][2]
	}
	return a
}

// unknown gives the exact value of one unknown of the model.
func (e *exact) unknown(c int, p r2.Vec) float64 {
	u := e.at(p).u
	switch e.model.(type) {
	case Torsion:
		return u[2]
	case Bending:
		return [3]float64{u[0], u[1], u[1] + u[2]}[c]
	}
	return u[c]
}

func (e *exact) traction(p, n r2.Vec) [3]float64 {
	s := e.at(p).stress
	return [3]float64{s.XX*n.X + s.XY*n.Y, s.XY*n.X + s.YY*n.Y, s.XZ*n.X + s.YZ*n.Y}
}

// A part is a region with what happens on its sides: displacements prescribed,
// or traction; neither on the others, which are free or the axis.
type part struct {
	name         string
	region       *outline.Region
	held, loaded []int
}

// problem poses the problem that has e as its solution.
func (e *exact) problem(shape *mesh.Curved, on part) *Problem {
	p := &Problem{Shape: shape, Model: e.model, Material: e.mat}
	for _, side := range on.held {
		for c := range e.model.Unknowns() {
			value := func(at r2.Vec) float64 { return e.unknown(c, at) }
			p.Fixed = append(p.Fixed, Fixed{Side: side, Unknown: c, Value: value})
		}
	}
	load := Case{Body: func(at r2.Vec) [3]float64 { return e.at(at).body }}
	sides := on.region.Sides()
	for _, side := range on.loaded {
		curve := sides[side].Curve
		load.Tractions = append(load.Tractions, Traction{Side: side, On: func(at r2.Vec) [3]float64 {
			t := curve.Deriv(curve.Nearest(at))
			length := math.Hypot(t.X, t.Y)
			return e.traction(at, r2.Vec{X: t.Y / length, Y: -t.X / length})
		}})
	}
	p.Cases = []Case{load}
	return p
}

// interpolate gives the exact unknowns at the nodes.
func (e *exact) interpolate(shape *mesh.Curved) []float64 {
	u := e.model.Unknowns()
	values := make([]float64, len(shape.Nodes)*u)
	for i, node := range shape.Nodes {
		for c := range u {
			values[i*u+c] = e.unknown(c, node)
		}
	}
	return values
}

func (p *Problem) mustSolve(t testing.TB) *Solution {
	t.Helper()
	s, err := p.Solve(context.Background(), nil, 0)
	if err != nil {
		t.Fatal(err)
	}
	return s[0]
}

// inner are points of the reference triangle, corners and edges among them.
var inner = [][2]float64{{1. / 3, 1. / 3}, {0, 0}, {1, 0}, {0, 1}, {0.5, 0}, {0.5, 0.5}, {0, 0.5}, {0.7, 0.2}, {0.05, 0.9}}

// deviation compares a solution with the exact one at points of every triangle
// that do not lie on the axis: the largest difference of displacement and of
// stress, each as a share of the largest value there is. Where the exact stress
// is zero, what displacements of this size could cause over a unit of length
// takes its place.
func (e *exact) deviation(s *Solution) (displacement, stress float64) {
	var du, ds, us, ss float64
	for tri := range s.Problem.Shape.Mesh.Triangles {
		for _, x := range inner {
			p := s.Problem.Shape.At(tri, x[0], x[1])
			want := e.at(p)
			got := s.Displacement(tri, x[0], x[1])
			for i := range got {
				du = math.Max(du, math.Abs(got[i]-want.u[i]))
				us = math.Max(us, math.Abs(want.u[i]))
			}
			if e.model.Revolved() && p.Y < 1e-9 {
				continue
			}
			d, size := difference(s.Amplitude(tri, x[0], x[1]), want.stress)
			ds, ss = math.Max(ds, d), math.Max(ss, size)
		}
	}
	if _, mu := e.lame(); ss < 1e-12*mu*us {
		ss = mu * us
	}
	return du / us, ds / ss
}

// difference gives the largest difference of two stresses, part by part, and
// the largest part of the second.
func difference(a, b Stress) (d, size float64) {
	x := [6]float64{a.XX, a.YY, a.ZZ, a.XY, a.XZ, a.YZ}
	y := [6]float64{b.XX, b.YY, b.ZZ, b.XY, b.XZ, b.YZ}
	for i := range x {
		d = math.Max(d, math.Abs(x[i]-y[i]))
		size = math.Max(size, math.Abs(y[i]))
	}
	return d, size
}

var models = []Model{PlaneStress{}, PlaneStrain{}, Axisymmetric{}, Torsion{}, Bending{}}

var steel = Material{E: 210, Nu: 0.3}
