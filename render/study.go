package render

import (
	"errors"
	"image"
	"math"

	"notchproof/render/number"
)

// A Study is a ladder of solves to be plotted.
type Study struct {
	Title  string // what was solved: "shaft-shoulder, bending"
	Note   string // one line below: what the study says
	Points []StudyPoint
	// Limit is the value that the ladder tends to, Uncertainty how far it may be
	// off; NaN when there is none.
	Limit, Uncertainty float64
}

// A StudyPoint is one rung.
type StudyPoint struct {
	Label    string  // "order 4"
	Unknowns int     // above zero
	Factor   float64 // finite
	Change   float64 // size of the change from the rung before; 0 or NaN: none to show
}

// StudyOptions say how a study is plotted. The zero value is the default.
type StudyOptions struct {
	Width int // pixels; 0: 1600
}

// StudyPlot plots a convergence study: the factor against the number of
// unknowns with its limit and the band of its uncertainty, and the size of the
// changes on logarithmic scales, on which an algebraic order is a straight line
// and a geometric one bends down.
func StudyPlot(study Study, o StudyOptions) (image.Image, error) {
	s, err := studyPlot(study, o)
	if err != nil {
		return nil, err
	}
	return s.im, nil
}

const studyHeight = 720

func studyPlot(study Study, o StudyOptions) (*sheet, error) {
	if len(study.Points) == 0 {
		return nil, errors.New("study plot: no rungs")
	}
	for _, p := range study.Points {
		if p.Unknowns <= 0 || math.IsNaN(p.Factor) || math.IsInf(p.Factor, 0) {
			return nil, errors.New("study plot: rung " + p.Label + " has no unknowns or no factor")
		}
	}
	s := newSheet(o.Width, studyHeight)
	s.text(point{s.u(56), s.u(66)}, 0, 0.5, s.fit(study.Title, head, s.u(900)), head, ink)
	s.text(point{s.u(56), s.u(studyHeight - 58)}, 0, 0.5, s.fit(study.Note, normal, s.u(1300)), normal, ink)
	s.text(point{s.u(1544), s.u(studyHeight - 58)}, 1, 0.5, "notchproof", strong, ink)
	s.values(s.area(150, 140, 790, 570), study)
	s.changes(s.area(930, 140, 1540, 570), study)
	return s, nil
}

// unknowns is the axis of both panels.
func (study Study) unknowns() axis {
	low, high := math.Inf(1), 0.0
	for _, p := range study.Points {
		low, high = math.Min(low, float64(p.Unknowns)), math.Max(high, float64(p.Unknowns))
	}
	low, high = around(low, high, 0.12, true)
	return axis{low: low, high: high, log: true}
}

// values draws the panel of the factor.
func (s *sheet) values(frame box, study Study) {
	low, high := math.Inf(1), math.Inf(-1)
	for _, p := range study.Points {
		low, high = math.Min(low, p.Factor), math.Max(high, p.Factor)
	}
	limited := !math.IsNaN(study.Limit) && !math.IsInf(study.Limit, 0) && study.Uncertainty >= 0 && !math.IsInf(study.Uncertainty, 0)
	if limited {
		low, high = math.Min(low, study.Limit-study.Uncertainty), math.Max(high, study.Limit+study.Uncertainty)
	}
	low, high = around(low, high, 0.14, false)
	p := s.newPanel(frame, study.unknowns(), axis{low: low, high: high}, "factor", "unknowns")
	if limited {
		p.band(study)
	}
	var ps []point
	for _, q := range study.Points {
		ps = append(ps, p.position(float64(q.Unknowns), q.Factor))
	}
	p.curve(ps)
	for i, q := range study.Points {
		p.name(ps[i], q.Label)
	}
}

// band draws the limit and its uncertainty.
func (p *panel) band(study Study) {
	top, bottom := p.y.at(study.Limit+study.Uncertainty), p.y.at(study.Limit-study.Uncertainty)
	p.dc.SetColor(tone(0.12))
	p.dc.DrawRectangle(p.frame.X0, top, p.frame.width(), math.Max(bottom-top, 1))
	p.dc.Fill()
	y := p.y.at(study.Limit)
	p.pen(accent, narrow)
	p.dashed()
	p.line(point{p.frame.X0, y}, point{p.frame.X1, y})
	p.dc.SetDash()
	text := number.Uncertain(study.Limit, study.Uncertainty)
	at := point{p.frame.X0 + p.u(10), math.Min(top, y) - p.u(4)}
	if b := p.sheet.place(at, 0, 1, text, small); b.Y0 < p.frame.Y0 {
		at.Y = math.Max(bottom, y) + p.u(4) + b.height()
	}
	p.text(at, 0, 1, text, small, accent)
	p.take(box{p.frame.X0, y - 1, p.frame.X1, y + 1})
}

// changes draws the panel of the differences between rungs.
func (s *sheet) changes(frame box, study Study) {
	low, high := math.Inf(1), 0.0
	var shown []StudyPoint
	for _, p := range study.Points {
		if p.Change > 0 && !math.IsInf(p.Change, 0) {
			shown = append(shown, p)
			low, high = math.Min(low, p.Change), math.Max(high, p.Change)
		}
	}
	const title = "change from the rung before"
	if len(shown) == 0 {
		s.rectangle(frame, narrow, ink)
		s.text(point{frame.X0, frame.Y0 - s.u(14)}, 0, 1, title, strong, ink)
		x, y := frame.middle()
		s.text(point{x, y}, 0.5, 0.5, "none", normal, grey)
		return
	}
	low, high = around(low, high, 0.14, true)
	p := s.newPanel(frame, study.unknowns(), axis{low: low, high: high, log: true}, title, "unknowns")
	var ps []point
	for _, q := range shown {
		ps = append(ps, p.position(float64(q.Unknowns), q.Change))
	}
	p.curve(ps)
	for i, q := range shown {
		p.name(ps[i], q.Label)
	}
}
