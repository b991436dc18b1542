package specimen

import (
	"math"
	"slices"

	"gonum.org/v1/gonum/spatial/r2"

	"notchproof/mesh/outline"
)

// endLength is the length of the plain ends in units of their own size. What a
// notch does to the stress dies out along a strip at least as fast as
// exp(−4.2 x/width) (Saint-Venant's principle; the slowest of the
// Papkovich-Fadle modes), and meets the end twice before it is back: at three
// sizes nothing of it is left in eight digits.
const endLength = 3

// sliver is the length, as a share of a part's, below which a side is not
// drawn: an outline does not pass with sides shorter than 1e-8 of its size.
// Dimensions that leave less are brought to where they leave nothing.
const sliver = 1.2e-8

// A trace draws a loop side by side, from a first corner on.
type trace struct {
	loop outline.Loop
	at   r2.Vec
}

// line goes straight to a corner and tells the index of the side.
func (t *trace) line(name string, x, y float64) int {
	to := r2.Vec{X: x, Y: y}
	return t.add(name, outline.Line{A: t.at, B: to}, to)
}

// arc goes to a corner clockwise about a centre, bending into the material.
func (t *trace) arc(name string, x, y, centerX, centerY float64) int {
	to := r2.Vec{X: x, Y: y}
	arc, err := outline.NewArc(t.at, to, r2.Vec{X: centerX, Y: centerY}, false)
	if err != nil {
		panic("specimen: arc whose ends are not equally far from its centre")
	}
	return t.add(name, arc, to)
}

// curve goes along a curve that begins where the trace is.
func (t *trace) curve(name string, c outline.Curve) int { return t.add(name, c, c.At(1)) }

func (t *trace) add(name string, c outline.Curve, to r2.Vec) int {
	t.loop = append(t.loop, outline.Side{Name: name, Curve: c})
	t.at = to
	return len(t.loop) - 1
}

// cutArc is the half width and half angle of an arc of radius r that rises to
// the height h ≤ r over its lowest point. The sine of half the angle keeps its
// digits where the arc is flat: h = 2r sin²(φ/2).
func cutArc(h, r float64) (run, angle float64) {
	angle = 2 * math.Asin(math.Sqrt(h/(2*r)))
	return math.Sqrt(h * (2*r - h)), angle
}

// noSide stands for the index of a root that has no radius and is not drawn.
const noSide = -1

// finish completes a part from its outline and notch sides. Where these have no
// radius it is the sides that meet in the sharp corners.
func finish(p *Part, region *outline.Region, notch ...int) *Part {
	p.Region = region
	p.Sharp = p.sharpCorners()
	p.Notch = slices.DeleteFunc(notch, func(i int) bool { return i == noSide })
	if len(p.Notch) == 0 {
		for _, c := range p.Sharp {
			p.Notch = append(p.Notch, c.Before, c.After)
		}
		slices.Sort(p.Notch)
		p.Notch = slices.Compact(p.Notch)
	}
	p.Joints = findJoints(region, p.Notch)
	p.Watch = p.offNotch()
	return p
}

// offNotch lists the free sides that do not belong to the notch.
func (p *Part) offNotch() []int {
	taken := make(map[int]bool)
	for _, side := range p.Notch {
		taken[side] = true
	}
	for _, plain := range p.Plain {
		taken[plain.End] = true
	}
	if p.Half {
		for _, side := range p.axis() {
			taken[side] = true
		}
	}
	var free []int
	for i := range p.Region.Sides() {
		if !taken[i] {
			free = append(free, i)
		}
	}
	return free
}
