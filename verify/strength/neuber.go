package strength

import (
	"fmt"
	"math"
	"sort"
)

// A neuberRow is Neuber's constant for one tensile strength.
type neuberRow struct{ kpsi, rootInch float64 }

// neuberTable is √a (in^0.5) against the tensile strength (kpsi) for the
// constant a of H. Neuber (Kerbspannungslehre, Springer 1937, 2nd ed. 1958), as
// tabulated in handbooks. √a in mm^0.5 is √25.4 times as much.
func neuberTable(metal Metal) []neuberRow {
	switch metal {
	case Steel, "":
		return []neuberRow{{50, .130}, {55, .118}, {60, .108}, {70, .093}, {80, .080}, {90, .070}, {100, .062}, {110, .055},
			{120, .049}, {130, .044}, {140, .039}, {160, .031}, {180, .024}, {200, .018}, {220, .013}, {240, .009}}
	case AnnealedAluminium:
		return []neuberRow{{10, .500}, {15, .341}, {20, .264}, {25, .217}, {30, .180}, {35, .152}, {40, .126}, {45, .111}}
	case HardenedAluminium:
		return []neuberRow{{15, .475}, {20, .380}, {30, .278}, {40, .219}, {50, .186}, {60, .162}, {70, .144}, {80, .131}, {90, .122}}
	}
	return nil
}

const kpsi = 6.894757293168361 // MPa: 4448.2216152605 N on the square inch of 25.4 mm, exact but for rounding

// neuberRoot is √a in mm^0.5, between the rows of the table by straight lines;
// ok is false beyond its ends.
func neuberRoot(table []neuberRow, tensile float64) (root float64, ok bool) {
	x := tensile / kpsi
	i := sort.Search(len(table), func(i int) bool { return table[i].kpsi >= x })
	switch {
	case i == len(table):
		return 0, false
	case i == 0 && x < table[0].kpsi:
		return 0, false
	case i == 0:
		return math.Sqrt(25.4) * table[0].rootInch, true
	}
	a, b := table[i-1], table[i]
	share := (x - a.kpsi) / (b.kpsi - a.kpsi)
	return math.Sqrt(25.4) * (a.rootInch + share*(b.rootInch-a.rootInch)), true
}

// neuber is Kf = 1 + q (Kt − 1) with q = 1/(1 + √a/√r).
func (m *Material) neuber(s *Sensitivity) Reduced {
	table := neuberTable(m.Metal)
	r := Reduced{
		Rule: "Neuber", Source: "H. Neuber, Kerbspannungslehre, 2nd ed., Springer 1958; √a as tabulated in handbooks",
		Sureness: "sure",
	}
	switch {
	case table == nil:
		r.Missing = "no constant is tabulated for " + m.Metal.text()
		return r
	case !m.Tensile.Given():
		r.Missing = "needs the tensile strength"
		return r
	case s.Radius == 0:
		r.Missing = "needs a radius, and the peak does not lie on a concave curve"
		return r
	}
	low, high := table[0].kpsi*kpsi, table[len(table)-1].kpsi*kpsi
	r.Covers = fmt.Sprintf("%s, tensile strength %.0f to %.0f MPa", m.Metal.text(), math.Ceil(low), math.Floor(high))
	if s.Load.Shear {
		r.Covers += "; a table for direct stress"
	}
	root, ok := neuberRoot(table, m.Tensile.Megapascals())
	if !ok {
		r.Missing = "tensile strength out of the table's range"
		return r
	}
	q := 1 / (1 + root/math.Sqrt(s.Radius))
	r.Factor = 1 + q*(s.Factor-1)
	r.Detail = fmt.Sprintf("q = %.3f, √a = %.3f √mm, r = %.3g mm", q, root, s.Radius)
	return r
}

func (m Metal) text() string {
	if m == "" {
		return string(Steel)
	}
	return string(m)
}
