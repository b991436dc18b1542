package strength

import (
	"math"

	"notchproof/fem"
	"notchproof/mesh/outline"
	"notchproof/verify"
	"notchproof/verify/specimen"
)

// Sensitivity is how much of a load's factor is felt by fluctuating loads. It
// is a first step: nothing here is a fatigue strength or a life.
type Sensitivity struct {
	Load        *specimen.Load
	Shaft       bool
	Factor      float64 // Kt or Kts
	Uncertainty float64
	Radius      float64 // of curvature at the peak, mm; 0: none, the peak is not on a concave curve
	Gradient    float64 // |dσ/dn|/σ at the peak, 1/mm
	GradientBar float64 // what one order less changes it by
	Rules       []Reduced
}

// Reduced is the effective factor Kf by one rule.
type Reduced struct {
	Rule     string
	Factor   float64
	Detail   string // what it came from: "q = 0.87"
	Source   string
	Covers   string // metals and range
	Sureness string
	Missing  string // why there is no factor; empty where there is
}

func (q *Question) sensitivity(checked *verify.Result, s *solved) []Sensitivity {
	var list []Sensitivity
	for i := range checked.Findings {
		f := &checked.Findings[i]
		peak, gradient, bar := q.gradient(f.Load, s.fine.parts[i].solution, s.coarse.parts[i].solution)
		mm := q.millimetres()
		one := Sensitivity{
			Load: f.Load, Shaft: q.shaft(), Factor: f.Computed.Factor.Value, Uncertainty: f.Computed.Factor.Uncertainty,
			Radius: q.radius(s.fine.side(peak), peak) * mm, Gradient: gradient / mm, GradientBar: bar / mm,
		}
		one.Rules = q.Material.rules(&one)
		list = append(list, one)
	}
	return list
}

// gradient is the relative gradient at a load's peak by the finer solution, and
// how far the coarser one is from it.
func (q *Question) gradient(l *specimen.Load, fine, coarse *fem.Solution) (peak fem.SurfacePoint, value, bar float64) {
	peak = fine.Maxima(q.Part.Notch, verify.Quantity(l))[0]
	value = relativeGradient(fine, peak, l.Shear)
	before := coarse.Maxima(q.Part.Notch, verify.Quantity(l))[0]
	return peak, value, math.Abs(value - relativeGradient(coarse, before, l.Shear))
}

// radius is the radius of curvature of a concave side at a point, in the part's
// unit; 0 where the side is straight or bulges.
func (q *Question) radius(side int, p fem.SurfacePoint) float64 {
	c := q.Part.Region.Sides()[side].Curve
	k := outline.Curvature(c, c.Nearest(p.At))
	if !(k < 0) {
		return 0
	}
	return -1 / k
}
