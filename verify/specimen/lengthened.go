package specimen

import (
	"math"
	"slices"

	"gonum.org/v1/gonum/spatial/r2"

	"notchproof/mesh/outline"
)

// Lengthened is the part with both plain ends longer by a number of their own
// sizes, and the same loads. If the ends are long enough nothing about the notch
// changes. An end whose neighbours do not run along the axis stays where it is.
// Sides keep their numbers.
func (p *Part) Lengthened(sizes float64) *Part {
	long := *p
	region := outline.Region{Outer: slices.Clone(p.Region.Outer), Holes: p.Region.Holes}
	long.Region = &region
	long.Plain = slices.Clone(p.Plain)
	long.Loads = slices.Clone(p.Loads)
	for i := range long.Loads {
		long.Loads[i].Pins = slices.Clone(p.Loads[i].Pins)
	}
	for i := range long.Plain {
		long.lengthen(&region, i, sizes)
	}
	return &long
}

// lengthen moves the end of plain stretch i outwards.
func (p *Part) lengthen(region *outline.Region, i int, sizes float64) {
	plain := &p.Plain[i]
	sides := region.Outer
	n := len(sides)
	before, after := (plain.End+n-1)%n, (plain.End+1)%n
	if !alongAxis(sides[before].Curve) || !alongAxis(sides[after].Curve) {
		return
	}
	size := plain.High - plain.Low
	if p.Half {
		size = 2 * plain.High
	}
	from := plain.To
	plain.To += math.Copysign(sizes*size, plain.To-plain.From)
	moved := func(at r2.Vec) r2.Vec { return r2.Vec{X: plain.To, Y: at.Y} }
	lead, end, follow := sides[before].Curve.(outline.Line), sides[plain.End].Curve.(outline.Line), sides[after].Curve.(outline.Line)
	sides[before].Curve = outline.Line{A: lead.A, B: moved(lead.B)}
	sides[plain.End].Curve = outline.Line{A: moved(end.A), B: moved(end.B)}
	sides[after].Curve = outline.Line{A: moved(follow.A), B: follow.B}
	for l := range p.Loads {
		for k := range p.Loads[l].Pins {
			if pin := &p.Loads[l].Pins[k]; pin.At.X == from {
				pin.At = moved(pin.At)
			}
		}
	}
}
