package main

import (
	"fmt"
	"io"
	"math"
	"strings"

	"notchproof/render/number"
	"notchproof/scf"
	"notchproof/verify"
	"notchproof/verify/quantity"
	"notchproof/verify/strength"
)

// A strengthSheet is the text about one result.
type strengthSheet struct {
	strings.Builder
	*strength.Result
	style style
}

// writeStrengthText prints a result for people.
func writeStrengthText(w io.Writer, r *strength.Result, s style) error {
	b := &strengthSheet{Result: r, style: s}
	if title := r.Part().Title; title != "" {
		b.line("%s", title)
	}
	b.line("%s  %s", s.bold(r.Part().Name), dimensionText(r.Part()))
	b.question()
	b.factors()
	if r.Settled {
		b.notch()
		b.places()
		b.section()
		b.fluctuating()
		b.cover()
	}
	b.decision()
	b.WriteString("\n" + caution)
	_, err := io.WriteString(w, b.String())
	return err
}

func (b *strengthSheet) line(format string, args ...any) { fmt.Fprintf(b, format+"\n", args...) }

// quantities are shown to this many digits where no bar says how many.
const strengthDigits = 4

func (b *strengthSheet) question() {
	m := &b.Question.Material
	b.line("  loads      %s", loadsText(&b.Question))
	var words []string
	if m.Yield.Given() {
		words = append(words, "yield "+number.Quantity(m.Yield.Value(), 6, m.Yield.Unit()))
	}
	if m.Tensile.Given() {
		words = append(words, "tensile "+number.Quantity(m.Tensile.Value(), 6, m.Tensile.Unit()))
	}
	if m.Elongation > 0 {
		words = append(words, "elongation "+number.Compact(100*m.Elongation, 3)+" %")
	}
	b.line("  material   %s", strings.Join(words, ", "))
	b.line("             %s", b.criterion())
}

// loadsText writes the loads that were given, and a bar's thickness.
func loadsText(q *strength.Question) string {
	var loads []string
	for _, l := range []struct {
		name string
		size interface {
			Value() float64
			Unit() string
			Given() bool
		}
	}{{"axial", q.Axial}, {"bending", q.Bending}, {"torque", q.Torque}} {
		if l.size.Given() {
			loads = append(loads, l.name+" "+number.Quantity(l.size.Value(), 6, l.size.Unit()))
		}
	}
	if q.Thickness.Value != 0 {
		loads = append(loads, "thickness "+number.Length(q.Thickness.Value, q.Thickness.Unit))
	}
	return strings.Join(loads, ", ")
}

func (b *strengthSheet) criterion() string {
	m := &b.Question.Material
	switch {
	case m.Brittle || m.Elongation == 0 && m.Metal == strength.GreyIron:
		return "brittle: largest principal stress against tensile strength"
	case b.Brittle:
		return "brittle, less than 5 % elongation (common practice): largest principal stress against tensile strength"
	case m.Elongation == 0:
		return "taken as ductile, no elongation given: von Mises against yield"
	}
	return "ductile, at least 5 % elongation (common practice): von Mises against yield"
}

// equivalent names the stress that is judged.
func (b *strengthSheet) equivalent() string {
	if b.Brittle {
		return "largest principal stress"
	}
	return "von Mises"
}

// unit is that of the strength as it was given.
func (b *strengthSheet) unit() quantity.Stress {
	if b.Brittle {
		return b.Question.Material.Tensile
	}
	return b.Question.Material.Yield
}

func (b *strengthSheet) stress(mpa float64) string {
	s := b.unit().Like(mpa)
	return number.Significant(s.Value(), strengthDigits) + "\u00a0" + s.Unit()
}

func (b *strengthSheet) uncertain(mpa, bar float64) string {
	s := b.unit().Like(mpa)
	return number.Uncertain(s.Value(), b.unit().Like(bar).Value()) + "\u00a0" + s.Unit()
}

