package usermesh_test

import (
	"context"
	"math"
	"testing"

	"gonum.org/v1/gonum/spatial/r2"

	"notchproof/verify/specimen"
	"notchproof/verify/usermesh"
)

// What guidance rests on: errors fall with the density, in the end about with
// its first power at order 1 and faster at order 2; order 2 never needs more
// elements than order 1, and a stricter level never fewer.
func TestGuidance(t *testing.T) {
	for _, row := range shapes {
		p := part(t, row.family, row.dims)
		e := check(t, p, row.load, nil).Computed.Factor
		g, err := subject(t, p, row.load).Guide(context.Background(), e.Value, e.Uncertainty)
		if err != nil {
			t.Fatal(err)
		}
		least := map[float64]float64{}
		before := usermesh.Need{}
		for _, n := range g.Needed {
			arc := n.Arc
			if arc == 0 {
				arc = math.Inf(1)
			}
			if n.Order == 1 {
				least[n.Level] = arc
			} else if arc > least[n.Level] {
				t.Errorf("%s, %s: %g elements of order 2 for %g, %g of order 1", row.family, row.load, arc, n.Level, least[n.Level])
			}
			if n.Order == before.Order && n.Arc > 0 && (before.Arc == 0 || n.Arc < before.Arc) {
				t.Errorf("%s, %s: %+v after %+v", row.family, row.load, n, before)
			}
			before = n
		}
		for order, power := range map[int]float64{1: 0.6, 2: 1.4} {
			coarse, fine := errorAt(t, g, order, 4), errorAt(t, g, order, 24)
			if got := math.Log(coarse/fine) / math.Log(6); !(got > power) {
				t.Errorf("%s, %s, order %d: error falls from %.2g to %.2g between 4 and 24 elements, power %.2f", row.family, row.load, order, coarse, fine, got)
			}
		}
	}
}

// errorAt is the error at a density.
func errorAt(t *testing.T, g *usermesh.Guidance, order int, arc float64) float64 {
	t.Helper()
	for _, trial := range g.Trials {
		if trial.Density == (specimen.Density{Order: order, Arc: arc}) {
			return math.Abs(trial.Error)
		}
	}
	t.Fatalf("order %d with %g elements was not tried", order, arc)
	return 0
}

// A level counts from where no finer mesh breaks it again, and not by the last
// mesh alone.
func TestNeedIsTheLastToStayWithin(t *testing.T) {
	tried := func(bounds ...float64) (list []usermesh.Trial) {
		for i, b := range bounds {
			list = append(list, usermesh.Trial{Density: specimen.Density{Order: 1, Arc: float64(2 + i)}, Bound: b})
		}
		return list
	}
	for _, row := range []struct {
		bounds        []float64
		arc, moreThan float64
	}{
		{[]float64{0.2, 0.04, 0.03, 0.02}, 3, 0},
		{[]float64{0.04, 0.03, 0.02}, 2, 0},
		{[]float64{0.2, 0.01, 0.07, 0.04, 0.03}, 5, 0}, // by accident first
		{[]float64{0.2, 0.1, 0.04}, 0, 3},              // not confirmed
		{[]float64{0.2, 0.1, 0.08}, 0, 4},
		{[]float64{0.04}, 0, 0},
	} {
		n := usermesh.Wanted(tried(row.bounds...), 1, 0.05)
		if n.Arc != row.arc || n.MoreThan != row.moreThan {
			t.Errorf("%v: %+v, want %g or more than %g", row.bounds, n, row.arc, row.moreThan)
		}
	}
}

// The factor's own uncertainty counts against a level.
func TestGuidanceCountsTheUncertainty(t *testing.T) {
	row := shapes[2]
	p := part(t, row.family, row.dims)
	e := check(t, p, row.load, nil).Computed.Factor
	g, err := subject(t, p, row.load).Guide(context.Background(), e.Value, 0.03*e.Value)
	if err != nil {
		t.Fatal(err)
	}
	for _, n := range g.Needed {
		if reached := n.Arc > 0; reached != (n.Level > 0.03) {
			t.Errorf("with 3 %% of uncertainty: %+v", n)
		}
	}
}

// The root has as many elements as are asked for: no mesh is finer there than it
// says, and none coarser.
func TestDensityIsKept(t *testing.T) {
	for _, row := range shapes {
		if row.family == "bar-ellipse" {
			continue // its curvature changes along the root
		}
		p := part(t, row.family, row.dims)
		turning := 0.0
		for _, side := range p.Notch {
			c := p.Region.Sides()[side].Curve
			a, b := c.Deriv(0), c.Deriv(1)
			turning += math.Abs(math.Atan2(r2.Cross(a, b), r2.Dot(a, b)))
		}
		s := subject(t, p, row.load)
		for _, arc := range []float64{3, 5, 16, 64} {
			for _, growth := range []float64{0.2, 0.5} {
				want := math.Ceil(arc*turning/(math.Pi/2) - 1e-6)
				if got := usermesh.RootEdges(t, s, arc, growth); got != int(want) {
					t.Errorf("%s with %g elements per 90°, growth %g: %d on the root, want %g", row.family, arc, growth, got, want)
				}
			}
		}
	}
}
