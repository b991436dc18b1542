package predicate

import (
	"math"
	"math/big"
	"math/rand/v2"
	"testing"

	"gonum.org/v1/gonum/spatial/r2"
)

// ratOrient and ratInCircle are the slow twins, straight from the determinants.

func rat(x float64) *big.Rat { return new(big.Rat).SetFloat64(x) }

func ratMul(a, b *big.Rat) *big.Rat { return new(big.Rat).Mul(a, b) }

func ratSub(a, b *big.Rat) *big.Rat { return new(big.Rat).Sub(a, b) }

func ratAdd(a, b *big.Rat) *big.Rat { return new(big.Rat).Add(a, b) }

func ratOrient(a, b, c r2.Vec) int {
	acx, acy := ratSub(rat(a.X), rat(c.X)), ratSub(rat(a.Y), rat(c.Y))
	bcx, bcy := ratSub(rat(b.X), rat(c.X)), ratSub(rat(b.Y), rat(c.Y))
	return ratSub(ratMul(acx, bcy), ratMul(acy, bcx)).Sign()
}

func ratInCircle(a, b, c, d r2.Vec) int {
	var x, y, l [3]*big.Rat
	for i, p := range []r2.Vec{a, b, c} {
		x[i], y[i] = ratSub(rat(p.X), rat(d.X)), ratSub(rat(p.Y), rat(d.Y))
		l[i] = ratAdd(ratMul(x[i], x[i]), ratMul(y[i], y[i]))
	}
	det := new(big.Rat)
	for i := range 3 {
		j, k := (i+1)%3, (i+2)%3
		det.Add(det, ratMul(l[i], ratSub(ratMul(x[j], y[k]), ratMul(x[k], y[j]))))
	}
	return det.Sign()
}

// nudge moves x by up to n units in the last place; zero, whose neighbours are
// below the range, stays.
func nudge(rng *rand.Rand, x float64, n int) float64 {
	if x == 0 {
		return 0
	}
	for range rng.IntN(n + 1) {
		x = math.Nextafter(x, math.Inf(2*rng.IntN(2)-1))
	}
	return x
}

func nudgeVec(rng *rand.Rand, p r2.Vec, n int) r2.Vec {
	return r2.Vec{X: nudge(rng, p.X, n), Y: nudge(rng, p.Y, n)}
}

// scales spans the range that both predicates are exact in; with the factors
// used by the generators below, coordinates stay inside it.
var scales = []float64{1, 0.1, 1e-12, 3e9, 0x1p-190, 0x1p240}

// quads makes four points in trouble: on small grids, on a common line, on a
// common circle, far from the origin, each a few units in the last place off.
func quads(rng *rand.Rand, s float64) [4]r2.Vec {
	var p [4]r2.Vec
	shift := r2.Vec{}
	if rng.IntN(2) == 0 {
		shift = r2.Vec{X: s * 100 * rng.Float64(), Y: -s * 50}
	}
	switch kind := rng.IntN(5); kind {
	case 0: // a grid
		for i := range p {
			p[i] = r2.Vec{X: s * float64(rng.IntN(4)), Y: s * float64(rng.IntN(4))}
		}
	case 1: // a line
		a, u := r2.Vec{X: rng.Float64(), Y: rng.Float64()}, r2.Vec{X: rng.Float64(), Y: rng.Float64()}
		for i := range p {
			p[i] = r2.Scale(s, r2.Add(a, r2.Scale(rng.NormFloat64(), u)))
		}
	case 2: // a circle
		for i := range p {
			sin, cos := math.Sincos(2 * math.Pi * rng.Float64())
			p[i] = r2.Vec{X: s * cos, Y: s * sin}
		}
	case 3: // two of them the same
		for i := range p {
			p[i] = r2.Vec{X: s * rng.Float64(), Y: s * rng.Float64()}
		}
		p[rng.IntN(4)] = p[rng.IntN(4)]
	case 4: // whole numbers on the circle of radius 65
		pts := []r2.Vec{{X: 63, Y: 16}, {X: 60, Y: 25}, {X: 56, Y: 33}, {X: 52, Y: 39}, {X: -39, Y: 52}, {X: -16, Y: 63}, {X: 25, Y: -60}}
		for i := range p {
			p[i] = r2.Scale(s, pts[rng.IntN(len(pts))])
		}
	}
	n := rng.IntN(4)
	for i := range p {
		p[i] = nudgeVec(rng, r2.Add(p[i], shift), n)
	}
	return p
}

