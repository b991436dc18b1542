package sizing

import (
	"math"
	"slices"

	"notchproof/scf"
)

// An Interval is a stretch of values of the dimension.
type Interval struct{ From, To float64 }

// Drawable finds the values of the dimension with which the part can be drawn:
// the stretch around the value given, else the longest that a coarse row of
// trials meets, its ends found by bisection. Check costs nothing beside a solve. The error is a
// *scf.DimensionError.
func (q *Question) Drawable() (Interval, error) {
	kind, err := q.kind()
	if err != nil {
		return Interval{}, err
	}
	if x, given := q.given(); given {
		if err := q.Family.Check(q.with(x)); err != nil {
			return Interval{}, err
		}
	}
	trials := q.trials(kind)
	lo, hi := q.stretch(trials)
	if lo < 0 {
		// What stands in the way is another dimension.
		return Interval{}, q.Family.Check(q.with(trials[len(trials)/2]))
	}
	out := Interval{trials[lo], trials[hi]}
	if lo > 0 {
		out.From = q.edge(trials[lo], trials[lo-1])
	}
	if hi < len(trials)-1 {
		out.To = q.edge(trials[hi], trials[hi+1])
	}
	return out, nil
}

// trials are values of the dimension from far too small to far too large.
func (q *Question) trials(kind scf.Dimension) []float64 {
	var xs []float64
	if kind.Angle {
		for a := range 180 {
			xs = append(xs, float64(a))
		}
		return append(xs, math.Nextafter(180, 0))
	}
	if kind.Zero {
		xs = append(xs, 0)
	}
	size := q.size()
	for k := -76; k <= 30; k++ { // 2.5e-8 to 1000 sizes, ten a decade
		x := size * math.Pow(10, float64(k)/10)
		xs = append(xs, x)
		if kind.Signed {
			xs = append(xs, -x)
		}
	}
	if x, given := q.given(); given && !slices.Contains(xs, x) {
		xs = append(xs, x)
	}
	slices.Sort(xs)
	return xs
}

// size is the largest of the lengths that stay; without any, that of the one
// that is sought.
func (q *Question) size() float64 {
	size := 0.0
	for _, d := range q.Family.Dimensions {
		if !d.Angle && d.Name != q.Dimension {
			size = math.Max(size, math.Abs(q.Dims[d.Name]))
		}
	}
	if size == 0 {
		size = math.Abs(q.Dims[q.Dimension])
	}
	if size == 0 || math.IsInf(size, 0) || math.IsNaN(size) {
		return 1
	}
	return size
}

func (q *Question) ok(x float64) bool { return q.Family.Check(q.with(x)) == nil }

// stretch is the run of trials that can be drawn: around the given value where
// that is one of them, else the longest; lo is −1 where there is none.
func (q *Question) stretch(trials []float64) (lo, hi int) {
	given, has := q.given()
	lo, hi = -1, -2
	for i := 0; i < len(trials); i++ {
		if !q.ok(trials[i]) {
			continue
		}
		j := i
		for j+1 < len(trials) && q.ok(trials[j+1]) {
			j++
		}
		if has && trials[i] <= given && given <= trials[j] {
			return i, j
		}
		if j-i > hi-lo {
			lo, hi = i, j
		}
		i = j
	}
	if has && q.ok(given) || lo >= 0 {
		return lo, hi
	}
	return -1, -1
}

// edge bisects between a value that can be drawn and one that cannot, and
// returns the last that can.
func (q *Question) edge(good, bad float64) float64 {
	for range 200 {
		middle := good + (bad-good)/2
		if good > 0 && bad > 2*good || bad > 0 && good > 2*bad {
			middle = math.Sqrt(good) * math.Sqrt(bad)
		}
		if math.Abs(bad-good) <= 1e-12*math.Abs(good) || middle == good || middle == bad {
			break
		}
		if q.ok(middle) {
			good = middle
		} else {
			bad = middle
		}
	}
	return good
}

// The search begins at features of a thousandth of the part and ends at ten
// times its size; it goes on where the limit may lie beyond. Beside an end that
// another dimension sets a thousandth is left out: less than anybody makes.
const (
	leastSize = 1e-3
	almost    = 1e-3
)

// grid is a coarse row of values that covers an interval, even in the
// coordinate: about two for every factor of ten in the size, or in the distance
// from an end that another dimension sets. The value given takes the place of the
// one that is next to it.
func (q *Question) grid(kind scf.Dimension, c coordinate, in Interval) []float64 {
	if c.linear {
		if kind.Signed {
			in = q.oneSide(in)
		}
		return evenly(in, 7)
	}
	size := q.size()
	from, to := math.Max(in.From, leastSize*size), math.Min(in.To, mostSize*size)
	if c.from > 0 {
		from = c.from + almost*c.from
	}
	if c.to > 0 {
		to = c.to - almost*(c.to-c.from)
	}
	if !(from < to) {
		return []float64{in.From + (in.To-in.From)/2}
	}
	span := Interval{c.of(from), c.of(to)}
	us := evenly(span, max(2, int(math.Ceil(2*(span.To-span.From)/math.Ln10))+1))
	xs := make([]float64, len(us))
	for i, u := range us {
		xs[i] = c.back(u)
	}
	xs[0], xs[len(xs)-1] = from, to
	if x, given := q.given(); given && from < x && x < to {
		xs = placed(xs, us, x, c.of(x))
	}
	return xs
}

// placed puts a value into a row: for the nearest of the inner ones where that
// is close, else between.
func placed(xs, us []float64, x, u float64) []float64 {
	step := us[1] - us[0]
	i := int(math.Round((u - us[0]) / step))
	if i > 0 && i < len(us)-1 && math.Abs(us[i]-u) < 0.3*step {
		xs[i] = x
		return xs
	}
	xs = append(xs, x)
	slices.Sort(xs)
	return slices.Compact(xs)
}

// oneSide is the half of an interval around zero on which the dimension is now,
// the positive one where it is not given. Its far end, where the part falls
// apart, is left out.
func (q *Question) oneSide(in Interval) Interval {
	const short = 0.98
	if q.Dims[q.Dimension] < 0 {
		return Interval{short * in.From, 0}
	}
	return Interval{0, short * in.To}
}

func evenly(in Interval, n int) []float64 {
	xs := make([]float64, n)
	for i := range n {
		xs[i] = in.From + (in.To-in.From)*float64(i)/float64(n-1)
	}
	return xs
}
