package outline

import (
	"fmt"
	"math"
	"math/rand/v2"
	"testing"

	"gonum.org/v1/gonum/spatial/r2"
)

// kinds lists curves of every kind, easy and awkward ones.
func kinds(t *testing.T) map[string]Curve {
	arc, err := NewArc(r2.Vec{X: 3, Y: 1}, r2.Vec{X: 1, Y: 3}, r2.Vec{X: 1, Y: 1}, true)
	if err != nil {
		t.Fatal(err)
	}
	major, err := NewArc(r2.Vec{X: 3, Y: 1}, r2.Vec{X: 1, Y: 3}, r2.Vec{X: 1, Y: 1}, false)
	if err != nil {
		t.Fatal(err)
	}
	end, err := EndpointArc(r2.Vec{X: 0.1, Y: 0.7}, r2.Vec{X: 2.3, Y: -0.4}, 3, 1.2, 0.6, true, false)
	if err != nil {
		t.Fatal(err)
	}
	return map[string]Curve{
		"line":              Line{r2.Vec{X: -1, Y: 2}, r2.Vec{X: 4, Y: -0.3}},
		"upright line":      Line{r2.Vec{X: 1, Y: 2}, r2.Vec{X: 1, Y: 7}},
		"quarter":           Arc{Center: r2.Vec{X: 1, Y: 2}, Radius: 2, Start: math.Pi, Sweep: math.Pi / 2},
		"clockwise":         Arc{Center: r2.Vec{X: -1, Y: 2}, Radius: 0.3, Start: 2, Sweep: -4},
		"circle":            Arc{Center: r2.Vec{X: -1, Y: 2}, Radius: 3, Start: 0.3, Sweep: 2 * math.Pi},
		"flat arc":          Arc{Center: r2.Vec{Y: -1000}, Radius: 1000, Start: 1.57, Sweep: 0.002},
		"arc by ends":       arc,
		"major arc by ends": major,
		"ellipse":           EllipticArc{Center: r2.Vec{X: 1}, A: 3, B: 1, Tilt: 0.4, Start: -2, Sweep: 2 * math.Pi},
		"slim ellipse":      EllipticArc{Center: r2.Vec{X: 1}, A: 0.05, B: 2, Start: 0.2, Sweep: -5},
		"elliptic fillet":   EllipticArc{Center: r2.Vec{X: 1}, A: 3, B: 1, Start: math.Pi, Sweep: math.Pi / 2},
		"round ellipse":     EllipticArc{A: 2, B: 2, Tilt: 1, Start: 1, Sweep: 3},
		"elliptic by ends":  end,
		"cubic":             Bezier{[4]r2.Vec{{}, {X: 1, Y: 2}, {X: 3, Y: -2}, {X: 4, Y: 1}}},
		"looped cubic":      Bezier{[4]r2.Vec{{}, {X: 5, Y: 3}, {X: -2, Y: 3}, {X: 3, Y: 0}}},
		"quadratic":         NewQuadratic(r2.Vec{}, r2.Vec{X: 1, Y: 3}, r2.Vec{X: 2, Y: -1}),
	}
}

// conform runs one check over all kinds and their reverses.
func conform(t *testing.T, check func(t *testing.T, c Curve)) {
	for name, c := range kinds(t) {
		t.Run(name, func(t *testing.T) { check(t, c) })
		t.Run(name+" reversed", func(t *testing.T) { check(t, c.Reverse()) })
	}
}

// size is a length to measure errors of a curve by.
func size(c Curve) float64 {
	b := c.Bounds()
	s := max(r2.Norm(b.Min), r2.Norm(b.Max))
	if a, ok := c.(Arc); ok { // its coordinates are sums of these
		s = max(s, r2.Norm(a.Center), a.Radius)
	}
	return s
}

func TestDerivatives(t *testing.T) {
	// Central differences with step h err by h²/6 times the third derivative
	// and by rounding/h; 1e-7 covers both for h = 1e-5 and derivatives up to
	// about 250 sizes (full turns).
	const h, tol = 1e-5, 1e-7
	conform(t, func(t *testing.T, c Curve) {
		s := size(c)
		for k := 1; k < 40; k++ {
			u := float64(k) / 40
			d := r2.Scale(0.5/h, r2.Sub(c.At(u+h), c.At(u-h)))
			if e := r2.Norm(r2.Sub(d, c.Deriv(u))); e > tol*s {
				t.Errorf("Deriv(%g) off by %g", u, e)
			}
			d = r2.Scale(0.5/h, r2.Sub(c.Deriv(u+h), c.Deriv(u-h)))
			if e := r2.Norm(r2.Sub(d, c.Second(u))); e > tol*s {
				t.Errorf("Second(%g) off by %g", u, e)
			}
		}
	})
}

// Close to pinned ends the formula must agree with the pins to rounding.
func TestEndsContinuous(t *testing.T) {
	conform(t, func(t *testing.T, c Curve) {
		for _, u := range []float64{0, 1} {
			near := math.Abs(u - 1e-15)
			if d := r2.Norm(r2.Sub(c.At(u), c.At(near))); d > 4e-15*(size(c)+c.Length(0, 1)) {
				t.Errorf("jump of %g at t = %g", d, u)
			}
		}
	})
}

