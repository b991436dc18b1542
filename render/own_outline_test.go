package render

import (
	"testing"

	"notchproof/mesh/outline"
	"notchproof/scf"
	"notchproof/verify/specimen"
)

// Parts that belong to no family are drawn too: a hollow stepped shaft and a
// whole bar with a hole, both with the sizes of their ends.
func TestOwnOutlines(t *testing.T) {
	for _, c := range []struct {
		name, path string
		kind       scf.Kind
		load       scf.Load
		sizes      []string
	}{
		{"hollow shaft", "M -90 6 L 80 6 L 80 12 L 3 12 A 3 3 0 0 0 0 15 L 0 20 L -90 20 Z", scf.Shaft, scf.Torsion, []string{"Ø40", "Ø24", "Ø12", "R3"}},
		{"bar with a hole", "M -90 -15 L 90 -15 L 90 15 L -90 15 Z M 5 2 A 5 5 0 0 0 -5 2 A 5 5 0 0 0 5 2 Z", scf.Bar, scf.Tension, []string{"30", "30", "Ø10"}},
	} {
		t.Run(c.name, func(t *testing.T) {
			loops, err := outline.ParsePath(c.path)
			if err != nil {
				t.Fatal(err)
			}
			part, err := (&specimen.Drawing{Kind: c.kind, Unit: "mm", Loops: loops, Options: scf.Options{Nu: 0.3}}).Part()
			if err != nil {
				t.Fatal(err)
			}
			s, err := picture(solved(t, part, c.load, 3), part, PictureOptions{Width: 800, Mesh: true})
			if err != nil {
				t.Fatal(err)
			}
			checkLayout(t, s)
			checkLayout(t, SketchFigure(part).sheet(FigureOptions{Pixels: 800}))
			for _, want := range c.sizes {
				found := false
				for _, l := range s.texts {
					found = found || l.Text == want
				}
				if !found {
					t.Errorf("%s is not on the sheet", want)
				}
			}
		})
	}
}
