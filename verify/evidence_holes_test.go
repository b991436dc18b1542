package verify_test

import (
	"fmt"
	"math"
	"testing"

	"notchproof/fem"
	"notchproof/scf"
	"notchproof/verify/evidence"
)

// Kirsch's plate under every remote stress, hoop stresses along the whole hole,
// stresses and displacements everywhere.
func TestEvidenceKirsch(t *testing.T) {
	for _, row := range []struct {
		name   string
		remote scf.Plane
	}{
		{"tension", scf.Plane{XX: 1}},
		{"tension all around", scf.Plane{XX: 1, YY: 1}},
		{"tension and compression", scf.Plane{XX: 0.4, YY: -1}},
		{"shear", scf.Plane{XY: 1}},
	} {
		for _, model := range []fem.Model{fem.PlaneStress{}, fem.PlaneStrain{}} {
			k := scf.KirschPlate{Radius: 1, Remote: row.remote}
			p := evidence.KirschPlate(k, model)
			hoop, field, move := evidence.KirschMisses(solved(t, p), k)
			hold(t, fmt.Sprintf("%s, %s", row.name, model.Name()), evidence.KirschTolerance,
				reading{"largest miss of the hoop stress at the hole", hoop, 0},
				reading{"largest miss of stress", field, 0})
			if p.Pins == nil { // pinned, the plate turns against the formula
				hold(t, row.name, evidence.KirschTolerance, reading{"largest miss of displacement", move, 0})
			}
		}
	}
}

// Elliptic holes of every slenderness, in tension and in tension all around.
func TestEvidenceInglis(t *testing.T) {
	for _, b := range []float64{2, 1, 0.5, 0.2, 0.1} {
		for _, load := range []struct {
			name   string
			sx, sy float64
		}{{"tension", 0, 1}, {"tension all around", 1, 1}} {
			s := solved(t, evidence.InglisPlate(b, load.sx, load.sy))
			want := scf.InglisBiaxial(1, b, load.sy, load.sx)
			hold(t, fmt.Sprintf("ellipse 1 by %g, %s", b, load.name), evidence.InglisTolerance,
				reading{"stress at the tip", surfaceAt(t, s, 4, pt(1, 0)).Tangential, want})
		}
	}
}

// Spherical cavities for several Poisson's ratios, in tension and in tension all
// around.
func TestEvidenceGoodier(t *testing.T) {
	const tolerance = evidence.GoodierTolerance
	for _, nu := range []float64{0, 0.2, 0.3, 0.45} {
		s := solved(t, evidence.GoodierBody(nu, 1, 0))
		c := scf.Goodier(nu)
		equator, pole := surfaceAt(t, s, 4, pt(0, 1)), surfaceAt(t, s, 4, pt(1, 0))
		hold(t, fmt.Sprintf("cavity in tension, ν = %g", nu), tolerance,
			reading{"equator, along the load", equator.Tangential, c.EquatorMeridional},
			reading{"equator, around", equator.Hoop, c.EquatorHoop},
			reading{"pole, across", pole.Tangential, c.Pole},
			reading{"pole, around", pole.Hoop, c.Pole})

		s = solved(t, evidence.GoodierBody(nu, 1, 1))
		most, least := 0.0, math.Inf(1)
		for i, e := range s.Problem.Shape.Mesh.Boundary {
			if e.Side == 4 {
				q := s.Surface(i, 0.4)
				most, least = max(most, q.Tangential, q.Hoop), min(least, q.Tangential, q.Hoop)
			}
		}
		hold(t, fmt.Sprintf("cavity in tension all around, ν = %g", nu), tolerance,
			reading{"largest", most, scf.GoodierHydrostatic}, reading{"smallest", least, scf.GoodierHydrostatic})
	}
}
