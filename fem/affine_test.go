package fem

import (
	"math"
	"testing"

	"gonum.org/v1/gonum/spatial/r2"

	"notchproof/mesh"
	"notchproof/mesh/outline"
)

// TestAffineMatrixAgainstCubature holds the tabulated matrices of straight
// triangles against the same integrals by cubature at every point. Away from
// the axis both rules integrate all but ∫φφ/y exactly, and there the radius
// varies so little that the rules agree to rounding as well.
func TestAffineMatrixAgainstCubature(t *testing.T) {
	loop := outline.Loop{}
	corners := []r2.Vec{{X: 0, Y: 10}, {X: 1.3, Y: 10.2}, {X: 0.4, Y: 11.1}}
	for i, p := range corners {
		loop = append(loop, outline.Side{Name: "side", Curve: outline.Line{A: p, B: corners[(i+1)%3]}})
	}
	m, err := mesh.Generate(&outline.Region{Outer: loop}, mesh.Sizing{})
	if err != nil {
		t.Fatal(err)
	}
	for _, model := range []Model{PlaneStress{}, PlaneStrain{}, Axisymmetric{}, Torsion{}, Bending{}} {
		for order := 1; order <= 8; order++ {
			shape := m.Curve(order)
			a := newAssembler(shape, model, Material{E: 1, Nu: 0.3}, newTables(shape.Element, model.Revolved()))
			n := shape.Element.Count * model.Unknowns()
			fast, slow := make([]float64, n*n), make([]float64, n*n)
			a.affineStiffness(0, fast)
			a.bentStiffness(0, slow)
			largest, worst := 0.0, 0.0
			for i := range n {
				for j := 0; j <= i; j++ {
					largest = math.Max(largest, math.Abs(slow[i*n+j]))
					worst = math.Max(worst, math.Abs(fast[i*n+j]-slow[i*n+j]))
				}
			}
			if worst > 1e-13*largest {
				t.Errorf("%s, order %d: matrices differ by %.1e of %.1e", model.Name(), order, worst, largest)
			}
		}
	}
}
