package outline

import (
	"math"
	"math/rand/v2"
	"testing"

	"gonum.org/v1/gonum/spatial/r2"
)

// close tells whether two numbers agree relative to a scale.
func near(got, want, tol float64) bool { return math.Abs(got-want) <= tol*math.Max(1, math.Abs(want)) }

func TestPropertiesKnown(t *testing.T) {
	const pi = math.Pi
	half := Loop{
		{"", Line{vec(-2, 1), vec(2, 1)}},
		{"", Arc{Center: vec(0, 1), Radius: 2, Start: 0, Sweep: pi}}}
	ellipse := Loop{{"", EllipticArc{Center: vec(5, -3), A: 3, B: 1, Start: 1, Sweep: 2 * pi}}}
	// x² under a parabola from (0,0) over the peak (1,1) to (2,0), from right
	// to left: y = 2x − x². Area 4/3, centroid (1, 2/5), by elementary
	// integration; Iy about x = 1: 2∫₀¹ u²(1−u²)du = 4/15, Ix about the chord
	// ∫ y³/3 = 2/3 ∫₀¹ (1−u²)³ du = 2/3 · 16/35.
	parabola := Loop{{"", Line{vec(0, 0), vec(2, 0)}}, {"", NewQuadratic(vec(2, 0), vec(1, 2), vec(0, 0))}}
	for name, c := range map[string]struct {
		r    *Region
		want Properties
	}{
		"rectangle": {&Region{Outer: rectangle(1, 2, 5, 4)},
			Properties{8, 12, vec(3, 3), 4. * 8 / 12, 2. * 64 / 12, 0}},
		"ring": {&Region{Outer: circle(vec(7, 7), 3, 1), Holes: []Loop{circle(vec(7, 7), 2, -1)}},
			Properties{5 * pi, 10 * pi, vec(7, 7), pi / 4 * 65, pi / 4 * 65, 0}},
		"half disc": {&Region{Outer: half},
			Properties{2 * pi, 4 + 2*pi, vec(0, 1+8/(3*pi)), 16 * (pi/8 - 8/(9*pi)), 16 * pi / 8, 0}},
		"ellipse": {&Region{Outer: ellipse},
			Properties{3 * pi, ellipse[0].Curve.Length(0, 1), vec(5, -3), pi / 4 * 3, pi / 4 * 27, 0}},
		"parabola": {&Region{Outer: parabola},
			Properties{4. / 3, 2 + math.Sqrt(5) + math.Asinh(2)/2, vec(1, 0.4), 2./3*16/35 - 4./3*0.16, 4. / 15, 0}},
	} {
		got := c.r.Properties()
		for what, v := range map[string][2]float64{
			"area": {got.Area, c.want.Area}, "perimeter": {got.Perimeter, c.want.Perimeter},
			"x": {got.Centroid.X, c.want.Centroid.X}, "y": {got.Centroid.Y, c.want.Centroid.Y},
			"Ix": {got.Ix, c.want.Ix}, "Iy": {got.Iy, c.want.Iy}, "Ixy": {got.Ixy, c.want.Ixy},
		} {
			if !near(v[0], v[1], 1e-14) {
				t.Errorf("%s: %s %.17g, want %.17g", name, what, v[0], v[1])
			}
		}
	}
}

// Turning and moving a shape turns its tensor of second moments.
func TestPropertiesTurn(t *testing.T) {
	tri := []r2.Vec{vec(0, 0), vec(4, 1), vec(1, 3)}
	p := (&Region{Outer: polygon(tri...)}).Properties()
	l0, s0, axis0 := p.Principal()
	for _, a := range []float64{0.3, 1, 2} {
		var q []r2.Vec
		for _, v := range tri {
			q = append(q, r2.Add(vec(50, -20), r2.Rotate(v, a, r2.Vec{})))
		}
		l, s, axis := (&Region{Outer: polygon(q...)}).Properties().Principal()
		turn := math.Remainder(axis-axis0-a, math.Pi)
		if !near(l, l0, 1e-12) || !near(s, s0, 1e-12) || math.Abs(turn) > 1e-12 {
			t.Errorf("turned by %g: %g %g at %g, was %g %g at %g", a, l, s, axis, l0, s0, axis0)
		}
	}
}

