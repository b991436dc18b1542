package predicate

import "gonum.org/v1/gonum/spatial/r2"

// An expansion is a slice of non-zero floating-point numbers that do not overlap,
// in order of growing size, whose exact sum is the value meant; no numbers mean
// zero. Its sign is that of its last number. The functions here write their
// result into h, which the caller makes long enough, and return the part used.
// None of them rounds, whatever the values, short of overflow and underflow.

// twoSum gives a+b as a rounded sum and its exact error (Knuth).
func twoSum(a, b float64) (s, e float64) {
	s = a + b
	bv := s - a
	av := s - bv
	return s, (a - av) + (b - bv)
}

// fastTwoSum is twoSum for |a| ≥ |b| (Dekker).
func fastTwoSum(a, b float64) (s, e float64) {
	s = a + b
	return s, b - (s - a)
}

// split cuts a into two halves of at most 26 bits each, so that their products
// are exact (Dekker, Veltkamp).
func split(a float64) (hi, lo float64) {
	const splitter = 1<<27 + 1
	c := float64(splitter * a)
	hi = c - (c - a)
	return hi, a - hi
}

// twoProduct gives a·b as a rounded product and its exact error. Every product
// of halves is exact, so fusing could not change a bit; the conversions say so.
func twoProduct(a, b float64) (p, e float64) {
	p = float64(a * b)
	ah, al := split(a)
	bh, bl := split(b)
	e = p - float64(ah*bh)
	e -= float64(al * bh)
	e -= float64(ah * bl)
	return p, float64(al*bl) - e
}

// cross gives p.X·q.Y − p.Y·q.X.
func cross(h *[4]float64, p, q r2.Vec) []float64 {
	var e, f [2]float64
	e[1], e[0] = twoProduct(p.X, q.Y)
	f[1], f[0] = twoProduct(-p.Y, q.X)
	return sum(h[:], trim(&e), trim(&f))
}

// trim drops the zeros of a pair.
func trim(e *[2]float64) []float64 {
	if e[1] == 0 {
		return e[:0]
	}
	if e[0] == 0 {
		return e[1:]
	}
	return e[:]
}

// sum adds two expansions (Shewchuk 1997, fig. 13, without zeros).
func sum(h, e, f []float64) []float64 {
	if len(e) == 0 {
		return append(h[:0], f...)
	}
	if len(f) == 0 {
		return append(h[:0], e...)
	}
	n, i, j := 0, 0, 0
	next := func() float64 { // merges e and f by size
		if j == len(f) || (i < len(e) && smaller(e[i], f[j])) {
			i++
			return e[i-1]
		}
		j++
		return f[j-1]
	}
	q := next()
	for i < len(e) || j < len(f) {
		var low float64
		if q, low = twoSum(q, next()); low != 0 {
			h[n] = low
			n++
		}
	}
	if q != 0 {
		h[n] = q
		n++
	}
	return h[:n]
}

// smaller tells whether |a| < |b|.
func smaller(a, b float64) bool {
	return (b > a) == (b > -a)
}

// scale multiplies an expansion by a number (Shewchuk 1997, fig. 14).
func scale(h, e []float64, b float64) []float64 {
	if len(e) == 0 || b == 0 {
		return h[:0]
	}
	n := 0
	q, low := twoProduct(e[0], b)
	if low != 0 {
		h[n] = low
		n++
	}
	for _, x := range e[1:] {
		big, small := twoProduct(x, b)
		s, low := twoSum(q, small)
		if low != 0 {
			h[n] = low
			n++
		}
		if q, low = fastTwoSum(big, s); low != 0 {
			h[n] = low
			n++
		}
	}
	if q != 0 {
		h[n] = q
		n++
	}
	return h[:n]
}

// sign is that of the largest number.
func sign(e []float64) int {
	if len(e) == 0 {
		return 0
	}
	if e[len(e)-1] > 0 {
		return 1
	}
	return -1
}
