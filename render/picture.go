package render

import (
	"errors"
	"fmt"
	"image"
	"image/draw"
	"image/png"
	"io"
	"math"

	"gonum.org/v1/gonum/spatial/r2"

	"notchproof/scf"
	"notchproof/verify"
	"notchproof/verify/specimen"
)

// PictureOptions say how a picture is drawn. The zero value is the default.
type PictureOptions struct {
	Width int  // pixels; 0: 1600
	Mesh  bool // draw the edges of the elements
}

// Picture draws the stresses of a finding: the whole part to scale with its
// dimensions, the field as the ratio of stress to nominal stress with contour
// lines, the stress along the surface of the notch as quills, the root
// magnified, and a title block. The finding must hold the solution of its last
// rung.
func Picture(f *verify.Finding, part *specimen.Part, o PictureOptions) (image.Image, error) {
	s, err := picture(f, part, o)
	if err != nil {
		return nil, err
	}
	return s.im, nil
}

// WritePNG writes an image as PNG.
func WritePNG(w io.Writer, im image.Image) error {
	e := png.Encoder{CompressionLevel: png.BestSpeed}
	return e.Encode(w, im)
}

// The parts of a picture's sheet, in units.
const (
	detailX, detailY, detailRadius = 300, 852, 226
	blockLeft, blockTop            = 620, 672
)

func picture(f *verify.Finding, part *specimen.Part, o PictureOptions) (*sheet, error) {
	c := &f.Computed
	switch {
	case c.Last == nil:
		return nil, errors.New("picture: the finding holds no solution")
	case !(c.Peak.Factor > 0) || math.IsInf(c.Peak.Factor, 0):
		return nil, fmt.Errorf("picture: peak factor %g cannot be drawn", c.Peak.Factor)
	}
	s := newSheet(o.Width, landscape)
	p := &plate{sheet: s, part: part, finding: f, options: o, top: c.Peak.Factor}
	p.levels = levels(p.top, 8)
	antisymmetric := part.Half && f.Load.Name == scf.Bending
	p.field = newField(c.Last, principal(antisymmetric))
	if f.Load.Shear {
		p.field = newField(c.Last, torsional())
	}
	p.surfaces = surfaces(c.Last, part, f.Load)

	s.titleBlock(box{s.u(blockLeft), s.u(blockTop), s.frame.X1, s.frame.Y1}, f, part)
	s.legend(s.area(blockLeft, blockTop-96, defaultWidth-frameMargin-20, blockTop), p.title(), p.note(antisymmetric), p.top, p.levels)
	p.draw()
	return s, nil
}

// A plate is a picture being drawn.
type plate struct {
	*sheet
	part     *specimen.Part
	finding  *verify.Finding
	options  PictureOptions
	field    *field
	surfaces []surface
	top      float64
	levels   []float64
}

func (p *plate) title() string {
	if p.finding.Load.Shear {
		return "shear stress ÷ nominal"
	}
	return "first principal stress ÷ nominal"
}

func (p *plate) note(antisymmetric bool) string {
	switch {
	case antisymmetric:
		return "lower half: the same stresses with the opposite sign"
	case p.part.Half:
		return "lower half is the mirror image"
	}
	return ""
}

// Quills: the distance between them and the length of the largest, in units.
const (
	mainStep, mainQuill   = 7, 70
	closeStep, closeQuill = 9, 100
)

func (p *plate) draw() {
	main, left, right := mainView(p.part, p.area(165, 112, 1435, 512), p.scale)
	peak := r2.Vec{X: p.finding.Computed.Peak.X, Y: p.finding.Computed.Peak.Y}
	close, times := detail(p.part, peak, main, point{p.u(detailX), p.u(detailY)}, p.u(detailRadius))
	p.text(point{p.u(50), p.u(blockTop - 96)}, 0, 0, "A", head, ink)
	p.text(point{p.u(50) + p.u(24), p.u(blockTop - 94)}, 0, 0, levelText(times)+" : 1 of the view above", normal, grey)

	field := p.paint(main)
	e := extentOf(p.part)
	p.quills(main, p.needles(main, peak, 0.5*(e.high-e.low)), p.u(mainQuill)/p.top, p.u(mainStep))
	p.annotate(main, p.part, left, right, false)
	p.magnified(main, close, "A")
	p.lines(main, field, 2)
	p.breaks(main, p.part, left, right)
	if p.part.Half {
		p.symmetry(main, 18)
	}
	p.load(main, p.part, p.finding.Load.Name, left, right)

	p.closeUp(close, peak)
}

// closeUp draws the magnified root in its circle.
func (p *plate) closeUp(v *view, peak r2.Vec) {
	b := v.bounds()
	x, y := b.middle()
	field := p.paint(v)
	needles := p.needles(v, peak, 1.5*b.width()/v.scale)
	p.within(v)
	p.quills(v, needles, p.u(closeQuill)/p.top, p.u(closeStep))
	p.dc.ResetClip()
	p.lines(v, field, 1)
	p.pen(ink, wide)
	p.dc.DrawCircle(x, y, b.width()/2)
	p.dc.Stroke()
	p.peak(v.at(peak))
}

// paint lays the field of a view on the sheet, with soft edges, and gives its
// values.
func (p *plate) paint(v *view) *raster {
	r := p.field.shade(v)
	soft := r.bled(2)
	mask := coverage(r.area, v.loops(p.part)...)
	multiply(mask, coverage(r.area, v.window))
	draw.DrawMask(p.im, r.area, soft.picture(p.top), r.area.Min, mask, r.area.Min, draw.Over)
	return r
}

// lines draws elements, contours and edges over the field of a view; most is
// the number of labels a level.
func (p *plate) lines(v *view, r *raster, most int) {
	cs := trace(r, p.shown(r))
	p.label(v, r, cs, most)
	p.within(v)
	if p.options.Mesh {
		p.elements(v, p.finding.Computed.Last.Problem.Shape)
	}
	p.contours(cs, p.top)
	p.edges(v, p.part, wide, ink)
	p.dc.ResetClip()
	p.letter(cs, p.top)
}

// shown gives the levels of the contours of a view: those of the legend, and a
// finer set where the view shows little but the lower end of the ramp.
func (p *plate) shown(r *raster) []float64 {
	const most, few = 0.98, 0.4
	if high := r.quantile(most, p.top); high < few*p.top {
		return levels(high, 6)
	}
	return p.levels
}

// needles gives the stress along the surface that the peak lies on, as far as
// reach (a length of the part) to both sides of the peak.
func (p *plate) needles(v *view, peak r2.Vec, reach float64) []needle {
	var on *surface
	at, gap := 0.0, math.Inf(1)
	for i := range p.surfaces {
		if a, g := p.surfaces[i].nearest(peak); g < gap {
			on, at, gap = &p.surfaces[i], a, g
		}
	}
	if on == nil {
		return nil
	}
	const spacing = 1.5 // units
	return on.needles(at, p.u(spacing)/v.scale, reach)
}

func multiply(a, b *image.Alpha) {
	for i, v := range b.Pix {
		a.Pix[i] = uint8(int(a.Pix[i]) * int(v) / 255)
	}
}
