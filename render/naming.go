package render

import (
	"strings"

	"notchproof/render/number"
	"notchproof/scf"
	"notchproof/verify"
	"notchproof/verify/specimen"
)

// titleText says what a part is.
func titleText(part *specimen.Part) string {
	switch {
	case part.Title != "":
		return part.Title
	case part.Family != nil:
		return part.Family.Title
	}
	return "part of its own outline"
}

// round tells shafts from bars, also for outlines that belong to no family.
func round(part *specimen.Part) bool {
	if part.Family != nil {
		return part.Family.Kind == scf.Shaft
	}
	for _, l := range part.Loads {
		return l.Model.Revolved()
	}
	return false
}

// dimensionText lists the dimensions that were given, in the family's order.
func dimensionText(part *specimen.Part) string {
	if part.Family == nil {
		return part.Name + ", " + overallText(part) + ", " + unitText(part.Unit)
	}
	var list []string
	for _, d := range part.Family.Dimensions {
		v, given := part.Given[d.Name]
		switch {
		case !given:
		case d.Angle:
			list = append(list, d.Name+" = "+number.Length(v, "")+"°")
		default:
			list = append(list, d.Name+" = "+number.Length(v, ""))
		}
	}
	text := part.Name + ": " + strings.Join(list, ", ")
	if part.Unit != "" {
		text += " (" + part.Unit + ")"
	}
	return text
}

func unitText(unit string) string {
	if unit == "" {
		return "all lengths in one unnamed unit"
	}
	return "all lengths in " + unit
}

func loadText(l *specimen.Load) string {
	switch l.Name {
	case scf.Tension:
		return "tension, axial force P"
	case scf.Bending:
		return "bending, moment M"
	case scf.Torsion:
		return "torsion, torque T"
	}
	return string(l.Name)
}

func nominalText(l *specimen.Load) string {
	text := "nominal stress " + l.Nominal.Formula
	if l.Nominal.Section != "" {
		text += " (" + l.Nominal.Section + ")"
	}
	return text
}

func verdictText(v verify.Verdict) string {
	switch v {
	case verify.Agrees:
		return "agrees"
	case verify.Disagrees:
		return "disagrees"
	case verify.OutOfRange:
		return "out of range"
	case verify.NothingToCompare:
		return "nothing to compare"
	}
	return "undecided"
}

func capitals(text string) string { return strings.ToUpper(text) }
