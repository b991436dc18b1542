package scf

import (
	"math"
	"testing"
)

// exactValue evaluates one row of exact.csv.
func exactValue(t *testing.T, row []string) float64 {
	t.Helper()
	opt := func(s string) float64 {
		if s == "" {
			return math.NaN() // a solution that needs it would show it
		}
		return mustFloat(t, s)
	}
	arg, nu := opt(row[2]), opt(row[3])
	switch row[0] {
	case "circular hole":
		remote := map[string]Plane{
			"uniaxial tension":    {XX: 1},
			"equibiaxial tension": {XX: 1, YY: 1},
			"pure shear":          {XY: 1},
		}[row[1]]
		return largestHoop(KirschPlate{Radius: 2, Remote: remote})
	case "elliptic hole":
		return Inglis(arg, 1)
	case "spherical cavity":
		normal, shear := GoodierShear(nu)
		return map[string]float64{
			"tension, equator meridional": Goodier(nu).EquatorMeridional,
			"tension, equator hoop":       Goodier(nu).EquatorHoop,
			"tension, pole":               Goodier(nu).Pole,
			"shear, normal":               normal,
			"shear, shear":                shear,
		}[row[1]]
	case "deep plane notches":
		return map[string]float64{
			"tension": NeuberPlaneTension(arg),
			"bending": NeuberPlaneBending(arg),
		}[row[1]]
	case "deep round groove":
		return map[string]float64{
			"tension": NeuberRoundTension(arg, nu),
			"bending": NeuberRoundBending(arg, nu),
			"torsion": NeuberRoundTorsion(arg),
		}[row[1]]
	case "Williams exponent":
		modeI, modeII := Williams(arg)
		return map[string]float64{"mode I": modeI, "mode II": modeII}[row[1]]
	}
	t.Fatalf("unknown case %q", row[0])
	return 0
}

// largestHoop scans the edge of the hole in steps of a degree, which holds all
// the peaks of the three plain loads.
func largestHoop(k KirschPlate) float64 {
	most := math.Inf(-1)
	for deg := range 360 {
		most = math.Max(most, k.Stress(k.Radius, radians(float64(deg))).Hoop)
	}
	return most
}

// The closed forms give the independent values to their six digits.
func TestExactValues(t *testing.T) {
	const half = 5.01e-6
	rows := readTable(t, "exact.csv")
	for _, row := range rows {
		want := mustFloat(t, row[4])
		if got := exactValue(t, row); !(math.Abs(got-want) <= half*math.Max(math.Abs(want), 0.1)) {
			t.Errorf("%v: got %.8g", row[:5], got)
		}
	}
	if len(rows) < 100 {
		t.Errorf("only %d rows", len(rows))
	}
}
