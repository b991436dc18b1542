package render

import (
	"math"
	"strings"

	"notchproof/render/number"
	"notchproof/verify"
	"notchproof/verify/specimen"
)

// SectionFigure plots the stress of a finding along the section from the root of
// the notch into the material, over all of it and close to the root, beside what
// theory says there. The finding must hold the solution of its last rung.
func SectionFigure(f *verify.Finding, part *specimen.Part) (*Figure, error) {
	profile, err := f.SectionProfile(part)
	if err != nil {
		return nil, err
	}
	plot := Plot{Title: headText(part, f) + ": stress below the root", Note: dimensionText(part) + "; " + nominalNote(f)}
	near := profile.Length
	if d := steep(profile); 8*d < profile.Length {
		near = roundStep(4 * d)
	}
	plot.Diagrams = []Diagram{sectionDiagram(f, part, profile, profile.Length)}
	if near < profile.Length {
		close := sectionDiagram(f, part, profile, near)
		close.Y.Label += ", close to the root"
		plot.Diagrams = append(plot.Diagrams, close)
	}
	return Chart(plot)
}

// headText says what is plotted: the part by its title, where it has one of its
// own, and the load.
func headText(part *specimen.Part, f *verify.Finding) string {
	name := part.Title
	if name == "" {
		name = part.Name
	}
	return name + ", " + string(f.Load.Name)
}

// nominalNote says what stresses are multiples of; its formula is kept in one
// line.
func nominalNote(f *verify.Finding) string {
	n := f.Load.Nominal
	text := "nominal stress " + strings.ReplaceAll(n.Formula, " ", "\u00a0")
	if n.Section != "" {
		text += " (" + n.Section + ")"
	}
	return text
}

// steep is the depth at which half of what the notch adds to the nominal stress
// is gone.
func steep(s *verify.SectionProfile) float64 {
	for _, q := range s.Points {
		if q.Value < (s.Points[0].Value+1)/2 {
			return q.Depth
		}
	}
	return s.Length
}

func sectionDiagram(f *verify.Finding, part *specimen.Part, s *verify.SectionProfile, reach float64) Diagram {
	value, through := "first principal stress", "axial stress"
	switch {
	case f.Load.Shear:
		value, through = "shear stress", "shear stress around the axis"
	case !s.Across:
		through = "stress normal to the section"
	}
	d := Diagram{X: Axis{Label: "depth below the root", Unit: part.Unit, High: reach}, Y: stressAxis(value)}
	computed, passed := Curve{Label: value, Strong: true}, Curve{Label: through}
	apart := 0.0
	for _, q := range s.Points {
		computed.Points = append(computed.Points, CurvePoint{X: q.Depth, Y: q.Value})
		passed.Points = append(passed.Points, CurvePoint{X: q.Depth, Y: q.Through})
		apart = math.Max(apart, math.Abs(q.Value-q.Through))
	}
	d.Curves = []Curve{computed}
	const alike = 0.02 // of the peak: closer together two curves are one to the eye
	if apart > alike*s.Points[0].Value {
		d.Curves = append(d.Curves, passed)
	}
	d.Curves = append(append(d.Curves, references(s.References, reach)...), peakMark(f))
	return d.upTo(reach)
}

// stressAxis is the scale of stresses over the nominal stress.
func stressAxis(what string) Axis { return Axis{Label: what + " ÷ nominal"} }

// references are the curves that something computed is held against, each with
// a line of its own; not those that on an axis of the given reach would be too
// short to be told from what they are held against.
func references(list []verify.Reference, reach float64) []Curve {
	const least = 0.15 // of the axis
	lines := []LineKind{Dashed, Chain, Dotted}
	var curves []Curve
	for i, r := range list {
		if n := len(r.Points); n == 0 || r.Points[n-1].At < least*reach {
			continue
		}
		c := Curve{Label: r.Label, Line: lines[i%len(lines)]}
		for _, q := range r.Points {
			c.Points = append(c.Points, CurvePoint{X: q.At, Y: q.Value})
		}
		curves = append(curves, c)
	}
	return curves
}

