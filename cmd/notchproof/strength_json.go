package main

import (
	"encoding/json"
	"io"

	"notchproof/scf"
	"notchproof/verify/quantity"
	"notchproof/verify/strength"
)

// The object that strength --json prints. Stresses are in stressUnit, forces and
// moments in units of their own, places in the unit of the part, G in 1/mm.
type jsonStrength struct {
	Schema      int                     `json:"schema"`
	Part        jsonPart                `json:"part"`
	Loads       map[string]jsonQuantity `json:"loads"`
	Criterion   string                  `json:"criterion"` // vonMises or firstPrincipal
	StressUnit  string                  `json:"stressUnit"`
	Strength    float64                 `json:"strength"`
	Factors     []jsonLoadFactor        `json:"factors"`
	ByHand      []jsonHand              `json:"byHand"`
	Places      []jsonCritical          `json:"places"`  // smallest safety first
	Section     *jsonSection            `json:"section"` // null: not known
	Fluctuating []jsonFluctuating       `json:"fluctuating"`
	Cover       *jsonCover              `json:"cover"` // null: a factor is not settled
	Required    float64                 `json:"required,omitempty"`
	Decision    strength.Decision       `json:"decision"` // met, notMet, undecided, notAsked
	Because     []string                `json:"because"`
	Warnings    []string                `json:"warnings"`
}

type jsonQuantity struct {
	Value float64 `json:"value"`
	Unit  string  `json:"unit"`
}

type jsonLoadFactor struct {
	Load        scf.Load      `json:"load"`
	Nominal     float64       `json:"nominal"`
	Factor      maybe         `json:"factor"`
	Uncertainty maybe         `json:"uncertainty"`
	Handbook    *jsonBookPick `json:"handbook"` // null: none in range
}

type jsonBookPick struct {
	ID       string  `json:"id"`
	Factor   float64 `json:"factor"`
	Accuracy float64 `json:"accuracy"`
}

type jsonSafety struct {
	Value maybe `json:"value"`
	Low   maybe `json:"low"`
	High  maybe `json:"high"`
}

type jsonHand struct {
	With        string      `json:"with"`
	Missing     []string    `json:"missing,omitempty"`
	Equivalent  float64     `json:"equivalent"`
	Uncertainty float64     `json:"uncertainty"`
	Difference  maybe       `json:"difference"` // (by hand − computed) ÷ computed
	Safety      *jsonSafety `json:"safety"`
}

type jsonCritical struct {
	Name        string     `json:"name"`
	Kind        string     `json:"kind"` // notch, side or section
	X           float64    `json:"x"`
	Y           float64    `json:"y"`
	Degrees     float64    `json:"degrees"`
	Along       float64    `json:"along"`
	Hoop        float64    `json:"hoop"`
	Shear       float64    `json:"shear"`
	Equivalent  float64    `json:"equivalent"`
	Uncertainty float64    `json:"uncertainty"`
	Safety      jsonSafety `json:"safety"`
}

type jsonSection struct {
	FirstYield maybe `json:"firstYield"`
	Elastic    maybe `json:"elastic"`
	Plastic    maybe `json:"plastic"`
}

type jsonFluctuating struct {
	Load        scf.Load   `json:"load"`
	Gradient    float64    `json:"gradient"`
	Uncertainty float64    `json:"uncertainty"`
	Radius      float64    `json:"radius,omitempty"` // mm
	Rules       []jsonRule `json:"rules"`
}

type jsonRule struct {
	Rule     string  `json:"rule"`
	Factor   float64 `json:"factor,omitempty"`
	Detail   string  `json:"detail,omitempty"`
	Source   string  `json:"source"`
	Covers   string  `json:"covers"`
	Sureness string  `json:"sureness"`
	Missing  string  `json:"missing,omitempty"` // why there is no factor
}

type jsonCover struct {
	Factors  float64    `json:"factors"`
	Handbook float64    `json:"handbook,omitempty"`
	Apart    float64    `json:"apart,omitempty"` // largest difference between handbook and computed factor
	InChart  bool       `json:"inChart"`
	Without  []scf.Load `json:"without"` // loads that no chart covers
	Usual    [2]float64 `json:"usual"`   // common practice, no substitute for the applicable code
	AndMore  bool       `json:"andMore"`
}

