package scf

import (
	"math"
	"strings"
	"testing"
)

// What engineers read off the printed charts of a stepped round shaft with
// D/d = 1.5. Common practice, no source; read by eye, good to 8 %. They are
// held against the fits of the charts' own book: the other fits are meant to
// differ from the charts (Tipton in bending by 11 %, Roark in torsion by 9 %).
func TestShaftShoulderChartReadings(t *testing.T) {
	const byEye = 0.08
	rows := []struct {
		load Load
		rd   float64
		want float64
	}{
		{Tension, 1.0 / 4, 1.5},
		{Tension, 1.0 / 8, 1.75},
		{Tension, 1.0 / 16, 2.2},
		{Bending, 1.0 / 16, 1.9},
		{Torsion, 1.0 / 16, 1.7},
	}
	f := mustLookup(t, "shaft-shoulder")
	for _, row := range rows {
		for _, v := range f.Handbook(row.load, Dims{"D": 1.5, "d": 1, "r": row.rd}, Options{Nu: 0.3}) {
			if strings.HasPrefix(v.ID, "pilkey-") && math.Abs(v.Factor-row.want) > byEye*row.want {
				t.Errorf("%s r/d = %g: %s gives %.3f, charts %.2f", row.load, row.rd, v.ID, v.Factor, row.want)
			}
		}
	}
}

// The later fit of bending comes first, and knows its own limits.
func TestTiptonRange(t *testing.T) {
	f := mustLookup(t, "shaft-shoulder")
	rows := []struct {
		dims Dims
		in   bool
		says string
	}{
		{Dims{"D": 60, "d": 50, "r": 5}, true, ""},
		{Dims{"D": 60, "d": 50, "r": 0.1}, true, ""},
		{Dims{"D": 60, "d": 50, "r": 0.05}, false, "r/d = 0.001 is below 0.002"},
		{Dims{"D": 60, "d": 50, "r": 16}, false, "r/d = 0.32 is above 0.3"},
		{Dims{"D": 350, "d": 50, "r": 5}, false, "D/d = 7 is above 6"},
		{Dims{"D": 50.1, "d": 50, "r": 0.1}, false, "D/d = 1.002 is below 1.01"},
	}
	for _, row := range rows {
		v := f.Handbook(Bending, row.dims, Options{Nu: 0.3})[0]
		if v.ID != "tipton-1996" || v.InRange != row.in || strings.Join(v.Outside, "; ") != row.says {
			t.Errorf("%v: %s in range %v, %q", row.dims, v.ID, v.InRange, v.Outside)
		}
	}
}

// A chamfer or an elliptic fillet is not what the fits are for.
func TestShoulderOptionsOnlyHint(t *testing.T) {
	for _, name := range []string{"bar-shoulder", "shaft-shoulder"} {
		f := mustLookup(t, name)
		plain := Dims{"D": 60, "d": 40, "r": 4}
		same := Dims{"D": 60, "d": 40, "r": 4, "ra": 4, "c": 0}
		for _, load := range f.Loads {
			want := f.Handbook(load, plain, Options{Nu: 0.3})
			if got := f.Handbook(load, same, Options{Nu: 0.3}); len(got) != len(want) || got[0].Factor != want[0].Factor {
				t.Errorf("%s %s: defaults written out change the values", name, load)
			}
			if len(f.Hints(load, plain, Options{Nu: 0.3})) != 0 {
				t.Errorf("%s %s: the plain shape needs no hints", name, load)
			}
			for _, extra := range []Dims{{"c": 2}, {"ra": 8}, {"ra": 2}, {"ra": 8, "c": 2}} {
				dims := Dims{"D": 60, "d": 40, "r": 4}
				for k, v := range extra {
					dims[k] = v
				}
				if err := f.Check(dims); err != nil {
					t.Fatal(err)
				}
				if got := f.Handbook(load, dims, Options{Nu: 0.3}); len(got) != 0 {
					t.Errorf("%s %s %v: handbook speaks: %v", name, load, extra, got[0].ID)
				}
				hints := f.Hints(load, dims, Options{Nu: 0.3})
				if len(hints) != len(want) {
					t.Fatalf("%s %s %v: %d hints", name, load, extra, len(hints))
				}
				for i, h := range hints {
					if !h.Hint || h.InRange || h.Factor != want[i].Factor || len(h.Outside) == 0 {
						t.Errorf("%s %s %v: bad hint %+v", name, load, extra, h)
					}
				}
			}
		}
	}
}
