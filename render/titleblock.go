package render

import (
	"fmt"
	"image/color"
	"slices"

	"notchproof/render/number"
	"notchproof/verify"
	"notchproof/verify/specimen"
)

// The title block says what the part is, how it is loaded, what came out and
// how far it may be trusted. It is a list of rows, each with lines of its own,
// which take as much room as their texts need at the width of the sheet.

// A row is ruled off from the next one.
type row struct {
	lines []line
	high  float64 // pixels
}

// A line is lettered at the top left corner of its place.
type line struct {
	high float64 // pixels
	draw func(s *sheet, at point)
}

const (
	cellMargin = 14
	rowMargin  = 7
	lineSpace  = 5
)

func heightOf(rows []row) float64 {
	sum := 0.0
	for _, r := range rows {
		sum += r.high
	}
	return sum
}

// titleBlock draws the rows from the top of a box down.
func (p *plate) titleBlock(b box) {
	s := p.sheet
	rows := p.rows(s.ruler, b.width())
	spare := (b.height() - heightOf(rows)) / float64(len(rows))
	s.rectangle(b, wide, ink)
	y := b.Y0
	for i, r := range rows {
		at := point{b.X0 + s.u(cellMargin), y + s.u(rowMargin) + spare/2}
		for _, l := range r.lines {
			l.draw(s, at)
			at.Y += l.high
		}
		if y += r.high + spare; i+1 < len(rows) {
			s.pen(ink, narrow)
			s.line(point{b.X0, y}, point{b.X1, y})
		}
	}
	s.take(b)
}

// rows gives the block's rows for a width in pixels.
func (p *plate) rows(r *ruler, width float64) []row {
	w := writer{r, width - 2*r.u(cellMargin)}
	f, part := p.finding, p.part
	if p.options.Rows != nil {
		return p.answerRows(w)
	}
	return []row{
		w.row(w.texts(titleText(part), strong, 2), w.texts(dimensionText(part), normal, 4)),
		w.row(w.texts(p.loadText(), normal, 2), w.texts(nominalText(f.Load), normal, 2)),
		w.row(w.factor(f), w.texts(sideText(f), normal, 3)),
		w.row(w.comparisons(f), w.remarks(f)),
		w.row(w.texts(meshText(f), normal, 2), w.texts(peakText(f, part), normal, 2)),
		w.row(w.foot(p.options.Edition)),
	}
}

// answerRows are the rows of a sum whose meaning only the caller knows.
func (p *plate) answerRows(w writer) []row {
	const most = 4 // lines of one text
	rows := []row{w.row(w.texts(titleText(p.part), strong, 2), w.texts(dimensionText(p.part), normal, most))}
	for _, texts := range p.options.Rows {
		var lines []line
		for i, text := range texts {
			letters := normal
			if i == 0 {
				letters = strong
			}
			lines = append(lines, w.texts(text, letters, most)...)
		}
		rows = append(rows, w.row(lines))
	}
	return append(rows, w.row(w.foot(p.options.Edition)))
}

// loadText says what acts: one load, or several with their shares.
func (p *plate) loadText() string {
	if len(p.options.Terms) == 0 {
		return loadText(p.finding.Load)
	}
	text := ""
	for i, t := range p.terms {
		if i > 0 {
			text += " + "
		}
		text += number.Compact(t.Scale, 4) + " × " + string(t.Load.Name)
	}
	return "stress field of " + text
}

// A writer makes lines for a width.
type writer struct {
	*ruler
	width float64
}

func (w writer) row(parts ...[]line) row {
	r := row{lines: slices.Concat(parts...), high: 2*w.u(rowMargin) - w.u(lineSpace)}
	for _, l := range r.lines {
		r.high += l.high
	}
	return r
}

func (w writer) high(l lettering) float64 { return w.u(l.Size + lineSpace) }

// texts breaks a text into at most n lines.
func (w writer) texts(text string, l lettering, n int) []line {
	return w.inked(text, l, n, ink)
}

func (w writer) inked(text string, l lettering, n int, c color.Color) []line {
	var lines []line
	for _, part := range w.wrap(text, l, w.width, n) {
		lines = append(lines, line{w.high(l), func(s *sheet, at point) { s.text(at, 0, 0, part, l, c) }})
	}
	return lines
}

