package render

import (
	"fmt"
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

// papers are the widths that pictures are laid out for: the default, a column of
// a page, and 80 mm, at a resolution that keeps the test short.
var papers = []PictureOptions{
	{Width: 800, DPI: 95}, {Width: 800, DPI: 95, Whole: true, Mesh: true},
	{Width: 630, DPI: 100}, {Width: 315, DPI: 100},
}

func TestPictureLayout(t *testing.T) {
	for _, c := range append(proportions, extremes...) {
		part := newPart(t, c.family, c.dims)
		f := solved(t, part, c.load, 3)
		for _, o := range papers {
			t.Run(fmt.Sprintf("%s on %d", c.name, o.Width), func(t *testing.T) {
				s, err := picture(f, part, o)
				if err != nil {
					t.Fatal(err)
				}
				checkLayout(t, s)
				checkReadable(t, s, o)
			})
		}
	}
}

// checkReadable holds the height of capitals on paper against the 1.6 mm below
// which lettering is not reproduced well (ISO 3098 begins at 1.8 mm).
func checkReadable(t *testing.T, s *sheet, o PictureOptions) {
	t.Helper()
	for _, l := range s.texts {
		face := s.face(l.Type)
		bounds, _, ok := face.GlyphBounds('H')
		if !ok {
			t.Fatal("no H")
		}
		high := float64(bounds.Max.Y-bounds.Min.Y) / 64 / o.dpi() * millimetresPerInch
		if high < 1.55 {
			t.Errorf("%q has capitals of %.2f mm on %.0f mm", l.Text, high, float64(o.Width)/o.dpi()*millimetresPerInch)
			return
		}
	}
}

// The part fills its room, whatever its proportions: in one direction all of it,
// and in the other a third where the part is not much longer than high.
func TestPartFillsTheSheet(t *testing.T) {
	for _, c := range append(proportions, extremes...) {
		part := newPart(t, c.family, c.dims)
		for _, wide := range []float64{1600, 1200, 610} {
			for _, whole := range []bool{false, true} {
				room := partRoom(wide)
				v, _, _ := partView(part, room, whole, 1)
				b := v.bounds()
				if b.width() < 0.6*room.width() && b.height() < 0.95*room.height() {
					t.Errorf("%s on %g: %.0f × %.0f of %.0f × %.0f", c.name, wide, b.width(), b.height(), room.width(), room.height())
				}
				if b.width() > room.width()+2*breakSwing+1 || b.height() > room.height()+2*viewSpare+1 {
					t.Errorf("%s on %g: %.0f × %.0f leaves its room", c.name, wide, b.width(), b.height())
				}
			}
		}
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