func TestCutKnown(t *testing.T) {
	r := stepped() // shoulder at 60, fillet centre at 63, 20 on 30, radius 3
	r.Holes = []Loop{circle(vec(100, 1), 4, -1)}
	h := 13 - math.Sqrt(9-4)
	for _, c := range []struct {
		x    float64
		want []Interval
	}{
		{-1, nil}, {121, nil},
		{0, []Interval{{-15, 15}}},
		{30, []Interval{{-15, 15}}},
		{60, []Interval{{-15, 15}}}, // closed: the face belongs to the thick end
		{60 + 1e-9, []Interval{{-13, 13}}},
		{61, []Interval{{-h, h}}},
		{63, []Interval{{-10, 10}}},
		{120, []Interval{{-10, 10}}},
		{96, []Interval{{-10, 10}}}, // the hole's edge is one point
		{100, []Interval{{-10, -3}, {5, 10}}},
		{104, []Interval{{-10, 10}}},
	} {
		got := r.CutX(c.x)
		ok := len(got) == len(c.want)
		tol := 1e-14
		if c.x == 60+1e-9 {
			tol = 1e-4 // the fillet starts square to the axis
		}
		for i := range c.want {
			ok = ok && near(got[i].Lo, c.want[i].Lo, tol) && near(got[i].Hi, c.want[i].Hi, tol)
		}
		if !ok {
			t.Errorf("x = %g: %v, want %v", c.x, got, c.want)
		}
	}
	got := r.CutSegment(vec(100, 20), vec(100, 0))
	if len(got) != 1 || !near(got[0].Lo, 10, 1e-14) || !near(got[0].Hi, 15, 1e-14) {
		t.Errorf("segment: %v", got)
	}
	if got = r.CutSegment(vec(3, 3), vec(3, 3)); got != nil {
		t.Errorf("segment without length: %v", got)
	}
}

// Cuts integrated over their position give the area, in every direction.
func TestCutAgainstArea(t *testing.T) {
	rng := rand.New(rand.NewPCG(11, 12))
	shape := &Region{Outer: Loop{
		{"", Line{vec(0, -5), vec(4, -5)}},
		{"", EllipticArc{Center: vec(4, -2), A: 2, B: 3, Start: -math.Pi / 2, Sweep: math.Pi}},
		{"wave", Bezier{[4]r2.Vec{vec(4, 1), vec(3, -2), vec(1, 2), vec(0, 0)}}},
		{"", Line{vec(0, 0), vec(0, -5)}}},
		Holes: []Loop{circle(vec(3, -3), 1, -1)}}
	if err := shape.Validate(); err != nil {
		t.Fatal(err)
	}
	area := shape.Properties().Area
	for range 5 {
		d := r2.Rotate(vec(1, 0), rng.Float64()*7, r2.Vec{})
		e := vec(-d.Y, d.X)
		const n = 20000
		k, sum := shape.cutter(d), 0.0
		for i := range n {
			depth := -20 + 40*(float64(i)+0.5)/n
			cut := k.cut(depth, false)
			sum += Bar(cut).Area * 40 / n
			if i%100 > 0 {
				continue
			}
			p := r2.Scale(depth, d)
			seg := Bar(shape.CutSegment(r2.Sub(p, r2.Scale(20, e)), r2.Add(p, r2.Scale(20, e))))
			if !near(seg.Area, Bar(cut).Area, 1e-9) {
				t.Errorf("direction %v, depth %g: segment %v, line %v", d, depth, seg, cut)
			}
		}
		// The midpoint rule errs by about h^1.5 at square roots.
		if !near(sum, area, 1e-4) {
			t.Errorf("direction %v: cuts sum to %g, area %g", d, sum, area)
		}
	}
}

// Points inside a cut are inside the region, points outside are not.
func TestCutAgainstContains(t *testing.T) {
	r := stepped()
	r.Holes = []Loop{circle(vec(100, 1), 4, -1), circle(vec(20, 1), 4, -1)}
	rng := rand.New(rand.NewPCG(13, 14))
	for range 2000 {
		p := vec(rng.Float64()*130-5, rng.Float64()*40-20)
		in := false
		for _, iv := range r.CutX(p.X) {
			in = in || p.Y > iv.Lo && p.Y < iv.Hi
		}
		if in != r.Contains(p) {
			t.Errorf("%v: inside by the cut %t, by winding %t", p, in, !in)
		}
	}
}

