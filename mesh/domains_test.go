package mesh

import (
	"fmt"
	"math"
	"testing"

	"notchproof/mesh/outline"
)

func TestHolesAndNotches(t *testing.T) {
	for _, r := range []float64{0.45, 0.1, 1e-2, 1e-4, 1e-6} {
		size := Sizing{Sides: []SideWish{{Side: 4, PerQuarter: 4}}}
		check(t, fmt.Sprintf("hole %g", r), holed(3, 1, [3]float64{1, 0.5, r}), size, 25)
		check(t, fmt.Sprintf("hole %g, no wish", r), holed(3, 1, [3]float64{1, 0.5, r}), Sizing{}, 25)
		check(t, fmt.Sprintf("notch %g", r), notched(2, 1, r), Sizing{Sides: []SideWish{{Side: 3, PerQuarter: 4}}}, 25)
		gap := r / 100
		two := holed(4, 2, [3]float64{1, 1, r}, [3]float64{1 + 2*r + gap, 1, r})
		check(t, fmt.Sprintf("two holes %g", r), two, Sizing{}, 25)
		eccentric := holed(2, 2, [3]float64{1, 1, r})
		eccentric.Outer = outline.Loop{arc(pt(1, 1+r/50), r*1.03, 0, 2*math.Pi)}
		check(t, fmt.Sprintf("thin ring %g", r), eccentric, Sizing{}, 25)
	}
}

func TestSharpCorners(t *testing.T) {
	for _, deg := range []float64{60, 59, 45, 30, 20, 10, 5, 2, 1, 0.1} {
		a := deg * math.Pi / 180
		far := pt(math.Cos(a), math.Sin(a))
		tri := &outline.Region{Outer: polygon(pt(0, 0), pt(1, 0), far)}
		for _, size := range []Sizing{{}, {Largest: 0.1}, {Largest: 0.013}, {Spots: []SpotWish{{At: pt(0, 0), Size: 0.01}}}} {
			check(t, fmt.Sprintf("triangle %g°", deg), tri, size, 0)
		}
		lens := &outline.Region{Outer: polygon(pt(-2, -1), pt(0, -1), pt(0.3, 0), pt(3, 0), pt(3*math.Cos(a), 3*math.Sin(a)), pt(0.3, 0.0+1e-9+1), pt(-2, 3))}
		check(t, fmt.Sprintf("other %g°", deg), lens, Sizing{Largest: 0.5}, 0)
		// Slots: a sharp corner between two circular sides.
		c := math.Cos(a / 2)
		sharp := &outline.Region{Outer: outline.Loop{
			arc(pt(0, c), 1, -math.Pi/2-a/2, a), arc(pt(0, -c), 1, math.Pi/2-a/2, a)}}
		check(t, fmt.Sprintf("lens %g°", deg), sharp, Sizing{}, 0)
	}
}

// Sides that meet tangentially leave a cusp, where no good triangle fits.
func TestCusp(t *testing.T) {
	region := &outline.Region{Outer: outline.Loop{
		line(pt(0, 0), pt(1, 0)), line(pt(1, 0), pt(1, 1)),
		arc(pt(0, 1), 1, 0, -math.Pi/2),
	}}
	for _, size := range []Sizing{{}, {Largest: 0.05}, {Sides: []SideWish{{Side: 2, PerQuarter: 20}}}} {
		check(t, "cusp of arc and line", region, size, 0)
	}
	region = &outline.Region{Outer: outline.Loop{
		arc(pt(0, 1), 1, -math.Pi/2, 2*math.Pi), arc(pt(0, 0.5), 0.5, -math.Pi/2, -2*math.Pi),
	}}
	if _, err := Generate(region, Sizing{}); err == nil {
		t.Error("circles that touch from inside: no error")
	}
}

func TestNecks(t *testing.T) {
	for _, w := range []float64{0.3, 0.1, 1e-2, 1e-3, 1e-4} {
		neck := &outline.Region{Outer: polygon(pt(0, 0), pt(1, 0), pt(1, 0.5), pt(1.2, 0.5), pt(1.2, 0), pt(2, 0), pt(2, 1), pt(1.2, 1), pt(1.2, 0.5+w), pt(1, 0.5+w), pt(1, 1), pt(0, 1))}
		check(t, fmt.Sprintf("neck %g", w), neck, Sizing{}, 25)
		slot := &outline.Region{Outer: polygon(pt(0, 0), pt(2, 0), pt(2, 1), pt(1+w, 1), pt(1+w, 0.5), pt(1, 0.5), pt(1, 1), pt(0, 1))}
		check(t, fmt.Sprintf("slot %g", w), slot, Sizing{}, 25)
	}
}

