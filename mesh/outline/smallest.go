package outline

import (
	"fmt"
	"math"
	"slices"
)

// A Smallest is the least section of a region in a range of x. On a plain
// parallel stretch From and To are its ends, elsewhere they are equal.
type Smallest struct {
	From, To float64
	Cut      []Interval
	Value    float64 // what the measure gives there
}

// SmallestSection finds where between x0 and x1 the measure of the cut across
// x is least; the measure may be the area of Bar or of Shaft, a section
// modulus, or any other that changes smoothly with the cut. Of several equal
// places the longest counts, then the first. It is an error if the range is
// empty or has a place without material.
//
// Between landmarks (corners, and places where a curve runs along or across
// the axis) the cut changes smoothly. There the measure is sampled at 16
// intervals and its minima closed in by golden section, good to about 1e-8 of
// the stretch in x and to rounding in the value, which is flat there; two
// minima within two samples would count as one. At a landmark both limits are
// taken, so that a shoulder's face belongs to both sizes.
func (r *Region) SmallestSection(x0, x1 float64, measure func([]Interval) float64) (Smallest, error) {
	if !(x0 < x1) {
		return Smallest{}, fmt.Errorf("no range of x between %s and %s", number(x0), number(x1))
	}
	k := r.cutter(axisX)
	marks := []float64{x0}
	for _, d := range k.landmarks(r) {
		if d > marks[len(marks)-1]+k.near && d < x1-k.near {
			marks = append(marks, d)
		}
	}
	marks = append(marks, x1)
	s := sweep{cutter: k, measure: measure}
	for i := range marks[1:] {
		if err := s.stretch(marks[i], marks[i+1]); err != nil {
			return Smallest{}, err
		}
	}
	return s.best, nil
}

// landmarks lists in rising order the depths at which the cut may change its
// character: of corners, and where a curve runs along or across the depth.
func (k *cutter) landmarks(r *Region) []float64 {
	var ds []float64
	for _, s := range k.stretches {
		ds = append(ds, s.d0)
	}
	for _, s := range r.Sides() {
		for _, t := range turningPoints(s.Curve, k.along) {
			ds = append(ds, k.depth(s.Curve.At(t)))
		}
	}
	slices.Sort(ds)
	return ds
}

type sweep struct {
	*cutter
	measure func([]Interval) float64
	best    Smallest
	found   bool
}

// sameValue: measures closer than this, relatively, are equal.
const sameValue = 1e-13

// stretch looks through one stretch between landmarks.
func (s *sweep) stretch(a, b float64) error {
	const n = 16
	var x, v [n + 1]float64
	least, most := math.Inf(1), math.Inf(-1)
	for i := range x {
		x[i] = a + (b-a)*float64(i)/n
		if i == n {
			x[i] = b
		}
		cut := s.cut(x[i], i == n) // inside, both limits are the same
		if len(cut) == 0 {
			return fmt.Errorf("no material at x = %s", number(x[i]))
		}
		if v[i] = s.measure(cut); math.IsNaN(v[i]) {
			return fmt.Errorf("section at x = %s has no measure", number(x[i]))
		}
		least, most = min(least, v[i]), max(most, v[i])
	}
	if most-least <= sameValue*math.Abs(most) {
		s.offer(a, b, s.cut(x[n/2], false))
		return nil
	}
	s.offer(a, a, s.cut(a, false))
	for i := 1; i < n; i++ {
		if v[i] <= v[i-1] && v[i] <= v[i+1] {
			at := golden(func(x float64) float64 { return s.measure(s.cut(x, false)) }, x[i-1], x[i+1])
			s.offer(at, at, s.cut(at, false))
		}
	}
	s.offer(b, b, s.cut(b, true))
	return nil
}

// offer keeps a place if it beats the best so far, and lengthens that if it
// goes on here.
func (s *sweep) offer(from, to float64, cut []Interval) {
	v := s.measure(cut)
	same := math.Abs(v-s.best.Value) <= sameValue*math.Abs(v)
	switch {
	case s.found && same && from == s.best.To:
		s.best.To = to
	case !s.found, same && to-from > s.best.To-s.best.From, !same && v < s.best.Value:
		s.best, s.found = Smallest{from, to, cut, v}, true
	}
}

// golden closes in on a minimum inside a bracket until rounding hides it.
func golden(f func(float64) float64, a, b float64) float64 {
	ratio := (math.Sqrt(5) - 1) / 2
	c, d := b-ratio*(b-a), a+ratio*(b-a)
	fc, fd := f(c), f(d)
	for range 44 { // ratio⁴⁴ is 6e-10
		if fc <= fd {
			b, d, fd = d, c, fc
			c = b - ratio*(b-a)
			fc = f(c)
		} else {
			a, c, fc = c, d, fd
			d = a + ratio*(b-a)
			fd = f(d)
		}
	}
	return a + (b-a)/2
}
