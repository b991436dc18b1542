package mesh

import (
	"fmt"
	"math"

	"gonum.org/v1/gonum/spatial/r2"

	"notchproof/mesh/outline"
)

// A boundary is the region's outline cut into pieces. Its vertices lie on the
// true curves, and the first vertex of every side is the corner where the side
// begins.
type boundary struct {
	sides  []outline.Side
	points []r2.Vec
	segs   []segment
	first  []int32 // first segment of each side
	last   []int32 // last segment of each side, before any is cut
	next   []int32 // the side that begins where each side ends
	box    r2.Box  // around the outline
	extent float64 // longer side of the box
	least  float64 // pieces shorter than this are not cut
}

// A segment is one piece of a side, from vertex a to vertex b with the material
// on its left.
type segment struct {
	a, b   int32
	side   int32
	next   int32 // following segment of the same side, -1 after the last
	curved bool
	t0, t1 float64
}

const (
	maxPieceTurn  = 45      // a piece of a curve turns by at most this many degrees
	maxPieces     = 1 << 20 // more boundary pieces than this are taken for a mistake
	shortestPiece = 1e-11   // pieces shorter than this, in extents, are not cut
	roundedPiece  = 3e-12   // nor shorter than this, in coordinates: 10⁴ units in the last place
	gapAllowed    = 1e-9    // between the end of a side and the begin of the next, in extents
)

// loops lists the outer loop and the holes.
func loops(region *outline.Region) []outline.Loop {
	return append([]outline.Loop{region.Outer}, region.Holes...)
}

// checkLoops looks at what can be known before anything is cut, and gives the box
// around the outline.
func checkLoops(region *outline.Region) (r2.Box, error) {
	box := emptyBox()
	for i, loop := range loops(region) {
		if len(loop) == 0 {
			return box, fmt.Errorf("loop %d has no sides", i)
		}
		for _, s := range loop {
			if s.Curve == nil {
				return box, fmt.Errorf("side %q of loop %d has no curve", s.Name, i)
			}
			if err := checkCurve(s.Curve); err != nil {
				return box, fmt.Errorf("side %q of loop %d: %w", s.Name, i, err)
			}
			b := s.Curve.Bounds()
			box = widen(widen(box, b.Min), b.Max)
		}
	}
	// Beyond these sizes the predicates' products could leave the range of
	// float64; no drawing is in such units.
	if extent := extentOf(box); !(extent > 1e-40 && extent < 1e40) || farthest(box) > farAway*extent {
		return box, fmt.Errorf("outline from (%g, %g) to (%g, %g): its extent must be between 1e-40 and 1e40 and a millionth of the coordinates",
			box.Min.X, box.Min.Y, box.Max.X, box.Max.Y)
	}
	for i, loop := range loops(region) {
		for j, s := range loop {
			if err := checkJoint(s.Curve, loop[(j+1)%len(loop)].Curve, extentOf(box)); err != nil {
				return box, fmt.Errorf("side %q of loop %d: %w", s.Name, i, err)
			}
		}
	}
	return box, nil
}

// farAway is how many extents from the origin an outline may lie.
const farAway = 1e6

// checkCurve demands finite points and a direction everywhere.
func checkCurve(c outline.Curve) error {
	for _, t := range []float64{0, 0.5, 1} {
		p, d := c.At(t), c.Deriv(t)
		if sum := p.X + p.Y + d.X + d.Y; math.IsNaN(sum) || math.IsInf(sum, 0) {
			return fmt.Errorf("not finite at (%g, %g)", p.X, p.Y)
		}
		if (d == r2.Vec{}) {
			return fmt.Errorf("no length at (%g, %g)", p.X, p.Y)
		}
	}
	return nil
}

// checkJoint demands that a curve has some length, ends where the next one begins
// and does not fold back there.
func checkJoint(c, next outline.Curve, extent float64) error {
	end, begin := c.At(1), next.At(0)
	if extentOf(c.Bounds()) <= gapAllowed*extent {
		return fmt.Errorf("no length at (%g, %g)", end.X, end.Y)
	}
	if !(dist(end, begin) <= gapAllowed*extent) {
		return fmt.Errorf("ends at (%g, %g), but the next side begins at (%g, %g)", end.X, end.Y, begin.X, begin.Y)
	}
	if foldsBack(c, next) {
		return fmt.Errorf("the next side folds back onto it at (%g, %g)", end.X, end.Y)
	}
	return nil
}

// cutSides turns the parameters at which each side is cut, from 0 to 1, into
// vertices and segments.
func cutSides(region *outline.Region, cuts [][]float64, box r2.Box) *boundary {
	b := &boundary{sides: region.Sides(), box: box, extent: extentOf(box)}
	b.least = max(shortestPiece*b.extent, roundedPiece*farthest(box))
	side := int32(0)
	for _, loop := range loops(region) {
		begin, side0 := int32(len(b.points)), side
		for _, s := range loop {
			ts := cuts[side]
			curved := !straight(s.Curve)
			b.first = append(b.first, int32(len(b.segs)))
			for i := range len(ts) - 1 {
				v, n := int32(len(b.points)), int32(len(b.segs))
				b.points = append(b.points, s.Curve.At(ts[i]))
				b.segs = append(b.segs, segment{a: v, b: v + 1, side: side, next: n + 1, curved: curved, t0: ts[i], t1: ts[i+1]})
			}
			b.segs[len(b.segs)-1].next = -1
			b.last = append(b.last, int32(len(b.segs)-1))
			side++
			b.next = append(b.next, side)
		}
		b.segs[len(b.segs)-1].b = begin
		b.next[side-1] = side0
	}
	return b
}
