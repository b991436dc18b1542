package fem

import "math/rand/v2"

// A poly is the sum of coef[i][k] x^i r^(k+shift), r² being y² + z². With
// even, only even powers of r are there: such a thing is smooth across the
// axis.
type poly struct {
	coef  [][]float64
	shift int
}

// randomPoly has x^i r^k with k from least up and i+k up to degree, before the
// shift.
func randomPoly(rng *rand.Rand, degree, least, shift int, even bool) poly {
	p := poly{shift: shift}
	for i := range degree + 1 {
		row := make([]float64, degree+1-i)
		for k := range row {
			if e := k + shift; k < least || even && (e < 0 || e%2 != 0) {
				continue
			}
			row[k] = rng.Float64() - 0.5
		}
		p.coef = append(p.coef, row)
	}
	return p
}

func (p poly) at(x [3]jet) (sum jet) {
	q := x[1].times(x[1]).plus(x[2].times(x[2]))
	for i, row := range p.coef {
		for k, c := range row {
			if c == 0 {
				continue
			}
			e := k + p.shift
			term := x[0].power(i).scaled(c)
			if e%2 != 0 {
				term = term.times(q.root())
				e--
			}
			sum = sum.plus(term.times(q.power(e / 2)))
		}
	}
	return sum
}

// plane has y in the place of r.
func (p poly) plane(x [3]jet) (sum jet) {
	for i, row := range p.coef {
		for k, c := range row {
			sum = sum.plus(x[0].power(i).times(x[1].power(k + p.shift)).scaled(c))
		}
	}
	return sum
}

// polynomial is a field whose unknowns are random polynomials of a degree in x
// and y. Fields of bodies of revolution are smooth across the axis if axis is
// set. What is divided by the radius contains it as a factor in any case, so
// that stresses are polynomials too.
func polynomial(m Model, degree int, axis bool, seed uint64) field {
	rng := rand.New(rand.NewPCG(seed, 7))
	switch m.(type) {
	case Axisymmetric:
		return alongMeridian(randomPoly(rng, degree, 0, 0, axis).at, randomPoly(rng, degree, 1, -1, axis).at)
	case Torsion:
		return aroundAxis(randomPoly(rng, degree, 1, -1, axis).at)
	case Bending:
		return bent(randomPoly(rng, degree, 1, -1, axis).at, randomPoly(rng, degree, 0, 0, axis).at, randomPoly(rng, degree, 1, -2, axis).at)
	}
	a, b := randomPoly(rng, degree, 0, 0, false), randomPoly(rng, degree, 0, 0, false)
	return func(x [3]jet) [3]jet { return [3]jet{a.plane(x), b.plane(x)} }
}

// The three kinds of displacement of a body of revolution, by functions of x
// and the radius.

// alongMeridian has u_x = f and u_r = r g.
func alongMeridian(f, g func([3]jet) jet) field {
	return func(x [3]jet) [3]jet {
		s := g(x)
		return [3]jet{f(x), x[1].times(s), x[2].times(s)}
	}
}

// aroundAxis has u_θ = r g.
func aroundAxis(g func([3]jet) jet) field {
	return func(x [3]jet) [3]jet {
		s := g(x)
		return [3]jet{{}, x[2].times(s).scaled(-1), x[1].times(s)}
	}
}

// bent has u_x = r f cosθ, u_r = g cosθ and u_θ = (r² s − g) sinθ. With
// y = r cosθ, z = r sinθ that is u_y = g − z² s and u_z = y z s.
func bent(f, g, s func([3]jet) jet) field {
	return func(x [3]jet) [3]jet {
		y, z, sv := x[1], x[2], s(x)
		return [3]jet{y.times(f(x)), g(x).minus(z.times(z).times(sv)), y.times(z).times(sv)}
	}
}
