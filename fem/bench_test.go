package fem

import (
	"context"
	"fmt"
	"math"
	"testing"

	"gonum.org/v1/gonum/spatial/r2"

	"notchproof/mesh"
	"notchproof/mesh/outline"
)

// shoulder is a stepped part, 2 high on the left and 1 on the right of its
// middle line, with a fillet of radius 0.2 graded by a number of edges per 90°.
// Sides: 0 middle line, 1 small end, 3 fillet, 6 large end.
func shoulder(b *testing.B, perQuarter, growth float64) *mesh.Mesh {
	const r = 0.2
	region := &outline.Region{Outer: outline.Loop{
		line(pt(-6, 0), pt(3, 0)), line(pt(3, 0), pt(3, 0.5)), line(pt(3, 0.5), pt(r, 0.5)),
		{Curve: outline.Arc{Center: pt(r, 0.5+r), Radius: r, Start: -math.Pi / 2, Sweep: -math.Pi / 2}},
		line(pt(0, 0.5+r), pt(0, 1)), line(pt(0, 1), pt(-6, 1)), line(pt(-6, 1), pt(-6, 0)),
	}}
	size := mesh.Sizing{Growth: growth, Sides: []mesh.SideWish{{Side: 3, PerQuarter: perQuarter}}}
	for _, at := range []r2.Vec{pt(r, 0.5), pt(0, 0.5+r)} {
		size.Spots = append(size.Spots, mesh.SpotWish{At: at, Size: 0.3 * r * math.Pi / 2 / perQuarter})
	}
	return generate(b, region, size)
}

var gradings = []struct{ perQuarter, growth float64 }{{3, 0.62}, {8, 0.38}}

// supports hold a part on its middle line as its model wants.
func supports(m Model) ([]Fixed, Traction) {
	end := func(k int) Traction {
		return Traction{Side: 1, On: func(p r2.Vec) (t [3]float64) {
			t[k] = p.Y
			return t
		}}
	}
	switch m.(type) {
	case Torsion:
		return []Fixed{{Side: 6, Unknown: 0}}, end(2)
	case Bending:
		return []Fixed{{Side: 6, Unknown: 0}, {Side: 6, Unknown: 1}}, end(0)
	}
	return []Fixed{{Side: 0, Unknown: 1}, {Side: 6, Unknown: 0}}, end(0)
}

// BenchmarkElementMatrix is one element matrix, of a straight triangle and of a
// bent one.
func BenchmarkElementMatrix(b *testing.B) {
	m := shoulder(b, 3, 0.7)
	for _, model := range models {
		for _, order := range []int{1, 2, 4, 6, 8} {
			shape := m.Curve(order)
			a := newAssembler(shape, model, steel, newTables(shape.Element, model.Revolved()))
			n := shape.Element.Count * model.Unknowns()
			k := make([]float64, n*n)
			for i, tri := range oneOfEach(shape) {
				b.Run(fmt.Sprintf("%s/order=%d/%s", model.Name(), order, []string{"straight", "bent"}[i]), func(b *testing.B) {
					for b.Loop() {
						a.stiffness(tri, k)
					}
				})
			}
		}
	}
}

// BenchmarkSolve is one rung: numbering, analysis, element matrices, factor and
// solution of one load case, on one worker and in memory that is kept.
func BenchmarkSolve(b *testing.B) {
	for _, model := range models {
		fixed, load := supports(model)
		for _, g := range gradings {
			m := shoulder(b, g.perQuarter, g.growth)
			for _, order := range []int{4, 6} {
				p := &Problem{Shape: m.Curve(order), Model: model, Material: steel, Fixed: fixed, Cases: []Case{{Tractions: []Traction{load}}}}
				b.Run(fmt.Sprintf("%s/triangles=%d/order=%d", model.Name(), len(m.Triangles), order), func(b *testing.B) {
					var w Workspace
					for b.Loop() {
						if _, err := p.Solve(context.Background(), &w, 1); err != nil {
							b.Fatal(err)
						}
					}
				})
			}
		}
	}
}

// BenchmarkMaxima is the search for the peak on a fillet.
func BenchmarkMaxima(b *testing.B) {
	m := shoulder(b, 6, 0.45)
	fixed, load := supports(Axisymmetric{})
	p := &Problem{Shape: m.Curve(6), Model: Axisymmetric{}, Material: steel, Fixed: fixed, Cases: []Case{{Tractions: []Traction{load}}}}
	s := p.mustSolve(b)
	for b.Loop() {
		s.Maxima([]int{3}, SurfacePoint.FirstPrincipal)
	}
}
