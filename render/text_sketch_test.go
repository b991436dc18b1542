package render

import (
	"strings"
	"testing"
	"unicode/utf8"
)

// TestSketchText: every dimension stands on the sketch, no line is longer than a
// terminal is wide, half models come out whole, and the material takes about the
// share of the sketch that the part takes of its window.
func TestSketchText(t *testing.T) {
	for _, c := range proportions {
		part := newPart(t, c.family, c.dims)
		text := SketchText(part)
		for _, p := range placementsOf(part) {
			if p.Skip != nil && p.Skip(part.Dims) {
				continue
			}
			if !strings.Contains(text, p.Dim+": ") {
				t.Errorf("%s: %s is not on the sketch\n%s", c.name, p.Dim, text)
			}
		}
		var upper, lower int
		lines := strings.Split(text, "\n")
		for i, line := range lines {
			if n := utf8.RuneCountInString(line); n > 100 {
				t.Errorf("%s: a line of %d characters", c.name, n)
			}
			cells := 2*strings.Count(line, "█") + strings.Count(line, "▀") + strings.Count(line, "▄")
			if i < textHalfRows/4 {
				upper += cells
			} else {
				lower += cells
			}
		}
		if part.Half && upper != lower {
			t.Errorf("%s: %d half cells above the axis, %d below\n%s", c.name, upper, lower, text)
		}
		if upper+lower < textColumns*textHalfRows/8 {
			t.Errorf("%s: hardly any material\n%s", c.name, text)
		}
	}
}
