package outline

import (
	"errors"
	"math"
	"math/rand/v2"
	"strings"
	"testing"

	"gonum.org/v1/gonum/spatial/r2"
)

func vec(x, y float64) r2.Vec { return r2.Vec{X: x, Y: y} }

// polygon joins points by lines.
func polygon(ps ...r2.Vec) Loop {
	var l Loop
	for i, p := range ps {
		l = append(l, Side{Curve: Line{p, ps[(i+1)%len(ps)]}})
	}
	return l
}

func rectangle(x0, y0, x1, y1 float64) Loop {
	return polygon(vec(x0, y0), vec(x1, y0), vec(x1, y1), vec(x0, y1))
}

// circle is one arc; a hole wants it clockwise.
func circle(c r2.Vec, r float64, sense float64) Loop {
	return Loop{{Name: "circle", Curve: Arc{Center: c, Radius: r, Start: 0.3, Sweep: sense * 2 * math.Pi}}}
}

// stepped is a bar with a fillet on either shoulder, ten sides.
func stepped() *Region {
	const D, d, r, L = 30.0, 20.0, 3.0, 60.0
	x := L + r
	return &Region{Outer: Loop{
		{"left", Line{vec(0, D/2), vec(0, -D/2)}},
		{"low", Line{vec(0, -D/2), vec(L, -D/2)}},
		{"step", Line{vec(L, -D/2), vec(L, -d/2-r)}},
		{"fillet", Arc{Center: vec(x, -d/2-r), Radius: r, Start: math.Pi, Sweep: -math.Pi / 2}},
		{"net", Line{vec(x, -d/2), vec(2*L, -d/2)}},
		{"right", Line{vec(2*L, -d/2), vec(2*L, d/2)}},
		{"net", Line{vec(2*L, d/2), vec(x, d/2)}},
		{"fillet", Arc{Center: vec(x, d/2+r), Radius: r, Start: -math.Pi / 2, Sweep: -math.Pi / 2}},
		{"step", Line{vec(L, d/2+r), vec(L, D/2)}},
		{"high", Line{vec(L, D/2), vec(0, D/2)}},
	}}
}

func TestValidateAccepts(t *testing.T) {
	square := rectangle(0, 0, 10, 10)
	for name, r := range map[string]*Region{
		"stepped": stepped(),
		"square":  {Outer: square},
		"disc":    {Outer: circle(vec(1, 2), 3, 1)},
		"ring":    {Outer: circle(vec(1, 2), 3, 1), Holes: []Loop{circle(vec(1, 2), 2.999, -1)}},
		"close ring": {Outer: circle(vec(1, 2), 3, 1),
			Holes: []Loop{circle(vec(1, 2), 3*(1-1e-7), -1)}},
		"holes": {Outer: square, Holes: []Loop{circle(vec(2, 2), 1, -1), circle(vec(5, 5), 2, -1)}},
		"hole close to the edge": {Outer: square,
			Holes: []Loop{circle(vec(5, 2), 2-1e-6, -1)}},
		"lens": {Outer: Loop{
			{"chord", Line{vec(-1, 0), vec(1, 0)}},
			{"bow", Arc{Center: vec(0, -1), Radius: math.Sqrt2, Start: math.Pi / 4, Sweep: math.Pi / 2}}}},
		"two arcs": {Outer: Loop{
			{"low", Arc{Radius: 1, Start: math.Pi, Sweep: math.Pi}},
			{"high", EllipticArc{A: 1, B: 0.1, Sweep: math.Pi}}}},
		"wedge of 0.1 degrees": {Outer: polygon(vec(0, 0), vec(100, 0), vec(100, 0.18))},
		"slit of 0.1 degrees":  {Outer: polygon(vec(0, 0), vec(100, 0), vec(100, 50), vec(1, 50), vec(90, 50.2), vec(0, 60))},
		"arc leaving at a small angle": {Outer: Loop{
			{"arc", Arc{Center: vec(0, -1), Radius: 1, Start: math.Pi/2 + 0.02, Sweep: -0.02}},
			{"", Line{vec(0, 0), vec(1, 0)}},
			{"", Line{vec(1, 0), vec(1, 1)}},
			{"", Line{vec(1, 1), Arc{Center: vec(0, -1), Radius: 1, Start: math.Pi/2 + 0.02}.At(0)}}}},
		"teardrop": {Outer: Loop{{"", Bezier{[4]r2.Vec{vec(0, 0), vec(4, 1), vec(1, 4), vec(0, 0)}}}}},
		"wave": {Outer: Loop{
			{"", Line{vec(0, -5), vec(4, -5)}},
			{"", Line{vec(4, -5), vec(4, 1)}},
			{"wave", Bezier{[4]r2.Vec{vec(4, 1), vec(3, -2), vec(1, 2), vec(0, 0)}}},
			{"", Line{vec(0, 0), vec(0, -5)}}}},
	} {
		if err := r.Validate(); err != nil {
			t.Errorf("%s: %v", name, err)
		}
	}
}

