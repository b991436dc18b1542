package render

import (
	"gonum.org/v1/gonum/spatial/r2"

	"notchproof/mesh"
)

// elements strokes the edges of the triangles in a view, bent ones along their
// own polynomial.
func (s *sheet) elements(v *view, shape *mesh.Curved) {
	keep := v.bounds().grown(spare)
	s.pen(elementInk, hairline)
	for tri := range shape.Mesh.Triangles {
		for k := range 3 {
			if n := shape.Mesh.Neighbors[tri][k]; n >= 0 && int(n) < tri {
				continue // drawn with the neighbour
			}
			ps := elementEdge(shape, tri, k)
			s.segments(v, ps, keep)
			if v.mirror {
				for i := range ps {
					ps[i] = mirrored(ps[i])
				}
				s.segments(v, ps, keep)
			}
		}
	}
	s.dc.Stroke()
}

func (s *sheet) segments(v *view, ps []r2.Vec, keep box) {
	for _, piece := range clipLine(v.all(ps), keep) {
		s.polyline(piece)
	}
}

// elementEdge gives points along edge k of a triangle.
func elementEdge(shape *mesh.Curved, tri, k int) []r2.Vec {
	pieces := 1
	if !shape.Straight[tri] {
		pieces = 16
	}
	ps := make([]r2.Vec, pieces+1)
	for i := range ps {
		var bary [3]float64
		t := float64(i) / float64(pieces)
		bary[(k+1)%3], bary[(k+2)%3] = 1-t, t
		ps[i] = shape.At(tri, bary[1], bary[2])
	}
	return ps
}
