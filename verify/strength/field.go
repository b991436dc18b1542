package strength

import (
	"math"

	"notchproof/fem"
)

// A field is the sum of the stresses of several loads on one mesh.
type field struct {
	parts  []component
	around around
}

// A component is one load's share.
type component struct {
	solution *fem.Solution // at unit nominal stress
	nominal  float64       // MPa, signed
	bar      float64       // of any stress at the notch, at unit nominal stress
	turning  bool          // goes with cosθ around the axis, or changes sign across the line of symmetry
}

// around says at which angles θ a point of the drawn outline stands for others.
type around int

const (
	once  around = iota // a whole bar: at itself alone
	image               // half a bar: at itself and its image, θ = 0 and 180°
	round               // a shaft: at all angles
)

// amplitudes of the summed surface stress at a point: what is the same at all
// angles, and what turns.
type amplitudes struct{ fixed, turning fem.SurfacePoint }

func (f *field) amplitudes(p fem.SurfacePoint) amplitudes {
	var a amplitudes
	for i := range f.parts {
		c := &f.parts[i]
		s := c.solution.SurfaceAmplitude(p.Edge, p.S)
		to := &a.fixed
		if c.turning {
			to = &a.turning
		}
		to.Tangential += c.nominal * s.Tangential
		to.Hoop += c.nominal * s.Hoop
		to.Shear += c.nominal * s.Shear
	}
	return a
}

// at is the stress at the angle θ: direct stresses of bending go with cosθ,
// its shear with sinθ (see fem.Bending).
func (a *amplitudes) at(p fem.SurfacePoint, theta float64) fem.SurfacePoint {
	sin, cos := math.Sincos(theta)
	p.Tangential = a.fixed.Tangential + cos*a.turning.Tangential
	p.Hoop = a.fixed.Hoop + cos*a.turning.Hoop
	p.Shear = a.fixed.Shear + sin*a.turning.Shear
	return p
}

// worst finds the angle at which a quantity is largest, and the stress there.
func (f *field) worst(p fem.SurfacePoint, of fem.Quantity) (at fem.SurfacePoint, theta float64) {
	a := f.amplitudes(p)
	value := func(theta float64) float64 { return of(a.at(p, theta)) }
	switch f.around {
	case image:
		if value(math.Pi) > value(0) {
			theta = math.Pi
		}
	case round:
		theta = largest(value)
	}
	return a.at(p, theta), theta
}

// largest finds the largest value over a full turn. The square of a von Mises
// stress is a trigonometric polynomial of degree 2 and has four extremes at most,
// a principal stress turns as slowly: a sample every 5° meets each of them.
// Golden sections leave 1e-9 of a turn, which enters the value with its square.
func largest(value func(theta float64) float64) float64 {
	const samples = 72
	best, most := 0.0, value(0)
	for i := 1; i < samples; i++ {
		theta := 2 * math.Pi * float64(i) / samples
		// From equals the first counts, whatever rounding makes of them.
		if v := value(theta); v > most+1e-12*math.Abs(most) {
			best, most = theta, v
		}
	}
	a, b := best-2*math.Pi/samples, best+2*math.Pi/samples
	ratio := (math.Sqrt(5) - 1) / 2
	for b-a > 1e-9 {
		x1, x2 := b-ratio*(b-a), a+ratio*(b-a)
		if value(x1) > value(x2) {
			b = x2
		} else {
			a = x1
		}
	}
	if theta := (a + b) / 2; value(theta) > most+1e-12*math.Abs(most) {
		return math.Mod(theta+2*math.Pi, 2*math.Pi)
	}
	return best
}

// bar bounds the error of von Mises and principal stresses of the sum at a
// point. Von Mises is a norm of the deviator, the largest principal stress
// changes by no more than the largest of the error's: errors of the loads add
// up at most. A load whose direct stresses are wrong by no more than δ and its
// shear by no more than δ is wrong by no more than √3 δ in both (direct stresses
// of opposite signs, or shear; around a shaft the two go with cosθ and sinθ); in a
// bar, where the edge carries one stress alone, by δ. δ is the bar of the
// ladder, or the traction that this very solution leaves on the free surface at
// this very place where that is larger.
func (f *field) bar(p fem.SurfacePoint) float64 {
	several := 1.0
	if f.around == round {
		several = math.Sqrt(3)
	}
	sum := 0.0
	for i := range f.parts {
		c := &f.parts[i]
		left := math.Hypot(c.solution.Leftover(c.solution.Surface(p.Edge, p.S)))
		sum += math.Abs(c.nominal) * several * math.Max(c.bar, left)
	}
	return sum
}

// maxima lists the local maxima of a quantity along sides, largest first, each
// at its worst angle.
func (f *field) maxima(sides []int, of fem.Quantity) []fem.SurfacePoint {
	return f.parts[0].solution.Maxima(sides, func(p fem.SurfacePoint) float64 {
		at, _ := f.worst(p, of)
		return of(at)
	})
}
