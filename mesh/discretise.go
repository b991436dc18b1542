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
	extent float64 // longer side of the box around the outline
	box    r2.Box
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
	maxPieceTurn = 45      // a piece of a curve turns by at most this many degrees
	maxPieces    = 1 << 20 // more boundary pieces than this are taken for a mistake
	gapAllowed   = 1e-9    // between the end of a side and the begin of the next, in extents
)

// loops lists the outer loop and the holes.
func loops(region *outline.Region) []outline.Loop {
	return append([]outline.Loop{region.Outer}, region.Holes...)
}

// checkLoops looks at what can be known before anything is cut, and measures
// the outline.
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
			b := s.Curve.Bounds()
			box = widen(widen(box, b.Min), b.Max)
			for _, t := range []float64{0, 0.5, 1} {
				p, d := s.Curve.At(t), s.Curve.Deriv(t)
				if sum := p.X + p.Y + d.X + d.Y; math.IsNaN(sum) || math.IsInf(sum, 0) {
					return box, fmt.Errorf("side %q of loop %d is not finite", s.Name, i)
				}
				if (d == r2.Vec{}) {
					return box, fmt.Errorf("side %q of loop %d has no length at (%g, %g)", s.Name, i, p.X, p.Y)
				}
			}
		}
	}
	extent := extentOf(box)
	// Beyond these sizes the predicates' products could leave the range of
	// float64; no drawing is in such units.
	if !(extent > 1e-40 && extent < 1e40) || !(math.Abs(box.Min.X+box.Min.Y) < 1e10*extent) {
		return box, fmt.Errorf("outline from (%g, %g) to (%g, %g): extent must be between 1e-40 and 1e40 and not lost beside the coordinates",
			box.Min.X, box.Min.Y, box.Max.X, box.Max.Y)
	}
	for i, loop := range loops(region) {
		for j, s := range loop {
			end, begin := s.Curve.At(1), loop[(j+1)%len(loop)].Curve.At(0)
			if !(r2.Norm(r2.Sub(end, begin)) <= gapAllowed*extent) {
				return box, fmt.Errorf("loop %d is open after side %q: (%g, %g) to (%g, %g)", i, s.Name, end.X, end.Y, begin.X, begin.Y)
			}
		}
	}
	return box, nil
}

func extentOf(b r2.Box) float64 { return max(b.Max.X-b.Min.X, b.Max.Y-b.Min.Y) }

// cutSides turns the parameters at which each side is cut, from 0 to 1, into
// vertices and segments.
func cutSides(region *outline.Region, cuts [][]float64, box r2.Box) *boundary {
	b := &boundary{sides: region.Sides(), box: box, extent: extentOf(box)}
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

// sideCuts cuts every side by the size field, each into equal steps of the
// integral of its density of pieces.
func sideCuts(region *outline.Region, field *sizeField, wishes []SideWish) ([][]float64, error) {
	sides := region.Sides()
	cuts := make([][]float64, len(sides))
	total := 0
	for i, s := range sides {
		d := pieceDensity{curve: s.Curve, field: field, straight: straight(s.Curve)}
		for _, w := range wishes {
			if w.Side == i {
				d.perQuarter = max(d.perQuarter, w.PerQuarter)
			}
		}
		ts, err := d.cut(maxPieces - total)
		if err != nil {
			return nil, fmt.Errorf("side %d (%q): %w", i, s.Name, err)
		}
		cuts[i] = ts
		total += len(ts)
	}
	i := 0
	for _, loop := range loops(region) { // no loop of fewer than three pieces
		for n := len(loop); n < 3; n++ {
			if len(cuts[i]) == 2 {
				cuts[i] = []float64{0, 0.5, 1}
			}
		}
		i += len(loop)
	}
	return cuts, nil
}

// A pieceDensity is the number of pieces wished for per unit of a curve's
// parameter.
type pieceDensity struct {
	curve      outline.Curve
	field      *sizeField
	straight   bool
	perQuarter float64

	ts  []float64 // ends of the intervals of integration
	sum []float64 // integral up to there
}

func (d *pieceDensity) at(t float64) float64 {
	speed := r2.Norm(d.curve.Deriv(t))
	n := speed / d.field.at(d.curve.At(t))
	if !d.straight {
		// 90/45 pieces a quarter keep to the turning allowed.
		per := max(d.perQuarter, 90/maxPieceTurn)
		n = max(n, math.Abs(outline.Curvature(d.curve, t))*speed*per*2/math.Pi)
	}
	return n
}

// cut gives the parameters from 0 to 1 at which the curve is cut.
func (d *pieceDensity) cut(most int) ([]float64, error) {
	d.ts, d.sum = append(d.ts, 0), append(d.sum, 0)
	steps := 1
	if !d.straight {
		steps = 8
	}
	for i := range steps {
		if !d.integrate(float64(i)/float64(steps), float64(i+1)/float64(steps), 50, most) {
			return nil, fmt.Errorf("more than %d pieces", maxPieces)
		}
	}
	total := d.sum[len(d.sum)-1]
	if !(total < float64(most)) {
		return nil, fmt.Errorf("%.3g pieces are more than %d", total, maxPieces)
	}
	n := max(1, int(math.Ceil(total-1e-6)))
	cuts := make([]float64, 1, n+1)
	k := 0
	for i := 1; i < n; i++ {
		want := total * float64(i) / float64(n)
		for d.sum[k+1] < want {
			k++
		}
		f := (want - d.sum[k]) / (d.sum[k+1] - d.sum[k])
		cuts = append(cuts, d.ts[k]+f*(d.ts[k+1]-d.ts[k]))
	}
	return append(cuts, 1), nil
}

// integrate adds the integral over an interval, halved until it covers a third
// of a piece: over so little the size changes by less than a tenth of itself
// and the midpoint rule is good to a few parts in a thousand.
func (d *pieceDensity) integrate(t0, t1 float64, depth, most int) bool {
	tm := (t0 + t1) / 2
	n := d.at(tm) * (t1 - t0)
	if n > 1.0/3 && depth > 0 {
		return d.integrate(t0, tm, depth-1, most) && d.integrate(tm, t1, depth-1, most)
	}
	d.ts = append(d.ts, t1)
	d.sum = append(d.sum, d.sum[len(d.sum)-1]+n)
	return d.sum[len(d.sum)-1] < float64(most) && len(d.ts) < 8*maxPieces
}
