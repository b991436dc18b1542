package render

import (
	"image"
	"image/color"
	"math"
)

// Inks. The one accent stands for what was measured at the surface; nothing
// hangs on its hue, it is as dark as ink when printed grey.
var (
	paper      = color.NRGBA{255, 255, 255, 255}
	ink        = color.NRGBA{22, 26, 34, 255}
	grey       = color.NRGBA{104, 110, 120, 255}
	pale       = color.NRGBA{198, 203, 210, 255}
	hatch      = color.NRGBA{232, 234, 238, 255} // material without stresses
	elementInk = color.NRGBA{20, 24, 32, 110}
	accent     = color.NRGBA{168, 32, 38, 255}
)

// Line widths in units: the wide one for edges of the part, the others for
// everything that explains it (the ratio 1 : 2 of wide and narrow lines is
// common practice on drawings).
const (
	wide     = 2.4
	narrow   = 1.2
	hairline = 0.7
)

// A sheet is the paper being drawn on, with a record of the places taken.
type sheet struct {
	*ruler
	dc    plotter
	im    *image.RGBA // what dc draws on; nil where that is not made of pixels
	paper box         // all of it
	frame box
	taken []box   // places that lettering keeps clear of
	texts []label // all lettering, in order
	// islands are pieces of paper on top of the part that carry dimensions.
	islands []box
}

// A label is a piece of lettering that stands on a sheet.
type label struct {
	Text string
	Type lettering
	Box  box
}

const (
	defaultWidth = 1600
	leastWidth   = 200
	frameMargin  = 26
)

// newSheet gives an empty sheet with its frame. Width is in pixels, 0 for the
// default; height is in units of the sheet.
func newSheet(width int, height float64) *sheet {
	if width == 0 {
		width = defaultWidth
	}
	width = max(width, leastWidth)
	return newSheetOf(width, defaultWidth, height)
}

// newSheetOf gives an empty sheet with its frame, of a width in pixels and of
// so many units across and up.
func newSheetOf(width int, across, up float64) *sheet {
	scale := float64(width) / across
	im := blank(width, int(math.Round(up*scale)))
	s := newSheetOn(newPixels(im), scale, sizeOf(im))
	s.im = im
	s.frame = s.paper.grown(-s.u(frameMargin))
	s.rectangle(s.frame, wide, ink)
	return s
}

// pen sets the colour and the width of strokes, in units.
func (s *sheet) pen(c color.Color, width float64) {
	s.dc.SetColor(c)
	s.dc.SetLineWidth(s.u(width))
	s.dc.SetDash()
}

// chain sets the long-dash short-dash pattern of centre lines.
func (s *sheet) chain() { s.dc.SetDash(s.u(26), s.u(5), s.u(4), s.u(5)) }

// dashed sets a plain dash pattern.
func (s *sheet) dashed() { s.dc.SetDash(s.u(7), s.u(5)) }

func (s *sheet) line(a, b point) {
	s.dc.DrawLine(a.X, a.Y, b.X, b.Y)
	s.dc.Stroke()
}

func (s *sheet) rectangle(b box, width float64, c color.Color) {
	s.pen(c, width)
	s.dc.DrawRectangle(b.X0, b.Y0, b.width(), b.height())
	s.dc.Stroke()
}

// polyline appends points to the current path, without corners that no eye sees:
// the rasteriser's strokes lose chords of a fraction of a pixel.
func (s *sheet) polyline(ps []point) {
	for i, p := range simplified(ps) {
		if i == 0 {
			s.dc.MoveTo(p.X, p.Y)
		} else {
			s.dc.LineTo(p.X, p.Y)
		}
	}
}

// arrow fills a slender arrowhead with its tip at p, pointing along dir (a unit
// vector).
func (s *sheet) arrow(p point, dir point, c color.Color) {
	length, half := s.u(15), s.u(3.1)
	base := p.toward(dir, -length)
	s.dc.SetColor(c)
	s.dc.MoveTo(p.X, p.Y)
	s.dc.LineTo(base.X-dir.Y*half, base.Y+dir.X*half)
	s.dc.LineTo(base.X+dir.Y*half, base.Y-dir.X*half)
	s.dc.ClosePath()
	s.dc.Fill()
}
