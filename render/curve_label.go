package render

import (
	"math"
	"sort"
)

// An ending is the label of a curve and where the curve ends.
type ending struct {
	at    point
	label string
}

// atRim is how close to the right side of the frame, as a share of its width,
// a curve ends whose label stands outside.
const atRim = 0.03

// endRoom is the room that labels need on the right side of a frame, in pixels.
// They are broken into lines where they would take up too much of it.
func (s *sheet) endRoom(cell box, d Diagram) float64 {
	x, _ := d.scales()
	widest := 0.0
	for _, c := range d.Curves {
		if n := len(c.Points); n == 0 || c.Label == "" || !x.nearHigh(c.Points[n-1].X) {
			continue
		}
		for _, line := range s.endLines(cell, c.Label) {
			widest = math.Max(widest, s.measure(line, small))
		}
	}
	if widest == 0 {
		return 0
	}
	return widest + s.u(26)
}

// endLines breaks the label of a curve into lines.
func (s *sheet) endLines(cell box, label string) []string {
	return s.wrap(label, small, math.Max(s.u(130), 0.2*cell.width()), 4)
}

// nearHigh tells whether a value is as good as the upper end of an axis, or
// beyond.
func (a axis) nearHigh(v float64) bool {
	a.from, a.to = 0, 1
	return a.at(v) >= 1-atRim
}

// ending gives where a curve leaves the frame or stops.
func (p *panel) ending(c Curve) (ending, bool) {
	n := len(c.Points)
	if n == 0 || c.Label == "" {
		return ending{}, false
	}
	last := c.Points[n-1]
	at := p.position(last.X, last.Y)
	at.X = math.Min(at.X, p.frame.X1)
	at.Y = math.Max(p.frame.Y0, math.Min(p.frame.Y1, at.Y))
	return ending{at, c.Label}, true
}

// endings letters the labels of all curves: outside for curves that run through
// to the right side, beside their end for others.
func (p *panel) endings(list []ending) {
	var outside []ending
	for _, e := range list {
		if e.at.X >= p.frame.X1-atRim*p.frame.width() {
			outside = append(outside, e)
		} else {
			p.name(e.at, e.label)
		}
	}
	sort.SliceStable(outside, func(i, j int) bool { return outside[i].at.Y < outside[j].at.Y })
	p.outside(outside)
}

// outside stacks labels beside the frame, each as close to its curve's end as
// the others let it be, with a line to it.
func (p *panel) outside(list []ending) {
	cell := box{p.frame.X0, 0, p.sheet.paper.X1 - p.u(sheetMargin), 0}
	leading := p.u(small.Size + 3)
	lines := make([][]string, len(list))
	heights, wishes := make([]float64, len(list)), make([]float64, len(list))
	for i, e := range list {
		lines[i] = p.endLines(cell, e.label)
		heights[i] = leading*float64(len(lines[i])) + p.u(5)
		wishes[i] = e.at.Y
	}
	for i, y := range spread(wishes, heights, p.frame.Y0-p.u(10), p.frame.Y1+p.u(10)) {
		x := p.frame.X1 + p.u(22)
		p.pen(ink, hairline)
		p.line(point{math.Max(list[i].at.X+p.u(7), p.frame.X1), list[i].at.Y}, point{x - p.u(4), y})
		top := y - leading*float64(len(lines[i]))/2
		for k, line := range lines[i] {
			p.text(point{x, top + leading*(float64(k)+0.5)}, 0, 0.5, line, small, ink)
		}
	}
}

// spread moves pieces of given heights, in the order of where their middles
// would like to be, apart until none overlap, and keeps them between low and
// high if they fit there. What each piece moves is least in squares: less the
// heights before it, a place only has to be no higher than that of the piece
// before, which pooling adjacent violators brings about (M. Ayer et al., Ann.
// Math. Stat. 26 (1955) 641).
func spread(wishes, heights []float64, low, high float64) []float64 {
	type pool struct {
		sum   float64
		count int
	}
	var pools []pool
	before := make([]float64, len(wishes)) // heights before the middle of each piece
	total := 0.0
	for i, h := range heights {
		before[i] = total + h/2
		total += h
		pools = append(pools, pool{wishes[i] - before[i], 1})
		for n := len(pools); n > 1 && pools[n-2].sum*float64(pools[n-1].count) > pools[n-1].sum*float64(pools[n-2].count); n-- {
			pools[n-2] = pool{pools[n-2].sum + pools[n-1].sum, pools[n-2].count + pools[n-1].count}
			pools = pools[:n-1]
		}
	}
	middles := make([]float64, 0, len(wishes))
	for _, k := range pools {
		at := math.Max(low, math.Min(high-total, k.sum/float64(k.count)))
		for range k.count {
			middles = append(middles, at+before[len(middles)])
		}
	}
	return middles
}

// name letters a point where there is room beside it.
func (p *panel) name(q point, text string) {
	for _, d := range [8][4]float64{{0, -11, 0.5, 1}, {9, -9, 0, 1}, {13, 0, 0, 0.5}, {0, 11, 0.5, 0}, {9, 9, 0, 0}, {-13, 0, 1, 0.5}, {-9, 9, 1, 0}, {-9, -9, 1, 1}} {
		at := q.plus(p.u(d[0]), p.u(d[1]))
		if b := p.sheet.place(at, d[2], d[3], text, small); p.free(b) && p.frame.holds(b) {
			p.text(at, d[2], d[3], text, small, ink)
			return
		}
	}
}

// levelLabel letters a level above or below its line and band.
func (p *panel) levelLabel(l Level) {
	if l.Label == "" {
		return
	}
	top, bottom := p.height(l.Value+l.Bar)-p.u(4), p.height(l.Value-l.Bar)+p.u(4)
	left, right := p.frame.X0+p.u(10), p.frame.X1-p.u(10)
	for _, c := range []struct {
		at     point
		ax, ay float64
	}{{point{left, top}, 0, 1}, {point{right, top}, 1, 1}, {point{left, bottom}, 0, 0}, {point{right, bottom}, 1, 0},
		{point{(left + right) / 2, top}, 0.5, 1}, {point{(left + right) / 2, bottom}, 0.5, 0}} {
		if b := p.sheet.place(c.at, c.ax, c.ay, l.Label, small); p.free(b) && p.frame.holds(b) {
			p.text(c.at, c.ax, c.ay, l.Label, small, accent)
			return
		}
	}
}
