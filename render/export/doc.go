// Package export writes the solution of a finding for other programs: the field
// over the part as a VTK XML unstructured grid, the stress along its free
// surface as a table of comma-separated values.
//
// Stresses are multiples of the nominal stress, displacements are those of a
// material whose Young's modulus is the nominal stress; to scale them multiply
// stresses by the nominal stress and displacements by nominal stress ÷ Young's
// modulus. Lengths carry the part's unit. x runs along the part, y across it; of
// a half model y ≥ 0 is there, of a shaft the half-plane on which its stresses
// are drawn (θ = 0 in bending).
package export
