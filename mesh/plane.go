package mesh

import (
	"math"

	"gonum.org/v1/gonum/spatial/r2"
)

// Arithmetic of vectors without fused multiply-adds: a mesh must not depend on
// the machine, and the least bit can decide about an edge.

func dot(p, q r2.Vec) float64 { return float64(p.X*q.X) + float64(p.Y*q.Y) }

func cross(p, q r2.Vec) float64 { return float64(p.X*q.Y) - float64(p.Y*q.X) }

func norm(p r2.Vec) float64 { return math.Sqrt(dot(p, p)) }

// shifted gives p + d·u.
func shifted(p r2.Vec, d float64, u r2.Vec) r2.Vec {
	return r2.Vec{X: p.X + float64(d*u.X), Y: p.Y + float64(d*u.Y)}
}

func midpoint(p, q r2.Vec) r2.Vec { return r2.Vec{X: (p.X + q.X) / 2, Y: (p.Y + q.Y) / 2} }

// area2 is twice the signed area of a triangle.
func area2(a, b, c r2.Vec) float64 {
	return float64((b.X-a.X)*(c.Y-a.Y)) - float64((b.Y-a.Y)*(c.X-a.X))
}

func dist2(a, b r2.Vec) float64 {
	dx, dy := a.X-b.X, a.Y-b.Y
	return float64(dx*dx) + float64(dy*dy)
}

func dist(a, b r2.Vec) float64 { return math.Sqrt(dist2(a, b)) }
