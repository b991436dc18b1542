package main

import (
	"notchproof/render/number"
	"notchproof/verify/strength"
)

// section prints what the net section bears as a whole.
func (b *strengthSheet) section() {
	s := b.Section
	if s == nil {
		return
	}
	b.line("\n%s", b.style.bold("beyond the first yield, all loads growing together"))
	b.line("  first local yield at        %s times the loads", number.Significant(s.First, 3))
	b.line("  net section, outer fibre    %s times, the notch left out", number.Significant(s.Elastic, 3))
	if b.Brittle {
		b.line("             a brittle part does not shed its peak by yielding: the section as a")
		b.line("             whole is never reached, and the largest principal stress decides")
		return
	}
	b.line("  net section, all of it      at least %s times, fully plastic", number.Significant(s.Plastic, 3))
	b.line("             between the first and the last a ductile part sheds its peak by local")
	b.line("             yielding, under a load that does not come back; a brittle part does not")
}

// cover prints what the safety has to make up for.
func (b *strengthSheet) cover() {
	c := &b.Cover
	b.line("\n%s", b.style.bold("what the safety has to cover"))
	b.line("  computed factors            ± %s at most", number.Percent(c.Factor, 2))
	if c.Handbook > 0 {
		b.line("  handbook factors            ± %s; up to %s away from the computed ones", number.Percent(c.Handbook, 0), number.Percent(c.Spread, 1))
	}
	for _, load := range c.Without {
		b.line("  %-9s                   no chart covers this shape", load)
	}
	more, why := "", "where the shape is exactly a chart's, as here;"
	if c.AndMore {
		more, why = " and more", "where a factor is carried over from a similar shape or an old experiment;"
	}
	b.line("  common practice             safety %s to %s%s", number.Significant(c.From, 2), number.Significant(c.To, 2), more)
	b.line("             %s", why)
	b.line("             no substitute for the applicable code")
}

// decision prints whether the safety asked for is there.
func (b *strengthSheet) decision() {
	text := "required   none asked for"
	switch r := number.Compact(b.Question.Required, 4); b.Decision {
	case strength.Met:
		text = b.style.good("required   " + r + ": met")
	case strength.NotMet:
		text = b.style.bad("required   " + r + ": not met")
	case strength.Undecided:
		text = b.style.weak("required   undecided")
	}
	b.line("\n  %s", text)
	for _, why := range b.Because {
		b.line("    %s", why)
	}
}
