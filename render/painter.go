package render

import "math"

// A painter fills rows of a raster from facets.
type painter struct {
	field  *field
	raster *raster
	axis   int // rows from here on show the mirror image of those above
	phi    []float64
}

// rows fills the rows from y0 up to y1. Facets are in order of their tops.
func (p *painter) rows(facets []facet, v *view, y0, y1 int) {
	for i := range facets {
		t := &facets[i]
		for y := y0; y < y1; y++ {
			// The mirror image of a row of pixels is a row of pixels because
			// the axis lies between two rows.
			from, lower := float64(y)+0.5, y >= p.axis
			if lower {
				from = float64(2*p.axis-1-y) + 0.5
			}
			if from < t.top || from > t.low {
				continue
			}
			p.span(t, from, y, lower)
		}
	}
}

// span fills what a facet covers of row y; from is where that row lies on the
// facet's own side of the axis.
func (p *painter) span(t *facet, from float64, y int, lower bool) {
	x0, x1 := t.cross(from)
	// Half a thousandth of a pixel more at both ends leaves no gap between
	// neighbours whose common side passes through a centre.
	const rim = 5e-4
	first := max(p.raster.area.Min.X, int(math.Ceil(x0-0.5-rim)))
	last := min(p.raster.area.Max.X-1, int(math.Floor(x1-0.5+rim)))
	if first > last {
		return
	}
	a, b, c := t.corner[0], t.corner[1], t.corner[2]
	twice := (b.X-a.X)*(c.Y-a.Y) - (c.X-a.X)*(b.Y-a.Y)
	if twice == 0 {
		return
	}
	out := p.raster.values[p.raster.index(first, y):]
	for k := range last - first + 1 {
		x := float64(first+k) + 0.5
		lb := ((x-a.X)*(c.Y-a.Y) - (c.X-a.X)*(from-a.Y)) / twice
		lc := ((b.X-a.X)*(from-a.Y) - (x-a.X)*(b.Y-a.Y)) / twice
		la := 1 - lb - lc
		here, mirrored := p.value(t.cell,
			la*t.xi[0]+lb*t.xi[1]+lc*t.xi[2], la*t.eta[0]+lb*t.eta[1]+lc*t.eta[2])
		if lower {
			here = mirrored
		}
		out[k] = here
	}
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
		x0, x1 = math.Min(x0, x), math.Max(x1, x)
	}
	return x0, x1
}

// value reads the field at a point of a triangle.
func (p *painter) value(i int, xi, eta float64) (here, mirrored float64) {
	p.field.element.Basis(xi, eta, p.phi)
	var s [4]float64
	for k, v := range p.field.cells[i].stress {
		w := p.phi[k]
		s[0] += w * v[0]
		s[1] += w * v[1]
		s[2] += w * v[2]
		s[3] += w * v[3]
	}
	return p.field.read.value(s)
}
