package fem

import (
	"math"
	"slices"
	"testing"

	"gonum.org/v1/gonum/spatial/r2"

	"notchproof/mesh"
	"notchproof/mesh/outline"
)

// Plain bars and shafts of length 4 and half depth or radius 1, under unit
// stress at the outer fibre. Sides: 0 below, 1 right end, 2 above, 3 left end.
type bar struct {
	name      string
	model     Model
	low       float64 // y of side 0: 0 for the half of a bar and for shafts
	fixed     []Fixed
	pins      []barPin
	end       func(y float64) [3]float64 // traction on the right end; the left one carries the opposite
	stress    func(y float64) Stress     // amplitudes
	resultant Resultant
	from      int // least order that holds the displacements: their degree
}

type barPin struct {
	at      r2.Vec
	unknown int
}

const (
	barLength = 4
	barTop    = 1
)

// bars are the loads that parts are checked under. Halves of bars stand on their
// middle line with a support of symmetry (tension) or antisymmetry (bending).
// Resultants are ∫σ dy, ∫σ y dy for bars and ∫σ r dr, ∫σ r² dr for shafts.
func bars() []bar {
	left, right, top := pt(0, 0), pt(barLength, 0), pt(0, barTop)
	axial := func(y float64) [3]float64 { return [3]float64{1, 0, 0} }
	linear := func(y float64) [3]float64 { return [3]float64{y, 0, 0} }
	twist := func(y float64) [3]float64 { return [3]float64{0, 0, y} }
	uniform := func(y float64) Stress { return Stress{XX: 1} }
	slope := func(y float64) Stress { return Stress{XX: y} }
	nu := steel.Nu
	return []bar{
		{"bar in tension, half", PlaneStress{}, 0, []Fixed{{Side: 0, Unknown: 1}}, []barPin{{left, 0}},
			axial, uniform, Resultant{Axial: 1, Moment: 0.5}, 1},
		{"bar in bending, half", PlaneStress{}, 0, []Fixed{{Side: 0, Unknown: 0}}, []barPin{{left, 1}, {right, 1}},
			linear, slope, Resultant{Axial: 0.5, Moment: 1. / 3}, 2},
		{"bar in tension, whole", PlaneStress{}, -1, nil, []barPin{{top, 0}, {top, 1}, {pt(barLength, -1), 1}},
			axial, uniform, Resultant{Axial: 2}, 1},
		{"bar in bending, whole", PlaneStress{}, -1, nil, []barPin{{top, 0}, {top, 1}, {pt(barLength, -1), 1}},
			linear, slope, Resultant{Moment: 2. / 3}, 2},
		{"wide bar in bending, half", PlaneStrain{}, 0, []Fixed{{Side: 0, Unknown: 0}}, []barPin{{left, 1}, {right, 1}},
			linear, func(y float64) Stress { return Stress{XX: y, ZZ: nu * y} }, Resultant{Axial: 0.5, Moment: 1. / 3}, 2},
		{"shaft in tension", Axisymmetric{}, 0, nil, []barPin{{left, 0}},
			axial, uniform, Resultant{Axial: 0.5, Moment: 1. / 3}, 1},
		{"shaft in bending", Bending{}, 0, nil, []barPin{{left, 1}, {right, 1}},
			linear, slope, Resultant{Axial: 1. / 3, Moment: 0.25}, 2},
		{"shaft in torsion", Torsion{}, 0, nil, []barPin{{top, 0}},
			twist, func(y float64) Stress { return Stress{XZ: y} }, Resultant{Torque: 0.25}, 2},
	}
}

func (b *bar) region() *outline.Region {
	return polygon(pt(0, b.low), pt(barLength, b.low), pt(barLength, barTop), pt(0, barTop))
}

func (b *bar) problem(shape *mesh.Curved) *Problem {
	p := &Problem{Shape: shape, Model: b.model, Material: steel, Fixed: b.fixed}
	for _, pin := range b.pins {
		p.Pinned = append(p.Pinned, Pin{Point: cornerAt(shape.Mesh, pin.at), Unknown: pin.unknown})
	}
	p.Cases = []Case{{Tractions: []Traction{
		{Side: 1, On: func(at r2.Vec) [3]float64 { return b.end(at.Y) }},
		{Side: 3, On: func(at r2.Vec) [3]float64 {
			t := b.end(at.Y)
			return [3]float64{-t[0], -t[1], -t[2]}
		}},
	}}}
	return p
}

