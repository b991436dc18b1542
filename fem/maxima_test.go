package fem

import (
	"math"
	"testing"

	"gonum.org/v1/gonum/spatial/r2"

	"notchproof/mesh"
	"notchproof/mesh/outline"
)

// strip is a solution on a rectangle of length 4 whose upper side, number 2, runs
// from x = 4 to 0 over four edges; the quantities of these tests are functions
// of place and of edge, so that the unknowns do not matter.
func strip(t *testing.T) *Solution {
	region := polygon(pt(0, 0), pt(4, 0), pt(4, 1), pt(0, 1))
	m := generate(t, region, mesh.Sizing{Largest: 1})
	e := &exact{"", PlaneStress{}, steel, wavy(PlaneStress{})}
	return e.sampled(m.Curve(4))
}

// A maximum inside an edge, at a joint, just beside one on either hand, at the
// ends of a chain, and where the two edges of a joint disagree about the value.
// Places are good to 1e-5 of an edge, which leaves 1e-10 of the value.
func TestMaximaPlace(t *testing.T) {
	s := strip(t)
	parabola := func(x float64) Quantity {
		return func(p SurfacePoint) float64 { return 1 - (p.At.X-x)*(p.At.X-x) }
	}
	// Edge first of the side ends at joint, where the next one begins.
	first := -1
	for i, e := range s.Problem.Shape.Mesh.Boundary {
		if first < 0 && e.Side == 2 {
			first = i
		}
	}
	joint := s.Surface(first, 1).At.X
	length := s.Surface(first, 0).At.X - joint
	step := length / 9 // of samples at order 4
	const place = 2e-5
	for _, row := range []struct {
		name string
		of   Quantity
		x    float64
	}{
		{"inside an edge", parabola(joint + 0.37*length), joint + 0.37*length},
		{"on a sample", parabola(joint + step), joint + step},
		{"at a joint", parabola(joint), joint},
		{"just before a joint", parabola(joint + 0.1*step), joint + 0.1*step},
		{"just after a joint", parabola(joint - 0.1*step), joint - 0.1*step},
		{"at the begin", parabola(5), 4},
		{"at the end", parabola(-1), 0},
		{"before a joint, the edge after it a little higher", func(p SurfacePoint) float64 {
			v := parabola(joint + 0.4*step)(p)
			if p.Edge == first+1 {
				v += 0.01 * step * step
			}
			return v
		}, joint + 0.4*step},
		{"after a joint, the edge before it a little higher", func(p SurfacePoint) float64 {
			v := parabola(joint - 0.4*step)(p)
			if p.Edge == first {
				v += 0.01 * step * step
			}
			return v
		}, joint - 0.4*step},
	} {
		found := s.Maxima([]int{2}, row.of)
		if len(found) != 1 {
			t.Errorf("%s: %d maxima, want 1", row.name, len(found))
			continue
		}
		if got := found[0].At; !(math.Abs(got.X-row.x) < place) || !(math.Abs(got.Y-1) < 1e-14) {
			t.Errorf("%s: at %v, want x = %g", row.name, got, row.x)
		}
	}
}

// Several maxima come largest first, across sides that join, and nothing is
// found on sides that were not asked for.
func TestMaximaSeveral(t *testing.T) {
	s := strip(t)
	// Over the right end and the upper side, by length of boundary from (4, 0).
	along := func(p SurfacePoint) float64 {
		if p.Normal.X > 0.5 {
			return p.At.Y
		}
		return 1 + 4 - p.At.X
	}
	wave := func(p SurfacePoint) float64 { l := along(p); return 0.1*l - math.Cos(2*math.Pi*l) }
	found := s.Maxima([]int{1, 2}, wave)
	// 2π sin 2πl = −0.1 just past every half: five peaks, rising.
	delta := math.Asin(0.1/(2*math.Pi)) / (2 * math.Pi)
	if len(found) != 5 {
		t.Fatalf("%d maxima, want 5", len(found))
	}
	for i, p := range found {
		if want := 4.5 - float64(i) + delta; !(math.Abs(along(p)-want) < 2e-5) {
			t.Errorf("maximum %d at %g along the boundary, want %g", i, along(p), want)
		}
	}
	for _, p := range s.Maxima([]int{0}, wave) {
		if !(math.Abs(p.At.Y) < 1e-14) {
			t.Errorf("maximum at %v, off the side asked for", p.At)
		}
	}
	if got := s.Maxima(nil, wave); len(got) != 0 {
		t.Errorf("%d maxima on no side", len(got))
	}
}

// On a full circle, which is one closed side, a maximum away from its seam is
// found once and in its place.
func TestMaximaOnHole(t *testing.T) {
	region := polygon(pt(-2, -2), pt(2, -2), pt(2, 2), pt(-2, 2))
	region.Holes = []outline.Loop{{{Curve: outline.Arc{Radius: 1, Sweep: -2 * math.Pi}}}}
	m := generate(t, region, mesh.Sizing{Largest: 1})
	e := &exact{"", PlaneStress{}, steel, wavy(PlaneStress{})}
	s := e.sampled(m.Curve(6))
	const angle = 2.2
	want := pt(math.Cos(angle), math.Sin(angle))
	found := s.Maxima([]int{4}, func(p SurfacePoint) float64 { return r2.Dot(p.At, want) })
	if len(found) == 0 || !(r2.Norm(r2.Sub(found[0].At, want)) < 2e-5) {
		t.Fatalf("maxima %v, want one at %v", found, want)
	}
	if n := found[0].Normal; !(r2.Norm(r2.Add(n, want)) < 2e-5) {
		t.Errorf("normal %v does not point out of the material, into the hole", n)
	}
}
