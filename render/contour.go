package render

import "math"

// contours traces the lines on which a raster takes a level, by marching over
// squares of four pixel centres. Lines end at the edge of the material; closed
// ones end where they begin. Positions are linear between centres.
func contours(r *raster, level float64) [][]point {
	t := tracer{r: r, level: level, w: r.area.Dx(), links: make(map[int][2]int)}
	for y := 0; y+1 < r.area.Dy(); y++ {
		for x := 0; x+1 < t.w; x++ {
			t.square(x, y)
		}
	}
	return t.chain()
}

// A tracer links the crossings of sides of squares. A side is numbered 2i for
// the one from pixel i to its right neighbour, 2i+1 for the one down from it.
type tracer struct {
	r     *raster
	level float64
	w     int
	links map[int][2]int // the one or two crossings that a crossing is tied to, −1: none
	order []int          // crossings as they were found, which fixes the order of the lines
}

// square ties the crossings of one square together in pairs.
func (t *tracer) square(x, y int) {
	i := y*t.w + x
	v := t.r.values
	a, b, c, d := v[i], v[i+1], v[i+t.w+1], v[i+t.w] // clockwise from the top left
	// Comparisons with NaN are false, so that squares at the rim drop out here.
	lo, hi := math.Min(math.Min(a, b), math.Min(c, d)), math.Max(math.Max(a, b), math.Max(c, d))
	if !(lo < t.level && hi >= t.level) {
		return
	}
	top, right, bottom, left := 2*i, 2*(i+1)+1, 2*(i+t.w), 2*i+1
	above := func(v float64) bool { return v >= t.level }
	var cut []int
	for k, s := range [4]int{top, right, bottom, left} {
		ends := [5]float64{a, b, c, d, a}
		if above(ends[k]) != above(ends[k+1]) {
			cut = append(cut, s)
		}
	}
	switch {
	case len(cut) == 2:
		t.tie(cut[0], cut[1])
	case above((a+b+c+d)/4) == above(a): // saddle: a and c are joined
		t.tie(top, right)
		t.tie(bottom, left)
	default:
		t.tie(left, top)
		t.tie(right, bottom)
	}
}

func (t *tracer) tie(p, q int) {
	for _, e := range [2][2]int{{p, q}, {q, p}} {
		l, ok := t.links[e[0]]
		if !ok {
			l = [2]int{-1, -1}
			t.order = append(t.order, e[0])
		}
		if l[0] < 0 {
			l[0] = e[1]
		} else {
			l[1] = e[1]
		}
		t.links[e[0]] = l
	}
}

// chain strings the crossings together: open lines first, from their ends.
func (t *tracer) chain() [][]point {
	var lines [][]point
	seen := make(map[int]bool, len(t.order))
	for _, openOnly := range [2]bool{true, false} {
		for _, start := range t.order {
			if seen[start] || openOnly && t.links[start][1] >= 0 {
				continue
			}
			lines = append(lines, t.follow(start, seen))
		}
	}
	return lines
}

func (t *tracer) follow(start int, seen map[int]bool) []point {
	var line []point
	at := start
	for {
		seen[at] = true
		line = append(line, t.crossing(at))
		next := -1
		for _, n := range t.links[at] {
			if n >= 0 && !seen[n] {
				next = n
				break
			}
		}
		if next < 0 {
			break
		}
		at = next
	}
	if l := t.links[at]; len(line) > 2 && (l[0] == start || l[1] == start) {
		line = append(line, line[0])
	}
	return line
}

// crossing is the place on a side where the level lies.
func (t *tracer) crossing(side int) point {
	i := side / 2
	p := point{float64(t.r.area.Min.X+i%t.w) + 0.5, float64(t.r.area.Min.Y+i/t.w) + 0.5}
	if side%2 == 0 {
		a, b := t.r.values[i], t.r.values[i+1]
		return p.plus((t.level-a)/(b-a), 0)
	}
	a, b := t.r.values[i], t.r.values[i+t.w]
	return p.plus(0, (t.level-a)/(b-a))
}