func TestValidateFaults(t *testing.T) {
	square := rectangle(0, 0, 10, 10)
	hole := func(ls ...Loop) *Region { return &Region{Outer: square, Holes: ls} }
	with := func(c Curve) *Region { // a square with one side replaced
		l := rectangle(0, 0, 10, 10)
		l[1] = Side{"odd", c}
		return &Region{Outer: l}
	}
	for name, c := range map[string]struct {
		r    *Region
		kind FaultKind
		says string
	}{
		"empty":        {&Region{}, NoSides, "outer loop has no sides"},
		"empty hole":   {hole(Loop{}), NoSides, "hole 1"},
		"NaN":          {with(Line{vec(10, 0), vec(10, math.NaN())}), NotFinite, `"odd" (side 2 of the outer loop)`},
		"Inf":          {with(Arc{Center: vec(10, 5), Radius: math.Inf(1), Sweep: 1}), NotFinite, "odd"},
		"NaN control":  {with(Bezier{[4]r2.Vec{vec(10, 0), vec(math.NaN(), 0), vec(10, 10), vec(10, 10)}}), NotFinite, "odd"},
		"no length":    {with(Line{vec(10, 0), vec(10, 0)}), NoLength, "(10, 0)"},
		"no radius":    {with(Arc{Center: vec(10, 0), Radius: 0, Sweep: 1}), NoRadius, "odd"},
		"negative B":   {with(EllipticArc{Center: vec(10, 0), A: 1, B: -1, Sweep: 1}), NoRadius, "odd"},
		"no sweep":     {with(Arc{Center: vec(10, 0), Radius: 1}), NoLength, "odd"},
		"two turns":    {with(Arc{Center: vec(10, 0), Radius: 1, Sweep: 13}), FullTurn, "odd"},
		"gap":          {with(Line{vec(10, 0.001), vec(10, 10)}), Gap, "gap of 0.001 at (10, 0)"},
		"stall at end": {with(Bezier{[4]r2.Vec{vec(10, 0), vec(10, 0), vec(12, 8), vec(10, 10)}}), Stall, "(10, 0)"},
		"cubic with a cusp": {&Region{Outer: Loop{
			{"cusp", Bezier{[4]r2.Vec{vec(0, 0), vec(6, 6), vec(0, 6), vec(6, 0)}}},
			{"", Line{vec(6, 0), vec(6, 9)}}, {"", Line{vec(6, 9), vec(0, 9)}}, {"", Line{vec(0, 9), vec(0, 0)}}}}, Stall, "(3, 4.5)"},
		"spike":          {&Region{Outer: polygon(vec(0, 0), vec(10, 0), vec(10, 10), vec(10, 12), vec(10, 10), vec(0, 10))}, Cusp, "(10, 12)"},
		"slit":           {&Region{Outer: polygon(vec(0, 0), vec(10, 0), vec(5, 0), vec(5, 10))}, Cusp, "(10, 0)"},
		"tangent cusp":   {&Region{Outer: Loop{{"", Line{vec(0, 0), vec(1, 0)}}, {"", Arc{Center: vec(1, 1), Radius: 1, Start: -math.Pi / 2, Sweep: -math.Pi / 2}}, {"", Line{vec(0, 1), vec(0, 0)}}}}, Cusp, "(1, 0)"},
		"bow tie":        {&Region{Outer: polygon(vec(0, 0), vec(10, 10), vec(10, 0), vec(0, 10))}, Meeting, "side 1 of the outer loop and side 3 of the outer loop cross or touch at (5, 5)"},
		"corner on side": {&Region{Outer: polygon(vec(0, 0), vec(10, 0), vec(10, 10), vec(5, 0), vec(0, 10))}, Meeting, "(5, 0)"},
		"corners meet":   {&Region{Outer: polygon(vec(0, 0), vec(4, 0), vec(5, 5), vec(6, 0), vec(10, 0), vec(10, 10), vec(5, 5), vec(0, 10))}, Meeting, "(5, 5)"},
		"looped cubic": {&Region{Outer: Loop{{"loop", Bezier{[4]r2.Vec{vec(0, 0), vec(9, 6), vec(-6, 6), vec(3, 0)}}},
			{"", Line{vec(3, 0), vec(3, -1)}}, {"", Line{vec(3, -1), vec(0, 0)}}}}, Meeting, `"loop" (side 1 of the outer loop) crosses or touches itself at (1.5,`},
		"clockwise":        {&Region{Outer: circle(vec(0, 0), 1, -1)}, WrongWay, "outer loop"},
		"hole ccw":         {hole(circle(vec(5, 5), 1, 1)), WrongWay, "hole 1"},
		"hole touches":     {hole(circle(vec(5, 2), 2, -1)), Meeting, "(5, 0)"},
		"hole crosses":     {hole(circle(vec(5, 2), 3, -1)), Meeting, `side 1 of the outer loop and "circle" (side 1 of hole 1) cross`},
		"hole outside":     {hole(circle(vec(15, 2), 2, -1)), Outside, "hole 1"},
		"around":           {&Region{Outer: circle(vec(0, 0), 1, 1), Holes: []Loop{circle(vec(0, 0), 2, -1)}}, Outside, "hole 1"},
		"holes touch":      {hole(circle(vec(3, 5), 1, -1), circle(vec(5, 5), 1, -1)), Meeting, "(4, 5)"},
		"hole in hole":     {hole(circle(vec(5, 5), 1, -1), circle(vec(5, 5), 2, -1)), Nested, "hole 1 lies inside hole 2"},
		"hole over itself": {hole(circle(vec(5, 5), 1, -1), circle(vec(5, 5), 1, -1)), Meeting, "hole 1"},
	} {
		err := c.r.Validate()
		var f *Fault
		if !errors.As(err, &f) {
			t.Errorf("%s: no fault but %v", name, err)
			continue
		}
		msg := err.Error()
		if f.Kind != c.kind || !strings.Contains(msg, c.says) {
			t.Errorf("%s: kind %d %q, want kind %d and %q", name, f.Kind, msg, c.kind, c.says)
		}
		if strings.Contains(msg, "\n") {
			t.Errorf("%s: message of several lines: %q", name, msg)
		}
	}
}

