package render

import (
	"math"
	"testing"
)

// geometric is a ladder whose changes fall by a factor of ten.
func geometric() Study {
	s := Study{Title: "shaft-shoulder, bending", Note: "factor 1.9757 ± 0.0003", Limit: 1.9757, Uncertainty: 3e-4}
	for i, n := range []int{1200, 2600, 4600, 7100, 10200} {
		p := StudyPoint{Label: "order " + string(rune('3'+i)), Unknowns: n, Factor: 1.9757 + 0.02*math.Pow(-0.1, float64(i))}
		if i > 0 {
			p.Change = 0.022 * math.Pow(0.1, float64(i-1))
		}
		s.Points = append(s.Points, p)
	}
	return s
}

func TestStudyLayout(t *testing.T) {
	nan := math.NaN()
	studies := map[string]Study{
		"geometric": geometric(),
		"one rung":  {Title: "t", Note: "n", Points: []StudyPoint{{Label: "order 3", Unknowns: 100, Factor: 2}}, Limit: nan, Uncertainty: nan},
		"equal":     {Title: "t", Note: "n", Points: []StudyPoint{{Label: "a", Unknowns: 100, Factor: 2, Change: 0}, {Label: "b", Unknowns: 200, Factor: 2, Change: 0}}, Limit: 2, Uncertainty: 0},
		"no limit": {Title: "t", Note: "diverges", Points: []StudyPoint{{Label: "a", Unknowns: 100, Factor: 2, Change: 0}, {Label: "b", Unknowns: 200, Factor: 3, Change: 1}, {Label: "c", Unknowns: 500000, Factor: 9, Change: 6}},
			Limit: nan, Uncertainty: math.Inf(1)},
		"crowded": {Title: "t", Note: "n", Limit: 3, Uncertainty: 1e-12, Points: []StudyPoint{
			{Label: "order 3", Unknowns: 100, Factor: 3.1, Change: nan}, {Label: "order 4", Unknowns: 101, Factor: 3.0001, Change: 0.1}, {Label: "order 5", Unknowns: 102, Factor: 3.00000001, Change: 1e-4}, {Label: "order 6", Unknowns: 103, Factor: 3, Change: 1e-11}}},
	}
	for name, study := range studies {
		t.Run(name, func(t *testing.T) {
			f, err := StudyFigure(study)
			if err != nil {
				t.Fatal(err)
			}
			checkFigure(t, f)
		})
	}
}

func TestStudyRefusesNonsense(t *testing.T) {
	for _, study := range []Study{
		{},
		{Points: []StudyPoint{{Label: "a", Unknowns: 0, Factor: 2, Change: 0}}},
		{Points: []StudyPoint{{Label: "a", Unknowns: 10, Factor: math.NaN(), Change: 0}}},
		{Points: []StudyPoint{{Label: "a", Unknowns: 10, Factor: math.Inf(1), Change: 0}}},
	} {
		if _, err := StudyFigure(study); err == nil {
			t.Errorf("%v was plotted", study.Points)
		}
	}
}

// On logarithmic scales equal ratios are equal lengths, and the ends of an axis
// are where they were said to be.
func TestAxis(t *testing.T) {
	a := axis{low: 1e-3, high: 1e3, from: 100, to: 700, log: true}
	for i := range 7 {
		if got, want := a.at(math.Pow(10, float64(i-3))), 100+100*float64(i); math.Abs(got-want) > 1e-9 {
			t.Errorf("10^%d at %g instead of %g", i-3, got, want)
		}
	}
	for _, c := range []struct{ low, high float64 }{{1.9, 2.1}, {0, 1}, {1.97567, 1.97581}, {-5, 1234}, {1e-9, 3e-9}} {
		b := axis{low: c.low, high: c.high, from: 0, to: 1}
		marks := b.marks(6)
		if len(marks) < 3 || len(marks) > 9 {
			t.Errorf("%v: %d marks", c, len(marks))
		}
		texts := make(map[string]bool)
		for _, m := range marks {
			if texts[m.text] && c.high > 1e-6 {
				t.Errorf("%v: %s twice", c, m.text)
			}
			texts[m.text] = true
		}
	}
}