func TestAgreesWithRationals(t *testing.T) {
	rng := rand.New(rand.NewPCG(1, 2))
	var zero [2]int
	for range 20000 {
		q := quads(rng, scales[rng.IntN(len(scales))])
		a, b, c, d := q[0], q[1], q[2], q[3]
		want := ratOrient(a, b, c)
		if got := Orient(a, b, c); got != want {
			t.Fatalf("Orient(%v, %v, %v) = %d, want %d", a, b, c, got, want)
		}
		if want == 0 {
			zero[0]++
		}
		want = ratInCircle(a, b, c, d)
		if got := InCircle(a, b, c, d); got != want {
			t.Fatalf("InCircle(%v, %v, %v, %v) = %d, want %d", a, b, c, d, got, want)
		}
		if want == 0 {
			zero[1]++
		}
	}
	if zero[0] < 100 || zero[1] < 100 {
		t.Errorf("only %v exact zeros met: the points are not awkward enough", zero)
	}
}

// The last stage alone must be right on points that never need it.
func TestExactStageOnEasyPoints(t *testing.T) {
	rng := rand.New(rand.NewPCG(3, 4))
	v := func() r2.Vec { return r2.Vec{X: rng.NormFloat64(), Y: rng.NormFloat64()} }
	for range 2000 {
		a, b, c, d := v(), v(), v(), v()
		if got, want := orientExact(a, b, c), ratOrient(a, b, c); got != want {
			t.Fatalf("orientExact(%v, %v, %v) = %d, want %d", a, b, c, got, want)
		}
		if got, want := inCircleExact(a, b, c, d), ratInCircle(a, b, c, d); got != want {
			t.Fatalf("inCircleExact(%v, %v, %v, %v) = %d, want %d", a, b, c, d, got, want)
		}
	}
}

// Whatever the order of the points, the answers must fit together.
func TestAntisymmetry(t *testing.T) {
	rng := rand.New(rand.NewPCG(5, 6))
	for range 20000 {
		q := quads(rng, 1)
		a, b, c, d := q[0], q[1], q[2], q[3]
		o, in := Orient(a, b, c), InCircle(a, b, c, d)
		if Orient(b, c, a) != o || Orient(b, a, c) != -o {
			t.Fatalf("Orient of %v, %v, %v depends on their order", a, b, c)
		}
		if InCircle(b, c, a, d) != in || InCircle(b, a, c, d) != -in || InCircle(a, b, d, c) != -in {
			t.Fatalf("InCircle of %v, %v, %v, %v depends on their order", a, b, c, d)
		}
	}
}

func TestEndsOfTheRange(t *testing.T) {
	for _, s := range []float64{0x1p-484, 0x1p499} {
		a, b := r2.Vec{X: s, Y: s}, r2.Vec{X: 2 * s, Y: 2 * s}
		c := r2.Vec{X: s * 1.5, Y: math.Nextafter(s*1.5, 0)}
		if got := Orient(a, b, c); got != -1 {
			t.Errorf("Orient at %g = %d, want -1", s, got)
		}
		c.Y = c.X
		if got := Orient(a, b, c); got != 0 {
			t.Errorf("Orient at %g = %d, want 0", s, got)
		}
	}
	for _, s := range []float64{0x1p-215, 0x1p249} {
		a, b, c := r2.Vec{X: s}, r2.Vec{Y: s}, r2.Vec{X: -s}
		d := r2.Vec{Y: -s}
		if got := InCircle(a, b, c, d); got != 0 {
			t.Errorf("InCircle at %g = %d, want 0", s, got)
		}
		d.Y = -s * (1 + 0x1p-52)
		if got := InCircle(a, b, c, d); got != -1 {
			t.Errorf("InCircle just outside at %g = %d, want -1", s, got)
		}
	}
}

var sink int

func BenchmarkOrient(b *testing.B) {
	p, q, r := r2.Vec{X: 1, Y: 2}, r2.Vec{X: 3, Y: 5}, r2.Vec{X: -2, Y: 7}
	for b.Loop() {
		sink += Orient(p, q, r)
	}
}

func BenchmarkInCircle(b *testing.B) {
	p, q, r, s := r2.Vec{X: 1}, r2.Vec{Y: 1}, r2.Vec{X: -1}, r2.Vec{Y: -0.9}
	for b.Loop() {
		sink += InCircle(p, q, r, s)
	}
}

func BenchmarkInCircleOnTheCircle(b *testing.B) {
	p, q, r, s := r2.Vec{X: 63, Y: 16}, r2.Vec{X: 60, Y: 25}, r2.Vec{X: -16, Y: 63}, r2.Vec{X: 25, Y: -60}
	for b.Loop() {
		sink += InCircle(p, q, r, s)
	}
}
