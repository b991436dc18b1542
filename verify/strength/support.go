package strength

import (
	"fmt"
	"math"
)

// The rules that divide the factor by a support factor n ≥ 1 which grows with
// the relative gradient G (1/mm) of the stress: E. Siebel, M. Stieler (1955) and
// two later rules after them. The coefficients are from memory and could not be
// held against a second copy.
const unchecked = "unchecked"

// rules lists what every rule makes of a load's factor.
func (m *Material) rules(s *Sensitivity) []Reduced {
	list := []Reduced{m.neuber(s), m.fkm(s), m.din743(s)}
	if m.SlipLayer > 0 {
		list = append(list, m.siebelStieler(s))
	}
	return list
}

// siebelStieler is n = 1 + √(s_g G) with the thickness s_g of the slip layer,
// which is the user's to know.
func (m *Material) siebelStieler(s *Sensitivity) Reduced {
	r := Reduced{Rule: "Siebel-Stieler", Source: "E. Siebel, M. Stieler (1955)", Covers: fmt.Sprintf("the metal whose slip layer is %.3g mm", m.SlipLayer), Sureness: unchecked}
	r.support(s, 1+math.Sqrt(m.SlipLayer*s.Gradient))
	return r
}

// din743 is n = 1 + √(G mm) 10^−(0.33 + Re/712 MPa).
func (m *Material) din743(s *Sensitivity) Reduced {
	r := Reduced{Rule: "DIN 743-2", Source: "DIN 743-2, Tragfähigkeitsberechnung von Wellen und Achsen", Covers: "shafts of steel", Sureness: unchecked}
	switch {
	case !s.Shaft:
		r.Missing = "for shafts alone"
	case m.Metal != "" && m.Metal != Steel:
		r.Missing = "for steel alone"
	case !m.Yield.Given():
		r.Missing = "needs the yield stress"
	default:
		n := 1 + math.Sqrt(s.Gradient)*math.Pow(10, -(0.33+m.Yield.Megapascals()/712))
		r.support(s, n)
	}
	return r
}

// fkmConstants are a_G and b_G (MPa).
func fkmConstants(m Metal) (a, b float64) {
	switch m {
	case Stainless:
		return 0.4, 2400
	case CastSteel:
		return 0.25, 2000
	case NodularIron:
		return 0.05, 3200
	case MalleableIron, GreyIron, CastAluminium:
		return -0.05, 3200
	case AnnealedAluminium, HardenedAluminium:
		return 0.05, 850
	}
	return 0.5, 2700
}

// fkm is the support factor of the FKM guideline, in three stretches of G.
func (m *Material) fkm(s *Sensitivity) Reduced {
	r := Reduced{Rule: "FKM", Source: "FKM-Richtlinie, Rechnerischer Festigkeitsnachweis für Maschinenbauteile, 6th ed.",
		Covers: m.Metal.text() + ", G up to 100/mm", Sureness: unchecked}
	if !m.Tensile.Given() {
		r.Missing = "needs the tensile strength"
		return r
	}
	a, b := fkmConstants(m.Metal)
	size := func(shift float64) float64 { return math.Pow(10, -(a - shift + m.Tensile.Megapascals()/b)) }
	switch g := s.Gradient; {
	case g <= 0.1:
		r.support(s, 1+g*size(0.5))
	case g <= 1:
		r.support(s, 1+math.Sqrt(g)*size(0))
	case g <= 100:
		r.support(s, 1+math.Sqrt(math.Sqrt(g))*size(0))
	default:
		r.Missing = fmt.Sprintf("G = %.3g/mm is beyond 100/mm", g)
	}
	return r
}

func (r *Reduced) support(s *Sensitivity, n float64) {
	r.Factor = s.Factor / n
	r.Detail = fmt.Sprintf("n = %.3f, G = %.3g/mm", n, s.Gradient)
}
