package render

import (
	"bytes"
	"encoding/xml"
	"fmt"
	"image/color"
	"strconv"

	"golang.org/x/image/font"
)

// svg is the plotter that writes SVG 1.1 (W3C Recommendation, 2nd ed. 2011).
// Coordinates are units of the sheet. Text is text: it stands in the
// sheet's own type where that is installed, and in another drawn to the same
// width (textLength) where it is not, so that what does not overlap here
// overlaps nowhere.
type svg struct {
	body bytes.Buffer
	path tracing

	color color.NRGBA
	width float64
	dash  string
	under *color.NRGBA // fill of the path that a stroke still follows on

	pen    string // attributes of the strokes that wait in lines
	lines  []byte // path data of strokes with one pen: one element for all of them
	prefix string
	clips  int // made so far
	open   int // groups that a clip has opened
}

func (v *svg) SetColor(c color.Color)     { v.color = color.NRGBAModel.Convert(c).(color.NRGBA) }
func (v *svg) SetLineWidth(width float64) { v.width = width }

func (v *svg) SetDash(pattern ...float64) {
	v.dash = ""
	for i, d := range pattern {
		if i > 0 {
			v.dash += " "
		}
		v.dash += short(d)
	}
}

func (v *svg) MoveTo(x, y float64) { v.path.move(point{x, y}) }
func (v *svg) LineTo(x, y float64) { v.path.line(point{x, y}) }
func (v *svg) ClosePath()          { v.path.close() }

func (v *svg) DrawLine(x0, y0, x1, y1 float64) {
	v.MoveTo(x0, y0)
	v.LineTo(x1, y1)
}

func (v *svg) DrawRectangle(x, y, width, height float64) {
	v.MoveTo(x, y)
	v.LineTo(x+width, y)
	v.LineTo(x+width, y+height)
	v.LineTo(x, y+height)
	v.ClosePath()
}

func (v *svg) DrawCircle(x, y, radius float64) { v.path.circle(point{x, y}, radius) }

func (v *svg) Fill() {
	v.flush()
	if d := v.path.take(); len(d) > 0 {
		fmt.Fprintf(&v.body, "<path d=\"%s\"%s/>\n", d, paint("fill", v.color))
	}
}

func (v *svg) FillPreserve() {
	under := v.color
	v.under = &under
}

// Stroke draws the path. Runs of strokes with one opaque pen become one path.
func (v *svg) Stroke() {
	d := v.path.take()
	if len(d) == 0 {
		v.under = nil
		return
	}
	pen := paint("stroke", v.color) + " stroke-width=\"" + short(v.width) + "\""
	if v.dash != "" {
		pen += " stroke-dasharray=\"" + v.dash + "\""
	}
	if v.under != nil || v.color.A < 255 {
		v.flush()
		if v.under != nil {
			pen = paint("fill", *v.under) + pen
			v.under = nil
		}
		fmt.Fprintf(&v.body, "<path d=\"%s\"%s/>\n", d, pen)
		return
	}
	if pen != v.pen {
		v.flush()
		v.pen = pen
	}
	v.lines = append(v.lines, d...)
}

// flush writes the strokes that wait.
func (v *svg) flush() {
	if len(v.lines) > 0 {
		fmt.Fprintf(&v.body, "<path d=\"%s\"%s/>\n", v.lines, v.pen)
	}
	v.lines, v.pen = v.lines[:0], ""
}

func (v *svg) Clip() {
	v.flush()
	v.clips++
	v.open++
	id := v.prefix + "clip" + strconv.Itoa(v.clips)
	fmt.Fprintf(&v.body, "<clipPath id=\"%s\"><path d=\"%s\"/></clipPath>\n<g clip-path=\"url(#%s)\">\n", id, v.path.take(), id)
}

func (v *svg) ResetClip() {
	v.flush()
	for ; v.open > 0; v.open-- {
		v.body.WriteString("</g>\n")
	}
}

func (v *svg) letter(text string, p point, width float64, l lettering, _ font.Face) {
	v.flush()
	fmt.Fprintf(&v.body, "<text x=\"%s\" y=\"%s\" font-size=\"%s\"", short(p.X), short(p.Y), short(l.Size))
	if l.Bold {
		v.body.WriteString(" font-weight=\"bold\"")
	}
	if len([]rune(text)) > 1 {
		fmt.Fprintf(&v.body, " textLength=\"%s\" lengthAdjust=\"spacingAndGlyphs\"", short(width))
	}
	v.body.WriteString(paint("fill", v.color) + ">" + escaped(text) + "</text>\n")
}

// document is the drawing as one svg element, of a size on paper in
// millimetres.
func (v *svg) document(size box, millimetres float64, title, description string) []byte {
	v.ResetClip()
	var b bytes.Buffer
	w, h := size.width(), size.height()
	fmt.Fprintf(&b, "<svg xmlns=\"http://www.w3.org/2000/svg\" width=\"%smm\" height=\"%smm\" viewBox=\"0 0 %s %s\"",
		short(millimetres), short(millimetres*h/w), short(w), short(h))
	fmt.Fprintf(&b, " role=\"img\" aria-labelledby=\"%stitle %sdesc\" font-family=\"%s\"", v.prefix, v.prefix, families)
	b.WriteString(" fill=\"none\" stroke-linecap=\"round\" stroke-linejoin=\"round\">\n")
	fmt.Fprintf(&b, "<title id=\"%stitle\">%s</title>\n<desc id=\"%sdesc\">%s</desc>\n", v.prefix, escaped(title), v.prefix, escaped(description))
	b.Write(v.body.Bytes())
	b.WriteString("</svg>\n")
	return b.Bytes()
}

// families of type: the sheet's own, then what looks most like it.
const families = "Go, 'Lucida Grande', 'DejaVu Sans', Verdana, Arial, sans-serif"

// paint writes a colour as an attribute, with its opacity where it has one.
func paint(attribute string, c color.NRGBA) string {
	s := fmt.Sprintf(" %s=\"#%02x%02x%02x\"", attribute, c.R, c.G, c.B)
	if c.A < 255 {
		s += fmt.Sprintf(" %s-opacity=\"%s\"", attribute, short(float64(c.A)/255))
	}
	return s
}

// short writes a number to a hundredth: of a unit, no eye sees less.
func short(x float64) string {
	return strconv.FormatFloat(hundredth(x), 'f', -1, 64)
}

func escaped(text string) string {
	var b bytes.Buffer
	if err := xml.EscapeText(&b, []byte(text)); err != nil {
		panic("render: a buffer that does not take bytes")
	}
	return b.String()
}
