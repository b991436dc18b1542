package export

import (
	"bytes"
	"encoding/csv"
	"math"
	"strconv"
	"strings"
	"testing"

	"gonum.org/v1/gonum/spatial/r2"

	"notchproof/scf"
)

// TestSurfaceReadsBack reads tables as another program would: places lie on the
// outline, arc lengths grow and add up to the free boundary, stresses are those
// of the solution there, and the largest is the factor.
func TestSurfaceReadsBack(t *testing.T) {
	for _, row := range []struct {
		name     string
		dims     scf.Dims
		surfaces int
	}{
		{"bar-hole", scf.Dims{"W": 60, "d": 20, "e": 5}, 3},       // two edges and the hole
		{"shaft-shoulder", scf.Dims{"D": 72, "d": 48, "r": 3}, 1}, // the axis is no surface
		{"bar-notch", scf.Dims{"D": 60, "d": 40, "r": 5, "angle": 60}, 1},
	} {
		r := checked(t, row.name, row.dims, 1e-4)
		for i := range r.Findings {
			f := &r.Findings[i]
			var b bytes.Buffer
			if err := Surface(&b, f, r.Part); err != nil {
				t.Fatal(err)
			}
			if text := b.String(); !strings.HasSuffix(text, "\r\n") || strings.Count(text, "\r\n") != strings.Count(text, "\n") {
				t.Errorf("%s: lines do not end as RFC 4180 has them", row.name)
			}
			table, err := csv.NewReader(&b).ReadAll()
			if err != nil {
				t.Fatal(err)
			}
			column := map[string]int{}
			for k, name := range table[0] {
				column[name] = k
			}
			s := f.Computed.Last
			highest, before, surface, total := 0.0, r2.Vec{}, "", 0.0
			arc, straight, surfaces := 0.0, 0.0, 0
			for line, cells := range table[1:] {
				value := func(name string) float64 {
					v, err := strconv.ParseFloat(cells[column[name]], 64)
					if err != nil || column[name] == 0 {
						t.Fatalf("%s, line %d, %s: %v", row.name, line+2, name, err)
					}
					return v
				}
				p := r2.Vec{X: value("x / mm"), Y: value("y / mm")}
				if cells[0] != surface {
					total += arc
					surface, arc, straight, surfaces = cells[0], 0, 0, surfaces+1
				} else {
					straight += r2.Norm(r2.Sub(p, before))
				}
				here := value("arc length / mm")
				if here < arc || here < straight*(1-1e-9) || here > 1.02*straight+1e-9 {
					t.Fatalf("%s, line %d: arc length %g after %g, chords %g", row.name, line+2, here, arc, straight)
				}
				arc, before = here, p
				tri, xi, eta, ok := s.Find(inner(r.Part.Region.Contains, p))
				if !ok {
					t.Fatalf("%s, line %d: (%g, %g) is not on the part", row.name, line+2, p.X, p.Y)
				}
				first, mises := value("first principal stress / nominal stress"), value("von Mises stress / nominal stress")
				st := s.Stress(tri, xi, eta)
				if math.Abs(st.VonMises()-mises) > 0.02*f.Computed.Factor.Value {
					t.Errorf("%s, line %d: von Mises stress %g, the full tensor beside it says %g", row.name, line+2, mises, st.VonMises())
				}
				if f.Load.Shear {
					first = math.Abs(value("shear stress / nominal stress"))
				}
				highest = math.Max(highest, first)
			}
			if e := f.Computed.Factor; highest > e.Value+e.Uncertainty && len(f.Warnings) == 0 || highest < 0.98*e.Value {
				t.Errorf("%s, %s: highest %g, factor %g ± %g", row.name, f.Load.Name, highest, e.Value, e.Uncertainty)
			}
			if surfaces != row.surfaces {
				t.Errorf("%s: %d surfaces, want %d", row.name, surfaces, row.surfaces)
			}
			want := 0.0
			for k, side := range r.Part.Region.Sides() {
				if free(r.Part, side, k) {
					want += side.Curve.Length(0, 1)
				}
			}
			if total += arc; math.Abs(total-want) > 1e-9*want {
				t.Errorf("%s: arc lengths add up to %g, the free boundary to %g", row.name, total, want)
			}
		}
	}
}

// inner gives a point inside the material near p: along the mean of the
// directions that lead into it.
func inner(contains func(r2.Vec) bool, p r2.Vec) r2.Vec {
	var mean r2.Vec
	for k := range 64 {
		sin, cos := math.Sincos(2 * math.Pi * (float64(k) + 0.25) / 64)
		if d := (r2.Vec{X: cos, Y: sin}); contains(r2.Add(p, r2.Scale(1e-5, d))) {
			mean = r2.Add(mean, d)
		}
	}
	return r2.Add(p, r2.Scale(5e-4/r2.Norm(mean), mean))
}
