package extrapolate

import (
	"fmt"
	"math"
)

// A Study is the outcome of a ladder of mesh sizes, in the terms of
//
//	Roache, J. Fluids Eng. 116 (1994) 405; Verification and Validation in
//	Computational Science and Engineering, 1998 (Richardson extrapolation,
//	grid convergence index);
//	Celik et al., J. Fluids Eng. 130 (2008) 078001 (the least procedure).
//
// 1, 2 and 3 are the finest, middle and coarsest of the last three rungs. The
// zero value is undecided.
type Study struct {
	Fine       float64   // f1, the finest rung's value
	Limit      float64   // Richardson's limit; NaN when there is none
	Order      float64   // observed order p
	Orders     []float64 // p of each three neighbours, coarse to fine; NaN where none
	Change     float64   // |(f1 - f2)/f1|, relative
	Distance   float64   // |(Limit - f1)/Limit|, relative
	GCI        float64   // grid convergence index of the finest rung, relative
	Asymptotic float64   // GCI23/(r21^p GCI12): 1 where the ladder has reached its order
	Status     Status
	Warnings   []string
}

// Safety factors of the grid convergence index (Roache 1994, 1998):
// with an order observed on three or more rungs, and with an order taken on
// trust from two.
const (
	safetyObserved = 1.25
	safetyTrusted  = 3.0
)

// leastRatio is the refinement from which differences are thought to stand out
// of other errors (Celik et al. 2008, step 2).
const leastRatio = 1.3

// Sizes reads a ladder of sizes (a typical length of the elements, in any
// unit) and the values they gave, in the same order, coarse first or fine
// first. Ratios need not be equal. The last three rungs are used for all but
// Orders. It panics when the lengths differ or the sizes are not positive and
// strictly monotone.
func Sizes(sizes, values []float64) Study {
	h, f := fineFirst(sizes, values)
	s := Study{Limit: math.NaN(), GCI: math.Inf(1)}
	switch {
	case !finite(values):
		s.Warnings = append(s.Warnings, "a rung's value is not a number")
		return s
	case len(f) < 3:
		s.Status = TooFew
		s.Warnings = append(s.Warnings, fmt.Sprintf("%d rungs, three are needed to observe an order", len(f)))
		return s
	}
	for i := len(f) - 3; i >= 0; i-- {
		p, _ := observedOrder(h[i:i+3], f[i:i+3])
		s.Orders = append(s.Orders, p)
	}
	s.read(h, f)
	return s
}

// read fills the study from the three finest rungs.
func (s *Study) read(h, f []float64) {
	s.Fine = f[0]
	r21, r32 := h[1]/h[0], h[2]/h[1]
	if r21 < leastRatio || r32 < leastRatio {
		s.Warnings = append(s.Warnings, fmt.Sprintf("sizes refined by %.3g and %.3g, less than %g", r32, r21, leastRatio))
	}
	e21 := f[1] - f[0]
	s.Change = math.Abs(e21 / f[0])
	if level := noise(f); math.Abs(e21) <= level {
		s.Limit, s.GCI, s.Distance, s.Status = f[0], safetyTrusted*rounding, 0, Converged
		if math.Abs(f[2]-f[1]) > level {
			s.Status, s.Limit, s.GCI = Undecided, math.NaN(), math.Inf(1)
			s.Warnings = append(s.Warnings, "the last two rungs agree to rounding and the one before does not: exact or an accident, add a rung")
		}
		return
	}
	s.Order, s.Status = observedOrder(h[:3], f[:3])
	if s.Status == Diverging && math.Abs(e21) <= widest(f)/10 {
		// The ladder has come down far already: it is the difference before the
		// last one that is small by accident.
		s.Status, s.Order = Undecided, 0
		s.Warnings = append(s.Warnings, "the difference before the last one is small by accident: add a rung")
		return
	}
	if s.Status == Undecided || s.Status == Diverging {
		s.Order = 0
		s.Warnings = append(s.Warnings, "the differences do not shrink as any positive order would make them")
		return
	}
	if s.Status == Oscillatory {
		s.Warnings = append(s.Warnings, "the values oscillate: the order is nominal")
	}
	a := math.Pow(r21, s.Order)
	s.Limit = f[0] - e21/(a-1)
	s.Distance = math.Abs((s.Limit - f[0]) / s.Limit)
	s.GCI = safetyObserved * s.Change / (a - 1)
	coarse := safetyObserved * math.Abs((f[2]-f[1])/f[1]) / (math.Pow(r32, s.Order) - 1)
	s.Asymptotic = coarse / (a * s.GCI)
}

// widest is the largest difference between neighbours.
func widest(f []float64) float64 {
	most := 0.0
	for i := 1; i < len(f); i++ {
		most = math.Max(most, math.Abs(f[i]-f[i-1]))
	}
	return most
}

// Estimate gives the finest rung's value with the grid convergence index as
// its uncertainty (about 95 % coverage in Roache's experience, no bound).
func (s Study) Estimate() Estimate {
	if math.IsNaN(s.Limit) || s.Status == Undecided || s.Status == TooFew || s.Status == Diverging {
		return Estimate{Value: math.NaN(), Uncertainty: math.Inf(1), Status: s.Status, Notes: s.Warnings}
	}
	return Estimate{Value: s.Fine, Uncertainty: s.GCI * math.Abs(s.Fine), Order: s.Order, Status: s.Status, Notes: s.Warnings}
}

// TwoRungs is the grid convergence index, relative, of the finer of two rungs
// whose order is taken on trust (Roache 1994: factor 3). ratio is the coarse
// size over the fine one.
func TwoRungs(fine, coarse, ratio, order float64) float64 {
	if !(ratio > 1) || !(order > 0) {
		panic("extrapolate: ratio must exceed 1 and order 0")
	}
	return safetyTrusted * math.Abs((coarse-fine)/fine) / (math.Pow(ratio, order) - 1)
}

// Richardson is the limit from two rungs of a known order.
func Richardson(fine, coarse, ratio, order float64) float64 {
	if !(ratio > 1) || !(order > 0) {
		panic("extrapolate: ratio must exceed 1 and order 0")
	}
	return fine + (fine-coarse)/(math.Pow(ratio, order)-1)
}

func fineFirst(sizes, values []float64) (h, f []float64) {
	if len(sizes) != len(values) {
		panic("extrapolate: sizes and values differ in number")
	}
	n := len(sizes)
	h, f = make([]float64, n), make([]float64, n)
	reverse := n > 1 && sizes[0] > sizes[n-1]
	for i := range sizes {
		j := i
		if reverse {
			j = n - 1 - i
		}
		h[j], f[j] = sizes[i], values[i]
	}
	for i, x := range h {
		if !(x > 0) || math.IsInf(x, 0) || i > 0 && x <= h[i-1] {
			panic("extrapolate: sizes must be positive and strictly monotone")
		}
	}
	return h, f
}
