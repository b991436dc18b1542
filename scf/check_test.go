package scf

import (
	"errors"
	"math"
	"math/rand/v2"
	"strings"
	"testing"
)

// good is a shape of each family, all dimensions given.
func good() map[string]Dims {
	return map[string]Dims{
		"bar-shoulder":      {"D": 60, "d": 40, "r": 4, "ra": 6, "c": 2},
		"bar-notch":         {"D": 60, "d": 40, "r": 4, "angle": 60},
		"bar-edge-notch":    {"D": 60, "d": 50, "r": 4, "angle": 60},
		"bar-hole":          {"W": 60, "d": 20, "e": 5},
		"bar-ellipse":       {"W": 60, "a": 10, "b": 5},
		"bar-collar":        {"D": 60, "d": 40, "r": 4, "L": 10},
		"shaft-shoulder":    {"D": 60, "d": 40, "r": 4, "ra": 6, "c": 2},
		"shaft-groove":      {"D": 60, "d": 50, "r": 4, "angle": 60},
		"shaft-ring-groove": {"D": 60, "d": 50, "r": 1, "w": 6},
		"shaft-collar":      {"D": 60, "d": 40, "r": 4, "L": 10},
	}
}

func with(dims Dims, name string, v float64) Dims {
	changed := Dims{}
	for k, x := range dims {
		changed[k] = x
	}
	changed[name] = v
	return changed
}

func TestFamiliesComplete(t *testing.T) {
	shapes := good()
	for _, f := range Families() {
		if err := f.Check(shapes[f.Name]); err != nil {
			t.Errorf("%s: %v", f.Name, err)
		}
		if len(shapes[f.Name]) != len(f.Dimensions) {
			t.Errorf("%s: dimensions not all tried", f.Name)
		}
		if g, ok := Lookup(f.Name); !ok || g.Title != f.Title {
			t.Errorf("%s is not found", f.Name)
		}
		if !strings.HasPrefix(f.Name, f.Kind.String()+"-") {
			t.Errorf("%s is a %s", f.Name, f.Kind)
		}
		if f.Carries(Torsion) != (f.Kind == Shaft) {
			t.Errorf("%s: torsion", f.Name)
		}
		delete(shapes, f.Name)
	}
	if len(shapes) != 0 {
		t.Errorf("not listed: %v", shapes)
	}
	if _, ok := Lookup("shaft"); ok {
		t.Error("an unknown name is found")
	}
}

// Every dimension of every family meets every nasty number: one clear line
// that names it, or a shape.
func TestCheckHostileNumbers(t *testing.T) {
	nasty := []float64{
		math.NaN(), math.Inf(1), math.Inf(-1), 0, math.Copysign(0, -1), -1, -1e-300,
		5e-324, 1e-300, 1e-16, 1e-9, 1e16, 1e300, 1e308, math.MaxFloat64, 179.9999999, 180, 360,
	}
	for _, f := range Families() {
		for _, n := range f.Dimensions {
			for _, v := range nasty {
				dims := with(good()[f.Name], n.Name, v)
				err := f.Check(dims)
				if err == nil {
					checkFinite(t, f, dims)
					continue
				}
				var fault *DimensionError
				if !errors.As(err, &fault) {
					t.Fatalf("%s %s=%g: %T", f.Name, n.Name, v, err)
				}
				if msg := err.Error(); strings.ContainsAny(msg, "\n") || !strings.Contains(msg, "=") || len(msg) > 140 {
					t.Errorf("%s %s=%g: %q", f.Name, n.Name, v, msg)
				}
				if finite := !math.IsNaN(v) && !math.IsInf(v, 0); !finite && (fault.Name != n.Name || fault.Reason != "not a finite number") {
					t.Errorf("%s %s=%g: %q", f.Name, n.Name, v, err)
				}
			}
			if v := 1e308; f.Check(with(good()[f.Name], n.Name, v)) == nil {
				t.Errorf("%s %s=%g passes", f.Name, n.Name, v)
			}
		}
	}
}

