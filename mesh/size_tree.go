package mesh

import (
	"math"
	"slices"

	"gonum.org/v1/gonum/spatial/r2"
)

// A sizePiece wishes for size ha at a and hb at a+u, linear between them.
type sizePiece struct {
	a, u   r2.Vec
	ha, hb float64
	uu     float64 // |u|²
}

// A sizeNode covers pieces[lo:hi]; inner nodes have children left and left+1.
type sizeNode struct {
	box    r2.Box
	least  float64
	lo, hi int32
	left   int32 // 0 at leaves
}

// sizeLeaf is the number of pieces that a leaf of the tree holds at most.
const sizeLeaf = 8

// build orders the node's pieces along the longer side of their box and cuts
// them in the middle until few are left.
func (f *sizeField) build(node int) {
	n := &f.nodes[node]
	ps := f.pieces[n.lo:n.hi]
	n.least = math.Inf(1)
	n.box = emptyBox()
	for i := range ps {
		n.least = min(n.least, ps[i].ha, ps[i].hb)
		n.box = widen(widen(n.box, ps[i].a), r2.Add(ps[i].a, ps[i].u))
	}
	if len(ps) <= sizeLeaf {
		return
	}
	mid := func(p *sizePiece) r2.Vec { return shifted(p.a, 0.5, p.u) }
	across := n.box.Max.X-n.box.Min.X < n.box.Max.Y-n.box.Min.Y
	slices.SortStableFunc(ps, func(p, q sizePiece) int {
		a, b := mid(&p), mid(&q)
		if across {
			a.X, b.X = a.Y, b.Y
		}
		switch {
		case a.X < b.X:
			return -1
		case a.X > b.X:
			return 1
		}
		return 0
	})
	left := len(f.nodes)
	lo, hi := n.lo, n.hi
	cut := (lo + hi) / 2
	n.left = int32(left)
	f.nodes = append(f.nodes, sizeNode{lo: lo, hi: cut}, sizeNode{lo: cut, hi: hi})
	f.build(left)
	f.build(left + 1)
}

// at gives the size at p; it is infinite where nothing is wished for.
func (f *sizeField) at(p r2.Vec) float64 {
	h := f.largest
	if len(f.nodes) == 0 {
		return h
	}
	return f.search(0, p, h)
}

// search lowers h to the least wish of the node's pieces.
func (f *sizeField) search(node int32, p r2.Vec, h float64) float64 {
	n := &f.nodes[node]
	if n.left == 0 {
		for i := n.lo; i < n.hi; i++ {
			h = f.pieces[i].lower(p, f.growth, h)
		}
		return h
	}
	first, second := n.left, n.left+1
	b1, b2 := f.nodes[first].bound(p, f.growth), f.nodes[second].bound(p, f.growth)
	if b2 < b1 {
		first, second, b1, b2 = second, first, b2, b1
	}
	if b1 < h {
		h = f.search(first, p, h)
	}
	if b2 < h {
		h = f.search(second, p, h)
	}
	return h
}

// bound is a size that no piece in the node goes below at p.
func (n *sizeNode) bound(p r2.Vec, growth float64) float64 {
	dx := max(n.box.Min.X-p.X, 0, p.X-n.box.Max.X)
	dy := max(n.box.Min.Y-p.Y, 0, p.Y-n.box.Max.Y)
	return n.least + float64(growth*math.Sqrt(float64(dx*dx)+float64(dy*dy)))
}

// lower gives the smaller of h and the piece's wish at p, taken from the piece's
// point nearest to p.
func (s *sizePiece) lower(p r2.Vec, growth, h float64) float64 {
	d := r2.Sub(p, s.a)
	t := 0.0
	if s.uu > 0 {
		t = min(max(dot(d, s.u)/s.uu, 0), 1)
		d = shifted(d, -t, s.u)
	}
	size := s.ha + float64(t*(s.hb-s.ha))
	if size >= h {
		return h
	}
	return min(h, size+float64(growth*norm(d)))
}
