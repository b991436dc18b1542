package fem

import (
	"fmt"
	"math"
	"os"
	"slices"
	"testing"

	"gonum.org/v1/gonum/spatial/r2"

	"notchproof/fem/cubature"
	"notchproof/mesh"
	"notchproof/mesh/outline"
)

// A manufactured problem is an exact field on a part; free lists the sides that
// it leaves without traction.
type manufactured struct {
	exact
	part
	free []int
}

// hollow is a quarter of a ring between circles, free inside (side 3) and held
// outside (side 1); the straight sides are loaded, side 0 only where it is not
// the axis.
func hollow(m Model, lift float64) manufactured {
	const inside, outside = 1, 2
	c := pt(0, lift)
	p := manufactured{exact: exact{model: m, mat: steel}, free: []int{3}}
	p.exact.name = fmt.Sprintf("cavity, middle at radius %g", lift)
	p.part.region = &outline.Region{Outer: outline.Loop{
		line(pt(inside, lift), pt(outside, lift)),
		{Curve: outline.Arc{Center: c, Radius: outside, Sweep: math.Pi / 2}},
		line(pt(0, lift+outside), pt(0, lift+inside)),
		{Curve: outline.Arc{Center: c, Radius: inside, Start: math.Pi / 2, Sweep: -math.Pi / 2}},
	}}
	p.held, p.loaded = []int{1}, []int{2}
	if lift > 0 || !m.Revolved() {
		p.loaded = append(p.loaded, 0)
	}
	if lift > 0 {
		p.exact.free(torus(inside, lift))
	} else {
		p.exact.free(sphere(inside))
	}
	return p
}

// solid is a half ellipse on the axis, one of its two arcs held, the other loaded.
func solid(m Model) manufactured {
	const a, b = 1.5, 1
	p := manufactured{exact: exact{name: "half ellipse", model: m, mat: Material{E: 3, Nu: 0.2}, u: wavy(m)}}
	p.part.region = &outline.Region{Outer: outline.Loop{
		line(pt(-a, 0), pt(a, 0)),
		elliptic(pt(0, 0), a, b, 0, 90),
		elliptic(pt(0, 0), a, b, 90, 180),
	}}
	p.held, p.loaded = []int{1}, []int{2}
	if !m.Revolved() {
		p.loaded = append(p.loaded, 0)
	}
	return p
}

// lens is an ellipse askew beside the axis, all of its boundary curved.
func lens(m Model) manufactured {
	arc := func(from, sweep float64) outline.Side {
		return outline.Side{Curve: outline.EllipticArc{Center: pt(0.2, 1.4), A: 1.2, B: 0.8, Tilt: 0.5, Start: from, Sweep: sweep}}
	}
	p := manufactured{exact: exact{name: "ellipse askew", model: m, mat: Material{E: 3, Nu: 0.45}, u: wavy(m)}}
	p.part.region = &outline.Region{Outer: outline.Loop{arc(0, math.Pi/2), arc(math.Pi/2, math.Pi), arc(3*math.Pi/2, math.Pi/2)}}
	p.held, p.loaded = []int{0}, []int{1, 2}
	return p
}

func manufacturedProblems() (list []manufactured) {
	for _, m := range models {
		list = append(list, hollow(m, 0), solid(m), lens(m))
		if m.Revolved() {
			list = append(list, hollow(m, 3))
		}
	}
	return list
}

// A misfit holds root-mean-square errors relative to the root mean square of the
// exact values.
type misfit struct{ displacement, stress, surface float64 }

func (p *manufactured) misfit(s *Solution) (e misfit) {
	shape := s.Problem.Shape
	rule := cubature.Triangle(2*shape.Element.Order + 2)
	var du, us, ds, ss float64
	for tri := range shape.Mesh.Triangles {
		for q, x := range rule.Points {
			j := shape.Jacobian(tri, x[0], x[1])
			at := shape.At(tri, x[0], x[1])
			w := rule.Weights[q] * (j[0][0]*j[1][1] - j[0][1]*j[1][0])
			if s.revolved {
				w *= at.Y
			}
			want := p.at(at)
			got := s.Displacement(tri, x[0], x[1])
			for i := range got {
				du += w * (got[i] - want.u[i]) * (got[i] - want.u[i])
				us += w * want.u[i] * want.u[i]
			}
			ds += w * square(s.Amplitude(tri, x[0], x[1]), want.stress)
			ss += w * square(Stress{}, want.stress)
		}
	}
	return misfit{math.Sqrt(du / us), math.Sqrt(ds / ss), p.surfaceError(s)}
}

func square(a, b Stress) float64 {
	sum := 0.0
	for _, d := range []float64{a.XX - b.XX, a.YY - b.YY, a.ZZ - b.ZZ, a.XY - b.XY, a.XZ - b.XZ, a.YZ - b.YZ} {
		sum += d * d
	}
	return sum
}

// surfaceError compares the surface stress on the free sides, at points evenly
// spread over each edge.
func (p *manufactured) surfaceError(s *Solution) float64 {
	miss, size := 0.0, 0.0
	for i, e := range s.Problem.Shape.Mesh.Boundary {
		if !slices.Contains(p.free, int(e.Side)) {
			continue
		}
		for k := range 9 {
			got := s.Surface(i, float64(k)/8)
			want := onSurface(s.Problem.Model.Drawn(p.at(got.At).stress), got.Normal)
			for j, v := range [3]float64{got.Tangential, got.Hoop, got.Shear} {
				miss += (v - want[j]) * (v - want[j])
				size += want[j] * want[j]
			}
		}
	}
	if size == 0 {
		return 0
	}
	return math.Sqrt(miss / size)
}

