package render

import (
	"errors"
	"math"

	"gonum.org/v1/gonum/spatial/r2"

	"notchproof/fem"
	"notchproof/mesh/lagrange"
	"notchproof/scf"
	"notchproof/verify/specimen"
)

// A Term is one load's share of a field: its solution, whose stresses are ratios
// to that load's nominal stress, times Scale.
type Term struct {
	Solution *fem.Solution
	Load     *specimen.Load
	Scale    float64
}

// A field is what solutions say about stress, put so that it can be read at many
// pixels quickly: the stresses at the nodes of each triangle, found from that
// triangle alone, as polynomials of the triangle's own order. Neighbours are
// not averaged: where they disagree the picture shows a jump.
//
// On a straight triangle of a plane model the stress is a polynomial of one
// order less, so that the interpolation is exact.
type field struct {
	element *lagrange.Triangle
	terms   *expansion
	strands []strand
	cells   []cell
	read    reading
	low     float64 // range of the values at all nodes
	high    float64
}

// A strand is a set of stresses that behave alike. In the other half of a part
// of which one half is modelled, seen in that half's own axes, stresses are the
// same, or, odd, have the opposite sign: under bending.
type strand struct{ twist, odd bool }

// A cell is one triangle of a field: polynomials of its map (x and y) and of
// the stresses of each strand.
type cell struct {
	nodes    []r2.Vec
	place    [][4]float64
	stress   [][][4]float64 // by strand
	straight bool
}

func strandOf(t Term, half bool) strand {
	return strand{
		twist: t.Solution.Problem.Model.Unknowns() == 1,
		odd:   half && t.Load.Name == scf.Bending,
	}
}

// newField superposes terms, which must be on one mesh. Orders may differ; the
// highest is the field's. Half tells that one half of the part is modelled,
// whole that the other one counts in the range of values.
func newField(terms []Term, half, whole bool, read reading) (*field, error) {
	if len(terms) == 0 {
		return nil, errors.New("picture: nothing to draw")
	}
	shape := terms[0].Solution.Problem.Shape
	for _, t := range terms[1:] {
		s := t.Solution.Problem.Shape
		if s.Mesh != shape.Mesh {
			return nil, errors.New("picture: solutions on different meshes cannot be added")
		}
		if s.Element.Order > shape.Element.Order {
			shape = s
		}
	}
	f := &field{element: shape.Element, terms: expansionOf(shape.Element), read: read, cells: make([]cell, len(shape.Mesh.Triangles))}
	of := make([]int, len(terms)) // the strand of each term
	for i, t := range terms {
		of[i] = f.strand(strandOf(t, half))
	}
	ranges := make([][2]float64, len(f.cells))
	concurrently(len(f.cells), func() func(i int) {
		own := make([]*fem.Solution, len(terms))
		for k, t := range terms {
			own[k] = t.Solution.Clone()
		}
		return func(i int) {
			c := &f.cells[i]
			c.straight = shape.Straight[i]
			for _, node := range shape.Triangle(i) {
				c.nodes = append(c.nodes, shape.Nodes[node])
			}
			nodal := make([][][4]float64, len(f.strands))
			for s := range nodal {
				nodal[s] = make([][4]float64, f.element.Count)
			}
			for k, t := range terms {
				for n, at := range f.element.Nodes {
					f.strands[of[k]].add(&nodal[of[k]][n], tensorOf(own[k].Stress(i, at[0], at[1])), t.Scale)
				}
			}
			ranges[i] = f.rangeOf(nodal, whole)
			f.expand(c, nodal)
		}
	})
	f.low, f.high = math.Inf(1), math.Inf(-1)
	for _, r := range ranges {
		f.low, f.high = math.Min(f.low, r[0]), math.Max(f.high, r[1])
	}
	return f, nil
}

// strand gives the number of a strand, a new one where there is none like it.
func (f *field) strand(s strand) int {
	for i, o := range f.strands {
		if o == s {
			return i
		}
	}
	f.strands = append(f.strands, s)
	return len(f.strands) - 1
}

// add takes up what a strand holds of a tensor.
func (s strand) add(to *[4]float64, t tensor, scale float64) {
	if s.twist {
		to[0] += scale * t[4]
		to[1] += scale * t[5]
		return
	}
	for k := range to {
		to[k] += scale * t[k]
	}
}

// put adds the stresses of a strand to a tensor.
func (s strand) put(t *tensor, v *[4]float64, sign float64) {
	if s.twist {
		t[4] += sign * v[0]
		t[5] += sign * v[1]
		return
	}
	t[0] += sign * v[0]
	t[1] += sign * v[1]
	t[2] += sign * v[2]
	t[3] += sign * v[3]
}

func (f *field) expand(c *cell, nodal [][][4]float64) {
	places := make([][4]float64, len(c.nodes))
	for i, p := range c.nodes {
		places[i] = [4]float64{p.X, p.Y}
	}
	c.place = f.terms.coefficients(places)
	c.stress = make([][][4]float64, len(nodal))
	for s := range nodal {
		c.stress[s] = f.terms.coefficients(nodal[s])
	}
}

// at is a place of a cell's map.
func (f *field) at(c *cell, xi, eta float64) r2.Vec {
	p := f.terms.at(c.place, xi, eta)
	return r2.Vec{X: p[0], Y: p[1]}
}

// values reads the field at a point of a cell, and at its mirror image where
// that is asked for. The tensors are the caller's, to work with.
func (f *field) values(c *cell, xi, eta float64, both bool, up, down *tensor) (here, image float64) {
	if len(f.strands) == 1 && !f.strands[0].twist { // one load: the common case
		v := f.terms.at(c.stress[0], xi, eta)
		*up = tensor{v[0], v[1], v[2], v[3]}
		here = f.read.of(up)
		if !both || !f.strands[0].odd {
			return here, here
		}
		*down = tensor{-v[0], -v[1], -v[2], -v[3]}
		return here, f.read.of(down)
	}
	*up, *down = tensor{}, tensor{}
	odd := false
	for i, s := range f.strands {
		v := f.terms.at(c.stress[i], xi, eta)
		s.put(up, &v, 1)
		if both && s.odd {
			s.put(down, &v, -1)
			odd = true
		} else if both {
			s.put(down, &v, 1)
		}
	}
	here = f.read.of(up)
	if image = here; odd {
		image = f.read.of(down)
	}
	return here, image
}

// rangeOf is the range of values at the nodes of a cell, and at their mirror
// images where the whole part counts.
func (f *field) rangeOf(nodal [][][4]float64, whole bool) [2]float64 {
	r := [2]float64{math.Inf(1), math.Inf(-1)}
	for n := range f.element.Count {
		for _, sign := range [2]float64{1, -1} {
			if sign < 0 && !whole {
				continue
			}
			var t tensor
			for i, s := range f.strands {
				if s.odd {
					s.put(&t, &nodal[i][n], sign)
				} else {
					s.put(&t, &nodal[i][n], 1)
				}
			}
			v := f.read.of(&t)
			r[0], r[1] = math.Min(r[0], v), math.Max(r[1], v)
		}
	}
	return r
}
