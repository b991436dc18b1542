package render

import (
	"math"
	"strconv"
)

// A tracing gathers a path as SVG path data, with no more corners than the eye
// needs.
type tracing struct {
	data []byte
	run  []point // the open subpath
}

func (t *tracing) move(p point) {
	t.finish(false)
	t.run = append(t.run[:0], p)
}

func (t *tracing) line(p point) { t.run = append(t.run, p) }

func (t *tracing) close() { t.finish(true) }

// circle adds a circle as two arcs.
func (t *tracing) circle(c point, radius float64) {
	t.finish(false)
	r, d := short(radius), short(2*radius)
	t.data = append(t.data, "M"+short(c.X-radius)+" "+short(c.Y)+"a"+r+" "+r+" 0 1 0 "+d+" 0a"+r+" "+r+" 0 1 0 -"+d+" 0z"...)
}

// take gives the data and begins anew.
func (t *tracing) take() []byte {
	t.finish(false)
	data := t.data
	t.data = nil
	return data
}

// finish writes the open subpath.
func (t *tracing) finish(closed bool) {
	if len(t.run) > 1 {
		for i, p := range simplified(t.run) {
			letter := byte('L')
			if i == 0 {
				letter = 'M'
			}
			t.data = append(t.data, letter)
			t.data = strconv.AppendFloat(t.data, hundredth(p.X), 'f', -1, 64)
			t.data = append(t.data, ' ')
			t.data = strconv.AppendFloat(t.data, hundredth(p.Y), 'f', -1, 64)
		}
		if closed {
			t.data = append(t.data, 'z')
		}
	}
	t.run = t.run[:0]
}

func hundredth(x float64) float64 {
	if x = math.Round(x*100) / 100; x == 0 {
		return 0 // and no minus
	}
	return x
}

// unseen is how far, in units of SVG or pixels, a line may pass by a corner that
// is left out: a twentieth of the narrowest line.
const unseen = 0.04

// simplified leaves out the corners of a polyline that lie within unseen of
// what remains (D. H. Douglas, T. K. Peucker, Cartographica 10 (1973) 112).
func simplified(ps []point) []point {
	if len(ps) < 3 {
		return ps
	}
	keep := make([]bool, len(ps))
	keep[0], keep[len(ps)-1] = true, true
	for todo := [][2]int{{0, len(ps) - 1}}; len(todo) > 0; {
		a, b := todo[len(todo)-1][0], todo[len(todo)-1][1]
		todo = todo[:len(todo)-1]
		far, at := 0.0, 0
		for i := a + 1; i < b; i++ {
			if d := offSegment(ps[i], ps[a], ps[b]); d > far {
				far, at = d, i
			}
		}
		if far > unseen {
			keep[at] = true
			todo = append(todo, [2]int{a, at}, [2]int{at, b})
		}
	}
	var out []point
	for i, p := range ps {
		if keep[i] {
			out = append(out, p)
		}
	}
	return out
}

// offSegment is the distance of p from the segment a to b.
func offSegment(p, a, b point) float64 {
	dx, dy := b.X-a.X, b.Y-a.Y
	t := 0.0
	if l := dx*dx + dy*dy; l > 0 {
		t = math.Max(0, math.Min(1, ((p.X-a.X)*dx+(p.Y-a.Y)*dy)/l))
	}
	return math.Hypot(p.X-a.X-t*dx, p.Y-a.Y-t*dy)
}
