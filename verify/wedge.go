package verify

import (
	"math"

	"notchproof/mesh/outline"
	"notchproof/scf"
	"notchproof/verify/specimen"
)

// A Mode is the way in which a load moves the flanks of a corner.
type Mode int

const (
	NoMode  Mode = iota // no wedge in the plane: a cone on the axis
	Opening             // apart, mode I
	Sliding             // along each other, mode II
	Tearing             // across the plane, mode III, as in torsion
	Closed              // across the plane, both alike: nothing grows
)

func (m Mode) String() string {
	switch m {
	case Opening:
		return "opening"
	case Sliding:
		return "sliding"
	case Tearing:
		return "torsion"
	case Closed:
		return "even torsion"
	}
	return "no wedge"
}

// source names where the exponent of a mode comes from.
func (m Mode) source() string {
	switch m {
	case Opening:
		return "Williams (1952) mode I"
	case Sliding:
		return "Williams (1952) mode II"
	case Tearing:
		return "torsion of a wedge, π/w − 1 ="
	case Closed:
		return "even torsion of a wedge, 2π/w − 1 ="
	}
	return m.String()
}

// mainMode is the strongest mode of a corner under a load. Close to a corner a
// body of revolution is plane, save on its axis; on the line of symmetry of half
// a bar the load has the one mode that the symmetry leaves it.
func mainMode(p *specimen.Part, l *specimen.Load, c outline.Corner) Mode {
	onLine := p.Half && c.At.Y == 0
	switch {
	case onLine && l.Model.Revolved():
		return NoMode
	case onLine && l.Name == scf.Bending:
		return Sliding
	}
	return bothFlanks(l)
}

// bothFlanks is the mode that the sum of both flanks shows.
func bothFlanks(l *specimen.Load) Mode {
	if l.Shear {
		return Tearing
	}
	return Opening
}

// other is the mode that is left where symmetry rules the stronger one out.
func (m Mode) other() Mode {
	switch m {
	case Opening:
		return Sliding
	case Sliding:
		return Opening
	case Tearing:
		return Closed
	}
	return m
}

// exponent is the power of the distance with which the stress of a mode goes at
// a corner with the given angle of material: in the plane λ − 1 with the least λ
// of M. L. Williams, J. Appl. Mech. 19 (1952) 526; in torsion π/w − 1 and
// 2π/w − 1, from the harmonic functions r^(nπ/w) cos(nπφ/w) on a wedge of the
// angle w with free flanks.
func (m Mode) exponent(degrees float64) float64 {
	switch m {
	case Opening:
		lambda, _ := scf.Williams(360 - degrees)
		return lambda - 1
	case Sliding:
		_, lambda := scf.Williams(360 - degrees)
		return lambda - 1
	case Tearing:
		return 180/degrees - 1
	case Closed:
		return 360/degrees - 1
	}
	return math.NaN()
}
