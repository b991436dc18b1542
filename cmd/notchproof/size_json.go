package main

import (
	"encoding/json"
	"io"
	"math"

	"notchproof/scf"
	"notchproof/verify/sizing"
)

// The object that size --json prints. value is null where nothing meets the
// limit; best then says what comes nearest. uncertainty is in factor units,
// valueUncertainty in the unit of the value.
type jsonSize struct {
	Schema           int               `json:"schema"`
	Part             jsonPart          `json:"part"`
	Load             scf.Load          `json:"load"`
	Limit            jsonLimit         `json:"limit"`
	Outcome          string            `json:"outcome"`
	Dimension        string            `json:"dimension"`
	Value            maybe             `json:"value"`
	ValueUncertainty maybe             `json:"valueUncertainty"`
	Unit             string            `json:"unit"`
	Factor           maybe             `json:"factor"`
	Uncertainty      maybe             `json:"uncertainty"`
	Smallest         bool              `json:"smallest"`
	Rounded          *jsonSized        `json:"rounded"`
	Best             *jsonSized        `json:"best,omitempty"`
	Keeps            []jsonInterval    `json:"keeps"`
	Searched         jsonInterval      `json:"searched"`
	Drawable         jsonInterval      `json:"drawable"`
	Scanned          []jsonSized       `json:"scanned"`
	Alternatives     []jsonAlternative `json:"alternatives"`
}

type jsonLimit struct {
	Of    string  `json:"of"`
	Value float64 `json:"value"`
}

type jsonSized struct {
	Value       float64 `json:"value"`
	Factor      maybe   `json:"factor"`
	Uncertainty maybe   `json:"uncertainty"`
}

type jsonInterval struct {
	From float64 `json:"from"`
	To   float64 `json:"to"`
}

type jsonAlternative struct {
	What        string `json:"what"`
	Factor      maybe  `json:"factor"`
	Uncertainty maybe  `json:"uncertainty"`
	Costs       string `json:"costs"`
}

func sized(s sizing.Sample) jsonSized {
	return jsonSized{s.At, maybe(s.Factor), maybe(s.FactorBar)}
}

var outcomeNames = map[sizing.Outcome]string{sizing.Met: "met", sizing.Throughout: "metThroughout", sizing.Beyond: "notMet", sizing.Undecided: "undecided"}

func writeSizeJSON(w io.Writer, s *sizeQuestion) error {
	a := s.answer
	out := jsonSize{
		Schema: 1,
		Part:   jsonPart{Family: s.shape.family.Name, Dims: s.shape.dims, Unit: s.shape.unit, Nu: s.shape.options.Nu},
		Load:   s.load, Limit: jsonLimit{"factor", s.question.Limit},
		Outcome: outcomeNames[a.Outcome], Dimension: s.dimension, Unit: s.unit(),
		Value: maybe(math.NaN()), ValueUncertainty: maybe(math.NaN()), Factor: maybe(math.NaN()), Uncertainty: maybe(math.NaN()),
		Smallest: a.Outcome == sizing.Throughout || a.Falling,
		Keeps:    []jsonInterval{},
		Searched: jsonInterval(a.Searched), Drawable: jsonInterval(a.Drawable),
		Alternatives: []jsonAlternative{},
	}
	switch a.Outcome {
	case sizing.Met, sizing.Throughout:
		out.Value, out.ValueUncertainty = maybe(a.At.At), maybe(a.Bar)
		out.Factor, out.Uncertainty = maybe(a.At.Factor), maybe(a.At.FactorBar)
	case sizing.Beyond:
		best := sized(a.At)
		out.Best = &best
	}
	if a.Rounded != nil {
		r := sized(*a.Rounded)
		out.Rounded = &r
	}
	for _, k := range a.Keeps {
		out.Keeps = append(out.Keeps, jsonInterval(k))
	}
	for _, x := range a.Scanned {
		out.Scanned = append(out.Scanned, sized(x))
	}
	encoder := json.NewEncoder(w)
	encoder.SetEscapeHTML(false)
	encoder.SetIndent("", "  ")
	return encoder.Encode(out)
}
