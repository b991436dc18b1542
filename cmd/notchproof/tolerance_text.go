package main

import (
	"fmt"
	"io"
	"strings"

	"notchproof/render/number"
	"notchproof/scf"
	"notchproof/verify/tolerance"
)

// writeToleranceText prints the answer for people.
func writeToleranceText(w io.Writer, s *shape, a *tolerance.Answer, st style) error {
	var b strings.Builder
	if s.title != "" {
		fmt.Fprintf(&b, "%s\n", s.title)
	}
	fmt.Fprintf(&b, "%s  %s\n", st.bold(s.family.Name), givenText(s))
	var words []string
	for _, d := range a.Question.Deviations {
		words = append(words, deviationText(s, d))
	}
	fmt.Fprintf(&b, "tolerances %s\n", strings.Join(words, ", "))
	for i := range a.Loads {
		toleranceLoadText(&b, s, a, &a.Loads[i], st)
	}
	fmt.Fprintf(&b, "\n%s solved. The peak stress is that under the same load, over the nominal\nstress as drawn. Root of squares: the width about the middle of the tolerances\nwhen dimensions vary independently (common practice), beside the worst corners.\n",
		number.CountOf(len(a.Points), "part", "parts"))
	for _, warning := range a.Warnings {
		fmt.Fprintf(&b, "%s %s\n", st.weak("warning"), warning)
	}
	b.WriteString("\n" + caution)
	_, err := io.WriteString(w, b.String())
	return err
}

// deviationText writes r ±0.2 mm or d +0.05/−0 mm.
func deviationText(s *shape, d tolerance.Deviation) string {
	unit := unitOf(s.family, d.Name, s.unit)
	if unit != "" && unit != "°" {
		unit = "\u00a0" + unit
	}
	if d.Lower == -d.Upper {
		return d.Name + " ±" + number.Compact(d.Upper, 6) + unit
	}
	return d.Name + " " + signedText(d.Upper) + "/" + signedText(d.Lower) + unit
}

func signedText(x float64) string {
	if x > 0 {
		return "+" + number.Compact(x, 6)
	}
	return number.Compact(x, 6)
}

func toleranceLoadText(b *strings.Builder, s *shape, a *tolerance.Answer, l *tolerance.LoadAnswer, st style) {
	fmt.Fprintf(b, "\n%s\n", st.bold(string(l.Load)))
	if !l.Decided {
		fmt.Fprintf(b, "  %s %s\n", st.weak("undecided"), oneLine(l.Why))
		return
	}
	symbol := "Kt"
	if l.Load == scf.Torsion {
		symbol = "Kts"
	}
	spreadText(b, s, a, symbol, &l.Factor, st)
	if l.SameSection {
		fmt.Fprintf(b, "  peak stress  varies as %s does: the net section stays\n", symbol)
		return
	}
	spreadText(b, s, a, "peak stress", &l.Peak, st)
}

func spreadText(b *strings.Builder, s *shape, a *tolerance.Answer, name string, p *tolerance.Spread, st style) {
	relative := func(v tolerance.Value) string { return number.SignedPercent(v.Value/p.Drawn.Value-1, 1) }
	fmt.Fprintf(b, "  %-12s %s as drawn\n", name, st.bold(valueText(p.Drawn)))
	fmt.Fprintf(b, "    %-10s %-18s %8s  at %s\n", "least", valueText(p.Least.Value), relative(p.Least.Value), a.Question.Place(p.Least.At))
	fmt.Fprintf(b, "    %-10s %-18s %8s  at %s\n", "most", valueText(p.Most.Value), relative(p.Most.Value), a.Question.Place(p.Most.At))
	if len(p.Contributions) > 1 {
		fmt.Fprintf(b, "    %-10s %s about %s in the middle, worst corners %s apart\n", "squares", "±"+widthText(p.RootSumSquare),
			valueText(p.Middle), number.Significant(p.Most.Value.Value-p.Least.Value.Value, 2))
	}
	for i, c := range p.Contributions {
		unit := unitOf(s.family, c.Name, s.unit)
		if unit == "" {
			unit = "unit"
		}
		largest := ""
		if i == 0 && len(p.Contributions) > 1 {
			largest = "  largest"
		}
		fmt.Fprintf(b, "    %-10s %s per %s, %s over its tolerance%s\n", "by "+c.Name, valueText(c.Sensitivity), unit, "±"+widthText(tolerance.Value{Value: abs(c.Change.Value), Uncertainty: c.Change.Uncertainty}), st.bold(largest))
	}
	if p.Beyond != "" {
		fmt.Fprintf(b, "    %s %s\n", st.weak("warning"), p.Beyond)
	}
}

func valueText(v tolerance.Value) string { return number.Uncertain(v.Value, v.Uncertainty) }

// widthText writes a width with its own bar in brackets.
func widthText(v tolerance.Value) string {
	value, bar := number.UncertainParts(v.Value, v.Uncertainty)
	if bar == "" {
		return value
	}
	return value + " (± " + bar + ")"
}

func abs(x float64) float64 {
	if x < 0 {
		return -x
	}
	return x
}
