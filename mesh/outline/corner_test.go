package outline

import (
	"math"
	"reflect"
	"testing"

	"gonum.org/v1/gonum/spatial/r2"
)

func TestCorners(t *testing.T) {
	l := polygon(vec(0, 0), vec(10, 0), vec(10, 4), vec(4, 4), vec(4, 10), vec(0, 10))
	hole := polygon(vec(1, 1), vec(1, 2), vec(2, 1)) // clockwise
	got := (&Region{Outer: l, Holes: []Loop{hole}}).Corners()
	want := []Corner{
		{vec(0, 0), 90, 5, 0}, {vec(10, 0), 90, 0, 1}, {vec(10, 4), 90, 1, 2},
		{vec(4, 4), 270, 2, 3}, {vec(4, 10), 90, 3, 4}, {vec(0, 10), 90, 4, 5},
		{vec(1, 1), 270, 8, 6}, {vec(1, 2), 315, 6, 7}, {vec(2, 1), 315, 7, 8},
	}
	if len(got) != len(want) {
		t.Fatalf("%v", got)
	}
	for i, c := range got {
		w := want[i]
		if math.Abs(c.Degrees-w.Degrees) > 1e-12 {
			t.Errorf("%v, want %v", c, w)
		}
		if c.Reentrant() != (w.Degrees > 180) {
			t.Errorf("%v: re-entrant %t", c, c.Reentrant())
		}
		w.Degrees = c.Degrees
		if c != w {
			t.Errorf("%v, want %v", c, w)
		}
	}
	// The fillets of the stepped bar join the net section smoothly, the faces
	// not at all; only convex corners are left.
	for _, c := range stepped().Corners() {
		if c.Reentrant() || math.Abs(c.Degrees-90) > 1e-12 {
			t.Errorf("stepped bar: %v", c)
		}
	}
	if cs := (&Region{Outer: circle(vec(0, 0), 1, 1)}).Corners(); cs != nil {
		t.Errorf("circle: %v", cs)
	}
}

func TestConcaveRuns(t *testing.T) {
	r := stepped()
	r.Holes = []Loop{circle(vec(100, 1), 4, -1), rectangle(10, -1, 11, 1).reverse()}
	want := []Run{{0, []int{3}, false}, {0, []int{7}, false}, {1, []int{10}, true}}
	if got := r.ConcaveRuns(); !reflect.DeepEqual(got, want) {
		t.Errorf("%v, want %v", got, want)
	}
	// A root of three arcs across the loop's first corner, and a wave.
	arc := func(from, sweep float64) Arc {
		return Arc{Center: vec(0, 0), Radius: 1, Start: from, Sweep: sweep}
	}
	notch := &Region{Outer: Loop{
		{"b", arc(2, -1)}, {"c", EllipticArc{A: 1, B: 1, Start: 1, Sweep: -1}},
		{"", Line{vec(1, 0), vec(5, 0)}}, {"", Line{vec(5, 0), vec(5, 5)}},
		{"wave", Bezier{[4]r2.Vec{vec(5, 5), vec(3, 3), vec(-2, 7), vec(-5, 5)}}},
		{"", Line{vec(-5, 5), vec(-5, 0)}}, {"", Line{vec(-5, 0), vec(-1, 0)}},
		{"a", arc(math.Pi, 2-math.Pi)}}}
	if err := notch.Validate(); err != nil {
		t.Fatal(err)
	}
	want = []Run{{0, []int{4}, false}, {0, []int{7, 0, 1}, false}}
	if got := notch.ConcaveRuns(); !reflect.DeepEqual(got, want) {
		t.Errorf("%v, want %v", got, want)
	}
}