// peakMark is the factor with its bar, at the root.
func peakMark(f *verify.Finding) Curve {
	e := f.Computed.Factor
	if !e.Status.Settled() {
		return Curve{}
	}
	return Curve{Label: number.Uncertain(e.Value, e.Uncertainty), Line: NoLine, Marked: true, Points: []CurvePoint{{Y: e.Value, Bar: e.Uncertainty}}}
}

// upTo cuts the curves off at the end of the x axis and lets the y axis begin at
// zero where nothing lies below it.
func (d Diagram) upTo(reach float64) Diagram {
	low, high := 0.0, 0.0
	for i := range d.Curves {
		c := &d.Curves[i]
		c.Points = cutOff(c.Points, reach)
		for _, p := range c.Points {
			low, high = math.Min(low, p.Y), math.Max(high, p.Y+p.bar())
		}
	}
	if low < 0 {
		low -= 0.05 * (high - low)
	}
	const headroom = 0.16 // for the factor above its mark
	d.Y.Low, d.Y.High = low, high+headroom*(high-low)
	return d
}

// cutOff ends a curve at a place.
func cutOff(ps []CurvePoint, reach float64) []CurvePoint {
	for i, p := range ps {
		if p.X <= reach || i == 0 {
			continue
		}
		before := ps[i-1]
		share := (reach - before.X) / (p.X - before.X)
		return append(ps[:i:i], CurvePoint{X: reach, Y: before.Y + share*(p.Y-before.Y)})
	}
	return ps
}

// SurfaceFigure plots the stress of a finding along the surface of the notch,
// against the arc length from the peak. The finding must hold the solution of its
// last rung.
func SurfaceFigure(f *verify.Finding, part *specimen.Part) (*Figure, error) {
	s, err := f.SurfaceProfile(part)
	if err != nil {
		return nil, err
	}
	first, last := s.Points[0].Arc, s.Points[len(s.Points)-1].Arc
	d := Diagram{X: Axis{Label: "length along the surface from the peak", Unit: part.Unit, Low: first, High: last}}
	if f.Load.Shear {
		d.Y = stressAxis("shear stress")
		d.Curves = []Curve{along(s, "shear stress", func(q verify.ProfilePoint) float64 { return q.Value })}
	} else {
		d.Y = stressAxis("stress on the surface")
		d.Curves = []Curve{
			along(s, "stress along the surface", func(q verify.ProfilePoint) float64 { return q.Along }),
			along(s, "von Mises stress", func(q verify.ProfilePoint) float64 { return q.VonMises }),
		}
		if hoopGoverns(s) {
			d.Curves = append(d.Curves, along(s, "first principal stress", func(q verify.ProfilePoint) float64 { return q.Value }))
		}
	}
	d.Curves[0].Strong = true
	d.Curves = append(append(d.Curves, references(s.References, 0)...), peakMark(f))
	const hair = 1e-6
	for _, end := range [2]struct {
		at   float64
		text string
	}{{s.From, " begins"}, {s.To, " ends"}} {
		if end.at > first+hair*(last-first) && end.at < last-hair*(last-first) {
			d.Stops = append(d.Stops, Stop{f.Computed.Peak.Side + end.text, end.at})
		}
	}
	return Chart(Plot{Title: headText(part, f) + ": stress along the notch",
		Note: dimensionText(part) + "; " + nominalNote(f) + "; peak " + peakPlace(f, part), Diagrams: []Diagram{d.upTo(last)}})
}

// along is a curve over the arc length of a profile.
func along(s *verify.SurfaceProfile, label string, of func(verify.ProfilePoint) float64) Curve {
	c := Curve{Label: label}
	for _, q := range s.Points {
		c.Points = append(c.Points, CurvePoint{X: q.Arc, Y: of(q)})
	}
	return c
}

// hoopGoverns tells whether the first principal stress is anywhere, to the eye,
// another than that along the surface.
func hoopGoverns(s *verify.SurfaceProfile) bool {
	largest, apart := 0.0, 0.0
	for _, q := range s.Points {
		largest = math.Max(largest, q.Value)
		if q.Along > 0 {
			apart = math.Max(apart, q.Value-q.Along)
		}
	}
	return apart > 0.02*largest
}

func peakPlace(f *verify.Finding, part *specimen.Part) string {
	return number.Decimal(f.Computed.Peak.ArcDegrees, 1) + "° " + part.AngleFrom()
}
