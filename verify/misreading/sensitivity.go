package misreading

import (
	"fmt"

	"notchproof/scf"
	"notchproof/verify/specimen"
)

// materials have Peterson's constant a in q = 1/(1 + a/r), the notch sensitivity,
// for axial load and bending; in torsion 0.6 a. R. E. Peterson, in G. Sines, J. L.
// Waisman (eds.), Metal Fatigue, McGraw-Hill 1959. The constants and the reference are
// from memory and unchecked: good for a hint as to where a claim comes from,
// and used for nothing else.
var materials = []struct {
	name string
	a    float64 // mm
}{
	{"annealed low-carbon steel", 0.25},
	{"quenched and tempered steel", 0.064},
	{"aluminium alloy", 0.51},
}

// sensitivity: a fatigue factor Kf = 1 + q (Kt − 1) for Kt. The material is not
// known, so the usual ones are tried; the size of the root must be.
func sensitivity(q *Question) []wrong {
	r, ok := root(q.Part)
	if !ok {
		return nil
	}
	shear := 1.0
	if q.Load.Shear {
		shear = 0.6
	}
	var list []wrong
	for _, m := range materials {
		share := 1 / (1 + shear*m.a/r)
		list = append(list, wrong{
			what:  fmt.Sprintf("Kf for Kt: notch sensitivity %.2f counted in, as for %s", share, m.name),
			known: []value{{1 + share*(q.Factor-1), computed}},
		})
	}
	return list
}

// root is the radius at the notch in mm, where it has one size.
func root(p *specimen.Part) (float64, bool) {
	if p.Family == nil || p.Unit == "" {
		return 0, false
	}
	d := p.Dims
	r := d["r"]
	switch {
	case has(d, "a"):
		r = d["b"] * d["b"] / d["a"]
	case has(d, "W"):
		r = d["d"] / 2
	case has(d, "ra") && d["ra"] != r:
		return 0, false
	}
	return specimen.Length{Value: r, Unit: p.Unit}.In("mm"), true
}

// handbook is what is published for the part itself.
func (q *Question) handbook() []scf.Value {
	if q.Part.Family == nil {
		return nil
	}
	return q.Part.Family.Handbook(q.Load.Name, q.Part.Dims, q.Part.Options)
}