func cornerAt(m *mesh.Mesh, at r2.Vec) int {
	for i, p := range m.Points {
		if p == at {
			return i
		}
	}
	panic("no mesh point at the place of a pin")
}

// Bounds for plain parts, all of them rounding, which grows with the order.
const (
	plainStress   = 5e-11 // measured 2e-11 at order 8
	plainReaction = 1e-11
	// The rounding that a pin carries is a point load: elements that touch a pin
	// feel it, those on the axis, where a point is no ring, most of all. Measured
	// is 2e-9 at order 8.
	plainPinned    = 1e-8
	plainResultant = 1e-11 // cuts through pinned corners among them
)

// Plain parts under the loads that stand at their ends are exact: in stress at
// every point, with nothing left for the pins to carry, and across any cut.
func TestPlainParts(t *testing.T) {
	for _, b := range bars() {
		m := generate(t, b.region(), mesh.Sizing{Largest: 0.9, Spots: []mesh.SpotWish{{At: pt(1.3, 1), Size: 0.2}}})
		for order := b.from; order <= 8; order++ {
			s := b.problem(m.Curve(order)).mustSolve(t)
			b.checkStress(t, s, order)
			reactions := s.Balance().Reactions
			if len(reactions) != len(b.pins) {
				t.Errorf("%s, order %d: %d reactions for %d pins", b.name, order, len(reactions), len(b.pins))
			}
			for _, r := range reactions {
				if !(math.Abs(r.Force) < plainReaction) {
					t.Errorf("%s, order %d: pin carries %.2g", b.name, order, r.Force)
				}
			}
			for _, x := range []float64{0, 0.77, m.Points[len(m.Points)-1].X, barLength} {
				if d := resultantDifference(s.Section(x), b.resultant); !(d < plainResultant) {
					t.Errorf("%s, order %d: cut at %g carries %v, want %v", b.name, order, x, s.Section(x), b.resultant)
				}
			}
		}
	}
}

func (b *bar) checkStress(t *testing.T, s *Solution, order int) {
	t.Helper()
	worst, pinned := 0.0, 0.0
	for tri, corners := range s.Problem.Shape.Mesh.Triangles {
		touches := slices.ContainsFunc(s.Problem.Pinned, func(p Pin) bool { return slices.Contains(corners[:], int32(p.Point)) })
		for _, x := range inner {
			p := s.Problem.Shape.At(tri, x[0], x[1])
			d, _ := difference(s.Amplitude(tri, x[0], x[1]), b.stress(p.Y))
			if touches {
				pinned = max(pinned, d)
			} else {
				worst = max(worst, d)
			}
		}
	}
	if !(worst < plainStress) || !(pinned < plainPinned) {
		t.Errorf("%s, order %d: stress off by %.2g, at pins by %.2g", b.name, order, worst, pinned)
	}
	for i, e := range s.Problem.Shape.Mesh.Boundary {
		if e.Side != 2 {
			continue
		}
		got := s.Surface(i, 0.3)
		want := s.Problem.Model.Drawn(b.stress(barTop))
		if pin := slices.ContainsFunc(b.pins, func(p barPin) bool { return r2.Norm(r2.Sub(p.at, got.At)) < 1 }); pin {
			continue
		}
		if d := math.Abs(got.Tangential-want.XX) + math.Abs(got.Hoop-want.ZZ) + math.Abs(math.Abs(got.Shear)-want.XZ); !(d < plainStress) {
			t.Errorf("%s, order %d: surface stress %v", b.name, order, got)
		}
		if normal, shear := s.Leftover(got); !(math.Abs(normal)+shear < plainStress) {
			t.Errorf("%s, order %d: traction %.2g and %.2g left on the free surface", b.name, order, normal, shear)
		}
	}
}

func resultantDifference(a, b Resultant) float64 {
	return math.Abs(a.Axial-b.Axial) + math.Abs(a.Transverse-b.Transverse) + math.Abs(a.Moment-b.Moment) + math.Abs(a.Torque-b.Torque)
}