// factor letters the answer large, with the verdict in a frame on its right or,
// where there is no room, below.
func (w writer) factor(f *verify.Finding) []line {
	const stampMargin = 9
	stamp, c := capitals(verdictText(f.Verdict)), ink
	if f.Verdict == verify.Disagrees {
		c = accent
	}
	room := w.width - w.measure(stamp, head) - w.u(4*stampMargin)
	framed := func(s *sheet, right, middle float64) {
		b := s.place(point{right - s.u(stampMargin), middle}, 1, 0.5, stamp, head)
		s.rectangle(b.grown(s.u(stampMargin)), wide, c)
		s.text(point{b.X1, middle}, 1, 0.5, stamp, head, c)
	}
	e := f.Computed.Factor
	settled := e.Status.Settled()
	answer := "no factor: " + e.Status.String()
	if settled {
		answer = "= " + number.Uncertain(e.Value, e.Uncertainty)
	}
	need := w.measure("Kts", figure) + w.u(16) + w.measure(answer, figure)
	if !settled {
		need = w.measure(answer, figure)
	}
	beside := need <= room
	letters := line{w.u(figure.Size + 14), func(s *sheet, at point) {
		x, width := at.X, w.width
		if beside {
			framed(s, at.X+w.width, at.Y+s.u(figure.Size/2+5))
			width = room
		}
		if settled {
			x = s.symbol(at.plus(0, s.u(2)), f.Load) + s.u(12)
		}
		s.text(point{x, at.Y + s.u(2)}, 0, 0, s.fit(answer, figure, at.X+width-x), figure, ink)
	}}
	if beside {
		return []line{letters}
	}
	return []line{letters, {w.u(head.Size + 2*stampMargin + 8), func(s *sheet, at point) {
		wide := s.measure(stamp, head) + 2*s.u(stampMargin)
		framed(s, at.X+wide, at.Y+s.u(head.Size/2+stampMargin+1))
	}}}
}

// comparisons gives a line each to what the factor was held against: who,
// factor, difference, verdict, in columns as wide as their texts. Where that
// leaves too little for the first, it stands on a line of its own.
func (w writer) comparisons(f *verify.Finding) []line {
	texts := comparisonTexts(f)
	gap := w.u(16)
	var wide [4]float64
	for _, c := range texts {
		for k := range c {
			wide[k] = max(wide[k], w.measure(c[k], normal))
		}
	}
	numbers := wide[1] + wide[2] + wide[3] + 2*gap
	beside := numbers+gap+min(wide[0], w.u(190)) <= w.width
	left := w.width - numbers // where the columns begin
	var lines []line
	for _, c := range texts {
		whole := w.width
		if beside {
			whole = left - gap
		}
		who := w.fit(c[0], normal, whole)
		columns := func(s *sheet, at point) {
			x := at.X + left + wide[1]
			s.text(point{x, at.Y}, 1, 0, c[1], normal, ink)
			x += gap + wide[2]
			s.text(point{x, at.Y}, 1, 0, c[2], normal, ink)
			s.text(point{x + gap, at.Y}, 0, 0, s.fit(c[3], normal, at.X+w.width-x-gap), normal, ink)
		}
		first := func(s *sheet, at point) { s.text(at, 0, 0, who, normal, ink) }
		if beside {
			lines = append(lines, line{w.high(normal), func(s *sheet, at point) { first(s, at); columns(s, at) }})
		} else {
			lines = append(lines, line{w.high(normal), first}, line{w.high(normal), columns})
		}
	}
	return lines
}

// remarks are warnings, conventions and reasons.
func (w writer) remarks(f *verify.Finding) []line {
	const most, each = 9, 3 // lines
	var lines []line
	for _, remark := range slices.Concat(f.Warnings, f.Load.Nominal.Notes, f.Because) {
		lines = append(lines, w.texts(remark, normal, min(each, most-len(lines)))...)
	}
	return lines
}

// foot says who drew this and what it is not.
func (w writer) foot(name string) []line {
	const caution = "elastic factor, not an approval"
	if name == "" {
		name = "notchproof"
	}
	if w.measure(caution, strong)+w.u(30)+w.measure(name, strong) <= w.width {
		return []line{{w.high(strong), func(s *sheet, at point) {
			s.text(at, 0, 0, caution, strong, ink)
			s.text(at.plus(w.width, 0), 1, 0, name, strong, ink)
		}}}
	}
	return slices.Concat(w.texts(caution, strong, 1), w.texts(name, strong, 1))
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
	return fmt.Sprintf("von Mises %s; on the gross section %s; ladder %s",
		number.Uncertain(c.VonMises.Value, c.VonMises.Uncertainty),
		number.Uncertain(c.Gross, c.Gross/c.Factor.Value*c.Factor.Uncertainty), c.State())
}

// comparisonTexts has one line for the claim and one for each handbook value.
func comparisonTexts(f *verify.Finding) [][4]string {
	var lines [][4]string
	say := func(who string, factor float64, c verify.Comparison) {
		verdict := verdictText(c.Verdict)
		if c.Unsafe() {
			verdict += ", unsafe"
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
		who := "handbook "
		if h.Value.Hint { // of a neighbouring shape
			who = "hint "
		}
		say(who+h.Value.ID, h.Value.Factor, h.Comparison)
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
