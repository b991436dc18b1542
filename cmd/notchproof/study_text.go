package main

import (
	"fmt"
	"io"
	"math"
	"strings"

	"notchproof/render"
	"notchproof/render/number"
	"notchproof/verify"
)

// writeStudy prints the table and what it comes to.
func writeStudy(w io.Writer, s *verify.Study, st style) error {
	var b strings.Builder
	fmt.Fprintf(&b, "%s  %s\n%s, nominal stress %s (%s)\n\n", st.bold(s.Part.Name), dimensionText(s.Part),
		st.bold(string(s.Load.Name)), s.Load.Nominal.Formula, s.Load.Nominal.Section)
	rungsText(&b, s)
	e := s.Estimate
	switch {
	case !e.Status.Settled():
		fmt.Fprintf(&b, "\n%s\n", st.weak("no limit: "+e.Status.String()))
	case s.Sizes != nil:
		fmt.Fprintf(&b, "\nobserved order %.2f (%s); extrapolated limit %.6f\ngrid convergence index of the finest mesh %s, with the traction left on its surface its factor is %s\n",
			s.Sizes.Order, e.Status, s.Sizes.Limit, number.Percent(s.Sizes.GCI, 3), number.Uncertain(e.Value, e.Uncertainty))
	default:
		fmt.Fprintf(&b, "\none order more leaves about %.2f of the error (%s); the factor is %s\n", e.Order, e.Status, number.Uncertain(e.Value, e.Uncertainty))
	}
	for _, line := range s.Says() {
		fmt.Fprintf(&b, "%s\n", line)
	}
	for _, note := range e.Notes {
		fmt.Fprintf(&b, "note: %s\n", note)
	}
	_, err := io.WriteString(w, b.String())
	return err
}

// bySizeOfElements tells that the rungs are told by the size of their elements at
// the peak: a corner has no arc to count them on.
func bySizeOfElements(s *verify.Study) bool { return s.SizeAsked > 0 || s.Endless() }

func rungsText(b *strings.Builder, s *verify.Study) {
	fine, note := "per 90°", ""
	if bySizeOfElements(s) {
		fine = "at peak"
	}
	fmt.Fprintf(b, "%5s %10s %8s %9s %12s %11s %9s %9s\n", "order", "triangles", fine, "unknowns", "factor", "change", "observed", "traction")
	for _, r := range s.Rows {
		if note = ""; r.Blind {
			note = "  root left out"
		}
		fmt.Fprintf(b, "%5d %10d %8s %9d %12.7f %11s %9s %9.1e%s\n", r.Order, r.Triangles, fineness(s, r), r.Unknowns, r.Factor,
			orNothing("%+.2e", r.Change), orNothing("%.2f", r.ObservedOrder), r.Leftover, note)
	}
}

// fineness is how fine a rung is at the notch.
func fineness(s *verify.Study, r verify.StudyRow) string {
	if bySizeOfElements(s) {
		return orNothing("%.3g", r.Size)
	}
	return fmt.Sprintf("%.1f", r.PerQuarter)
}

func orNothing(format string, v float64) string {
	if math.IsNaN(v) || math.IsInf(v, 0) {
		return "–"
	}
	return fmt.Sprintf(format, v)
}

// plotOf is a study as it is plotted. The dashed slope is the power of the size
// with which the changes are expected to go: surface stresses of elements of
// order p converge with h^p, those at a sharp corner grow with its exponent.
func plotOf(s *verify.Study) render.Study {
	p := render.Study{Title: s.Part.Name + ", " + string(s.Load.Name), Note: dimensionText(s.Part), Limit: math.NaN(), Uncertainty: math.NaN()}
	if s.Estimate.Status.Settled() {
		p.Limit, p.Uncertainty = s.Estimate.Value, s.Estimate.Uncertainty
		if s.Sizes != nil {
			p.Limit = s.Sizes.Limit
		}
	} else {
		p.Title += ": no limit, " + s.Estimate.Status.String()
	}
	if says := s.Says(); len(says) > 0 {
		p.Note += "; " + strings.Join(says, "; ")
	}
	if s.Sizes != nil {
		p.Order = float64(s.Rows[0].Order)
		if s.Endless() {
			p.Order = s.Corners[0].Measured
		}
	}
	for _, r := range s.Rows {
		label := fmt.Sprintf("order %d", r.Order)
		switch {
		case s.Sizes != nil && bySizeOfElements(s):
			label = number.Length(round(r.Size, 3), s.Part.Unit)
		case s.Sizes != nil:
			label = fmt.Sprintf("%.3g per 90°", r.PerQuarter)
		}
		p.Points = append(p.Points, render.StudyPoint{Label: label, Unknowns: r.Unknowns, Factor: r.Factor, Change: math.Abs(r.Change), Traction: r.Leftover})
	}
	return p
}
