package fem

import (
	"slices"
	"testing"

	"notchproof/mesh"
)

// Of a polynomial field whose stresses are one degree lower than the elements
// can hold nothing is seen, of one that has the highest degree something in every
// straight triangle.
func TestTopDegree(t *testing.T) {
	const order, rounding = 4, 1e-10
	for _, model := range []Model{PlaneStress{}, PlaneStrain{}} {
		shape := generate(t, crooked(0.7), mesh.Sizing{Largest: 1}).Curve(order)
		low := (&exact{"", model, steel, polynomial(model, order-1, false, 3)}).sampled(shape).TopDegree()
		high := (&exact{"", model, steel, polynomial(model, order, false, 3)}).sampled(shape).TopDegree()
		if largest := slices.Max(high); !(largest > 0) {
			t.Fatalf("%s: nothing of the highest degree", model.Name())
		}
		for tri, straight := range shape.Straight {
			if !straight {
				continue
			}
			if low[tri] > rounding*slices.Max(high) {
				t.Errorf("%s: %.2g of the top degree in triangle %d, want none", model.Name(), low[tri], tri)
			}
			if high[tri] < 1e-6*slices.Max(high) {
				t.Errorf("%s: the top degree of triangle %d is not seen", model.Name(), tri)
			}
		}
	}
}
