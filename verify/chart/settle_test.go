package chart

import (
	"maps"
	"math"
	"strings"
	"testing"

	"notchproof/scf"
)

// TestShapesAreSettled: the same shape from whatever is given of it, in whatever
// order.
func TestShapesAreSettled(t *testing.T) {
	for _, row := range []struct {
		w    Words
		x, y float64
		want scf.Dims
	}{
		{words(t, "shaft-shoulder", scf.Bending, "r/d=0.1:0.2", "D/d=1.5,2"), 0.1, 1.5, scf.Dims{"D": 1.5, "d": 1, "r": 0.1}},
		{words(t, "shaft-shoulder", scf.Bending, "r/D=0.1:0.2", "D/d=1.5,2", "d=40mm"), 0.1, 1.5, scf.Dims{"D": 60, "d": 40, "r": 6}},
		{words(t, "shaft-shoulder", scf.Bending, "D/r=10:20", "D/d=1.5,2", "r=0.2in", "ra/r=2"), 10, 2, scf.Dims{"D": 2, "d": 1, "r": 0.2, "ra": 0.4}},
		{words(t, "shaft-shoulder", scf.Bending, "d=30:50mm", "r=0.2,0.3cm", "D=0.06m"), 40, 3, scf.Dims{"D": 60, "d": 40, "r": 3}},
		{words(t, "bar-collar", scf.Tension, "r/L=0.1:0.2", "", "L/d=0.5", "d/D=0.5"), 0.2, math.NaN(), scf.Dims{"D": 2, "d": 1, "L": 0.5, "r": 0.1}},
		{words(t, "bar-hole", scf.Tension, "d/W=0.1:0.5", "e/W=0,0.1"), 0.2, 0.1, scf.Dims{"W": 1, "d": 0.2, "e": 0.1}},
		{words(t, "bar-hole", scf.Tension, "d/W=0.1:0.5", "", "e=0"), 0.2, math.NaN(), scf.Dims{"W": 1, "d": 0.2, "e": 0}},
		{words(t, "shaft-groove", scf.Torsion, "angle=0:90", "r/D=0.1,0.2", "d/D=0.8"), 45, 0.1, scf.Dims{"D": 1, "d": 0.8, "r": 0.1, "angle": 45}},
	} {
		q, err := row.w.Read()
		if err != nil {
			t.Errorf("%v: %v", row.w, err)
			continue
		}
		got := q.dims(row.x, row.y)
		if !maps.EqualFunc(got, row.want, func(a, b float64) bool { return math.Abs(a-b) <= 1e-12*math.Abs(b) }) {
			t.Errorf("%s by %s with %v: %v, not %v", row.w.Along, row.w.Curves, row.w.Given, got, row.want)
		}
		again := Words{Family: q.Family, Load: q.Load, Options: q.Options, Target: q.Target}
		for _, line := range q.Lines() {
			if key, value, _ := strings.Cut(line, " "); key != "family" && key != "load" {
				if err := again.set(key, value); err != nil {
					t.Fatal(err)
				}
			}
		}
		r, err := again.Read()
		if err != nil {
			t.Fatalf("%v read again: %v", q.Lines(), err)
		}
		if mine, theirs, differ := q.differs(r); differ {
			t.Errorf("read again %s is %s", mine, theirs)
		}
	}
}

// TestAxes: ends are as given, lengths rise by equal factors, angles and offsets
// by equal steps.
func TestAxes(t *testing.T) {
	for _, row := range []struct {
		w    Words
		want []float64
	}{
		{words(t, "shaft-shoulder", scf.Bending, "r/d=0.01:1:3", "", "D/d=4"), []float64{0.01, 0.1, 1}},
		{words(t, "bar-hole", scf.Tension, "e=0:10mm:3", "", "W=100mm", "d=10mm"), []float64{0, 5, 10}},
		{words(t, "bar-hole", scf.Tension, "e/W=-0.1:0.1:3", "", "d/W=0.2"), []float64{-0.1, 0, 0.1}},
		{words(t, "shaft-groove", scf.Torsion, "angle=60,0,90°", "", "d/D=0.8", "r/D=0.1"), []float64{0, 60, 90}},
	} {
		q, err := row.w.Read()
		if err != nil {
			t.Errorf("%s: %v", row.w.Along, err)
			continue
		}
		for i, v := range q.Along.Values {
			if math.Abs(v-row.want[i]) > 1e-15 || len(q.Along.Values) != len(row.want) {
				t.Errorf("%s: %v", row.w.Along, q.Along.Values)
			}
		}
	}
	q, err := words(t, "shaft-shoulder", scf.Bending, "r/d=0.02:0.3", "D/d=1.1:2", "c/d=0.001").Read()
	if err != nil || len(q.Along.Values) != 12 || len(q.Curves.Values) != 4 {
		t.Errorf("%v: defaults", err)
	}
}
