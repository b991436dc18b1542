package render

import (
	"math"
	"sort"

	"gonum.org/v1/gonum/spatial/r2"

	"notchproof/fem"
	"notchproof/mesh/outline"
	"notchproof/verify/specimen"
)

// A needle is the surface stress at one place, as a ratio to the nominal stress.
type needle struct {
	At     r2.Vec
	Normal r2.Vec // out of the material
	Value  float64
	behind float64 // distance along the surface from where the needles were asked for
}

// A station is a piece of a free surface: a boundary edge and the length of
// surface before and behind it.
type station struct {
	edge     int
	from, to float64
}

// surface is the chain of free surface that a notch lies on.
type surface struct {
	terms    []Term
	read     reading
	stations []station
	length   float64
	closed   bool
}

// surfaces lists the chains of free sides that hold sides of the notch.
func surfaces(terms []Term, part *specimen.Part, read reading) []surface {
	notch := make(map[int]bool)
	for _, side := range part.Notch {
		notch[side] = true
	}
	free := freeSides(part)
	var list []surface
	first := 0
	for _, loop := range append([]outline.Loop{part.Region.Outer}, part.Region.Holes...) {
		n := len(loop)
		for _, run := range runs(n, func(i int) bool { return free[first+i] }) {
			sides := make([]int, len(run))
			notched := false
			for k, i := range run {
				sides[k] = first + i
				notched = notched || notch[first+i]
			}
			if notched {
				list = append(list, newSurface(terms, read, sides, len(run) == n))
			}
		}
		first += n
	}
	return list
}

// freeSides tells of each side whether it is a surface of the part: neither a
// loaded end nor the line of symmetry of a half model.
func freeSides(part *specimen.Part) []bool {
	sides := part.Region.Sides()
	free := make([]bool, len(sides))
	for i, side := range sides {
		free[i] = !(part.Half && onAxis([]r2.Vec{side.Curve.At(0), side.Curve.At(0.5), side.Curve.At(1)}))
	}
	for _, p := range part.Plain {
		free[p.End] = false
	}
	return free
}

// runs gives the unbroken runs around a ring of n places for which ok holds.
func runs(n int, ok func(i int) bool) [][]int {
	start := 0
	for start < n && ok(start) {
		start++
	}
	if start == n {
		whole := make([]int, n)
		for i := range whole {
			whole[i] = i
		}
		return [][]int{whole}
	}
	var list [][]int
	open := false
	for k := 1; k <= n; k++ {
		i := (start + k) % n
		if !ok(i) {
			open = false
			continue
		}
		if !open {
			list, open = append(list, nil), true
		}
		list[len(list)-1] = append(list[len(list)-1], i)
	}
	return list
}

func newSurface(terms []Term, read reading, sides []int, closed bool) surface {
	m := terms[0].Solution.Problem.Shape.Mesh
	all := m.Region.Sides()
	byside := make(map[int][]int)
	for i, e := range m.Boundary {
		byside[int(e.Side)] = append(byside[int(e.Side)], i)
	}
	c := surface{terms: terms, read: read, closed: closed}
	for _, side := range sides {
		for _, i := range byside[side] {
			e := m.Boundary[i]
			l := all[side].Curve.Length(e.T0, e.T1)
			c.stations = append(c.stations, station{i, c.length, c.length + l})
			c.length += l
		}
	}
	return c
}

// needle reads the surface at a distance along it.
func (c *surface) needle(at float64) needle {
	if c.closed {
		at = math.Mod(math.Mod(at, c.length)+c.length, c.length)
	}
	k := 0
	for k < len(c.stations)-1 && c.stations[k].to < at {
		k++
	}
	st := c.stations[k]
	return c.value(st.edge, math.Max(0, math.Min(1, (at-st.from)/(st.to-st.from))))
}

// value reads the field on the surface from the stresses that follow from the
// strains within it: the sharpest there are, and free of tractions.
func (c *surface) value(edge int, s float64) needle {
	var sum tensor
	var n needle
	for _, t := range c.terms {
		p := t.Solution.Surface(edge, s)
		at := onSurface(p)
		for k := range sum {
			sum[k] += t.Scale * at[k]
		}
		n.At, n.Normal = p.At, p.Normal
	}
	n.Value = c.read.of(&sum)
	return n
}

// onSurface is the tensor of a surface's stresses in the axes of the part.
func onSurface(p fem.SurfacePoint) tensor {
	n := p.Normal
	tx, ty := -n.Y, n.X
	return tensor{p.Tangential * tx * tx, p.Tangential * ty * ty, p.Tangential * tx * ty, p.Hoop, p.Shear * tx, p.Shear * ty}
}

// highest is the place of the largest value, to a part in twenty of an element.
func (c *surface) highest() needle {
	best := needle{Value: math.Inf(-1)}
	for _, st := range c.stations {
		for k := range stationPieces + 1 {
			if n := c.value(st.edge, float64(k)/stationPieces); n.Value > best.Value {
				best = n
			}
		}
	}
	return best
}

const stationPieces = 20

// nearest gives the distance along the surface at which it comes closest to a
// point, to a part in twenty of an element.
func (c *surface) nearest(to r2.Vec) (at, gap float64) {
	solution := c.terms[0].Solution
	gap = math.Inf(1)
	for _, st := range c.stations {
		for k := range stationPieces + 1 {
			s := float64(k) / stationPieces
			p := solution.Surface(st.edge, s)
			if d := r2.Norm(r2.Sub(p.At, to)); d < gap {
				gap, at = d, st.from+s*(st.to-st.from)
			}
		}
	}
	return at, gap
}

// needles reads the surface around a distance along it, as far as reach to both
// sides: at even steps, and ever closer together towards the middle, where the
// whole arc of a small root may be less than a step.
func (c *surface) needles(at, step, reach float64) []needle {
	if half := c.length / 2; c.closed && reach > 0.7*half {
		reach = half // all round rather than with a gap
	}
	offsets := []float64{0}
	const closer, least = 0.8, 1e-3
	for d := step; d > least*step; d *= closer {
		offsets = append(offsets, d, -d)
	}
	for d := 2 * step; d <= reach; d += step {
		offsets = append(offsets, d, -d)
	}
	sort.Float64s(offsets)
	var list []needle
	for _, d := range offsets {
		if c.closed || at+d >= 0 && at+d <= c.length {
			n := c.needle(at + d)
			n.behind = d
			list = append(list, n)
		}
	}
	return list
}
