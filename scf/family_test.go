package scf

import (
	"fmt"
	"math"
	"math/rand/v2"
	"strings"
	"testing"
)

// randomShape draws dimensions about a good shape, over decades, until Check
// passes.
func randomShape(rng *rand.Rand, f *Family) Dims {
	for {
		dims := Dims{}
		typical := good()[f.Name]
		for _, n := range f.Dimensions {
			if v, ok := typical[n.Name]; ok {
				dims[n.Name] = v * math.Exp(rng.NormFloat64())
			}
		}
		for _, n := range f.Dimensions {
			if n.Optional && rng.IntN(2) == 0 {
				delete(dims, n.Name)
			}
		}
		if f.Check(dims) == nil {
			return dims
		}
	}
}

// What every value of every shape must show.
func TestValuesKeepTheirPromises(t *testing.T) {
	rng := rand.New(rand.NewPCG(1, 2))
	opt := Options{Nu: 0.3}
	for _, f := range Families() {
		for range 300 {
			dims := randomShape(rng, f)
			checkFinite(t, f, dims)
			for _, load := range f.Loads {
				values := f.Handbook(load, dims, opt)
				seen := map[string]bool{}
				for i, v := range values {
					where := fmt.Sprintf("%s %s %v %s", f.Name, load, dims, v.ID)
					if seen[v.ID] {
						t.Errorf("%s: id twice", where)
					}
					seen[v.ID] = true
					if v.Source == "" || v.Sureness == Unchecked || v.Range == "" || v.Accuracy <= 0 || v.Hint {
						t.Errorf("%s: incomplete: %+v", where, v)
					}
					if v.InRange != (len(v.Outside) == 0) {
						t.Errorf("%s: in range %v but outside %q", where, v.InRange, v.Outside)
					}
					if v.InRange && v.Factor < 0.94 {
						t.Errorf("%s: factor %g in range", where, v.Factor)
					}
					if i > 0 && (v.Accuracy < values[i-1].Accuracy || v.Accuracy == values[i-1].Accuracy && v.Sureness > values[i-1].Sureness) {
						t.Errorf("%s: stands behind a poorer value", where)
					}
				}
				for _, h := range f.Hints(load, dims, opt) {
					if !h.Hint || h.InRange || len(h.Outside) == 0 || h.Source == "" {
						t.Errorf("%s %s %v: hint %+v", f.Name, load, dims, h)
					}
				}
			}
		}
	}
}

// A factor has no unit: a thousand times the part has the same.
func TestScaleInvariance(t *testing.T) {
	const scale = 1000.0
	rng := rand.New(rand.NewPCG(3, 4))
	for _, f := range Families() {
		for range 50 {
			dims := randomShape(rng, f)
			large := Dims{}
			for _, n := range f.Dimensions {
				if v, ok := dims[n.Name]; ok && n.Angle {
					large[n.Name] = v
				} else if ok {
					large[n.Name] = scale * v
				}
			}
			for _, load := range f.Loads {
				small, big := f.Handbook(load, dims, Options{}), f.Handbook(load, large, Options{})
				for i, v := range small {
					if w := big[i]; v.ID != w.ID || v.InRange != w.InRange || !near(w.Factor, v.Factor, 1e-9*(1+math.Abs(v.Factor))) {
						t.Errorf("%s %v: %s %v, scaled %s %v", f.Name, dims, v.ID, v.Factor, w.ID, w.Factor)
					}
				}
			}
		}
	}
}

// Nominal stresses of textbook sections, by hand.
func TestNominal(t *testing.T) {
	rows := []struct {
		family     string
		dims       Dims
		load       Load
		net, gross float64
		formula    string
	}{
		{"bar-shoulder", Dims{"D": 20, "d": 10, "r": 1}, Tension, 1 / 10.0, 1 / 20.0, "P / (d t)"},
		{"bar-notch", Dims{"D": 20, "d": 10, "r": 1}, Bending, 6 / 100.0, 6 / 400.0, "6 M / (d² t)"},
		{"bar-edge-notch", Dims{"D": 20, "d": 10, "r": 1}, Tension, 1 / 10.0, 1 / 20.0, "P / (d t)"},
		{"bar-hole", Dims{"W": 20, "d": 10}, Tension, 1 / 10.0, 1 / 20.0, "P / ((W − d) t)"},
		{"bar-hole", Dims{"W": 20, "d": 10}, Bending, 60 / 7000.0, 6 / 400.0, "6 M d / ((W³ − d³) t)"},
		{"bar-ellipse", Dims{"W": 20, "a": 5, "b": 3}, Tension, 1 / 10.0, 1 / 20.0, "P / ((W − 2a) t)"},
		{"bar-ellipse", Dims{"W": 20, "a": 5, "b": 3}, Bending, 60 / 7000.0, 6 / 400.0, "12 M a / ((W³ − 8 a³) t)"},
		{"shaft-shoulder", Dims{"D": 2, "d": 1, "r": 0.1}, Tension, 4 / math.Pi, 1 / math.Pi, "4 P / (π d²)"},
		{"shaft-groove", Dims{"D": 2, "d": 1, "r": 0.1}, Bending, 32 / math.Pi, 4 / math.Pi, "32 M / (π d³)"},
		{"shaft-collar", Dims{"D": 2, "d": 1, "r": 0.1, "L": 1}, Torsion, 16 / math.Pi, 2 / math.Pi, "16 T / (π d³)"},
	}
	for _, row := range rows {
		n := mustLookup(t, row.family).Nominal(row.load, row.dims, Options{})
		if !near(n.Net, row.net, 1e-14) || !near(n.Gross, row.gross, 1e-14) || n.Formula != row.formula {
			t.Errorf("%s %s: %g, %g, %q", row.family, row.load, n.Net, n.Gross, n.Formula)
		}
		if !strings.HasPrefix(n.Section, "net, at") {
			t.Errorf("%s %s: section %q", row.family, row.load, n.Section)
		}
	}
}

func TestLoadsNotCarriedPanic(t *testing.T) {
	defer func() {
		if recover() == nil {
			t.Error("torsion of a bar went through")
		}
	}()
	mustLookup(t, "bar-hole").Nominal(Torsion, Dims{"W": 20, "d": 10}, Options{})
}

func BenchmarkHandbook(b *testing.B) {
	f, _ := Lookup("shaft-shoulder")
	dims := Dims{"D": 60, "d": 50, "r": 5}
	for b.Loop() {
		f.Handbook(Bending, dims, Options{Nu: 0.3})
	}
}

func ExampleFamily_Handbook() {
	f, _ := Lookup("shaft-shoulder")
	dims := Dims{"D": 60, "d": 50, "r": 5}
	if err := f.Check(dims); err != nil {
		fmt.Println(err)
		return
	}
	for _, v := range f.Handbook(Bending, dims, Options{Nu: 0.3}) {
		fmt.Printf("%-12s %.2f  %s\n", v.ID, v.Factor, v.Range)
	}
	// Output:
	// tipton-1996  1.72  0.002 ≤ r/d ≤ 0.3, 1.01 ≤ D/d ≤ 6
	// pilkey-3.10  1.67  0.1 ≤ h/r ≤ 20
	// roark-7-17   1.64  0.25 ≤ h/r ≤ 20
}

func ExampleFamily_Check() {
	f, _ := Lookup("bar-hole")
	fmt.Println(f.Check(Dims{"W": 50, "d": 20, "e": 16}))
	// Output: e=16: hole breaks through the edge, the offset must stay below (W−d)/2 = 15
}
