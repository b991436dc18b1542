package sizing

import (
	"context"
	"math"

	"notchproof/scf"
)

// ways lists what else a family offers.
func (q *Question) ways(ctx context.Context, a *Answer) (list []way, err error) {
	if a.Outcome != Met && a.Outcome != Beyond {
		return nil, nil
	}
	l := &wayList{q: q, answer: a.At.At, now: a.At.At / 2}
	if x, given := q.given(); given && (a.Outcome == Beyond || x < a.At.At) {
		l.now = x
	} else if a.Outcome == Beyond {
		return nil, nil // nothing to keep
	}
	if q.ok(l.now) {
		if l.known, err = q.knownAt(ctx, a, l.now); err != nil {
			return nil, err
		}
	}
	l.dims = q.Family.Complete(q.with(l.now))
	switch {
	case q.Dimension == "r":
		l.radius()
	case q.Family.Name == "bar-hole" && q.Dimension == "d":
		l.hole()
	case q.Family.Name == "bar-ellipse" && q.Dimension == "b":
		l.shrink("a", "hole less far across the bar")
	default:
		l.moreRadius()
	}
	return l.list, nil
}

// knownAt is the measure of the part as it is, from the scan if it was there.
func (q *Question) knownAt(ctx context.Context, a *Answer, x float64) (*Reading, error) {
	for i := range a.Scanned {
		if a.Scanned[i].At == x {
			return &a.Scanned[i].Reading, nil
		}
	}
	s, err := q.sample(ctx, x, q.rough())
	return &s.Reading, err
}

// A wayList collects ways around the part as it is now.
type wayList struct {
	q      *Question
	answer float64  // of the dimension that is sought
	now    float64  // what the alternatives keep instead of it
	known  *Reading // the measure there
	dims   scf.Dims
	list   []way
}

func (l *wayList) add(w way, ok bool) {
	if ok {
		l.list = append(l.list, w)
	}
}

// keep is the radius that the alternatives have, with whatever follows from it.
func (l *wayList) keep() []Size { return []Size{{"r", l.now}} }

// radius: what else may be done where a larger radius would help.
func (l *wayList) radius() {
	q := l.q
	switch q.Family.Name {
	case "bar-shoulder", "shaft-shoulder":
		l.shoulder()
	case "bar-collar", "shaft-collar":
		l.shrink("L", "shorter collar")
	case "shaft-ring-groove":
		l.fixed("groove twice as wide", Size{"w", 2 * l.dims["w"]})
	default:
		if l.dims["angle"] < 90 {
			l.fixed("flanks opened to 90°", Size{"angle", 90})
		}
	}
	l.largerNet()
}

// fixed is the part as it is now with one dimension changed.
func (l *wayList) fixed(what string, s Size) {
	w, ok := l.q.familyWay(what, l.q.Family, l.dims, append(l.keep(), s), "", Interval{})
	l.add(w, ok)
}

// shrink makes a dimension smaller.
func (l *wayList) shrink(name, what string) {
	x := l.dims[name]
	var keep []Size
	if l.q.Dimension == "r" {
		keep = l.keep()
	}
	w, ok := l.q.familyWay(what, l.q.Family, l.dims, keep, name, Interval{x, x / 10})
	w.known = l.known
	w.changes = func(y float64) []Size { return []Size{{name, y - x}} }
	l.add(w, ok)
}

// largerNet makes the net size larger, up to a hundredth of the step.
func (l *wayList) largerNet() {
	D, d := l.dims["D"], l.dims["d"]
	if !(D > d) {
		return
	}
	w, ok := l.q.familyWay("larger net size", l.q.Family, l.dims, l.keep(), "d", Interval{d, D - 0.01*(D-d)})
	w.known, w.guess, w.below = l.known, D-0.25*(D-d), D
	w.changes = func(x float64) []Size { return []Size{{"d", x - d}} }
	l.add(w, ok)
}

// shoulder: fillets of other shapes with the same height as the one there is.
func (l *wayList) shoulder() {
	q, d, D := l.q, l.dims["d"], l.dims["D"]
	step := (D - d) / 2
	given := l.dims["ra"]
	if _, ok := q.Dims["ra"]; !ok {
		given = l.now
		w, ok := q.familyWay("elliptic fillet", q.Family, l.dims, l.keep(), "ra", Interval{l.now, 8 * l.now})
		if longer := 1.1 * math.Sqrt(l.now*l.answer); longer > l.now && longer < w.within.To {
			w.guess = longer
		}
		w.known = l.known
		l.add(w, ok)
		w, ok = q.familyWay("elliptic fillet, twice as long", q.Family, l.dims, []Size{{"r", l.now}, {"ra", 2 * l.now}}, "", Interval{})
		l.add(w, ok)
	}
	if face := step - l.now; face > 0 && l.dims["c"] < face {
		// A tenth of the face is left: where none is, the fillet runs out into the
		// chamfer.
		c := 0.9 * face
		w, ok := q.familyWay("corner of the shoulder chamfered", q.Family, l.dims, []Size{{"r", l.now}, {"ra", given}, {"c", c}}, "", Interval{})
		w.changes = func(float64) []Size { return []Size{{"length of the larger size", -c}} }
		if given == l.now {
			w.sizes = []Size{{"r", l.now}, {"c", c}}
		}
		l.add(w, ok)
	}
	if most := 0.45 * step; l.dims["c"] == 0 {
		w := q.undercut(d, D, Interval{math.Min(l.now, most) / 4, most})
		w.guess = math.Min(l.answer, most)
		l.add(w, true)
	}
}

// hole: the same width across the bar, longer along it.
func (l *wayList) hole() {
	ellipse, ok := scf.Lookup("bar-ellipse")
	if !ok || l.dims["e"] != 0 {
		return
	}
	a := l.now / 2
	base := scf.Dims{"W": l.dims["W"], "a": a, "b": a}
	w, ok := l.q.familyWay("elliptic hole of the same width", ellipse, base, []Size{{"a", a}}, "b", Interval{a, 8 * a})
	w.known, w.guess = l.known, 1.2*a
	l.add(w, ok)
	w, ok = l.q.familyWay("elliptic hole, twice as long as wide", ellipse, base, []Size{{"a", a}, {"b", 2 * a}}, "", Interval{})
	l.add(w, ok)
}

// moreRadius leaves the dimension that was asked for as it is and makes the
// radius larger.
func (l *wayList) moreRadius() {
	r, has := l.q.Dims["r"]
	x, given := l.q.Dims[l.q.Dimension]
	if !has || !given {
		return
	}
	base := l.q.Family.Complete(l.q.Dims)
	if _, own := l.q.Dims["ra"]; !own {
		delete(base, "ra") // follows the radius
	}
	w, ok := l.q.familyWay("larger radius", l.q.Family, base, []Size{{l.q.Dimension, x}}, "r", Interval{r, 20 * r})
	w.known, w.guess = l.known, math.Min(1.5*r, w.within.To)
	l.add(w, ok)
}
