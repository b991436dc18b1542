package mesh

import (
	"math"
	"testing"

	"gonum.org/v1/gonum/spatial/r2"

	"notchproof/mesh/outline"
)

// A recipe turns bytes into an outline: a point in polar coordinates for every
// side of the outer loop, with the way the side bulges, then holes. Few recipes
// make sense, but nearly all come close.
type recipe []byte

// next takes one byte as a number from 0 to 1.
func (r *recipe) next() float64 {
	if len(*r) == 0 {
		return 0.5
	}
	b := (*r)[0]
	*r = (*r)[1:]
	return float64(b) / 255
}

func (r *recipe) region() *outline.Region {
	n := 2 + int(r.next()*10)
	var ps []r2.Vec
	for i := range n {
		sin, cos := math.Sincos(2 * math.Pi * (float64(i) + r.next() - 0.5) / float64(n))
		ps = append(ps, r2.Scale(math.Pow(10, 1.2*(r.next()-1)), pt(cos, sin)))
	}
	region := &outline.Region{}
	for i, p := range ps {
		region.Outer = append(region.Outer, bulged(p, ps[(i+1)%n], r.next()))
	}
	for range int(r.next() * 3) {
		radius := math.Pow(10, 3*r.next()-4)
		c := pt(0.4*(r.next()-0.5), 0.4*(r.next()-0.5))
		region.Holes = append(region.Holes, outline.Loop{arc(c, radius, 0, -2*math.Pi)})
	}
	return region
}

// bulged joins two points by a line or, for how above a half, by an arc that
// turns by up to a quarter to either side.
func bulged(a, b r2.Vec, how float64) outline.Side {
	turn := (how - 0.75) * 2 * math.Pi
	if how < 0.5 || math.Abs(turn) < 0.01 {
		return line(a, b)
	}
	// The centre sees the chord under |turn|, from the left if turn > 0.
	chord := r2.Sub(b, a)
	mid := r2.Scale(0.5, r2.Add(a, b))
	c := r2.Add(mid, r2.Scale(0.5/math.Tan(turn/2), pt(-chord.Y, chord.X)))
	d := r2.Sub(a, c)
	return arc(c, r2.Norm(d), math.Atan2(d.Y, d.X), turn)
}

func (r *recipe) sizing() Sizing {
	var s Sizing
	switch int(r.next() * 4) {
	case 1:
		s.Largest = 0.05 + r.next()
	case 2:
		s.Sides = []SideWish{{Side: 0, PerQuarter: 1 + 8*r.next()}, {Side: 1, Size: 0.01 + r.next()}}
	case 3:
		s.Spots = []SpotWish{{At: pt(r.next()-0.5, r.next()-0.5), Size: 0.001 + 0.1*r.next()}}
		s.Growth = 0.2 + r.next()
	}
	return s
}

// blunt tells whether no corner of the region is sharper than 60°.
func blunt(region *outline.Region) bool {
	for _, l := range loops(region) {
		for i := range l {
			if sharpCorner(l[i].Curve, l[(i+1)%len(l)].Curve) {
				return false
			}
		}
	}
	return true
}

// Whatever the outline, Generate gives a valid mesh or an error, and soon.
func FuzzGenerate(f *testing.F) {
	f.Add([]byte("a blunt one"))
	f.Add([]byte{0x40, 0x80, 0xff, 0x80, 0xff, 0x80, 0xff, 0x80, 0xff, 0xc8, 0xd0, 0xa0, 0xb0})
	f.Fuzz(func(t *testing.T, data []byte) {
		r := recipe(data)
		region := r.region()
		m, err := Generate(region, r.sizing())
		if err != nil {
			return
		}
		if err := m.Validate(); err != nil {
			t.Fatal(err)
		}
		if q := m.Quality(); q.SmallestAngle < 20 && blunt(region) {
			t.Fatalf("smallest angle %.2f° at %v", q.SmallestAngle, q.At)
		}
		if len(m.Triangles) > 100_000 {
			t.Fatalf("%d triangles", len(m.Triangles))
		}
	})
}
