package fem

import (
	"math"
	"testing"

	"gonum.org/v1/gonum/integrate/quad"
	"gonum.org/v1/gonum/spatial/r2"

	"notchproof/mesh"
	"notchproof/mesh/outline"
)

// sampled is a solution that holds given values, for tests of what is read from
// solutions.
func (e *exact) sampled(shape *mesh.Curved) *Solution {
	p := &Problem{Shape: shape, Model: e.model, Material: e.mat}
	return &Solution{Problem: p, Values: e.interpolate(shape), sampler: newSampler(p)}
}

// across integrates the exact stress over a stretch of a cut, straight from the
// definition of Resultant.
func (e *exact) across(x, low, high float64) (sum Resultant) {
	y, w := make([]float64, 30), make([]float64, 30)
	quad.Legendre{}.FixedLocations(y, w, low, high)
	for i, y := range y {
		s, w := e.at(pt(x, y)).stress, w[i]
		if e.model.Revolved() {
			w *= y
		}
		sum.Axial += w * s.XX
		sum.Moment += w * s.XX * y
		sum.Torque += w * s.XZ * y
		switch e.model.(type) {
		case Torsion:
		case Bending: // along y: τ_xr cosθ·cosθ − τ_xθ sinθ·sinθ, without ∫cos²θ dθ
			sum.Transverse += w * (s.XY - s.XZ)
		default:
			sum.Transverse += w * s.XY
		}
	}
	return sum
}

func (r Resultant) plus(o Resultant) Resultant {
	return Resultant{r.Axial + o.Axial, r.Transverse + o.Transverse, r.Moment + o.Moment, r.Torque + o.Torque}
}

// Cuts through a mesh with a hole: past it, through it and through a corner of
// the mesh, for polynomial fields of degree 2 held by elements of order 8.
// Triangles at the hole hold the circle to 1e-10 or so, and the fields as
// well; the others are exact.
func TestSectionThroughHole(t *testing.T) {
	const (
		radius  = 0.5
		through = 1e-9  // of the circle's map
		past    = 1e-11 // rounding of the basis and of its derivatives
	)
	region := polygon(pt(0, 1), pt(4, 1), pt(4, 3), pt(0, 3))
	center := pt(2, 2)
	region.Holes = []outline.Loop{{{Curve: outline.Arc{Center: center, Radius: radius, Sweep: -2 * math.Pi}}}}
	m := generate(t, region, mesh.Sizing{Largest: 0.6})
	shape := m.Curve(8)
	corner := innermost(m, pt(3.2, 2))
	for _, model := range models {
		e := &exact{"", model, steel, polynomial(model, 2, false, 11)}
		s := e.sampled(shape)
		for _, row := range []struct {
			name      string
			x         float64
			tolerance float64
		}{
			{"left end", 0, past},
			{"right end", 4, past},
			{"plain", 0.71, past},
			{"corner of the mesh", corner.X, past},
			{"near side of the hole", 1.51, through},
			{"hole", 1.9, through},
			{"middle of the hole", 2, through},
			{"hole touched", 2.5, through},
		} {
			want := e.across(row.x, 1, 3)
			if d := math.Abs(row.x - center.X); d < radius {
				h := math.Sqrt(radius*radius - d*d)
				want = e.across(row.x, 1, 2-h).plus(e.across(row.x, 2+h, 3))
			}
			got := s.Section(row.x)
			size := math.Abs(want.Axial) + math.Abs(want.Transverse) + math.Abs(want.Moment) + math.Abs(want.Torque)
			if d := resultantDifference(got, want); !(d < row.tolerance*size) {
				t.Errorf("%s, %s: %v, want %v: off by %.2g", model.Name(), row.name, got, want, d/size)
			}
		}
	}
}

// innermost gives the mesh point nearest to a place.
func innermost(m *mesh.Mesh, at r2.Vec) r2.Vec {
	best := m.Points[0]
	for _, p := range m.Points {
		if r2.Norm(r2.Sub(p, at)) < r2.Norm(r2.Sub(best, at)) {
			best = p
		}
	}
	return best
}