// All dimensions nasty at once: an error or finite numbers, never a panic. A
// third of the draws is a plain number, so that some get through.
func TestCheckHostileTogether(t *testing.T) {
	nasty := []float64{0, -1, 1e-15, 1e-9, 1e-6, 1, 1 + 1e-9, 1 + 2e-6, 1e3, 1e4, 1e9, 1e15, 1e308, 90, 179}
	rng := rand.New(rand.NewPCG(5, 6))
	for _, f := range Families() {
		passed, plain := 0, good()[f.Name]
		for range 5000 {
			dims := Dims{}
			for _, n := range f.Dimensions {
				dims[n.Name] = nasty[rng.IntN(len(nasty))]
				if rng.IntN(3) == 0 {
					dims[n.Name] = plain[n.Name]
				}
			}
			if f.Check(dims) == nil {
				passed++
				checkFinite(t, f, dims)
			}
		}
		if passed < 20 {
			t.Errorf("%s: only %d draws made a shape", f.Name, passed)
		}
	}
}

// checkFinite wants finite numbers from a shape that passed Check.
func checkFinite(t *testing.T, f *Family, dims Dims) {
	t.Helper()
	for _, load := range f.Loads {
		for _, line := range []string{"", ForceLineNet, ForceLineGross} {
			opt := Options{Nu: 0.3, ForceLine: line}
			n := f.Nominal(load, dims, opt)
			if !(n.Net > 0 && n.Gross > 0) || math.IsInf(n.Net, 0) || math.IsInf(n.Gross, 0) {
				t.Errorf("%s %s %v: nominal %g, %g", f.Name, load, dims, n.Net, n.Gross)
			}
			for _, v := range append(f.Handbook(load, dims, opt), f.Hints(load, dims, opt)...) {
				if math.IsNaN(v.Factor) || math.IsInf(v.Factor, 0) {
					t.Errorf("%s %s %v: %s gives %g", f.Name, load, dims, v.ID, v.Factor)
				}
			}
		}
	}
}

