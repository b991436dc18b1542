package evidence

import (
	"context"
	"fmt"
	"math"

	"gonum.org/v1/gonum/spatial/r2"

	"notchproof/fem"
	"notchproof/mesh"
	"notchproof/mesh/outline"
	"notchproof/scf"
)

// Neuber's deep notches: bodies bounded by a hyperbola of half net width (or net
// radius) 1 and root radius 1/A, which open towards a wedge (or cone) of the
// half angle alpha, tan alpha = √A. They are cut by a circle of the radius far.
// The load on the cut has the resultant of nominal stress 1; how it is spread
// matters little so far off, and less the farther.

// A neuber is one load: a traction along the radius (0), across it (1) or along
// z (2), or along the axis (3), of the given shape over the angle theta from the
// axis; what it does per unit of amplitude and of far (over the quarter that is
// modelled, or per radian), and what it must do.
type neuber struct {
	name      string
	model     fem.Model
	fixed     []fem.Fixed
	pins      []Pin
	spread    func(alpha, theta float64) [4]float64
	amplitude func(alpha, far float64) float64
	factor    func(A, nu float64) float64
	quantity  fem.Quantity
}

// Sides of the quarter body: the axis, the cut, the hyperbola, the net section.
const (
	neuberAxis = iota
	neuberCut
	neuberNotch
	neuberNet
)

func neubers() []neuber {
	flat := func(f func(float64) float64) func(A, nu float64) float64 {
		return func(A, _ float64) float64 { return f(A) }
	}
	symmetric := []fem.Fixed{{Side: neuberAxis, Unknown: 1}, {Side: neuberNet, Unknown: 0}}
	origin := pt(0, 0)
	return []neuber{
		{"plane tension", fem.PlaneStress{}, symmetric, nil,
			// The radial stress of a wedge pulled at its apex (Michell 1900).
			func(_, th float64) [4]float64 { return [4]float64{math.Cos(th)} },
			func(al, far float64) float64 { return 1 / (far * (al/2 + math.Sin(2*al)/4)) },
			flat(scf.NeuberPlaneTension), fem.SurfacePoint.FirstPrincipal},
		{"plane bending", fem.PlaneStress{}, []fem.Fixed{{Side: neuberAxis, Unknown: 0}, {Side: neuberNet, Unknown: 0}}, []Pin{{origin, 1}},
			// The stress of a wedge with a moment at its apex (Carothers 1912),
			// from the function Aθ + B sin 2θ: σr = −4B sin 2θ/r²,
			// τ = 2B (cos 2θ − cos 2α)/r². The moment of the quarter about the
			// apex is B (sin 2α − 2α cos 2α), and −1/3 for the nominal stress 1.
			func(al, th float64) [4]float64 {
				return [4]float64{-4 * math.Sin(2*th), 2 * (math.Cos(2*th) - math.Cos(2*al))}
			},
			func(al, far float64) float64 {
				return -1. / 3 / (far * far * (math.Sin(2*al) - 2*al*math.Cos(2*al)))
			},
			flat(scf.NeuberPlaneBending), fem.SurfacePoint.FirstPrincipal},
		{"plane shear", fem.PlaneStress{}, []fem.Fixed{{Side: neuberAxis, Unknown: 0}, {Side: neuberNet, Unknown: 1}}, nil,
			// A wedge pushed sideways at its apex (Michell 1900). The body may
			// turn, which the pin in body stops.
			func(_, th float64) [4]float64 { return [4]float64{math.Sin(th)} },
			func(al, far float64) float64 { return 1 / (far * (al/2 - math.Sin(2*al)/4)) },
			neuberPlaneShear, fem.SurfacePoint.FirstPrincipal},
		{"round tension", fem.Axisymmetric{}, []fem.Fixed{{Side: neuberNet, Unknown: 0}}, nil,
			// ∫cosθ cosθ sinθ dθ = (1 − cos³α)/3 times far²; nominal 1/2 per radian.
			func(_, th float64) [4]float64 { return [4]float64{math.Cos(th)} },
			func(al, far float64) float64 { return 1.5 / (far * far * (1 - math.Pow(math.Cos(al), 3))) },
			scf.NeuberRoundTension, fem.SurfacePoint.FirstPrincipal},
		{"round bending", fem.Bending{}, []fem.Fixed{{Side: neuberNet, Unknown: 0}}, []Pin{{origin, 1}},
			// Along the axis and as the distance from it: ∫sin³θ dθ times far³,
			// nominal 1/4.
			func(_, th float64) [4]float64 { return [4]float64{3: math.Sin(th)} },
			func(al, far float64) float64 { return 0.25 / (far * far * far * sineCubed(al)) },
			scf.NeuberRoundBending, fem.SurfacePoint.FirstPrincipal},
		{"round torsion", fem.Torsion{}, []fem.Fixed{{Side: neuberNet, Unknown: 0}}, nil,
			// The stress of a twisted cone (Föppl 1905): sinθ/r³.
			func(_, th float64) [4]float64 { return [4]float64{2: math.Sin(th)} },
			func(al, far float64) float64 { return 0.25 / (far * far * far * sineCubed(al)) },
			flat(scf.NeuberRoundTorsion), fem.SurfacePoint.ShearSize},
	}
}

