package specimen

import (
	"math"
	"slices"

	"notchproof/mesh/outline"
)

// A concave corner blunter than this counts as smooth: that far arcs drawn with
// coordinates of a few decimals miss the tangent, and over the lengths that a
// mesh resolves so weak a corner raises nothing.
const bluntCorner = 0.1 // degrees

// sharpCorners lists the concave corners without a radius, where the stress of
// an elastic solid has no bound. A corner on the line along which a half is
// completed counts with its image.
func (p *Part) sharpCorners() []outline.Corner {
	sides := p.Region.Sides()
	var sharp []outline.Corner
	for _, c := range p.Region.Corners() {
		if p.Half && onAxis(sides[c.Before].Curve) != onAxis(sides[c.After].Curve) {
			c.Degrees *= 2
		}
		if c.Degrees > 180+bluntCorner {
			sharp = append(sharp, c)
		}
	}
	return sharp
}

// choose settles where the factor is sought: on the sides that the drawing
// names, else on every concave run, else, where there is none, on the sides
// that meet in the sharp corners, to show that there is no factor.
func (s sheet) choose(p *Part, given bool) error {
	i := 0
	for _, loop := range s {
		for _, side := range loop {
			if side.notch {
				p.Notch = append(p.Notch, i)
			}
			i++
		}
	}
	sides := p.Region.Sides()
	bare := func(i int) bool {
		return i != p.Plain[0].End && i != p.Plain[1].End && !(p.Half && onAxis(sides[i].Curve))
	}
	if given {
		for _, i := range p.Notch {
			if !bare(i) {
				return drawingFault("notch", sides[i].Name, "an end or the axis is no notch", "name sides that are free")
			}
		}
		return nil
	}
	for _, run := range p.Region.ConcaveRuns() {
		p.Notch = append(p.Notch, run.Sides...)
	}
	if len(p.Notch) == 0 {
		for _, c := range p.Sharp {
			p.Notch = append(p.Notch, c.Before, c.After)
		}
		p.Notch = slices.DeleteFunc(p.Notch, func(i int) bool { return !bare(i) })
	}
	slices.Sort(p.Notch)
	p.Notch = slices.Compact(p.Notch)
	if len(p.Notch) == 0 {
		return drawingFault("outline", "", "nothing concave: there is no notch", "a plain part has the factor 1; name sides with \"notch\" to look elsewhere")
	}
	return nil
}

// notchRange is the stretch of x that the notch takes up.
func (p *Part) notchRange() (from, to float64) {
	sides := p.Region.Sides()
	from, to = math.Inf(1), math.Inf(-1)
	for _, i := range p.Notch {
		b := sides[i].Curve.Bounds()
		from, to = math.Min(from, b.Min.X), math.Max(to, b.Max.X)
	}
	return from, to
}
