package report

import (
	"fmt"
	"io"
	"strings"
	"unicode"
	"unicode/utf8"

	"notchproof/render/number"
)

// Text writes a content as plain text for a terminal, 80 columns where words
// allow it. Control characters of what people wrote are shown as dots.
func Text(w io.Writer, c *Content) error {
	t := &textSheet{}
	t.head(c)
	for i := range c.Results {
		t.finding(&c.Results[i], i+3, c.Part.Unit)
	}
	t.section(len(c.Results)+3, "METHOD")
	for _, p := range c.Method {
		t.paragraph("", p)
	}
	for i, s := range c.Sources {
		t.paragraph(fmt.Sprintf("[%d] ", i+1), s)
	}
	t.section(len(c.Results)+4, "INPUT")
	t.line("  %s", c.Input.Command())
	t.line("")
	for _, line := range strings.Split(strings.TrimRight(c.Input.File, "\n"), "\n") {
		t.line("  %s", line)
	}
	t.line("\n%s", rule)
	t.paragraph("", c.Caution)
	_, err := io.WriteString(w, t.String())
	return err
}

const (
	columns = 80
	rule    = "────────────────────────────────────────────────────────────────────────────────"
)

type textSheet struct{ strings.Builder }

func (t *textSheet) line(format string, args ...any) {
	for i, a := range args {
		if s, ok := a.(string); ok {
			args[i] = visible(s)
		}
	}
	t.WriteString(strings.TrimRight(fmt.Sprintf(format, args...), " ") + "\n")
}

// visible keeps a text from steering the terminal.
func visible(s string) string {
	return strings.Map(func(r rune) rune {
		if unicode.IsControl(r) && r != '\n' {
			return '·'
		}
		return r
	}, s)
}

// paragraph breaks a text into lines behind a hanging label.
func (t *textSheet) paragraph(label, text string) {
	indent := strings.Repeat(" ", 2+len([]rune(label)))
	row := "  " + label
	empty := true
	for _, word := range strings.Fields(visible(text)) {
		if !empty && len([]rune(row))+1+len([]rune(word)) > columns {
			t.line("%s", row)
			row, empty = indent, true
		}
		if !empty {
			row += " "
		}
		row += word
		empty = false
	}
	t.line("%s", row)
}

func (t *textSheet) section(no int, title string) { t.line("\n%d  %s", no, title) }

func (t *textSheet) head(c *Content) {
	t.line(rule)
	t.line("%s", c.Sheet.Title)
	t.line("calculation sheet, stress concentration")
	for _, row := range [][2]string{{"by", c.Sheet.By}, {"date", c.Sheet.Date}, {"program", c.Program}} {
		if row[1] != "" {
			t.line("%-8s %s", row[0], row[1])
		}
	}
	t.line(rule)
	t.section(1, "QUESTION")
	t.paragraph("", c.Question)
	t.section(2, "PART")
	t.line("  %s; %s; ν = %s", c.Part.Shape, lengthsIn(c.Part.Unit), number.Compact(c.Part.Nu, 4))
	for _, d := range c.Part.Dimensions {
		t.line("  %-6s %12s  %s", d.Name, number.Length(d.Value, d.Unit), d.Meaning)
	}
}

func (t *textSheet) finding(f *Finding, no int, unit string) {
	c := &f.Computed
	t.section(no, strings.ToUpper(f.Load))
	if c.Settled {
		t.line("  %-14s %s = %s", "factor", f.Symbol, c.Factor.String())
		t.line("  %-14s %s", "von Mises", c.VonMises.String())
		t.line("  %-14s %s", "gross section", c.Gross.String())
	} else {
		t.line("  %-14s none: %s", "factor", c.Status)
	}
	t.line("  %-14s %s (%s)", "nominal stress", f.Nominal.Formula, f.Nominal.Section)
	t.line("  %-14s on the %s at x = %s, y = %s, %s° %s", "peak", c.At.Side, coordinate(c.At.X, unit), coordinate(c.At.Y, unit),
		number.Decimal(c.At.ArcDegrees, 1), c.AngleFrom)
	for _, o := range c.Others {
		t.line("  %-14s about %s on the %s at x = %s, y = %s", "also", number.Significant(float64(o.Factor), 3), o.Side, coordinate(o.X, unit), coordinate(o.Y, unit))
	}
	for _, note := range f.Nominal.Notes {
		t.paragraph("note: ", note)
	}
	for _, warning := range f.Warnings {
		t.paragraph("warning: ", warning)
	}
	t.line("\n  VERDICT  %s", f.Verdict.Words())
	t.paragraph("", f.Sentence)
	for _, why := range f.Because {
		t.paragraph("- ", why)
	}
	t.comparisons(f)
	t.evidence(f)
}