func TestSections(t *testing.T) {
	b := Bar([]Interval{{-10, -3}, {5, 10}})
	// Two rectangles of heights 7 and 5 at −6.5 and 7.5.
	c := (7*-6.5 + 5*7.5) / 12
	i := 343./12 + 125./12 + 7*(6.5+c)*(6.5+c) + 5*(7.5-c)*(7.5-c)
	if !near(b.Area, 12, 1e-15) || !near(b.Centroid, c, 1e-15) || !near(b.SecondMoment, i, 1e-15) || b.Lo != -10 || b.Hi != 10 {
		t.Errorf("bar %+v, want centroid %g, moment %g", b, c, i)
	}
	s := Shaft([]Interval{{-5, -2}, {2, 5}})
	if !near(s.Area, 21*math.Pi, 1e-15) || !near(s.PolarMoment, math.Pi/2*(625-16), 1e-15) ||
		s.SecondMoment*2 != s.PolarMoment || s.Inner != 2 || s.Outer != 5 {
		t.Errorf("shaft %+v", s)
	}
	if s := Shaft([]Interval{{-5, 5}}); s.Inner != 0 || !near(s.Area, 25*math.Pi, 1e-15) {
		t.Errorf("solid shaft %+v", s)
	}
	if Bar(nil) != (BarSection{}) || Shaft(nil) != (ShaftSection{}) {
		t.Error("an empty cut has a section")
	}
}

func TestSmallestSection(t *testing.T) {
	width := func(c []Interval) float64 { return Bar(c).Area }
	r := stepped()
	s, err := r.SmallestSection(0, 120, width)
	if err != nil || s.From != 63 || s.To != 120 || s.Value != 20 {
		t.Errorf("stepped bar: %+v, %v", s, err)
	}
	s, err = r.SmallestSection(10, 50, width)
	if err != nil || s.From != 10 || s.To != 50 || s.Value != 30 {
		t.Errorf("its thick end: %+v, %v", s, err)
	}
	s, err = r.SmallestSection(0, 61, width)
	if want := 2 * (13 - math.Sqrt(5)); err != nil || s.From != 61 || !near(s.Value, want, 1e-14) {
		t.Errorf("part of the fillet: %+v, %v", s, err)
	}
	r.Holes = []Loop{circle(vec(100, 1), 4, -1)}
	s, err = r.SmallestSection(0, 120, width)
	if err != nil || !near(s.From, 100, 1e-14) || s.From != s.To || !near(s.Value, 12, 1e-14) || len(s.Cut) != 2 {
		t.Errorf("with a hole: %+v, %v", s, err)
	}
	// Two notches not opposite each other: the least width lies between the
	// roots. By symmetry it is half way, here x = 1, with width 2·f(1).
	skew := &Region{Outer: Loop{
		{"low notch", Arc{Center: vec(0, -10), Radius: 8, Start: math.Pi, Sweep: -math.Pi}},
		{"", Line{vec(8, -10), vec(14, -10)}},
		{"", Line{vec(14, -10), vec(14, 10)}},
		{"", Line{vec(14, 10), vec(10, 10)}},
		{"high notch", Arc{Center: vec(2, 10), Radius: 8, Start: 0, Sweep: -math.Pi}},
		{"", Line{vec(-6, 10), vec(-12, 10)}},
		{"", Line{vec(-12, 10), vec(-12, -10)}},
		{"", Line{vec(-12, -10), vec(-8, -10)}}}}
	if err := skew.Validate(); err != nil {
		t.Fatal(err)
	}
	s, err = skew.SmallestSection(-12, 14, width)
	if want := 2 * (10 - math.Sqrt(63)); err != nil || !near(s.From, 1, 1e-7) || !near(s.Value, want, 1e-14) {
		t.Errorf("skew notches: %+v, want %g, %v", s, want, err)
	}
	for _, x := range [][2]float64{{5, 5}, {7, 3}, {-5, 10}, {100, 130}, {math.NaN(), 1}} {
		if _, err := r.SmallestSection(x[0], x[1], width); err == nil {
			t.Errorf("range %v accepted", x)
		}
	}
}

func BenchmarkCutX(b *testing.B) {
	r := stepped()
	for b.Loop() {
		r.CutX(61)
	}
}

func BenchmarkProperties(b *testing.B) {
	r := stepped()
	for b.Loop() {
		r.Properties()
	}
}
