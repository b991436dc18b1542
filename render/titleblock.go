package render

import (
	"fmt"
	"slices"
	"strings"

	"notchproof/render/number"
	"notchproof/verify"
	"notchproof/verify/specimen"
)

// titleBlock draws the table in the corner of the sheet: what the part is, how
// it is loaded, what came out and how far it may be trusted.
func (s *sheet) titleBlock(b box, f *verify.Finding, part *specimen.Part) {
	s.rectangle(b, wide, ink)
	defer s.take(b)
	t := table{s, b, b.Y0}
	t.row(62, titleText(part), strong, dimensionText(part), normal)
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
		answer = "= " + number.Uncertain(e.Value, e.Uncertainty)
		x = s.symbol(point{x, t.y + s.u(14)}, f.Load) + s.u(12)
	}
	stamp := strings.ToUpper(verdictText(f.Verdict))
	w := s.measure(stamp, head)
	s.text(point{x, t.y + s.u(14)}, 0, 0, s.fit(answer, figure, right-w-s.u(60)-x), figure, ink)
	x = t.box.X0 + s.u(cellMargin)
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

// comparisons letters what the factor was held against and, in the room that is
// left above the two rows that follow, warnings,
// conventions and reasons.
func (t *table) comparisons(f *verify.Finding) {
	const line, below = 25, 62 + 36
	room := t.box.Y1 - t.s.u(below+10) - t.y
	lines := comparisonTexts(f)
	most := int(room / t.s.u(line))
	if len(lines) > most {
		left := len(lines) - most + 1
		lines = append(lines[:most-1:most-1], [4]string{fmt.Sprintf("and %d more", left)})
	}
	for _, remark := range slices.Concat(f.Warnings, f.Load.Nominal.Notes, f.Because) {
		for _, part := range t.s.wrap(remark, normal, t.box.width()-2*t.s.u(cellMargin), most-len(lines)) {
			lines = append(lines, [4]string{part})
		}
	}
	for i, l := range lines {
		t.columns(t.y+t.s.u(6+line*float64(i)), l)
	}
	t.y = t.box.Y1 - t.s.u(below)
	t.rule(0)
}

// columns letters one comparison: who, factor, difference, verdict. A line with
// nothing but its first text has the whole width.
func (t *table) columns(y float64, c [4]string) {
	s := t.s
	x := t.box.X0 + s.u(cellMargin)
	width := t.box.width() - 2*s.u(cellMargin)
	if c[1] == "" {
		s.text(point{x, y}, 0, 0, s.fit(c[0], normal, width), normal, ink)
		return
	}
	s.text(point{x, y}, 0, 0, s.fit(c[0], normal, 0.49*width), normal, ink)
	s.text(point{x + 0.59*width, y}, 1, 0, c[1], normal, ink)
	s.text(point{x + 0.71*width, y}, 1, 0, c[2], normal, ink)
	s.text(point{x + 0.74*width, y}, 0, 0, s.fit(c[3], normal, 0.26*width), normal, ink)
}

func (t *table) foot() {
	s := t.s
	middle := (t.y + t.box.Y1) / 2
	s.text(point{t.box.X0 + s.u(cellMargin), middle}, 0, 0.5, "elastic factor, not an approval", strong, ink)
	s.text(point{t.box.X1 - s.u(cellMargin), middle}, 1, 0.5, "notchproof", strong, ink)
}

// symbol letters the factor's symbol, K with its subscript, and gives where it
// ends.
func (s *sheet) symbol(p point, l *specimen.Load) float64 {
	subscript := "t"
	if l.Shear {
		subscript = "ts"
	}
	k := s.text(p, 0, 0, "K", figure, ink)
	return s.text(point{k.X1 + s.u(1), k.Y1 + s.u(2)}, 0, 1, subscript, head, ink).X1
}

// sideText is what goes with the factor.
func sideText(f *verify.Finding) string {
	c := &f.Computed
	if !c.Factor.Status.Settled() {
		return ""
	}
	return fmt.Sprintf("von Mises %s   gross section %s   ladder %s",
		number.Uncertain(c.VonMises.Value, c.VonMises.Uncertainty),
		number.Uncertain(c.Gross, c.Gross/c.Factor.Value*c.Factor.Uncertainty), c.Factor.Status)
}

// comparisonTexts has one line for the claim and one for each handbook value.
func comparisonTexts(f *verify.Finding) [][4]string {
	var lines [][4]string
	say := func(who string, factor float64, c verify.Comparison) {
		verdict := verdictText(c.Verdict)
		if c.Unsafe() {
			verdict += ", unsafe side"
		}
		lines = append(lines, [4]string{who, number.Decimal(factor, 3), number.SignedPercent(c.Difference, 1), verdict})
	}
	if c := f.Claim; c != nil {
		who := "claim"
		if c.Claim.From != "" {
			who += ": " + c.Claim.From
		}
		say(who, c.Claim.Factor, c.Comparison)
	}
	for _, h := range f.Handbook {
		say("handbook "+h.Value.ID, h.Value.Factor, h.Comparison)
	}
	return lines
}

func meshText(f *verify.Finding) string {
	ladder := f.Computed.Ladder
	if len(ladder) == 0 {
		return "no mesh"
	}
	r := ladder[len(ladder)-1]
	return fmt.Sprintf("mesh of %s of order %d, %s unknowns, ladder of %s",
		number.CountOf(r.Triangles, "triangle", "triangles"), r.Order, number.Count(r.Unknowns), number.CountOf(len(ladder), "rung", "rungs"))
}

func peakText(f *verify.Finding, part *specimen.Part) string {
	p := f.Computed.Peak
	const digits = 5
	at := "x = " + number.Compact(p.X, digits) + ", y = " + number.Compact(p.Y, digits)
	if part.Unit != "" {
		at += "\u00a0" + part.Unit
	}
	return "peak on the " + p.Side + " at " + at + ", " + number.Decimal(p.ArcDegrees, 1) + "° " + part.AngleFrom()
}
