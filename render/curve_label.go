package render

import (
	"image/color"
	"math"
	"sort"
	"strings"
)

// An ending is the label of a curve and where the curve ends.
type ending struct {
	at    point
	label string
	path  []point // of the whole curve
}

// atRim is how close to the right side of the frame, as a share of its width,
// a curve ends whose label stands outside.
const atRim = 0.1

// endRoom is the room that labels need on the right side of a frame, in pixels.
// They are broken into lines where they would take up too much of it. Where any
// stands there, there is room for all: one that finds no place inside comes too.
func (s *sheet) endRoom(cell box, d Diagram) float64 {
	x, _ := d.scales()
	widest, needed := 0.0, false
	for _, c := range d.Curves {
		if n := len(c.Points); n == 0 || c.Label == "" {
			continue
		} else if x.nearHigh(c.Points[n-1].X) {
			needed = true
		}
		for _, line := range s.endLines(cell, c.Label) {
			widest = math.Max(widest, s.measure(line, small))
		}
	}
	if !needed {
		return 0
	}
	return widest + s.u(26)
}

// endLines breaks the label of a curve into lines, none narrower than its words.
func (s *sheet) endLines(cell box, label string) []string {
	width := math.Max(s.u(130), 0.2*cell.width())
	for _, word := range wordsOf(label) {
		width = math.Max(width, s.measure(word, small))
	}
	return s.wrap(label, small, width, 6)
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
	e := ending{at: at, label: c.Label}
	for _, q := range c.Points {
		e.path = append(e.path, p.position(q.X, q.Y))
	}
	return e, true
}

// endings letters the labels of all curves: outside for curves that run through
// to the right side and for those that there is no room beside, else beside
// their end.
func (p *panel) endings(list []ending) {
	var outside []ending
	for _, e := range list {
		if e.at.X >= p.frame.X1-atRim*p.frame.width() || !p.inside(e) {
			outside = append(outside, e)
		}
	}
	sort.SliceStable(outside, func(i, j int) bool { return outside[i].at.Y < outside[j].at.Y })
	p.outside(outside)
}

// inside letters the label of a curve beside it, in one line or broken into
// several, as close to its end as there is room; further off with a line to it.
func (p *panel) inside(e ending) bool {
	width := p.measure(e.label, small)
	for _, off := range [5]float64{10, 20, 36, 56, 80} {
		for _, part := range [3]float64{1, 0.6, 0.4} {
			lines := p.wrap(e.label, small, part*width+1, 6)
			if strings.Join(lines, " ") != strings.Join(wordsOf(e.label), " ") {
				continue // a word is wider than that
			}
			for _, back := range [4]float64{0, 0.1, 0.25, 0.45} {
				at := e.path[int(float64(len(e.path)-1)*(1-back))]
				if p.beside(at, off, lines, len(e.path) == 1) {
					return true
				}
			}
		}
	}
	return false
}

// beside letters lines at a distance, in units, from a point, in the first of
// eight directions that is free: of a single point above it, of a curve beyond
// its end.
func (p *panel) beside(at point, off float64, lines []string, single bool) bool {
	directions := []point{{1, 0}, {1, -1}, {1, 1}, {0, -1}, {0, 1}, {-1, -1}, {-1, 1}, {-1, 0}}
	if single {
		directions = []point{{0, -1}, {1, -1}, {-1, -1}, {1, 0}, {-1, 0}, {1, 1}, {-1, 1}, {0, 1}}
	}
	width, leading := 0.0, p.u(small.Size+3)
	for _, line := range lines {
		width = math.Max(width, p.measure(line, small))
	}
	height := leading * float64(len(lines))
	for _, d := range directions {
		// The side of the block that looks at the point stands off by the distance.
		x, y := at.X+d.X*p.u(off)-width*(1-d.X)/2, at.Y+d.Y*p.u(off)-height*(1-d.Y)/2
		b := box{x, y, x + width, y + height}
		if !p.frame.holds(b.grown(p.u(3))) || !p.free(b.widened(p.u(6))) {
			continue
		}
		if off >= 20 {
			p.pen(ink, hairline)
			p.line(at.plus(d.X*p.u(4), d.Y*p.u(4)), at.plus(d.X*p.u(off-3), d.Y*p.u(off-3)))
		}
		for k, line := range lines {
			p.onPaper(point{x, y + leading*(float64(k)+0.5)}, 0, 0.5, line, small, ink)
		}
		return true
	}
	return false
}

// outside stacks labels beside the frame, each as close to its curve's end as
// the others let it be, with a line to it.
func (p *panel) outside(list []ending) {
	leading := p.u(small.Size + 3)
	lines := make([][]string, len(list))
	heights, wishes := make([]float64, len(list)), make([]float64, len(list))
	for i, e := range list {
		lines[i] = p.endLines(p.cell, e.label)
		heights[i] = leading*float64(len(lines[i])) + p.u(5)
		wishes[i] = e.at.Y
	}
	for i, y := range spread(wishes, heights, p.frame.Y0-p.u(10), p.frame.Y1+p.u(10)) {
		x := p.frame.X1 + p.u(22)
		p.pen(ink, hairline)
		p.line(point{math.Min(list[i].at.X+p.u(9), p.frame.X1+p.u(5)), list[i].at.Y}, point{x - p.u(4), y})
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
		if b := p.sheet.place(at, d[2], d[3], text, small); p.free(b.widened(p.u(6))) && p.frame.holds(b) {
			p.onPaper(at, d[2], d[3], text, small, ink)
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
			p.onPaper(c.at, c.ax, c.ay, l.Label, small, accent)
			return
		}
	}
}

// stopLabel letters a place on the x axis beside its line, as high as there is
// room.
func (p *panel) stopLabel(s Stop) {
	if s.Label == "" {
		return
	}
	x := p.x.at(s.At)
	for y := p.frame.Y0 + p.u(8); y < p.frame.Y1-p.u(small.Size); y += p.u(10) {
		for _, side := range [2]float64{1, -1} {
			at := point{x + side*p.u(6), y}
			if b := p.sheet.place(at, (1-side)/2, 0, s.Label, small); p.free(b.widened(p.u(6))) && p.frame.holds(b) {
				p.onPaper(at, (1-side)/2, 0, s.Label, small, grey)
				return
			}
		}
	}
}

// onPaper letters on paper of its own, which the grid stops short of.
func (p *panel) onPaper(at point, ax, ay float64, text string, l lettering, c color.Color) box {
	b := p.sheet.place(at, ax, ay, text, l).grown(p.u(1.5))
	p.dc.SetColor(paper)
	p.dc.DrawRectangle(b.X0, b.Y0, b.width(), b.height())
	p.dc.Fill()
	return p.text(at, ax, ay, text, l, c)
}
