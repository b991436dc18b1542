package strength

import (
	"math"
	"math/rand/v2"
	"testing"

	"notchproof/mesh/outline"
)

func rectangle(width, thickness float64) section {
	return section{cut: []outline.Interval{{Lo: -width / 2, Hi: width / 2}}, thickness: thickness}
}

func tube(inner, outer float64) section {
	return section{shaft: true, cut: []outline.Interval{{Lo: inner, Hi: outer}}}
}

func near(t *testing.T, what string, got, want, tolerance float64) {
	t.Helper()
	if !(math.Abs(got-want) <= tolerance*math.Abs(want)) {
		t.Errorf("%s: %.12g, want %.12g within %.2g", what, got, want, tolerance)
	}
}

// Shape factors: 1.5 of a rectangle, 16/(3π) = 1.698 of a circle, 4/3 of a
// circle in torsion; a thin tube has 4/π in bending and 1 in torsion, up to
// terms of the order of its thickness.
func TestShapeFactors(t *testing.T) {
	const yield, exact = 300, 1e-12
	factor := func(s section, r resultants) float64 { return s.plastic(r, yield) / (yield / s.elastic(r)) }
	bending, torsion := resultants{moment: 7e5}, resultants{torque: 7e5}
	near(t, "rectangle", factor(rectangle(40, 8), bending), 1.5, exact)
	near(t, "circle", factor(tube(0, 24), bending), 16/(3*math.Pi), exact)
	near(t, "circle", factor(tube(0, 24), bending), 1.698, 5e-4)
	near(t, "circle in torsion", factor(tube(0, 24), torsion), 4.0/3, exact)
	near(t, "thin tube", factor(tube(0.999, 1), bending), 4/math.Pi, 1e-3)
	near(t, "thin tube in torsion", factor(tube(0.999, 1), torsion), 1, 1e-3)
	near(t, "tension", factor(tube(10, 24), resultants{axial: -1e4}), 1, exact)
}

// The rectangle's interaction M/Mp = 1 − (N/Np)².
func TestRectangleInteraction(t *testing.T) {
	const yield = 300
	s := rectangle(40, 8)
	np, mp := yield*40*8., yield*8*40*40/4.
	for _, n := range []float64{0.01, 0.3, 0.7, 0.99, 0.99999} {
		for _, sign := range [][2]float64{{1, 1}, {-1, 1}, {1, -1}, {-1, -1}} {
			r := resultants{axial: sign[0] * n * np, moment: sign[1] * (1 - n*n) * mp}
			near(t, "load factor on the interaction curve", s.plastic(r, yield), 1, 1e-9)
		}
	}
}

// plasticByStrips is the slow twin: the section in strips across, all at yield,
// with the neutral axis between any two of them. The points (N, M) make a polygon
// that the ray of the loads leaves somewhere. With a torque the direct stress is
// what the shear leaves of the yield stress in each strip; the load factor is then
// found by halving, and nothing is known of the closed interaction.
func plasticByStrips(s *section, r resultants, yield float64) float64 {
	const strips, rings = 4000, 4000
	lo, hi := s.low(), s.high()
	d := (hi - lo) / strips
	var areas, ys [strips]float64
	area, first := 0.0, 0.0
	for i := range strips {
		ys[i] = lo + (float64(i)+0.5)*d
		areas[i] = d * widthAt(s, ys[i])
		area, first = area+areas[i], first+areas[i]*ys[i]
	}
	middle := first / area
	borne := func(direct float64) float64 {
		// All in compression first, then strip by strip from above in tension.
		n, m := 0.0, 0.0
		for i := range strips {
			n, m = n-direct*areas[i], m-direct*areas[i]*(ys[i]-middle)
		}
		best := 0.0
		for step := range 2 * strips { // up the one side, down the other
			i := strips - 1 - step%strips
			change := 2 * direct * areas[i]
			if step >= strips {
				change = -change
			}
			n1, m1 := n+change, m+change*(ys[i]-middle)
			best = math.Max(best, meets(n, m, n1, m1, r.axial, r.moment))
			n, m = n1, m1
		}
		return best
	}
	unit := borne(1)
	if r.torque == 0 {
		return unit * yield
	}
	polar := 0.0
	for _, iv := range s.cut {
		d := (iv.Hi - iv.Lo) / rings
		for i := range rings {
			radius := iv.Lo + (float64(i)+0.5)*d
			polar += 2 * math.Pi * radius * d * radius
		}
	}
	low, high := 0.0, unit*yield
	for range 60 {
		lambda := (low + high) / 2
		shear := lambda * r.torque / polar
		if left := yield*yield - 3*shear*shear; left < 0 || unit*math.Sqrt(left) < lambda {
			high = lambda
		} else {
			low = lambda
		}
	}
	return low
}

