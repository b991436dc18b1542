// Package fem solves linear elasticity on curved triangle meshes of any order.
//
// A Problem is a curved mesh with a Model (plane stress, plane strain, body of
// revolution, torsion, bending of a round bar), a material, supports and loads.
// Solve gives one Solution per load case: displacements, stress at any point,
// stress on free surfaces, reactions and resultants across sections.
//
// Conventions. x runs along the part, y across it; for bodies of revolution y
// is the radius and the mesh is the meridian half-plane y ≥ 0. z is the third
// direction: the thickness of a plate, the circumference of a round body.
// Strains and stresses are ordered xx, yy, zz, xy, xz, yz, shear strains being
// engineering strains. Integrals are per unit thickness (plates) or per radian
// (bodies of revolution; for the bending harmonic the factor ∫cos²θ dθ is left
// out on both sides). Any consistent set of units will do.
package fem
