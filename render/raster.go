package render

import (
	"image"
	"image/color"
	"math"
)

// A raster holds a value a pixel of a rectangle of the sheet, NaN where there
// is no material.
type raster struct {
	area   image.Rectangle
	values []float64
}

func newRaster(area image.Rectangle) *raster {
	r := &raster{area, make([]float64, area.Dx()*area.Dy())}
	for i := range r.values {
		r.values[i] = math.NaN()
	}
	return r
}

func (r *raster) index(x, y int) int { return (y-r.area.Min.Y)*r.area.Dx() + x - r.area.Min.X }

// at gives the value of the pixel that holds a place, NaN outside.
func (r *raster) at(p point) float64 {
	q := image.Pt(int(math.Floor(p.X)), int(math.Floor(p.Y)))
	if !q.In(r.area) {
		return math.NaN()
	}
	return r.values[r.index(q.X, q.Y)]
}

// covers tells whether all of a box holds values. It looks at the corners and
// at points along the sides, a pixel and a half apart at most.
func (r *raster) covers(b box) bool {
	const apart = 1.5
	nx, ny := int(b.width()/apart)+1, int(b.height()/apart)+1
	for i := 0; i <= nx; i++ {
		x := b.X0 + b.width()*float64(i)/float64(nx)
		if math.IsNaN(r.at(point{x, b.Y0})) || math.IsNaN(r.at(point{x, b.Y1})) {
			return false
		}
	}
	for i := 0; i <= ny; i++ {
		y := b.Y0 + b.height()*float64(i)/float64(ny)
		if math.IsNaN(r.at(point{b.X0, y})) || math.IsNaN(r.at(point{b.X1, y})) {
			return false
		}
	}
	return true
}

// shares is, for each level, the part of the material that is within a distance
// of it.
func (r *raster) shares(levels []float64, within float64) []float64 {
	near, all := make([]float64, len(levels)), 0
	l := 0 // the level next to the last pixel's value
	for _, v := range r.values {
		if v != v {
			continue
		}
		all++
		for l+1 < len(levels) && levels[l+1] <= v {
			l++
		}
		for l > 0 && levels[l] > v {
			l--
		}
		for k := l; k < min(l+2, len(levels)); k++ {
			if math.Abs(v-levels[k]) <= within {
				near[k]++
			}
		}
	}
	for k := range near {
		near[k] /= float64(max(1, all))
	}
	return near
}

// quantile gives the value that a share q of the material does not exceed, to
// a thousandth of top; what is above top counts as top.
func (r *raster) quantile(q, top float64) float64 {
	const bins = 1000
	var count [bins + 1]int
	all := 0
	for _, v := range r.values {
		if !math.IsNaN(v) {
			count[int(bins*math.Max(0, math.Min(1, v/top)))]++
			all++
		}
	}
	seen := 0
	for i, n := range count {
		if seen += n; float64(seen) >= q*float64(all) {
			return top * float64(i+1) / bins
		}
	}
	return top
}

// nearby gives the value of a pixel beside the material, that the boundary cuts:
// the mean of those around it, NaN when there are none within two pixels.
func (r *raster) nearby(x, y int) float64 {
	for reach := 1; reach <= 2; reach++ {
		sum, n := 0.0, 0
		for j := max(r.area.Min.Y, y-reach); j <= min(r.area.Max.Y-1, y+reach); j++ {
			for i := max(r.area.Min.X, x-reach); i <= min(r.area.Max.X-1, x+reach); i++ {
				if v := r.values[r.index(i, j)]; v == v {
					sum += v
					n++
				}
			}
		}
		if n > 0 {
			return sum / float64(n)
		}
	}
	return math.NaN()
}

// lay paints the values on a picture where a mask, of the raster's own area,
// lets them through.
func (r *raster) lay(im *image.RGBA, mask *image.Alpha, paint func(x, y int, v float64) color.RGBA) {
	area := r.area.Intersect(im.Bounds())
	concurrently(area.Dy(), func() func(i int) {
		return func(i int) {
			y := area.Min.Y + i
			row := im.Pix[im.PixOffset(area.Min.X, y):]
			for x := area.Min.X; x < area.Max.X; x++ {
				a := uint32(mask.Pix[mask.PixOffset(x, y)])
				if a == 0 {
					continue
				}
				v := r.values[r.index(x, y)]
				if v != v {
					if v = r.nearby(x, y); v != v {
						continue
					}
				}
				c, to := paint(x, y, v), row[4*(x-area.Min.X):][:3]
				if a == 255 {
					to[0], to[1], to[2] = c.R, c.G, c.B
					continue
				}
				to[0] = mixed(c.R, to[0], a)
				to[1] = mixed(c.G, to[1], a)
				to[2] = mixed(c.B, to[2], a)
			}
		}
	})
}

// mixed lays one part in 255 of a colour over another.
func mixed(over, under uint8, a uint32) uint8 {
	return uint8((uint32(over)*a + uint32(under)*(255-a) + 127) / 255)
}
