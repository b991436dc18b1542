package outline

import (
	"math"
	"testing"

	"gonum.org/v1/gonum/spatial/r2"
)

// plate is a bar with a hole in the middle, a round notch on either side and
// a bolt hole above and below: its own mirror image.
func plate() *Region {
	return &Region{
		Outer: Loop{
			{"low", Line{vec(-20, -10), vec(-3, -10)}},
			{"notch", Arc{Center: vec(0, -10), Radius: 3, Start: math.Pi, Sweep: -math.Pi}},
			{"low", Line{vec(3, -10), vec(20, -10)}},
			{"right", Line{vec(20, -10), vec(20, 10)}},
			{"high", Line{vec(20, 10), vec(3, 10)}},
			{"notch", Arc{Center: vec(0, 10), Radius: 3, Start: 0, Sweep: -math.Pi}},
			{"high", Line{vec(-3, 10), vec(-20, 10)}},
			{"left", EllipticArc{Center: vec(-20, 0), A: 2, B: 10, Start: math.Pi / 2, Sweep: math.Pi}},
		},
		Holes: []Loop{
			{{"hole", EllipticArc{A: 4, B: 3, Start: 1, Sweep: -2 * math.Pi}}},
			circle(vec(10, 5), 1, -1), circle(vec(10, -5), 1, -1),
		},
	}
}

func TestHalves(t *testing.T) {
	whole := plate()
	if err := whole.Validate(); err != nil {
		t.Fatal(err)
	}
	half, err := whole.Half("axis")
	if err != nil {
		t.Fatal(err)
	}
	if err := half.Validate(); err != nil {
		t.Fatalf("half: %v", err)
	}
	if len(half.Holes) != 1 || len(half.Outer) != 9 {
		t.Errorf("half has %d holes and sides %v", len(half.Holes), half.Outer)
	}
	back, err := half.Whole()
	if err != nil {
		t.Fatal(err)
	}
	if err := back.Validate(); err != nil {
		t.Fatalf("whole again: %v", err)
	}
	p, h, q := whole.Properties(), half.Properties(), back.Properties()
	if !near(h.Area, p.Area/2, 1e-14) || !near(q.Area, p.Area, 1e-14) || !near(q.Ix, p.Ix, 1e-14) || !near(q.Iy, p.Iy, 1e-14) {
		t.Errorf("whole %+v, half %+v, whole again %+v", p, h, q)
	}
	again, err := back.Half("axis")
	if err != nil {
		t.Fatal(err)
	}
	if a, b := FormatPath(half.loops()), FormatPath(again.loops()); a != b {
		t.Errorf("half %q became %q", a, b)
	}
}

func TestHalvesErrors(t *testing.T) {
	off := plate()
	off.Holes[1] = circle(vec(10, 5.001), 1, -1)
	if _, err := off.Half("axis"); err == nil {
		t.Error("half of an outline that is not symmetric")
	}
	if _, err := (&Region{Outer: rectangle(0, 1, 1, 2)}).Half("axis"); err == nil {
		t.Error("half of an outline beside the axis")
	}
	if _, err := (&Region{Outer: rectangle(0, 1, 1, 2)}).Whole(); err == nil {
		t.Error("whole of an outline off the axis")
	}
	if _, err := plate().Whole(); err == nil {
		t.Error("whole of a whole")
	}
	apart := polygon(vec(0, -5), vec(3, -5), vec(3, 5), vec(0, 5))
	apart = append(apart, polygon(vec(6, -5), vec(9, -5), vec(9, 5), vec(6, 5))...)
	if _, err := (&Region{Outer: apart}).Half("axis"); err == nil {
		t.Error("half of two rectangles in one loop")
	}
	h := polygon(vec(0, -5), vec(3, -5), vec(3, 5), vec(0, 5))
	if r, err := (&Region{Outer: h}).Half("axis"); err != nil || len(r.Outer) != 4 || r.Outer[3].Name != "axis" {
		t.Errorf("half of a rectangle: %v, %v", r, err)
	}
}

func TestTransforms(t *testing.T) {
	r := plate()
	p := r.Properties()
	for name, c := range map[string]struct {
		r    *Region
		want func(v r2.Vec) r2.Vec
		f    float64
	}{
		"scaled":     {r.Scaled(25.4), func(v r2.Vec) r2.Vec { return r2.Scale(25.4, v) }, 25.4},
		"translated": {r.Translated(vec(3, 0.1)), func(v r2.Vec) r2.Vec { return r2.Add(v, vec(3, 0.1)) }, 1},
		"mirrored":   {r.Mirrored(), func(v r2.Vec) r2.Vec { return vec(v.X, -v.Y) }, 1},
	} {
		if err := c.r.Validate(); err != nil {
			t.Errorf("%s: %v", name, err)
		}
		q := c.r.Properties()
		if !near(q.Area, p.Area*c.f*c.f, 1e-14) || !near(q.Ix, p.Ix*math.Pow(c.f, 4), 1e-13) ||
			r2.Norm(r2.Sub(q.Centroid, c.want(p.Centroid))) > 1e-13*c.f {
			t.Errorf("%s: %+v from %+v", name, q, p)
		}
		for _, l := range c.r.loops() {
			for i, s := range l {
				if gap := r2.Norm(r2.Sub(s.Curve.At(1), l[(i+1)%len(l)].Curve.At(0))); gap > 1e-14*c.f*20 {
					t.Errorf("%s: gap of %g", name, gap)
				}
			}
		}
	}
	// Every kind of curve, point by point.
	for name, c := range kinds(t) {
		m, s := mirrored(c), similar(c, 2, vec(1, -1))
		a, b := c.At(0.3), c.At(0.8)
		cut := part(c, 0.3, 0.8, a, b)
		if cut.At(0) != a || cut.At(1) != b {
			t.Errorf("%s: part has other ends", name)
		}
		for k := range 11 {
			u := float64(k) / 10
			p := c.At(u)
			d := max(r2.Norm(r2.Sub(m.At(u), vec(p.X, -p.Y))),
				r2.Norm(r2.Sub(s.At(u), vec(2*p.X+1, 2*p.Y-1)))/2,
				r2.Norm(r2.Sub(cut.At(u), c.At(0.3+0.5*u))))
			if d > 1e-14*(1+size(c)) {
				t.Errorf("%s: off by %g at %g", name, d, u)
			}
		}
	}
}