// onSurface gives the stresses along the drawn boundary, along z and the shear
// between the two.
func onSurface(s Stress, n r2.Vec) [3]float64 {
	t := r2.Vec{X: -n.Y, Y: n.X}
	return [3]float64{
		s.XX*t.X*t.X + s.YY*t.Y*t.Y + 2*s.XY*t.X*t.Y,
		s.ZZ,
		s.XZ*t.X + s.YZ*t.Y,
	}
}

// The free fields are what they claim: their traction on the surface is rounding
// against the stress there, and the amplitudes found at θ = 0 and 90° are those
// at any other angle.
func TestManufacturedFields(t *testing.T) {
	for _, p := range manufacturedProblems() {
		sides := p.region.Sides()
		for _, side := range p.free {
			for _, at := range []float64{0.1, 0.5, 0.8} {
				c := sides[side].Curve
				d := c.Deriv(at)
				n := r2.Scale(1/r2.Norm(d), pt(d.Y, -d.X))
				tr := p.traction(c.At(at), n)
				size := math.Sqrt(square(Stress{}, p.at(c.At(at)).stress))
				if got := math.Hypot(math.Hypot(tr[0], tr[1]), tr[2]); !(got < 1e-13*size) {
					t.Errorf("%s, %s: traction %.2g beside the stress %.2g", p.exact.name, p.model.Name(), got, size)
				}
			}
		}
		if p.model.Revolved() {
			p.checkHarmonic(t)
		}
	}
}

func (p *manufactured) checkHarmonic(t *testing.T) {
	const x, r, theta = 0.3, 1.2, 0.7
	sin, cos := math.Sincos(theta)
	a := p.at(pt(x, r))
	ca, sa := 1.0, 1.0
	if _, ok := p.model.(Bending); ok {
		ca, sa = cos, sin
	}
	s := p.space(x, r*cos, r*sin)
	for _, v := range []struct {
		what             string
		x, y, z          float64 // Cartesian parts
		along, up, round float64 // amplitudes
	}{
		{"displacement", s.u[0], s.u[1], s.u[2], a.u[0], a.u[1], a.u[2]},
		{"body force", s.body[0], s.body[1], s.body[2], a.body[0], a.body[1], a.body[2]},
		{"stress on the cut across the axis", s.stress[0][0], s.stress[0][1], s.stress[0][2], a.stress.XX, a.stress.XY, a.stress.XZ},
	} {
		d := math.Abs(v.x-v.along*ca) + math.Abs(v.y*cos+v.z*sin-v.up*ca) + math.Abs(v.z*cos-v.y*sin-v.round*sa)
		if size := math.Abs(v.x) + math.Abs(v.y) + math.Abs(v.z); !(d < 1e-13*size) {
			t.Errorf("%s, %s: %s at θ = %g differs by %.2g of %.2g", p.exact.name, p.model.Name(), v.what, theta, d, size)
		}
	}
}

// Bounds of observed orders. One halving of a mesh of some forty elements is not
// yet the limit: it may fall short of the order by 0.45, on a surface of a few
// edges by 0.7, where a fault of geometry, loads or integration would cost a
// whole order or more. Below the
// floor errors are rounding and have no order; 4e-12 is the most that was seen
// on these meshes. It grows with the condition of the system, fourfold with
// every further halving.
const (
	orderShortfall   = 0.45
	surfaceShortfall = 0.7
	roundingFloor    = 1e-11
)

// Halving the elements must divide the error of displacements by 2^(p+1), that
// of stresses by 2^p at least (Ciarlet & Raviart 1972 for curved elements with
// isoparametric maps), inside and on free surfaces. The observed order is the
// binary logarithm of the ratio of errors.
func TestManufacturedOrder(t *testing.T) {
	orders, halvings := []int{1, 2, 3, 4, 6}, 1
	if os.Getenv("NOTCHPROOF_LONG") == "1" {
		orders, halvings = []int{1, 2, 3, 4, 5, 6, 7, 8}, 2
	}
	for _, p := range manufacturedProblems() {
		meshes := []*mesh.Mesh{generate(t, p.region, mesh.Sizing{Largest: 0.55})}
		for i := range halvings {
			meshes = append(meshes, halved(meshes[i]))
		}
		for _, order := range orders {
			var last misfit
			for i, m := range meshes {
				e := p.misfit(p.problem(m.Curve(order), p.part).mustSolve(t))
				if i > 0 {
					p.checkOrder(t, order, last, e, roundingFloor*math.Pow(4, float64(i-1)))
				}
				last = e
			}
		}
	}
}

func (p *manufactured) checkOrder(t *testing.T, order int, coarse, fine misfit, floor float64) {
	t.Helper()
	for _, row := range []struct {
		what         string
		order        int
		shortfall    float64
		coarse, fine float64
	}{
		{"displacement", order + 1, orderShortfall, coarse.displacement, fine.displacement},
		{"stress", order, orderShortfall, coarse.stress, fine.stress},
		{"surface stress", order, surfaceShortfall, coarse.surface, fine.surface},
	} {
		if row.what == "surface stress" && len(p.free) == 0 || row.fine < floor {
			continue
		}
		if got := math.Log2(row.coarse / row.fine); !(got > float64(row.order)-row.shortfall) {
			t.Errorf("%s, %s, order %d: error of %s falls from %.2g to %.2g, order %.2f, want %d",
				p.exact.name, p.model.Name(), order, row.what, row.coarse, row.fine, got, row.order)
		}
	}
}
