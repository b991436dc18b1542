package render

import (
	"fmt"
	"math"
	"sort"
	"testing"

	"golang.org/x/image/math/fixed"
)

// family is a design chart of invented numbers: curves that end close together.
func family(n int, log bool) Plot {
	d := Diagram{X: Axis{Label: "r/d", Log: log}, Y: Axis{Label: "factor"}}
	for k := range n {
		c := Curve{Label: fmt.Sprintf("D/d = %.3g", 1.1+0.15*float64(k)), Marked: k%2 == 0, Band: k%3 == 0}
		for i := range 12 {
			x := 0.01 * math.Pow(30, float64(i)/11)
			c.Points = append(c.Points, CurvePoint{X: x, Y: 1 + (0.5+0.1*float64(k))*math.Pow(x, -0.3), Bar: 0.02 + 0.01*float64(k)})
		}
		d.Curves = append(d.Curves, c)
	}
	return Plot{Title: "stepped shaft in bending", Note: "factor on the net section", Diagrams: []Diagram{d}}
}

func mustChart(t *testing.T, p Plot) *Figure {
	t.Helper()
	f, err := Chart(p)
	if err != nil {
		t.Fatal(err)
	}
	return f
}

// Every curve has its label, however many there are and wherever they end.
func TestEveryCurveIsLabelled(t *testing.T) {
	short := family(4, true)
	for i := range short.Diagrams[0].Curves {
		c := &short.Diagrams[0].Curves[i]
		c.Points = c.Points[:4+2*i]
	}
	equal := family(6, false)
	for i := range equal.Diagrams[0].Curves {
		equal.Diagrams[0].Curves[i].Points = equal.Diagrams[0].Curves[0].Points
	}
	several := family(3, true)
	several.Diagrams = append(several.Diagrams, family(5, false).Diagrams[0], family(2, true).Diagrams[0])
	for name, p := range map[string]Plot{"one": family(1, true), "eight": family(8, true), "straight": family(8, false),
		"ends inside": short, "the same curve": equal, "three diagrams": several} {
		t.Run(name, func(t *testing.T) {
			f := mustChart(t, p)
			checkFigure(t, f)
			for _, mm := range []float64{210, 80} {
				s, _ := f.vector(FigureOptions{Millimetres: mm})
				for _, d := range p.Diagrams {
					for _, c := range d.Curves {
						if !letters(s, c.Label) {
							t.Errorf("at %g mm %q is missing", mm, c.Label)
						}
					}
				}
			}
		})
	}
}

func TestChartRefusesNonsense(t *testing.T) {
	curve := func(x, y float64) []Curve { return []Curve{{Points: []CurvePoint{{X: x, Y: y}}}} }
	nan := math.NaN()
	for name, d := range map[string]Diagram{
		"nothing":          {},
		"not a number":     {Curves: curve(1, nan)},
		"infinite":         {Curves: curve(math.Inf(1), 1)},
		"zero on a log":    {X: Axis{Log: true}, Curves: curve(0, 1)},
		"level":            {Curves: curve(1, 1), Levels: []Level{{Value: nan}}},
		"band upside down": {Curves: curve(1, 1), Levels: []Level{{Value: 1, Bar: -1}}},
	} {
		if _, err := Chart(Plot{Diagrams: []Diagram{d}}); err == nil {
			t.Errorf("%s was drawn", name)
		}
	}
	if _, err := Chart(Plot{}); err == nil {
		t.Error("no diagram at all was drawn")
	}
}

// On paper of 80 mm and more capitals are 1.6 mm high, measured on the letters
// themselves.
func TestLettersAreLegibleOnPaper(t *testing.T) {
	const least = 1.6 // mm
	face := small.face(1)
	bounds, _, ok := face.GlyphBounds('H')
	if !ok {
		t.Fatal("no H")
	}
	capital := float64(-bounds.Min.Y) / float64(fixed.I(1)) / small.Size
	for _, mm := range []float64{80, 160, 210} {
		o := FigureOptions{Millimetres: mm}
		s, _ := mustChart(t, family(5, true)).vector(o)
		for _, l := range s.texts {
			if height := capital * l.Type.Size * mm / s.paper.width(); height < least {
				t.Errorf("at %g mm %q is %.2f mm high", mm, l.Text, height)
			}
		}
	}
}

// Labels that are spread do not overlap, keep their order, stay in their room
// and stay put where nothing presses.
func TestSpread(t *testing.T) {
	for _, wishes := range [][]float64{{50}, {10, 100, 190}, {50, 50, 50}, {-20, 0, 3, 180, 400}, {199, 199.5, 200}, {0, 40, 41, 42, 90, 91}} {
		heights := make([]float64, len(wishes))
		for i := range heights {
			heights[i] = 20 + 5*float64(i%2)
		}
		const low, high = 0.0, 200.0
		got := spread(wishes, heights, low, high)
		free := true
		for i, y := range got {
			if y-heights[i]/2 < low-1e-9 || y+heights[i]/2 > high+1e-9 {
				t.Errorf("%v: %g leaves its room", wishes, y)
			}
			if i > 0 && y-heights[i]/2 < got[i-1]+heights[i-1]/2-1e-9 {
				t.Errorf("%v: %v overlap", wishes, got)
			}
			free = free && (i == 0 || wishes[i]-wishes[i-1] >= 25) && wishes[i] >= 12.5 && wishes[i] <= 187.5
		}
		if free && fmt.Sprint(got) != fmt.Sprint(wishes) {
			t.Errorf("%v moved to %v", wishes, got)
		}
		if !sort.Float64sAreSorted(got) {
			t.Errorf("%v: order %v", wishes, got)
		}
	}
}

// A curve is cut off on the straight line between its points.
func TestCutOff(t *testing.T) {
	ps := []CurvePoint{{X: 0, Y: 0}, {X: 1, Y: 2}, {X: 3, Y: 6}}
	if got := cutOff(ps, 2); len(got) != 3 || got[2].X != 2 || got[2].Y != 4 {
		t.Errorf("%v", got)
	}
	if got := cutOff(ps, 3); len(got) != 3 || ps[2].X != 3 {
		t.Errorf("%v of %v", got, ps)
	}
}
