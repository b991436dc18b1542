package mesh

import (
	"math"
	"reflect"
	"testing"

	"gonum.org/v1/gonum/spatial/r2"

	"notchproof/mesh/outline"
	"notchproof/mesh/predicate"
)

// domains are the regions that property tests run over.
func domains() map[string]*outline.Region {
	ellipse := holed(4, 2)
	ellipse.Holes = []outline.Loop{{{Curve: outline.EllipticArc{Center: pt(2, 1), A: 0.6, B: 0.03, Tilt: 0.3, Sweep: -2 * math.Pi}}}}
	return map[string]*outline.Region{
		"stepped":      stepped(2, 1, 0.05),
		"to the edge":  stepped(2, 1, 0.5),
		"tiny fillet":  stepped(3, 1, 1e-5),
		"hole":         holed(3, 2, [3]float64{1, 1, 0.1}),
		"close holes":  holed(3, 2, [3]float64{1, 1, 0.3}, [3]float64{1.61, 1, 0.3}),
		"notch":        notched(2, 1, 0.2),
		"ellipse":      ellipse,
		"sharp corner": {Outer: polygon(pt(0, 0), pt(1, 0), pt(1, 0.1))},
	}
}

// No corner lies inside the circle of a triangle across an edge: the mesh is a
// constrained Delaunay triangulation.
func TestConstrainedDelaunay(t *testing.T) {
	for name, region := range domains() {
		m := check(t, name, region, Sizing{Largest: 0.1}, 0)
		for i := range m.Triangles {
			for _, n := range m.Neighbors[i] {
				if n < 0 {
					continue
				}
				v := m.Triangles[i]
				for _, w := range m.Triangles[n] {
					if w != v[0] && w != v[1] && w != v[2] && predicate.InCircle(m.Points[v[0]], m.Points[v[1]], m.Points[v[2]], m.Points[w]) > 0 {
						t.Fatalf("%s: point %v lies inside the circle of triangle %d", name, m.Points[w], i)
					}
				}
			}
		}
	}
}

// The triangles' area is that of the polygon through the boundary vertices, and
// both approach that of the region.
func TestArea(t *testing.T) {
	region := holed(3, 2, [3]float64{1, 1, 0.5})
	for _, n := range []float64{2, 8, 32} {
		m := check(t, "hole", region, Sizing{Sides: []SideWish{{Side: 4, PerQuarter: n}}}, 25)
		area := 0.0
		for _, v := range m.Triangles {
			area += area2(m.Points[v[0]], m.Points[v[1]], m.Points[v[2]]) / 2
		}
		var pieces float64
		for _, e := range m.Boundary {
			if e.Side == 4 {
				pieces++
			}
		}
		// The polygon in the circle of radius r has the area n r² sin(2π/n)/2.
		want := 6 - pieces*0.25*math.Sin(2*math.Pi/pieces)/2
		if math.Abs(area-want) > 1e-12 {
			t.Errorf("%g pieces: area %.15g, want %.15g", pieces, area, want)
		}
		if pieces != 4*n {
			t.Errorf("%g pieces on the hole, want %g", pieces, 4*n)
		}
	}
}

func TestSameBits(t *testing.T) {
	for name, region := range domains() {
		size := Sizing{Largest: 0.2, Sides: []SideWish{{Side: 2, PerQuarter: 5}}}
		a, err := Generate(region, size)
		if err != nil {
			t.Fatal(err)
		}
		b, _ := Generate(region, size)
		if !reflect.DeepEqual(a, b) {
			t.Errorf("%s: two runs differ", name)
		}
	}
}

// Sizes are kept: nowhere an edge longer than the largest, on sides never longer
// than wished for there, and inside at most √2 times longer.
func TestSizesAreKept(t *testing.T) {
	for name, region := range domains() {
		size := Sizing{Largest: 0.3, Growth: 0.3,
			Sides: []SideWish{{Side: 1, Size: 0.05}},
			Spots: []SpotWish{{At: pt(0.5, 0.3), Size: 0.01}}}
		m := check(t, name, region, size, 0)
		box := emptyBox()
		for _, p := range m.Points {
			box = widen(box, p)
		}
		field, err := newSizeField(region.Sides(), size, extentOf(box))
		if err != nil {
			t.Fatal(err)
		}
		if q := m.Quality(); q.Longest > size.Largest {
			t.Errorf("%s: edge of length %g", name, q.Longest)
		}
		for _, v := range m.Triangles {
			for k := range 3 {
				a, b := m.Points[v[k]], m.Points[v[(k+1)%3]]
				if h := field.at(r2.Scale(0.5, r2.Add(a, b))); dist(a, b) > math.Sqrt2*h*(1+1e-12) {
					t.Errorf("%s: edge of length %g where %g is wished for", name, dist(a, b), h)
				}
			}
		}
	}
}