func (b *strengthSheet) factors() {
	b.line("\n%s", b.style.bold("factors on the net section"))
	for i := range b.Checked.Findings {
		f := &b.Checked.Findings[i]
		symbol := "Kt"
		if f.Load.Shear {
			symbol = "Kts"
		}
		e := f.Computed.Factor
		if f.Verdict == verify.Undecided || !e.Status.Settled() {
			b.line("  %-9s  nominal %s, %s", f.Load.Name, b.stress(b.Nominal[i].Stress), b.style.weak("no factor settled"))
			continue
		}
		b.line("  %-9s  nominal %s, %s = %s, handbook %s", f.Load.Name, b.stress(b.Nominal[i].Stress), symbol,
			number.Uncertain(e.Value, e.Uncertainty), b.book(f.Load.Name))
		if f.Claim != nil {
			b.line("             claim %s", comparisonText(f.Claim.Comparison, b.style))
		}
	}
	for _, warning := range b.Warnings {
		b.line("  %s %s", b.style.weak("warning"), warning)
	}
}

// book is the handbook factor that the rule by hand uses.
func (b *strengthSheet) book(load scf.Load) string {
	if !b.Settled {
		return "not looked at"
	}
	for _, f := range b.Hand[1].Factors {
		if f.Load == load {
			return fmt.Sprintf("%s ± %s %s", number.Compact(f.Factor, 4), number.Percent(f.Tolerance/f.Factor, 0), f.From)
		}
	}
	return "has none in range"
}

func (b *strengthSheet) notch() {
	n := b.Notch()
	b.line("\n%s", b.style.bold("at the notch, "+b.equivalent()))
	b.line("  as computed                 %s", b.style.bold(b.uncertain(n.Equivalent, n.Uncertainty)))
	b.line("             all fields added; on the %s", b.where(n))
	b.line("             %s", b.tensor(n))
	for i := range b.Hand {
		h := &b.Hand[i]
		if len(h.Missing) > 0 {
			b.line("  by hand, %-18s nothing: no factor in range for %s", h.With, strings.Join(h.Missing, ", "))
			continue
		}
		b.line("  by hand, %-18s %s  %s  %s", h.With, b.uncertain(h.Equivalent, h.Uncertainty), number.SignedPercent(h.Difference, 1), b.side(h, n))
	}
	b.line("             by hand: every nominal stress times its own factor, all at one point")
}

// side tells on which side of the computed stress the rule by hand lies, and
// whether that is more than its factors are good for.
func (b *strengthSheet) side(h *strength.Hand, n *strength.Place) string {
	gap, within := math.Abs(h.Equivalent-n.Equivalent), ""
	if gap <= n.Uncertainty+h.Uncertainty {
		within = ", within its ±"
	}
	switch {
	case h.Equivalent == 0:
		return "nothing pulls"
	case gap <= n.Uncertainty:
		return "the same"
	case h.Difference > 0:
		return b.style.weak("conservative" + within)
	}
	return b.style.bad("not conservative" + within)
}

func (b *strengthSheet) where(p *strength.Place) string {
	unit := b.Part().Unit
	text := fmt.Sprintf("%s at x = %s, y = %s", p.Name, number.Length(round(p.X, 4), unit), number.Length(round(p.Y, 4), unit))
	if p.Degrees == 0 {
		return text
	}
	if b.Part().Loads[0].Model.Revolved() {
		return text + fmt.Sprintf(", %.0f° around from the tensile side of bending", math.Min(p.Degrees, 360-p.Degrees))
	}
	return text + ", on the lower edge"
}

func (b *strengthSheet) tensor(p *strength.Place) string {
	text := "along the outline " + b.stress(p.Along)
	if b.Part().Loads[0].Model.Revolved() {
		text += ", around the axis " + b.stress(p.Hoop) + ", shear " + b.stress(math.Abs(p.Shear))
	}
	return text
}

func (b *strengthSheet) places() {
	b.line("\n%s", b.style.bold("critical places"))
	least := b.Governing().Safety.Value
	row := func(name, stress string, s strength.Interval, note string) {
		b.line("  %-36s %-22s safety %-6s %s", name, stress, number.Significant(s.Value, 3), note)
	}
	for i := range b.Places {
		p := &b.Places[i]
		name, stress := p.Name+", computed", b.uncertain(p.Equivalent, p.Uncertainty)
		if p.Beam {
			name, stress = p.Name+", plain", b.stress(p.Equivalent)
		}
		note := b.style.bold("governs")
		if i > 0 {
			note = number.Significant(p.Safety.Value/least, 3) + " times that"
		}
		row(name, stress, p.Safety, note)
	}
	for i := range b.Hand {
		if h := &b.Hand[i]; len(h.Missing) == 0 {
			row("by hand, "+h.With, b.uncertain(h.Equivalent, h.Uncertainty), h.Safety, number.Significant(h.Safety.Value/least, 3)+" times that")
		}
	}
}

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
