package fem

// A Model is one kind of two-dimensional elasticity: which unknowns a node
// carries and how strains follow from them. Everything else (element matrices,
// loads, stresses, reactions) is derived from these few facts.
type Model interface {
	// Name is the trade name of the model.
	Name() string
	// Unknowns is the number of unknowns a node, 1 to 3.
	Unknowns() int
	// Revolved tells whether y is a radius: integrals then carry the weight
	// y, and strains may hold the unknown divided by y.
	Revolved() bool
	// Kinematics gives the strains and displacements in terms of the unknowns.
	Kinematics() Kinematics
	// Elasticity gives the stresses that unit strains cause.
	Elasticity(Material) Elasticity
	// Axis lists the unknowns that vanish at y = 0 in a body of revolution.
	Axis() []int
	// Drawn gives the stresses that act on the drawn plane (for the bending
	// harmonic the half-plane θ = 0, where the bending stress is greatest) from
	// the amplitudes.
	Drawn(amplitude Stress) Stress
}

// The operators from which strains are built, indices of Kinematics.Strain.
const (
	alongX = iota // ∂/∂x
	alongY        // ∂/∂y
	overY         // 1/y
	strainOperators
)

// The components of strain and stress.
const (
	xx = iota
	yy
	zz
	xy
	xz
	yz
	components
)

// Kinematics holds the constants of a model: strain c is the sum over unknowns
// a and operators k of Strain[c][a][k] × (operator k applied to unknown a), and
// displacement i (along x, y, z) is the sum over a of Displacement[i][a] ×
// unknown a.
type Kinematics struct {
	Strain       [components][3][strainOperators]float64
	Displacement [3][3]float64
}

// Elasticity is the symmetric matrix from strains to stresses.
type Elasticity [components][components]float64

// Material is linear elastic and isotropic.
type Material struct {
	E  float64 // Young's modulus
	Nu float64 // Poisson's ratio, above −1 and below 1/2
}

// ShearModulus is E/(2(1+ν)).
func (m Material) ShearModulus() float64 { return m.E / (2 * (1 + m.Nu)) }

// isotropic is Hooke's law in three dimensions.
func isotropic(m Material) Elasticity {
	g := m.ShearModulus()
	lame := m.E * m.Nu / ((1 + m.Nu) * (1 - 2*m.Nu))
	var d Elasticity
	for i := xx; i <= zz; i++ {
		for j := xx; j <= zz; j++ {
			d[i][j] = lame
		}
		d[i][i] += 2 * g
		d[i+3][i+3] = g
	}
	return d
}
