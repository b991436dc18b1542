package specimen

import (
	"math"
	"testing"

	"notchproof/mesh/outline"
	"notchproof/scf"
)

// The nominal stress of tension is the load on the area of the net section, in
// every family.
func TestNetSectionOfFamilies(t *testing.T) {
	for _, e := range examples() {
		f, _ := scf.Lookup(e.family)
		p, err := New(f, e.dims, "mm", e.options)
		if err != nil {
			t.Fatal(err)
		}
		s, err := p.NetSection()
		if err != nil {
			t.Fatal(e.family, err)
		}
		area := outline.Bar(s.Cut).Area
		if s.Revolved {
			area = outline.Shaft(s.Cut).Area
		}
		load, _ := p.Load(scf.Tension)
		if got := load.Nominal.Net * area; math.Abs(got-1) > 1e-9 || s.Slanting {
			t.Errorf("%s %v: nominal stress times area of the net section %.12g, %+v", e.family, e.dims, got, s)
		}
	}
}

// A section as the drawing gives it: across, between two points, slanting.
func TestNetSectionAsGiven(t *testing.T) {
	const bar = `"model": "bar", "outline": "M -90 -20 H 90 V 20 H 5 A 5 5 0 0 0 -5 20 H -90 Z"`
	for _, row := range []struct {
		nominal  string
		length   float64
		slanting bool
	}{
		{`{"x": 0}`, 35, false},
		{`{"x": 40}`, 40, false},
		{`{"from": [0, -20], "to": [0, 15]}`, 35, false},
		{`{"from": [-10, -20], "to": [0, 15]}`, math.Hypot(10, 35), true},
	} {
		file, err := ReadPart([]byte(`{"shape": {`+bar+`, "nominal": `+row.nominal+`}}`), "bar.json", Over{})
		if err != nil {
			t.Fatal(err)
		}
		s, err := file.Part.NetSection()
		if err != nil || math.Abs(outline.Bar(s.Cut).Area-row.length) > 1e-9 || s.Slanting != row.slanting || s.Revolved {
			t.Errorf("%s: %+v, %v", row.nominal, s, err)
		}
	}
}
