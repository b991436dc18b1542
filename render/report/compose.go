package report

import (
	"fmt"
	"math"
	"slices"
	"strings"
	"unicode"

	"notchproof/render/number"
	"notchproof/scf"
	"notchproof/verify"
	"notchproof/verify/specimen"
	"notchproof/verify/usermesh"
)

// Source is what a sheet is made of beside the result.
type Source struct {
	Sheet   Sheet
	Program string  // with its version
	Input   Input   // what the result came from
	Target  float64 // the uncertainty wished for, relative
	Caution string
}

// New puts what is to be said about a result into a content, without figures.
func New(r *verify.Result, s Source) *Content {
	c := &Content{
		Schema: schema, Program: s.Program, Part: partOf(r.Part),
		Input: s.Input, Figures: []Figure{}, Caution: oneParagraph(s.Caution),
	}
	c.Sheet = Sheet{plain(s.Sheet.Title), plain(s.Sheet.By), plain(s.Sheet.Date)}
	if c.Sheet.Title == "" {
		c.Sheet.Title = plain(titleOf(r.Part))
	}
	for i := range r.Findings {
		f := findingOf(&r.Findings[i], r.Part)
		f.Computed.TargetShare = s.Target
		c.Results = append(c.Results, f)
	}
	c.Question = question(r)
	c.Method, c.Sources = method(r)
	return c
}

// plain keeps what people wrote from steering what stands around it: control
// characters and those that turn the direction of text become dots.
func plain(text string) string {
	return strings.Map(func(r rune) rune {
		if unicode.IsControl(r) || unicode.Is(unicode.Bidi_Control, r) {
			return '·'
		}
		return r
	}, text)
}

func oneParagraph(text string) string { return strings.Join(strings.Fields(text), " ") }

func titleOf(p *specimen.Part) string {
	switch {
	case p.Title != "":
		return upperFirst(p.Title)
	case p.Family != nil:
		return upperFirst(p.Family.Title)
	}
	return "Part of its own outline"
}

func partOf(p *specimen.Part) Part {
	part := Part{Name: p.Name, Unit: p.Unit, Nu: p.Options.Nu, Dimensions: []Dimension{}}
	if p.Family == nil {
		part.Shape = "a bar with an outline of its own"
		if p.Loads[0].Model.Revolved() {
			part.Shape = "a shaft with an outline of its own"
		}
		return part
	}
	part.Shape = p.Family.Title
	for _, d := range p.Family.Dimensions {
		_, given := p.Given[d.Name]
		v := p.Dims[d.Name]
		if !given && v == 0 {
			continue // a feature that is not there
		}
		unit := p.Unit
		if d.Angle {
			unit = "°"
		}
		part.Dimensions = append(part.Dimensions, Dimension{d.Name, d.Meaning, v, unit, !given})
	}
	return part
}

func findingOf(f *verify.Finding, p *specimen.Part) Finding {
	n := f.Load.Nominal
	out := Finding{
		Load: string(f.Load.Name), Carries: loadWords(f.Load.Name), Symbol: "Kt",
		Nominal:  Nominal{n.Formula, n.Section, append(slices.Clone(texts(n.Notes)), n.Warnings...)},
		Computed: computedOf(&f.Computed, p),
		Verdict:  verdictOf(f.Verdict), Sentence: sentence(f),
		Because: texts(f.Because), Warnings: texts(f.Warnings),
		Handbook: []Handbook{}, Misreadings: []Misreading{}, Checks: []Check{},
	}
	if f.Load.Shear {
		out.Symbol = "Kts"
	}
	for _, h := range f.Handbook {
		out.Handbook = append(out.Handbook, handbookOf(h))
	}
	if c := f.Claim; c != nil {
		out.Claim = &Claim{c.Claim.Factor, plain(c.Claim.From), c.Tolerance, numberOf(c.Difference), verdictOf(c.Verdict), c.Unsafe()}
	}
	if m := f.MeshClaim; m != nil {
		out.ClaimMesh = claimMeshOf(m)
	}
	for _, m := range f.Misreadings {
		out.Misreadings = append(out.Misreadings, Misreading{m.What, m.Factor, m.From, m.Chance})
	}
	for _, k := range f.Checks {
		out.Checks = append(out.Checks, Check{k.Name, numberOf(k.Value), numberOf(k.Limit), k.Above, k.Passed})
	}
	return out
}

