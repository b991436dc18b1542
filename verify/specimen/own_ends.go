package specimen

import (
	"fmt"
	"math"
	"slices"

	"gonum.org/v1/gonum/spatial/r2"

	"notchproof/mesh/outline"
)

const endHint = "draw both ends straight and square to the axis, better three than two sizes away from the notch: the loads enter there"

// arrange finds the loaded ends and the plain stretches before them, and lets
// the outer loop begin behind the left end, at its lower corner, wherever the
// drawing began: the same shape then gives the same mesh.
func (s sheet) arrange(p *Part) error {
	left, err := findEnd(p.Region, -1)
	if err != nil {
		return err
	}
	begin := (left + 1) % len(s[0])
	s[0] = slices.Concat(s[0][begin:], s[0][:begin])
	p.Region = s.region()
	for _, side := range []float64{-1, 1} {
		end, err := findEnd(p.Region, side)
		if err != nil {
			return err
		}
		p.Plain = append(p.Plain, plainStretch(p.Region, end, side))
	}
	return p.checkLength()
}

// longestPart is how many times longer than its ends are high a part may be. A
// beam's stiffness in bending falls behind that of its material with the square
// of this, and rounding with it gains on the supports: beyond a few hundred the
// checks of a solve no longer pass.
const longestPart = 200

func (p *Part) checkLength() error {
	a, b := p.Plain[0], p.Plain[1]
	size := math.Min(a.High-a.Low, b.High-b.Low)
	if p.Half {
		size = 2 * math.Min(a.High, b.High)
	}
	if times := (b.To - a.To) / size; times > longestPart {
		return drawingFault("outline", "", fmt.Sprintf("%.4g times longer than its ends are high, more than %d", times, longestPart),
			"shorten the plain ends: what is more than three sizes away from the notch changes nothing")
	}
	return nil
}

// findEnd finds the end at the smallest x (side −1) or the largest (side 1).
func findEnd(r *outline.Region, side float64) (int, error) {
	near, b := slack(r), r.Bounds()
	x, name := b.Min.X, "left"
	if side > 0 {
		x, name = b.Max.X, "right"
	}
	found := -1
	for i, s := range r.Outer {
		l, ok := s.Curve.(outline.Line)
		if !ok || math.Abs(l.A.X-x) > near || math.Abs(l.B.X-x) > near {
			continue
		}
		if found >= 0 {
			return 0, drawingFault("outline", "", fmt.Sprintf("%s end at x = %.6g in several pieces", name, x), endHint)
		}
		found = i
	}
	if found < 0 {
		return 0, drawingFault("outline", "", fmt.Sprintf("no straight side across the axis at the %s end, x = %.6g", name, x), endHint)
	}
	return found, nil
}

// plainStretch follows the two sides that meet an end as far as they run along
// the axis and nothing else comes beside them. Where they do not run along it
// the stretch has next to no length.
func plainStretch(r *outline.Region, end int, side float64) Plain {
	n := len(r.Outer)
	l := r.Outer[end].Curve.(outline.Line)
	before, after := (end+n-1)%n, (end+1)%n
	name := "left end"
	if side > 0 {
		name = "right end"
	}
	// A stretch of next to no length still tells which way its end faces.
	plain := Plain{Name: name, From: l.A.X - float64(side*slack(r)), To: l.A.X, Low: math.Min(l.A.Y, l.B.Y), High: math.Max(l.A.Y, l.B.Y), End: end}
	if !alongAxis(r.Outer[before].Curve) || !alongAxis(r.Outer[after].Curve) {
		return plain
	}
	// Of all sides but these three, the place nearest to the end.
	limit := math.Inf(1)
	for i, s := range r.Sides() {
		b := s.Curve.Bounds()
		if i == end || i == before || i == after {
			continue
		}
		limit = math.Min(limit, math.Min(side*(plain.To-b.Min.X), side*(plain.To-b.Max.X)))
	}
	for _, i := range []int{before, after} {
		limit = math.Min(limit, r2.Norm(r2.Sub(r.Outer[i].Curve.At(1), r.Outer[i].Curve.At(0))))
	}
	plain.From = plain.To - float64(side*math.Max(slack(r), limit))
	return plain
}

// alongAxis tells whether a side is straight and parallel to y = 0.
func alongAxis(c outline.Curve) bool {
	l, ok := c.(outline.Line)
	return ok && math.Abs(l.A.Y-l.B.Y) <= sameShape*math.Abs(l.A.X-l.B.X)
}