func TestReverse(t *testing.T) {
	conform(t, func(t *testing.T, c Curve) {
		r := c.Reverse()
		if r.At(0) != c.At(1) || r.At(1) != c.At(0) {
			t.Errorf("ends differ: %v %v, %v %v", r.At(0), c.At(1), r.At(1), c.At(0))
		}
		if b := r.Reverse(); b.At(0) != c.At(0) || b.At(1) != c.At(1) {
			t.Error("reversing twice moves the ends")
		}
		for k := range 21 {
			u := float64(k) / 20
			if d := r2.Norm(r2.Sub(r.At(u), c.At(1-u))); d > 1e-14*size(c) {
				t.Errorf("t = %g: off by %g", u, d)
			}
			if k, l := Curvature(r, u), Curvature(c, 1-u); math.Abs(k+l) > 1e-9*(1+math.Abs(k)) {
				t.Errorf("t = %g: curvatures %g and %g are not opposite", u, k, l)
			}
		}
	})
}

func TestLength(t *testing.T) {
	conform(t, func(t *testing.T, c Curve) {
		// Chords of n pieces are short by O(n⁻²); one Richardson step from
		// n and 2n leaves O(n⁻⁴).
		chords := func(t0, t1 float64, n int) (sum float64) {
			for k := range n {
				a, b := t0+(t1-t0)*float64(k)/float64(n), t0+(t1-t0)*float64(k+1)/float64(n)
				sum += r2.Norm(r2.Sub(c.At(b), c.At(a)))
			}
			return sum
		}
		for _, span := range [][2]float64{{0, 1}, {0.2, 0.7}} {
			n1, n2 := chords(span[0], span[1], 20000), chords(span[0], span[1], 40000)
			want := n2 + (n2-n1)/3
			if got := c.Length(span[0], span[1]); math.Abs(got-want) > 1e-11*want {
				t.Errorf("Length%v = %.15g, chords give %.15g", span, got, want)
			}
		}
		if whole, sum := c.Length(0, 1), c.Length(0, 0.3)+c.Length(0.3, 1); math.Abs(whole-sum) > 1e-14*whole {
			t.Errorf("lengths do not add up: %.17g and %.17g", whole, sum)
		}
		if c.Length(0.5, 0.5) != 0 {
			t.Error("empty stretch has a length")
		}
	})
}

// The perimeter of an ellipse is 4 A E(k); E(1/2) is from Abramowitz and
// Stegun (1964), table 17.1, m = 0.5: 1.350643881 to nine figures.
func TestEllipsePerimeter(t *testing.T) {
	e := EllipticArc{A: 1, B: math.Sqrt(0.5), Sweep: 2 * math.Pi}
	if got, want := e.Length(0, 1), 4*1.350643881; math.Abs(got-want) > 4e-9 {
		t.Errorf("perimeter %.10g, want %.10g", got, want)
	}
}

func TestNearest(t *testing.T) {
	rng := rand.New(rand.NewPCG(1, 2))
	conform(t, func(t *testing.T, c Curve) {
		b := c.Bounds()
		mid, s := b.Center(), size(c)
		const n = 2000
		at := make([]r2.Vec, n+1)
		for k := range at {
			at[k] = c.At(float64(k) / n)
		}
		for trial := range 300 {
			p := r2.Add(mid, r2.Scale(s, r2.Vec{X: rng.NormFloat64(), Y: rng.NormFloat64()}))
			if trial%3 == 0 { // close to the curve
				p = r2.Add(c.At(rng.Float64()), r2.Scale(1e-3*s, r2.Vec{X: rng.NormFloat64(), Y: rng.NormFloat64()}))
			}
			if trial%10 == 1 { // on an axis through the middle
				p.X = mid.X
			}
			u := c.Nearest(p)
			if !(u >= 0 && u <= 1) {
				t.Fatalf("Nearest(%v) = %g", p, u)
			}
			got := r2.Norm(r2.Sub(c.At(u), p))
			for k, q := range at {
				// A dense sample can never be closer.
				if d := r2.Norm(r2.Sub(q, p)); d < got-1e-12*s {
					t.Fatalf("Nearest(%v) = %g at distance %.15g, t = %g is at %.15g", p, u, got, float64(k)/n, d)
				}
			}
			if u > 0 && u < 1 {
				// Inside the foot is square to the tangent.
				d := c.Deriv(u)
				if e := math.Abs(r2.Dot(r2.Sub(p, c.At(u)), d)) / r2.Norm(d); e > 1e-11*s {
					t.Fatalf("Nearest(%v) = %g is not a foot: %g along the tangent", p, u, e)
				}
			}
		}
		for k := range 101 {
			u := float64(k) / 100
			q := c.At(u)
			if d := r2.Norm(r2.Sub(c.At(c.Nearest(q)), q)); d > 1e-13*s {
				t.Errorf("point at t = %g: nearest is %g away", u, d)
			}
		}
	})
}