func widthAt(s *section, y float64) float64 {
	width := 0.0
	for _, iv := range s.cut {
		switch {
		case s.shaft:
			chord := func(radius float64) float64 { return 2 * math.Sqrt(math.Max(0, radius*radius-y*y)) }
			width += chord(iv.Hi) - chord(iv.Lo)
		case iv.Lo <= y && y <= iv.Hi:
			width += s.thickness
		}
	}
	return width
}

// meets is the multiple of the load (n, m) at which it meets an edge of the
// polygon; 0: it does not.
func meets(n0, m0, n1, m1, n, m float64) float64 {
	a, b := n*m0-m*n0, n*m1-m*n1
	if a*b > 0 || a == b {
		return 0
	}
	share := a / (a - b)
	at := [2]float64{n0 + share*(n1-n0), m0 + share*(m1-m0)}
	return math.Max(0, (at[0]*n+at[1]*m)/(n*n+m*m))
}

func TestPlasticAgainstStrips(t *testing.T) {
	const yield, strips = 250, 1e-3 // a strip is 1/4000 of the section; edges of strips miss those of the cut
	for _, s := range []section{
		rectangle(40, 8),
		{cut: []outline.Interval{{Lo: -30, Hi: -8}, {Lo: 10, Hi: 30}}, thickness: 5},
		tube(0, 24), tube(15, 24),
		{shaft: true, cut: []outline.Interval{{Lo: 0, Hi: 8}, {Lo: 14, Hi: 20}}},
	} {
		area, _ := s.whole()
		depth := s.high() - s.low()
		for _, share := range [][3]float64{{1, 0.5, 0}, {0.3, -1, 0}, {-1, 0.1, 0}, {0.6, 0.5, 0.4}, {0, 0.7, 1}, {0.001, 0.7, 0}, {1, 0.0001, 0}, {-0.2, 0.1, 1}} {
			r := resultants{axial: share[0] * 100 * area, moment: share[1] * 20 * area * depth}
			if s.shaft {
				r.torque = share[2] * 20 * area * depth
			}
			near(t, "load factor", s.plastic(r, yield), plasticByStrips(&s, r, yield), strips)
		}
	}
}

// The elastic limit lies below the plastic one, and both fall like 1/load.
func TestLimitsAreInOrder(t *testing.T) {
	rng := rand.New(rand.NewPCG(3, 1))
	for range 300 {
		s := rectangle(10+rng.Float64()*50, 3)
		if rng.IntN(2) == 0 {
			s = tube(rng.Float64()*20, 22)
		}
		r := resultants{axial: rng.NormFloat64() * 1e4, moment: rng.NormFloat64() * 1e5}
		if s.shaft {
			r.torque = math.Abs(rng.NormFloat64()) * 1e5
		}
		elastic, plastic := 250/s.elastic(r), s.plastic(r, 250)
		if elastic > plastic*(1+1e-12) || plastic > 2*elastic {
			t.Errorf("%+v %+v: elastic limit %g, plastic %g", s, r, elastic, plastic)
		}
		twice := resultants{2 * r.axial, 2 * r.moment, 2 * r.torque}
		near(t, "half of the load factor", s.plastic(twice, 250), plastic/2, 1e-9)
		turned := resultants{-r.axial, -r.moment, r.torque}
		near(t, "all signs changed", s.plastic(turned, 250), plastic, 1e-9)
	}
}
