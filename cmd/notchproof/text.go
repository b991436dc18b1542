package main

import (
	"fmt"
	"io"
	"math"
	"strings"

	"notchproof/render/number"
	"notchproof/verify"
	"notchproof/verify/specimen"
)

// writeText prints a result for people.
func writeText(w io.Writer, r *verify.Result, s style) error {
	var b strings.Builder
	if r.Part.Title != "" {
		fmt.Fprintf(&b, "%s\n", r.Part.Title)
	}
	fmt.Fprintf(&b, "%s  %s\n", s.bold(r.Part.Name), dimensionText(r.Part))
	for i := range r.Findings {
		findingText(&b, &r.Findings[i], r.Part, s)
	}
	b.WriteString("\n" + caution)
	_, err := io.WriteString(w, b.String())
	return err
}

// dimensionText writes dimensions in the order of the family's list.
func dimensionText(p *specimen.Part) string {
	var words []string
	if p.Family != nil {
		for _, d := range p.Family.Dimensions {
			v, given := p.Given[d.Name]
			switch {
			case !given:
			case d.Angle:
				words = append(words, fmt.Sprintf("%s = %s°", d.Name, number.Compact(v, 6)))
			default:
				words = append(words, fmt.Sprintf("%s = %s", d.Name, number.Length(v, p.Unit)))
			}
		}
	}
	return strings.Join(append(words, "ν = "+number.Compact(p.Options.Nu, 4)), ", ")
}

func findingText(b *strings.Builder, f *verify.Finding, part *specimen.Part, s style) {
	unit := part.Unit
	c := &f.Computed
	n := f.Load.Nominal
	fmt.Fprintf(b, "\n%s, nominal stress %s (%s)\n", s.bold(string(f.Load.Name)), n.Formula, n.Section)
	for _, note := range append(append([]string{}, n.Notes...), n.Warnings...) {
		fmt.Fprintf(b, "  note: %s\n", note)
	}
	symbol := "Kt"
	if f.Load.Shear {
		symbol = "Kts"
	}
	if !c.Factor.Status.Settled() {
		fmt.Fprintf(b, "  computed   no factor: the ladder is %s\n", c.Factor.Status)
	} else {
		fmt.Fprintf(b, "  computed   %s = %s\n", symbol, s.bold(number.Uncertain(c.Factor.Value, c.Factor.Uncertainty)))
		fmt.Fprintf(b, "             von Mises %s; on the gross section %s\n",
			number.Uncertain(c.VonMises.Value, c.VonMises.Uncertainty), number.Uncertain(c.Gross, c.Gross/c.Factor.Value*c.Factor.Uncertainty))
	}
	at := fmt.Sprintf("on the %s at x = %s, y = %s", c.Peak.Side, number.Length(round(c.Peak.X, 4), unit), number.Length(round(c.Peak.Y, 4), unit))
	if c.Factor.Status.Settled() {
		fmt.Fprintf(b, "             peak %s, %.1f° %s\n", at, c.Peak.ArcDegrees, part.AngleFrom())
	} else {
		fmt.Fprintf(b, "             highest %s\n", at)
	}
	if k := len(c.Ladder); k > 0 {
		last := c.Ladder[k-1]
		fmt.Fprintf(b, "             %s: %d rungs to order %d on %s, %s unknowns; %s\n",
			c.State(), k, last.Order, number.CountOf(last.Triangles, "triangle", "triangles"), number.Count(last.Unknowns), c.Factor.Status)
		signalsText(b, c.Factor)
	}
	othersText(b, c, unit)
	for _, warning := range f.Warnings {
		fmt.Fprintf(b, "  %s %s\n", s.weak("warning"), warning)
	}
	if f.Claim != nil {
		from := f.Claim.Claim.From
		if from != "" {
			from = "  (" + oneLine(from) + ")"
		}
		fmt.Fprintf(b, "  claim      %s%s\n", comparisonText(f.Claim.Comparison, s), from)
		misreadingsText(b, f.Misreadings)
	}
	if f.MeshClaim != nil {
		meshClaimText(b, f, s)
	}
	for _, h := range f.Handbook {
		handbookText(b, h, s)
	}
	checksText(b, f.Checks, s)
	fmt.Fprintf(b, "  %s\n", verdictText(f, s))
	for _, why := range f.Because {
		fmt.Fprintf(b, "    %s\n", why)
	}
}

