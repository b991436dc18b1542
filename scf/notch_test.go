package scf

import (
	"math"
	"testing"
)

// Opening the flanks never raises a factor, and the correction joins on.
func TestOpeningAngle(t *testing.T) {
	n := edgeNotch{D: 60, d: 50, r: 5}
	s := step{D: 60, d: 30, r: 5}
	lastR, lastP, lastT := math.Inf(1), math.Inf(1), math.Inf(1)
	for angle := 1.0; angle <= 150; angle++ {
		r, p := roarkOneV(n, angle).Factor, pilkeyOneV(n, angle).Factor
		if r > lastR || p > lastP || r > roarkEdgeNotch(Bending, n).Factor || p > pilkeyEdgeNotch(Bending, n).Factor {
			t.Errorf("one notch at %g°: %.4f after %.4f, %.4f after %.4f", angle, r, lastR, p, lastP)
		}
		lastR, lastP = r, p
		if v := roarkTwoV(s, angle); angle <= 120 {
			if v.Factor > lastT || v.Factor > roarkTwoNotches(Tension, s).Factor || !v.InRange {
				t.Errorf("two notches at %g°: %.4f after %.4f", angle, v.Factor, lastT)
			}
			lastT = v.Factor
		} else if v.InRange {
			t.Errorf("two notches at %g°: in range", angle)
		}
	}
}

// Both books print one correction in two forms: 0.0421 at 90 and 0.1400 at 150
// degrees, to four decimals.
func TestOpeningAngleForms(t *testing.T) {
	rows := []struct{ angle, want float64 }{{90, 0.0421}, {150, 0.1400}}
	for _, row := range rows {
		y := row.angle / 150
		roark := 0.0275 + 0.1125*math.Pow(y, 4)
		pilkey := horner(y, -0.0159, 0.2243, -0.4293, 0.3609)
		if !near(roark, row.want, 1e-4) || !near(pilkey, row.want, 1e-4) {
			t.Errorf("%g°: %.5f and %.5f, want %.4f", row.angle, roark, pilkey, row.want)
		}
	}
}

// The two depths that the table prints are met by the interpolation, and
// beyond them the value is out of range.
func TestTwoVDepths(t *testing.T) {
	const angle = 110.0
	for _, row := range []struct{ x, k float64 }{
		{0.40, 0.0275 + 0.000145*angle + 0.00164*math.Pow(angle/120, 8)},
		{0.667, 0.0275 + 0.00042*angle + 0.0075*math.Pow(angle/120, 8)},
	} {
		s := step{D: 100, d: 100 * (1 - row.x), r: 10}
		ktu := roarkTwoNotches(Tension, s).Factor
		v := roarkTwoV(s, angle)
		if want := math.Min(ktu, 1.11*ktu-row.k*ktu*ktu); !near(v.Factor, want, 1e-12) || !v.InRange {
			t.Errorf("2h/D = %g: %.6f, want %.6f, in range %v", row.x, v.Factor, want, v.InRange)
		}
	}
	for _, x := range []float64{0.39, 0.68} {
		if roarkTwoV(step{D: 100, d: 100 * (1 - x), r: 10}, angle).InRange {
			t.Errorf("2h/D = %g: in range", x)
		}
	}
}

// A notch shallower than its arc has no flanks: the angle changes nothing.
func TestShallowNotchIgnoresAngle(t *testing.T) {
	for _, name := range []string{"bar-notch", "bar-edge-notch", "shaft-groove"} {
		f := mustLookup(t, name)
		dims := Dims{"D": 60, "d": 58, "r": 5}
		for _, load := range f.Loads {
			plain, open := f.Handbook(load, dims, Options{}), f.Handbook(load, with(dims, "angle", 60), Options{})
			if len(plain) != len(open) || plain[0].Factor != open[0].Factor || plain[0].ID != open[0].ID {
				t.Errorf("%s %s: the angle of missing flanks counts", name, load)
			}
			if len(f.Hints(load, with(dims, "angle", 60), Options{})) != 0 {
				t.Errorf("%s %s: hints for a plain arc", name, load)
			}
		}
	}
}

// The half width is continuous where the flanks begin, and that of a U notch
// is its radius.
func TestHalfWidth(t *testing.T) {
	const r = 3.0
	for _, angle := range []float64{0, 30, 90, 150} {
		h := flankStart(r, angle)
		below, above := halfWidth(h*(1-1e-9), r, angle), halfWidth(h*(1+1e-9), r, angle)
		if !near(below, above, 1e-6) {
			t.Errorf("%g°: %g below, %g above", angle, below, above)
		}
	}
	if got := halfWidth(10, r, 0); got != r {
		t.Errorf("U notch: half width %g", got)
	}
	if got := halfWidth(10, r, 90); !near(got, 10+r*(math.Sqrt2-1), 1e-12) {
		t.Errorf("right angle: half width %g", got)
	}
}

// The force line decides what the handbook may say.
func TestForceLine(t *testing.T) {
	f := mustLookup(t, "bar-edge-notch")
	dims := Dims{"D": 60, "d": 50, "r": 5}
	gross := Options{ForceLine: ForceLineGross}
	net := f.Handbook(Tension, dims, Options{})
	if len(net) != 2 || len(f.Hints(Tension, dims, Options{})) != 0 {
		t.Fatalf("net: %v", net)
	}
	if len(f.Handbook(Tension, dims, gross)) != 0 {
		t.Error("gross: a published fit speaks for the other line")
	}
	hints := f.Hints(Tension, dims, gross)
	if len(hints) != 2 {
		t.Fatalf("gross: %d hints", len(hints))
	}
	for i, bending := range []Value{roarkEdgeNotch(Bending, edgeNotchOf(dims)), pilkeyEdgeNotch(Bending, edgeNotchOf(dims))} {
		if want := net[i].Factor + 0.6*bending.Factor; !near(hints[i].Factor, want, 1e-12) {
			t.Errorf("%s: %.4f, want %.4f", hints[i].ID, hints[i].Factor, want)
		}
	}
	if a, b := f.Nominal(Tension, dims, Options{}), f.Nominal(Tension, dims, gross); a.Net != b.Net || a.Notes[0] == b.Notes[0] {
		t.Error("the line changes the note, not the nominal stress")
	}
	if len(f.Handbook(Bending, dims, gross)) != 2 {
		t.Error("the force line matters in bending")
	}
}

// Two books, one shape: the fits of a groove in tension, each taken to be good
// for 5 %, must overlap where both speak. One of them is from memory.
func TestGrooveTensionBooksAgree(t *testing.T) {
	for _, q := range []float64{2.5, 5, 10, 20, 50} {
		for _, x := range []float64{0.05, 0.1, 0.3} {
			a, b := roarkGrooveTension.fit.factor(q, x), pilkeyGrooveTension.fit.factor(q, x)
			if math.Abs(a-b) > 2*fitAccuracy*a {
				t.Errorf("q = %g, x = %g: %.3f and %.3f", q, x, a, b)
			}
		}
	}
	if v := pilkeyGroove(Tension, step{D: 60, d: 56, r: 2}); v.InRange {
		t.Error("the missing branch speaks at h/r = 1")
	}
}
