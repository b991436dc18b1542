package verify

import (
	"fmt"
	"testing"

	"notchproof/scf"
	"notchproof/verify/specimen"
)

// closedForms are parts so large beside their notch that the factor is that of
// an infinite body to eight digits: what the edges change goes with the square
// of notch over part, with its cube about a cavity.
func closedForms(t *testing.T) []*calibrationCase {
	const wide = 20000
	var list []*calibrationCase
	add := func(family string, dims scf.Dims, load scf.Load, nu, truth float64) {
		f, _ := scf.Lookup(family)
		p, err := specimen.New(f, dims, "", scf.Options{Nu: nu})
		if err != nil {
			t.Fatal(err)
		}
		list = append(list, &calibrationCase{group: "closed forms", part: p, load: load, truth: truth})
	}
	for _, nu := range []float64{0, 0.3, 0.45} {
		// Kirsch 1898, Z. VDI 42, 797: 3 on the gross section.
		add("bar-hole", scf.Dims{"W": wide, "d": 1}, scf.Tension, nu, 3*(1-1./wide))
	}
	for _, ratio := range []float64{0.25, 0.5, 2, 4, 7} { // a/b
		// Inglis 1913, Trans. INA 55, 219: 1 + 2 a/b on the gross section.
		a := 1.0
		add("bar-ellipse", scf.Dims{"W": wide, "a": a, "b": a / ratio}, scf.Tension, 0.3, scf.Inglis(a, a/ratio)*(1-2*a/wide))
	}
	for _, nu := range []float64{0.2, 0.3} {
		// Goodier 1933, J. Appl. Mech. 55, 39: spherical cavity on the axis.
		p := readPart(t, fmt.Sprintf(`{"shape": {"model": "shaft", "outline": "M -4000 0 H -1 A 1 1 0 0 0 1 0 H 4000 V 1000 H -4000 Z", "nominal": {"x": -1500}}, "material": {"nu": %g}}`, nu))
		list = append(list, &calibrationCase{group: "closed forms", part: p, load: scf.Tension, truth: scf.Goodier(nu).EquatorMeridional})
		// The same in torsion: u_θ = α r x (1 + a⁵/4ρ⁵) is harmonic and leaves the
		// sphere free; the shear on it is 5/4 of that of the plain shaft at its radius.
		p = readPart(t, fmt.Sprintf(`{"shape": {"model": "shaft", "outline": "M -4000 0 H -1 A 1 1 0 0 0 1 0 H 4000 V 1000 H -4000 Z", "nominal": {"x": 0, "fibre": 1}}, "material": {"nu": %g}}`, nu))
		list = append(list, &calibrationCase{group: "closed forms", part: p, load: scf.Torsion, truth: 1.25})
	}
	return list
}
