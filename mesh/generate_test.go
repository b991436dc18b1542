package mesh

import (
	"fmt"
	"testing"

	"notchproof/mesh/outline"
)

func TestSteppedBars(t *testing.T) {
	for _, ratio := range []float64{1.02, 1.1, 1.5, 2, 3, 5, 100} {
		for _, rd := range []float64{1e-6, 1e-5, 1e-4, 1e-3, 0.01, 0.05, 0.1, 0.3, 0} {
			d, D := 1.0, ratio
			r := min(rd*d, (D-d)/2)
			if r == 0 {
				r = (D - d) / 2
			}
			if r > 2*d { // the thin part would end before the fillet
				continue
			}
			for _, n := range []float64{3, 5} {
				size := Sizing{Sides: []SideWish{{Side: filletSide, PerQuarter: n}}}
				check(t, fmt.Sprintf("D/d=%g r/d=%g n=%g", ratio, r, n), stepped(D, d, r), size, 20)
			}
		}
	}
}

func check(t *testing.T, name string, region *outline.Region, size Sizing, angle float64) *Mesh {
	t.Helper()
	m, err := Generate(region, size)
	if err != nil {
		t.Errorf("%s: %v", name, err)
		return nil
	}
	if err := m.Validate(); err != nil {
		t.Errorf("%s: %v", name, err)
	}
	q := m.Quality()
	if q.SmallestAngle < angle {
		t.Errorf("%s: smallest angle %.1f° at %v", name, q.SmallestAngle, q.At)
	}
	if testing.Verbose() {
		t.Logf("%s: %d triangles, angles %.1f–%.1f°, %d boundary edges", name, q.Triangles, q.SmallestAngle, q.LargestAngle, len(m.Boundary))
	}
	return m
}
