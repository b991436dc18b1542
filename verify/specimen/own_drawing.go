package specimen

import (
	"fmt"
	"slices"

	"gonum.org/v1/gonum/spatial/r2"

	"notchproof/mesh/outline"
	"notchproof/scf"
)

// A Drawing is an outline of the user's own with what is asked of it. x runs
// along the part, y across it, upwards.
//
// A bar is drawn whole, or with Mirror as its upper half, y ≥ 0, which is then
// completed by its image. A shaft is drawn as the upper half of its section
// along the axis y = 0; without a side on that line it is hollow. Both ends
// must be straight and square to the axis: there the loads enter, and between
// them and the nearest change of shape at least 1.5 sizes of plain part are
// needed, better three.
//
// Sides are called by the letter of their kind and their number as drawn (L1,
// A2, C3: line, arc, cubic), or as Names says; a hole is "hole 1", "hole 2" as a
// whole, in the order in which holes are drawn.
type Drawing struct {
	Kind    scf.Kind
	Unit    string
	Loops   []outline.Loop    // as outline.ParsePath gives them, outer loop first
	Holes   []outline.Loop    // further holes, in either sense
	Names   map[string]string // by the side's name as drawn; may be nil
	Notch   []string          // sides and holes on which the factor is sought; nil: all that is concave
	Nominal *Section          // nil: the smallest section along the notch
	Mirror  bool
	Options scf.Options
}

// Part makes the part that is solved, with all loads that its kind carries. A
// fault is an *InputError whose What is the key of a part file's shape that is
// to blame.
func (o *Drawing) Part() (*Part, error) {
	if o.Kind != scf.Bar && o.Kind != scf.Shaft {
		panic("specimen: drawing that is neither bar nor shaft")
	}
	if len(o.Loops) == 0 {
		panic("specimen: drawing without an outline")
	}
	sheet, err := o.sheet()
	if err != nil {
		return nil, err
	}
	p := &Part{
		Name: "outline", Unit: o.Unit, Options: o.Options, Region: sheet.region(),
		Dims: scf.Dims{}, Given: scf.Dims{},
		Half: o.Kind == scf.Shaft || o.Mirror,
	}
	if err := p.Region.Validate(); err != nil {
		return nil, drawingFault("outline", "", err.Error(), "an outline goes round its material once; sides meet at their ends alone, holes lie inside")
	}
	if err := o.checkHalf(p.Region); err != nil {
		return nil, err
	}
	if err := sheet.arrange(p); err != nil {
		return nil, err
	}
	p.Sharp = p.sharpCorners()
	if err := sheet.choose(p, o.Notch != nil); err != nil {
		return nil, err
	}
	p.Joints = findJoints(p.Region, p.Notch)
	p.Watch = p.offNotch()
	return p, o.load(p)
}

func drawingFault(key, value, reason, hint string) error {
	return &InputError{What: key, Value: value, Reason: reason, Hint: hint}
}

// mostSides bounds the work that an outline takes before it is meshed, which
// goes with the square of their number.
const mostSides = 2000

// A sheet holds the loops of a drawing, side by side with what the drawing
// says of each side. The outer loop is the first.
type sheet [][]drawnSide

type drawnSide struct {
	outline.Side
	notch bool
}

func (s sheet) region() *outline.Region {
	loop := func(sides []drawnSide) outline.Loop {
		l := make(outline.Loop, len(sides))
		for i, side := range sides {
			l[i] = side.Side
		}
		return l
	}
	r := &outline.Region{Outer: loop(s[0])}
	for _, hole := range s[1:] {
		r.Holes = append(r.Holes, loop(hole))
	}
	return r
}

// sheet lays out the loops, sets the names and marks the notch.
func (o *Drawing) sheet() (sheet, error) {
	loops := slices.Concat(o.Loops, o.Holes)
	count := 0
	for _, loop := range loops {
		count += len(loop)
	}
	switch {
	case o.Kind == scf.Shaft && len(loops) > 1:
		return nil, drawingFault("outline", "", "a shaft with a hole in its section", "a bore is drawn by leaving the axis out of the outline; a ring-shaped cavity cannot be checked")
	case o.Kind == scf.Shaft && o.Mirror:
		return nil, drawingFault("mirror", "true", "a shaft is drawn as a half already", "leave it out")
	case count > mostSides:
		return nil, drawingFault("outline", "", fmt.Sprintf("%d sides, more than %d", count, mostSides), "draw it with fewer, longer curves")
	}
	m := marker{Drawing: o, met: make(map[string]bool)}
	var s sheet
	for k, loop := range loops {
		if k > 0 && area(loop) > 0 {
			loop = reversed(loop)
		}
		var sides []drawnSide
		for _, side := range loop {
			if k > 0 {
				side.Name = fmt.Sprintf("hole %d", k)
			}
			sides = append(sides, m.mark(side))
		}
		s = append(s, sides)
	}
	if err := m.check(); err != nil {
		return nil, err
	}
	return s.joined(), nil
}

// area is positive for a loop that runs counter-clockwise.
func area(l outline.Loop) float64 {
	return (&outline.Region{Outer: l}).Properties().Area
}

func reversed(l outline.Loop) outline.Loop {
	r := make(outline.Loop, len(l))
	for i, s := range l {
		r[len(l)-1-i] = outline.Side{Name: s.Name, Curve: s.Curve.Reverse()}
	}
	return r
}

// checkHalf looks at where a half outline lies.
func (o *Drawing) checkHalf(r *outline.Region) error {
	if o.Kind == scf.Bar && !o.Mirror {
		return nil
	}
	near, found := slack(r), false
	for _, s := range r.Sides() {
		b := s.Curve.Bounds()
		if b.Min.Y < -near {
			return drawingFault("outline", s.Name, fmt.Sprintf("lies below y = 0, down to %.6g", b.Min.Y), "draw the upper half alone, y ≥ 0")
		}
		if onAxis(s.Curve) {
			found = true
			continue
		}
		a, e := s.Curve.At(0), s.Curve.At(1)
		if b.Min.Y <= near && a.Y > near && e.Y > near {
			return drawingFault("outline", s.Name, "touches y = 0 between its ends", "let it keep clear of the axis, or end on it")
		}
	}
	if o.Mirror && !found {
		return drawingFault("mirror", "true", "no straight side on y = 0", "draw the upper half with its line of symmetry on y = 0")
	}
	return nil
}

// onAxis tells whether a side lies on y = 0.
func onAxis(c outline.Curve) bool {
	l, ok := c.(outline.Line)
	return ok && l.A.Y == 0 && l.B.Y == 0
}

// slack is the distance within which places of an outline are the same: that
// up to which outline.Region takes joints for closed.
func slack(r *outline.Region) float64 {
	b := r.Bounds()
	return 1e-9 * r2.Norm(r2.Sub(b.Max, b.Min))
}
