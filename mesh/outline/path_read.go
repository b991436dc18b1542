package outline

import (
	"fmt"
	"math"
	"strings"

	"gonum.org/v1/gonum/spatial/r2"
)

// Bounds of what ParsePath takes.
const (
	longestPath   = 1 << 20 // bytes
	mostPathSides = 4096
)

// ParsePath reads SVG path data: all commands (M L H V A C Q Z S T, absolute
// and relative) with y upwards, not down the screen. The first subpath is the
// outer loop, the others are holes; each is turned to run as its kind must,
// keeping its first point. A subpath is closed by Z, or by ending where it
// began; a gap there of up to 1e-9 of its extent is closed by moving the last
// point. Segments without length are left out. Sides are named by the letter
// of their kind (L, A or C) and their number in the data, from 1.
//
// The loops are well-formed but not checked as Region.Validate does. The error
// is a *PathError.
func ParsePath(data string) ([]Loop, error) {
	if len(data) > longestPath {
		return nil, &PathError{longestPath, "", fmt.Sprintf("%d bytes of path data are too many", len(data)),
			fmt.Sprintf("up to %d bytes can be read", longestPath)}
	}
	p := pathReader{scanner: scanner{data: data}}
	if err := p.run(); err != nil {
		return nil, err
	}
	if len(p.loops) == 0 {
		return nil, p.fail(len(data), "path draws nothing", "an outline is a closed path such as M 0 0 H 10 V 5 H 0 Z")
	}
	return p.loops, nil
}

// A segment is a side before its subpath is known to be closed.
type segment struct {
	at       int // byte of its first argument
	from, to r2.Vec
	letter   byte // L, A or C
	control  [2]r2.Vec
	rx, ry   float64
	degrees  float64
	large    bool
	ccw      bool
}

type pathReader struct {
	scanner
	loops      []Loop
	sides      int // in loops and subpath
	subpath    []segment
	opened     int // byte of the command that began the subpath
	start, cur r2.Vec
	last       byte   // previous command, in capitals
	handle     r2.Vec // its last control point, for S and T
}

func (p *pathReader) run() error {
	for p.space(); p.pos < len(p.data); p.space() {
		at, command := p.pos, p.data[p.pos]
		if strings.IndexByte("MmLlHhVvAaCcQqZzSsTt", command) < 0 {
			return p.fail(at, "not a path command", "commands are M L H V A C Q S T Z and their lower case")
		}
		if p.last == 0 && command|0x20 != 'm' {
			return p.fail(at, "path must begin with a move", "begin with M x y")
		}
		p.pos++
		if err := p.command(at, command); err != nil {
			return err
		}
	}
	return p.finish(len(p.data), false)
}

// command reads one command with all its sets of arguments.
func (p *pathReader) command(at int, letter byte) error {
	capital := letter &^ 0x20
	relative := letter != capital
	switch capital {
	case 'Z':
		p.last = 'Z'
		return p.finish(at, true)
	case 'M':
		if err := p.finish(at, false); err != nil {
			return err
		}
		p.opened = at
	}
	if len(p.subpath) == 0 && p.last == 'Z' {
		p.opened = at
	}
	p.space()
	for first := true; first || p.more(); first = false {
		var origin r2.Vec
		if relative {
			origin = p.cur
		}
		if err := p.arguments(capital, origin); err != nil {
			return err
		}
		p.last = capital
		if capital == 'M' {
			capital = 'L' // further points of a move are lines
		}
		if p.separator() && !p.more() {
			return p.fail(p.pos, "argument missing after the comma", "take the comma away or give another point")
		}
	}
	return nil
}

// arguments reads one set of arguments and draws what it says.
func (p *pathReader) arguments(capital byte, origin r2.Vec) (err error) {
	seg := segment{at: p.pos, from: p.cur, letter: 'L'}
	switch capital {
	case 'M':
		if p.cur, err = p.point(origin); err == nil {
			p.start = p.cur
			err = p.inRange(seg.at, p.cur)
		}
		return err
	case 'L':
		seg.to, err = p.point(origin)
	case 'H':
		seg.to = p.cur
		err = p.numbers(&seg.to.X)
		seg.to.X += origin.X
	case 'V':
		seg.to = p.cur
		err = p.numbers(&seg.to.Y)
		seg.to.Y += origin.Y
	case 'A':
		seg.letter = 'A'
		err = p.arc(&seg, origin)
	default:
		seg.letter = 'C'
		err = p.cubic(&seg, capital, origin)
	}
	if err != nil {
		return err
	}
	return p.draw(seg)
}

func (p *pathReader) arc(seg *segment, origin r2.Vec) (err error) {
	if err = p.numbers(&seg.rx, &seg.ry, &seg.degrees); err != nil {
		return err
	}
	if seg.large, err = p.flag(); err != nil {
		return err
	}
	if seg.ccw, err = p.flag(); err != nil {
		return err
	}
	p.separator()
	seg.to, err = p.point(origin)
	return err
}

// cubic reads C, S, Q and T. S and T take their first control point as the
// mirror image of the last one of a command of the same family before them.
func (p *pathReader) cubic(seg *segment, capital byte, origin r2.Vec) error {
	first := p.cur
	family := map[byte]string{'S': "CS", 'T': "QT"}[capital]
	if strings.IndexByte(family, p.last) >= 0 {
		first = r2.Sub(r2.Scale(2, p.cur), p.handle)
	}
	given := map[byte]int{'C': 3, 'S': 2, 'Q': 2, 'T': 1}[capital]
	pts := []r2.Vec{first}
	if capital == 'C' || capital == 'Q' {
		pts = pts[:0]
	}
	for i := range given {
		if i > 0 {
			p.separator()
		}
		q, err := p.point(origin)
		if err != nil {
			return err
		}
		pts = append(pts, q)
	}
	if len(pts) == 3 { // C, S
		seg.control, seg.to = [2]r2.Vec{pts[0], pts[1]}, pts[2]
		p.handle = pts[1]
		return p.inRange(seg.at, pts...)
	}
	q := NewQuadratic(p.cur, pts[0], pts[1])
	seg.control, seg.to = [2]r2.Vec{q.P[1], q.P[2]}, q.P[3]
	p.handle = pts[0]
	return p.inRange(seg.at, pts...)
}

// inRange keeps sums of relative steps and reflections inside the range of
// single numbers.
func (p *pathReader) inRange(at int, ps ...r2.Vec) error {
	for _, q := range ps {
		if !(max(math.Abs(q.X), math.Abs(q.Y)) <= largestPathNumber) {
			return p.fail(at, "point too far out", "lengths up to 1e15 can be read")
		}
	}
	return nil
}

// draw adds a segment, unless it has no length.
func (p *pathReader) draw(seg segment) error {
	if err := p.inRange(seg.at, seg.to); err != nil {
		return err
	}
	p.cur = seg.to
	if seg.pointlike() {
		return nil
	}
	if p.sides++; p.sides > mostPathSides {
		return p.fail(seg.at, fmt.Sprintf("more than %d sides", mostPathSides), "draw the outline with fewer, longer curves")
	}
	p.subpath = append(p.subpath, seg)
	return nil
}

func (s *segment) pointlike() bool {
	return s.to == s.from && (s.letter != 'C' || s.control == [2]r2.Vec{s.to, s.to})
}
