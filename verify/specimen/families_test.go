package specimen

import (
	"errors"
	"math"
	"math/rand/v2"
	"slices"
	"testing"

	"notchproof/mesh"
	"notchproof/mesh/outline"
	"notchproof/scf"
)

// rounds of dimensions that designers write: a few digits, so that steps, faces
// and radii meet exactly now and then.
func tidy(rng *rand.Rand, low, high float64) float64 {
	v := low * math.Pow(high/low, rng.Float64())
	digits := math.Pow(10, math.Floor(math.Log10(v))-float64(rng.IntN(2)))
	if v = math.Round(v/digits) * digits; rng.IntN(4) == 0 {
		v *= 1 + 2e-9*(rng.Float64()-0.5)
	}
	return v
}

// hostile draws dimensions over the whole range that may be accepted, with
// sudden equalities between them.
func hostile(rng *rand.Rand, family *scf.Family) scf.Dims {
	dims := scf.Dims{}
	big := 60.0
	for _, n := range family.Dimensions {
		switch {
		case n.Optional && rng.IntN(2) == 0:
			continue
		case n.Angle:
			dims[n.Name] = []float64{0, 1e-6, 30, 60, 90, 120, 179, 180 * rng.Float64()}[rng.IntN(8)]
			continue
		case n.Name == "D" || n.Name == "W":
			dims[n.Name] = big
			continue
		}
		v := 0.0
		switch rng.IntN(3) {
		case 0:
			v = tidy(rng, 1e-6*big, 100*big)
		case 1:
			v = tidy(rng, 0.01*big, big)
		case 2:
			v = related(rng, dims, big)
		}
		if n.Signed && rng.IntN(2) == 0 {
			v = -v
		}
		dims[n.Name] = v
	}
	return dims
}

// related makes a length that leaves nothing, or next to nothing, of another.
func related(rng *rand.Rand, dims scf.Dims, big float64) float64 {
	d, r := dims["d"], dims["r"]
	step := (big - d) / 2
	v := []float64{step, 2 * step, step - r, 2 * r, r, big / 2, big - d, d / 2, step / (1 - math.Sqrt(0.5))}[rng.IntN(9)]
	return v * []float64{1, 1, 1 + 1e-12, 1 - 1e-12, 1 + 1e-10, 1 - 1e-10, 1 + 1e-8, 1 - 1e-8, 1 - 1e-6, 1 + 1e-6, 0.999}[rng.IntN(11)]
}

// Whatever a family accepts is drawn as a sound outline that can be meshed.
func TestAcceptedDimensionsAreDrawn(t *testing.T) {
	const trials = 1500
	for _, family := range scf.Families() {
		t.Run(family.Name, func(t *testing.T) {
			rng := rand.New(rand.NewPCG(1, 2))
			accepted := 0
			for range trials {
				dims := hostile(rng, family)
				p, err := New(family, dims, "mm", scf.Options{Nu: 0.3})
				if err != nil {
					var d *scf.DimensionError
					if !errors.As(err, &d) {
						t.Fatalf("%v: %v", dims, err)
					}
					continue
				}
				accepted++
				if err := p.Region.Validate(); err != nil {
					t.Errorf("%v: %v", dims, err)
					continue
				}
				checkPart(t, p)
				if accepted%8 == 0 {
					if _, err := mesh.Generate(p.Region, graded(p)); err != nil {
						t.Errorf("%v: %v", dims, err)
					}
				}
			}
			if accepted < trials/20 {
				t.Errorf("only %d of %d accepted: the generator misses the shapes", accepted, trials)
			}
		})
	}
}

// graded asks for what a solve asks for at least: a few elements on every arc.
func graded(p *Part) (s mesh.Sizing) {
	for _, side := range p.Notch {
		s.Sides = append(s.Sides, mesh.SideWish{Side: side, PerQuarter: 6})
	}
	return s
}

// checkPart holds a part's description against its outline.
func checkPart(t *testing.T, p *Part) {
	t.Helper()
	sides := p.Region.Sides()
	size := p.Region.Bounds().Max.X - p.Region.Bounds().Min.X
	near := func(a, b float64) bool { return math.Abs(a-b) <= 1e-9*size }
	for _, s := range p.Plain {
		end := sides[s.End].Curve
		a, b := end.At(0), end.At(1)
		if !near(a.X, s.To) || !near(b.X, s.To) || !near(math.Min(a.Y, b.Y), s.Low) || !near(math.Max(a.Y, b.Y), s.High) {
			t.Errorf("%v: %s ends at %v %v, not as told %+v", p.Given, s.Name, a, b, s)
		}
		for _, share := range []float64{0.001, 0.5, 0.999} {
			cut := p.Region.CutX(s.From + share*(s.To-s.From))
			if len(cut) != 1 || !near(cut[0].Lo, s.Low) || !near(cut[0].Hi, s.High) {
				t.Errorf("%v: %s is not plain: %v at %g", p.Given, s.Name, cut, share)
			}
		}
	}
	if len(p.Region.CutX(p.Net)) == 0 {
		t.Errorf("%v: no net section at %g", p.Given, p.Net)
	}
	if p.Family.Sharp(p.Given) == (len(p.Sharp) == 0) {
		t.Errorf("%v: %d sharp corners", p.Given, len(p.Sharp))
	}
	for _, side := range p.Notch {
		if meetsSharp(p, side) {
			continue
		}
		if name := sides[side].Name; name != "fillet" && name != "root" && name != "hole" {
			t.Errorf("%v: notch on %s", p.Given, name)
		}
	}
}

// meetsSharp tells that a side ends in a corner without a radius.
func meetsSharp(p *Part, side int) bool {
	return slices.ContainsFunc(p.Sharp, func(c outline.Corner) bool { return c.Before == side || c.After == side })
}
