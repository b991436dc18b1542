package fem

import "math"

// A jet is a number that depends on three coordinates, with its first and
// second derivatives: enough to write down the equations of elasticity for a
// displacement field that is given as a formula. Rounding apart, all of it is
// exact.
type jet struct {
	v float64
	d [3]float64
	h [3][3]float64
}

// coordinates are the jets of x, y and z at a point.
func coordinates(x, y, z float64) [3]jet {
	c := [3]jet{{v: x}, {v: y}, {v: z}}
	for i := range c {
		c[i].d[i] = 1
	}
	return c
}

func constant(v float64) jet { return jet{v: v} }

func (a jet) plus(b jet) jet {
	a.v += b.v
	for i := range a.d {
		a.d[i] += b.d[i]
		for j := range a.d {
			a.h[i][j] += b.h[i][j]
		}
	}
	return a
}

func (a jet) minus(b jet) jet { return a.plus(b.scaled(-1)) }

func (a jet) scaled(k float64) jet { return a.through(k*a.v, k, 0) }

func (a jet) times(b jet) jet {
	p := jet{v: a.v * b.v}
	for i := range p.d {
		p.d[i] = a.d[i]*b.v + a.v*b.d[i]
		for j := range p.d {
			p.h[i][j] = a.h[i][j]*b.v + a.d[i]*b.d[j] + a.d[j]*b.d[i] + a.v*b.h[i][j]
		}
	}
	return p
}

// through is f(a), given f, f' and f” at a: the chain rule.
func (a jet) through(f, f1, f2 float64) jet {
	p := jet{v: f}
	for i := range p.d {
		p.d[i] = f1 * a.d[i]
		for j := range p.d {
			p.h[i][j] = f1*a.h[i][j] + f2*a.d[i]*a.d[j]
		}
	}
	return p
}

func (a jet) inverse() jet { return a.through(1/a.v, -1/(a.v*a.v), 2/(a.v*a.v*a.v)) }

func (a jet) over(b jet) jet { return a.times(b.inverse()) }

func (a jet) root() jet {
	r := math.Sqrt(a.v)
	return a.through(r, 1/(2*r), -1/(4*r*a.v))
}

func (a jet) sin() jet {
	s, c := math.Sincos(a.v)
	return a.through(s, c, -s)
}

func (a jet) exp() jet {
	e := math.Exp(a.v)
	return a.through(e, e, e)
}

// power is a to the n-th; n may be negative.
func (a jet) power(n int) jet {
	if n < 0 {
		return a.inverse().power(-n)
	}
	p := constant(1)
	for range n {
		p = p.times(a)
	}
	return p
}