// Validate must not depend on where the region lies, how large it is, which
// way up it is and with which side its loop begins.
func TestValidateInvariant(t *testing.T) {
	rng := rand.New(rand.NewPCG(5, 6))
	for range 200 {
		a, s := rng.Float64()*7, math.Exp(10*rng.NormFloat64())
		at := r2.Scale(s, vec(rng.NormFloat64(), rng.NormFloat64()))
		touch := rng.Float64() < 0.5
		y := 2 + 1e-6
		if touch {
			y = 2
		}
		put := func(p r2.Vec) r2.Vec { return r2.Add(at, r2.Scale(s, r2.Rotate(p, a, r2.Vec{}))) }
		l := polygon(put(vec(0, 0)), put(vec(10, 0)), put(vec(10, 10)), put(vec(0, 10)))
		k := rng.IntN(4)
		l = append(l[k:], l[:k]...)
		r := &Region{Outer: l, Holes: []Loop{{{"", Arc{Center: put(vec(5, y)), Radius: 2 * s, Start: rng.Float64() * 7, Sweep: -2 * math.Pi}}}}}
		if err := r.Validate(); (err != nil) != touch {
			t.Fatalf("turned %g, scale %g, touching %t: %v", a, s, touch, err)
		}
	}
}

// Random wiggly loops: Validate against dense polygons tested pair by pair.
func TestMeetingAgainstPolygons(t *testing.T) {
	rng := rand.New(rand.NewPCG(7, 8))
	good, bad := 0, 0
	for range 400 {
		var ps [6]r2.Vec
		for k := range ps {
			ps[k] = r2.Rotate(vec(1+0.3*rng.NormFloat64(), 0), 2*math.Pi*(float64(k)+0.4*rng.NormFloat64())/6, r2.Vec{})
		}
		var l Loop
		for k, p := range ps {
			q := ps[(k+1)%6]
			m := func() r2.Vec {
				return r2.Add(mix(p, q, rng.Float64()), vec(0.4*rng.NormFloat64(), 0.4*rng.NormFloat64()))
			}
			l = append(l, Side{"", Bezier{[4]r2.Vec{p, m(), m(), q}}})
		}
		const n = 100
		var dense []r2.Vec
		for _, s := range l {
			for k := range n {
				dense = append(dense, s.Curve.At(float64(k)/n))
			}
		}
		crossings := 0
		for i := range dense {
			for j := i + 2; j < len(dense); j++ {
				if (j+1)%len(dense) == i {
					continue
				}
				a, b, c, d := dense[i], dense[i+1], dense[j], dense[(j+1)%len(dense)]
				if side(a, b, c)*side(a, b, d) < 0 && side(c, d, a)*side(c, d, b) < 0 {
					crossings++
				}
			}
		}
		err := (&Region{Outer: l}).Validate()
		var f *Fault
		errors.As(err, &f)
		met := f != nil && f.Kind == Meeting
		if f != nil && !met && f.Kind != WrongWay {
			t.Errorf("unexpected: %v", err)
		}
		if crossings > 0 {
			bad++
		} else {
			good++
		}
		if crossings > 0 && !met {
			t.Errorf("%d crossings of polygons, but %v\n%v", crossings, err, l)
		}
		if met {
			checkMeeting(t, l)
		}
	}
	if good < 20 || bad < 20 {
		t.Errorf("one-sided test: %d good, %d bad", good, bad)
	}
}

