package render

import (
	"image"
	"math"
	"testing"

	"notchproof/scf"
)

// The closed mean of sin²(πN) over a pixel is the one that many samples give.
func TestIntensityIsTheMeanOverAPixel(t *testing.T) {
	const n = 400
	for _, c := range [][3]float64{{0, 0, 0}, {0.5, 0, 0}, {3, 0.2, 0.1}, {2.3, 0.9, -0.4}, {7.77, 2.6, 1.3}} {
		sum := 0.0
		for i := range n {
			for j := range n {
				order := c[0] + c[1]*((float64(i)+0.5)/n-0.5) + c[2]*((float64(j)+0.5)/n-0.5)
				s := math.Sin(math.Pi * order)
				sum += s * s / n / n
			}
		}
		if got := intensity(c[0], c[1], c[2]); math.Abs(got-sum) > 1e-4 {
			t.Errorf("%v: %g instead of %g", c, got, sum)
		}
	}
}

// Bands much finer than a pixel are the grey of their mean light, with neither
// black nor white; wide ones reach both.
func TestFineFringesAreGrey(t *testing.T) {
	f := newFringes(9)
	lightest, darkest := uint8(0), uint8(255)
	look := func(step float64) {
		r := filled(60, 8, func(x, y float64) float64 { return f.value * (step*x + 0.3*step*y) })
		paint := f.painter(r)
		lightest, darkest = 0, 255
		for y := r.area.Min.Y + 1; y < r.area.Max.Y-1; y++ {
			for x := r.area.Min.X + 1; x < r.area.Max.X-1; x++ {
				c := paint(x, y, r.at(point{float64(x) + 0.5, float64(y) + 0.5}))
				lightest, darkest = max(lightest, c.R), min(darkest, c.R)
				if c.R != c.G || c.G != c.B {
					t.Fatal("fringes have a colour")
				}
			}
		}
	}
	look(0.02)
	if lightest < 250 || darkest > 20 {
		t.Errorf("wide bands run from %d to %d", darkest, lightest)
	}
	look(5.37)
	mean := int(math.Round(255 * encode(0.5)))
	if int(lightest)-mean > 12 || mean-int(darkest) > 12 {
		t.Errorf("fine bands run from %d to %d, their mean is %d", darkest, lightest, mean)
	}
}

// The sheet states the stress of one fringe, as a round number, and the root
// shows a number of them that can be counted.
func TestFringeValue(t *testing.T) {
	for _, high := range []float64{0.9, 1.41, 2.5, 3.14, 7.13, 48} {
		f := newFringes(high)
		if n := high / f.value; n < 4 || n > 10.01 {
			t.Errorf("difference %g: %.1f fringes", high, n)
		}
	}
}

// Fringes are drawn without any colour.
func TestFringePictureIsMonochrome(t *testing.T) {
	part := newPart(t, "bar-notch", scf.Dims{"D": 60, "d": 40, "r": 6})
	f := solved(t, part, scf.Tension, 4)
	f.Verdict = 0
	im, err := Picture(f, part, PictureOptions{Width: 600, Style: StyleFringe})
	if err != nil {
		t.Fatal(err)
	}
	p := im.(*image.RGBA).Pix
	for i := 0; i < len(p); i += 4 {
		if spread := max(p[i], p[i+1], p[i+2]) - min(p[i], p[i+1], p[i+2]); spread > 16 { // ink is a little blue
			t.Fatalf("pixel %d has the colour %v", i/4, p[i:i+3])
		}
	}
}
