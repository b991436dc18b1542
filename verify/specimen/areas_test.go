package specimen

import (
	"fmt"
	"math"
	"testing"

	"notchproof/scf"
)

// under is the area between the foot of an arc of radius r and the arc itself,
// from the foot to the distance run: ∫ r − √(r² − x²) dx.
func under(run, r float64) float64 {
	return r*run - (run*math.Sqrt(r*r-run*run)+r*r*math.Asin(run/r))/2
}

// fillets gives the run of a fillet and the area beneath it, elliptic ones by
// stretching the circle.
func fillets(h, r, ra float64) (run, area float64) {
	run = r
	if h < r {
		run = math.Sqrt(h * (2*r - h))
	}
	return run * ra / r, under(run, r) * ra / r
}

// notchGap is what a notch takes away, and its half width at the surface.
func notchGap(h, r, degrees float64) (area, half float64) {
	slope := degrees * math.Pi / 360
	rise := r * (1 - math.Sin(slope))
	phi := math.Pi/2 - slope
	if h < rise {
		phi = math.Acos(1 - h/r)
		rise = h
	}
	root := r * math.Sin(phi)
	half = root + (h-rise)*math.Tan(slope)
	return r*r*(phi-math.Sin(phi)*math.Cos(phi)) + (root+half)*(h-rise), half
}

func closedArea(family string, m scf.Dims) float64 {
	D, d, r, W := m["D"], m["d"], m["r"], m["W"]
	h := (D - d) / 2
	switch family {
	case "bar-shoulder", "shaft-shoulder":
		run, area := fillets(h, r, m["ra"])
		return 3*D*D/2 + (run+3*d)*d/2 + area - m["c"]*m["c"]/2
	case "bar-notch", "shaft-groove":
		gap, half := notchGap(h, r, m["angle"])
		return (6*D+2*half)*D/2 - gap
	case "bar-edge-notch":
		gap, half := notchGap(2*h, r, m["angle"])
		return (6*D+2*half)*D - gap
	case "bar-hole":
		whole := (6*W+d)*W - math.Pi*d*d/4
		if m["e"] == 0 {
			return whole / 2
		}
		return whole
	case "bar-ellipse":
		return (6*W+2*m["b"])*W/2 - math.Pi*m["a"]*m["b"]/2
	case "bar-collar", "shaft-collar":
		run, area := fillets(h, r, r)
		return m["L"]*D/2 + (6*d+2*run)*d/2 + 2*area
	case "shaft-ring-groove":
		_, area := fillets(h, r, r)
		return (6*D+m["w"])*D/2 - (m["w"]*h - 2*area)
	}
	return math.NaN()
}

// shapes are proportions of every family on both sides of each of its cases:
// full and cut arcs, flanks and none, faces and none.
func shapes(family string) []scf.Dims {
	switch family {
	case "bar-shoulder", "shaft-shoulder":
		return []scf.Dims{
			{"D": 72, "d": 48, "r": 3}, {"D": 72, "d": 48, "r": 12}, {"D": 72, "d": 48, "r": 20}, {"D": 72, "d": 71.9, "r": 500},
			{"D": 72, "d": 48, "r": 3, "ra": 9}, {"D": 72, "d": 48, "r": 9, "ra": 3}, {"D": 72, "d": 48, "r": 20, "ra": 50}, {"D": 72, "d": 48, "r": 12, "ra": 7},
			{"D": 72, "d": 48, "r": 3, "c": 2}, {"D": 72, "d": 48, "r": 3, "c": 9}, {"D": 72, "d": 48, "r": 4, "ra": 6, "c": 8},
			{"D": 72, "d": 48, "r": 0}, {"D": 72, "d": 48, "r": 0, "c": 12},
		}
	case "bar-notch", "shaft-groove", "bar-edge-notch":
		return []scf.Dims{
			{"D": 60, "d": 40, "r": 3}, {"D": 60, "d": 40, "r": 10}, {"D": 60, "d": 40, "r": 20}, {"D": 60, "d": 40, "r": 21}, {"D": 60, "d": 59.9, "r": 300},
			{"D": 60, "d": 40, "r": 3, "angle": 60}, {"D": 60, "d": 40, "r": 3, "angle": 150}, {"D": 60, "d": 50, "r": 10, "angle": 60}, {"D": 60, "d": 50, "r": 40, "angle": 60},
			{"D": 60, "d": 50, "r": 0, "angle": 60}, {"D": 60, "d": 50, "r": 0, "angle": 1},
		}
	case "bar-hole":
		return []scf.Dims{{"W": 60, "d": 20}, {"W": 60, "d": 59}, {"W": 60, "d": 0.01}, {"W": 60, "d": 20, "e": 15}, {"W": 60, "d": 20, "e": -19.9}}
	case "bar-ellipse":
		return []scf.Dims{{"W": 60, "a": 10, "b": 2}, {"W": 60, "a": 2, "b": 50}, {"W": 60, "a": 29, "b": 29}}
	case "bar-collar", "shaft-collar":
		return []scf.Dims{{"D": 60, "d": 40, "r": 3, "L": 20}, {"D": 60, "d": 40, "r": 10, "L": 1}, {"D": 60, "d": 40, "r": 30, "L": 600}, {"D": 60, "d": 40, "r": 0, "L": 20}}
	case "shaft-ring-groove":
		return []scf.Dims{
			{"D": 60, "d": 40, "r": 3, "w": 20}, {"D": 60, "d": 40, "r": 0, "w": 20}, {"D": 60, "d": 40, "r": 3, "w": 6}, {"D": 60, "d": 40, "r": 10, "w": 20}, {"D": 60, "d": 40, "r": 10, "w": 30},
			{"D": 60, "d": 40, "r": 20, "w": 40}, {"D": 60, "d": 40, "r": 20, "w": 20 * math.Sqrt(3)},
		}
	}
	return nil
}

