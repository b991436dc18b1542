package render

import (
	"math"

	"notchproof/mesh/lagrange"
)

// A painter fills rows of a raster from facets.
type painter struct {
	field  *field
	raster *raster
	axis   int // the rows from here on are the mirror images of those above; beyond the raster: none are
	phi    []float64
	line   *lagrange.Line
	nodes  [][4]float64 // stresses at the nodes of the line
	along  []float64
}

func newPainter(f *field, r *raster, axis int) *painter {
	n := f.element.Order + 1
	return &painter{
		field: f, raster: r, axis: axis, phi: make([]float64, f.element.Count),
		line: lagrange.NewLine(f.element.Order), nodes: make([][4]float64, n), along: make([]float64, n),
	}
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
	if t.twice() == 0 {
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
	at := p.stresses(t, float64(y)+0.5, first, last)
	for k := range last - first + 1 {
		here, mirrored := p.field.read.value(at(k))
		if upper != nil {
			upper[k] = here
		}
		if lower != nil {
			lower[k] = mirrored
		}
	}
}

// stresses gives the stresses at the pixels of a span, counted from its first.
// Along a straight line through a facet the stress is a polynomial of the
// element's order, so that on a long span order+1 evaluations give it exactly
// everywhere.
func (p *painter) stresses(t *facet, y float64, first, last int) func(k int) [4]float64 {
	from := float64(first) + 0.5
	if last-first < 2*len(p.nodes) {
		return func(k int) [4]float64 { return p.stress(t, from+float64(k), y) }
	}
	length := float64(last - first)
	for i, s := range p.line.Nodes {
		p.nodes[i] = p.stress(t, from+s*length, y)
	}
	return func(k int) (s [4]float64) {
		p.line.Basis(float64(k)/length, p.along)
		for i, w := range p.along {
			n := &p.nodes[i]
			s[0] += w * n[0]
			s[1] += w * n[1]
			s[2] += w * n[2]
			s[3] += w * n[3]
		}
		return s
	}
}

// stress evaluates the stresses at a place in a facet.
func (p *painter) stress(t *facet, x, y float64) (s [4]float64) {
	a, b, c := t.corner[0], t.corner[1], t.corner[2]
	twice := t.twice()
	lb := ((x-a.X)*(c.Y-a.Y) - (c.X-a.X)*(y-a.Y)) / twice
	lc := ((b.X-a.X)*(y-a.Y) - (x-a.X)*(b.Y-a.Y)) / twice
	la := 1 - lb - lc
	p.field.element.Basis(la*t.xi[0]+lb*t.xi[1]+lc*t.xi[2], la*t.eta[0]+lb*t.eta[1]+lc*t.eta[2], p.phi)
	for k, v := range p.field.cells[t.cell].stress {
		w := p.phi[k]
		s[0] += w * v[0]
		s[1] += w * v[1]
		s[2] += w * v[2]
		s[3] += w * v[3]
	}
	return s
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
		x0, x1 = math.Min(x0, x), math.Max(x1, x)
	}
	return x0, x1
}