// The lines that users read, word for word.
func TestCheckSays(t *testing.T) {
	rows := []struct {
		family string
		dims   Dims
		want   string
	}{
		{"shaft-shoulder", Dims{"D": 60, "d": 40}, "r: missing, the fillet radius; of an elliptic fillet the radial semi-axis"},
		{"shaft-shoulder", Dims{"D": 60, "d": 40, "r": 2, "w": 3, "b": 1}, "b=1: no such dimension"},
		{"shaft-shoulder", Dims{"D": 60, "d": 40, "r": 0, "ra": 2}, "ra=2: an elliptic fillet without its radial semi-axis r"},
		{"bar-notch", Dims{"D": 60, "d": 40, "r": 0}, "r=0: parallel flanks without a radius enclose nothing"},
		{"bar-notch", Dims{"D": 60, "d": 40, "r": 0, "angle": 1e-5}, "angle=1e-05: half width of the notch/D = 1.45444e-08 is below 1e-06"},
		{"bar-hole", Dims{"W": 60, "d": 0}, "d=0: must be greater than zero"},
		{"shaft-shoulder", Dims{"D": 60, "d": 40, "r": -2}, "r=-2: must be greater than zero"},
		{"shaft-shoulder", Dims{"D": 1e308, "d": 40, "r": 2}, "D=1e+308: larger than 1e+15"},
		{"shaft-shoulder", Dims{"D": 40, "d": 60, "r": 2}, "d=60: not smaller than D = 40"},
		{"shaft-shoulder", Dims{"D": 40, "d": 40, "r": 2}, "d=40: not smaller than D = 40"},
		{"shaft-shoulder", Dims{"D": 1e6, "d": 40, "r": 2}, "d=40: D/d = 25000 is above 300"},
		{"shaft-shoulder", Dims{"D": 40.00001, "d": 40, "r": 2}, "d=40: D/d − 1 = 2.5e-07 is below 1e-06"},
		{"shaft-shoulder", Dims{"D": 60, "d": 40, "r": 1e-6}, "r=1e-06: r/D = 1.66667e-08 is below 1e-06"},
		{"shaft-shoulder", Dims{"D": 60, "d": 40, "r": 1e6}, "r=1e+06: radius 1e+06 is more than 100 times D = 60"},
		{"shaft-shoulder", Dims{"D": 64, "d": 40, "r": 20, "c": 1}, "r=20: radius is not smaller than the step (D−d)/2 = 12, which leaves no corner to chamfer"},
		{"shaft-shoulder", Dims{"D": 64, "d": 40, "r": 4, "c": 9}, "c=9: larger than the face left by the fillet, (D−d)/2 − r = 8"},
		{"bar-notch", Dims{"D": 60, "d": 40, "r": 2, "angle": 180}, "angle=180: opening angle outside 0 to 180 degrees"},
		{"bar-notch", Dims{"D": 60, "d": 40, "r": 2, "angle": -1}, "angle=-1: opening angle outside 0 to 180 degrees"},
		{"bar-notch", Dims{"D": 60, "d": 40, "r": 2, "angle": 179.9}, "angle=179.9: half width of the notch 11459.2 is more than 100 times D = 60"},
		{"bar-hole", Dims{"W": 50, "d": 60}, "d=60: hole is not smaller than the width W = 50"},
		{"bar-hole", Dims{"W": 50, "d": 20, "e": -20}, "e=-20: hole breaks through the edge, the offset must stay below (W−d)/2 = 15"},
		{"bar-ellipse", Dims{"W": 50, "a": 25, "b": 1}, "a=25: hole is not smaller than the bar, a must stay below W/2 = 25"},
		{"bar-ellipse", Dims{"W": 50, "a": 10, "b": 0.01}, "b=0.01: tip radius b²/(a W) = 2e-07 is below 1e-06"},
		{"shaft-ring-groove", Dims{"D": 60, "d": 50, "r": 2, "w": 3}, "w=3: narrower than its two corners, which take 4"},
		{"shaft-collar", Dims{"D": 60, "d": 50, "r": 2, "L": 1e-9}, "L=1e-09: L/D = 1.66667e-11 is below 1e-06"},
	}
	for _, row := range rows {
		err := mustLookup(t, row.family).Check(row.dims)
		if err == nil || err.Error() != row.want {
			t.Errorf("%s %v:\n got %v\nwant %s", row.family, row.dims, err, row.want)
		}
	}
}

// Shapes at the edge of being one pass: an arc cut off by a low step, a
// chamfer that takes the whole face, a groove with nothing between its corners.
func TestCheckAccepts(t *testing.T) {
	rows := []struct {
		family string
		dims   Dims
	}{
		{"shaft-shoulder", Dims{"D": 44, "d": 40, "r": 20}},
		{"shaft-shoulder", Dims{"D": 44, "d": 40, "r": 0}},
		{"bar-shoulder", Dims{"D": 44, "d": 40, "r": 0, "c": 2}},
		{"bar-edge-notch", Dims{"D": 44, "d": 40, "r": 0, "angle": 30}},
		{"shaft-ring-groove", Dims{"D": 44, "d": 40, "r": 0, "w": 1}},
		{"bar-shoulder", Dims{"D": 0.5, "d": 0.3, "r": 0.04, "c": 0.06}},
		{"shaft-shoulder", Dims{"D": 60, "d": 40, "r": 4, "c": 0}},
		{"shaft-ring-groove", Dims{"D": 0.6, "d": 0.5, "r": 0.05, "w": 0.1}},
		{"shaft-ring-groove", Dims{"D": 52, "d": 50, "r": 2, "w": 2 * math.Sqrt(3)}},
		{"bar-notch", Dims{"D": 42, "d": 40, "r": 100, "angle": 170}},
		{"bar-hole", Dims{"W": 50, "d": 20, "e": 0}},
		{"bar-hole", Dims{"W": 50, "d": 20, "e": -14.9}},
	}
	for _, row := range rows {
		if err := mustLookup(t, row.family).Check(row.dims); err != nil {
			t.Errorf("%s %v: %v", row.family, row.dims, err)
		}
	}
}
