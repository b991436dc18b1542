// Package strength leads from the factor to a decision: a part with its loads
// and the strength of its material comes in; out go the stresses at every
// critical place, their safety, and what the whole section bears beyond the
// first local yield.
//
// The fields of all loads are solved on one mesh and added at every point of
// the surface and at every angle around a shaft. Beside that stands the rule
// of the design office, which takes all peaks to lie in one point.
//
// Conventions. Newtons, millimetres and megapascals inside; quantities go out
// in the units they came in. A positive axial force pulls. A positive bending
// moment puts y > 0 in tension (θ = 0 of a shaft), in a bar that is notched on
// one side the notch. The angle θ around a shaft counts from there. The sign of
// a torque changes nothing but the side.
//
// Nothing here is about fatigue life, stability, wear or residual stress.
package strength
