package main

import (
	"fmt"
	"math"
	"strings"

	"notchproof/render"
	"notchproof/render/number"
	"notchproof/verify"
	"notchproof/verify/strength"
)

// utilisation turns a result into what is drawn: the equivalent stress of all
// loads over the strength, at the angle around a shaft, or in the half of a bar,
// where the governing place of the notch is nearest.
func utilisation(r *strength.Result, d *drawing) *verify.Result {
	d.o.Field, d.o.Reference = render.FieldMises, "yield stress"
	if r.Brittle {
		d.o.Field, d.o.Reference = render.FieldPrincipal, "tensile strength"
	}
	turn := 1.0
	if math.Cos(r.Notch().Degrees*math.Pi/180) < 0 {
		turn = -1
	}
	for _, f := range r.Fields {
		scale := f.Nominal / r.Strength
		switch {
		case f.Turning:
			scale *= turn
		case f.Load.Shear && len(r.Fields) == 1 && !r.Brittle:
			scale *= math.Sqrt(3) // of a shaft that is twisted alone the shear is drawn
		}
		d.o.Terms = append(d.o.Terms, render.Term{Solution: f.Solution, Load: f.Load, Scale: scale})
	}
	d.o.Rows = pictureRows(r, turn)
	return &r.Checked
}

// pictureRows is what the title block says.
func pictureRows(r *strength.Result, turn float64) [][]string {
	b := &strengthSheet{Result: r}
	n, g := r.Notch(), r.Governing()
	drawn := b.equivalent() + " ÷ " + map[bool]string{false: "yield stress", true: "tensile strength"}[r.Brittle] + ", all loads added"
	means := []string{drawn}
	off := math.Abs(math.Remainder(n.Degrees, 180))
	switch shaft := r.Part().Loads[0].Model.Revolved(); {
	case shaft && turn < 0:
		means = append(means, fmt.Sprintf("drawn is the half at 180° from the tensile side of bending; the governing place lies %.0f° around from it", off))
	case shaft:
		means = append(means, fmt.Sprintf("drawn is the half on the tensile side of bending; the governing place lies %.0f° around from it", off))
	case turn < 0:
		means = append(means, "drawn is the lower half, turned up")
	}
	answer := []string{fmt.Sprintf("safety %s on the %s", number.Significant(g.Safety.Value, 3), g.Name),
		"notch, computed: " + b.uncertain(n.Equivalent, n.Uncertainty)}
	for i := range r.Hand {
		if h := &r.Hand[i]; len(h.Missing) == 0 {
			answer = append(answer, fmt.Sprintf("by hand, %s: %s", h.With, b.uncertain(h.Equivalent, h.Uncertainty)))
		}
	}
	if r.Question.Required > 0 {
		answer = append(answer, "required "+number.Compact(r.Question.Required, 4)+": "+map[strength.Decision]string{
			strength.Met: "met", strength.NotMet: "not met", strength.Undecided: "undecided"}[r.Decision])
	}
	return [][]string{
		{loadsText(&r.Question), strings.Join(b.metal(), ", ")},
		answer,
		means,
	}
}
