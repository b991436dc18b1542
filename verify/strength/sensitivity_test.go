package strength

import (
	"math"
	"testing"

	"notchproof/scf"
	"notchproof/verify/quantity"
	"notchproof/verify/specimen"
)

// TestNeuber: rows of the table, between them straight lines, and an end.
func TestNeuber(t *testing.T) {
	for _, row := range []struct {
		metal Metal
		kpsi  float64
		want  float64 // √a, in^0.5
	}{{Steel, 50, .130}, {Steel, 100, .062}, {"", 240, .009}, {Steel, 65, .1005}, {AnnealedAluminium, 22.5, .2405}, {HardenedAluminium, 90, .122}} {
		got, ok := neuberRoot(neuberTable(row.metal), row.kpsi*kpsi)
		if !ok {
			t.Errorf("%s at %g kpsi: out of range", row.metal, row.kpsi)
		}
		near(t, "√a", got, row.want*math.Sqrt(25.4), 1e-9)
		near(t, "√a with the factor as it is quoted", got, row.want*5.04, 1e-4)
	}
	for _, outside := range []float64{49.9, 240.1} {
		if _, ok := neuberRoot(neuberTable(Steel), outside*kpsi); ok {
			t.Errorf("%g kpsi is in range", outside)
		}
	}
	// q = 1/(1 + 0.062/√0.1) = 0.83607 at a radius of a tenth of an inch.
	m := Material{Tensile: quantity.Megapascals(100 * kpsi)}
	r := m.neuber(&Sensitivity{Load: &specimen.Load{}, Factor: 3, Radius: 2.54})
	near(t, "Kf", r.Factor, 1+2*0.83607, 1e-5)
}

// TestSupport works the support factors out for one gradient in each stretch.
func TestSupport(t *testing.T) {
	m := Material{Yield: quantity.Megapascals(356), Tensile: quantity.Megapascals(540), SlipLayer: 0.05}
	for _, row := range []struct{ g, fkm, din float64 }{
		// 540/2700 = 0.2: 10^−0.2 = 0.630957, 10^−0.7 = 0.199526;
		// 0.33 + 356/712 = 0.83: 10^−0.83 = 0.147911.
		{0.04, 1 + 0.04*0.630957, 1 + 0.2*0.147911},
		{0.25, 1 + 0.5*0.199526, 1 + 0.5*0.147911},
		{16, 1 + 2*0.199526, 1 + 4*0.147911},
	} {
		s := Sensitivity{Load: &specimen.Load{}, Shaft: true, Factor: 2, Gradient: row.g}
		near(t, "FKM", 2/m.fkm(&s).Factor, row.fkm, 1e-5)
		near(t, "DIN 743-2", 2/m.din743(&s).Factor, row.din, 1e-5)
		near(t, "Siebel and Stieler", 2/m.siebelStieler(&s).Factor, 1+math.Sqrt(0.05*row.g), 1e-12)
	}
	if r := m.fkm(&Sensitivity{Factor: 2, Gradient: 101}); r.Missing == "" {
		t.Error("FKM beyond G = 100")
	}
}

// Whatever the rule, the effective factor lies between 1 and the theoretical
// one, and rules that lack something say so.
func TestEffectiveFactors(t *testing.T) {
	p := family(t, "shaft-shoulder", scf.Dims{"D": 72, "d": 48, "r": 3})
	q := Question{Part: p, Bending: quantity.NewtonMillimetres(1e5), Torque: quantity.NewtonMillimetres(1e5)}
	found := answer(t, q).Sensitivity
	for _, metal := range Metals() {
		m := Material{Yield: quantity.Megapascals(350), Tensile: quantity.Megapascals(500), Metal: metal}
		for _, s := range found {
			for _, r := range m.rules(&s) {
				if (r.Missing == "") == (r.Factor == 0) || r.Missing == "" && !(r.Factor > 1 && r.Factor < s.Factor) {
					t.Errorf("%s, %s: %+v of %g", metal, s.Load.Name, r, s.Factor)
				}
			}
		}
	}
	for _, r := range (&Material{Yield: quantity.Megapascals(350)}).rules(&found[0]) {
		if (r.Rule == "DIN 743-2") != (r.Missing == "") {
			t.Errorf("without a tensile strength: %+v", r)
		}
	}
}

// The gradient of a shoulder scales with its size, and is near the handbook's
// 2.3/r (1 + φ) for tension, φ = 1/(4√(t/r) + 2) (unchecked).
func TestGradientScales(t *testing.T) {
	small := answer(t, Question{Part: family(t, "shaft-shoulder", scf.Dims{"D": 72, "d": 48, "r": 3}), Axial: quantity.Newtons(1e3)}).Sensitivity[0]
	large := answer(t, Question{Part: family(t, "shaft-shoulder", scf.Dims{"D": 144, "d": 96, "r": 6}), Axial: quantity.Newtons(1e3)}).Sensitivity[0]
	near(t, "gradient of twice the size", 2*large.Gradient, small.Gradient, 1e-6)
	phi := 1 / (4*math.Sqrt(12.0/3) + 2)
	near(t, "gradient", small.Gradient, 2.3*(1+phi)/3, 0.15)
}
