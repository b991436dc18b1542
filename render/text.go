package render

import (
	"image/color"
	"strings"

	"golang.org/x/image/font"
)

// baseline is where letters stand in a line of text, as a fraction of its
// height from the top; what is below holds the descenders.
const baseline = 0.77

// A ruler measures lettering at a scale.
type ruler struct {
	scale float64 // pixels per unit
	faces map[lettering]font.Face
}

func rulerOf(scale float64) *ruler {
	return &ruler{scale, make(map[lettering]font.Face)}
}

// u gives units in pixels.
func (s *ruler) u(units float64) float64 { return units * s.scale }

// face gives the glyphs of a lettering at the ruler's scale.
func (s *ruler) face(l lettering) font.Face {
	f, ok := s.faces[l]
	if !ok {
		f = l.face(s.scale)
		s.faces[l] = f
	}
	return f
}

// legible replaces what the fonts have no shape for: a narrow space stands as
// an ordinary one.
func legible(text string) string { return strings.ReplaceAll(text, "\u202f", "\u00a0") }

// measure gives the width of a line of text in pixels.
func (s *ruler) measure(text string, l lettering) float64 {
	return float64(font.MeasureString(s.face(l), legible(text))) / 64
}

// place gives the box of a line of text: (ax, ay) is the point of the box,
// from 0, 0 (top left) to 1, 1 (bottom right), that comes to lie at p.
func (s *ruler) place(p point, ax, ay float64, text string, l lettering) box {
	w, h := s.measure(text, l), s.u(l.Size)
	x, y := p.X-ax*w, p.Y-ay*h
	return box{x, y, x + w, y + h}
}

// text letters a line and takes its place.
func (s *sheet) text(p point, ax, ay float64, text string, l lettering, c color.Color) box {
	text = legible(text)
	b := s.place(p, ax, ay, text, l)
	s.dc.SetColor(c)
	s.dc.letter(text, point{b.X0, b.Y0 + baseline*b.height()}, b.width(), l, s.face(l))
	s.texts = append(s.texts, label{text, l, b})
	s.take(b)
	return b
}

// take keeps later lettering away from a place.
func (s *sheet) take(b box) { s.taken = append(s.taken, b) }

// takeLine keeps later lettering away from a line.
func (s *sheet) takeLine(a, b point) {
	n := int(distance(a, b)/s.u(8)) + 1
	for i := range n + 1 {
		p := between(a, b, float64(i)/float64(n))
		s.take(box{p.X, p.Y, p.X, p.Y}.grown(s.u(3)))
	}
}

// open tells whether a line crosses nothing taken.
func (s *sheet) open(a, b point) bool {
	n := int(distance(a, b)/s.u(4)) + 1
	for i := range n + 1 {
		p := between(a, b, float64(i)/float64(n))
		for _, t := range s.taken {
			if t.has(p) {
				return false
			}
		}
	}
	return true
}

// free tells whether a place is inside the frame and touches nothing taken.
func (s *sheet) free(b box) bool {
	if !s.frame.holds(b) {
		return false
	}
	for _, t := range s.taken {
		if t.meets(b) {
			return false
		}
	}
	return true
}

// fit cuts a text to a width in pixels, with an ellipsis where something is
// left out.
func (s *ruler) fit(text string, l lettering, width float64) string {
	if s.measure(text, l) <= width {
		return text
	}
	runes := []rune(text)
	for n := len(runes) - 1; n > 0; n-- {
		cut := strings.TrimRight(string(runes[:n]), " ,;:") + "…"
		if s.measure(cut, l) <= width {
			return cut
		}
	}
	return ""
}

// wordsOf parts a text where lines may break: at plain spaces, not at those that
// keep a number and its unit or its uncertainty together.
func wordsOf(text string) []string {
	return strings.FieldsFunc(text, func(r rune) bool { return r == ' ' })
}

// wrap breaks a text at spaces into at most n lines of a width in pixels; what
// does not fit is left out, which an ellipsis shows.
func (s *ruler) wrap(text string, l lettering, width float64, n int) []string {
	words := wordsOf(text)
	var lines []string
	for len(words) > 0 && len(lines) < n {
		take := 1
		for take < len(words) && s.measure(strings.Join(words[:take+1], " "), l) <= width {
			take++
		}
		if len(lines) == n-1 {
			take = len(words)
		}
		lines = append(lines, s.fit(strings.Join(words[:take], " "), l, width))
		words = words[take:]
	}
	return lines
}
