package scf

import "math"

// eccentricHole is Pilkey & Pilkey, 3rd ed., chart 4.3, after E. Sjöström
// 1950: hole of radius a in a strip under uniform tension, its centre c from
// the near edge and e from the far one; coefficients from memory. The chart's
// fit is on the gross section,
//
//	Ktg = C1 + C2 (a/c) + C3 (a/c)² + C4 (a/c)³,  Ci quadratic in z = c/e
//
// and is referred here to the net section P / ((W − d) t) like its neighbours,
// not to the chart's own nominal stress.
func eccentricHole(W, d, offset float64) Value {
	a, c, e := d/2, W/2-math.Abs(offset), W/2+math.Abs(offset)
	z := c / e
	gross := horner(a/c,
		horner(z, 2.9969, -0.0090, 0.01338),
		horner(z, 0.1217, 0.5180, -0.5297),
		horner(z, 0.5565, 0.7215, 0.6153),
		horner(z, 4.082, 6.0146, -3.9815))
	v := Value{
		ID:       "pilkey-4.3",
		Factor:   gross * (1 - d/W),
		Accuracy: fitAccuracy,
		Source:   pilkey3 + "chart 4.3, after Sjöström 1950",
		Sureness: Memory,
		Warnings: []string{"converted from the gross section to P / ((W − d) t); the chart's own net stress counts the eccentricity in"},
	}
	v.hold(
		limit{name: "a/c", value: a / c, lo: 0, hi: 0.5},
		limit{name: "c/e", value: z, lo: 0, hi: 1},
	)
	return v
}
