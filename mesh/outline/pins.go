package outline

import "gonum.org/v1/gonum/spatial/r2"

// pins hold the exact end points of a curve whose formula gives them with
// rounding errors only. They keep joints tight to the last bit: the formula
// rules inside, the pins rule at t = 0 and t = 1.
type pins struct {
	set      bool
	from, to r2.Vec
}

func pinned(from, to r2.Vec) pins { return pins{true, from, to} }

// at gives the pinned point, if t has one.
func (p pins) at(t float64) (r2.Vec, bool) {
	switch {
	case !p.set:
		return r2.Vec{}, false
	case t == 0:
		return p.from, true
	case t == 1:
		return p.to, true
	}
	return r2.Vec{}, false
}
