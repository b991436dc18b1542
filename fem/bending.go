package fem

// Bending is the first harmonic of a round bar, the one that bends it:
//
//	u_x = U cosθ, u_r = V cosθ, u_θ = W sinθ.
//
// The unknowns are U, V and S = V + W. On the axis a displacement that is
// single-valued has U = 0 and V = −W, that is S = 0, while V (the deflection)
// is free; with S among the unknowns both conditions are plain zeros, and the
// strains that are divided by the radius hold only U and S, which vanish there.
type Bending struct{}

func (Bending) Name() string                     { return "bending harmonic" }
func (Bending) Unknowns() int                    { return 3 }
func (Bending) Revolved() bool                   { return true }
func (Bending) Elasticity(m Material) Elasticity { return isotropic(m) }
func (Bending) Axis() []int                      { return []int{0, 2} }

// Drawn: on the half-plane θ = 0 the shears xz and yz, which go with sinθ, vanish.
func (Bending) Drawn(s Stress) Stress {
	s.XZ, s.YZ = 0, 0
	return s
}

// Kinematics, amplitudes (cosθ for xx, yy, zz, xy; sinθ for xz, yz):
//
//	ε_θ  = (V + W)/r          = S/r
//	γ_xθ = ∂W/∂x − U/r        = ∂(S−V)/∂x − U/r
//	γ_rθ = ∂W/∂r − (V + W)/r  = ∂(S−V)/∂r − S/r
func (Bending) Kinematics() Kinematics {
	const u, v, s = 0, 1, 2
	var k Kinematics
	k.Strain[xx][u][alongX] = 1
	k.Strain[yy][v][alongY] = 1
	k.Strain[zz][s][overY] = 1
	k.Strain[xy][u][alongY] = 1
	k.Strain[xy][v][alongX] = 1
	k.Strain[xz][s][alongX] = 1
	k.Strain[xz][v][alongX] = -1
	k.Strain[xz][u][overY] = -1
	k.Strain[yz][s][alongY] = 1
	k.Strain[yz][v][alongY] = -1
	k.Strain[yz][s][overY] = -1
	k.Displacement[0][u] = 1
	k.Displacement[1][v] = 1
	k.Displacement[2][s] = 1
	k.Displacement[2][v] = -1
	return k
}
