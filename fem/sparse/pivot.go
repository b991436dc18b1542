package sparse

import "fmt"

// Pivots sums up the pivots of a factorisation: the diagonal entries of D in
// the factorisation L·D·Lᵀ.
type Pivots struct {
	Smallest, Largest float64
	Unknown           int // the unknown with the smallest pivot
}

// Ratio returns smallest ÷ largest: a rough measure (and bound from above) of
// the reciprocal condition of the matrix.
func (p Pivots) Ratio() float64 { return p.Smallest / p.Largest }

// A PivotError reports that a matrix is not positive definite to working
// precision, by the first pivot that shows it. In a structure that is not
// supported well enough, Unknown is a direction that remained free to move
// when all others before it had been eliminated.
type PivotError struct {
	Unknown  int
	Pivot    float64 // what elimination left of the diagonal entry
	Diagonal float64 // the diagonal entry before any elimination
	Limit    float64 // smallest acceptable Pivot ÷ Diagonal
}

// Relative returns pivot ÷ diagonal entry; 0 where both vanish.
func (e *PivotError) Relative() float64 {
	if e.Pivot == e.Diagonal && e.Pivot == 0 {
		return 0
	}
	return e.Pivot / e.Diagonal
}

func (e *PivotError) Error() string {
	r := e.Relative()
	switch {
	case r != r || e.Pivot-e.Pivot != 0:
		return fmt.Sprintf("sparse: unknown %d: entry is not a finite number", e.Unknown)
	case e.Diagonal <= 0:
		return fmt.Sprintf("sparse: unknown %d: diagonal entry %.3g is not positive", e.Unknown, e.Diagonal)
	case r < -e.Limit:
		return fmt.Sprintf("sparse: unknown %d: pivot %.2g of its diagonal entry: not positive definite", e.Unknown, r)
	}
	return fmt.Sprintf("sparse: unknown %d: pivot %.2g of its diagonal entry: unsupported", e.Unknown, r)
}

// pivotLimit returns the smallest pivot, relative to its diagonal entry, that
// is told from zero in a system of n unknowns: n·ε, but not less than 64·ε.
//
// Cholesky's method yields the factor of a matrix that differs from the given
// one by at most about n·ε·√(aᵢᵢ·aⱼⱼ) in entry i, j (Higham, Accuracy and
// Stability of Numerical Algorithms, 2nd ed. 2002, theorem 10.3), and n·ε is
// where pivoted Cholesky codes stop (Hammarling, Higham & Lucas, "LAPACK-style
// codes for pivoted Cholesky and QR updating", 2007). In floating bodies of up
// to 80 000 unknowns the last pivots were seen below 130·ε.
func pivotLimit(n int) float64 {
	const epsilon = 0x1p-52
	return epsilon * float64(max(n, 64))
}

// A judge looks at pivots and remembers the extremes and the first that fails.
// Unknowns are elimination numbers here.
type judge struct {
	limit             float64 // smallest acceptable pivot ÷ diagonal entry
	smallest, largest float64
	at                int32 // unknown of the smallest
	failed            int32 // unknown of the first bad pivot, −1 if none
	pivot, diagonal   float64
}

func newJudge(limit float64) judge { return judge{limit: limit, at: -1, failed: -1} }

// accept returns the pivot to go on with: the given one, or 1 for a bad one.
// Going on costs time only when a matrix is bad, and lets the first failure in
// the order of elimination be reported, whatever goroutine meets one first.
func (j *judge) accept(pivot, diagonal float64, unknown int32) float64 {
	if !(pivot > j.limit*diagonal) || !(diagonal > 0) || pivot-pivot != 0 {
		if j.failed < 0 {
			j.failed, j.pivot, j.diagonal = unknown, pivot, diagonal
		}
		return 1
	}
	if j.at < 0 || pivot < j.smallest {
		j.smallest, j.at = pivot, unknown
	}
	j.largest = max(j.largest, pivot)
	return pivot
}

// merge adds the findings of a judge of unknowns eliminated later.
func (j *judge) merge(o *judge) {
	if j.failed < 0 && o.failed >= 0 {
		j.failed, j.pivot, j.diagonal = o.failed, o.pivot, o.diagonal
	}
	if o.at >= 0 && (j.at < 0 || o.smallest < j.smallest) {
		j.smallest, j.at = o.smallest, o.at
	}
	j.largest = max(j.largest, o.largest)
}
