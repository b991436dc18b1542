package mesh

import (
	"fmt"
	"math"

	"gonum.org/v1/gonum/spatial/r2"

	"notchproof/mesh/outline"
)

// Generate meshes a region.
func Generate(region *outline.Region, size Sizing) (*Mesh, error) {
	box, err := checkLoops(region)
	if err != nil {
		return nil, err
	}
	field, err := newSizeField(region.Sides(), size, extentOf(box))
	if err != nil {
		return nil, err
	}
	if err := checkCount(region, size.Largest); err != nil {
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
	return r.mesh(region), nil
}

// checkCount refuses at once what would come to far too many triangles: the area
// over that of an equilateral triangle of the largest size.
func checkCount(region *outline.Region, largest float64) error {
	if largest == 0 {
		return nil
	}
	area := 0.0
	for _, s := range region.Sides() {
		ts := turningCuts(s.Curve, sizePieceTurn*math.Pi/180)
		for i := range len(ts) - 1 {
			area += r2.Cross(s.Curve.At(ts[i]), s.Curve.At(ts[i+1])) / 2
		}
	}
	if n := area / (math.Sqrt(3) / 4 * largest * largest); n > maxTriangles {
		return fmt.Errorf("largest size %g: would take %.2g triangles, more than %d", largest, n, maxTriangles)
	}
	return nil
}

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
