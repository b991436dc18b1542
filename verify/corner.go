package verify

import (
	"context"
	"fmt"
	"math"
	"slices"

	"gonum.org/v1/gonum/spatial/r2"

	"notchproof/fem"
	"notchproof/mesh"
	"notchproof/mesh/outline"
	"notchproof/scf"
	"notchproof/verify/specimen"
)

// A Corner is a concave corner without a radius with the growth of the stress
// about it, like distance^Measured.
type Corner struct {
	X, Y    float64
	Degrees float64 // angle of the material
	OnNotch bool    // the notch runs into it: there is no factor

	// Measured is read from a mesh that is graded into the corner, ± Uncertainty;
	// NaN where it was not measured or there is no room to.
	Measured    float64
	Uncertainty float64
	From, To    float64 // distances from the corner between which it is measured

	// Wedge is the exponent that the theory has for the angle and the mode; NaN
	// where it has none: on the axis of a shaft the corner is a cone.
	Wedge float64
	Mode  Mode
}

// Bounded tells that the load leaves the corner without a stress that grows, as
// one that is antisymmetric does where the corner opens by more than 102.6°.
func (c Corner) Bounded() bool {
	return c.Measured-c.Uncertainty > 0 || math.IsNaN(c.Measured) && c.Wedge >= 0
}

// mostCorners bounds the time that goes into corners; the rest are told by the
// theory alone.
const mostCorners = 6

// How corners are measured, lengths over the room about each. Sizes that grow by
// half of the distance give the same picture of the stress at every distance but
// for the first few, where the corner's own element spoils it. What it spoils
// falls with the distance at least as fast as 1/r (the dual of the wedge's own
// solution): hundreds of its sizes off it is below a hundredth. The picture has
// an exponent of its own, closer to the true one by every order; two orders tell
// how close.
const (
	cornerSize   = 2e-8 // of the element at the corner
	cornerGrowth = 0.5
	cornerOrder  = 7 // and the one below it
	cornerFrom   = 1e-5
	cornerTo     = 1e-3
	cornerClear  = 300 // elements at the corner to the nearest place that is read
	cornerWidest = 1e-2
	cornerLeast  = 8.0 // ratio of the farthest to the nearest place, at least
)

// leastSize is the smallest size that a mesh takes, over the extent of the
// region, with room for rounding.
const leastSize = 2e-9

// corners lists the sharp corners of a part under a load, those of the notch
// first, and measures them, all on one mesh: one that is not resolved would be
// felt at the others.
func corners(ctx context.Context, p *specimen.Part, l *specimen.Load, w *fem.Workspace, workers int) ([]Corner, error) {
	drawn := notchFirst(p)
	list := make([]Corner, len(drawn))
	size := mesh.Sizing{Growth: cornerGrowth}
	for i, c := range drawn {
		list[i] = newCorner(p, l, c)
		if i < mostCorners {
			size.Spots = append(size.Spots, list[i].reach(p, c))
		}
	}
	if len(list) == 0 {
		return nil, nil
	}
	m, err := mesh.Generate(p.Region, size)
	if err != nil {
		return nil, err
	}
	for order := cornerOrder - 1; order <= cornerOrder; order++ {
		s, err := solve(ctx, p, l, m.Curve(order), w, workers)
		if err != nil {
			return nil, err
		}
		for i, c := range drawn[:len(size.Spots)] {
			list[i].read(flanks(p, s, c), l)
		}
	}
	for i := range list {
		list[i].settle()
	}
	return list, nil
}

// notchFirst sorts the sharp corners: those that the notch runs into, then others.
func notchFirst(p *specimen.Part) (list []outline.Corner) {
	for _, c := range p.Sharp {
		if onNotch(p, c) {
			list = append(list, c)
		}
	}
	for _, c := range p.Sharp {
		if !onNotch(p, c) {
			list = append(list, c)
		}
	}
	return list
}

func onNotch(p *specimen.Part, c outline.Corner) bool {
	return slices.Contains(p.Notch, c.Before) || slices.Contains(p.Notch, c.After)
}

// newCorner is what is known of a corner before it is measured.
func newCorner(p *specimen.Part, l *specimen.Load, c outline.Corner) Corner {
	mode, degrees := mainMode(p, l, c), math.Min(c.Degrees, 360)
	return Corner{X: c.At.X, Y: c.At.Y, Degrees: degrees, OnNotch: onNotch(p, c),
		Measured: math.NaN(), Uncertainty: math.Inf(1), Mode: mode, Wedge: mode.exponent(degrees)}
}

// reach settles between which distances a corner is measured, none when there is
// no room to, and the size of its elements.
func (c *Corner) reach(p *specimen.Part, at outline.Corner) mesh.SpotWish {
	free := room(p, at)
	box := p.Region.Bounds()
	extent := math.Max(box.Max.X-box.Min.X, box.Max.Y-box.Min.Y)
	size := math.Max(cornerSize*free, leastSize*extent)
	from := math.Max(cornerFrom*free, cornerClear*size)
	if to := math.Max(cornerTo*free, cornerLeast*from); to <= cornerWidest*free {
		c.From, c.To = from, to
	}
	return mesh.SpotWish{At: at.At, Size: size}
}

// room is the distance from a corner within which the part is a wedge but for
// the bend of its flanks: to the next side, or to where a flank has turned.
func room(p *specimen.Part, c outline.Corner) float64 {
	least := math.Inf(1)
	for i, s := range p.Region.Sides() {
		switch i {
		case c.Before, c.After:
			t := 0.0
			if i == c.After {
				t = 1
			}
			least = math.Min(least, r2.Norm(r2.Sub(s.Curve.At(t), c.At)))
			if k := math.Abs(outline.Curvature(s.Curve, 1-t)); k > 0 {
				least = math.Min(least, 1/k)
			}
		default:
			least = math.Min(least, r2.Norm(r2.Sub(s.Curve.At(s.Curve.Nearest(c.At)), c.At)))
		}
	}
	return least
}

// Corners measures the growth of the stress at the sharp corners of a part under
// a load that it carries, on workers goroutines (0: one a processor).
func Corners(ctx context.Context, p *specimen.Part, load scf.Load, workers int) ([]Corner, error) {
	l, ok := p.Load(load)
	if !ok {
		return nil, fmt.Errorf("%s does not carry %s", p.Name, load)
	}
	return corners(ctx, p, l, &fem.Workspace{}, workers)
}
