package mesh

import (
	"cmp"
	"slices"

	"gonum.org/v1/gonum/spatial/r2"
)

// A Finder tells which triangle of a curved mesh a point lies in. It is a
// binary tree of boxes over the triangles: halves of a half, split across the
// longer way, which suits meshes graded over many sizes and regions with
// holes. It describes the mesh as it was when the Finder was made, and is safe
// for concurrent use.
type Finder struct {
	curved *Curved
	order  []int32  // triangles, leaf by leaf
	boxes  []r2.Box // each triangle's own
	tree   []r2.Box // node i has the children 2i+1 and 2i+2
}

// leaf is the number of triangles that are tried one by one.
const leaf = 4

// Finder prepares to find points in the mesh.
func (c *Curved) Finder() *Finder {
	n := len(c.Mesh.Triangles)
	f := &Finder{curved: c, order: make([]int32, n), boxes: make([]r2.Box, n)}
	for t := range n {
		f.order[t] = int32(t)
		f.boxes[t] = c.box(t)
	}
	if n > 0 {
		f.build(0, f.order)
	}
	return f
}

func (f *Finder) build(node int, triangles []int32) {
	for len(f.tree) <= node {
		f.tree = append(f.tree, r2.Box{})
	}
	all := f.boxes[triangles[0]]
	for _, t := range triangles[1:] {
		all = all.Union(f.boxes[t])
	}
	f.tree[node] = all
	if len(triangles) <= leaf {
		return
	}
	wide := all.Max.X-all.Min.X >= all.Max.Y-all.Min.Y
	slices.SortFunc(triangles, func(s, t int32) int {
		a, b := f.boxes[s], f.boxes[t]
		if wide {
			return cmp.Or(cmp.Compare(a.Min.X+a.Max.X, b.Min.X+b.Max.X), cmp.Compare(s, t))
		}
		return cmp.Or(cmp.Compare(a.Min.Y+a.Max.Y, b.Min.Y+b.Max.Y), cmp.Compare(s, t))
	})
	half := len(triangles) / 2
	f.build(2*node+1, triangles[:half])
	f.build(2*node+2, triangles[half:])
}

// Find gives a triangle that contains p and p's reference coordinates in it.
// A point shared by several triangles is given to one of them, always the
// same. It reports false, with triangle −1, if p is outside the mesh by more
// than Locate allows.
func (f *Finder) Find(p r2.Vec) (tri int, xi, eta float64, ok bool) {
	if len(f.order) == 0 {
		return -1, 0, 0, false
	}
	return f.find(0, f.order, p)
}

func (f *Finder) find(node int, triangles []int32, p r2.Vec) (tri int, xi, eta float64, ok bool) {
	if !contains(f.tree[node], p) {
		return -1, 0, 0, false
	}
	if len(triangles) > leaf {
		half := len(triangles) / 2
		if tri, xi, eta, ok = f.find(2*node+1, triangles[:half], p); ok {
			return tri, xi, eta, true
		}
		return f.find(2*node+2, triangles[half:], p)
	}
	for _, t := range triangles {
		if contains(f.boxes[t], p) {
			if xi, eta, ok = f.curved.Locate(int(t), p); ok {
				return int(t), xi, eta, true
			}
		}
	}
	return -1, 0, 0, false
}

func contains(b r2.Box, p r2.Vec) bool {
	return b.Min.X <= p.X && p.X <= b.Max.X && b.Min.Y <= p.Y && p.Y <= b.Max.Y
}

// box encloses a triangle: the hull of its Bernstein coefficients, which a
// polynomial map never leaves, with room for Locate's slack.
func (c *Curved) box(tri int) r2.Box {
	var room control
	points := c.control(tri, &room)
	b := r2.Box{Min: points[0], Max: points[0]}
	for _, x := range points[1:] {
		b.Min = r2.Vec{X: min(b.Min.X, x.X), Y: min(b.Min.Y, x.Y)}
		b.Max = r2.Vec{X: max(b.Max.X, x.X), Y: max(b.Max.Y, x.Y)}
	}
	const rim = 100 * slack
	margin := rim * max(b.Max.X-b.Min.X, b.Max.Y-b.Min.Y)
	b.Min = r2.Sub(b.Min, r2.Vec{X: margin, Y: margin})
	b.Max = r2.Add(b.Max, r2.Vec{X: margin, Y: margin})
	return b
}
