package outline

import (
	"fmt"
	"math"
	"slices"

	"gonum.org/v1/gonum/spatial/r2"
)

// An Arc is a piece of a circle, at uniform speed. Start is the angle of its
// first point, Sweep the angle it covers, in radians, counter-clockwise
// positive, at most a full turn either way.
//
// Arcs made by NewArc, by reading path data, and by transforming or reversing
// those, also carry their end points to the last bit.
type Arc struct {
	Center r2.Vec
	Radius float64
	Start  float64
	Sweep  float64

	pins pins
}

// NewArc gives the arc about a centre from one point to another, with exactly
// these ends; from == to gives the full circle. The two points may differ in
// distance from the centre by a millionth of the radius: the centre then moves
// along the chord until they do not.
func NewArc(from, to, center r2.Vec, counterClockwise bool) (Arc, error) {
	center, err := balance(from, to, center)
	if err != nil {
		return Arc{}, err
	}
	a := r2.Sub(from, center)
	b := r2.Sub(to, center)
	// The angle between the radii, rather than the difference of two
	// directions, keeps small arcs sharp.
	sweep := math.Atan2(cross(a, b), dot(a, b))
	switch {
	case from == to:
		sweep = 2 * math.Pi
	case sweep < 0:
		sweep += 2 * math.Pi
	}
	if !counterClockwise {
		sweep -= 2 * math.Pi
		if sweep == 0 {
			sweep = -2 * math.Pi
		}
	}
	return Arc{
		Center: center,
		Radius: (r2.Norm(a) + r2.Norm(b)) / 2,
		Start:  math.Atan2(a.Y, a.X),
		Sweep:  sweep,
		pins:   pinned(from, to),
	}, nil
}

// balance moves a centre along the chord until both points are equally far.
func balance(from, to, center r2.Vec) (r2.Vec, error) {
	const slack = 1e-6
	a, b := r2.Sub(from, center), r2.Sub(to, center)
	ra, rb := r2.Norm(a), r2.Norm(b)
	if !finite(ra, rb) || ra == 0 || rb == 0 {
		return r2.Vec{}, fmt.Errorf("arc from %s to %s about %s has no radius", place(from), place(to), place(center))
	}
	if math.Abs(ra-rb) > slack*ra {
		return r2.Vec{}, fmt.Errorf("arc from %s to %s: radii %g and %g about %s differ",
			place(from), place(to), ra, rb, place(center))
	}
	chord := r2.Sub(to, from)
	l := r2.Norm(chord)
	if l == 0 {
		return center, nil
	}
	shift := (rb - ra) / l * ((ra + rb) / 2)
	if math.Abs(shift) > slack*ra {
		// Nearly closed: the chord is too short to say where the centre is.
		return center, nil
	}
	return r2.Vec{X: center.X + float64(shift/l*chord.X), Y: center.Y + float64(shift/l*chord.Y)}, nil
}

func (a Arc) At(t float64) r2.Vec {
	if p, ok := a.pins.at(t); ok {
		return p
	}
	s, c := sincos(a.Start + float64(t*a.Sweep))
	return r2.Vec{X: a.Center.X + float64(a.Radius*c), Y: a.Center.Y + float64(a.Radius*s)}
}

func (a Arc) Deriv(t float64) r2.Vec {
	s, c := sincos(a.Start + float64(t*a.Sweep))
	v := a.Radius * a.Sweep
	return r2.Vec{X: -v * s, Y: v * c}
}

func (a Arc) Second(t float64) r2.Vec {
	s, c := sincos(a.Start + float64(t*a.Sweep))
	w := a.Radius * a.Sweep * a.Sweep
	return r2.Vec{X: -w * c, Y: -w * s}
}

func (a Arc) Length(t0, t1 float64) float64 {
	return math.Abs(a.Radius * a.Sweep * (t1 - t0))
}

// Nearest looks along the radius through p and falls back to the nearer end.
// From the centre itself every point is equally near; the answer is then one
// of them.
func (a Arc) Nearest(p r2.Vec) float64 {
	d := r2.Sub(p, a.Center)
	if t, ok := along(math.Atan2(d.Y, d.X), a.Start, a.Sweep); ok {
		return t
	}
	return nearerEnd(a, p)
}

func nearerEnd(c Curve, p r2.Vec) float64 {
	if r2.Norm2(r2.Sub(c.At(1), p)) < r2.Norm2(r2.Sub(c.At(0), p)) {
		return 1
	}
	return 0
}

func (a Arc) Bounds() r2.Box { return boundsBy(a) }

func (a Arc) Reverse() Curve {
	return Arc{a.Center, a.Radius, a.Start + a.Sweep, -a.Sweep, pinned(a.At(1), a.At(0))}
}

func (a Arc) stationary(n r2.Vec) []float64 {
	psi := math.Atan2(n.Y, n.X)
	return anglesInside(a.Start, a.Sweep, psi, psi+math.Pi)
}

// anglesInside lists the parameters strictly between the ends at which an arc
// passes the given angles.
func anglesInside(start, sweep float64, angles ...float64) []float64 {
	var ts []float64
	for _, a := range angles {
		if t, ok := along(a, start, sweep); ok && t > 0 && t < 1 {
			ts = append(ts, t)
		}
	}
	slices.Sort(ts)
	return ts
}
