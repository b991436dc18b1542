package strength

import (
	"fmt"
	"strings"

	"notchproof/verify/quantity"
)

// Material is what the part is made of, as far as strength goes. What was not
// given is zero.
type Material struct {
	Yield      quantity.Stress
	Tensile    quantity.Stress // strength
	Elongation float64         // after fracture, a share: 0.18
	Brittle    bool            // cast or otherwise without ductility, whatever the elongation
	Metal      Metal
	SlipLayer  float64 // thickness s_g of Siebel and Stieler, mm
}

// leastElongation is the elongation after fracture below which a metal is
// treated as brittle. Common practice.
const leastElongation = 0.05

// brittle tells that the largest principal stress is held against the tensile
// strength, not von Mises against yield. Grey iron breaks without yielding
// (common practice), whether anybody says so or not.
func (m *Material) brittle() bool {
	if m.Elongation == 0 && m.Metal == GreyIron {
		return true
	}
	return m.Brittle || m.Elongation > 0 && m.Elongation < leastElongation
}

// strength is what the equivalent stress is held against.
func (m *Material) strength() quantity.Stress {
	if m.brittle() {
		return m.Tensile
	}
	return m.Yield
}

func (m *Material) check() error {
	yield, tensile := m.Yield.Megapascals(), m.Tensile.Megapascals()
	switch {
	case m.Yield.Given() && !(yield > 0):
		return &Fault{"yield " + m.Yield.String() + ": not above zero", "give the yield stress, as in 355MPa"}
	case m.Tensile.Given() && !(tensile > 0):
		return &Fault{"tensile " + m.Tensile.String() + ": not above zero", "give the tensile strength, as in 510MPa"}
	case m.Elongation < 0 || m.Elongation > 1:
		return &Fault{fmt.Sprintf("elongation %g %%: not a share", 100*m.Elongation), "give the elongation after fracture, as in 18%"}
	case m.brittle() && !m.Tensile.Given():
		return &Fault{"no tensile strength of a brittle material", `give it with --tensile 250MPa, or "tensile" under "material" in the part file`}
	case !m.brittle() && !m.Yield.Given():
		return &Fault{"no yield stress", `give it with --yield 355MPa, or "yield" under "material" in the part file`}
	case m.Yield.Given() && m.Tensile.Given() && yield > tensile:
		return &Fault{"yield " + m.Yield.String() + " above tensile " + m.Tensile.String(), "a metal yields before it breaks: have the two been swapped?"}
	}
	return nil
}

// A Metal is a kind of metal as the rules for notch sensitivity divide them.
type Metal string

// The metals. The zero value is taken for steel.
const (
	Steel             Metal = "steel"
	Stainless         Metal = "stainless"
	CastSteel         Metal = "cast-steel"
	NodularIron       Metal = "nodular-iron"
	MalleableIron     Metal = "malleable-iron"
	GreyIron          Metal = "grey-iron"
	AnnealedAluminium Metal = "annealed-aluminium"
	HardenedAluminium Metal = "hardened-aluminium"
	CastAluminium     Metal = "cast-aluminium"
)

// Metals lists them.
func Metals() []Metal {
	return []Metal{Steel, Stainless, CastSteel, NodularIron, MalleableIron, GreyIron, AnnealedAluminium, HardenedAluminium, CastAluminium}
}

// ParseMetal reads the name of a metal. The error is a *Fault.
func ParseMetal(name string) (Metal, error) {
	var names []string
	for _, m := range Metals() {
		if string(m) == name {
			return m, nil
		}
		names = append(names, string(m))
	}
	return "", &Fault{fmt.Sprintf("%.40q: no such metal", name), "the metals are " + strings.Join(names, ", ")}
}
