package render

import (
	"image/color"
	"math"

	"notchproof/render/number"
)

// fringes is the look of a photoelastic model between crossed circular
// polarisers (dark field): the intensity is sin²(πN), N = (σ1 − σ2)/f, so that
// whole orders are dark (the stress-optic law after Maxwell; common practice).
// Charts of factors were once measured from such bands. Light is added up before
// it is turned into grey, and a band finer than a pixel shows as its average.
type fringes struct {
	value float64 // f, as a multiple of the reference: one fringe
	high  float64 // largest difference
	grey  [256]color.RGBA
}

// fringesAtRoot is about how many bands lie between nothing and the root: few
// enough to be counted, enough for half an order to matter little.
const fringesAtRoot = 10

func newFringes(high float64) *fringes {
	f := &fringes{value: roundStep(high / fringesAtRoot), high: high}
	for i := range f.grey {
		v := uint8(math.Round(255 * encode(float64(i)/255)))
		f.grey[i] = color.RGBA{v, v, v, 255}
	}
	return f
}

// intensity is the light of a pixel in which the order is n in the middle and
// rises by dx and dy from edge to edge: the mean of sin²(πN) over the pixel,
// for an order that is linear in it.
func intensity(n, dx, dy float64) float64 {
	return (1 - math.Cos(2*math.Pi*n)*sinc(dx)*sinc(dy)) / 2
}

// sinc is sin(πx)/(πx).
func sinc(x float64) float64 {
	x *= math.Pi
	if x*x < 1e-4 {
		return 1 - x*x/6
	}
	return math.Sin(x) / x
}

func (f *fringes) shade(light float64) color.RGBA {
	return f.grey[int(255*math.Max(0, math.Min(1, light))+0.5)]
}

func (f *fringes) painter(r *raster) func(x, y int, v float64) color.RGBA {
	return func(x, y int, v float64) color.RGBA {
		dx := r.change(x, y, 1, 0) / f.value
		dy := r.change(x, y, 0, 1) / f.value
		return f.shade(intensity(v/f.value, dx, dy))
	}
}

// change is the rise of the values along a direction at a pixel, from as many
// neighbours as are on the material.
func (r *raster) change(x, y, dx, dy int) float64 {
	value := func(x, y int) float64 {
		if x < r.area.Min.X || x >= r.area.Max.X || y < r.area.Min.Y || y >= r.area.Max.Y {
			return math.NaN()
		}
		return r.values[r.index(x, y)]
	}
	before, here, after := value(x-dx, y-dy), value(x, y), value(x+dx, y+dy)
	switch {
	case before == before && after == after:
		return (after - before) / 2
	case here == here && after == after:
		return after - here
	case here == here && before == before:
		return here - before
	}
	return 0
}

// orders lists the differences of the whole orders.
func (f *fringes) orders() []float64 {
	var list []float64
	for k := 1.0; k*f.value <= f.high; k++ {
		list = append(list, k*f.value)
	}
	return list
}

func (f *fringes) scale() scale {
	return scale{
		low: 0, high: f.high, levels: f.orders(),
		paint:   func(v float64) color.RGBA { return f.shade(intensity(v/f.value, 0, 0)) },
		text:    func(v float64) string { return number.Compact(v/f.value, 3) },
		end:     f.order,
		unruled: true,
	}
}

// order writes an order to a tenth.
func (f *fringes) order(v float64) string {
	if v == 0 {
		return "0"
	}
	return number.Decimal(v/f.value, 1)
}

// contours gives the lines of the whole orders for their numbers to stand on.
func (f *fringes) contours(r *raster) []contour {
	cs := trace(r, f.orders())
	for i := range cs {
		cs[i].bare = true
	}
	return cs
}

func (f *fringes) over(float64) color.NRGBA { return ink }

func (f *fringes) mark() color.NRGBA { return ink }

func (f *fringes) label(level float64) (string, color.Color) {
	return number.Compact(level/f.value, 3), paper
}

func (f *fringes) title(reference string) string {
	return "fringe order, one fringe = " + number.Compact(f.value, 3) + " · " + reference
}

func (f *fringes) note(p *plate) string {
	if p.twistAlone() {
		return "dark field; σ1 − σ2 of the shear on the drawn plane"
	}
	return "dark field; σ1 − σ2 in the drawn plane"
}
