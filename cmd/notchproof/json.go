package main

import (
	"encoding/json"
	"io"
	"math"

	"notchproof/scf"
	"notchproof/verify"
)

// The object that check --json prints. Its names are a contract with whoever
// reads it; schema counts the changes that would break a reader.
type jsonResult struct {
	Schema  int           `json:"schema"`
	Part    jsonPart      `json:"part"`
	Results []jsonFinding `json:"results"`
}

type jsonPart struct {
	Family string   `json:"family"`
	Dims   scf.Dims `json:"dims"`
	Unit   string   `json:"unit"`
	Nu     float64  `json:"nu"`
}

type jsonFinding struct {
	Load        scf.Load         `json:"load"`
	Nominal     jsonNominal      `json:"nominal"`
	Computed    jsonComputed     `json:"computed"`
	Handbook    []jsonHandbook   `json:"handbook"`
	Claim       *jsonClaim       `json:"claim,omitempty"`
	ClaimMesh   *jsonClaimMesh   `json:"claimMesh,omitempty"`
	Corners     []jsonCorner     `json:"corners,omitempty"`
	Warnings    []string         `json:"warnings"`
	Checks      []jsonCheck      `json:"checks"`
	Verdict     verify.Verdict   `json:"verdict"`
	Because     []string         `json:"because"`
	Misreadings []jsonMisreading `json:"misreadings"`
}

// maybe is a number that may be missing: null where a ladder has no value.
type maybe float64

func (m maybe) MarshalJSON() ([]byte, error) {
	if v := float64(m); math.IsNaN(v) || math.IsInf(v, 0) {
		return []byte("null"), nil
	}
	return json.Marshal(float64(m))
}

type jsonNominal struct {
	Section string   `json:"section"`
	Formula string   `json:"formula"`
	Notes   []string `json:"notes,omitempty"`
}

type jsonComputed struct {
	Factor      maybe      `json:"factor"`
	Uncertainty maybe      `json:"uncertainty"`
	VonMises    maybe      `json:"vonMises"`
	Gross       maybe      `json:"gross"`
	At          jsonPlace  `json:"at"`
	Status      string     `json:"status"`
	Trend       string     `json:"trend"` // of the ladder's values
	Signals     jsonSignal `json:"signals"`
	Ladder      []jsonRung `json:"ladder"`
	Others      []jsonPeak `json:"others,omitempty"`
}

// jsonSignal is what each piece of evidence leaves open, absolute, in factor units.
type jsonSignal struct {
	Ladder          maybe `json:"ladder"`
	SurfaceTraction maybe `json:"surfaceTraction"`
	SecondMesh      maybe `json:"secondMesh"`
}

type jsonPlace struct {
	X          float64 `json:"x"`
	Y          float64 `json:"y"`
	ArcDegrees float64 `json:"arcDegrees"`
}

type jsonPeak struct {
	Side   string    `json:"side"`
	Factor float64   `json:"factor"`
	At     jsonPlace `json:"at"`
}

type jsonRung struct {
	Order     int     `json:"order"`
	Triangles int     `json:"triangles"`
	Unknowns  int     `json:"unknowns"`
	Factor    float64 `json:"factor"`
}

type jsonHandbook struct {
	ID         string         `json:"id"`
	Factor     float64        `json:"factor"`
	InRange    bool           `json:"inRange"`
	Accuracy   float64        `json:"accuracy"`
	Source     string         `json:"source"`
	Difference maybe          `json:"difference"`
	Verdict    verify.Verdict `json:"verdict"`
	Warnings   []string       `json:"warnings"`
}

type jsonClaim struct {
	Factor     float64        `json:"factor"`
	Source     string         `json:"source"`
	Tolerance  float64        `json:"tolerance"`
	Difference maybe          `json:"difference"`
	Verdict    verify.Verdict `json:"verdict"`
}

type jsonCheck struct {
	Name   string  `json:"name"`
	Value  maybe   `json:"value"`
	Limit  float64 `json:"limit"`
	Passed bool    `json:"passed"`
}

