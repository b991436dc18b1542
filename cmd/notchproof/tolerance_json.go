package main

import (
	"encoding/json"
	"io"

	"notchproof/scf"
	"notchproof/verify/tolerance"
)

// The object that tolerance --json prints. Sensitivities are per unit of the
// dimension, changes half of what the whole tolerance does.
type jsonTolerance struct {
	Schema     int                  `json:"schema"`
	Part       jsonPart             `json:"part"`
	Tolerances []jsonDeviation      `json:"tolerances"`
	Results    []jsonToleranceLoad  `json:"results"`
	Points     []jsonTolerancePoint `json:"points"`
	Warnings   []string             `json:"warnings"`
}

type jsonDeviation struct {
	Dimension string  `json:"dimension"`
	Lower     float64 `json:"lower"`
	Upper     float64 `json:"upper"`
}

type jsonToleranceLoad struct {
	Load    scf.Load    `json:"load"`
	Decided bool        `json:"decided"`
	Why     string      `json:"why,omitempty"`
	Factor  *jsonSpread `json:"factor"`
	Peak    *jsonSpread `json:"peakStress"`
}

type jsonSpread struct {
	AsDrawn       jsonValue          `json:"asDrawn"`
	Middle        jsonValue          `json:"middle"`
	Least         jsonExtreme        `json:"least"`
	Most          jsonExtreme        `json:"most"`
	RootSumSquare jsonValue          `json:"rootSumSquare"`
	Largest       string             `json:"largest"`
	Contributions []jsonContribution `json:"contributions"`
	Beyond        string             `json:"beyond,omitempty"`
}

type jsonValue struct {
	Value       maybe `json:"value"`
	Uncertainty maybe `json:"uncertainty"`
}

type jsonExtreme struct {
	jsonValue
	Dims scf.Dims `json:"dims"`
}

type jsonContribution struct {
	Dimension   string    `json:"dimension"`
	Sensitivity jsonValue `json:"sensitivity"`
	Change      jsonValue `json:"change"`
}

type jsonTolerancePoint struct {
	Dims    scf.Dims        `json:"dims"`
	Results []jsonPointLoad `json:"results"`
}

type jsonPointLoad struct {
	Load   scf.Load  `json:"load"`
	Factor jsonValue `json:"factor"`
	Peak   jsonValue `json:"peakStress"`
}

func jsonValueOf(v tolerance.Value) jsonValue {
	return jsonValue{maybe(v.Value), maybe(v.Uncertainty)}
}

func writeToleranceJSON(w io.Writer, a *tolerance.Answer) error {
	q := a.Question
	out := jsonTolerance{
		Schema: 1, Part: jsonPart{Family: q.Family.Name, Dims: q.Dims, Unit: q.Unit, Nu: q.Options.Nu},
		Warnings: append([]string{}, a.Warnings...),
	}
	for _, d := range q.Deviations {
		out.Tolerances = append(out.Tolerances, jsonDeviation{d.Name, d.Lower, d.Upper})
	}
	for i := range a.Loads {
		l := &a.Loads[i]
		item := jsonToleranceLoad{Load: l.Load, Decided: l.Decided, Why: l.Why}
		if l.Decided {
			item.Factor, item.Peak = jsonSpreadOf(&l.Factor), jsonSpreadOf(&l.Peak)
		}
		out.Results = append(out.Results, item)
	}
	for _, p := range a.Points {
		point := jsonTolerancePoint{Dims: p.Dims}
		for i, load := range q.Loads {
			point.Results = append(point.Results, jsonPointLoad{load, jsonValueOf(p.Factor[i]), jsonValueOf(p.Peak[i])})
		}
		out.Points = append(out.Points, point)
	}
	encoder := json.NewEncoder(w)
	encoder.SetEscapeHTML(false)
	encoder.SetIndent("", "  ")
	return encoder.Encode(out)
}

func jsonSpreadOf(s *tolerance.Spread) *jsonSpread {
	out := &jsonSpread{
		AsDrawn: jsonValueOf(s.Drawn), Middle: jsonValueOf(s.Middle),
		Least:         jsonExtreme{jsonValueOf(s.Least.Value), s.Least.At.Dims},
		Most:          jsonExtreme{jsonValueOf(s.Most.Value), s.Most.At.Dims},
		RootSumSquare: jsonValueOf(s.RootSumSquare), Largest: s.Contributions[0].Name, Beyond: s.Beyond,
	}
	for _, c := range s.Contributions {
		out.Contributions = append(out.Contributions, jsonContribution{c.Name, jsonValueOf(c.Sensitivity), jsonValueOf(c.Change)})
	}
	return out
}
