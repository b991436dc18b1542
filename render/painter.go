package render

import "math"

// A painter fills rows of a raster from facets.
type painter struct {
	field  *field
	raster *raster
	up     tensor
	down   tensor
	axis   int // the rows from here on are the mirror images of those above; beyond the raster: none are
}

// rows fills the rows from y0 up to y1 and their mirror images. Facets are in
// order of their tops.
func (p *painter) rows(facets []facet, y0, y1 int) {
	for i := range facets {
		t := &facets[i]
		first := max(y0, int(math.Ceil(t.top-0.5)))
		last := min(y1-1, int(math.Floor(t.low-0.5)))
		for y := first; y <= last; y++ {
			p.span(t, y)
		}
		if t.top > float64(y1) {
			return
		}
	}
}

// span fills what a facet covers of row y and of the mirror image of that row,
// which is a row of pixels because the axis lies between two rows.
func (p *painter) span(t *facet, y int) {
	twice := t.twice()
	if twice == 0 {
		return
	}
	x0, x1 := t.cross(float64(y) + 0.5)
	// Half a thousandth of a pixel more at both ends leaves no gap between
	// neighbours whose common side passes through a centre.
	const rim = 5e-4
	area := p.raster.area
	first := max(area.Min.X, int(math.Ceil(x0-0.5-rim)))
	last := min(area.Max.X-1, int(math.Floor(x1-0.5+rim)))
	if first > last {
		return
	}
	var upper, lower []float64
	if y >= area.Min.Y && y < area.Max.Y {
		upper = p.raster.values[p.raster.index(first, y):]
	}
	if image := 2*p.axis - 1 - y; p.axis < area.Max.Y && image < area.Max.Y && image >= area.Min.Y {
		lower = p.raster.values[p.raster.index(first, image):]
	}
	// The reference coordinates are linear along the row.
	xi, eta := t.reference(float64(first)+0.5, float64(y)+0.5)
	dxi, deta := t.slope(twice)
	c := &p.field.cells[t.cell]
	for k := range last - first + 1 {
		here, image := p.field.values(c, xi+float64(k)*dxi, eta+float64(k)*deta, lower != nil, &p.up, &p.down)
		if upper != nil {
			upper[k] = here
		}
		if lower != nil {
			lower[k] = image
		}
	}
}

// reference gives the reference coordinates of a place in a facet.
func (t *facet) reference(x, y float64) (xi, eta float64) {
	a, b, c := t.corner[0], t.corner[1], t.corner[2]
	twice := t.twice()
	lb := ((x-a.X)*(c.Y-a.Y) - (c.X-a.X)*(y-a.Y)) / twice
	lc := ((b.X-a.X)*(y-a.Y) - (x-a.X)*(b.Y-a.Y)) / twice
	la := 1 - lb - lc
	return la*t.xi[0] + lb*t.xi[1] + lc*t.xi[2], la*t.eta[0] + lb*t.eta[1] + lc*t.eta[2]
}

// slope gives the change of the reference coordinates from pixel to pixel.
func (t *facet) slope(twice float64) (dxi, deta float64) {
	a, b, c := t.corner[0], t.corner[1], t.corner[2]
	lb, lc := (c.Y-a.Y)/twice, -(b.Y-a.Y)/twice
	la := -lb - lc
	return la*t.xi[0] + lb*t.xi[1] + lc*t.xi[2], la*t.eta[0] + lb*t.eta[1] + lc*t.eta[2]
}

// twice is double the area of a facet, with a sign.
func (t *facet) twice() float64 {
	a, b, c := t.corner[0], t.corner[1], t.corner[2]
	return (b.X-a.X)*(c.Y-a.Y) - (c.X-a.X)*(b.Y-a.Y)
}

// cross gives where the row at y enters and leaves a facet.
func (t *facet) cross(y float64) (x0, x1 float64) {
	x0, x1 = math.Inf(1), math.Inf(-1)
	for k := range 3 {
		a, b := t.corner[k], t.corner[(k+1)%3]
		if (a.Y-y)*(b.Y-y) > 0 || a.Y == b.Y {
			continue
		}
		x := a.X + (b.X-a.X)*(y-a.Y)/(b.Y-a.Y)
		x0, x1 = min(x0, x), max(x1, x)
	}
	return x0, x1
}
