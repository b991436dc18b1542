package quantity

import (
	"math"
	"math/big"
	"strconv"
	"strings"
)

// A kind is what a quantity measures.
type kind struct {
	name  string // with its article
	units []unit // the first is the one that calculations use
	names string // of the units, for hints
	such  string // an example
	least float64
	most  float64 // sizes in the first unit between which parts of machines lie
}

// A unit is a name with the ratio to its kind's first unit, an exact decimal
// number, or the quotient of two.
type unit struct {
	name  string
	ratio string
}

const (
	lbf = "4.4482216152605" // N
	kip = "4448.2216152605" // N, 1000 lbf
)

// psi is lbf on the square of an inch of 25.4 mm, in N/mm² = MPa.
const psi = lbf + "/645.16"

func forces() kind {
	return kind{
		name: "a force", names: "N, kN, MN, lbf or kip", such: "12kN", least: 1e-9, most: 1e12,
		units: []unit{{"N", "1"}, {"kN", "1e3"}, {"MN", "1e6"}, {"lbf", lbf}, {"kip", kip}},
	}
}

func moments() kind {
	return kind{
		name: "a moment", names: "N·m, N·mm, kN·m, lbf·in, lbf·ft or kip·in", such: "300N·m", least: 1e-9, most: 1e15,
		units: []unit{
			{"N·mm", "1"}, {"N·m", "1e3"}, {"kN·m", "1e6"}, {"kN·mm", "1e3"}, {"MN·m", "1e9"},
			{"lbf·in", "112.9848290276167"}, {"lbf·ft", "1355.8179483314004"},
			{"kip·in", "112984.8290276167"}, {"kip·ft", "1355817.9483314004"},
		},
	}
}

func stresses() kind {
	return kind{
		name: "a stress", names: "MPa, N/mm², GPa, kPa, Pa, psi or ksi", such: "355MPa", least: 1e-9, most: 1e9,
		units: []unit{
			{"MPa", "1"}, {"N/mm²", "1"}, {"GPa", "1e3"}, {"kPa", "1e-3"}, {"Pa", "1e-6"},
			{"psi", psi}, {"ksi", kip + "/645.16"},
		},
	}
}

// find looks a unit up as people write it: with any sign of multiplication or
// none, either factor first, ^2 for ².
func (k kind) find(written string) (unit, bool) {
	plain := folded(written)
	for _, u := range k.units {
		name := folded(u.name)
		first, second, product := strings.Cut(u.name, "·")
		if plain == name || product && plain == second+first && imperial(first) {
			return u, true
		}
	}
	return unit{}, false
}

// imperial: in·lbf is as common as lbf·in, while mN would be a millinewton.
func imperial(force string) bool { return force == "lbf" || force == "kip" }

// folded leaves the letters of a unit.
func folded(name string) string {
	return strings.NewReplacer("·", "", "⋅", "", "*", "", "×", "", ".", "", "-", "", " ", "", "\u00a0", "", "^2", "²", "mm2", "mm²").Replace(name)
}

func (u unit) exact() *big.Rat {
	over, under, quotient := strings.Cut(u.ratio, "/")
	r := rational(over)
	if quotient {
		r.Quo(r, rational(under))
	}
	return r
}

func rational(decimal string) *big.Rat {
	r, ok := new(big.Rat).SetString(decimal)
	if !ok {
		panic("quantity: ratio that is no decimal number")
	}
	return r
}

// convert takes a finite value from one unit to another. The decimal number is
// multiplied as it reads and rounded once.
func convert(value float64, from, to unit) float64 {
	if from == to || value == 0 || math.IsNaN(value) || math.IsInf(value, 0) {
		return value
	}
	x := rational(strconv.FormatFloat(value, 'g', -1, 64))
	x.Mul(x, from.exact())
	converted, _ := x.Quo(x, to.exact()).Float64()
	return converted
}
