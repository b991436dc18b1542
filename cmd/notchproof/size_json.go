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
	Load             scf.Load          `json:"load,omitempty"`
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
	Unsettled        []jsonUnsettled   `json:"unsettled,omitempty"`
}

// A jsonUnsettled is an alternative that could not be settled.
type jsonUnsettled struct {
	What string `json:"what"`
	Why  string `json:"why"`
}

type jsonLimit struct {
	Of     string  `json:"of"` // factor, stress or safety
	Value  float64 `json:"value"`
	Unit   string  `json:"unit,omitempty"` // of stresses
	Safety float64 `json:"safety,omitempty"`
}

type jsonSized struct {
	Value             float64 `json:"value"`
	Factor            maybe   `json:"factor"`
	Uncertainty       maybe   `json:"uncertainty"`
	Stress            *maybe  `json:"stress,omitempty"` // in the unit of the limit
	StressUncertainty *maybe  `json:"stressUncertainty,omitempty"`
	Rough             bool    `json:"rough,omitempty"` // of one solve: the uncertainty is an allowance
}

type jsonInterval struct {
	From float64 `json:"from"`
	To   float64 `json:"to"`
}

type jsonAlternative struct {
	What        string          `json:"what"`
	Factor      maybe           `json:"factor"`
	Uncertainty maybe           `json:"uncertainty"`
	Costs       string          `json:"costs"`
	Sizes       []jsonDimension `json:"sizes"`
	Meets       bool            `json:"meets"`
	Length      float64         `json:"length"` // along the axis
	Changes     []jsonDimension `json:"changes"`
}

// A jsonDimension is a size by its name, with a bar where it was sought.
type jsonDimension struct {
	Dimension   string  `json:"dimension"`
	Value       float64 `json:"value"`
	Uncertainty float64 `json:"uncertainty,omitempty"`
}

func (s *sizeQuestion) sized(x sizing.Sample) jsonSized {
	out := jsonSized{Value: x.At, Factor: maybe(x.Factor), Uncertainty: maybe(x.FactorBar), Rough: x.Rough}
	if s.limit.Given() {
		stress, bar := maybe(s.limit.Like(x.Value).Value()), maybe(s.limit.Like(x.Uncertainty).Value())
		out.Stress, out.StressUncertainty = &stress, &bar
	}
	return out
}

func (s *sizeQuestion) jsonAlternatives() []jsonAlternative {
	list := []jsonAlternative{}
	for i := range s.alternatives {
		a := &s.alternatives[i]
		out := jsonAlternative{What: a.What, Factor: maybe(a.Factor), Uncertainty: maybe(a.FactorBar), Costs: s.costsText(a), Meets: a.Meets, Length: a.Length, Changes: []jsonDimension{}}
		for _, z := range a.Sizes {
			d := jsonDimension{Dimension: z.Name, Value: z.Value}
			if z.Name == a.Sought {
				d.Uncertainty = a.Bar
			}
			out.Sizes = append(out.Sizes, d)
		}
		for _, z := range a.Changes {
			out.Changes = append(out.Changes, jsonDimension{Dimension: z.Name, Value: z.Value})
		}
		list = append(list, out)
	}
	return list
}

func (s *sizeQuestion) jsonLimit() jsonLimit {
	switch {
	case !s.limit.Given():
		return jsonLimit{Of: "factor", Value: s.question.Limit}
	case s.safety > 0:
		return jsonLimit{Of: "safety", Value: s.limit.Value(), Unit: s.limit.Unit(), Safety: s.safety}
	}
	return jsonLimit{Of: "stress", Value: s.limit.Value(), Unit: s.limit.Unit()}
}

var outcomeNames = map[sizing.Outcome]string{sizing.Met: "met", sizing.Throughout: "metThroughout", sizing.Beyond: "notMet", sizing.Undecided: "undecided"}

func writeSizeJSON(w io.Writer, s *sizeQuestion) error {
	a := s.answer
	out := jsonSize{
		Schema: 1,
		Part:   jsonPart{Family: s.shape.family.Name, Dims: s.shape.dims, Unit: s.shape.unit, Nu: s.shape.options.Nu},
		Load:   s.load, Limit: s.jsonLimit(),
		Outcome: outcomeNames[a.Outcome], Dimension: s.dimension, Unit: s.unit(),
		Value: maybe(math.NaN()), ValueUncertainty: maybe(math.NaN()), Factor: maybe(math.NaN()), Uncertainty: maybe(math.NaN()),
		Smallest: a.Outcome == sizing.Throughout || a.Falling,
		Keeps:    []jsonInterval{},
		Searched: jsonInterval(a.Searched), Drawable: jsonInterval(a.Drawable),
		Alternatives: s.jsonAlternatives(),
	}
	switch a.Outcome {
	case sizing.Met, sizing.Throughout:
		out.Value, out.ValueUncertainty = maybe(a.At.At), maybe(a.Bar)
		out.Factor, out.Uncertainty = maybe(a.At.Factor), maybe(a.At.FactorBar)
	case sizing.Beyond:
		best := s.sized(a.At)
		out.Best = &best
	}
	if a.Rounded != nil {
		r := s.sized(*a.Rounded)
		out.Rounded = &r
	}
	for _, k := range a.Keeps {
		out.Keeps = append(out.Keeps, jsonInterval(k))
	}
	for _, x := range a.Scanned {
		out.Scanned = append(out.Scanned, s.sized(x))
	}
	for _, u := range s.unsettled {
		out.Unsettled = append(out.Unsettled, jsonUnsettled{u.What, oneLine(u.Why)})
	}
	encoder := json.NewEncoder(w)
	encoder.SetEscapeHTML(false)
	encoder.SetIndent("", "  ")
	return encoder.Encode(out)
}
