package outline

import (
	"fmt"
	"math"

	"gonum.org/v1/gonum/spatial/r2"
)

// Whole completes a half outline, which lies above y = 0 and has straight
// sides on that line, by its mirror image. The sides on the line vanish; the
// chains of sides between them close into loops with their images. Holes
// above the line appear twice. Images keep the names of their originals.
//
// The error says which side lies below the line, or that no side lies on it:
// such a region and its image are two.
func (r *Region) Whole() (*Region, error) {
	near := jointTolerance * r.size()
	for i, s := range r.Sides() {
		if y := s.Curve.Bounds().Min.Y; y < -near {
			return nil, fmt.Errorf("%s lies below y = 0, down to %s", r.sideName(i), number(y))
		}
	}
	w := new(Region)
	for _, c := range r.chains(near) {
		m := &Region{Outer: c}
		loop := append(c, m.Mirrored().Outer...)
		switch a := loop.area(); {
		case a < 0:
			w.Holes = append(w.Holes, loop)
		case w.Outer == nil:
			w.Outer = loop
		default:
			return nil, fmt.Errorf("half outline has two parts, the second from %s", place(c[0].Curve.At(0)))
		}
	}
	if w.Outer == nil {
		return nil, fmt.Errorf("half outline has no side on y = 0 to be completed along")
	}
	w.Holes = append(w.Holes, r.Holes...)
	w.Holes = append(w.Holes, r.Mirrored().Holes...)
	return w, nil
}

// chains cuts the outer loop at its sides on y = 0, which are left out.
func (r *Region) chains(near float64) []Loop {
	n := len(r.Outer)
	onAxis := func(i int) bool {
		l, ok := r.Outer[i%n].Curve.(Line)
		return ok && max(math.Abs(l.A.Y), math.Abs(l.B.Y)) <= near
	}
	first := 0
	for first < n && !onAxis(first) {
		first++
	}
	if first == n {
		return nil
	}
	var cs []Loop
	for j := first + 1; j <= first+n; j++ {
		switch {
		case onAxis(j):
		case onAxis(j - 1):
			cs = append(cs, Loop{r.Outer[j%n]})
		default:
			cs[len(cs)-1] = append(cs[len(cs)-1], r.Outer[j%n])
		}
	}
	return cs
}

// Half gives the part of a whole outline above y = 0, closed along that line
// by straight sides of the given name. The outline must be its own mirror
// image to 1e-9 of its size.
func (r *Region) Half(axis string) (*Region, error) {
	if err := r.checkSymmetry(); err != nil {
		return nil, err
	}
	h := new(Region)
	var chains []Loop
	for k, l := range r.loops() {
		parts := l.above(sameDepth * r.size())
		switch cs, closed := joinUp(parts); {
		case closed && k == 0:
			return nil, fmt.Errorf("outer loop does not cross y = 0")
		case closed:
			h.Holes = append(h.Holes, parts)
		default:
			chains = append(chains, cs...)
		}
	}
	if len(chains) == 0 {
		return nil, fmt.Errorf("outer loop does not cross y = 0")
	}
	var err error
	h.Outer, err = alongAxis(chains, axis)
	return h, err
}

// above lists the parts of a loop's sides above y = 0, cut where they cross it.
func (l Loop) above(near float64) Loop {
	var up Loop
	for i, s := range l {
		end := l[(i+1)%len(l)].Curve.At(0)
		cuts, points := []float64{0}, []r2.Vec{onAxis(s.Curve.At(0), near)}
		for _, t := range append(turningPoints(s.Curve, axisY), 1) {
			p := end
			if t < 1 {
				p = s.Curve.At(t)
			}
			p = onAxis(p, near)
			t0, p0 := cuts[len(cuts)-1], points[len(points)-1]
			if p0.Y < 0 && p.Y > 0 || p0.Y > 0 && p.Y < 0 {
				st := stretch{s.Curve, t0, t, p0.Y, p.Y}
				u := st.param(0, axisY)
				cuts, points = append(cuts, u), append(points, r2.Vec{X: s.Curve.At(u).X})
			}
			cuts, points = append(cuts, t), append(points, p)
		}
		// Join again what no crossing separates.
		for j := 1; j < len(cuts); {
			k := j
			for k+1 < len(cuts) && points[k].Y != 0 {
				k++
			}
			mid := s.Curve.At((cuts[j-1] + cuts[k]) / 2)
			if mid.Y > near {
				up = append(up, Side{s.Name, part(s.Curve, cuts[j-1], cuts[k], points[j-1], points[k])})
			}
			j = k + 1
		}
	}
	return up
}

// onAxis puts points that miss y = 0 by rounding onto it.
func onAxis(p r2.Vec, near float64) r2.Vec {
	if math.Abs(p.Y) <= near {
		p.Y = 0
	}
	return p
}

// joinUp divides the upper parts of a loop into chains from axis to axis. A
// loop that never meets the axis is closed.
func joinUp(parts Loop) (chains []Loop, closed bool) {
	n := len(parts)
	first := 0
	for first < n && parts[first].Curve.At(0).Y != 0 {
		first++
	}
	if first == n {
		return nil, n > 0
	}
	for j := range n {
		s := parts[(first+j)%n]
		if s.Curve.At(0).Y == 0 {
			chains = append(chains, nil)
		}
		chains[len(chains)-1] = append(chains[len(chains)-1], s)
	}
	return chains, false
}

// alongAxis joins chains into one loop: from the end of each the material lies
// to the right along the axis, up to the nearest start of a chain. A connected
// outline that is its own image has a connected half, so that one loop takes
// up all chains unless the outline is not valid.
func alongAxis(chains []Loop, name string) (Loop, error) {
	var loop Loop
	at := 0
	for joined := 1; ; joined++ {
		c := chains[at]
		end := c[len(c)-1].Curve.At(1)
		at = nextStart(chains, end.X)
		if at < 0 || at == 0 && joined < len(chains) || joined > len(chains) {
			return nil, fmt.Errorf("upper half does not close at %s: outline is not valid", place(end))
		}
		loop = append(append(loop, c...), Side{name, Line{end, chains[at][0].Curve.At(0)}})
		if at == 0 {
			return loop, nil
		}
	}
}

// nextStart finds the chain that starts next to the right of x, or gives −1.
func nextStart(chains []Loop, x float64) int {
	next, least := -1, math.Inf(1)
	for k, c := range chains {
		if s := c[0].Curve.At(0).X; s > x && s < least {
			next, least = k, s
		}
	}
	return next
}

// checkSymmetry looks whether the images of points on every side lie on the
// boundary.
func (r *Region) checkSymmetry() error {
	tol := jointTolerance * r.size()
	sides := r.Sides()
	for i, s := range sides {
		for _, t := range [5]float64{0, 0.2, 0.4, 0.6, 0.8} {
			p := s.Curve.At(t)
			q := r2.Vec{X: p.X, Y: -p.Y}
			least := math.Inf(1)
			for _, o := range sides {
				least = min(least, r2.Norm(r2.Sub(o.Curve.At(o.Curve.Nearest(q)), q)))
			}
			if !(least <= tol) {
				return fmt.Errorf("%s has no mirror image in y = 0 for its point %s", r.sideName(i), place(p))
			}
		}
	}
	return nil
}
