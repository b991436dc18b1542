package specimen

import (
	"math"
	"strings"
	"testing"

	"notchproof/scf"
)

func drawn(t *testing.T, keys string) *Part {
	t.Helper()
	f, err := ReadPart([]byte(shapeOf(keys)), t.Name(), Over{})
	if err != nil {
		t.Fatal(err)
	}
	return f.Part
}

// Nominal stresses against elementary strength of materials, written out by
// hand for each shape.
func TestNominalStressOfOutlines(t *testing.T) {
	const (
		hole      = `"holes": ["M -8 12 A 8 8 0 0 0 8 12 A 8 8 0 0 0 -8 12 Z"]`
		strip     = `"model": "bar", "outline": "M -200 -30 H 200 V 30 H -200 Z", ` + hole
		halfStrip = `"model": "bar", "mirror": true, "outline": "M -200 0 H 200 V 30 H -200 Z", ` + hole
		hollow    = `"model": "shaft", "outline": "M -200 10 H 200 V 30 H 4 A 4 4 0 0 0 -4 30 H -200 Z"`
	)
	// The strip with the hole at y = 12: what is left lies at −30 to 4 and 20 to 30.
	middle := (34*-13. + 10*25) / 44
	inertia := (34*34*34+10*10*10)/12. + 34*(middle+13)*(middle+13) + 10*(25-middle)*(25-middle)
	// Two such holes, in mirror image: 0 to 4 and 20 to 30, twice.
	twice := 2. / 3 * (4*4*4 + 30*30*30 - 20*20*20)
	ring := math.Pi / 4 * (26*26*26*26 - 10*10*10*10)
	for _, c := range []struct {
		name, keys         string
		load               scf.Load
		net, gross         float64
		fibre, forceLine   float64
		section, condition string
	}{
		{"hole off the middle", strip, scf.Tension, 1. / 44, 1. / 60, 20, middle, "x = 0", ""},
		{"hole off the middle", strip, scf.Bending, (20 - middle) / inertia, 6. / 3600, 20, middle, "x = 0", "y = 20, the end of the section nearest to the notch"},
		{"gross line", strip + `, "forceLine": "gross"`, scf.Tension, 1. / 44, 1. / 60, 20, 0, "x = 0", "the larger end section, y = 0"},
		{"given fibre", strip + `, "nominal": {"x": 0, "fibre": -30}`, scf.Bending, (30 + middle) / inertia, 6. / 3600, -30, middle, "as given", "y = −30, as given"},
		{"given section", strip + `, "nominal": {"x": 100, "fibre": 30}`, scf.Bending, 6. / 3600, 6. / 3600, 30, 0, "x = 100", ""},
		{"ligament", strip + `, "nominal": {"from": [0, 31], "to": [0, 19]}`, scf.Tension, 1. / 10, 1. / 60, 20, 25, "from (0, 31) to (0, 19)", ""},
		{"slanting ligament", strip + `, "nominal": {"from": [0, 12], "to": [18, 30]}`, scf.Tension, 1 / (18*math.Sqrt2 - 8), 1. / 60, 12 + 8/math.Sqrt2, (30 + 12 + 8/math.Sqrt2) / 2, "", ""},
		{"mirror", halfStrip, scf.Tension, 1. / 28, 1. / 60, 20, 0, "", ""},
		{"mirror", halfStrip, scf.Bending, 20 / twice, 6. / 3600, 20, 0, "", ""},
		{"hollow", hollow, scf.Tension, 1 / (math.Pi * (26*26 - 100)), 1 / (math.Pi * 800), 26, 0, "", ""},
		{"hollow", hollow, scf.Bending, 26 / ring, 30 / (math.Pi / 4 * (810000 - 10000)), 26, 0, "", ""},
		{"hollow", hollow, scf.Torsion, 26 / (2 * ring), 30 / (math.Pi / 2 * (810000 - 10000)), 26, 0, "", ""},
		{"bore", hollow + `, "nominal": {"x": 0, "fibre": 10}`, scf.Torsion, 10 / (2 * ring), 30 / (math.Pi / 2 * (810000 - 10000)), 10, 0, "", ""},
	} {
		p := drawn(t, c.keys)
		l, _ := p.Load(c.load)
		n := l.Nominal
		const rounding = 1e-12
		if math.Abs(n.Net/c.net-1) > rounding || math.Abs(n.Gross/c.gross-1) > rounding {
			t.Errorf("%s, %s: nominal %.15g, gross %.15g, want %.15g, %.15g", c.name, c.load, n.Net, n.Gross, c.net, c.gross)
		}
		if math.Abs(*p.Section.Fibre-c.fibre) > 1e-9 || math.Abs(p.ForceLine-c.forceLine) > 1e-9 {
			t.Errorf("%s, %s: fibre %g, force line %g, want %g, %g", c.name, c.load, *p.Section.Fibre, p.ForceLine, c.fibre, c.forceLine)
		}
		if notes := strings.Join(n.Notes, "\n"); !strings.Contains(n.Section, c.section) || !strings.Contains(notes, c.condition) {
			t.Errorf("%s, %s: %s; %s", c.name, c.load, n.Section, notes)
		}
	}
}