func (t *textSheet) comparisons(f *Finding) {
	if len(f.Handbook) > 0 {
		t.line("\n  %-22s %8s %8s %10s  %s", "handbook", "factor", "good for", "difference", "verdict")
	} else {
		t.line("\n  nothing is published for this shape and load")
	}
	for _, h := range f.Handbook {
		factor, difference := number.Compact(h.Factor, 4), number.SignedPercent(float64(h.Difference), 1)
		if h.lost() {
			factor, difference = "–", "–"
		}
		t.line("  %-22s %8s %8s %10s  %s", h.ID, factor, number.Percent(h.Accuracy, 0), difference, judged(h.Verdict, h.Unsafe))
		t.paragraph("    ", h.Source)
		for _, remark := range append(append([]string{}, h.Outside...), h.Remarks...) {
			t.paragraph("    ", remark)
		}
	}
	if c := f.Claim; c != nil {
		t.line("\n  %-22s %8s %8s %10s  %s", "claim", number.Compact(c.Factor, 6), number.Significant(c.Tolerance, 2),
			number.SignedPercent(float64(c.Difference), 1), judged(c.Verdict, c.Unsafe))
		if c.Source != "" {
			t.paragraph("    ", c.Source)
		}
	}
	if m := f.ClaimMesh; m != nil {
		t.line("    meshes of %s give", m.Mesh)
		for _, r := range m.Readings {
			t.line("    %-34s %s %10s", r.What, r.Factor.String(), number.SignedPercent(float64(r.Difference), 1))
		}
	}
	for _, m := range f.Misreadings {
		t.paragraph("would be explained by: ", fmt.Sprintf("%s, %s (%s); so by chance in %s of wrong claims",
			m.What, number.Compact(m.Factor, 4), m.From, number.Percent(m.Chance, 0)))
	}
}

func judged(v Verdict, unsafe bool) string {
	if unsafe {
		return v.Words() + ", unsafe"
	}
	return v.Words()
}

func (t *textSheet) evidence(f *Finding) {
	longest := len("check")
	for _, k := range f.Checks {
		longest = max(longest, utf8.RuneCountInString(k.Name))
	}
	t.line("\n  %-*s %12s %14s  %s", longest, "check", "value", "limit", "result")
	for _, k := range f.Checks {
		sign, result := "≤", "passed"
		if k.Above {
			sign = "≥"
		}
		if !k.Passed {
			result = "FAILED"
		}
		t.line("  %-*s %12s %14s  %s", longest, k.Name, scientific(k.Value), sign+" "+scientific(k.Limit), result)
	}
	if s := f.Computed.Signals; f.Computed.Settled {
		t.line("\n  its bar: ladder %s, second mesh %s, surface traction %s", number.Significant(float64(s.Ladder), 1),
			number.Significant(float64(s.SecondMesh), 1), number.Significant(float64(s.Traction), 1))
	}
	t.line("\n  ladder, %s\n  %5s %10s %10s %12s %12s %14s", f.Computed.Trend, "order", "triangles", "unknowns", "factor", "change", "traction left")
	for _, r := range f.Computed.Ladder {
		t.line("  %5d %10d %10d %12s %12s %14s", r.Order, r.Triangles, r.Unknowns, number.Decimal(float64(r.Factor), 6), scientific(r.Change), scientific(r.Traction))
	}
}
