package strength

import (
	"math"

	"notchproof/scf"
	"notchproof/verify"
	"notchproof/verify/quantity"
	"notchproof/verify/specimen"
)

// A Question is a part with its loads and what is asked of it.
type Question struct {
	Part      *specimen.Part
	Axial     quantity.Force // a load that was not given does not act
	Bending   quantity.Moment
	Torque    quantity.Moment
	Thickness specimen.Length // of a bar
	Material  Material
	Required  float64 // safety that is asked for; 0: none
	Options   verify.Options
}

// A Fault says in one line what is wrong with a question.
type Fault struct{ text, hint string }

func (f *Fault) Error() string { return f.text }

// Hint says what to do about it.
func (f *Fault) Hint() string { return f.hint }

// Check finds what a question lacks before anything is solved. The error is a
// *Fault.
func (q *Question) Check() error {
	bar := !q.shaft()
	switch {
	case bar && q.Torque.NewtonMillimetres() != 0:
		return &Fault{"torque " + q.Torque.String() + ": a flat bar carries none here", "torsion of a bar is another problem; a round shaft carries axial force, bending and torque"}
	case q.Axial.Newtons() == 0 && q.Bending.NewtonMillimetres() == 0 && q.Torque.NewtonMillimetres() == 0:
		return &Fault{"no load", `give one or more: --axial 12kN, --bending 300N·m, --torque 450N·m, or "forces" in the part file`}
	case q.Part.Unit == "":
		return &Fault{"the lengths of the part have no unit", "stresses need one: write D=72mm, or give the outline a unit"}
	case bar && q.Thickness.Value == 0:
		return &Fault{"no thickness of the bar", `give it with --thickness 8mm, or "thickness" in the part file`}
	case bar && q.Thickness.Unit == "":
		return &Fault{"thickness " + q.Thickness.Text + ": no unit", "write it as 8mm or 0.25in"}
	case bar && !(q.Thickness.Value > 0):
		return &Fault{"thickness " + q.Thickness.Text + ": not above zero", "give the thickness of the bar, as in 8mm"}
	case !bar && q.Thickness.Value != 0:
		return &Fault{"thickness " + q.Thickness.Text + ": a shaft has none", "leave it out"}
	case q.Required != 0 && !(q.Required >= 1 && q.Required <= 100):
		return &Fault{"the required safety is not between 1 and 100", "give what the applicable code asks for, as in 1.8"}
	}
	return q.Material.check()
}

// shaft tells a body of revolution from a bar.
func (q *Question) shaft() bool { return q.Part.Loads[0].Model.Revolved() }

// millimetres is the length of the part's unit.
func (q *Question) millimetres() float64 {
	return specimen.Length{Value: 1, Unit: q.Part.Unit}.In("mm")
}

// loads lists what acts, in the order of the part's loads.
func (q *Question) loads() []scf.Load {
	var names []scf.Load
	for _, l := range q.Part.Loads {
		if q.size(l.Name) != 0 {
			names = append(names, l.Name)
		}
	}
	return names
}

// size is the load in N or N·mm.
func (q *Question) size(load scf.Load) float64 {
	switch load {
	case scf.Tension:
		return q.Axial.Newtons()
	case scf.Bending:
		return q.Bending.NewtonMillimetres()
	case scf.Torsion:
		return q.Torque.NewtonMillimetres()
	}
	panic("strength: unknown load")
}

// nominal is the signed nominal stress of a load in MPa. Nominal.Net is the
// stress under a unit load in the part's unit of length, of a bar of unit
// thickness.
func (q *Question) nominal(l *specimen.Load) float64 {
	power := 2.0 // of length that a stress under a unit load is divided by
	if l.Name != scf.Tension {
		power = 3
	}
	thickness := 1.0
	if !q.shaft() {
		power--
		thickness = q.Thickness.In("mm")
	}
	return q.size(l.Name) * l.Nominal.Net / (math.Pow(q.millimetres(), power) * thickness)
}
