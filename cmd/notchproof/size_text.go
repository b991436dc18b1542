package main

import (
	"fmt"
	"io"
	"strings"
	"unicode/utf8"

	"notchproof/render/number"
	"notchproof/scf"
	"notchproof/verify/sizing"
	"notchproof/verify/specimen"
)

// writeSizeText prints the answer for people.
func writeSizeText(w io.Writer, s *sizeQuestion, st style) error {
	var b strings.Builder
	if s.shape.title != "" {
		fmt.Fprintf(&b, "%s\n", s.shape.title)
	}
	fmt.Fprintf(&b, "%s  %s\n", st.bold(s.shape.family.Name), s.others())
	s.questionText(&b, st)
	s.answerText(&b, st)
	s.searchText(&b, st)
	s.alternativesText(&b, st)
	s.unsettledText(&b, st)
	b.WriteString("\n" + caution)
	_, err := io.WriteString(w, b.String())
	return err
}

func (s *sizeQuestion) questionText(b *strings.Builder, st style) {
	b.WriteString("\n")
	if s.load != "" {
		b.WriteString(st.bold(string(s.load)))
		if p := s.part(s.answer.At.At); p != nil {
			l, _ := p.Load(s.load)
			fmt.Fprintf(b, ", nominal stress %s (%s)", l.Nominal.Formula, l.Nominal.Section)
		}
		b.WriteString("\n")
	} else {
		fmt.Fprintf(b, "  loads      %s\n", loadsText(&s.strength))
	}
	which := "smallest"
	if s.answer.Outcome == sizing.Met && !s.answer.Falling {
		which = "largest"
	}
	fmt.Fprintf(b, "  asked      the %s %s with %s\n", which, s.dimension, s.words)
}

func (s *sizeQuestion) symbol() string {
	if s.load == scf.Torsion {
		return "Kts"
	}
	return "Kt"
}

// length writes a value of the dimension.
func (s *sizeQuestion) length(x float64) string {
	if s.unit() == "°" {
		return number.Compact(x, 6) + "°"
	}
	return number.Length(round(x, 6), s.unit())
}

// known writes a value of the dimension with its bar.
func (s *sizeQuestion) known(x, bar float64) string {
	text := number.Uncertain(x, bar)
	if u := s.unit(); u == "°" {
		return "(" + text + ")°"
	} else if u != "" {
		text += "\u00a0" + u
	}
	return text
}

// at writes what was measured.
func (s *sizeQuestion) at(r sizing.Reading) string {
	factor := fmt.Sprintf("%s = %s", s.symbol(), number.Uncertain(r.Factor, r.FactorBar))
	text := s.bare(r)
	switch {
	case !s.limit.Given():
		return factor
	case s.load != "":
		return text + ", " + factor
	case s.safety > 0:
		safety := s.safety * s.question.Limit / r.Value
		text += ", safety " + number.Uncertain(safety, safety*r.Uncertainty/(r.Value-r.Uncertainty))
	}
	if r.Where != "" {
		text += ", on the " + r.Where
	}
	return text
}

// bare writes the measure alone.
func (s *sizeQuestion) bare(r sizing.Reading) string {
	if !s.limit.Given() {
		return number.Uncertain(r.Factor, r.FactorBar)
	}
	return number.Uncertain(s.limit.Like(r.Value).Value(), s.limit.Like(r.Uncertainty).Value()) + "\u00a0" + s.limit.Unit()
}

func (s *sizeQuestion) answerText(b *strings.Builder, st style) {
	a := s.answer
	switch a.Outcome {
	case sizing.Met:
		fmt.Fprintf(b, "  answer     %s, where %s\n", st.bold(s.dimension+" = "+s.known(a.At.At, a.Bar)), s.at(a.At.Reading))
		s.roundedText(b)
	case sizing.Throughout:
		fmt.Fprintf(b, "  answer     %s\n             at %s = %s %s\n", st.bold("every "+s.dimension+" that was looked at meets it"), s.dimension, s.length(a.At.At), s.at(a.At.Reading))
		s.highestText(b)
	case sizing.Beyond:
		fmt.Fprintf(b, "  answer     %s\n             the best is %s = %s with %s\n", st.bad("no "+s.dimension+" meets it"), s.dimension, s.length(a.At.At), s.at(a.At.Reading))
	default:
		fmt.Fprintf(b, "  answer     %s\n             at %s = %s: %s\n", st.weak("undecided"), s.dimension, s.length(a.At.At), oneLine(a.At.Why))
	}
	if a.Outcome != sizing.Undecided && a.At.Why != "" {
		fmt.Fprintf(b, "  %s %s\n", st.weak("warning"), oneLine(a.At.Why))
	}
}

// highestText says where the measure comes nearest to the limit, if a full
// ladder has told so.
func (s *sizeQuestion) highestText(b *strings.Builder) {
	var top *sizing.Sample
	for i := range s.answer.Scanned {
		if x := &s.answer.Scanned[i]; !x.Rough && (top == nil || x.Value > top.Value) {
			top = x
		}
	}
	if top != nil {
		fmt.Fprintf(b, "             highest near %s = %s: %s\n", s.dimension, s.length(top.At), s.at(top.Reading))
	}
}

