package evidence

import (
	"context"
	"fmt"

	"notchproof/scf"
	"notchproof/verify"
	"notchproof/verify/specimen"
)

// wedges: exponents of the stress at sharp notches, measured on meshes that are
// graded into the corner. Six decimals of λ are the roots of Williams' equations.
func wedges() Case {
	rows := []struct {
		family string
		load   scf.Load
		angle  float64
		value  float64
	}{
		{"bar-edge-notch", scf.Bending, 60, 0.512221 - 1}, {"bar-edge-notch", scf.Bending, 120, 0.615731 - 1},
		{"bar-notch", scf.Tension, 90, 0.544484 - 1}, {"shaft-groove", scf.Torsion, 90, -1. / 3},
	}
	c := Case{Name: "exponents of sharp notches", Source: "M. L. Williams, J. Appl. Mech. 19 (1952) 526; torsion π/w − 1", Sureness: Exact}
	for _, r := range rows {
		c.Expected = append(c.Expected, Expected{What: fmt.Sprintf("%s %g°, %s", r.family, r.angle, r.load), Value: r.value, Accuracy: half(6)})
	}
	c.Compute = func(ctx context.Context) ([]Got, error) {
		var list []Got
		for _, r := range rows {
			f, _ := scf.Lookup(r.family)
			p, err := specimen.New(f, scf.Dims{"D": 60, "d": 40, "r": 0, "angle": r.angle}, "mm", scf.Options{Nu: 0.3})
			if err != nil {
				return nil, err
			}
			found, err := verify.Corners(ctx, p, r.load, 1)
			if err != nil {
				return nil, err
			}
			if len(found) != 1 {
				return nil, fmt.Errorf("%s: %d corners", r.family, len(found))
			}
			list = append(list, Got{found[0].Measured, found[0].Uncertainty})
		}
		return list, nil
	}
	return c
}

// program tries the whole of it, families, ladders and their bars: a notch at the
// edge of a bar a thousand times as wide as it is deep is one of a half-plane.
func program() Case {
	return Case{Name: "a check from end to end: bar-edge-notch, D/r = 1000, gross", Source: "F. G. Maunsell 1936; C. B. Ling, J. Appl. Mech. 14 (1947) A-275", Sureness: Published,
		Expected: []Expected{{What: "factor", Value: 3.065, Accuracy: half(3)}},
		Compute: func(ctx context.Context) ([]Got, error) {
			f, _ := scf.Lookup("bar-edge-notch")
			p, err := specimen.New(f, scf.Dims{"D": 1000, "d": 999, "r": 1}, "mm", scf.Options{Nu: 0.3, ForceLine: scf.ForceLineGross})
			if err != nil {
				return nil, err
			}
			r, err := verify.Run(ctx, p, []scf.Load{scf.Tension}, verify.Options{Workers: 1})
			if err != nil {
				return nil, err
			}
			c := r.Findings[0].Computed
			return []Got{{c.Gross, c.Gross / c.Factor.Value * c.Factor.Uncertainty}}, nil
		},
	}
}
