package main

import (
	"errors"
	"math/big"
)

// precision is the number of bits that rules are polished with. The plain
// monomials in u and v lose some thirty bits to their poor conditioning at
// degree 20, twice that in the normal equations; the rest is ample.
const precision = 320

func number(x float64) *big.Float { return new(big.Float).SetPrec(precision).SetFloat64(x) }

func zero() *big.Float { return number(0) }

func mul(x, y *big.Float) *big.Float { return zero().Mul(x, y) }
func add(x, y *big.Float) *big.Float { return zero().Add(x, y) }
func sub(x, y *big.Float) *big.Float { return zero().Sub(x, y) }

// exact gives the mean of u^i v^j over the triangle.
func exact(i, j int) *big.Float {
	// u = 1 − 3(λ0λ1 + λ1λ2 + λ2λ0), v = 27 λ0λ1λ2, and the mean of λ0^a λ1^b λ2^c
	// is 2 a! b! c! / (a+b+c+2)!.
	sum := new(big.Rat)
	for n := 0; n <= i; n++ {
		for p := 0; p <= n; p++ {
			for q := 0; p+q <= n; q++ {
				r := n - p - q
				a, b, c := p+r+j, p+q+j, q+r+j
				term := new(big.Int).Mul(factorial(a), factorial(b))
				term.Mul(term, factorial(c)).Mul(term, big.NewInt(2))
				term.Mul(term, new(big.Int).Binomial(int64(i), int64(n)))
				term.Mul(term, new(big.Int).Binomial(int64(n), int64(p)))
				term.Mul(term, new(big.Int).Binomial(int64(n-p), int64(q)))
				term.Mul(term, new(big.Int).Exp(big.NewInt(-3), big.NewInt(int64(n)), nil))
				sum.Add(sum, new(big.Rat).SetFrac(term, factorial(a+b+c+2)))
			}
		}
	}
	scale := new(big.Int).Exp(big.NewInt(27), big.NewInt(int64(j)), nil)
	sum.Mul(sum, new(big.Rat).SetInt(scale))
	return zero().SetRat(sum)
}

func factorial(n int) *big.Int { return new(big.Int).MulRange(1, int64(n)) }

// A sharp orbit is an orbit to many digits.
type sharp struct {
	size    int
	w, a, b *big.Float
}

// polish takes a rule on to many digits by Newton's method on the moments of
// the plain monomials u^i v^j. Where unknowns and equations differ in number,
// it takes the smallest step that solves them.
func polish(degree int, list []orbit) ([]sharp, error) {
	powers := exponents(degree)
	var want []*big.Float
	for _, p := range powers {
		want = append(want, exact(p[0], p[1]))
	}
	var rule []sharp
	for _, o := range list {
		s := sharp{o.size, number(o.w), number(o.a), number(o.b)}
		if o.size == 1 {
			s.a = zero().Quo(number(1), number(3))
			s.b = s.a
		}
		rule = append(rule, s)
	}
	limit := zero().SetMantExp(number(1), -150)
	for range 12 {
		residual, jacobian := sharpMoments(powers, want, rule)
		if largest(residual).Cmp(limit) < 0 {
			return rule, nil
		}
		if largest(residual).Cmp(number(1e-6)) > 0 {
			break
		}
		step, err := smallest(jacobian, residual)
		if err != nil {
			return nil, err
		}
		for i := range rule {
			o := &rule[i]
			o.w = sub(o.w, step[0])
			switch o.size {
			case 1:
				step = step[1:]
			case 3:
				o.a = sub(o.a, step[1])
				o.b = o.a
				step = step[2:]
			default:
				o.a, o.b = sub(o.a, step[1]), sub(o.b, step[2])
				step = step[3:]
			}
		}
	}
	return nil, errors.New("polishing does not converge")
}

// sharpMoments gives the residual of each moment, and its derivatives.
func sharpMoments(powers [][2]int, want []*big.Float, rule []sharp) (residual []*big.Float, jacobian [][]*big.Float) {
	for _, x := range want {
		residual = append(residual, sub(zero(), x))
	}
	jacobian = make([][]*big.Float, len(powers))
	one, three, n27 := number(1), number(3), number(27)
	for _, o := range rule {
		a, b := o.a, o.b
		c := sub(sub(one, a), b)
		u := sub(one, mul(three, add(mul(a, b), mul(c, add(a, b)))))
		v := mul(n27, mul(a, mul(b, c)))
		ua, ub := mul(three, sub(a, c)), mul(three, sub(b, c))
		va, vb := mul(mul(n27, b), sub(c, a)), mul(mul(n27, a), sub(c, b))
		size := number(float64(o.size))
		for k, p := range powers {
			f := mul(power(u, p[0]), power(v, p[1]))
			residual[k] = add(residual[k], mul(size, mul(o.w, f)))
			fu, fv := zero(), zero()
			if p[0] > 0 {
				fu = mul(number(float64(p[0])), mul(power(u, p[0]-1), power(v, p[1])))
			}
			if p[1] > 0 {
				fv = mul(number(float64(p[1])), mul(power(u, p[0]), power(v, p[1]-1)))
			}
			sw := mul(size, o.w)
			da := mul(sw, add(mul(fu, ua), mul(fv, va)))
			db := mul(sw, add(mul(fu, ub), mul(fv, vb)))
			row := append(jacobian[k], mul(size, f))
			switch o.size {
			case 3:
				row = append(row, add(da, db))
			case 6:
				row = append(row, da, db)
			}
			jacobian[k] = row
		}
	}
	return residual, jacobian
}

func power(x *big.Float, n int) *big.Float {
	p := number(1)
	for range n {
		p = mul(p, x)
	}
	return p
}

func largest(list []*big.Float) *big.Float {
	most := zero()
	for _, x := range list {
		if y := zero().Abs(x); y.Cmp(most) > 0 {
			most = y
		}
	}
	return most
}

// smallest solves jacobian·x = residual: x = Jᵀ (J Jᵀ)⁻¹ r.
func smallest(jacobian [][]*big.Float, residual []*big.Float) ([]*big.Float, error) {
	m, n := len(jacobian), len(jacobian[0])
	a := make([][]*big.Float, m)
	for i := range m {
		for k := range m {
			sum := zero()
			for j := range n {
				sum = add(sum, mul(jacobian[i][j], jacobian[k][j]))
			}
			a[i] = append(a[i], sum)
		}
		a[i] = append(a[i], residual[i])
	}
	// Gauss elimination; the matrix is positive definite.
	for k := range m {
		if a[k][k].Sign() <= 0 {
			return nil, errors.New("moments are dependent")
		}
		for i := k + 1; i < m; i++ {
			f := zero().Quo(a[i][k], a[k][k])
			for j := k; j <= m; j++ {
				a[i][j] = sub(a[i][j], mul(f, a[k][j]))
			}
		}
	}
	y := make([]*big.Float, m)
	for k := m - 1; k >= 0; k-- {
		y[k] = a[k][m]
		for j := k + 1; j < m; j++ {
			y[k] = sub(y[k], mul(a[k][j], y[j]))
		}
		y[k] = zero().Quo(y[k], a[k][k])
	}
	x := make([]*big.Float, n)
	for j := range n {
		x[j] = zero()
		for i := range m {
			x[j] = add(x[j], mul(jacobian[i][j], y[i]))
		}
	}
	return x, nil
}
