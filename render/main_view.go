package render

import (
	"math"

	"gonum.org/v1/gonum/spatial/r2"

	"notchproof/verify/specimen"
)

// extent is the part of the x axis that a notch takes up, and the half height
// (or the range of y) of the whole part.
type extent struct {
	notch0, notch1 float64
	low, high      float64
}

func extentOf(part *specimen.Part) extent {
	e := extent{math.Inf(1), math.Inf(-1), math.Inf(1), math.Inf(-1)}
	sides := part.Region.Sides()
	for _, side := range sides {
		b := side.Curve.Bounds()
		e.low, e.high = math.Min(e.low, b.Min.Y), math.Max(e.high, b.Max.Y)
	}
	for _, i := range part.Notch {
		b := sides[i].Curve.Bounds()
		e.notch0, e.notch1 = math.Min(e.notch0, b.Min.X), math.Max(e.notch1, b.Max.X)
	}
	if part.Half {
		e.low = -e.high
	}
	return e
}

// mainView fits the whole part into an area of the sheet. Its plain ends are
// broken off so that what is shown on either side of the notch is between
// least and most heights long; left and right are where.
func mainView(part *specimen.Part, area box, scale float64) (v *view, left, right float64) {
	return partView(part, area, true, scale)
}

// partView fits the part into an area, whole or, where a half is modelled, down
// to the line of symmetry. In a narrow area less of the plain ends is shown.
func partView(part *specimen.Part, area box, whole bool, scale float64) (v *view, left, right float64) {
	const most = 1.7
	least := 0.75
	if area.width() < 800*scale {
		least = 0.4
	}
	e := extentOf(part)
	height := e.high - e.low
	notch := e.notch1 - e.notch0
	v = &view{mirror: part.Half && whole, half: part.Half && !whole}
	low := e.low
	if v.half {
		low = 0
	}
	// The ends of the plain stretches, inside which the breaks must lie.
	first, last := e.notch0-most*height, e.notch1+most*height
	for _, p := range part.Plain {
		if p.To < p.From {
			first = math.Max(first, p.To)
		} else {
			last = math.Min(last, p.To)
		}
	}
	left, right = math.Max(first, e.notch0-least*height), math.Min(last, e.notch1+least*height)
	pixels := math.Min(area.height()/(e.high-low), area.width()/(right-left))
	inside := 2 * breakSwing * scale / pixels
	reach := (area.width()/pixels - notch) / 2
	left, right = math.Max(first+inside, e.notch0-reach), math.Min(last-inside, e.notch1+reach)
	if spare := area.width()/pixels - (right - left); spare > 0 { // one end is short: more of the other
		left, right = math.Max(first+inside, left-spare), math.Min(last-inside, right+spare)
	}
	middle := r2.Vec{X: (left + right) / 2, Y: (low + e.high) / 2}
	x, y := area.middle()
	v.scale = pixels
	// The axis lies between two rows of pixels, so that the mirror image of a
	// row is a row.
	v.origin = point{x - pixels*middle.X, math.Round(y + pixels*middle.Y)}
	v.window = broken(v.at(r2.Vec{X: left, Y: e.high}), v.at(r2.Vec{X: right, Y: low}), scale)
	return v, left, right
}

// viewSpare is what a view's window is higher than the part, at the top and at
// the bottom, in units.
const viewSpare = 3

// broken is the window of a view whose left and right ends are break lines. It
// is higher than the part by the room that quills need.
func broken(topLeft, bottomRight point, scale float64) []point {
	spare := viewSpare * scale
	top, bottom := topLeft.Y-spare, bottomRight.Y+spare
	left, right := waves(topLeft.X, top, bottom, scale), waves(bottomRight.X, bottom, top, scale)
	return append(left, right...)
}

// breakSwing is how far a break line swings out to either side, in units.
const breakSwing = 5

// waves is a break line: a free-hand line with a wave about every 90 units.
func waves(x, from, to, scale float64) []point {
	length := math.Abs(to - from)
	n := max(16, int(length/(3*scale)))
	count := math.Max(1, math.Round(length/(90*scale)))
	ps := make([]point, n+1)
	for i := range ps {
		t := float64(i) / float64(n)
		y := from + t*(to-from)
		// Counted from the top, so that both ends break in the same rhythm.
		phase := 2 * math.Pi * count * (y - math.Min(from, to)) / length
		ps[i] = point{x + breakSwing*scale*math.Sin(phase), y}
	}
	return ps
}

// endRange is the range of y of the whole part's material in its plain end to
// the left or to the right.
func endRange(part *specimen.Part, left bool) (low, high float64) {
	for _, p := range part.Plain {
		if (p.To < p.From) == left {
			low, high = p.Low, p.High
		}
	}
	if part.Half {
		low = -high
	}
	return low, high
}

// breaks strokes the break lines where there is material: on both sides of a
// bore.
func (s *sheet) breaks(v *view, part *specimen.Part, left, right float64) {
	s.pen(ink, narrow)
	for _, p := range part.Plain {
		x := right
		if p.To < p.From {
			x = left
		}
		if v.half {
			s.breakLine(v, x, p.Low, p.High)
			continue
		}
		if part.Half && p.Low > 0 {
			s.breakLine(v, x, p.Low, p.High)
			s.breakLine(v, x, -p.High, -p.Low)
			continue
		}
		low, high := endRange(part, x == left)
		s.breakLine(v, x, low, high)
	}
	s.dc.Stroke()
}

func (s *sheet) breakLine(v *view, x, low, high float64) {
	b := v.bounds()
	at := box{b.X0 - 1, v.at(r2.Vec{Y: high}).Y, b.X1 + 1, v.at(r2.Vec{Y: low}).Y}
	for _, piece := range clipLine(waves(v.at(r2.Vec{X: x}).X, b.Y0, b.Y1, s.scale), at) {
		s.polyline(piece)
	}
}