func (s *sizeQuestion) roundedText(b *strings.Builder) {
	r := s.answer.Rounded
	if r == nil {
		b.WriteString("  rounded    no drawing step nearby meets it with its bar\n")
		return
	}
	way := "up"
	if !s.answer.Falling {
		way = "down"
	}
	fmt.Fprintf(b, "  rounded    %s to %s = %s, where %s\n", way, s.dimension, s.length(r.At), s.at(r.Reading))
}

func (s *sizeQuestion) searchText(b *strings.Builder, st style) {
	a := s.answer
	if len(a.Keeps) > 1 || len(a.Keeps) == 1 && a.Keeps[0].From > a.Searched.From && a.Keeps[0].To < a.Searched.To {
		var stretches []string
		for _, k := range a.Keeps {
			stretches = append(stretches, fmt.Sprintf("%s to %s", s.length(round(k.From, 3)), s.length(round(k.To, 3))))
		}
		fmt.Fprintf(b, "  also       what meets it lies, roughly, from %s\n", strings.Join(stretches, " and from "))
	}
	fmt.Fprintf(b, "  searched   %s from %s to %s at %s\n", s.dimension, s.length(round(a.Searched.From, 3)), s.length(round(a.Searched.To, 3)), number.CountOf(len(a.Scanned), "place", "places"))
	for _, x := range a.Skipped {
		fmt.Fprintf(b, "  %s at %s = %s nothing could be judged: %s\n", st.weak("warning"), s.dimension, s.length(x.At), oneLine(x.Why))
	}
}

// alternativesText is the table of other ways, the answer first.
func (s *sizeQuestion) alternativesText(b *strings.Builder, st style) {
	if len(s.alternatives) == 0 {
		return
	}
	head := s.symbol()
	if s.limit.Given() {
		head = "stress"
	}
	rows := [][]string{{"other ways in the same envelope", head, "along the axis", "elsewhere"}}
	if a := s.answer; a.Outcome == sizing.Met {
		if p := s.part(a.At.At); p != nil {
			rows = append(rows, []string{"the answer, " + s.dimension + " = " + s.known(a.At.At, a.Bar), s.bare(a.At.Reading), s.alongText(sizing.Length(p)), ""})
		}
	}
	for i := range s.alternatives {
		a := &s.alternatives[i]
		elsewhere := s.changesText(a)
		if !a.Meets {
			elsewhere = strings.TrimPrefix(elsewhere+"; does not meet it", "; ")
		}
		rows = append(rows, []string{a.What + ", " + s.sizesText(a), s.bare(a.Reading), s.alongText(a.Length), elsewhere})
	}
	b.WriteString("\n")
	for i, line := range columns(rows) {
		if i == 0 {
			line = st.bold(line)
		}
		fmt.Fprintf(b, "  %s\n", line)
	}
}

// unsettledText says what else was tried, and why nothing is known of it.
func (s *sizeQuestion) unsettledText(b *strings.Builder, st style) {
	var words []string
	for _, u := range s.unsettled {
		words = append(words, u.What+" ("+oneLine(u.Why)+")")
	}
	if len(words) > 0 {
		fmt.Fprintf(b, "  %s not settled: %s\n", st.weak("warning"), strings.Join(words, "; "))
	}
}

// columns lines up the cells of rows of the same length.
func columns(rows [][]string) (lines []string) {
	width := make([]int, len(rows[0]))
	for _, r := range rows {
		for i, cell := range r {
			width[i] = max(width[i], utf8.RuneCountInString(cell))
		}
	}
	for _, r := range rows {
		var b strings.Builder
		for i, cell := range r {
			b.WriteString(cell + strings.Repeat(" ", width[i]-utf8.RuneCountInString(cell)+2))
		}
		lines = append(lines, strings.TrimRight(b.String(), " "))
	}
	return lines
}

// sizesText writes the dimensions of an alternative; the one that was sought
// with its bar.
func (s *sizeQuestion) sizesText(a *sizing.Alternative) string {
	var words []string
	for _, z := range a.Sizes {
		text := s.lengthOf(z)
		if z.Name == a.Sought && a.Bar > 0 {
			text = number.Uncertain(z.Value, a.Bar) + noBreakUnit(s.shape.unit)
		}
		words = append(words, z.Name+" = "+text)
	}
	return strings.Join(words, ", ")
}

func noBreakUnit(unit string) string {
	if unit == "" {
		return ""
	}
	return "\u00a0" + unit
}

func (s *sizeQuestion) lengthOf(z sizing.Size) string {
	if z.Name == "angle" {
		return number.Compact(z.Value, 6) + "°"
	}
	return number.Length(round(z.Value, 4), s.shape.unit)
}

func (s *sizeQuestion) alongText(length float64) string {
	return number.Length(round(length, 3), s.shape.unit)
}

// changesText says what an alternative changes elsewhere.
func (s *sizeQuestion) changesText(a *sizing.Alternative) string {
	var words []string
	for _, z := range a.Changes {
		words = append(words, z.Name+" "+signedText(round(z.Value, 3))+noBreakUnit(s.shape.unit))
	}
	return strings.Join(words, ", ")
}

// costsText says all that an alternative takes.
func (s *sizeQuestion) costsText(a *sizing.Alternative) string {
	text := s.alongText(a.Length) + " along the axis"
	if more := s.changesText(a); more != "" {
		text += ", " + more
	}
	return text
}

// givenText writes the dimensions as given, in the order of the family's list.
func givenText(s *shape) string {
	return dimensionText(&specimen.Part{Family: s.family, Given: s.dims, Unit: s.unit, Options: s.options})
}