// jsonCorner is a sharp corner: exponents of the distance by which its stress goes.
type jsonCorner struct {
	X           float64 `json:"x"`
	Y           float64 `json:"y"`
	Degrees     float64 `json:"degrees"`
	OnNotch     bool    `json:"onNotch"`
	Mode        string  `json:"mode"`
	Measured    maybe   `json:"measured"`
	Uncertainty maybe   `json:"uncertainty"`
	Wedge       maybe   `json:"wedge"`
}

type jsonMisreading struct {
	What   string  `json:"what"`
	Factor float64 `json:"factor"`
	From   string  `json:"from"`
	Chance float64 `json:"chance"`
}

// writeJSON prints a result as one object.
func writeJSON(w io.Writer, r *verify.Result) error {
	out := jsonResult{
		Schema: 1,
		Part:   jsonPart{Family: r.Part.Name, Dims: r.Part.Given, Unit: r.Part.Unit, Nu: r.Part.Options.Nu},
	}
	for i := range r.Findings {
		out.Results = append(out.Results, jsonOf(&r.Findings[i]))
	}
	encoder := json.NewEncoder(w)
	encoder.SetEscapeHTML(false)
	encoder.SetIndent("", "  ")
	return encoder.Encode(out)
}

func jsonOf(f *verify.Finding) jsonFinding {
	c := &f.Computed
	out := jsonFinding{
		Load:    f.Load.Name,
		Nominal: jsonNominal{f.Load.Nominal.Section, f.Load.Nominal.Formula, f.Load.Nominal.Notes},
		Computed: jsonComputed{
			Factor: maybe(c.Factor.Value), Uncertainty: maybe(c.Factor.Uncertainty),
			VonMises: maybe(c.VonMises.Value), Gross: maybe(c.Gross),
			At:     jsonPlace{c.Peak.X, c.Peak.Y, c.Peak.ArcDegrees},
			Status: c.State(), Trend: c.Factor.Status.String(),
			Signals: jsonSignal{maybe(c.Factor.Signals.Ladder), maybe(c.Factor.Signals.Witness), maybe(c.Factor.Signals.Second)},
			Ladder:  []jsonRung{},
		},
		Handbook: []jsonHandbook{}, Checks: []jsonCheck{}, Misreadings: []jsonMisreading{},
		Warnings: append([]string{}, f.Warnings...),
		Verdict:  f.Verdict, Because: append([]string{}, f.Because...),
	}
	for _, r := range c.Ladder {
		out.Computed.Ladder = append(out.Computed.Ladder, jsonRung{r.Order, r.Triangles, r.Unknowns, r.Factor})
	}
	for _, p := range c.Others {
		out.Computed.Others = append(out.Computed.Others, jsonPeak{p.Side, p.Factor, jsonPlace{p.X, p.Y, p.ArcDegrees}})
	}
	for _, h := range f.Handbook {
		out.Handbook = append(out.Handbook, jsonHandbook{
			h.Value.ID, h.Value.Factor, h.Value.InRange, h.Value.Accuracy, h.Value.Source,
			maybe(h.Difference), h.Verdict, append(append([]string{}, h.Value.Outside...), h.Value.Warnings...),
		})
	}
	if f.Claim != nil {
		out.Claim = &jsonClaim{f.Claim.Factor, f.Claim.Claim.From, f.Claim.Tolerance, maybe(f.Claim.Difference), f.Claim.Verdict}
	}
	if f.MeshClaim != nil {
		out.ClaimMesh = claimMeshOf(f.MeshClaim)
	}
	for _, k := range f.Corners {
		out.Corners = append(out.Corners, jsonCorner{k.X, k.Y, k.Degrees, k.OnNotch, k.Mode.String(), maybe(k.Measured), maybe(k.Uncertainty), maybe(k.Wedge)})
	}
	for _, k := range f.Checks {
		out.Checks = append(out.Checks, jsonCheck{k.Name, maybe(k.Value), k.Limit, k.Passed})
	}
	for _, m := range f.Misreadings {
		out.Misreadings = append(out.Misreadings, jsonMisreading{m.What, m.Factor, m.From, m.Chance})
	}
	return out
}
