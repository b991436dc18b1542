package mesh

import (
	"fmt"
	"math"

	"gonum.org/v1/gonum/spatial/r2"

	"notchproof/mesh/outline"
)

// Generate meshes a region: a constrained Delaunay triangulation whose boundary
// vertices lie on the true curves and whose edges follow the sizes wished for.
//
// Sides are cut so finely that no edge along them is longer than wished for, with
// at least PerQuarter edges per 90° where that is asked, and always at least two.
// Pieces of the boundary are cut further where the inside is narrow or the shapes
// of triangles ask for it. Inside, edges are up to √2 times longer than wished
// for, 0.9 times on average, and nowhere longer than Largest. The smallest angle
// between the straight lines that join the corners is 28° or more, except where
// two sides meet at less than 60° and in the triangles next to that.
//
// The same input gives the same mesh to the last bit. The time is about a
// microsecond for a triangle. Errors say which side or loop of the outline, or
// which size, is at fault and where: loops that are open, run the wrong way, touch
// or cross, and sizes that would take more than two million triangles.
func Generate(region *outline.Region, size Sizing) (*Mesh, error) {
	box, err := checkLoops(region)
	if err != nil {
		return nil, err
	}
	field, err := newSizeField(region.Sides(), size, extentOf(box))
	if err != nil {
		return nil, err
	}
	if err := checkArea(region, size.Largest, box); err != nil {
		return nil, err
	}
	t, b, err := start(region, field, size, box)
	if err != nil {
		return nil, err
	}
	r, err := refine(t, b, field)
	if err != nil {
		return nil, err
	}
	r.smooth()
	return r.mesh(region), nil
}

// checkArea refuses outlines that enclose nothing, and at once what would come to
// far too many triangles: the area over that of an equilateral triangle of the
// largest size.
func checkArea(region *outline.Region, largest float64, box r2.Box) error {
	extent := extentOf(box)
	area := 0.0
	for _, s := range region.Sides() {
		ts := turningCuts(s.Curve, sizePieceTurn*math.Pi/180)
		for i := range len(ts) - 1 {
			area += area2(box.Min, s.Curve.At(ts[i]), s.Curve.At(ts[i+1])) / 2
		}
	}
	if math.Abs(area) < leastArea*extent*extent {
		return fmt.Errorf("the outline encloses no area: %g at an extent of %g", area, extent)
	}
	if n := area / (math.Sqrt(3) / 4 * largest * largest); largest > 0 && n > maxTriangles {
		return fmt.Errorf("largest size %g: would take %.2g triangles, more than %d", largest, n, maxTriangles)
	}
	return nil
}

// leastArea is the smallest area, in squares of the extent, told from rounding
// errors.
const leastArea = 1e-12

// mesh keeps what is inside, with the boundary side by side.
func (r *refiner) mesh(region *outline.Region) *Mesh {
	count := 0
	number := make([]int32, len(r.tris))
	for i := range r.tris {
		number[i] = -1
		if r.tris[i].inside {
			number[i] = int32(count)
			count++
		}
	}
	m := &Mesh{
		Region:    region,
		Points:    append([]r2.Vec(nil), r.points[boxCorners:]...),
		Triangles: make([][3]int32, 0, count),
		Neighbors: make([][3]int32, 0, count),
	}
	edges := make([]Edge, len(r.segs))
	for i := range r.tris {
		tr := &r.tris[i]
		if !tr.inside {
			continue
		}
		n := [3]int32{-1, -1, -1}
		for k := range 3 {
			if s := tr.s[k]; s >= 0 {
				seg := &r.segs[s]
				edges[s] = Edge{number[i], int8(k), seg.side, seg.t0, seg.t1}
			} else {
				n[k] = number[tr.n[k]]
			}
		}
		m.Triangles = append(m.Triangles, [3]int32{tr.v[0] - boxCorners, tr.v[1] - boxCorners, tr.v[2] - boxCorners})
		m.Neighbors = append(m.Neighbors, n)
	}
	m.Boundary = make([]Edge, 0, len(edges))
	for _, s := range r.outline.first {
		for ; s >= 0; s = r.segs[s].next {
			m.Boundary = append(m.Boundary, edges[s])
		}
	}
	return m
}
