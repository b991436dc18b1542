package main

import (
	"fmt"
	"math"
	"strings"
	"unicode/utf8"

	"notchproof/render"
	"notchproof/render/number"
	"notchproof/verify/chart"
)

// plot lays the chart out: the best published fit as bands, then the curves.
func (s *chartQuestion) plot() render.Plot {
	q := s.table.Question
	d := render.Diagram{
		X: render.Axis{Label: q.Along.String(), Unit: strings.ReplaceAll(q.Along.Unit, "°", "degrees"), Log: q.Along.Log, Fine: true},
		Y: render.Axis{Label: q.Symbol() + ", on the net section", Fine: true},
	}
	book, drawn := s.book(), false
	for k := range s.table.Curves() {
		if book >= 0 {
			list := bands(s.table.Curve(k), book, s.table.Books[book].Accuracy)
			d.Curves, drawn = append(d.Curves, list...), drawn || len(list) > 0
		}
	}
	if !drawn {
		book = -1
	}
	for k := range s.table.Curves() {
		d.Curves = append(d.Curves, s.curve(k)...)
	}
	return render.Plot{Title: s.heading(), Note: s.plotNote(book), Diagrams: []render.Diagram{d}}
}

// book is the fit that covers most points, the better of equals; −1: none.
func (s *chartQuestion) book() int {
	best, most := -1, 0
	for b := range s.table.Books {
		count := 0
		for _, p := range s.table.Points {
			if !math.IsNaN(p.Handbook[b]) {
				count++
			}
		}
		if count > most {
			best, most = b, count
		}
	}
	return best
}

// bands are the stretches of a curve that a fit covers.
func bands(points []chart.Point, book int, accuracy float64) (list []render.Curve) {
	var run []render.CurvePoint
	for _, p := range points {
		v := p.Handbook[book]
		if math.IsNaN(v) {
			list, run = bandOf(list, run), nil
			continue
		}
		run = append(run, render.CurvePoint{X: p.X, Y: v, Bar: accuracy * v})
	}
	return bandOf(list, run)
}

func bandOf(list []render.Curve, run []render.CurvePoint) []render.Curve {
	if len(run) < 2 {
		return list
	}
	return append(list, render.Curve{Points: run, Line: render.NoLine, Band: true})
}

// curve draws a smooth line through the settled points of a curve, in pieces
// where points are missing, and the points themselves.
func (s *chartQuestion) curve(k int) (list []render.Curve) {
	q, points := s.table.Question, s.table.Curve(k)
	pieces := s.table.Smooth(k)
	for i, piece := range pieces {
		c := render.Curve{Line: render.Solid}
		for _, p := range piece {
			c.Points = append(c.Points, render.CurvePoint{X: p.X, Y: p.Factor})
		}
		if i == len(pieces)-1 && q.Curves != nil {
			c.Label = q.CurveName(points[0].Y)
		}
		list = append(list, c)
	}
	marks := render.Curve{Line: render.NoLine, Marked: true}
	for _, p := range points {
		if p.Status == chart.Settled {
			marks.Points = append(marks.Points, render.CurvePoint{X: p.X, Y: p.Factor, Bar: p.Uncertainty})
		}
	}
	return append(list, marks)
}

func (s *chartQuestion) heading() string {
	q := s.table.Question
	text := fmt.Sprintf("%s: %s, %s", q.Family.Name, q.Family.Title, q.Load)
	if s.title != "" {
		return oneLine(s.title) + ". " + text
	}
	return text
}

// plotNote says what the chart is of, and how good it is.
func (s *chartQuestion) plotNote(book int) string {
	q := s.table.Question
	words := append(s.conventions(), s.fixed()...)
	widest := 0.0
	for _, p := range s.table.Points {
		if p.Status == chart.Settled {
			widest = math.Max(widest, p.Uncertainty/p.Factor)
		}
	}
	words = append(words, fmt.Sprintf("%d points computed, each within ± %s", s.table.Count(chart.Settled), percentUp(widest)))
	if n := s.table.Count(chart.Undecided); n > 0 {
		words = append(words, fmt.Sprintf("%d undecided and left out", n))
	}
	note := "N" + strings.TrimPrefix(strings.Join(words, "; "), "n")
	if book >= 0 {
		b := s.table.Books[book]
		note += fmt.Sprintf(". Bands: %s ± %s, in its range", b.ID, number.Percent(b.Accuracy, 0))
	}
	if s.fit == nil {
		return note
	}
	formula := fmt.Sprintf(". Formula, within %s over the range of the points: %s", percentUp(s.fit.Error), strings.Join(q.Formula(s.fit), ", "))
	if utf8.RuneCountInString(note+formula) > s.room() {
		return note // half a formula is worse than none
	}
	return note + formula
}

// room is how many letters the note of a plot takes: six lines.
func (s *chartQuestion) room() int {
	const lines, letters, a4 = 6, 125, 210 // a line, on A4
	if s.paper.mm == 0 {
		return lines * letters
	}
	return int(lines * letters * s.paper.mm / a4)
}
