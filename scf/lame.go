package scf

// Thick-walled cylinder and sphere after G. Lamé, and the rotating disc. All
// exact. Stresses, pressures and moduli share one unit, radii another.

// A LameCylinder is a long thick-walled cylinder under internal pressure.
type LameCylinder struct {
	Inner, Outer float64 // radii
	Pressure     float64 // inside
}

// Stress is σr, σθ = p a²/(b² − a²) (1 ∓ b²/r²) at the radius r.
func (c LameCylinder) Stress(r float64) (radial, hoop float64) {
	a2, b2 := c.Inner*c.Inner, c.Outer*c.Outer
	p := c.Pressure * a2 / (b2 - a2)
	return p * (1 - b2/(r*r)), p * (1 + b2/(r*r))
}

// Displacement is the radial displacement at r, with Young's modulus E and
// Poisson's ratio nu, under the uniform axial stress axial: 0 for plane stress
// and open ends, nu (σr + σθ) for plane strain. Hooke's law, u = r εθ.
func (c LameCylinder) Displacement(r, E, nu, axial float64) float64 {
	radial, hoop := c.Stress(r)
	return r * (hoop - nu*(radial+axial)) / E
}

// A LameSphere is a thick-walled sphere under internal pressure.
type LameSphere struct {
	Inner, Outer float64
	Pressure     float64
}

// Stress at the radius r, with p' = p a³/(b³ − a³):
// σr = p' (1 − b³/r³), σθ = p' (1 + b³/(2r³)), the latter in all tangential
// directions.
func (s LameSphere) Stress(r float64) (radial, hoop float64) {
	a3, b3, r3 := s.Inner*s.Inner*s.Inner, s.Outer*s.Outer*s.Outer, r*r*r
	p := s.Pressure * a3 / (b3 - a3)
	return p * (1 - b3/r3), p * (1 + b3/(2*r3))
}

// Displacement is the radial displacement at r: r [(1 − ν) σθ − ν σr] / E.
func (s LameSphere) Displacement(r, E, nu float64) float64 {
	radial, hoop := s.Stress(r)
	return r * ((1-nu)*hoop - nu*radial) / E
}

// SpinningDisc is the hoop stress at the inner edge of a free annular disc of
// constant thickness with radii inner and outer, density rho and angular speed
// omega: (3 + ν)/4 ρω² [b² + (1 − ν)/(3 + ν) a²], plane stress.
func SpinningDisc(inner, outer, rho, omega, nu float64) float64 {
	return (3 + nu) / 4 * rho * omega * omega * (outer*outer + (1-nu)/(3+nu)*inner*inner)
}
