package render

import (
	"math"
	"math/rand/v2"
	"testing"
)

func areaOf(ps []point) float64 {
	sum := 0.0
	for i, p := range ps {
		q := ps[(i+1)%len(ps)]
		sum += p.X*q.Y - q.X*p.Y
	}
	return math.Abs(sum) / 2
}

// The area of a clipped circle is that of the circle's part in the box; the
// clipped length of random polylines is what fine sampling counts.
func TestClipping(t *testing.T) {
	b := box{0, -1e9, 1e9, 1e9}
	disc := circle(point{0, 0}, 500)
	if got, want := areaOf(clipPolygon(disc, b)), areaOf(disc)/2; math.Abs(got/want-1) > 1e-9 {
		t.Errorf("half a disc has area %g instead of %g", got, want)
	}
	if rest := clipPolygon(disc, box{600, 600, 700, 700}); len(rest) != 0 {
		t.Errorf("outside the box %v is left", rest)
	}
	rng := rand.New(rand.NewPCG(1, 2))
	window := box{20, 30, 80, 70}
	for range 50 {
		var line []point
		for range 8 {
			line = append(line, point{100 * rng.Float64(), 100 * rng.Float64()})
		}
		got := 0.0
		for _, piece := range clipLine(line, window) {
			got += lengthOf(piece)
			for _, p := range piece {
				if !window.grown(1e-9).has(p) {
					t.Fatalf("%v is outside", p)
				}
			}
		}
		want, total := 0.0, lengthOf(line)
		const samples = 20000
		for i := range samples {
			if window.has(pointAlong(line, total*(float64(i)+0.5)/samples)) {
				want += total / samples
			}
		}
		if math.Abs(got-want) > 16*total/samples { // a sample at each crossing
			t.Fatalf("length %g inside, sampling says %g", got, want)
		}
	}
}

// At a magnification of a million the part's silhouette stays what it is near
// the window and nowhere far from it.
func TestLoopsAtLargeMagnification(t *testing.T) {
	part := newPart(t, "bar-shoulder", map[string]float64{"D": 60, "d": 40, "r": 0.006})
	const on = 0.006 * (1 - math.Sqrt2/2) // the middle of the fillet, from its ends
	v := &view{scale: 3e7, window: circle(point{200, 200}, 180), mirror: true}
	v.origin = point{200 - v.scale*on, 200 + v.scale*(20+on)}
	reach := v.bounds().grown(spare + 1)
	for _, ps := range v.loops(part) {
		for _, p := range ps {
			if !reach.has(p) {
				t.Fatalf("point %v is far outside the window", p)
			}
		}
	}
	mask := coverage(v.pixels(), v.loops(part)...)
	if a := mask.AlphaAt(100, 300).A; a != 255 {
		t.Errorf("material has coverage %d", a)
	}
}
