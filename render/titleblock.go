package render

import (
	"fmt"
	"strconv"
	"strings"

	"notchproof/scf"
	"notchproof/verify"
	"notchproof/verify/specimen"
)

// titleBlock draws the table in the corner of the sheet: what the part is, how
// it is loaded, what came out and how far it may be trusted.
func (s *sheet) titleBlock(b box, f *verify.Finding, part *specimen.Part) {
	s.rectangle(b, wide, ink)
	t := table{s, b, b.Y0}
	t.row(62, part.Family.Title, strong, dimensionText(part), normal)
	t.row(62, loadText(f.Load), normal, nominalText(f.Load), normal)
	t.factor(96, f)
	t.comparisons(f)
	t.row(62, meshText(f), normal, peakText(f, part), normal)
	t.foot()
}

// A table is filled from the top; y is where the next row begins.
type table struct {
	s   *sheet
	box box
	y   float64
}

const cellMargin = 14

// rule closes a row of a height in units.
func (t *table) rule(height float64) {
	t.y += t.s.u(height)
	t.s.pen(ink, narrow)
	t.s.line(point{t.box.X0, t.y}, point{t.box.X1, t.y})
}

// row letters two lines in one row.
func (t *table) row(height float64, first string, a lettering, second string, b lettering) {
	width := t.box.width() - 2*t.s.u(cellMargin)
	x := t.box.X0 + t.s.u(cellMargin)
	t.s.text(point{x, t.y + t.s.u(7)}, 0, 0, t.s.fit(first, a, width), a, ink)
	t.s.text(point{x, t.y + t.s.u(height-7)}, 0, 1, t.s.fit(second, b, width), b, ink)
	t.rule(height)
}

// factor letters the answer large, with the verdict on its right.
func (t *table) factor(height float64, f *verify.Finding) {
	s, x := t.s, t.box.X0+t.s.u(cellMargin)
	right := t.box.X1 - s.u(cellMargin)
	middle := t.y + s.u(height)/2
	e := f.Computed.Factor
	answer := "no factor: " + e.Status.String()
	if e.Status.Settled() {
		answer = symbol(f.Load) + " = " + factorText(e)
	}
	stamp := strings.ToUpper(verdictText(f.Verdict))
	w := s.measure(stamp, head)
	s.text(point{x, t.y + s.u(14)}, 0, 0, s.fit(answer, figure, right-w-s.u(60)-x), figure, ink)
	s.text(point{x, t.y + s.u(height-12)}, 0, 1, s.fit(sideText(f), normal, right-w-s.u(60)-x), normal, grey)
	frame := s.place(point{right - s.u(12), middle}, 1, 0.5, stamp, head).grown(s.u(9))
	if f.Verdict == verify.Disagrees {
		s.rectangle(frame, wide, accent)
		s.text(point{right - s.u(12), middle}, 1, 0.5, stamp, head, accent)
	} else {
		s.rectangle(frame, wide, ink)
		s.text(point{right - s.u(12), middle}, 1, 0.5, stamp, head, ink)
	}
	t.rule(height)
}

// comparisons letters what the factor was held against, as many as there is
// room for above the two rows that follow.
func (t *table) comparisons(f *verify.Finding) {
	const line, below = 25, 62 + 36
	room := t.box.Y1 - t.s.u(below+10) - t.y
	lines := comparisonTexts(f)
	most := int(room / t.s.u(line))
	if len(lines) > most {
		left := len(lines) - most + 1
		lines = append(lines[:most-1:most-1], fmt.Sprintf("and %d more", left))
	}
	x := t.box.X0 + t.s.u(cellMargin)
	for i, l := range lines {
		y := t.y + t.s.u(5+line*float64(i))
		t.s.text(point{x, y}, 0, 0, t.s.fit(l, normal, t.box.width()-2*t.s.u(cellMargin)), normal, ink)
	}
	t.y = t.box.Y1 - t.s.u(below)
	t.rule(0)
}

