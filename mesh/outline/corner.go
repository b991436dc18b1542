package outline

import (
	"math"

	"gonum.org/v1/gonum/spatial/r2"
)

// A Corner is a joint at which the boundary turns by more than 1e-6 rad.
type Corner struct {
	At            r2.Vec
	Degrees       float64 // angle measured through the material, 0 to 360
	Before, After int     // the sides that meet, by their index in Region.Sides()
}

// Reentrant tells whether the material takes up more than half of what is
// around the corner: there the stress of an elastic solid has no bound. How
// far above 180° that begins to matter is the caller's to say.
func (c Corner) Reentrant() bool { return c.Degrees > 180 }

// Corners lists the corners of all loops in the order of the sides after them.
// A joint of 1e-6 rad (0.00006°) and less counts as smooth, which is what
// coordinates of nine digits can promise.
func (r *Region) Corners() []Corner {
	const smooth = 1e-6
	var cs []Corner
	first := 0
	for _, l := range r.loops() {
		for i, s := range l {
			before := (i + len(l) - 1) % len(l)
			in, out := tangent(l[before].Curve, 1), tangent(s.Curve, 0)
			turn := math.Atan2(cross(in, out), dot(in, out))
			if math.Abs(turn) > smooth {
				cs = append(cs, Corner{s.Curve.At(0), 180 - turn*(180/math.Pi), first + before, first + i})
			}
		}
		first += len(l)
	}
	return cs
}

// A Run is a maximal run of consecutive sides of one loop along which the
// boundary bends away from the material, as along a fillet, a notch root or a
// hole.
type Run struct {
	Loop   int   // 0 the outer loop, k the k-th hole
	Sides  []int // indices in Region.Sides(), in order along the loop
	Closed bool  // the run is the whole loop
}

// ConcaveRuns lists the runs, loop by loop. A cubic that bends both ways
// belongs to a run, since it is concave somewhere.
func (r *Region) ConcaveRuns() []Run {
	var runs []Run
	first := 0
	for k, l := range r.loops() {
		n := len(l)
		hollow := make([]bool, n)
		straight := -1
		for i, s := range l {
			if hollow[i] = concave(s.Curve); !hollow[i] && straight < 0 {
				straight = i
			}
		}
		if straight < 0 {
			runs = append(runs, Run{k, count(first, n), true})
		}
		// Begin behind a side that is not concave, so that no run is cut.
		open := false
		for j := 1; j <= n && straight >= 0; j++ {
			i := (straight + j) % n
			if hollow[i] {
				if !open {
					runs = append(runs, Run{Loop: k})
				}
				last := &runs[len(runs)-1]
				last.Sides = append(last.Sides, first+i)
			}
			open = hollow[i]
		}
		first += n
	}
	return runs
}

// count lists n indices.
func count(first, n int) []int {
	is := make([]int, n)
	for i := range is {
		is[i] = first + i
	}
	return is
}

// concave tells whether c bends to the right somewhere: between breaks the
// curvature keeps its sign, so that one look in each stretch will do.
func concave(c Curve) bool {
	if _, ok := c.(Line); ok {
		return false
	}
	ts := breaks(c)
	for i, t := range ts[1:] {
		mid := ts[i] + (t-ts[i])/2
		d := c.Deriv(mid)
		// Relative to the speed: what a straight cubic's rounding leaves is
		// not curvature.
		if cross(d, c.Second(mid)) < -1e-9*dot(d, d) {
			return true
		}
	}
	return false
}
