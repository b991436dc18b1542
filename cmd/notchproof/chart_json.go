package main

import (
	"encoding/json"
	"io"
	"math"

	"notchproof/scf"
	"notchproof/verify/chart"
)

// The object that chart --json prints. largestError and onCurves are shares of
// the factor; fit is null where there is none.
type jsonChart struct {
	Schema int              `json:"schema"`
	Family string           `json:"family"`
	Load   scf.Load         `json:"load"`
	Along  string           `json:"along"`
	Across string           `json:"across,omitempty"`
	Unit   string           `json:"unit,omitempty"`
	Nu     float64          `json:"nu"`
	Given  []string         `json:"given"`
	Curves []jsonChartCurve `json:"curves"`
	Fit    *jsonChartFit    `json:"fit"`
}

type jsonChartCurve struct {
	Value  maybe            `json:"value"` // null: there is one curve
	Points []jsonChartPoint `json:"points"`
}

type jsonChartPoint struct {
	X           float64          `json:"x"`
	Factor      maybe            `json:"factor"`
	Uncertainty maybe            `json:"uncertainty"`
	Status      string           `json:"status"`
	Note        string           `json:"note,omitempty"`
	Handbook    map[string]maybe `json:"handbook,omitempty"`
}

type jsonChartFit struct {
	Formula      []string              `json:"formula"`
	LargestError float64               `json:"largestError"`
	OnCurves     float64               `json:"onCurves"`
	Worst        jsonChartPlace        `json:"worst"`
	Fitted       int                   `json:"fitted"`
	Between      int                   `json:"between"`
	Range        map[string][2]float64 `json:"range"`
}

type jsonChartPlace struct {
	X     float64 `json:"x"`
	Value maybe   `json:"value"`
}

func (s *chartQuestion) writeJSON(w io.Writer) error {
	q := s.table.Question
	out := jsonChart{Schema: 1, Family: q.Family.Name, Load: q.Load, Along: q.Along.String(), Unit: q.Unit, Nu: q.Options.Nu, Given: []string{}}
	if q.Curves != nil {
		out.Across = q.Curves.String()
	}
	for _, g := range q.Given {
		out.Given = append(out.Given, q.Setting(g))
	}
	for k := range s.table.Curves() {
		points := s.table.Curve(k)
		c := jsonChartCurve{Value: maybe(points[0].Y)}
		for _, p := range points {
			c.Points = append(c.Points, s.jsonPoint(p))
		}
		out.Curves = append(out.Curves, c)
	}
	if f := s.fit; f != nil {
		out.Fit = &jsonChartFit{
			Formula: q.Formula(f), LargestError: f.Error, OnCurves: f.OnCurves,
			Worst: jsonChartPlace{f.Worst.X, maybe(f.Worst.Y)}, Fitted: f.Fitted, Between: f.Between,
			Range: q.Ranges(f),
		}
	}
	e := json.NewEncoder(w)
	e.SetIndent("", "  ")
	e.SetEscapeHTML(false)
	return e.Encode(out)
}

func (s *chartQuestion) jsonPoint(p chart.Point) jsonChartPoint {
	out := jsonChartPoint{X: p.X, Factor: maybe(p.Factor), Uncertainty: maybe(p.Uncertainty), Status: p.Status.String(), Note: p.Why}
	for k, v := range p.Handbook {
		if !math.IsNaN(v) {
			if out.Handbook == nil {
				out.Handbook = make(map[string]maybe)
			}
			out.Handbook[s.table.Books[k].ID] = maybe(v)
		}
	}
	return out
}
