package misreading

import (
	"fmt"

	"notchproof/scf"
)

// curves are the D/d for which charts of shoulders, notches and grooves draw
// their curves. Common practice.
var curves = []float64{1.01, 1.02, 1.05, 1.1, 1.2, 1.3, 1.5, 2, 3, 6}

// neighbouringCurve: the next curve of the chart, below or above the right one.
func neighbouringCurve(q *Question) []wrong {
	d := q.Part.Dims
	if q.Part.Family == nil || !has(d, "D") {
		return nil
	}
	ratio := d["D"] / d["d"]
	const same = 1e-3 // on the curve itself
	below, above := 0.0, 0.0
	for _, c := range curves {
		switch {
		case c < ratio*(1-same):
			below = c
		case c > ratio*(1+same) && above == 0:
			above = c
		}
	}
	var list []wrong
	for _, c := range []float64{below, above} {
		if c > 0 {
			list = append(list, wrong{
				what:   fmt.Sprintf("the neighbouring curve D/d = %g of the chart", c),
				family: q.Part.Family, dims: q.given(scf.Dims{"D": c * d["d"]}), load: q.Load.Name, options: q.Part.Options,
				chartFirst: true,
			})
		}
	}
	return list
}
