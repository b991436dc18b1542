package fem

// Torsion is a body of revolution twisted about its axis: the one unknown is
// the circumferential displacement u_θ, and only the shears xz and yz act.
type Torsion struct{}

func (Torsion) Name() string                     { return "torsion" }
func (Torsion) Unknowns() int                    { return 1 }
func (Torsion) Revolved() bool                   { return true }
func (Torsion) Elasticity(m Material) Elasticity { return isotropic(m) }
func (Torsion) Drawn(s Stress) Stress            { return s }

// Axis: u_θ vanishes where the radius does.
func (Torsion) Axis() []int { return []int{0} }

// Kinematics: γ_xθ = ∂u_θ/∂x, γ_rθ = ∂u_θ/∂r − u_θ/r.
func (Torsion) Kinematics() Kinematics {
	const w = 0
	var k Kinematics
	k.Strain[xz][w][alongX] = 1
	k.Strain[yz][w][alongY] = 1
	k.Strain[yz][w][overY] = -1
	k.Displacement[2][w] = 1
	return k
}
