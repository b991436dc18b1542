package outline

import (
	"math"
	"strconv"
	"strings"

	"gonum.org/v1/gonum/spatial/r2"
)

// FormatPath writes loops as SVG path data (y upwards) which ParsePath reads
// back with the same end points and control points to the last bit; numbers
// are the shortest that do so. Every loop is closed with Z. Curves of other
// kinds than the package's own cause a panic.
//
// An arc in path data is known by its ends and radii, which near 180° and near
// 360° tell little about its centre. Such arcs (162° to 198°, save an exact half; above 324°) are written as two or three.
func FormatPath(loops []Loop) string {
	var w pathWriter
	for _, l := range loops {
		if len(l) == 0 {
			continue
		}
		w.command('M', pair(l[0].Curve.At(0))...)
		for i, s := range l {
			w.curve(s.Curve, l[(i+1)%len(l)].Curve.At(0))
		}
		w.command('Z')
	}
	return w.String()
}

type pathWriter struct{ strings.Builder }

func (w *pathWriter) command(letter byte, args ...string) {
	if w.Len() > 0 {
		w.WriteByte(' ')
	}
	w.WriteByte(letter)
	for _, a := range args {
		w.WriteByte(' ')
		w.WriteString(a)
	}
}

// curve writes a side that ends in the corner to.
func (w *pathWriter) curve(c Curve, to r2.Vec) {
	switch c := c.(type) {
	case Line:
		w.command('L', pair(to)...)
	case Bezier:
		w.command('C', append(append(pair(c.P[1]), pair(c.P[2])...), pair(to)...)...)
	case Arc:
		w.arc(EllipticArc{A: c.Radius, B: c.Radius, Sweep: c.Sweep}, c, to)
	case EllipticArc:
		w.arc(c, c, to)
	default:
		panic("outline: path data has no such kind of curve")
	}
}

// arc writes c, which has the radii, tilt and sweep of e.
func (w *pathWriter) arc(e EllipticArc, c Curve, to r2.Vec) {
	n := arcParts(e.Sweep)
	if s := math.Abs(e.Sweep); math.Abs(s-math.Pi) < 1e-14 &&
		math.Abs(r2.Norm(e.halfChord(c.At(0), to))-1) < reachRounding {
		n = 1
	}
	tilt := "0"
	if e.A != e.B {
		tilt = degrees(e.Tilt)
	}
	large, ccw := "0", "0"
	if math.Abs(e.Sweep)/float64(n) > math.Pi*(1+1e-14) {
		large = "1"
	}
	if e.Sweep > 0 {
		ccw = "1"
	}
	for k := 1; k <= n; k++ {
		end := to
		if k < n {
			end = c.At(float64(k) / float64(n))
		}
		w.command('A', append([]string{shortest(e.A), shortest(e.B), tilt, large, ccw}, pair(end)...)...)
	}
}

// arcParts says in how many parts an arc is written.
func arcParts(sweep float64) int {
	switch s := math.Abs(sweep) / math.Pi; {
	case s > 1.8:
		return 3
	case s > 0.9 && s < 1.1:
		return 2
	}
	return 1
}

func pair(p r2.Vec) []string { return []string{shortest(p.X), shortest(p.Y)} }

// shortest writes the fewest digits that read back to x; −0 counts as 0.
func shortest(x float64) string { return strconv.FormatFloat(x+0, 'g', -1, 64) }

// degrees writes the shortest angle that radians turns back into exactly a, or
// where there is none, the one next to it.
func degrees(a float64) string {
	d := math.Mod(a, 2*math.Pi) * (180 / math.Pi)
	for digits := 1; digits <= 17; digits++ {
		s := strconv.FormatFloat(d, 'g', digits, 64)
		if x, err := strconv.ParseFloat(s, 64); err == nil && radians(x) == a {
			return s
		}
	}
	for _, x := range [2]float64{math.Nextafter(d, math.Inf(1)), math.Nextafter(d, math.Inf(-1))} {
		if radians(x) == a {
			return shortest(x)
		}
	}
	return shortest(d)
}
