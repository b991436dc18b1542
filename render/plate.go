package render

import (
	"image"
	"math"
)

// Quills: the distance between them and the length of the largest, in units.
const (
	mainStep, mainQuill   = 7, 70
	closeStep, closeQuill = 9, 100
)

func (p *plate) draw() {
	main, left, right := partView(p.part, p.box(p.layout.main), p.options.Whole, p.scale)
	close, times := detail(p.part, p.peak, main, p.point(p.layout.detail), p.u(p.layout.radius))
	p.captions(times)

	field := p.paint(main)
	e := extentOf(p.part)
	p.quills(main, p.needles(main, 0.5*(e.high-e.low)), p.quillLength(main, mainQuill)/p.quill, p.u(mainStep), p.look.mark())
	p.annotate(main, p.part, left, right, false)
	p.magnified(main, close, main.loops(p.part), "A")
	p.lines(main, field, 2)
	p.breaks(main, p.part, left, right)
	if p.part.Half {
		p.symmetry(main, symmetryPast)
	}
	lift := 0
	for _, t := range p.terms {
		p.load(main, p.part, t, lift, left, right, p.look.mark())
		if p.part.Half {
			lift++ // all act along the axis
		}
	}
	p.closeUp(close)
}

func (p *plate) captions(times float64) {
	at := p.point(p.layout.caption)
	a := p.text(at, 0, 0, "A", head, ink)
	p.text(point{a.X1 + p.u(10), at.Y + p.u(3)}, 0, 0, levelText(times)+" : 1 of the view above", normal, grey)
}

// closeUp draws the magnified root in its circle.
func (p *plate) closeUp(v *view) {
	b := v.bounds()
	x, y := b.middle()
	field := p.paint(v)
	needles := p.needles(v, 1.5*b.width()/v.scale)
	p.within(v)
	p.quills(v, needles, p.quillLength(v, closeQuill)/p.quill, p.u(closeStep), p.look.mark())
	p.dc.ResetClip()
	p.lines(v, field, 1)
	if v.mirror {
		p.within(v)
		p.symmetry(v, 0)
		p.dc.ResetClip()
	}
	p.pen(ink, wide)
	p.dc.DrawCircle(x, y, b.width()/2)
	p.dc.Stroke()
	p.markPeak(v)
}

// paint lays the field of a view on the sheet, with soft edges, and gives its
// values.
func (p *plate) paint(v *view) *raster {
	r := p.field.shade(v)
	mask := coverage(r.area, v.loops(p.part)...)
	multiply(mask, coverage(r.area, v.window))
	r.lay(p.im, mask, p.look.painter(r))
	return r
}

// lines draws elements, contours and edges over the field of a view; most is
// the number of labels a level.
func (p *plate) lines(v *view, r *raster, most int) {
	cs := p.look.contours(r)
	p.label(v, r, cs, most, p.look)
	p.within(v)
	if p.options.Mesh {
		p.elements(v, p.finding.Computed.Last.Problem.Shape)
	}
	p.contours(cs, p.look)
	p.edges(v, p.part, wide, ink)
	p.dc.ResetClip()
	p.letter(cs, p.look)
}

// quillLength is the length of the largest quill in a view, in pixels: in a hole
// that is wide enough for it not beyond its middle.
func (p *plate) quillLength(v *view, units float64) float64 {
	_, radius := root(p.part, p.peak)
	most := 0.8 * radius / 1.5 * v.scale
	if full := p.u(units); most >= full || most < full/3 {
		return full
	}
	return most
}

// needles gives the field along the surface that the peak lies on, as far as
// reach (a length of the part) to both sides of the peak, fine enough for a view.
func (p *plate) needles(v *view, reach float64) []needle {
	const spacing = 1.5 // units
	return p.along(p.u(spacing)/v.scale, reach)
}

// along is needles at steps of a length of the part.
func (p *plate) along(step, reach float64) []needle {
	var on *surface
	at, gap := 0.0, math.Inf(1)
	for i := range p.surfaces {
		if a, g := p.surfaces[i].nearest(p.peak); g < gap {
			on, at, gap = &p.surfaces[i], a, g
		}
	}
	if on == nil {
		return nil
	}
	list := on.needles(at, step, reach)
	if !p.settled() {
		for i := range list {
			list[i].Value = math.Min(list[i].Value, unboundTop)
		}
	}
	return list
}

func multiply(a, b *image.Alpha) {
	for i, v := range b.Pix {
		a.Pix[i] = uint8(int(a.Pix[i]) * int(v) / 255)
	}
}
