package sparse

import (
	"math"
	"sync"
	"sync/atomic"
)

// A Residual says how well x solves A·x = b.
type Residual struct {
	Relative float64 // max |b − A·x| ÷ max |b|; grows with the condition of A
	Backward float64 // max |b − A·x| ÷ max (|A|·|x| + |b|), |A| summed over elements; some ε for a sound factor
}

// Residual measures the solutions x of A·x = b, where fill gives A. It takes
// one more pass over the element matrices for all sides together, on as many
// goroutines as the factorisation had.
func (f *Factor) Residual(fill Fill, x, b [][]float64) []Residual {
	_, r := f.remainder(fill, x, b)
	return r
}

// Refine improves the solutions x by one step of iterative refinement and
// returns their residuals before that step. It takes what Residual takes, and
// a Solve.
func (f *Factor) Refine(fill Fill, x, b [][]float64) []Residual {
	r, was := f.remainder(fill, x, b)
	f.Solve(r...)
	for s := range x {
		for u, d := range r[s] {
			x[s][u] += d
		}
	}
	return was
}

// remainder returns b − A·x and its measures. The elements' parts are found on
// several goroutines and added up in the order of elements.
func (f *Factor) remainder(fill Fill, x, b [][]float64) ([][]float64, []Residual) {
	f.check()
	p := f.plan
	if len(x) != len(b) {
		panic("sparse: numbers of solutions and of right-hand sides differ")
	}
	length := len(p.pattern.Index)
	product := make([]float64, len(x)*length)  // A·x, by place in the index
	absolute := make([]float64, len(x)*length) // |A|·|x|
	f.eachElement(fill, func(e int, matrix []float64) {
		from := int(p.pattern.Start[e])
		list := p.pattern.list(int32(e))
		for s := range x {
			at := s*length + from
			multiply(matrix, list, x[s], product[at:at+len(list)], absolute[at:at+len(list)])
		}
	})
	rest := make([][]float64, len(x))
	measures := make([]Residual, len(x))
	for s := range x {
		rest[s] = append([]float64(nil), b[s]...)
		size := make([]float64, p.unknowns)
		for at, u := range p.pattern.Index {
			if u >= 0 {
				rest[s][u] -= product[s*length+at]
				size[u] += absolute[s*length+at]
			}
		}
		measures[s] = measure(rest[s], size, b[s])
	}
	return rest, measures
}

// measure compares a remainder with b and with the size of the terms in A·x.
func measure(rest, size, b []float64) Residual {
	var top, right, all float64
	for u, r := range rest {
		top = math.Max(top, math.Abs(r)) // carries NaN along
		right = math.Max(right, math.Abs(b[u]))
		all = math.Max(all, size[u]+math.Abs(b[u]))
	}
	if top == 0 {
		return Residual{}
	}
	return Residual{Relative: top / right, Backward: top / all}
}

// multiply adds matrix·x to product and its absolute terms to absolute, for
// the lower triangle of a symmetric element matrix.
func multiply(matrix []float64, list []int32, x, product, absolute []float64) {
	for i, u := range list {
		if u < 0 {
			continue
		}
		row := matrix[i*len(list):][:i+1]
		for j, v := range list[:i+1] {
			if v < 0 {
				continue
			}
			t := float64(row[j] * x[v])
			product[i] += t
			absolute[i] += math.Abs(t)
			if i != j {
				t = float64(row[j] * x[u])
				product[j] += t
				absolute[j] += math.Abs(t)
			}
		}
	}
}

// eachElement calls do with each element matrix, on several goroutines.
func (f *Factor) eachElement(fill Fill, do func(e int, matrix []float64)) {
	p := f.plan
	elements := int64(p.pattern.Elements())
	var next atomic.Int64
	work := func(worker int) {
		memory := make([]float64, p.listed*p.listed)
		for {
			e := next.Add(1) - 1
			if e >= elements {
				return
			}
			if len(p.runs[e]) == 0 { // nothing but prescribed unknowns
				continue
			}
			n := len(p.pattern.list(int32(e)))
			fill(worker, int(e), memory[:n*n])
			do(int(e), memory[:n*n])
		}
	}
	var others sync.WaitGroup
	for worker := 1; worker < f.workers; worker++ {
		others.Go(func() { work(worker) })
	}
	work(0)
	others.Wait()
}
