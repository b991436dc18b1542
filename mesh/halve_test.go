package mesh

import (
	"math"
	"testing"
)

// TestHalvedIsValidAndConverges splits meshes with concave and convex arcs: each
// level is valid, keeps the smallest angle to what the bulging of the arcs takes
// of it, and comes nearer to the exact area by the square of the size.
func TestHalvedIsValidAndConverges(t *testing.T) {
	region := stepped(1.5, 1, 0.1)
	exact := region.Properties().Area
	m, err := Generate(region, Sizing{Sides: []SideWish{{Side: 3, PerQuarter: 3}}})
	if err != nil {
		t.Fatal(err)
	}
	angle := m.Quality().SmallestAngle
	var errs []float64
	for level := range 5 {
		if err := m.Validate(); err != nil {
			t.Fatalf("level %d: %v", level, err)
		}
		if q := m.Quality().SmallestAngle; q < angle-4 {
			t.Errorf("level %d: smallest angle %.1f°, at first %.1f°", level, q, angle)
		}
		errs = append(errs, math.Abs(straightArea(m)-exact))
		m = m.Halved()
	}
	for i := 2; i < len(errs); i++ {
		if order := math.Log2(errs[i-1] / errs[i]); math.Abs(order-2) > 0.05 {
			t.Errorf("level %d: the area converges with order %.2f, want 2", i, order)
		}
	}
}

func straightArea(m *Mesh) (sum float64) {
	for _, c := range m.Triangles {
		p, a, b := m.Points[c[0]], m.Points[c[1]], m.Points[c[2]]
		sum += ((a.X-p.X)*(b.Y-p.Y) - (b.X-p.X)*(a.Y-p.Y)) / 2
	}
	return sum
}
