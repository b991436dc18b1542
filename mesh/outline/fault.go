package outline

import (
	"fmt"
	"strings"

	"gonum.org/v1/gonum/spatial/r2"
)

// FaultKind says what is wrong with a region.
type FaultKind int

const (
	// NoSides: a loop is empty.
	NoSides FaultKind = iota + 1
	// NotFinite: a side holds an infinite value or one that is no number.
	NotFinite
	// NoLength: a side is shorter than 1e-8 of the region.
	NoLength
	// NoRadius: the radius or a semi-axis of an arc is not positive.
	NoRadius
	// FullTurn: an arc sweeps more than a full turn.
	FullTurn
	// Stall: the derivative of a cubic vanishes, at an end or at a cusp.
	Stall
	// Cusp: two sides fold back onto each other at their joint.
	Cusp
	// Gap: a side does not begin where the one before ends.
	Gap
	// Meeting: sides cross or touch.
	Meeting
	// WrongWay: the outer loop runs clockwise, or a hole counter-clockwise.
	WrongWay
	// Outside: a hole is not inside the outer loop.
	Outside
	// Nested: a hole is inside another.
	Nested
)

// A Fault is the error that Validate returns.
type Fault struct {
	Kind  FaultKind
	Sides []string // the sides, or for the last three kinds the loops, concerned
	Where r2.Vec   // where that is
	Gap   float64  // for Gap, its width
}

func (f *Fault) Error() string {
	who, at := strings.Join(f.Sides, " and "), place(f.Where)
	switch f.Kind {
	case NoSides:
		return who + " has no sides"
	case NotFinite:
		return who + " has a value that is not finite"
	case NoLength:
		return fmt.Sprintf("%s at %s has no length", who, at)
	case NoRadius:
		return fmt.Sprintf("%s at %s has a radius that is not positive", who, at)
	case FullTurn:
		return fmt.Sprintf("%s at %s sweeps more than a full turn", who, at)
	case Stall:
		return fmt.Sprintf("%s stands still at %s: control points coincide there or it has a cusp", who, at)
	case Cusp:
		return fmt.Sprintf("%s fold back on each other at %s", who, at)
	case Gap:
		return fmt.Sprintf("%s do not join: gap of %.3g at %s", who, f.Gap, at)
	case Meeting:
		if len(f.Sides) == 1 {
			return fmt.Sprintf("%s crosses or touches itself at %s", who, at)
		}
		return fmt.Sprintf("%s cross or touch at %s", who, at)
	case WrongWay:
		if f.Sides[0] == outerName {
			return fmt.Sprintf("%s through %s runs clockwise", who, at)
		}
		return fmt.Sprintf("%s through %s runs counter-clockwise", who, at)
	case Outside:
		return fmt.Sprintf("%s through %s lies outside the outer loop", who, at)
	case Nested:
		return fmt.Sprintf("%s lies inside %s at %s", f.Sides[0], f.Sides[1], at)
	}
	panic("outline: fault of no kind")
}

const outerName = "outer loop"

// loopName names loop k: 0 is the outer one, k > 0 the k-th hole.
func loopName(k int) string {
	if k == 0 {
		return outerName
	}
	return fmt.Sprintf("hole %d", k)
}

// sideName names a side by its place, counted from 1, and its own name.
func (r *Region) sideName(index int) string {
	k, i, s := r.locate(index)
	where := fmt.Sprintf("side %d of the outer loop", i+1)
	if k > 0 {
		where = fmt.Sprintf("side %d of hole %d", i+1, k)
	}
	if s.Name == "" {
		return where
	}
	return fmt.Sprintf("%q (%s)", s.Name, where)
}

// locate finds the loop (0 the outer one) and the place in it of a side.
func (r *Region) locate(index int) (loop, place int, s Side) {
	for k, l := range r.loops() {
		if index < len(l) {
			return k, index, l[index]
		}
		index -= len(l)
	}
	panic("outline: no side of this number")
}

// loops lists the outer loop and the holes.
func (r *Region) loops() []Loop { return append([]Loop{r.Outer}, r.Holes...) }
