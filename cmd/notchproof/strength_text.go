package main

import (
	"fmt"
	"io"
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
	b.line("  loads      %s", loadsText(&b.Question))
	b.line("  material   %s", strings.Join(b.metal(), ", "))
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

// metal lists what is known of the material.
func (b *strengthSheet) metal() []string {
	m := &b.Question.Material
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
	return words
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
