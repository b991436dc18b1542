package chart

import (
	"math"

	"gonum.org/v1/gonum/mat"
)

// try solves the weighted least squares by QR, and leaves out each point in turn:
// its residual then is the one of the full fit over 1 − h, h being its diagonal
// element of the hat matrix (D. M. Allen, Technometrics 16 (1974) 125, from
// memory), so that no second fit is needed.
func (f *Fit) try(form form, data []datum) (trial, bool) {
	terms := form.terms()
	n, m := len(data), len(terms)
	if n < m+2 {
		return trial{}, false
	}
	u, v := f.scalings(form)
	a, b := mat.NewDense(n, m, nil), mat.NewVecDense(n, nil)
	weights := make([]float64, n)
	for i, d := range data {
		weights[i] = d.weight / math.Abs(form.outer.slope(d.k))
		x, y := u.of(form.x.of(d.x)), v.of(form.y.of(d.y))
		for k, w := range terms {
			a.Set(i, k, weights[i]*w.of(x, y))
		}
		b.SetVec(i, weights[i]*form.outer.back(d.k))
	}
	var qr mat.QR
	qr.Factorize(a)
	var c mat.VecDense
	if err := qr.SolveVecTo(&c, false, b); err != nil {
		return trial{}, false
	}
	var r mat.Dense
	qr.RTo(&r)
	left := 0.0
	for i, d := range data {
		residual := b.AtVec(i) - mat.Dot(a.RowView(i), &c)
		rest := 1 - leverage(&r, a.RawRowView(i))
		if rest < 1e-9 {
			return trial{}, false // this point alone decides a coefficient
		}
		k := form.outer.of(form.outer.back(d.k) - residual/rest/weights[i])
		left = math.Max(left, math.Abs(k-d.k)/d.k)
	}
	return trial{form, c.RawVector().Data, left}, !math.IsNaN(left) && !math.IsInf(left, 0)
}

// leverage is the diagonal element of the hat matrix of a row: the square of
// what solves Rᵀ z = row.
func leverage(r *mat.Dense, row []float64) float64 {
	z, sum := make([]float64, len(row)), 0.0
	for k := range row {
		v := row[k]
		for l := range k {
			v -= float64(r.At(l, k) * z[l])
		}
		z[k] = v / r.At(k, k)
		sum += float64(z[k] * z[k])
	}
	return sum
}
