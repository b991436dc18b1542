package fem

import (
	"math"
	"testing"

	"gonum.org/v1/gonum/spatial/r2"

	"notchproof/mesh"
	"notchproof/mesh/outline"
)

func pt(x, y float64) r2.Vec { return r2.Vec{X: x, Y: y} }

func line(a, b r2.Vec) outline.Side { return outline.Side{Curve: outline.Line{A: a, B: b}} }

func polygon(ps ...r2.Vec) *outline.Region {
	r := new(outline.Region)
	for i, p := range ps {
		r.Outer = append(r.Outer, line(p, ps[(i+1)%len(ps)]))
	}
	return r
}

// elliptic is the arc about a centre between two eccentric angles in degrees.
func elliptic(center r2.Vec, a, b, from, to float64) outline.Side {
	const degree = math.Pi / 180
	return outline.Side{Curve: outline.EllipticArc{Center: center, A: a, B: b, Start: from * degree, Sweep: (to - from) * degree}}
}

func generate(t testing.TB, region *outline.Region, size mesh.Sizing) *mesh.Mesh {
	t.Helper()
	m, err := mesh.Generate(region, size)
	if err != nil {
		t.Fatal(err)
	}
	return m
}

// halved cuts every triangle into four similar ones; new points on the boundary
// lie on its curves.
func halved(m *mesh.Mesh) *mesh.Mesh {
	f := &mesh.Mesh{Region: m.Region, Points: append([]r2.Vec(nil), m.Points...)}
	middle := make(map[[2]int32]int32)
	mid := func(a, b int32) int32 {
		key := [2]int32{min(a, b), max(a, b)}
		k, ok := middle[key]
		if !ok {
			k = int32(len(f.Points))
			middle[key] = k
			f.Points = append(f.Points, r2.Scale(0.5, r2.Add(m.Points[a], m.Points[b])))
		}
		return k
	}
	// The piece at corner k of triangle t is 4t+k and has that corner at place
	// k, so that its two outer edges have the numbers of the old ones.
	for _, v := range m.Triangles {
		m0, m1, m2 := mid(v[1], v[2]), mid(v[2], v[0]), mid(v[0], v[1])
		f.Triangles = append(f.Triangles, [3]int32{v[0], m2, m1}, [3]int32{m2, v[1], m0}, [3]int32{m1, m0, v[2]}, [3]int32{m0, m1, m2})
	}
	sides := m.Region.Sides()
	for _, e := range m.Boundary {
		k := int32(e.Opposite)
		v := m.Triangles[e.Triangle]
		tm := (e.T0 + e.T1) / 2
		f.Points[mid(v[(k+1)%3], v[(k+2)%3])] = sides[e.Side].Curve.At(tm)
		f.Boundary = append(f.Boundary,
			mesh.Edge{Triangle: 4*e.Triangle + (k+1)%3, Opposite: e.Opposite, Side: e.Side, T0: e.T0, T1: tm},
			mesh.Edge{Triangle: 4*e.Triangle + (k+2)%3, Opposite: e.Opposite, Side: e.Side, T0: tm, T1: e.T1})
	}
	f.Neighbors = neighbours(f.Triangles)
	return f
}

func neighbours(triangles [][3]int32) [][3]int32 {
	owner := make(map[[2]int32]int32)
	for i, v := range triangles {
		for k := range 3 {
			owner[[2]int32{v[(k+1)%3], v[(k+2)%3]}] = int32(i)
		}
	}
	n := make([][3]int32, len(triangles))
	for i, v := range triangles {
		for k := range 3 {
			other, ok := owner[[2]int32{v[(k+2)%3], v[(k+1)%3]}]
			if !ok {
				other = -1
			}
			n[i][k] = other
		}
	}
	return n
}

// The regions of the patch tests. Side 0 is the axis of a body of revolution;
// lifted copies stay clear of it.

// crooked has straight sides only.
func crooked(lift float64) *outline.Region {
	return polygon(pt(0, lift), pt(3, lift), pt(3.4, 1.1+lift), pt(2.1, 2+lift), pt(-0.3, 1.3+lift))
}

// domed has sides 2 and 3 elliptic and circular, one bulging, one hollow.
func domed(lift float64) *outline.Region {
	return &outline.Region{Outer: outline.Loop{
		line(pt(0, lift), pt(3, lift)),
		line(pt(3, lift), pt(3, 1.2+lift)),
		elliptic(pt(1.5, 1.2+lift), 1.5, 1, 0, 90),
		{Curve: outline.Arc{Center: pt(0, 2.2+lift), Radius: 1.5, Sweep: -math.Pi / 2}},
		line(pt(0, 0.7+lift), pt(0, lift)),
	}}
}

// vaulted has side 2 parabolic, whose edges are maps of degree 2.
func vaulted(lift float64) *outline.Region {
	return &outline.Region{Outer: outline.Loop{
		line(pt(0, lift), pt(3, lift)),
		line(pt(3, lift), pt(3, 1+lift)),
		{Curve: outline.NewQuadratic(pt(3, 1+lift), pt(1.5, 2.4+lift), pt(0, 1.2+lift))},
		line(pt(0, 1.2+lift), pt(0, lift)),
	}}
}
