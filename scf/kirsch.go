package scf

import "math"

// A Polar is a plane state of stress in polar components.
type Polar struct {
	Radial, Hoop, Shear float64
}

// A Plane is a plane state of stress in Cartesian components.
type Plane struct {
	XX, YY, XY float64
}

// Cartesian turns polar components at the polar angle theta.
func (p Polar) Cartesian(theta float64) Plane {
	s, c := math.Sincos(theta)
	twist := 2 * p.Shear * s * c
	return Plane{
		XX: p.Radial*c*c + p.Hoop*s*s - twist,
		YY: p.Radial*s*s + p.Hoop*c*c + twist,
		XY: (p.Radial-p.Hoop)*s*c + p.Shear*(c*c-s*s),
	}
}

// A KirschPlate is an infinite plate with a circular hole of the given radius
// about the origin, under the uniform stress Remote far away. Exact; G. Kirsch,
// Z. VDI 42 (1898) 797, here with all three remote components by rotation and
// superposition.
type KirschPlate struct {
	Radius float64
	Remote Plane
}

// terms are the mean of the remote stress and its deviator turned to theta:
// normal and shear part.
func (k KirschPlate) terms(theta float64) (mean, normal, shear float64) {
	s, c := math.Sincos(2 * theta)
	half := (k.Remote.XX - k.Remote.YY) / 2
	return (k.Remote.XX + k.Remote.YY) / 2, half*c + k.Remote.XY*s, k.Remote.XY*c - half*s
}

// Stress is the stress at the radius r ≥ Radius and the angle theta from x, in
// radians. Under Remote.XX = S alone:
//
//	σr = S/2 (1 − a²/r²) + S/2 (1 − 4a²/r² + 3a⁴/r⁴) cos 2θ
//	σθ = S/2 (1 + a²/r²) − S/2 (1 + 3a⁴/r⁴) cos 2θ
//	τ  = −S/2 (1 + 2a²/r² − 3a⁴/r⁴) sin 2θ
func (k KirschPlate) Stress(r, theta float64) Polar {
	mean, normal, shear := k.terms(theta)
	e := (k.Radius / r) * (k.Radius / r)
	return Polar{
		Radial: mean*(1-e) + normal*(1-4*e+3*e*e),
		Hoop:   mean*(1+e) - normal*(1+3*e*e),
		Shear:  shear * (1 + 2*e - 3*e*e),
	}
}

// StressAt is the stress at a point of the plate, outside the hole.
func (k KirschPlate) StressAt(x, y float64) Plane {
	theta := math.Atan2(y, x)
	return k.Stress(math.Hypot(x, y), theta).Cartesian(theta)
}

// Displacement is the radial and the circumferential displacement that go with
// Stress, without rigid motion, for the shear modulus mu and Kolosov's kappa:
// (3 − ν)/(1 + ν) in plane stress, 3 − 4ν in plane strain. From memory; a test
// differentiates it back to the stresses.
func (k KirschPlate) Displacement(r, theta, mu, kappa float64) (radial, hoop float64) {
	mean, normal, shear := k.terms(theta)
	e := (k.Radius / r) * (k.Radius / r)
	radial = r / (4 * mu) * (mean*(kappa-1+2*e) + 2*normal*(1+(kappa+1)*e-e*e))
	hoop = r / (2 * mu) * shear * (1 + (kappa-1)*e + e*e)
	return radial, hoop
}