func (t *table) foot() {
	s := t.s
	middle := (t.y + t.box.Y1) / 2
	s.text(point{t.box.X0 + s.u(cellMargin), middle}, 0, 0.5, "elastic factor, not an approval", strong, ink)
	s.text(point{t.box.X1 - s.u(cellMargin), middle}, 1, 0.5, "notchproof", strong, ink)
}

func symbol(l *specimen.Load) string {
	if l.Shear {
		return "Kts"
	}
	return "Kt"
}

func dimensionText(part *specimen.Part) string {
	var list []string
	for _, d := range part.Family.Dimensions {
		if v, given := part.Given[d.Name]; given {
			list = append(list, d.Name+" = "+plain(v))
		}
	}
	text := strings.Join(list, ", ")
	if part.Unit != "" {
		text += " " + part.Unit
	}
	return part.Family.Name + ": " + text
}

func loadText(l *specimen.Load) string {
	names := map[scf.Load]string{scf.Tension: "tension, axial force P", scf.Bending: "bending, moment M", scf.Torsion: "torsion, torque T"}
	if name, ok := names[l.Name]; ok {
		return name
	}
	return string(l.Name)
}

func nominalText(l *specimen.Load) string {
	return "nominal stress " + l.Nominal.Formula + "   (" + l.Nominal.Section + ")"
}

// sideText is what goes with the factor.
func sideText(f *verify.Finding) string {
	c := &f.Computed
	if !c.Factor.Status.Settled() {
		return ""
	}
	return fmt.Sprintf("von Mises %.3f   gross section %.3f   %s", c.VonMises.Value, c.Gross, c.Factor.Status)
}

func verdictText(v verify.Verdict) string {
	switch v {
	case verify.Agrees:
		return "agrees"
	case verify.Disagrees:
		return "disagrees"
	case verify.OutOfRange:
		return "out of range"
	case verify.NothingToCompare:
		return "nothing to compare"
	}
	return "undecided"
}

// comparisonTexts has one line for the claim, one for each handbook value and
// the reasons of the verdict.
func comparisonTexts(f *verify.Finding) []string {
	var lines []string
	say := func(who string, factor float64, c verify.Comparison) {
		lines = append(lines, fmt.Sprintf("%s %s, %+.1f %%: %s", who, strconv.FormatFloat(factor, 'f', 3, 64), 100*c.Difference, verdictText(c.Verdict)))
	}
	if c := f.Claim; c != nil {
		who := "claim"
		if c.Claim.From != "" {
			who += " (" + c.Claim.From + ")"
		}
		say(who, c.Claim.Factor, c.Comparison)
	}
	for _, h := range f.Handbook {
		say("handbook "+h.Value.ID, h.Value.Factor, h.Comparison)
	}
	if len(lines) == 0 {
		lines = f.Because
	}
	return lines
}

func meshText(f *verify.Finding) string {
	ladder := f.Computed.Ladder
	if len(ladder) == 0 {
		return "no mesh"
	}
	r := ladder[len(ladder)-1]
	return fmt.Sprintf("mesh %d triangles of order %d, %d unknowns, %d rungs", r.Triangles, r.Order, r.Unknowns, len(ladder))
}

func peakText(f *verify.Finding, part *specimen.Part) string {
	p := f.Computed.Peak
	text := fmt.Sprintf("peak on the %s at x = %s, y = %s", p.Side, plain4(p.X), plain4(p.Y))
	if part.Unit != "" {
		text += " " + part.Unit
	}
	return text + fmt.Sprintf(", %.1f° up the arc", p.ArcDegrees)
}

func plain4(v float64) string { return strconv.FormatFloat(v, 'g', 4, 64) }

// factorText writes a factor with its uncertainty, as many digits as that
// allows.
func factorText(e verify.Estimate) string {
	return fmt.Sprintf("%.4f ± %.1g", e.Value, e.Uncertainty)
}
