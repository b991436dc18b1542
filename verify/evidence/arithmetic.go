package evidence

import (
	"context"
	"fmt"
	"math"

	"notchproof/scf"
	"notchproof/verify/extrapolate"
)

// celik is the first sample of the paper: values on 18000, 8000 and 4500 cells.
// Its table prints the order 1.53, the limit 6.1685 and the index 2.2 %.
func celik() Case {
	return Case{Name: "Richardson's limit and the grid convergence index", Source: "Celik et al., J. Fluids Eng. 130 (2008) 078001, table 1", Sureness: Published,
		Expected: []Expected{
			{What: "observed order", Value: 1.53, Accuracy: half(2)}, {What: "limit", Value: 6.1685, Accuracy: half(4)},
			{What: "index, %", Value: 2.2, Accuracy: half(1)},
		},
		Compute: func(context.Context) ([]Got, error) {
			var sizes []float64
			for _, cells := range []float64{18000, 8000, 4500} {
				sizes = append(sizes, math.Sqrt(1/cells))
			}
			s := extrapolate.Sizes(sizes, []float64{6.063, 5.972, 5.863})
			return []Got{{Value: s.Order}, {Value: s.Limit}, {Value: 100 * s.GCI}}, nil
		},
	}
}

// sections: nominal stresses under unit loads, thickness 1, worked by hand.
func sections() Case {
	const rounding = 1e-14
	rows := []struct {
		family string
		load   scf.Load
		dims   scf.Dims
		value  float64
	}{
		{"bar-hole", scf.Tension, scf.Dims{"W": 20, "d": 10}, 0.1},                       // 1/10
		{"bar-hole", scf.Bending, scf.Dims{"W": 20, "d": 10}, 60. / 7000},                // M c/I, c = 5, I = (20³ − 10³)/12
		{"bar-notch", scf.Bending, scf.Dims{"D": 20, "d": 10, "r": 1}, 0.06},             // 6/10²
		{"shaft-shoulder", scf.Tension, scf.Dims{"D": 4, "d": 2, "r": 0.1}, 1 / math.Pi}, // 1/π
		{"shaft-shoulder", scf.Bending, scf.Dims{"D": 4, "d": 2, "r": 0.1}, 4 / math.Pi}, // c/I = 1/(π/4)
		{"shaft-groove", scf.Torsion, scf.Dims{"D": 4, "d": 2, "r": 0.1}, 2 / math.Pi},   // c/J = 1/(π/2)
	}
	c := Case{Name: "nominal stresses on net sections, unit loads", Source: "P/A, M c/I, T c/J by hand", Sureness: Exact}
	for _, r := range rows {
		c.Expected = append(c.Expected, Expected{What: fmt.Sprintf("%s, %s", r.family, r.load), Value: r.value})
	}
	c.Compute = func(context.Context) ([]Got, error) {
		var list []Got
		for _, r := range rows {
			f, ok := scf.Lookup(r.family)
			if !ok {
				return nil, fmt.Errorf("%s: no such family", r.family)
			}
			list = append(list, Got{f.Nominal(r.load, r.dims, scf.Options{Nu: 0.3}).Net, rounding})
		}
		return list, nil
	}
	return c
}
