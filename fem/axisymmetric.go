package fem

// Axisymmetric is a body of revolution under loads that are the same at every
// angle: unknowns u_x and u_r.
type Axisymmetric struct{}

func (Axisymmetric) Name() string                     { return "axisymmetric" }
func (Axisymmetric) Unknowns() int                    { return 2 }
func (Axisymmetric) Revolved() bool                   { return true }
func (Axisymmetric) Elasticity(m Material) Elasticity { return isotropic(m) }
func (Axisymmetric) Drawn(s Stress) Stress            { return s }

// Axis: u_r vanishes where the radius does.
func (Axisymmetric) Axis() []int { return []int{1} }

func (Axisymmetric) Kinematics() Kinematics {
	const u, v = 0, 1
	var k Kinematics
	k.Strain[xx][u][alongX] = 1
	k.Strain[yy][v][alongY] = 1
	k.Strain[zz][v][overY] = 1
	k.Strain[xy][u][alongY] = 1
	k.Strain[xy][v][alongX] = 1
	k.Displacement[0][u] = 1
	k.Displacement[1][v] = 1
	return k
}
