package sizing

import (
	"math"

	"notchproof/scf"
)

// A coordinate is what the search moves in: the logarithm of a length, in
// which factors are nearly straight lines, or the value itself where it may be
// zero. Where another dimension sets an end of the interval, as the net size
// sets the least gross one, it is the distance from that end that counts:
// log(x − from), log(x/(to − x)), or both.
type coordinate struct {
	linear   bool
	from, to float64 // ends set by other dimensions; 0: none
}

// limiting tells an end that another dimension sets from one that only what can
// be meshed does: it lies within these shares of the size of the part.
const (
	leastLimiting = 0.05
	mostSize      = 10
)

// coordinate chooses it for an interval of what can be drawn.
func (q *Question) coordinate(kind scf.Dimension, in Interval) coordinate {
	c := coordinate{linear: kind.Angle || kind.Zero || kind.Signed}
	if c.linear {
		return c
	}
	size := q.size()
	if in.From > leastLimiting*size {
		c.from = in.From
	}
	if in.To <= mostSize*size && in.To > c.from {
		c.to = in.To
	}
	return c
}

func (c coordinate) of(x float64) float64 {
	switch {
	case c.linear:
		return x
	case c.to > 0:
		return math.Log((x - c.from) / (c.to - x))
	}
	return math.Log(x - c.from)
}

func (c coordinate) back(u float64) float64 {
	e := math.Exp(u)
	switch {
	case c.linear:
		return u
	case c.to > 0:
		return c.from + (c.to-c.from)*e/(1+e)
	}
	return c.from + e
}
