package render

import (
	"image/color"

	"github.com/fogleman/gg"
	"golang.org/x/image/font"
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
type pixels struct{ *gg.Context }

func (c pixels) letter(text string, p point, _ float64, _ lettering, face font.Face) {
	c.SetFontFace(face)
	c.DrawString(text, p.X, p.Y)
}