// signalsText says what the bar is made of.
func signalsText(b *strings.Builder, e verify.Estimate) {
	if !e.Status.Settled() {
		return
	}
	s := e.Signals
	fmt.Fprintf(b, "             its bar: ladder %s, second mesh %s, surface traction %s\n",
		number.Significant(s.Ladder, 1), number.Significant(s.Second, 1), number.Significant(s.Witness, 1))
}

func othersText(b *strings.Builder, c *verify.Computed, unit string) {
	for _, p := range c.Others {
		if p.Factor < 0.5*c.Peak.Factor {
			continue // local maxima that compete with nothing
		}
		fmt.Fprintf(b, "  also       about %s on %s at x = %s, y = %s, %.1f°\n",
			number.Significant(p.Factor, 3), p.Side, number.Length(round(p.X, 4), unit), number.Length(round(p.Y, 4), unit), p.ArcDegrees)
	}
}

// misreadingsText says what slip would explain the claim, and how much that means.
func misreadingsText(b *strings.Builder, list []verify.Misreading) {
	for _, m := range list {
		fmt.Fprintf(b, "  misread?   %-6s %s (%s); so by chance in %s of wrong claims\n",
			number.Compact(m.Factor, 4), m.What, m.From, number.Percent(m.Chance, 0))
	}
}

func comparisonText(c verify.Comparison, s style) string {
	text := fmt.Sprintf("%-6s %8s  ", number.Compact(c.Factor, 4), number.SignedPercent(c.Difference, 1))
	switch {
	case c.Verdict == verify.OutOfRange && c.Factor < 1:
		// A polynomial far outside its range; the digits say nothing.
		return fmt.Sprintf("%-6s %8s  ", "–", "") + s.weak("out of range")
	case c.Unsafe():
		return text + s.bad("disagrees, too low: unsafe")
	case c.Verdict == verify.Disagrees:
		return text + s.weak("disagrees, too high: safe side")
	case c.Verdict == verify.Agrees:
		return text + s.good("agrees")
	case c.Verdict == verify.OutOfRange:
		return text + s.weak("out of range")
	}
	return text + s.weak("undecided")
}

func handbookText(b *strings.Builder, h verify.HandbookComparison, s style) {
	what := "handbook"
	if h.Value.Hint {
		what = "hint    "
	}
	fmt.Fprintf(b, "  %s   %s ± %s  %s\n", what, comparisonText(h.Comparison, s), number.Percent(h.Value.Accuracy, 0), h.Value.ID)
	fmt.Fprintf(b, "             %s\n", h.Value.Source)
	for _, o := range h.Value.Outside {
		fmt.Fprintf(b, "             out of range: %s\n", o)
	}
	if h.Verdict == verify.Disagrees && h.Value.Bias != "" {
		fmt.Fprintf(b, "             known bias: %s\n", h.Value.Bias)
	}
	for _, warning := range h.Value.Warnings {
		fmt.Fprintf(b, "             note: %s\n", warning)
	}
}

func checksText(b *strings.Builder, checks []verify.Check, s style) {
	passed := 0
	for _, c := range checks {
		if c.Passed {
			passed++
		}
	}
	fmt.Fprintf(b, "  checks     %d of %d passed\n", passed, len(checks))
	for _, c := range checks {
		if !c.Passed {
			fmt.Fprintf(b, "             %s %s: %s, limit %s\n", s.bad("failed"), c.Name, number.Compact(c.Value, 3), number.Compact(c.Limit, 3))
		}
	}
}

func verdictText(f *verify.Finding, s style) string {
	switch f.Verdict {
	case verify.Agrees:
		return s.good("verdict    agrees")
	case verify.Disagrees:
		return s.bad("verdict    disagrees")
	case verify.OutOfRange:
		return s.weak("verdict    out of range")
	case verify.NothingToCompare:
		return "verdict    nothing to compare with"
	}
	return s.weak("verdict    undecided")
}

// round keeps a number of significant digits of a coordinate.
func round(v float64, digits int) float64 {
	if v == 0 || math.IsInf(v, 0) || math.IsNaN(v) {
		return v
	}
	scale := math.Pow10(digits - 1 - int(math.Floor(math.Log10(math.Abs(v)))))
	if math.IsInf(scale, 0) || scale == 0 {
		return v
	}
	return math.Round(v*scale) / scale
}
