package mesh

import (
	"math"

	"gonum.org/v1/gonum/spatial/r2"
)

// A Quality sums up the shapes of a mesh's triangles, as their corners give
// them.
type Quality struct {
	Triangles     int
	Points        int
	SmallestAngle float64 // degrees
	At            r2.Vec  // the corner with the smallest angle
	LargestAngle  float64 // degrees
	Shortest      float64 // edge
	Longest       float64 // edge
}

// Quality measures the mesh.
func (m *Mesh) Quality() Quality {
	q := Quality{Triangles: len(m.Triangles), Points: len(m.Points), SmallestAngle: 180, Shortest: math.Inf(1)}
	for _, v := range m.Triangles {
		for k := range 3 {
			p, a, b := m.Points[v[k]], m.Points[v[(k+1)%3]], m.Points[v[(k+2)%3]]
			angle := cornerAngle(p, a, b)
			if angle < q.SmallestAngle {
				q.SmallestAngle, q.At = angle, p
			}
			q.LargestAngle = max(q.LargestAngle, angle)
			l := dist(a, b)
			q.Shortest, q.Longest = min(q.Shortest, l), max(q.Longest, l)
		}
	}
	return q
}

// cornerAngle is the angle at p between a and b, in degrees.
func cornerAngle(p, a, b r2.Vec) float64 {
	u, w := r2.Sub(a, p), r2.Sub(b, p)
	return math.Atan2(math.Abs(cross(u, w)), dot(u, w)) * 180 / math.Pi
}
