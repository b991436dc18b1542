package scf

// A Load is a way of loading a part. Its text is what users write and read.
type Load string

const (
	Tension Load = "tension" // axial force P
	Bending Load = "bending" // bending moment M; for bars in their plane
	Torsion Load = "torsion" // torque T, shafts only
)
