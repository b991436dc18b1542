package render

import "math"

// contours traces the lines on which a raster takes each of some levels, in
// rising order, by marching over squares of four pixel centres. Lines end at
// the edge of the material; closed ones end where they begin. Positions are
// linear between centres.
//
// All levels are found in one pass: every pixel is given the number of levels
// that it reaches, and only squares whose corners differ in it are looked at.
func contours(r *raster, levels []float64) [][][]point {
	reached := ranks(r, levels)
	w, h := r.area.Dx(), r.area.Dy()
	const band = 32
	bands := (h + band - 1) / band
	crossed := make([][][]int, bands) // by band and level: the squares, by their first pixel
	concurrently(bands, func() func(i int) {
		return func(i int) {
			crossed[i] = make([][]int, len(levels))
			for y := i * band; y < min((i+1)*band, h-1); y++ {
				upper, lower := reached[y*w:(y+1)*w], reached[(y+1)*w:(y+2)*w]
				for x := range w - 1 {
					a, b, c, d := upper[x], upper[x+1], lower[x+1], lower[x]
					if a == b && b == c && c == d {
						continue
					}
					lo, hi := min(a, b, c, d), max(a, b, c, d)
					if hi == noMaterial {
						continue
					}
					for l := lo; l < hi; l++ {
						crossed[i][l] = append(crossed[i][l], y*w+x)
					}
				}
			}
		}
	})
	lines := make([][][]point, len(levels))
	concurrently(len(levels), func() func(l int) {
		return func(l int) {
			t := tracer{r: r, level: levels[l], w: w, links: make(map[int][2]int)}
			for _, squares := range crossed {
				for _, i := range squares[l] {
					t.square(i)
				}
			}
			lines[l] = t.chain()
		}
	})
	return lines
}

const noMaterial = math.MaxUint8

// ranks counts the levels that each pixel reaches.
func ranks(r *raster, levels []float64) []uint8 {
	if len(levels) >= noMaterial {
		panic("render: too many levels")
	}
	out := make([]uint8, len(r.values))
	const piece = 1 << 14
	concurrently((len(out)+piece-1)/piece, func() func(i int) {
		return func(i int) {
			l := 0 // neighbours differ by little: on from the last one
			for k := i * piece; k < min((i+1)*piece, len(out)); k++ {
				v := r.values[k]
				if v != v {
					out[k] = noMaterial
					continue
				}
				for l < len(levels) && levels[l] <= v {
					l++
				}
				for l > 0 && levels[l-1] > v {
					l--
				}
				out[k] = uint8(l)
			}
		}
	})
	return out
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
func (t *tracer) square(i int) {
	v := t.r.values
	ends := [5]float64{v[i], v[i+1], v[i+t.w+1], v[i+t.w], v[i]} // clockwise from the top left
	top, right, bottom, left := 2*i, 2*(i+1)+1, 2*(i+t.w), 2*i+1
	above := func(v float64) bool { return v >= t.level }
	var cut [4]int
	n := 0
	for k, s := range [4]int{top, right, bottom, left} {
		if above(ends[k]) != above(ends[k+1]) {
			cut[n] = s
			n++
		}
	}
	switch {
	case n == 2:
		t.tie(cut[0], cut[1])
	case above((ends[0]+ends[1]+ends[2]+ends[3])/4) == above(ends[0]): // saddle: top left and bottom right are joined
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