func TestMistakes(t *testing.T) {
	square := polygon(pt(0, 0), pt(1, 0), pt(1, 1), pt(0, 1))
	cw := polygon(pt(0, 0), pt(0, 1), pt(1, 1), pt(1, 0))
	hole := polygon(pt(0.2, 0.2), pt(0.2, 0.4), pt(0.4, 0.4), pt(0.4, 0.2))
	for _, c := range []struct {
		name   string
		region outline.Region
	}{
		{"empty", outline.Region{}},
		{"clockwise", outline.Region{Outer: cw}},
		{"hole counter-clockwise", outline.Region{Outer: square, Holes: []outline.Loop{polygon(pt(0.2, 0.2), pt(0.4, 0.2), pt(0.4, 0.4))}}},
		{"hole outside", outline.Region{Outer: square, Holes: []outline.Loop{polygon(pt(2.2, 0.2), pt(2.2, 0.4), pt(2.4, 0.4))}}},
		{"hole in hole", outline.Region{Outer: square, Holes: []outline.Loop{hole, polygon(pt(0.25, 0.25), pt(0.25, 0.35), pt(0.35, 0.35))}}},
		{"hole twice", outline.Region{Outer: square, Holes: []outline.Loop{hole, hole}}},
		{"bow tie", outline.Region{Outer: polygon(pt(0, 0), pt(1, 1), pt(1, 0), pt(0, 1))}},
		{"unequal bow tie", outline.Region{Outer: polygon(pt(0, 0), pt(1, 1), pt(1, 0), pt(0, 0.5))}},
		{"far away", outline.Region{Outer: polygon(pt(1e9, 0), pt(1e9+1, 0), pt(1e9+1, 1))}},
		{"touching itself", outline.Region{Outer: polygon(pt(0, 0), pt(2, 0), pt(2, 2), pt(1, 0), pt(0, 2))}},
		{"vertex twice", outline.Region{Outer: polygon(pt(0, 0), pt(2, 0), pt(2, 2), pt(1, 1), pt(0, 2), pt(0, 1), pt(1, 1), pt(0, 0.5))}},
		{"flat", outline.Region{Outer: polygon(pt(0, 0), pt(1, 0), pt(2, 0))}},
		{"back and forth", outline.Region{Outer: polygon(pt(0, 0), pt(1, 0))}},
		{"open", outline.Region{Outer: outline.Loop{line(pt(0, 0), pt(1, 0)), line(pt(1, 0), pt(0, 1))}}},
		{"no length", outline.Region{Outer: polygon(pt(0, 0), pt(1, 0), pt(1, 0), pt(0, 1))}},
		{"NaN", outline.Region{Outer: polygon(pt(0, 0), pt(math.NaN(), 0), pt(0, 1))}},
		{"infinite", outline.Region{Outer: polygon(pt(0, 0), pt(math.Inf(1), 0), pt(0, 1))}},
		{"hole cuts the edge", *holed(1, 1, [3]float64{0, 0.5, 0.1})},
		{"holes cross", *holed(1, 1, [3]float64{0.5, 0.5, 0.1}, [3]float64{0.65, 0.5, 0.1})},
		{"holes touch", *holed(1, 1, [3]float64{0.5, 0.5, 0.1}, [3]float64{0.7, 0.5, 0.1})},
		{"hole touches", *holed(1, 1, [3]float64{0.5, 0.25, 0.25})},
		{"one line", outline.Region{Outer: outline.Loop{line(pt(0, 0), pt(1, 0))}}},
		{"circles touch from inside", outline.Region{Outer: outline.Loop{arc(pt(0, 1), 1, 0, 2*math.Pi)}, Holes: []outline.Loop{{arc(pt(0, 0.5), 0.5, 0, -2*math.Pi)}}}},
		{"nil curve", outline.Region{Outer: outline.Loop{{}}}},
	} {
		m, err := Generate(&c.region, Sizing{})
		if err == nil {
			t.Errorf("%s: a mesh of %d triangles, valid: %v", c.name, len(m.Triangles), m.Validate())
			continue
		}
		t.Logf("%s: %v", c.name, err)
	}
	for _, s := range []Sizing{{Largest: -1}, {Largest: math.NaN()}, {Growth: -1}, {Growth: math.NaN()},
		{Sides: []SideWish{{Side: 4, Size: 1}}}, {Sides: []SideWish{{Side: 0, Size: -1}}}, {Sides: []SideWish{{PerQuarter: -1}}},
		{Spots: []SpotWish{{}}}, {Spots: []SpotWish{{At: pt(math.NaN(), 0), Size: 1}}}, {Largest: 1e-5}, {Sides: []SideWish{{Side: 0, Size: 1e-8}}}} {
		m, err := Generate(&outline.Region{Outer: square}, s)
		if err == nil {
			t.Errorf("%+v: a mesh of %d triangles", s, len(m.Triangles))
			continue
		}
		t.Logf("%+v: %v", s, err)
	}
}
