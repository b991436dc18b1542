package render

import (
	"image"
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

// share is the part of the material that is within a distance of a level.
func (r *raster) share(level, within float64) float64 {
	near, all := 0, 0
	for _, v := range r.values {
		if math.IsNaN(v) {
			continue
		}
		all++
		if math.Abs(v-level) <= within {
			near++
		}
	}
	return float64(near) / float64(max(1, all))
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

// bled gives a raster in which pixels beside the material have the value of
// their neighbours, so that pixels which the boundary cuts have one.
func (r *raster) bled(steps int) *raster {
	w, h := r.area.Dx(), r.area.Dy()
	wider := &raster{r.area, append([]float64(nil), r.values...)}
	for range steps {
		old := append([]float64(nil), wider.values...)
		for y := range h {
			for x := range w {
				if i := y*w + x; math.IsNaN(old[i]) {
					wider.values[i] = beside(old, w, h, x, y)
				}
			}
		}
	}
	return wider
}

// beside is the mean of the values around a pixel, NaN when there are none.
func beside(values []float64, w, h, x, y int) float64 {
	sum, n := 0.0, 0
	for j := max(0, y-1); j <= min(h-1, y+1); j++ {
		for i := max(0, x-1); i <= min(w-1, x+1); i++ {
			if v := values[j*w+i]; !math.IsNaN(v) {
				sum += v
				n++
			}
		}
	}
	if n == 0 {
		return math.NaN()
	}
	return sum / float64(n)
}

// picture colours the values, top being the dark end of the ramp.
func (r *raster) picture(top float64) *image.RGBA {
	im := image.NewRGBA(r.area)
	for i, v := range r.values {
		if !math.IsNaN(v) {
			c := tone(v / top)
			im.Pix[4*i], im.Pix[4*i+1], im.Pix[4*i+2], im.Pix[4*i+3] = c.R, c.G, c.B, c.A
		}
	}
	return im
}
