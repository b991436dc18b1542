package scf

import "math"

// Nominal is the stress that a factor is referred to.
type Nominal struct {
	Section string // the section in words: "net, at the smaller diameter d"
	Formula string // the stress in the load P, M or T: "32 M / (π d³)"

	// Stress under the load 1 (P, M or T) and, for bars, the thickness 1: on
	// the section that the factor is referred to, and on the gross section.
	// A factor on the gross section is the one on the net section times
	// Net / Gross.
	Net, Gross float64

	Notes    []string // conventions to be printed with the factor
	Warnings []string // where the convention misleads for this shape
}

// Nominal stresses under a unit load, thickness 1. Elementary strength of
// materials, no source needed.

func barTension(width float64) float64 { return 1 / width }
func barBending(width float64) float64 { return 6 / (width * width) }

func shaftTension(diameter float64) float64 { return 4 / (math.Pi * diameter * diameter) }
func shaftBending(diameter float64) float64 {
	return 32 / (math.Pi * diameter * diameter * diameter)
}
func shaftTorsion(diameter float64) float64 {
	return 16 / (math.Pi * diameter * diameter * diameter)
}

// barNominal is the convention of all bars whose net section is one strip of
// width d.
func barNominal(load Load, D, d float64) Nominal {
	n := Nominal{Section: "net, at the smaller width d"}
	switch load {
	case Tension:
		n.Formula, n.Net, n.Gross = "P / (d t)", barTension(d), barTension(D)
	case Bending:
		n.Formula, n.Net, n.Gross = "6 M / (d² t)", barBending(d), barBending(D)
	default:
		panic("scf: load that bars do not carry")
	}
	return n
}

// shaftNominal is the convention of all shafts.
func shaftNominal(load Load, D, d float64) Nominal {
	n := Nominal{Section: "net, at the smaller diameter d"}
	switch load {
	case Tension:
		n.Formula, n.Net, n.Gross = "4 P / (π d²)", shaftTension(d), shaftTension(D)
	case Bending:
		n.Formula, n.Net, n.Gross = "32 M / (π d³)", shaftBending(d), shaftBending(D)
	case Torsion:
		n.Formula, n.Net, n.Gross = "16 T / (π d³)", shaftTorsion(d), shaftTorsion(D)
	default:
		panic("scf: unknown load")
	}
	return n
}
