package mesh

import (
	"fmt"
	"math"
	"slices"

	"gonum.org/v1/gonum/spatial/r2"

	"notchproof/mesh/outline"
)

// A sizeField gives the edge length wished for at every point. Wishes along
// sides are held as straight pieces with a size at either end: a straight side
// is one piece, a curved one is cut where it has turned by about 15°, so that
// the distance to it is off by less than one part in a hundred of a piece.
// The pieces lie in a tree of boxes, smallest size and box at each node, which
// is searched by branch and bound.
type sizeField struct {
	growth  float64
	largest float64
	pieces  []sizePiece
	nodes   []sizeNode
}

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

const (
	defaultGrowth  = 0.5
	sizeLeaf       = 8       // pieces a leaf of the tree holds at most
	sizePieceTurn  = 15      // pieces of curved sides turn by at most this many degrees
	maxSizePieces  = 1 << 20 // more in one mesh is taken for a mistake
	smallestWished = 1e-9    // smallest size, in units of the region's largest extent
)

// newSizeField checks the wishes and gathers them.
func newSizeField(sides []outline.Side, size Sizing, extent float64) (*sizeField, error) {
	f := &sizeField{growth: size.Growth, largest: size.Largest}
	if f.growth == 0 {
		f.growth = defaultGrowth
	}
	if !(f.growth > 0) || math.IsInf(f.growth, 0) {
		return nil, fmt.Errorf("growth of size %g: must be positive", size.Growth)
	}
	if f.largest == 0 {
		f.largest = math.Inf(1)
	} else if err := checkSize("largest size", f.largest, extent); err != nil {
		return nil, err
	}
	for _, w := range size.Spots {
		if err := checkSize("size at a spot", w.Size, extent); err != nil {
			return nil, err
		}
		if math.IsNaN(w.At.X+w.At.Y) || math.IsInf(w.At.X+w.At.Y, 0) {
			return nil, fmt.Errorf("spot at (%g, %g): must be finite", w.At.X, w.At.Y)
		}
		f.pieces = append(f.pieces, sizePiece{a: w.At, ha: w.Size, hb: w.Size})
	}
	for _, w := range size.Sides {
		if err := f.addSide(sides, w, extent); err != nil {
			return nil, err
		}
	}
	if len(f.pieces) > 0 {
		f.nodes = append(f.nodes, sizeNode{lo: 0, hi: int32(len(f.pieces))})
		f.build(0)
	}
	return f, nil
}

func checkSize(what string, h, extent float64) error {
	if !(h >= smallestWished*extent) {
		return fmt.Errorf("%s %g: must be at least %g for a region %g across", what, h, smallestWished*extent, extent)
	}
	return nil
}

// addSide cuts one side's wish into pieces.
func (f *sizeField) addSide(sides []outline.Side, w SideWish, extent float64) error {
	if w.Side < 0 || w.Side >= len(sides) {
		return fmt.Errorf("size for side %d: the region has %d sides", w.Side, len(sides))
	}
	if w.Size != 0 {
		if err := checkSize(fmt.Sprintf("size along side %d", w.Side), w.Size, extent); err != nil {
			return err
		}
	}
	if !(w.PerQuarter >= 0) || w.PerQuarter > maxSizePieces {
		return fmt.Errorf("%g edges per 90° along side %d: must be positive", w.PerQuarter, w.Side)
	}
	c := sides[w.Side].Curve
	wish := func(t float64) float64 {
		h := math.Inf(1)
		if w.Size > 0 {
			h = w.Size
		}
		if k := math.Abs(outline.Curvature(c, t)); w.PerQuarter > 0 && k > 0 {
			h = min(h, math.Pi/2/(w.PerQuarter*k))
		}
		return max(h, smallestWished*extent)
	}
	cuts := turningCuts(c, sizePieceTurn*math.Pi/180)
	if len(f.pieces)+len(cuts) > maxSizePieces {
		return fmt.Errorf("side %d turns too often", w.Side)
	}
	a, ha := c.At(cuts[0]), wish(cuts[0])
	for _, t := range cuts[1:] {
		b, hb := c.At(t), wish(t)
		if !math.IsInf(ha, 0) || !math.IsInf(hb, 0) {
			u := r2.Sub(b, a)
			f.pieces = append(f.pieces, sizePiece{a: a, u: u, ha: min(ha, f.cap(hb, u)), hb: min(hb, f.cap(ha, u)), uu: r2.Norm2(u)})
		}
		a, ha = b, hb
	}
	return nil
}

// cap is the size that a wish h reaches at a distance u.
func (f *sizeField) cap(h float64, u r2.Vec) float64 { return h + f.growth*r2.Norm(u) }

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
	mid := func(p *sizePiece) r2.Vec { return r2.Add(p.a, r2.Scale(0.5, p.u)) }
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
	return n.least + growth*math.Sqrt(dx*dx+dy*dy)
}

// lower gives the smaller of h and the piece's wish at p, taken from the piece's
// point nearest to p.
func (s *sizePiece) lower(p r2.Vec, growth, h float64) float64 {
	d := r2.Sub(p, s.a)
	t := 0.0
	if s.uu > 0 {
		t = min(max(r2.Dot(d, s.u)/s.uu, 0), 1)
		d = r2.Sub(d, r2.Scale(t, s.u))
	}
	size := s.ha + t*(s.hb-s.ha)
	if size >= h {
		return h
	}
	return min(h, size+growth*math.Sqrt(r2.Norm2(d)))
}

func emptyBox() r2.Box {
	inf := math.Inf(1)
	return r2.Box{Min: r2.Vec{X: inf, Y: inf}, Max: r2.Vec{X: -inf, Y: -inf}}
}

func widen(b r2.Box, p r2.Vec) r2.Box {
	return r2.Box{
		Min: r2.Vec{X: min(b.Min.X, p.X), Y: min(b.Min.Y, p.Y)},
		Max: r2.Vec{X: max(b.Max.X, p.X), Y: max(b.Max.Y, p.Y)},
	}
}
