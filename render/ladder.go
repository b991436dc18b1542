package render

import (
	"errors"
	"image/color"
	"math"

	"notchproof/render/number"
	"notchproof/verify"
	"notchproof/verify/specimen"
)

// LadderFigure draws the factors of a finding rung below rung: what each solve
// gave with the traction that it left, the answer with its uncertainty as a band
// through all rungs, then the claim and the handbook factors, each with what it
// is taken to be good for. It fails on a finding without an answer.
func LadderFigure(f *verify.Finding, part *specimen.Part) (*Figure, error) {
	e := f.Computed.Factor
	if len(f.Computed.Ladder) == 0 || !e.Status.Settled() {
		return nil, errors.New("ladder of factors: the ladder has no answer: " + e.Status.String())
	}
	l := newLadder(f, part)
	return &Figure{
		title:       l.title,
		description: l.describe(),
		height:      func(wide float64) float64 { return l.layout(wide).height },
		draw:        func(s *sheet) { s.ladder(l) },
	}, nil
}

// A ladder is what a figure of factors shows.
type ladder struct {
	title, note string
	answer, bar float64
	rungs       []rung
}

// A rung is one factor with how far it may be off.
type rung struct {
	label  string
	factor float64
	bar    float64
	value  string // what is lettered
	kind   rungKind
}

type rungKind int

const (
	solvedRung  rungKind = iota + 1
	answerRung           // of the whole ladder
	judgedRung           // a claim or a handbook factor that is compared
	outsideRung          // a handbook factor out of its range
)

func newLadder(f *verify.Finding, part *specimen.Part) ladder {
	c := &f.Computed
	l := ladder{
		title:  headText(part, f) + ": ladder of factors",
		note:   dimensionText(part) + "; " + nominalNote(f) + "; bars of rungs: traction left on the free surface, at unit nominal stress",
		answer: c.Factor.Value, bar: c.Factor.Uncertainty,
	}
	for _, r := range c.Ladder {
		label := "order " + number.Count(r.Order) + ", " + number.CountOf(r.Unknowns, "unknown", "unknowns")
		l.rungs = append(l.rungs, rung{label, r.Factor, r.Around, number.Uncertain(r.Factor, math.Abs(r.Around)), solvedRung})
	}
	l.rungs = append(l.rungs, rung{"computed", l.answer, l.bar, number.Uncertain(l.answer, l.bar), answerRung})
	compared := func(label string, factor float64, cmp verify.Comparison) {
		r := rung{label, factor, cmp.Tolerance, number.Decimal(factor, 3) + "  " + number.SignedPercent(cmp.Difference, 1) + "  " + verdictText(cmp.Verdict), judgedRung}
		if cmp.Verdict == verify.OutOfRange {
			r.kind = outsideRung
		}
		l.rungs = append(l.rungs, r)
	}
	if f.Claim != nil {
		label := "claim"
		if f.Claim.Claim.From != "" {
			label += ", " + f.Claim.Claim.From
		}
		compared(label, f.Claim.Claim.Factor, f.Claim.Comparison)
	}
	for _, h := range f.Handbook {
		compared(h.Value.ID, h.Value.Factor, h.Comparison)
	}
	return l
}

func (l ladder) describe() string {
	text := l.note + "."
	for _, r := range l.rungs {
		text += " " + r.label + ": " + r.value + "."
	}
	return text
}

// scale is the axis of factors: wide enough for all that is compared; rungs that
// are further off run out of it.
func (l ladder) scale() axis {
	low, high := l.answer-l.bar, l.answer+l.bar
	for _, r := range l.rungs {
		reach := math.Min(r.bar, 0.15*l.answer)
		if math.Abs(r.factor/l.answer-1) < 0.5 {
			low, high = math.Min(low, r.factor-reach), math.Max(high, r.factor+reach)
		}
	}
	low, high = around(low, high, 0.06, false)
	return axis{low: low, high: high}
}

// Layout of the ladder, in units.
const (
	rungApart  = 34.0
	labelApart = 24.0 // between a label above its rung and the rung, on narrow paper
	narrowest  = 1000 // narrower paper has the labels above the rungs
)

type ladderLayout struct {
	title, note []string
	stacked     bool // labels above the rungs
	left, right float64
	pitch       float64
	top, bottom float64
	height      float64
}

func (l ladder) layout(wide float64) ladderLayout {
	s := newSheetOn(nil, 1, point{wide, wide})
	room := wide - 2*sheetMargin
	o := ladderLayout{
		title: s.wrap(l.title, head, room, 3), note: s.wrap(l.note, small, room-signature, 8),
		stacked: wide < narrowest, left: sheetMargin, right: wide - sheetMargin, pitch: rungApart,
	}
	if o.stacked {
		o.pitch += labelApart
	} else {
		labels, values := 0.0, 0.0
		for _, r := range l.rungs {
			labels, values = math.Max(labels, s.measure(r.label, small)), math.Max(values, s.measure(r.value, small))
		}
		// Type measures up to a hundredth more or less at another scale.
		o.left += 1.02*math.Min(labels, 0.3*room) + 14
		o.right -= 1.02*math.Min(values, 0.3*room) + 14
	}
	o.top = sheetMargin + titleHeight*float64(len(o.title)) + 8
	o.bottom = o.top + o.pitch*float64(len(l.rungs)) + 10
	o.height = o.bottom + diagramFoot + noteHeight*float64(max(1, len(o.note))) + sheetMargin
	return o
}

