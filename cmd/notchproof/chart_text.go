package main

import (
	"fmt"
	"io"
	"math"
	"slices"
	"strings"

	"notchproof/render/number"
	"notchproof/verify/chart"
)

// conventions say what the factors are referred to, where that changes over the
// chart with the point from which on each holds, and their notes.
func (s *chartQuestion) conventions() (words []string) {
	for k, c := range s.table.Conventions() {
		text := fmt.Sprintf("nominal stress %s (%s)", c.Formula, c.Section)
		if k > 0 {
			text = "from " + s.table.Question.Place(c.X, c.Y) + " on " + text
		}
		words = append(words, text)
		for _, note := range c.Notes {
			if !slices.Contains(words, note) {
				words = append(words, note)
			}
		}
	}
	return words
}

// fixed says what is the same all over the chart.
func (s *chartQuestion) fixed() (words []string) {
	q := s.table.Question
	for _, g := range q.Given {
		unit := ""
		if g.Over == "" {
			unit = unitOf(q.Family, g.Name, q.Unit)
		}
		if unit == "°" {
			words = append(words, g.String()+" = "+number.Compact(g.Value, 6)+unit)
		} else {
			words = append(words, g.String()+" = "+number.Length(g.Value, unit))
		}
	}
	return append(words, "ν = "+number.Compact(q.Options.Nu, 4))
}

func (s *chartQuestion) writeText(w io.Writer, st style) error {
	var b strings.Builder
	q := s.table.Question
	if s.title != "" {
		fmt.Fprintf(&b, "%s\n", oneLine(s.title))
	}
	fmt.Fprintf(&b, "%s  %s\n", st.bold(q.Family.Name), strings.Join(s.fixed(), ", "))
	conventions := s.conventions()
	fmt.Fprintf(&b, "\n%s, %s over %s, %s\n", st.bold(string(q.Load)), q.Symbol(), q.Along.Variable, conventions[0])
	for _, note := range conventions[1:] {
		fmt.Fprintf(&b, "  %s\n", note)
	}
	s.tableText(&b)
	s.booksText(&b)
	s.fitText(&b, st)
	s.leftOutText(&b, st)
	for _, note := range s.notes {
		fmt.Fprintf(&b, "  %s\n", note)
	}
	for _, name := range s.outputs {
		fmt.Fprintf(&b, "  written to %s\n", oneLine(name))
	}
	b.WriteString("\n" + caution)
	_, err := io.WriteString(w, b.String())
	return err
}

// tableText is the grid: a line for each place along, a column for each curve.
func (s *chartQuestion) tableText(b *strings.Builder) {
	q := s.table.Question
	head := []string{q.Along.String()}
	if q.Along.Unit != "" {
		head[0] += " (" + q.Along.Unit + ")"
	}
	rows := [][]string{nil}
	for i, x := range q.Along.Values {
		row := []string{number.Compact(x, 6)}
		for k := range s.table.Curves() {
			row = append(row, cell(s.table.Curve(k)[i]))
		}
		rows = append(rows, row)
	}
	for k := range s.table.Curves() {
		if q.Curves == nil {
			head = append(head, q.Symbol())
		} else {
			head = append(head, q.CurveName(s.table.Curve(k)[0].Y))
		}
	}
	rows[0] = head
	for _, line := range columns(rows) {
		fmt.Fprintf(b, "  %s\n", line)
	}
}

// cell is a point in the grid.
func cell(p chart.Point) string {
	switch p.Status {
	case chart.Settled:
		return number.Uncertain(p.Factor, p.Uncertainty)
	case chart.NotDrawn:
		return "not drawn"
	case chart.Missing:
		return "–"
	}
	return p.Status.String()
}

// booksText says how far the published fits are off.
func (s *chartQuestion) booksText(b *strings.Builder) {
	for k, book := range s.table.Books {
		low, high, n := math.Inf(1), math.Inf(-1), 0
		for _, p := range s.table.Points {
			if v := p.Handbook[k]; p.Status == chart.Settled && !math.IsNaN(v) {
				off := v/p.Factor - 1
				low, high, n = math.Min(low, off), math.Max(high, off), n+1
			}
		}
		if n > 0 {
			fmt.Fprintf(b, "  handbook   %s … %s over %s in its range  %s\n", number.SignedPercent(low, 1), number.SignedPercent(high, 1), number.CountOf(n, "point", "points"), book.ID)
		}
	}
}

func (s *chartQuestion) fitText(b *strings.Builder, st style) {
	if s.fit == nil {
		switch {
		case s.bare || s.share != "":
		case len(s.table.Absent()) > 0:
			b.WriteString("  formula    none while points are missing\n")
		default:
			b.WriteString("  formula    none: too few settled points\n")
		}
		return
	}
	q, f := s.table.Question, s.fit
	fmt.Fprintf(b, "\n%s, %s\n", st.bold("formula"), q.Range(f))
	for _, line := range q.Formula(f) {
		fmt.Fprintf(b, "  %s\n", line)
	}
	fmt.Fprintf(b, "  within %s of what is computed, bars included: %d points that it was fitted to, %d others\n", percentUp(f.Error), f.Fitted, f.Between)
	fmt.Fprintf(b, "  largest at %s; on the curves of the chart %s\n", q.Place(f.Worst.X, f.Worst.Y), percentUp(f.OnCurves))
	b.WriteString("  it says nothing outside this range, nor beside points that the chart does not have\n\n")
}

// percentUp writes an error that is rounded up already, or up to one digit.
func percentUp(x float64) string {
	return number.Compact(100*chart.RoundUp(x), 2) + "\u00a0%"
}

// leftOutText names the points that are not on the chart.
func (s *chartQuestion) leftOutText(b *strings.Builder, st style) {
	q := s.table.Question
	for _, p := range s.table.Points {
		switch p.Status {
		case chart.NotDrawn:
			fmt.Fprintf(b, "  not drawn  %s: %s\n", q.Place(p.X, p.Y), oneLine(p.Why))
		case chart.Undecided:
			fmt.Fprintf(b, "  %s  %s: %s\n", st.weak("undecided"), q.Place(p.X, p.Y), oneLine(p.Why))
		}
	}
	s.warningsText(b, st)
	if s.share != "" {
		return
	}
	for _, p := range s.table.Absent() {
		if p.Status == chart.Missing {
			fmt.Fprintf(b, "  %s    %s\n", st.weak("missing"), q.Place(p.X, p.Y))
		}
	}
}

// warningsText tells of the first point whose factor does not tell all.
func (s *chartQuestion) warningsText(b *strings.Builder, st style) {
	var first *chart.Point
	n := 0
	for i := range s.table.Points {
		if p := &s.table.Points[i]; p.Status == chart.Settled && p.Why != "" {
			if n++; first == nil {
				first = p
			}
		}
	}
	if n > 0 {
		fmt.Fprintf(b, "  %s    at %s, the first at %s: %s\n", st.weak("warning"), number.CountOf(n, "point", "points"), s.table.Question.Place(first.X, first.Y), oneLine(first.Why))
	}
}
