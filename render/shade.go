package render

import (
	"image"
	"math"
	"sort"
)

// shade reads a field at the centre of every pixel of a view's window. A
// triangle that is bent is cut into flat facets first, a few pixels wide each,
// in which the reference coordinates are taken as linear: with the bend of a
// whole triangle below its own size, facets of 4 pixels misplace a value by
// less than a tenth of a pixel. The stress itself is evaluated from the
// triangle's polynomial at every pixel.
func (f *field) shade(v *view) *raster {
	r := newRaster(v.pixels())
	facets := f.facets(v, r.area)
	top, end, axis := r.area.Min.Y, r.area.Max.Y, r.area.Max.Y
	if v.mirror { // only the upper half is read, each row for itself and its image
		axis = int(math.Round(v.origin.Y))
		top, end = min(top, 2*axis-end), axis
	}
	const band = 16
	concurrently((end-top+band-1)/band, func() func(i int) {
		p := &painter{field: f, raster: r, axis: axis}
		return func(i int) {
			y := top + i*band
			p.rows(facets, y, min(y+band, end))
		}
	})
	return r
}

// A facet is a flat triangle on the sheet with the reference coordinates of
// its corners.
type facet struct {
	cell     int
	corner   [3]point
	xi, eta  [3]float64
	low, top float64 // range of y
}

// facets lists, from top to bottom, what may show in an area: of the part
// itself, not of its mirror image.
func (f *field) facets(v *view, area image.Rectangle) []facet {
	reach := box{float64(area.Min.X), float64(area.Min.Y), float64(area.Max.X), float64(area.Max.Y)}
	if v.mirror { // what shows below the axis is the mirror image of what is above
		reach.Y0 = math.Min(reach.Y0, 2*v.origin.Y-reach.Y1)
	}
	lists := make([][]facet, len(f.cells))
	concurrently(len(f.cells), func() func(i int) {
		return func(i int) { lists[i] = f.cut(v, i, reach) }
	})
	var all []facet
	for _, l := range lists {
		all = append(all, l...)
	}
	sort.SliceStable(all, func(i, j int) bool { return all[i].top < all[j].top })
	return all
}

// cut gives the facets of one triangle that meet an area.
func (f *field) cut(v *view, i int, reach box) []facet {
	c := &f.cells[i]
	hull := box{math.Inf(1), math.Inf(1), math.Inf(-1), math.Inf(-1)}
	for _, n := range c.nodes {
		p := v.at(n)
		hull = box{math.Min(hull.X0, p.X), math.Min(hull.Y0, p.Y), math.Max(hull.X1, p.X), math.Max(hull.Y1, p.Y)}
	}
	size := math.Max(hull.width(), hull.height())
	// Nodes of a bent triangle hold its edges to within a part of its size.
	if !hull.grown(size / 4).meets(reach) {
		return nil
	}
	n := 1
	if !c.straight {
		const wide, most = 4, 256
		n = max(1, min(most, int(math.Ceil(size/wide))))
	}
	// The corners of a row are those of the row before, one further on.
	row := func(b int) []facetCorner {
		ps := make([]facetCorner, n-b+1)
		for a := range ps {
			xi, eta := float64(a)/float64(n), float64(b)/float64(n)
			ps[a] = facetCorner{v.at(f.at(c, xi, eta)), xi, eta}
		}
		return ps
	}
	var list []facet
	add := func(corners ...facetCorner) {
		t := facet{cell: i}
		for k, g := range corners {
			t.corner[k], t.xi[k], t.eta[k] = g.at, g.xi, g.eta
		}
		t.top = min(t.corner[0].Y, t.corner[1].Y, t.corner[2].Y)
		t.low = max(t.corner[0].Y, t.corner[1].Y, t.corner[2].Y)
		if t.top <= reach.Y1 && t.low >= reach.Y0 {
			list = append(list, t)
		}
	}
	below := row(0)
	for b := range n {
		above := row(b + 1)
		for a := range n - b {
			add(below[a], below[a+1], above[a])
			if a+b+1 < n {
				add(below[a+1], above[a+1], above[a])
			}
		}
		below = above
	}
	return list
}

// A facetCorner is a point of a triangle on the sheet.
type facetCorner struct {
	at      point
	xi, eta float64
}