// Points on the axes of an ellipse have feet at vertices or in pairs; arcs may
// hold the one of a pair and not the other.
func TestNearestOnAxes(t *testing.T) {
	for _, axes := range [][2]float64{{3, 1}, {1, 3}, {2, 2}, {1, 0.999999}, {1000, 1}} {
		for start := -3.0; start < 3; start += 0.7 {
			for _, sweep := range []float64{1, -2, 4, 2 * math.Pi} {
				e := EllipticArc{A: axes[0], B: axes[1], Start: start, Sweep: sweep}
				for x := -4.0; x <= 4; x += 0.25 {
					for _, p := range []r2.Vec{{X: x * axes[0] / 3}, {Y: x * axes[1] / 3}, {X: x, Y: 1e-18}} {
						u := e.Nearest(p)
						got := r2.Norm(r2.Sub(e.At(u), p))
						for k := range 201 {
							v := float64(k) / 200
							if d := r2.Norm(r2.Sub(e.At(v), p)); d < got-1e-12*(axes[0]+axes[1]) {
								t.Fatalf("%+v: Nearest(%v) = %g at %.15g, but t = %g is at %.15g", e, p, u, got, v, d)
							}
						}
					}
				}
			}
		}
	}
}

func TestBounds(t *testing.T) {
	conform(t, func(t *testing.T, c Curve) {
		b, s := c.Bounds(), size(c)
		dense := boxOf(c.At(0))
		const n = 20000
		for k := range n + 1 {
			dense = grow(dense, c.At(float64(k)/n))
		}
		// Samples miss an extreme by at most h²/8 of the second derivative.
		for name, d := range map[string]float64{
			"left": dense.Min.X - b.Min.X, "low": dense.Min.Y - b.Min.Y,
			"right": b.Max.X - dense.Max.X, "high": b.Max.Y - dense.Max.Y,
		} {
			if d < -1e-15*s || d > 1e-7*s {
				t.Errorf("%s bound off by %g", name, d)
			}
		}
	})
}

func TestNewArcEnds(t *testing.T) {
	rng := rand.New(rand.NewPCG(3, 4))
	for range 1000 {
		c := r2.Vec{X: rng.NormFloat64(), Y: rng.NormFloat64()}
		r := math.Exp(rng.NormFloat64())
		a, b := rng.Float64()*7, rng.Float64()*7
		from := r2.Vec{X: c.X + r*math.Cos(a), Y: c.Y + r*math.Sin(a)}
		to := r2.Vec{X: c.X + r*math.Cos(b), Y: c.Y + r*math.Sin(b)}
		for _, ccw := range []bool{true, false} {
			arc, err := NewArc(from, to, c, ccw)
			if err != nil {
				t.Fatal(err)
			}
			if arc.At(0) != from || arc.At(1) != to {
				t.Error("ends are not the given points")
			}
			if arc.Sweep > 0 != ccw || math.Abs(arc.Sweep) > 2*math.Pi {
				t.Errorf("sweep %g, counter-clockwise %t", arc.Sweep, ccw)
			}
			arc.pins = pins{}
			if d := max(r2.Norm(r2.Sub(arc.At(0), from)), r2.Norm(r2.Sub(arc.At(1), to))); d > 2e-15*(r+r2.Norm(c)) {
				t.Errorf("formula misses the ends by %g", d)
			}
		}
	}
	if _, err := NewArc(r2.Vec{X: 1}, r2.Vec{Y: 2}, r2.Vec{}, true); err == nil {
		t.Error("unequal radii accepted")
	}
	if _, err := NewArc(r2.Vec{}, r2.Vec{}, r2.Vec{}, true); err == nil {
		t.Error("no radius accepted")
	}
}

// Quarter angles are meant exactly although no float64 holds them.
func TestQuarterAngles(t *testing.T) {
	for k := -4; k <= 4; k++ {
		a := Arc{Radius: 1, Start: 0, Sweep: float64(k) * math.Pi / 2}
		if k == 0 {
			continue
		}
		p := a.At(1)
		if got, want := fmt.Sprint(p.X+0, p.Y+0), fmt.Sprint([]float64{1, 0, -1, 0}[(k+4)%4], []float64{0, 1, 0, -1}[(k+4)%4]); got != want {
			t.Errorf("%d quarters: %s, want %s", k, got, want)
		}
	}
}

func BenchmarkNearest(b *testing.B) {
	for _, c := range []struct {
		name string
		c    Curve
	}{
		{"arc", Arc{Radius: 1, Sweep: 2}},
		{"ellipse", EllipticArc{A: 3, B: 1, Sweep: 2}},
		{"cubic", Bezier{[4]r2.Vec{{}, {X: 1, Y: 2}, {X: 3, Y: -2}, {X: 4, Y: 1}}}},
	} {
		b.Run(c.name, func(b *testing.B) {
			for b.Loop() {
				c.c.Nearest(r2.Vec{X: 1.5, Y: 0.2})
			}
		})
	}
}
