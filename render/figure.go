package render

import (
	"image"
	"math"
)

// A Figure is a drawing made of lines and letters, a plot or a sketch, that can
// be put on paper of any width, in pixels or as SVG. Letters have the same
// height in millimetres whatever the width: the layout follows the paper.
type Figure struct {
	title       string
	description string
	height      func(wide float64) float64 // of the sheet, in units
	draw        func(s *sheet)
}

// FigureOptions say what a figure is drawn on. The zero value is the default.
type FigureOptions struct {
	// Millimetres is the width on paper; 0: 210. Widths below 60 are drawn like
	// 60 and made smaller, letters and all.
	Millimetres float64
	// Pixels is the width of an image; 0: 1600.
	Pixels int
	// Prefix begins all ids of an SVG, to keep those of several in one HTML page
	// apart: letters, digits and hyphens.
	Prefix string
}

// A unit is 1/1600 of A4's narrow side, so that the smallest lettering of 17
// units has capitals of 1.6 mm.
const (
	millimetre        = defaultWidth / 210.0 // in units
	leastMillimetres  = 60
	normalMillimetres = 210
)

// units gives the width of the sheet in units.
func (o FigureOptions) units() float64 {
	if o.Millimetres == 0 {
		return defaultWidth
	}
	return math.Round(math.Max(o.Millimetres, leastMillimetres) * millimetre)
}

// Image draws the figure in pixels.
func (f *Figure) Image(o FigureOptions) image.Image { return f.sheet(o).im }

func (f *Figure) sheet(o FigureOptions) *sheet {
	width := o.Pixels
	if width == 0 {
		width = defaultWidth
	}
	width = max(width, leastWidth)
	wide := o.units()
	scale := float64(width) / wide
	im := blank(width, int(math.Round(f.height(wide)*scale)))
	s := newSheetOn(newPixels(im), scale, sizeOf(im))
	s.im = im
	f.drawOn(s)
	return s
}

// SVG draws the figure as one svg element, without XML declaration, so that it
// can be a file of its own or stand inline in an HTML page. Its width and height
// are in millimetres; style sheets may overrule them, the viewBox keeps the
// proportions. It has a title and a desc element for those who cannot see it,
// which aria-labelledby names; all its ids begin with the prefix of the options.
// The bytes are the same for the same figure and options.
func (f *Figure) SVG(o FigureOptions) []byte {
	s, v := f.vector(o)
	mm := o.Millimetres
	if mm == 0 {
		mm = normalMillimetres
	}
	return v.document(s.paper, mm, f.title, f.description)
}

func (f *Figure) vector(o FigureOptions) (*sheet, *svg) {
	wide := o.units()
	v := &svg{prefix: o.Prefix}
	s := newSheetOn(v, 1, point{wide, math.Round(f.height(wide))})
	s.dc.SetColor(paper)
	s.dc.DrawRectangle(0, 0, s.paper.X1, s.paper.Y1)
	s.dc.Fill()
	f.drawOn(s)
	return s, v
}

// figureMargin is where a figure's frame stands, in units.
const figureMargin = 8

func (f *Figure) drawOn(s *sheet) {
	s.frame = s.paper.grown(-s.u(figureMargin))
	s.rectangle(s.frame, narrow, ink)
	f.draw(s)
}

// blank is empty paper: white, all bytes are alike.
func blank(width, height int) *image.RGBA {
	im := image.NewRGBA(image.Rect(0, 0, width, height))
	im.Pix[0] = 255
	for n := 1; n < len(im.Pix); n *= 2 {
		copy(im.Pix[n:], im.Pix[:n])
	}
	return im
}

func newSheetOn(dc plotter, scale float64, size point) *sheet {
	return &sheet{ruler: rulerOf(scale), dc: dc, paper: box{0, 0, size.X, size.Y}}
}

func sizeOf(im image.Image) point {
	return point{float64(im.Bounds().Dx()), float64(im.Bounds().Dy())}
}