// neuberPlaneShear is the largest stress on the surface over the mean shear of a
// force across the net section without a moment there: it sits on either side
// of the root, where the stress is zero. The form with √A in the place of √(A+1)
// that is in circulation is not this stress.
func neuberPlaneShear(A, _ float64) float64 {
	z := math.Sqrt(A)
	return A * math.Sqrt(A+1) / ((A+1)*math.Atan(z) - z)
}

// sineCubed is ∫sin³θ dθ from 0 to alpha.
func sineCubed(al float64) float64 {
	c := math.Cos(al)
	return 2./3 - c + c*c*c/3
}

// body is a quarter of the body with the notch A = 1/ρ, cut at far.
func (n *neuber) body(A, nu, far float64) (*Problem, error) {
	b := math.Sqrt(1 / A)
	alpha := math.Atan(math.Sqrt(A))
	s := math.Sqrt((far*far - 1) / (1 + b*b))
	notch := hyperbola{a: 1, b: b, from: math.Asinh(s)}
	end, corner := notch.At(0), pt(far, 0)
	cut, err := outline.NewArc(corner, end, pt(0, 0), true)
	if err != nil {
		return nil, err
	}
	k := n.amplitude(alpha, far)
	traction := fem.Traction{Side: neuberCut, On: func(p r2.Vec) [3]float64 {
		f := n.spread(alpha, math.Atan2(p.Y, p.X))
		sin, cos := p.Y/r2.Norm(p), p.X/r2.Norm(p)
		return [3]float64{k * (f[0]*cos - f[1]*sin + f[3]), k * (f[0]*sin + f[1]*cos), k * f[2]}
	}}
	pins := n.pins
	if n.name == "plane shear" {
		pins = []Pin{{corner, 1}}
	}
	return &Problem{Model: n.model, Nu: nu, Order: 8, Fixed: n.fixed, Pins: pins, Tractions: []fem.Traction{traction},
		Sides: outline.Loop{Line(pt(0, 0), corner), {Curve: cut}, {Curve: notch}, Line(pt(0, 1), pt(0, 0))},
		Size:  mesh.Sizing{Growth: 0.35, Spots: []mesh.SpotWish{{At: pt(0, 1), Size: 0.25 / A}}, Largest: far / 3}}, nil
}

// NeuberTolerance: what the cut does to the peak falls with the square of its
// distance, by which the hyperbola still differs from its asymptotes there:
// doubling the distance takes three quarters of it away, and two distances give
// the limit. (Farther cuts would cost digits: the far part of a shaft is far³ times
// as stiff as its neck.) What is left are the next power of 1/far and the
// resolution of the root.
const (
	NeuberTolerance = 3e-6 // relative
	neuberFar       = 60
)

// NeuberLoads names the loads of Neuber's notches.
func NeuberLoads() (names []string) {
	for _, n := range neubers() {
		names = append(names, n.name)
	}
	return names
}

// Neuber gives the computed factor of one of NeuberLoads, the formula's, and by
// how much the farther cut moves it; dependent tells that ν matters.
func Neuber(ctx context.Context, load string, A, nu float64) (got, want, moved float64, dependent bool, err error) {
	for _, n := range neubers() {
		if n.name != load {
			continue
		}
		var peaks [2]float64
		for i, far := range []float64{neuberFar, 2 * neuberFar} {
			p, err := n.body(A, nu, far)
			if err != nil {
				return 0, 0, 0, false, err
			}
			s, err := p.Solve(ctx)
			if err != nil {
				return 0, 0, 0, false, err
			}
			if peaks[i], err = Peak(s, neuberNotch, n.quantity); err != nil {
				return 0, 0, 0, false, err
			}
		}
		moved = peaks[1] - peaks[0]
		_, plane := n.model.(fem.PlaneStress)
		return peaks[1] + moved/3, n.factor(A, nu), moved / peaks[1], !plane && n.name != "round torsion", nil
	}
	return 0, 0, 0, false, fmt.Errorf("%q: no such load of Neuber's notches", load)
}

// neuberCase tries five of the loads on the notch whose half net width is ten
// times its root radius. The formulas are from memory, so nothing but their being
// exact explains six digits.
func neuberCase() Case {
	const A, nu = 10, 0.3
	loads := []string{"plane tension", "plane bending", "round tension", "round bending", "round torsion"}
	values := []float64{scf.NeuberPlaneTension(A), scf.NeuberPlaneBending(A), scf.NeuberRoundTension(A, nu), scf.NeuberRoundBending(A, nu), scf.NeuberRoundTorsion(A)}
	c := Case{Name: "deep hyperbolic notches, a/ρ = 10, ν = 0.3", Source: "H. Neuber, Kerbspannungslehre, Springer 1937", Sureness: Memory,
		Compute: func(ctx context.Context) ([]Got, error) {
			var list []Got
			for _, load := range loads {
				got, _, _, _, err := Neuber(ctx, load, A, nu)
				if err != nil {
					return nil, err
				}
				list = append(list, Got{got, NeuberTolerance * got})
			}
			return list, nil
		}}
	for i, load := range loads {
		c.Expected = append(c.Expected, Expected{What: load, Value: values[i]})
	}
	return c
}
