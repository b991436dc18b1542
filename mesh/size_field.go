package mesh

import (
	"fmt"
	"math"

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

const (
	defaultGrowth  = 0.5
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
		if k := curvature(c, t); w.PerQuarter > 0 && k > 0 {
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
			f.pieces = append(f.pieces, sizePiece{a: a, u: u, ha: min(ha, f.cap(hb, u)), hb: min(hb, f.cap(ha, u)), uu: dot(u, u)})
		}
		a, ha = b, hb
	}
	return nil
}

// cap is the size that a wish h reaches at a distance u.
func (f *sizeField) cap(h float64, u r2.Vec) float64 { return h + float64(f.growth*norm(u)) }