func claimMeshOf(m *verify.MeshReading) *ClaimMesh {
	reading := func(what string, s usermesh.Span, difference float64, match usermesh.Match) MeshReading {
		claimed := m.Matches == match || m.Matches == usermesh.Both
		return MeshReading{what, Value{numberOf(s.Value), numberOf(s.Scatter)}, numberOf(difference), claimed}
	}
	return &ClaimMesh{m.Density.String(), m.Matches.String(), []MeshReading{
		reading("averaged at the nodes", m.Nodes, m.DifferenceNodes, usermesh.Nodes),
		reading("at the "+m.Points(), m.Interior, m.DifferenceInterior, usermesh.Interior),
	}}
}

// texts is a list that JSON writes as [] when it is empty.
func texts(list []string) []string { return append([]string{}, list...) }

func computedOf(c *verify.Computed, p *specimen.Part) Computed {
	out := Computed{
		Settled: c.Factor.Status.Settled(), Status: c.State(), Trend: c.Factor.Status.String(),
		Signals:  Signals{numberOf(c.Factor.Signals.Ladder), numberOf(c.Factor.Signals.Second), numberOf(c.Factor.Signals.Witness)},
		Factor:   Value{numberOf(c.Factor.Value), numberOf(c.Factor.Uncertainty)},
		VonMises: Value{numberOf(c.VonMises.Value), numberOf(c.VonMises.Uncertainty)},
		Gross:    Value{numberOf(c.Gross), numberOf(c.Gross / c.Factor.Value * c.Factor.Uncertainty)},
		At:       placeOf(c.Peak), AngleFrom: p.AngleFrom(), Others: []Place{}, Ladder: []Rung{},
	}
	for _, o := range c.Others {
		out.Others = append(out.Others, placeOf(o))
	}
	before := math.NaN()
	for _, r := range c.Ladder {
		out.Ladder = append(out.Ladder, Rung{r.Order, r.Triangles, r.Unknowns, numberOf(r.Factor), numberOf(r.Factor - before), numberOf(r.Leftover)})
		before = r.Factor
	}
	return out
}

func placeOf(p verify.Peak) Place { return Place{p.Side, p.X, p.Y, p.ArcDegrees, numberOf(p.Factor)} }

func handbookOf(h verify.HandbookComparison) Handbook {
	v := h.Value
	out := Handbook{
		ID: v.ID, Factor: v.Factor, InRange: v.InRange, Hint: v.Hint, Range: v.Range, Outside: texts(v.Outside),
		Accuracy: v.Accuracy, Source: v.Source, Difference: numberOf(h.Difference),
		Verdict: verdictOf(h.Verdict), Unsafe: h.Unsafe(), Remarks: []string{},
	}
	if h.Verdict == verify.Disagrees && v.Bias != "" {
		out.Remarks = append(out.Remarks, "known bias: "+v.Bias)
	}
	out.Remarks = append(out.Remarks, v.Warnings...)
	return out
}

func loadWords(l scf.Load) string {
	switch l {
	case scf.Tension:
		return "tension, axial force P"
	case scf.Bending:
		return "bending, moment M"
	case scf.Torsion:
		return "torsion, torque T"
	}
	return string(l)
}

// question is what the sheet was made to answer.
func question(r *verify.Result) string {
	var loads, claims []string
	for i := range r.Findings {
		f := &r.Findings[i]
		loads = append(loads, string(f.Load.Name))
		if c := f.Claim; c != nil {
			from := ""
			if c.Claim.From != "" {
				from = " (" + plain(c.Claim.From) + ")"
			}
			claims = append(claims, fmt.Sprintf("%s%s in %s", number.Compact(c.Claim.Factor, 6), from, f.Load.Name))
		}
	}
	text := "What is the elastic stress concentration factor of this part in " + listed(loads) + ", and how far may it be off?"
	if len(claims) > 0 {
		text += " Is the factor " + listed(claims) + " right for it?"
	} else {
		text += " Do the handbook values hold for it?"
	}
	return text
}

// listed joins words as people do.
func listed(words []string) string {
	if n := len(words); n > 1 {
		return strings.Join(words[:n-1], ", ") + " and " + words[n-1]
	}
	return strings.Join(words, "")
}

func upperFirst(s string) string {
	r := []rune(s)
	if len(r) == 0 {
		return s
	}
	return strings.ToUpper(string(r[:1])) + string(r[1:])
}
