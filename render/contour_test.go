package render

import (
	"image"
	"math"
	"testing"
)

// filled gives a raster with f at the centre of every pixel.
func filled(w, h int, f func(x, y float64) float64) *raster {
	r := newRaster(image.Rect(7, 11, 7+w, 11+h)) // not at the origin
	for y := r.area.Min.Y; y < r.area.Max.Y; y++ {
		for x := r.area.Min.X; x < r.area.Max.X; x++ {
			r.values[r.index(x, y)] = f(float64(x)+0.5, float64(y)+0.5)
		}
	}
	return r
}

// The contour of a distance is a circle: closed, one, everywhere at its radius
// to within the error of linear interpolation, h²/(8R), and of its length.
func TestContourOfCone(t *testing.T) {
	const cx, cy, radius = 60.3, 58.7, 31.4
	r := filled(110, 100, func(x, y float64) float64 { return math.Hypot(x-cx, y-cy) })
	lines := contours(r, []float64{radius})[0]
	if len(lines) != 1 {
		t.Fatalf("%d lines instead of one", len(lines))
	}
	line := lines[0]
	if line[0] != line[len(line)-1] {
		t.Error("the circle is not closed")
	}
	for _, p := range line {
		if d := math.Hypot(p.X-cx, p.Y-cy) - radius; math.Abs(d) > 1/(8*radius) {
			t.Fatalf("point %v is %g off the circle", p, d)
		}
	}
	if got, want := lengthOf(line), 2*math.Pi*radius; math.Abs(got/want-1) > 1e-3 {
		t.Errorf("length %g instead of %g", got, want)
	}
}

// Contours of a plane are straight lines from rim to rim, also where a hole in
// the material cuts them.
func TestContourOfPlane(t *testing.T) {
	hole := image.Rect(30, 40, 50, 60)
	r := filled(80, 80, func(x, y float64) float64 {
		if image.Pt(int(x), int(y)).In(hole) {
			return math.NaN()
		}
		return 0.3*x + 0.7*y
	})
	lines := contours(r, []float64{47})[0]
	if len(lines) != 2 {
		t.Fatalf("%d lines instead of two beside a hole", len(lines))
	}
	for _, line := range lines {
		for _, p := range line {
			if d := 0.3*p.X + 0.7*p.Y - 47; math.Abs(d) > 1e-9 {
				t.Fatalf("point %v is off the line by %g", p, d)
			}
		}
	}
}

// At a saddle four branches meet two by two: no line is lost, none crosses.
func TestContourOfSaddle(t *testing.T) {
	f := func(x, y float64) float64 { return (x - 40.2) * (y - 40.4) }
	for _, level := range []float64{-3, -0.01, 0.01, 3} {
		lines := contours(filled(70, 70, f), []float64{level})[0]
		if len(lines) != 2 {
			t.Errorf("level %g: %d branches instead of two", level, len(lines))
		}
		for _, line := range lines {
			for _, p := range line {
				if math.Abs(f(p.X, p.Y)-level) > 0.3 { // bilinear: 1/4 at most between centres
					t.Fatalf("level %g: value %g at %v", level, f(p.X, p.Y), p)
				}
			}
		}
	}
}

// A level at which a plain stretch lies is not traced, its neighbours are.
func TestNoContourOnPlateau(t *testing.T) {
	r := filled(100, 60, func(x, y float64) float64 {
		return math.Min(1, x/50) + 1e-9*math.Sin(x*y)
	})
	for _, c := range trace(r, []float64{0.25, 0.5, 0.75, 1}) {
		if has := len(c.lines) > 0; has != (c.level < 1) {
			t.Errorf("level %g: %d lines", c.level, len(c.lines))
		}
	}
}

func TestLevels(t *testing.T) {
	for _, top := range []float64{0.0123, 1.0001, 1.29, 1.98, 3, 7.13, 47} {
		list := levels(top, 8)
		if len(list) < 4 || len(list) > 10 {
			t.Errorf("top %g: %d levels", top, len(list))
		}
		for i, v := range list {
			if v <= 0 || v >= top || i > 0 && v <= list[i-1] {
				t.Errorf("top %g: level %g", top, v)
			}
		}
	}
	for _, bad := range []float64{0, -1, math.NaN(), math.Inf(1)} {
		if list := levels(bad, 8); list != nil {
			t.Errorf("top %g: levels %v", bad, list)
		}
	}
}
