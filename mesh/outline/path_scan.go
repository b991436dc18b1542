package outline

import (
	"fmt"
	"strconv"
	"strings"

	"gonum.org/v1/gonum/spatial/r2"
)

// A PathError says where path data cannot be read, and why.
type PathError struct {
	Offset  int    // byte in the data, from 0
	Token   string // what stands there; empty at the end of the data
	Problem string
	Hint    string // what to do about it
}

func (e *PathError) Error() string {
	if e.Token == "" {
		return fmt.Sprintf("path data, byte %d: %s", e.Offset, e.Problem)
	}
	return fmt.Sprintf("path data, byte %d: %q: %s", e.Offset, e.Token, e.Problem)
}

// A scanner takes path data apart by the grammar of W3C, Scalable Vector
// Graphics 2 (2018), section 9.3.9, with exponents and a bare trailing point
// in numbers, as version 1.1 (2011, section 8.3.9) has them.
type scanner struct {
	data string
	pos  int
}

// largestPathNumber bounds what a number may be, so that squares and fourth
// powers of lengths stay finite.
const largestPathNumber = 1e15

// fail makes an error about the token at a byte.
func (s *scanner) fail(at int, problem, hint string) error {
	return &PathError{at, token(s.data[at:]), problem, hint}
}

// token cuts the first word from the data, short enough to print.
func token(rest string) string {
	const longest = 16
	end := strings.IndexAny(rest, " \t\r\n\f,")
	if end == 0 {
		end = 1
	}
	if end < 0 {
		end = len(rest)
	}
	if end <= longest {
		return rest[:end]
	}
	cut := 0
	for i := range rest { // by characters, not bytes
		if i > longest {
			break
		}
		cut = i
	}
	return rest[:cut]
}

func (s *scanner) space() {
	for s.pos < len(s.data) && strings.IndexByte(" \t\r\n\f", s.data[s.pos]) >= 0 {
		s.pos++
	}
}

// separator passes over space with at most one comma in it.
func (s *scanner) separator() (comma bool) {
	s.space()
	if s.pos < len(s.data) && s.data[s.pos] == ',' {
		s.pos++
		s.space()
		return true
	}
	return false
}

func isDigit(b byte) bool { return b >= '0' && b <= '9' }

// digits passes over digits and counts them.
func (s *scanner) digits() int {
	from := s.pos
	for s.pos < len(s.data) && isDigit(s.data[s.pos]) {
		s.pos++
	}
	return s.pos - from
}

// more tells whether another set of arguments follows.
func (s *scanner) more() bool {
	return s.pos < len(s.data) && (isDigit(s.data[s.pos]) || strings.IndexByte("+-.", s.data[s.pos]) >= 0)
}

func (s *scanner) number() (float64, error) {
	from := s.pos
	if s.pos < len(s.data) && (s.data[s.pos] == '+' || s.data[s.pos] == '-') {
		s.pos++
	}
	n := s.digits()
	if s.pos < len(s.data) && s.data[s.pos] == '.' {
		s.pos++
		n += s.digits()
	}
	if n == 0 {
		s.pos = from
		if from == len(s.data) {
			return 0, s.fail(from, "number missing at the end", "the last command lacks arguments")
		}
		return 0, s.fail(from, "not a number", "give every command all its arguments")
	}
	if mark := s.pos; s.pos < len(s.data) && (s.data[s.pos] == 'e' || s.data[s.pos] == 'E') {
		s.pos++
		if s.pos < len(s.data) && (s.data[s.pos] == '+' || s.data[s.pos] == '-') {
			s.pos++
		}
		if s.digits() == 0 {
			s.pos = mark // not an exponent
		}
	}
	x, err := strconv.ParseFloat(s.data[from:s.pos], 64)
	if err != nil || x > largestPathNumber || x < -largestPathNumber {
		return 0, s.fail(from, "number too large", "lengths up to 1e15 can be read")
	}
	return x, nil
}

// numbers reads one set of arguments, with separators between.
func (s *scanner) numbers(xs ...*float64) error {
	for i, x := range xs {
		if i > 0 {
			s.separator()
		}
		var err error
		if *x, err = s.number(); err != nil {
			return err
		}
	}
	return nil
}

// flag reads one digit, 0 or 1, which needs no separator behind it.
func (s *scanner) flag() (bool, error) {
	s.separator()
	if s.pos == len(s.data) || s.data[s.pos] != '0' && s.data[s.pos] != '1' {
		return false, s.fail(s.pos, "not an arc flag", "an arc is rx ry angle large-arc sweep x y, the flags 0 or 1")
	}
	s.pos++
	return s.data[s.pos-1] == '1', nil
}

// point reads a coordinate pair relative to an origin.
func (s *scanner) point(origin r2.Vec) (r2.Vec, error) {
	var p r2.Vec
	err := s.numbers(&p.X, &p.Y)
	return r2.Add(origin, p), err
}