// Bending opens the notch, on whichever side it lies.
func TestBendingPullsAtTheNotch(t *testing.T) {
	above := drawn(t, `"model": "bar", "outline": "M -90 -20 H 90 V 20 H 5 A 5 5 0 0 0 -5 20 H -90 Z"`)
	below := drawn(t, `"model": "bar", "outline": "M -90 -20 H -5 A 5 5 0 0 0 5 -20 H 90 V 20 H -90 Z"`)
	for name, p := range map[string]*Part{"above": above, "below": below} {
		l, _ := p.Load(scf.Bending)
		if p.Opposite != (name == "below") || !(l.Far(0, *p.Section.Fibre) > 0) {
			t.Errorf("%s: opposite %t, fibre %g, far stress %g", name, p.Opposite, *p.Section.Fibre, l.Far(0, *p.Section.Fibre))
		}
	}
}

func TestPlainEnds(t *testing.T) {
	for name, c := range map[string]struct {
		keys        string
		left, right float64
	}{
		"notch":       {`"model": "bar", "outline": "M -90 -20 H 80 V 20 H 5 A 5 5 0 0 0 -5 20 H -90 Z"`, 85, 75},
		"hole":        {`"model": "bar", "outline": "M -90 -20 H 80 V 20 H -90 Z", "holes": ["M 10 0 A 5 5 0 0 0 20 0 A 5 5 0 0 0 10 0 Z"]`, 100, 60},
		"overhang":    {`"model": "shaft", "outline": "M -90 0 H 80 V 10 H 12 A 2 2 0 0 0 10 12 V 15 H 20 V 20 H -90 Z"`, 100, 60},
		"blind bore":  {`"model": "shaft", "outline": "M -90 0 H 8 A 2 2 0 0 1 10 2 V 5 H 80 V 20 H -90 Z"`, 98, 70},
		"taper":       {`"model": "bar", "outline": "M -90 -20 H 80 V 20 H 5 A 5 5 0 0 0 -5 20 L -90 21 Z"`, 0, 75},
		"split lines": {`"model": "bar", "outline": "M -90 -20 H 0 H 80 V 3 V 20 H 60 H 5 A 5 5 0 0 0 -5 20 H -90 Z"`, 85, 75},
	} {
		p := drawn(t, c.keys)
		left, right := p.Plain[0], p.Plain[1]
		if math.Abs(left.From-left.To-c.left) > 1e-6 || math.Abs(right.To-right.From-c.right) > 1e-6 || !(left.To < left.From) || !(right.From < right.To) {
			t.Errorf("%s: %+v", name, p.Plain)
		}
	}
}