func writeStrengthJSON(w io.Writer, r *strength.Result) error {
	unit := r.Question.Material.Yield
	criterion := "vonMises"
	if r.Brittle {
		unit, criterion = r.Question.Material.Tensile, "firstPrincipal"
	}
	p := r.Part()
	out := jsonStrength{
		Schema: 1, Part: jsonPart{Family: p.Name, Dims: p.Given, Unit: p.Unit, Nu: p.Options.Nu},
		Loads: loadsJSON(&r.Question), Criterion: criterion, StressUnit: unit.Unit(), Strength: unit.Value(),
		Factors: factorsJSON(r, unit), ByHand: []jsonHand{}, Places: []jsonCritical{}, Fluctuating: []jsonFluctuating{},
		Required: r.Question.Required, Decision: r.Decision,
		Because: append([]string{}, r.Because...), Warnings: append([]string{}, r.Warnings...),
	}
	if r.Settled {
		settledJSON(&out, r, unit)
	}
	encoder := json.NewEncoder(w)
	encoder.SetEscapeHTML(false)
	encoder.SetIndent("", "  ")
	return encoder.Encode(out)
}

func loadsJSON(q *strength.Question) map[string]jsonQuantity {
	loads := make(map[string]jsonQuantity)
	if q.Axial.Given() {
		loads["axial"] = jsonQuantity{q.Axial.Value(), q.Axial.Unit()}
	}
	if q.Bending.Given() {
		loads["bending"] = jsonQuantity{q.Bending.Value(), q.Bending.Unit()}
	}
	if q.Torque.Given() {
		loads["torque"] = jsonQuantity{q.Torque.Value(), q.Torque.Unit()}
	}
	return loads
}

func factorsJSON(r *strength.Result, unit quantity.Stress) []jsonLoadFactor {
	list := []jsonLoadFactor{}
	for i := range r.Checked.Findings {
		f := &r.Checked.Findings[i]
		one := jsonLoadFactor{
			Load: f.Load.Name, Nominal: unit.Like(r.Nominal[i].Stress).Value(),
			Factor: maybe(f.Computed.Factor.Value), Uncertainty: maybe(f.Computed.Factor.Uncertainty),
		}
		if r.Settled {
			for _, h := range r.Hand[1].Factors {
				if h.Load == f.Load.Name {
					one.Handbook = &jsonBookPick{h.From, h.Factor, h.Tolerance / h.Factor}
				}
			}
		}
		list = append(list, one)
	}
	return list
}

func safetyJSON(i strength.Interval) jsonSafety {
	return jsonSafety{maybe(i.Value), maybe(i.Low), maybe(i.High)}
}

// settledJSON fills in what only settled factors give.
func settledJSON(out *jsonStrength, r *strength.Result, unit quantity.Stress) {
	in := func(mpa float64) float64 { return unit.Like(mpa).Value() }
	for _, h := range r.Hand {
		one := jsonHand{With: h.With, Missing: h.Missing}
		if len(h.Missing) == 0 {
			s := safetyJSON(h.Safety)
			one = jsonHand{h.With, nil, in(h.Equivalent), in(h.Uncertainty), maybe(h.Difference), &s}
		}
		out.ByHand = append(out.ByHand, one)
	}
	for _, p := range r.Places {
		kind := "side"
		switch {
		case p.Notch:
			kind = "notch"
		case p.Beam:
			kind = "section"
		}
		out.Places = append(out.Places, jsonCritical{
			Name: p.Name, Kind: kind, X: p.X, Y: p.Y, Degrees: p.Degrees,
			Along: in(p.Along), Hoop: in(p.Hoop), Shear: in(p.Shear),
			Equivalent: in(p.Equivalent), Uncertainty: in(p.Uncertainty), Safety: safetyJSON(p.Safety),
		})
	}
	if s := r.Section; s != nil {
		out.Section = &jsonSection{maybe(s.First), maybe(s.Elastic), maybe(s.Plastic)}
	}
	for _, s := range r.Sensitivity {
		one := jsonFluctuating{Load: s.Load.Name, Gradient: s.Gradient, Uncertainty: s.GradientBar, Radius: s.Radius, Rules: []jsonRule{}}
		for _, k := range s.Rules {
			one.Rules = append(one.Rules, jsonRule{k.Rule, k.Factor, k.Detail, k.Source, k.Covers, k.Sureness, k.Missing})
		}
		out.Fluctuating = append(out.Fluctuating, one)
	}
	c := r.Cover
	out.Cover = &jsonCover{c.Factor, c.Handbook, c.Spread, c.InChart, append([]scf.Load{}, c.Without...), [2]float64{c.From, c.To}, c.AndMore}
}