// Every family takes up the area that its dimensions say.
func TestAreas(t *testing.T) {
	for _, family := range scf.Families() {
		list := shapes(family.Name)
		if len(list) == 0 {
			t.Errorf("no shapes of %s", family.Name)
		}
		for _, dims := range list {
			t.Run(fmt.Sprint(family.Name, dims), func(t *testing.T) {
				p, err := New(family, dims, "", scf.Options{Nu: 0.3})
				if err != nil {
					t.Fatal(err)
				}
				if err := p.Region.Validate(); err != nil {
					t.Fatal(err)
				}
				checkPart(t, p)
				got, want := p.Region.Properties().Area, closedArea(family.Name, p.Dims)
				if math.Abs(got-want) > 1e-12*want {
					t.Errorf("area %.15g, want %.15g", got, want)
				}
			})
		}
	}
}

// The loads balance: what the tractions on both ends add up to is what the
// outside fixes on any cut, and the nominal stress under it is one.
func TestEndTractionsBalance(t *testing.T) {
	for _, family := range scf.Families() {
		for _, dims := range shapes(family.Name) {
			for _, line := range []string{scf.ForceLineNet, scf.ForceLineGross} {
				p, err := New(family, dims, "", scf.Options{Nu: 0.3, ForceLine: line})
				if err != nil {
					t.Fatal(err)
				}
				for i := range p.Loads {
					for k := range p.Plain {
						checkResultant(t, p, &p.Loads[i], k)
					}
				}
			}
		}
	}
}

// checkResultant adds up the traction on one end by Gauss's rule with three
// points, exact for the cubics that the far stresses and their arms make.
func checkResultant(t *testing.T, p *Part, l *Load, plain int) {
	t.Helper()
	s := p.Plain[plain]
	sign := math.Copysign(1, s.To-s.From)
	middle, half := (s.High+s.Low)/2, (s.High-s.Low)/2
	var axial, moment, torque float64
	for i, x := range []float64{-math.Sqrt(0.6), 0, math.Sqrt(0.6)} {
		y := middle + x*half
		w := []float64{5, 8, 5}[i] / 9 * half * sign
		if l.Model.Revolved() {
			w *= y
		}
		at := p.Region.Bounds().Max
		at.X, at.Y = s.To, y
		on := l.Tractions[plain].On(at)
		axial += w * on[0]
		moment += w * on[0] * y
		torque += w * on[2] * y
		if far := on[0] + on[2]; math.Abs(far*sign-l.Far(plain, y)) > 1e-12*math.Abs(far) {
			t.Errorf("%s %s: traction %g, far stress %g", p.Name, l.Name, far, l.Far(plain, y))
		}
	}
	size := 1 / l.Nominal.Net
	near := func(what string, got, want float64) {
		if math.Abs(got-want) > 1e-12*size*math.Max(1, math.Abs(s.High)) {
			t.Errorf("%s %v %s: %s %g on the %s, want %g", p.Name, p.Given, l.Name, what, got, s.Name, want)
		}
	}
	near("torque", torque, l.Resultant.Torque)
	if l.Name != scf.Bending || !p.Half {
		near("axial force", axial, l.Resultant.Axial)
	}
	if l.Name == scf.Bending || !p.Half {
		near("moment", moment, l.Resultant.Moment)
	}
}
