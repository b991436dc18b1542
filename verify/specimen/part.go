// Package specimen turns a family with dimensions, or a part file with an
// outline of the user's own, into the part that is solved: its outline, model,
// loads, supports, nominal section and the sides where the factor is sought.
//
// Conventions. x runs along the part, from the middle of a notch, hole or
// collar or from the face of a shoulder, whose larger section is at x < 0; y = 0
// is the axis (shafts) or the middle line (bars). Every load is scaled so that
// the nominal stress on the net section is one: stresses that come out of a
// solve are factors.
package specimen

import (
	"gonum.org/v1/gonum/spatial/r2"

	"notchproof/fem"
	"notchproof/mesh/outline"
	"notchproof/scf"
)

// A Part is what is checked.
type Part struct {
	Title   string      // what it is, for people; may be empty
	Name    string      // of the family, or "outline"
	Family  *scf.Family // nil for an outline of the user's own
	Dims    scf.Dims    // complete, with defaults
	Given   scf.Dims    // as they were given
	Unit    string      // unit of all lengths, empty when unnamed
	Options scf.Options // Poisson's ratio, force line
	Region  *outline.Region
	Notch   []int // sides on which the factor is sought
	// Watch are free sides off the notch on which the stress is looked at too:
	// where it is higher than on the notch the user is warned.
	Watch []int
	// Joints are the points where the curvature of the boundary jumps; the
	// stress is less smooth there and the mesh is graded towards them.
	Joints []Joint
	// Half tells that only y ≥ 0 is modelled.
	Half bool
	// ForceLine is the y along which a bar's axial force acts.
	ForceLine float64
	// Opposite tells that a bar's bending moment puts y < 0 in tension, not y > 0.
	Opposite bool
	// Section is where the nominal stress of an outline is taken; nil for families.
	Section *Section
	// Sharp are the concave corners that have no radius and therefore no factor.
	Sharp []outline.Corner
	// Plain are the stretches of constant section at both ends, one at either.
	Plain []Plain
	// Net is the x of the cut on which the balance of forces is checked.
	Net   float64
	Loads []Load
}

// Plain is a stretch of constant section that ends in a loaded end.
type Plain struct {
	Name     string
	From, To float64 // x; the loaded end is at To
	Low      float64 // y range of the material (bars and bores), Low < High
	High     float64
	End      int // side of the loaded end
}

// A Joint is a point where the curvature of the boundary jumps.
type Joint struct {
	At     r2.Vec
	Radius float64 // the smaller radius of curvature beside it
}

// A Load is one way of loading the part, scaled to unit nominal stress.
type Load struct {
	Name      scf.Load
	Model     fem.Model
	Fixed     []fem.Fixed
	Pins      []Pin
	Tractions []fem.Traction
	Nominal   scf.Nominal
	// Far is the axial stress (shear stress in torsion) in plain stretch i at y.
	Far func(plain int, y float64) float64
	// Resultant is what the stresses across any cut add up to. Only what the
	// outside puts there is held: a half model in tension carries forces across
	// its line of symmetry, one in bending along it, and these are left at zero.
	Resultant fem.Resultant
	// Shear tells that the factor is one of shear stress.
	Shear bool
}

// A Pin holds one unknown at a corner of the outline.
type Pin struct {
	At      r2.Vec
	Unknown int
}
