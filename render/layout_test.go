package render

import (
	"strings"
	"testing"

	"gonum.org/v1/gonum/spatial/r2"
)

// checkLayout holds a sheet's lettering against the rules: all of it inside
// the frame, no two pieces on top of each other, nothing that the fonts cannot
// write.
func checkLayout(t *testing.T, s *sheet) {
	t.Helper()
	if len(s.texts) == 0 {
		t.Error("nothing is lettered")
	}
	for i, a := range s.texts {
		if a.Text == "" || !a.Type.drawable(a.Text) {
			t.Errorf("text %q cannot be written", a.Text)
		}
		if !s.frame.holds(a.Box) {
			t.Errorf("text %q at %.0f reaches over the frame %.0f", a.Text, a.Box, s.frame)
		}
		for _, b := range s.texts[:i] {
			if a.Box.grown(-0.5).meets(b.Box.grown(-0.5)) {
				t.Errorf("texts %q at %.0f and %q at %.0f overlap", a.Text, a.Box, b.Text, b.Box)
			}
		}
	}
}

// checkFigure holds a figure against the rules on wide and on narrow paper, as
// SVG and in pixels.
func checkFigure(t *testing.T, f *Figure) {
	t.Helper()
	for _, mm := range []float64{210, 160, 80} {
		o := FigureOptions{Millimetres: mm}
		s, _ := f.vector(o)
		checkLayout(t, s)
		checkSVG(t, f.SVG(o))
	}
	checkLayout(t, f.sheet(FigureOptions{Millimetres: 80, Pixels: 400}))
}

// letters tells whether a text stands on a figure, in one line or broken into
// several.
func letters(s *sheet, text string) bool {
	all := ""
	for _, l := range s.texts {
		all += l.Text + " "
	}
	return strings.Contains(all, legible(text))
}

func TestPictureLayout(t *testing.T) {
	for _, c := range proportions {
		t.Run(c.name, func(t *testing.T) {
			part := newPart(t, c.family, c.dims)
			s, err := picture(solved(t, part, c.load, 3), part, PictureOptions{Width: 800})
			if err != nil {
				t.Fatal(err)
			}
			checkLayout(t, s)
		})
	}
}

func TestSketchLayout(t *testing.T) {
	for _, c := range proportions {
		t.Run(c.name, func(t *testing.T) {
			checkFigure(t, SketchFigure(newPart(t, c.family, c.dims)))
		})
	}
}

// Every dimension that was given stands on the sketch, with its name.
func TestSketchShowsEveryDimension(t *testing.T) {
	for _, c := range proportions {
		part := newPart(t, c.family, c.dims)
		s := SketchFigure(part).sheet(FigureOptions{Pixels: 800})
		want := 0
		for _, p := range placementsOf(part) {
			if p.Skip != nil && p.Skip(part.Dims) {
				continue
			}
			want++
			text, found := p.Dim+": "+lettered(p, part, r2.Vec{}, r2.Vec{}), false
			for _, l := range s.texts {
				found = found || l.Text == legible(text)
			}
			if !found {
				t.Errorf("%s: %q is not on the sketch", c.name, text)
			}
		}
		if want < 2 { // a hole has no more
			t.Errorf("%s: only %d dimensions", c.name, want)
		}
	}
}

// Text that is too long is cut, not run over.
func TestFit(t *testing.T) {
	s := newSheet(800, 400)
	long := "a remark that goes on and on and on and on and on and on and on"
	for _, width := range []float64{40, 120, 300} {
		if got := s.fit(long, normal, width); s.measure(got, normal) > width || got == "" {
			t.Errorf("fit to %g gave %q, %.1f wide", width, got, s.measure(got, normal))
		}
		for _, line := range s.wrap(long, normal, width, 3) {
			if s.measure(line, normal) > width {
				t.Errorf("wrap to %g gave %q, %.1f wide", width, line, s.measure(line, normal))
			}
		}
	}
}
