package specimen

import (
	"math"
	"testing"

	"notchproof/mesh/outline"
	"notchproof/scf"
)

// Longer ends leave everything else where it is: the sides and their numbers, the
// notch, the supports at the ends, the tractions.
func TestLengthened(t *testing.T) {
	const sizes = 0.5
	for _, family := range scf.Families() {
		p, err := New(family, exampleDims(family.Name), "mm", scf.Options{Nu: 0.3})
		if err != nil {
			t.Fatal(err)
		}
		long := p.Lengthened(sizes)
		if err := long.Region.Validate(); err != nil {
			t.Fatalf("%s: %v", p.Name, err)
		}
		before, after := p.Region.Sides(), long.Region.Sides()
		if len(before) != len(after) {
			t.Fatalf("%s: %d sides, then %d", p.Name, len(before), len(after))
		}
		for _, side := range p.Notch {
			if before[side] != after[side] {
				t.Errorf("%s: the notch side %d is not what it was", p.Name, side)
			}
		}
		added := 0.0
		for i, plain := range long.Plain {
			old := p.Plain[i]
			size := old.High - old.Low
			if p.Half {
				size = 2 * old.High
			}
			if more := math.Abs(plain.To-plain.From) - math.Abs(old.To-old.From); math.Abs(more-sizes*size) > 1e-9*size {
				t.Errorf("%s: the %s is longer by %g, want %g", p.Name, plain.Name, more, sizes*size)
			}
			if end := after[plain.End].Curve.(outline.Line); end.A.X != plain.To || end.B.X != plain.To {
				t.Errorf("%s: the end of the %s is not where it ends", p.Name, plain.Name)
			}
			added += sizes * size * (old.High - old.Low)
		}
		if got := long.Region.Properties().Area - p.Region.Properties().Area; math.Abs(got-added) > 1e-9*added {
			t.Errorf("%s: %g of area added, want %g", p.Name, got, added)
		}
		for i, l := range long.Loads {
			for k, pin := range l.Pins {
				old := p.Loads[i].Pins[k]
				moved := old.At.X == p.Plain[0].To || old.At.X == p.Plain[1].To
				if moved && pin.At.X != long.Plain[0].To && pin.At.X != long.Plain[1].To {
					t.Errorf("%s %s: the support at %v is not at an end any more", p.Name, l.Name, pin.At)
				}
				if pin.At.Y != old.At.Y || pin.Unknown != old.Unknown {
					t.Errorf("%s %s: support %v became %v", p.Name, l.Name, old, pin)
				}
			}
		}
	}
}

// exampleDims are ordinary proportions of a family.
func exampleDims(family string) scf.Dims {
	all := scf.Dims{"D": 72, "d": 48, "r": 4, "L": 60, "w": 20, "W": 60, "a": 10, "b": 6}
	f, _ := scf.Lookup(family)
	dims := scf.Dims{}
	for _, d := range f.Dimensions {
		if !d.Optional {
			dims[d.Name] = all[d.Name]
		}
	}
	if family == "bar-hole" {
		dims["d"] = 20
	}
	return dims
}
