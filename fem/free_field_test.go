package fem

import "gonum.org/v1/gonum/spatial/r2"

// A surface is given by a function ψ of space that vanishes on it and grows at
// the rate 1 along its normal n. Both need be right on the surface alone.
type surface func(x [3]jet) (psi jet, n [3]jet)

// sphere has the radius r about the origin; in the plane it is a circle. All is
// polynomial, so that fields made from it are smooth in the middle as well.
func sphere(r float64) surface {
	return func(x [3]jet) (psi jet, n [3]jet) {
		for i := range n {
			n[i] = x[i].scaled(1 / r)
		}
		return dot(x, x).minus(constant(r * r)).scaled(1 / (2 * r)), n
	}
}

// torus is swept by a circle of radius r whose middle goes round the axis at the
// radius c.
func torus(r, c float64) surface {
	return func(x [3]jet) (psi jet, n [3]jet) {
		rho := x[1].times(x[1]).plus(x[2].times(x[2])).root()
		off := rho.minus(constant(c))
		psi = x[0].times(x[0]).plus(off.times(off)).minus(constant(r * r)).scaled(1 / (2 * r))
		radial := off.over(rho).scaled(1 / r)
		return psi, [3]jet{x[0].scaled(1 / r), x[1].times(radial), x[2].times(radial)}
	}
}

// strained is a field whose displacements are polynomials of degree 2, so that
// its strains have no second derivatives; one for each model.
func strained(m Model) field {
	half := func(x [3]jet) jet { return x[0].scaled(1.1).plus(constant(0.5)) }
	radius2 := func(x [3]jet) jet { return x[1].times(x[1]).plus(x[2].times(x[2])) }
	switch m.(type) {
	case Axisymmetric:
		return alongMeridian(func(x [3]jet) jet { return x[0].times(half(x)).minus(radius2(x).scaled(0.2)) },
			func(x [3]jet) jet { return x[0].scaled(0.3).minus(constant(0.4)) })
	case Torsion:
		return aroundAxis(half)
	case Bending:
		return bent(half, func(x [3]jet) jet { return x[0].times(x[0]).scaled(-0.4).plus(radius2(x).scaled(0.2)) },
			func([3]jet) jet { return constant(0.3) })
	}
	return func(x [3]jet) [3]jet {
		return [3]jet{
			x[0].times(half(x)).plus(x[0].times(x[1]).scaled(0.6)),
			x[1].scaled(-0.3).plus(x[0].times(x[0]).scaled(0.2)).plus(x[1].times(x[1]).scaled(0.5)),
		}
	}
}

// free makes the field one that leaves a surface without traction, but not
// without stress. It starts from the strained field of the model, whose traction
// on the surface is t = σ n, and adds sin(ψ) w, which is zero on the surface and
// has the gradient w ⊗ n there, and so the traction
//
//	λ (w·n) n + μ (w + (w·n) n),
//
// which is −t for w = −[t − (λ+μ)/(λ+2μ) (t·n) n]/μ. The sine makes the field no
// polynomial.
func (e *exact) free(s surface) {
	lambda, mu := e.lame()
	start, plane := strained(e.model), !e.model.Revolved()
	e.u = func(x [3]jet) [3]jet {
		if plane {
			x[2] = jet{}
		}
		u := start(x)
		psi, n := s(x)
		stress := strainedStress(u, lambda, mu)
		var t [3]jet
		for i := range t {
			t[i] = dot(stress[i], n)
		}
		tn := dot(t, n).scaled((lambda + mu) / (lambda + 2*mu))
		wave := psi.sin().scaled(-1 / mu)
		for i := range u {
			u[i] = u[i].plus(wave.times(t[i].minus(tn.times(n[i]))))
		}
		return u
	}
}

// strainedStress is Hooke's law with the first derivatives of the stress, for
// displacements of degree 2.
func strainedStress(u [3]jet, lambda, mu float64) (s [3][3]jet) {
	slope := func(i, j int) jet { return jet{v: u[i].d[j], d: u[i].h[j]} }
	trace := slope(0, 0).plus(slope(1, 1)).plus(slope(2, 2)).scaled(lambda)
	for i := range s {
		for j := range s {
			s[i][j] = slope(i, j).plus(slope(j, i)).scaled(mu)
		}
		s[i][i] = s[i][i].plus(trace)
	}
	return s
}

func dot(a, b [3]jet) jet {
	return a[0].times(b[0]).plus(a[1].times(b[1])).plus(a[2].times(b[2]))
}

// wavy is a field of sines and exponentials that fits a model, smooth across the
// axis.
func wavy(m Model) field {
	wave := func(p r2.Vec, shift float64) func([3]jet) jet {
		return func(x [3]jet) jet {
			q := x[1].times(x[1]).plus(x[2].times(x[2]))
			return x[0].scaled(p.X).plus(q.scaled(p.Y)).plus(constant(shift)).sin()
		}
	}
	grow := func(x [3]jet) jet { return x[0].scaled(0.5).exp() }
	switch m.(type) {
	case Axisymmetric:
		return alongMeridian(wave(pt(0.9, 0.4), 0.3), wave(pt(-0.7, 0.3), 1))
	case Torsion:
		return aroundAxis(wave(pt(1, 0.3), 0.5))
	case Bending:
		return bent(wave(pt(0.8, 0.3), 0.2), wave(pt(-0.9, 0.4), 0.5), grow)
	}
	return func(x [3]jet) [3]jet {
		a := x[0].plus(x[1].scaled(0.7)).sin()
		b := x[1].scaled(0.9).minus(x[0].scaled(0.4)).exp()
		return [3]jet{a, x[0].sin().times(b)}
	}
}
