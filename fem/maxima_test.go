package fem

import (
	"math"
	"testing"

	"gonum.org/v1/gonum/spatial/r2"

	"notchproof/mesh"
	"notchproof/mesh/outline"
)

// pulledPlate is a wide plate with a round hole under tension along x. The hole
// begins at an angle in degrees and is drawn in a number of arcs.
func pulledPlate(t *testing.T, start float64, arcs int) (*Solution, []int) {
	region := polygon(pt(-10, -10), pt(10, -10), pt(10, 10), pt(-10, 10))
	var hole outline.Loop
	var sides []int
	size := mesh.Sizing{}
	for i := range arcs {
		step := 360 / float64(arcs)
		hole = append(hole, elliptic(pt(0, 0), 1, 1, start-float64(i)*step, start-float64(i+1)*step))
		sides = append(sides, 4+i)
		size.Sides = append(size.Sides, mesh.SideWish{Side: 4 + i, PerQuarter: 5})
	}
	region.Holes = []outline.Loop{hole}
	m := generate(t, region, size)
	pull := func(side int, x float64) Traction {
		return Traction{Side: side, On: func(r2.Vec) [3]float64 { return [3]float64{x} }}
	}
	low, right := cornerAt(m, pt(-10, -10)), cornerAt(m, pt(10, -10))
	p := &Problem{
		Shape: m.Curve(6), Model: PlaneStress{}, Material: Material{E: 1, Nu: 0.3},
		Pinned: []Pin{{low, 0}, {low, 1}, {right, 1}},
		Cases:  []Case{{Tractions: []Traction{pull(1, 1), pull(3, -1)}}},
	}
	return p.mustSolve(t), sides
}

// A hole has two maxima, above and below, wherever its drawing begins: one at
// the seam is neither lost nor counted twice.
func TestMaximaOfClosedChain(t *testing.T) {
	for _, c := range []struct {
		start float64
		arcs  int
	}{{180, 1}, {90, 1}, {-90, 1}, {90, 2}, {45, 4}, {90.01, 3}, {89.99, 1}} {
		s, sides := pulledPlate(t, c.start, c.arcs)
		found := s.Maxima(sides, SurfacePoint.FirstPrincipal)
		if len(found) != 2 {
			t.Errorf("%v: %d maxima, want 2", c, len(found))
			continue
		}
		for i, p := range found {
			// The places: the stress is flat there, so an error of 1e-5 in it
			// moves them by up to a few thousandths.
			if math.Abs(p.At.X) > 0.01 || math.Abs(p.At.Y*found[1-i].At.Y+1) > 0.001 {
				t.Errorf("%v: maximum at %v", c, p.At)
			}
			if r := p.FirstPrincipal() / found[0].FirstPrincipal(); math.Abs(r-1) > 1e-4 {
				t.Errorf("%v: maxima %.7f apart, both are the same in truth", c, r)
			}
		}
	}
}

// Sides that a loop's first corner parts belong together.
func TestMaximaAcrossFirstSide(t *testing.T) {
	s, sides := pulledPlate(t, 90, 4)
	found := s.Maxima([]int{sides[0], sides[3]}, SurfacePoint.FirstPrincipal)
	if len(found) == 0 || math.Abs(found[0].At.X) > 0.01 || found[0].At.Y < 0 {
		t.Fatalf("maxima %v, want one at the top first", found)
	}
	for _, p := range found[1:] {
		if p.At.Y > 0.9 {
			t.Errorf("the maximum at the top counts twice")
		}
	}
}
