package render

import (
	"testing"

	"notchproof/render/number"
	"notchproof/scf"
	"notchproof/verify"
	"notchproof/verify/extrapolate"
	"notchproof/verify/specimen"
)

// A finder draws a figure of a finding.
type finder = func(*verify.Finding, *specimen.Part) (*Figure, error)

func TestProfileLayout(t *testing.T) {
	for _, c := range proportions {
		t.Run(c.name, func(t *testing.T) {
			part := newPart(t, c.family, c.dims)
			f := solved(t, part, c.load, 3)
			f.Computed.Factor.Value = f.Computed.Peak.Factor
			for _, draw := range []finder{SectionFigure, SurfaceFigure, LadderFigure} {
				figure, err := draw(f, part)
				if err != nil {
					t.Fatal(err)
				}
				for _, mm := range []float64{210, 80} {
					s, _ := figure.vector(FigureOptions{Millimetres: mm})
					checkLayout(t, s)
					if e := f.Computed.Factor; !letters(s, number.Uncertain(e.Value, e.Uncertainty)) {
						t.Errorf("%s: the factor is missing", figure.title)
					}
				}
			}
		})
	}
}

// On a ladder of factors stands everything that the finding compares.
func TestLadderShowsEveryFactor(t *testing.T) {
	part := newPart(t, "shaft-shoulder", scf.Dims{"D": 72, "d": 48, "r": 3})
	f := solved(t, part, scf.Bending, 3)
	f.Computed.Ladder = append(f.Computed.Ladder, verify.Rung{Order: 4, Unknowns: 999, Factor: 25, Around: 3}) // beyond the scale
	figure, err := LadderFigure(f, part)
	if err != nil {
		t.Fatal(err)
	}
	checkFigure(t, figure)
	want := []string{number.Uncertain(1.8741, 0.0004), "order 3, 12\u202f345\u00a0unknowns", "order 4, 999\u00a0unknowns", "claim, sheet 12", "1.600  −14.6\u00a0%  disagrees"}
	for _, h := range f.Handbook {
		want = append(want, h.Value.ID)
	}
	if len(want) < 7 {
		t.Fatalf("only %d handbook factors", len(f.Handbook))
	}
	f.Claim.Claim.From = "sheet 12"
	if figure, err = LadderFigure(f, part); err != nil {
		t.Fatal(err)
	}
	for _, pixels := range []int{480, 1100, 1600, 1601, 3000} { // type is measured at one scale and set at another
		s := figure.sheet(FigureOptions{Millimetres: 213.89, Pixels: pixels})
		for _, text := range want {
			if !letters(s, text) {
				t.Errorf("%q is missing at %d pixels", text, pixels)
			}
		}
	}
}

// Without an answer there is nothing to plot, and no band to pretend one.
func TestNoPlotWithoutAnAnswer(t *testing.T) {
	part := newPart(t, "bar-hole", scf.Dims{"W": 60, "d": 20})
	f := solved(t, part, scf.Tension, 2)
	f.Computed.Factor.Status = extrapolate.Diverging
	if _, err := LadderFigure(f, part); err == nil {
		t.Error("a ladder without an answer was drawn")
	}
	f.Computed.Last = nil
	for _, draw := range []finder{SectionFigure, SurfaceFigure} {
		if _, err := draw(f, part); err == nil {
			t.Error("a profile without a solution was drawn")
		}
	}
}

func TestGoldenProfiles(t *testing.T) {
	part := newPart(t, "bar-notch", scf.Dims{"D": 60, "d": 40, "r": 2})
	f := solved(t, part, scf.Bending, 5)
	f.Computed.Factor.Value = f.Computed.Peak.Factor
	for name, draw := range map[string]finder{"section": SectionFigure, "surface": SurfaceFigure, "ladder": LadderFigure} {
		figure, err := draw(f, part)
		if err != nil {
			t.Fatal(err)
		}
		golden(t, name, figure.Image(FigureOptions{Millimetres: 80, Pixels: 500}))
	}
	golden(t, "chart", mustChart(t, family(5, true)).Image(FigureOptions{Pixels: 640}))
}
