package mesh

import (
	"math/rand/v2"
	"testing"

	"gonum.org/v1/gonum/spatial/r2"
)

// Points made by the map are found again, from the middle of triangles to
// their corners and edges.
func TestLocateInvertsTheMap(t *testing.T) {
	for order := 1; order <= 8; order++ {
		for _, m := range []*Mesh{disc(1, 1, 1), disc(2, 1, 3), sector(1, 2, 1), sector(0.3, 2, 4), arch(1)} {
			c := m.Curve(order)
			f := c.Finder()
			for tri := range m.Triangles {
				for i := 0; i <= 8; i++ {
					for j := 0; i+j <= 8; j++ {
						xi, eta := float64(i)/8, float64(j)/8
						p := c.At(tri, xi, eta)
						x, e, ok := c.Locate(tri, p)
						if !ok || r2.Norm(r2.Sub(c.At(tri, x, e), p)) > 1e-14 {
							t.Errorf("order %d triangle %d (%g, %g): located at (%g, %g), %v", order, tri, xi, eta, x, e, ok)
						}
						found, x, e, ok := f.Find(p)
						if !ok || r2.Norm(r2.Sub(c.At(found, x, e), p)) > 1e-14 {
							t.Errorf("order %d triangle %d (%g, %g): found in %d at (%g, %g), %v", order, tri, xi, eta, found, x, e, ok)
						}
					}
				}
			}
		}
	}
}

// Find and a search through all triangles agree on whether a point is inside,
// and so does the region, away from its edge.
func TestFindAgreesWithSearch(t *testing.T) {
	rng := rand.New(rand.NewPCG(1, 2))
	c := sector(1, 2, 4).Curve(4)
	f := c.Finder()
	inside, outside := 0, 0
	for range 3000 {
		p := r2.Vec{X: -0.2 + 2.4*rng.Float64(), Y: -0.2 + 2.4*rng.Float64()}
		any := false
		for tri := range c.Mesh.Triangles {
			if _, _, ok := c.Locate(tri, p); ok {
				any = true
			}
		}
		tri, _, _, ok := f.Find(p)
		if ok != any || ok == (tri < 0) {
			t.Errorf("%v: found %v in %d, search %v", p, ok, tri, any)
		}
		r := r2.Norm(p)
		const clear = 1e-5 // the mesh's boundary is that near to the arcs
		switch {
		case p.X > clear && p.Y > clear && r > 1+clear && r < 2-clear:
			inside++
			if !ok {
				t.Errorf("%v is in the region, not found", p)
			}
		case p.X < -clear || p.Y < -clear || r < 1-clear || r > 2+clear:
			outside++
			if ok {
				t.Errorf("%v is outside, found in %d", p, tri)
			}
		}
	}
	if inside < 500 || outside < 500 {
		t.Errorf("only %d points inside and %d outside", inside, outside)
	}
}

// Far from the origin a small mesh has points of few digits; they are found
// all the same.
func TestLocateFarFromOrigin(t *testing.T) {
	c := disc(1, 1, 2).Curve(5)
	for i, p := range c.Nodes {
		c.Nodes[i] = r2.Add(r2.Scale(1e-4, p), r2.Vec{X: 1000, Y: -2000})
	}
	copy(c.Mesh.Points, c.Nodes)
	for tri := range c.Mesh.Triangles {
		if _, _, ok := c.Locate(tri, c.At(tri, 0.3, 0.3)); !ok {
			t.Errorf("triangle %d: own point not located", tri)
		}
	}
}

func TestFindInEmptyMesh(t *testing.T) {
	f := (&Finder{})
	if tri, _, _, ok := f.Find(r2.Vec{}); ok || tri != -1 {
		t.Errorf("found in %d", tri)
	}
}

func BenchmarkFind(b *testing.B) {
	c := disc(1, 1, 6).Curve(6)
	f := c.Finder()
	rng := rand.New(rand.NewPCG(1, 2))
	for b.Loop() {
		f.Find(r2.Vec{X: 2*rng.Float64() - 1, Y: 2*rng.Float64() - 1})
	}
}

func BenchmarkFinder(b *testing.B) {
	c := disc(1, 1, 6).Curve(6)
	for b.Loop() {
		c.Finder()
	}
}
