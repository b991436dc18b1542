package evidence

import (
	"math"
	"testing"

	"gonum.org/v1/gonum/spatial/r2"

	"notchproof/mesh/outline"
)

// The curve of the evidence is itself one: derivatives by differences, length by
// chords, the curvature at the root, the foot of a perpendicular.
func TestHyperbola(t *testing.T) {
	h := hyperbola{a: 2, b: 0.5, from: 3, to: 0}
	const step = 1e-5
	chords := 0.0
	for i := range 20000 {
		chords += r2.Norm(r2.Sub(h.At(float64(i+1)/20000), h.At(float64(i)/20000)))
	}
	if got := h.Length(0, 1); !(math.Abs(got-chords) < 1e-7*chords) {
		t.Errorf("length %g, by chords %g", got, chords)
	}
	for _, at := range []float64{0.2, 0.7, 0.95} {
		d := r2.Scale(1/(2*step), r2.Sub(h.At(at+step), h.At(at-step)))
		s := r2.Scale(1/(2*step), r2.Sub(h.Deriv(at+step), h.Deriv(at-step)))
		if !(r2.Norm(r2.Sub(d, h.Deriv(at))) < 1e-8*r2.Norm(d)) || !(r2.Norm(r2.Sub(s, h.Second(at))) < 1e-8*r2.Norm(s)) {
			t.Errorf("derivatives at %g: %v and %v, by differences %v and %v", at, h.Deriv(at), h.Second(at), d, s)
		}
		p, n := h.At(at), h.Deriv(at)
		below := r2.Add(p, r2.Scale(-0.3/r2.Norm(n), pt(n.Y, -n.X)))
		if below.Y > p.Y {
			below = r2.Sub(r2.Scale(2, p), below)
		}
		if got := h.Nearest(below); !(math.Abs(got-at) < 1e-12) {
			t.Errorf("foot from %v at %g, want %g", below, got, at)
		}
	}
	if k := math.Abs(outline.Curvature(h, 1)); !(math.Abs(k-2/0.25) < 1e-12) {
		t.Errorf("curvature at the root %g, want a/b² = 8", k)
	}
}
