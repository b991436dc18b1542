package mesh

import (
	"fmt"
	"slices"

	"gonum.org/v1/gonum/spatial/r2"

	"notchproof/mesh/outline"
)

// start triangulates the boundary alone. Where chords of curves cross or leave
// vertices on their wrong side although the true curves do not, the curves are
// cut finer and all is done again.
func start(region *outline.Region, field *sizeField, size Sizing, box r2.Box) (*triangulation, *boundary, error) {
	cuts, err := sideCuts(region, field, size.Sides)
	if err != nil {
		return nil, nil, err
	}
	shellCuts(region, cuts)
	for extra := 0; ; {
		b := cutSides(region, cuts, box)
		t, coarse, err := triangulate(b)
		if err != nil {
			return nil, nil, err
		}
		if len(coarse) == 0 {
			return t, b, t.classify()
		}
		extra += len(coarse)
		for _, s := range coarse {
			seg := &b.segs[s]
			tm := (seg.t0 + seg.t1) / 2
			if extra > maxExtraCuts || dist(b.points[seg.a], b.points[seg.b]) < b.least {
				p := b.points[seg.a]
				return nil, nil, fmt.Errorf("side %d (%q) touches or crosses another near (%g, %g)", seg.side, b.sides[seg.side].Name, p.X, p.Y)
			}
			ts := cuts[seg.side]
			at, _ := slices.BinarySearch(ts, tm)
			cuts[seg.side] = slices.Insert(ts, at, tm)
		}
	}
}

// maxExtraCuts is the number of cuts made for curves that nearly touch: enough for
// a ring as thin as a ten-millionth of its radius, and soon reached by curves
// that lie upon each other.
const maxExtraCuts = 1 << 14

// triangulate makes the constrained Delaunay triangulation of the boundary, or
// lists the segments that are too coarse for that.
func triangulate(b *boundary) (*triangulation, []int32, error) {
	t := newTriangulation(b.box, len(b.points))
	t.points = append(t.points, b.points...)
	t.at = append(t.at, make([]int32, len(b.points))...)
	t.segs = slices.Clone(b.segs)
	for i := range t.segs {
		t.segs[i].a += boxCorners
		t.segs[i].b += boxCorners
	}
	for _, i := range insertionOrder(b.points, b.box) {
		p := b.points[i]
		tri, _ := t.walk(t.last, p)
		for _, v := range t.tris[tri].v {
			if t.points[v] == p {
				return nil, nil, fmt.Errorf("the outline meets itself at (%g, %g)", p.X, p.Y)
			}
		}
		t.find(p, tri)
		if _, ok := t.sound(p); !ok {
			return nil, nil, fmt.Errorf("no place for a vertex at (%g, %g)", p.X, p.Y)
		}
		t.fill(i + boxCorners)
	}
	var coarse []int32
	for s := range t.segs {
		bad, ok := t.recover(int32(s))
		if ok {
			continue
		}
		curved := bad.of(t)
		if len(curved) == 0 || bad.certain(t, b) {
			return nil, nil, bad.err(t, b)
		}
		coarse = append(coarse, curved...)
	}
	if len(coarse) == 0 {
		for s := range t.segs {
			coarse = append(coarse, t.lens(b, int32(s))...)
		}
		coarse = append(coarse, t.foldedCorners(b)...)
	}
	slices.Sort(coarse)
	return t, slices.Compact(coarse), nil
}

// of lists the segments that can be cut finer to undo a crossing.
func (c crossing) of(t *triangulation) []int32 {
	var curved []int32
	for _, s := range []int32{c.seg, c.other} {
		if s >= 0 && t.segs[s].curved {
			curved = append(curved, s)
		}
	}
	return curved
}

// certain tells whether two segments cross so clearly that their curves must
// cross as well. Each curve keeps within a band about its chord; if the ends of
// each segment lie on either side of the other's chord and farther away than
// both bands are wide, the curves have to pass through each other.
func (c crossing) certain(t *triangulation, b *boundary) bool {
	if c.other < 0 {
		return false
	}
	s, o := &t.segs[c.seg], &t.segs[c.other]
	band := b.band(s) + b.band(o)
	beyond := func(s, o *segment) bool {
		p, q := t.points[s.a], t.points[s.b]
		l := dist(p, q)
		d, e := area2(p, q, t.points[o.a])/l, area2(p, q, t.points[o.b])/l
		return min(d, e) < -band && max(d, e) > band
	}
	return beyond(s, o) && beyond(o, s)
}

// band bounds the distance of a segment's curve from its chord: a curve that
// turns by φ keeps within the triangle with the angle φ at one end of the chord.
func (b *boundary) band(s *segment) float64 {
	if !s.curved {
		return 0
	}
	c := b.sides[s.side].Curve
	return c.Length(s.t0, s.t1) * turning(c, s.t0, s.t1)
}

func (c crossing) err(t *triangulation, b *boundary) error {
	s := t.segs[c.seg]
	if c.other >= 0 {
		o := t.segs[c.other]
		p := t.points[o.a]
		return fmt.Errorf("sides %d (%q) and %d (%q) cross near (%g, %g)", s.side, b.sides[s.side].Name, o.side, b.sides[o.side].Name, p.X, p.Y)
	}
	p := t.points[c.vertex]
	return fmt.Errorf("side %d (%q) runs through the vertex (%g, %g)", s.side, b.sides[s.side].Name, p.X, p.Y)
}
