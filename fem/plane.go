package fem

// PlaneStress is a thin plate in its plane: unknowns u_x and u_y, no stress
// across the thickness.
type PlaneStress struct{}

// PlaneStrain is a slice of a long prism: unknowns u_x and u_y, no strain along z.
type PlaneStrain struct{}

func (PlaneStress) Name() string { return "plane stress" }
func (PlaneStrain) Name() string { return "plane strain" }

func (PlaneStress) Unknowns() int { return 2 }
func (PlaneStrain) Unknowns() int { return 2 }

func (PlaneStress) Revolved() bool { return false }
func (PlaneStrain) Revolved() bool { return false }

func (PlaneStress) Axis() []int { return nil }
func (PlaneStrain) Axis() []int { return nil }

func (PlaneStress) Drawn(s Stress) Stress { return s }
func (PlaneStrain) Drawn(s Stress) Stress { return s }

func (PlaneStress) Kinematics() Kinematics { return planeKinematics() }
func (PlaneStrain) Kinematics() Kinematics { return planeKinematics() }

func planeKinematics() Kinematics {
	const u, v = 0, 1
	var k Kinematics
	k.Strain[xx][u][alongX] = 1
	k.Strain[yy][v][alongY] = 1
	k.Strain[xy][u][alongY] = 1
	k.Strain[xy][v][alongX] = 1
	k.Displacement[0][u] = 1
	k.Displacement[1][v] = 1
	return k
}

// Elasticity leaves σ_zz at zero; the thickness strain that goes with it is
// not among the unknowns.
func (PlaneStress) Elasticity(m Material) Elasticity {
	var d Elasticity
	e := m.E / (1 - m.Nu*m.Nu)
	d[xx][xx], d[yy][yy] = e, e
	d[xx][yy], d[yy][xx] = m.Nu*e, m.Nu*e
	d[xy][xy] = m.ShearModulus()
	return d
}

func (PlaneStrain) Elasticity(m Material) Elasticity { return isotropic(m) }
