package render

import (
	"math"
	"strings"
	"unicode/utf8"

	"gonum.org/v1/gonum/spatial/r2"

	"notchproof/verify/specimen"
)

// The size of a sketch in text: columns, and half rows, of which two fit into
// one character, so that a half row is about as high as a column is wide.
const (
	textColumns  = 64
	textHalfRows = 36
)

// SketchText draws a part with its dimensions in characters, the material in
// blocks. Sizes across the part stand beside it, what cannot be shown so coarsely
// below it.
func SketchText(part *specimen.Part) string {
	v, left, right := mainView(part, box{0, 0, textColumns, textHalfRows}, 0.01)
	g := geometry{part.Dims, part, left, right, extentOf(part)}
	c := newCanvas()
	c.material(v, part, left, right)
	var below []string
	for _, p := range placementsOf(part) {
		if p.Skip != nil && p.Skip(part.Dims) {
			continue
		}
		a, b := p.At(g)
		text := lettered(p, part, a, b)
		if p.Dim != "" {
			text = p.Dim + ": " + text
		}
		from, to := int(v.at(a).Y/2), int((v.at(b).Y-0.5)/2)
		switch p.Kind {
		case acrossLeft:
			c.left.mark(from, to, text)
		case acrossRight:
			c.right.mark(from, to, text)
		default:
			below = append(below, text)
		}
	}
	text := c.String()
	if len(below) > 0 {
		text += strings.Repeat(" ", c.left.width()+2) + strings.Join(below, "   ") + "\n"
	}
	return text
}

// A canvas is the characters of the part with a margin on either side.
type canvas struct {
	cells       [textHalfRows / 2][textColumns]rune
	left, right margin
}

func newCanvas() *canvas {
	c := &canvas{}
	for i := range c.cells {
		for j := range c.cells[i] {
			c.cells[i][j] = ' '
		}
	}
	return c
}

// material fills in what lies inside the region between the broken ends.
func (c *canvas) material(v *view, part *specimen.Part, left, right float64) {
	inside := func(column, half int) bool {
		p := v.model(point{float64(column) + 0.5, float64(half) + 0.5})
		if part.Half {
			p.Y = math.Abs(p.Y)
		}
		return p.X >= left && p.X <= right && part.Region.Contains(r2.Vec{X: p.X, Y: p.Y})
	}
	for i := range c.cells {
		for j := range c.cells[i] {
			switch top, bottom := inside(j, 2*i), inside(j, 2*i+1); {
			case top && bottom:
				c.cells[i][j] = '█'
			case top:
				c.cells[i][j] = '▀'
			case bottom:
				c.cells[i][j] = '▄'
			}
		}
	}
}

// A margin holds one dimension line with its lettering.
type margin struct {
	lines [textHalfRows / 2]rune
	row   int
	text  string
}

// mark draws a dimension line over rows with its lettering in the middle.
func (m *margin) mark(from, to int, text string) {
	from, to = max(0, min(from, to)), min(len(m.lines)-1, max(from, to))
	for i := from; i <= to; i++ {
		m.lines[i] = '│'
	}
	m.lines[from], m.lines[to] = '┬', '┴'
	m.row, m.text = (from+to)/2, text
}

func (m *margin) width() int { return utf8.RuneCountInString(m.text) }

// at is the line and the lettering of one row.
func (m *margin) at(row int) (line, text string) {
	line = " "
	if m.lines[row] != 0 {
		line = string(m.lines[row])
	}
	if row == m.row {
		text = m.text
	}
	return line, text
}

func (c *canvas) String() string {
	var b strings.Builder
	for i := range c.cells {
		line, text := c.left.at(i)
		row := text + strings.Repeat(" ", c.left.width()-utf8.RuneCountInString(text)) + line + " " + string(c.cells[i][:])
		line, text = c.right.at(i)
		row += " " + line + text
		b.WriteString(strings.TrimRight(row, " ") + "\n")
	}
	return b.String()
}