// ladder draws the figure.
func (s *sheet) ladder(l ladder) {
	o := l.layout(s.paper.width() / s.scale)
	s.titleAndNote(o.title, o.note, o.height)
	frame := s.area(o.left, o.top, o.right, o.bottom)
	x := l.scale()
	x.from, x.to = frame.X0+s.u(12), frame.X1-s.u(12)
	p := &panel{sheet: s, frame: frame, x: x}
	p.answer(l)
	marks := p.apart(x.marks(int(frame.width() / s.u(2.4*markApart))))
	p.rule(marks, nil)
	for _, m := range marks {
		s.text(point{x.at(m.value), frame.Y1 + s.u(9)}, 0.5, 0, m.text, small, ink)
	}
	s.text(point{frame.X1, frame.Y1 + s.u(37)}, 1, 0, "factor", small, ink)
	for i, r := range l.rungs {
		y := frame.Y0 + s.u(o.pitch*(float64(i)+1)-rungApart/2+4)
		p.rung(r, y)
		p.rungText(r, y, o)
	}
}

// answer draws the band of the answer through all rungs.
func (p *panel) answer(l ladder) {
	x0, x1 := p.x.at(l.answer-l.bar), p.x.at(l.answer+l.bar)
	x0, x1 = math.Max(x0, p.frame.X0), math.Min(x1, p.frame.X1)
	p.dc.SetColor(tone(0.12))
	p.dc.DrawRectangle(x0, p.frame.Y0, math.Max(x1-x0, p.u(1)), p.frame.height())
	p.dc.Fill()
	x := p.x.at(l.answer)
	p.pen(accent, narrow)
	p.dashed()
	p.line(point{x, p.frame.Y0}, point{x, p.frame.Y1})
	p.dc.SetDash()
}

// rung draws the bar and the mark of a factor.
func (p *panel) rung(r rung, y float64) {
	hold := func(x float64) float64 { return math.Max(p.frame.X0, math.Min(p.frame.X1, x)) }
	x := p.x.at(r.factor)
	x0, x1 := hold(p.x.at(r.factor-math.Abs(r.bar))), hold(p.x.at(r.factor+math.Abs(r.bar)))
	if r.kind == judgedRung {
		p.dc.SetColor(faint)
		p.dc.DrawRectangle(x0, y-p.u(9), x1-x0, p.u(18))
		p.dc.Fill()
	}
	if r.kind != outsideRung && x1-x0 > p.u(2*8) {
		p.pen(ink, narrow)
		p.line(point{x0, y}, point{x1, y})
		for _, x := range [2]float64{x0, x1} {
			if x > p.frame.X0 && x < p.frame.X1 {
				p.line(point{x, y - p.u(6)}, point{x, y + p.u(6)})
			}
		}
	}
	if x < p.frame.X0 || x > p.frame.X1 {
		p.beyond(x > p.frame.X1, y)
		return
	}
	forms := map[rungKind]int{solvedRung: 0, answerRung: 3, judgedRung: 1, outsideRung: 4}
	p.mark(point{x, y}, forms[r.kind], 5)
}

// beyond points to where a factor lies that the scale does not reach.
func (p *panel) beyond(right bool, y float64) {
	tip, dir := point{p.frame.X0 + p.u(3), y}, point{-1, 0}
	if right {
		tip, dir = point{p.frame.X1 - p.u(3), y}, point{1, 0}
	}
	p.arrow(tip, dir, grey)
}

// rungText letters a factor: beside the frame, or above its bar.
func (p *panel) rungText(r rung, y float64, o ladderLayout) {
	style, c := small, color.Color(ink)
	switch r.kind {
	case answerRung:
		style = lettering{Size: small.Size, Bold: true}
	case outsideRung:
		c = grey
	}
	if o.stacked {
		top := y - p.u(12)
		value := p.onPaper(point{p.frame.X1 - p.u(8), top}, 1, 1, r.value, style, c)
		label := p.fit(r.label, style, value.X0-p.frame.X0-p.u(24))
		p.onPaper(point{p.frame.X0 + p.u(8), top}, 0, 1, label, style, c)
		return
	}
	room := p.frame.X0 - p.u(sheetMargin) - p.u(14)
	p.text(point{p.u(sheetMargin), y}, 0, 0.5, p.fit(r.label, style, room), style, c)
	room = p.sheet.paper.X1 - p.u(sheetMargin) - p.frame.X1 - p.u(14)
	p.text(point{p.frame.X1 + p.u(14), y}, 0, 0.5, p.fit(r.value, style, room), style, c)
}
