package render

import (
	"image"
	"image/color"
	"math"

	"github.com/fogleman/gg"
	"golang.org/x/image/font"
	"golang.org/x/image/math/fixed"
)

// A plotter is what a sheet is drawn on. There are two kinds: pixels, and SVG
// for line work. Paths, pens and their order mean on both what they mean in gg:
// Fill and Stroke use up the path, FillPreserve keeps it, caps and joins of
// lines are round, a clip stays until it is reset.
type plotter interface {
	SetColor(c color.Color)
	SetLineWidth(width float64)
	SetDash(pattern ...float64)

	MoveTo(x, y float64)
	LineTo(x, y float64)
	ClosePath()
	DrawLine(x0, y0, x1, y1 float64)
	DrawRectangle(x, y, width, height float64)
	DrawCircle(x, y, radius float64)

	Fill()
	FillPreserve()
	Stroke()
	Clip()
	ResetClip()

	// letter writes a line of text in the colour that is set, its baseline
	// beginning at p. The face is that of the lettering at the sheet's scale,
	// and width what the text measures in it.
	letter(text string, p point, width float64, l lettering, face font.Face)
}

// pixels is the plotter of pictures.
type pixels struct {
	*gg.Context
	im      *image.RGBA
	ink     *image.Uniform
	clipped bool
}

func newPixels(im *image.RGBA) *pixels {
	return &pixels{Context: gg.NewContextForRGBA(im), im: im, ink: image.Black}
}

func (c *pixels) SetColor(k color.Color) {
	c.Context.SetColor(k)
	c.ink = image.NewUniform(k)
}

func (c *pixels) Clip() {
	c.Context.Clip()
	c.clipped = true
}

func (c *pixels) ResetClip() {
	c.Context.ResetClip()
	c.clipped = false
}

// letter draws glyphs straight, to a quarter of a pixel; gg turns and scales
// each of them, which takes five times as long.
func (c *pixels) letter(text string, p point, _ float64, _ lettering, face font.Face) {
	if c.clipped {
		c.SetFontFace(face)
		c.DrawString(text, p.X, p.Y)
		return
	}
	d := font.Drawer{Dst: c.im, Src: c.ink, Face: face, Dot: fixed.Point26_6{X: fixed.Int26_6(math.Round(p.X * 64)), Y: fixed.Int26_6(math.Round(p.Y * 64))}}
	d.DrawString(text)
}
