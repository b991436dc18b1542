package verify

import (
	"fmt"
	"math"
	"strconv"

	"gonum.org/v1/gonum/spatial/r2"

	"notchproof/fem"
	"notchproof/verify/specimen"
)

// competing is the share of the factor above which another local maximum on
// the notch is worth a word.
const competing = 0.5

// places fills in where the factor sits, which other places compete with it,
// and what is stressed higher off the notch. The factor is the notch's all the
// same: another place has a nominal stress and a remedy of its own.
func (f *Finding) places(p *specimen.Part) {
	c := &f.Computed
	if len(c.peaks) > 0 && !c.Factor.Status.Settled() {
		c.Peak = peak(f.Load, c.Last, c.peaks[0], finest) // where it is; its size means nothing
		return
	}
	known := math.Max(finest, blur*c.Factor.Uncertainty/c.Factor.Value)
	for i, at := range c.peaks {
		found := peak(f.Load, c.Last, at, known)
		if i == 0 {
			c.Peak = found
		} else if found.Factor >= competing*c.Peak.Factor {
			c.Others = append(c.Others, found)
		}
	}
	for _, side := range p.Watch {
		at, ok := highest(p, f.Load, c.Last, side)
		if !ok || quantity(f.Load)(at) <= c.Factor.Value+c.Factor.Uncertainty {
			continue
		}
		found := peak(f.Load, c.Last, at, known)
		c.Others = append(c.Others, found)
		f.Warnings = append(f.Warnings, fmt.Sprintf("the %s is stressed higher than the notch: about %s times the nominal stress against %s",
			found.Side, threeDigits(found.Factor), threeDigits(c.Factor.Value)))
	}
}

// threeDigits writes a factor without an exponent: 1.99, 100000.
func threeDigits(v float64) string {
	if v < 1000 {
		return strconv.FormatFloat(v, 'g', 3, 64)
	}
	step := math.Pow(10, math.Floor(math.Log10(v))-2)
	return strconv.FormatFloat(math.Round(v/step)*step, 'f', 0, 64)
}

// highest is the most stressed place on a side off the notch. Where the side
// meets the notch the stress is the notch's.
func highest(p *specimen.Part, l *specimen.Load, s *fem.Solution, side int) (fem.SurfacePoint, bool) {
	for _, at := range s.Maxima([]int{side}, quantity(l)) {
		if !atJoint(p, at.At) && !atSharpCorner(p, s, at) {
			return at, true
		}
	}
	return fem.SurfacePoint{}, false
}

// atSharpCorner: there the stress is whatever the mesh makes of it.
func atSharpCorner(p *specimen.Part, s *fem.Solution, at fem.SurfacePoint) bool {
	for _, c := range p.Sharp {
		if r2.Norm(r2.Sub(at.At, c.At)) <= 1e-2*edgeLength(s, at) {
			return true
		}
	}
	return false
}

// edgeLength is the length of the chord of the boundary edge that a point lies on.
func edgeLength(s *fem.Solution, at fem.SurfacePoint) float64 {
	m := s.Problem.Shape.Mesh
	e := m.Boundary[at.Edge]
	corners := m.Triangles[e.Triangle]
	return r2.Norm(r2.Sub(m.Points[corners[(e.Opposite+1)%3]], m.Points[corners[(e.Opposite+2)%3]]))
}

func atJoint(p *specimen.Part, at r2.Vec) bool {
	for _, j := range p.Joints {
		if r2.Norm(r2.Sub(at, j.At)) <= 1e-3*j.Radius {
			return true
		}
	}
	return false
}

// peak describes a maximum in the part's terms. Its coordinates are rounded to
// the share of its edge to which the place is known.
func peak(l *specimen.Load, s *fem.Solution, at fem.SurfacePoint, known float64) Peak {
	m := s.Problem.Shape.Mesh
	e := m.Boundary[at.Edge]
	edge := edgeLength(s, at)
	return Peak{
		X: rounded(at.At.X, known*edge), Y: rounded(at.At.Y, known*edge),
		ArcDegrees: math.Atan2(math.Abs(at.Normal.X), math.Abs(at.Normal.Y)) * 180 / math.Pi,
		Factor:     quantity(l)(at),
		Side:       m.Region.Sides()[e.Side].Name,
	}
}

// The place of a maximum is known to a share of the edge it lies on: never better
// than the search for it resolves, and no better than the error allows. A maximum
// is flat; an error that changes over an edge by the relative bar moves it by some
// such shares of the edge.
const (
	finest = 1e-5
	blur   = 10
)

// rounded brings a coordinate to a decimal step no larger than the given one.
func rounded(v, step float64) float64 {
	digits := math.Ceil(-math.Log10(step))
	if digits >= 0 {
		scale := math.Pow(10, digits)
		return math.Round(v*scale)/scale + 0 // + 0: no negative zero
	}
	scale := math.Pow(10, -digits)
	return math.Round(v/scale)*scale + 0
}