// checkMeeting makes sure that a meeting found is one: the place is on both
// curves, and not their common end. (Polygons may miss it, close to a corner.)
func checkMeeting(t *testing.T, l Loop) {
	sides, p, found := findMeeting([][]piece{l.pieces(0, 1e-8)}, 1e-9)
	if !found {
		t.Fatal("meeting lost")
	}
	for _, k := range sides {
		c := l[k].Curve
		u := c.Nearest(p)
		if d := r2.Norm(r2.Sub(c.At(u), p)); d > 1e-9 {
			t.Errorf("meeting at %v is %g away from side %d", p, d, k)
		}
		if sides[0] != sides[1] && (u < 1e-6 || u > 1-1e-6) {
			t.Errorf("meeting at %v is an end of side %d", p, k)
		}
	}
}

// The most sides that path data can bring, once harmless and once as a star
// whose thousand long sides all cross near the middle.
func TestValidateMany(t *testing.T) {
	const n = mostPathSides - 1 // odd
	ps := make([]r2.Vec, n)
	for k := range ps {
		ps[k] = r2.Rotate(vec(1, 0), 2*math.Pi*float64(k)/n, r2.Vec{})
	}
	if err := (&Region{Outer: polygon(ps...)}).Validate(); err != nil {
		t.Error(err)
	}
	star := make([]r2.Vec, n)
	for k := range star {
		star[k] = ps[k*(n/2)%n]
	}
	if err := (&Region{Outer: polygon(star...)}).Validate(); err == nil {
		t.Error("star accepted")
	}
	// A comb of long thin teeth: all boxes overlap in x, none meet.
	var comb []r2.Vec
	for k := range n / 4 {
		y := float64(k)
		comb = append(comb, vec(0.001*y, y), vec(1000+0.001*y, y), vec(1000+0.001*y, y+0.5), vec(1+0.001*y, y+0.5))
	}
	comb = append(comb, vec(1+0.001*n/4, n/4+1), vec(-1, n/4+1), vec(-1, 0))
	if err := (&Region{Outer: polygon(comb...)}).Validate(); err != nil {
		t.Error(err)
	}
}

func BenchmarkValidate(b *testing.B) {
	r := stepped()
	for b.Loop() {
		if err := r.Validate(); err != nil {
			b.Fatal(err)
		}
	}
}