// Each mesh is spoiled in one way that Validate must notice.
func TestValidateNotices(t *testing.T) {
	for _, c := range []struct {
		what  string
		spoil func(m *Mesh)
	}{
		{"clockwise triangle", func(m *Mesh) { v := &m.Triangles[5]; v[0], v[1] = v[1], v[0] }},
		{"moved point", func(m *Mesh) { m.Points[len(m.Points)-1] = pt(-1, -1) }},
		{"boundary point off its curve", func(m *Mesh) { m.Points[5].X += 1e-6 }},
		{"wrong neighbour", func(m *Mesh) { n := &m.Neighbors[3]; n[0], n[1] = n[1], n[0] }},
		{"missing neighbour", func(m *Mesh) { m.Neighbors[len(m.Neighbors)/2] = [3]int32{-1, -1, -1} }},
		{"missing triangle", func(m *Mesh) { m.Triangles = m.Triangles[:len(m.Triangles)-1] }},
		{"missing edge", func(m *Mesh) { m.Boundary = m.Boundary[1:] }},
		{"edge twice", func(m *Mesh) { m.Boundary = append(m.Boundary, m.Boundary[0]) }},
		{"edges out of order", func(m *Mesh) { m.Boundary[0], m.Boundary[1] = m.Boundary[1], m.Boundary[0] }},
		{"wrong parameter", func(m *Mesh) { m.Boundary[0].T1 += 1e-3 }},
		{"wrong side", func(m *Mesh) { m.Boundary[0].Side = 1 }},
		{"loose point", func(m *Mesh) { m.Points = append(m.Points, pt(0, 0)) }},
		{"more holes than the mesh has", func(m *Mesh) { r := *m.Region; r.Holes = append(r.Holes, outline.Loop{}); m.Region = &r }},
		{"corner out of range", func(m *Mesh) { m.Triangles[0][0] = int32(len(m.Points)) }},
		{"no triangles", func(m *Mesh) { *m = Mesh{Region: m.Region} }},
		{"no region", func(m *Mesh) { m.Region = nil }},
	} {
		m, err := Generate(notched(2, 1, 0.2), Sizing{Largest: 0.3})
		if err != nil {
			t.Fatal(err)
		}
		if c.spoil(m); m.Validate() == nil {
			t.Errorf("%s: not noticed", c.what)
		}
	}
}

// The number of triangles grows with the logarithm of the ratio of sizes.
func TestCountGrowsLogarithmically(t *testing.T) {
	count := func(r float64) float64 {
		size := Sizing{Sides: []SideWish{{Side: 3, PerQuarter: 4}}}
		return float64(len(check(t, "notch", notched(2, 1, r), size, 25).Triangles))
	}
	n1, n2, n4, n8 := count(1e-1), count(1e-2), count(1e-4), count(1e-8)
	if decade := (n8 - n4) / 4; n4 > n2+2.5*decade || n8 > n1+9*decade {
		t.Errorf("%g, %g, %g and %g triangles for radii of 1e-1, 1e-2, 1e-4 and 1e-8", n1, n2, n4, n8)
	}
}

// Units and place of a drawing do not matter. Powers of two and whole numbers keep
// the coordinates exact.
func TestScaleAndPlace(t *testing.T) {
	base := check(t, "base", &outline.Region{Outer: polygon(pt(0, 0), pt(4, 0), pt(4, 3), pt(1, 3), pt(1, 1), pt(0, 1))}, Sizing{Largest: 0.5}, 25)
	for _, s := range []float64{0x1p-100, 0x1p-20, 0x1p100} {
		scaled := &outline.Region{Outer: polygon(pt(0, 0), pt(4*s, 0), pt(4*s, 3*s), pt(s, 3*s), pt(s, s), pt(0, s))}
		m := check(t, "scaled", scaled, Sizing{Largest: 0.5 * s}, 25)
		if !reflect.DeepEqual(m.Triangles, base.Triangles) {
			t.Errorf("scaled by %g: other triangles", s)
		}
	}
	for _, d := range []float64{1e3, 1e6} {
		far := &outline.Region{Outer: polygon(pt(d, -d), pt(d+4, -d), pt(d+4, 3-d), pt(d+1, 3-d), pt(d+1, 1-d), pt(d, 1-d))}
		check(t, "far", far, Sizing{Largest: 0.5}, 25)
		hole := holed(1, 1)
		hole.Outer = outline.Loop{arc(pt(d, d), 1, 0, 2*math.Pi)}
		check(t, "far disc", hole, Sizing{Spots: []SpotWish{{At: pt(d, d), Size: 1e-3}}}, 25)
	}
}
