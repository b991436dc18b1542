package render

import (
	"errors"
	"fmt"
	"image"
	"math"

	"gonum.org/v1/gonum/spatial/r2"

	"notchproof/verify"
	"notchproof/verify/specimen"
)

// PictureOptions say how a picture is drawn. The zero value is the default.
type PictureOptions struct {
	Width int     // pixels; 0: 1600
	DPI   float64 // pixels an inch, from which the size of letters follows; 0: 190, which puts 1600 on A4
	Field string  // one of Fields(); "": first principal stress, in torsion the shear
	Style string  // one of Styles(); "": wash
	Whole bool    // both halves of a part of which one is modelled
	Mesh  bool    // draw the edges of the elements

	// Terms are the loads whose stresses are added up, each times its scale, all
	// on the mesh of the finding; nil: the finding's own, once. Reference is what
	// the sum is a multiple of; "": nominal.
	Terms     []Term
	Reference string
	// Rows are what the title block says of a sum, lines by row, the first line
	// of a row in strong letters; nil: load, factor and verdict of the finding.
	Rows [][]string

	Edition string // the program with its version, for the title block; "": its name alone
}

// The styles of a picture.
const (
	StyleWash   = "wash"   // tones with contour lines
	StyleFringe = "fringe" // dark-field isochromatic fringes of a photoelastic model
)

// Styles lists the styles by name, the default first.
func Styles() []string { return []string{StyleWash, StyleFringe} }

func (o PictureOptions) dpi() float64 {
	if o.DPI > 0 {
		return o.DPI
	}
	return usualDPI
}

// Picture draws the stresses of a finding: the part to scale with its
// dimensions, the field as the ratio of stress to nominal stress with contour
// lines, the stress along the surface of the notch as quills, the root
// magnified, and a title block. The finding must hold the solution of its last
// rung. Errors are a *FieldError where the part has no such field.
func Picture(f *verify.Finding, part *specimen.Part, o PictureOptions) (image.Image, error) {
	s, err := picture(f, part, o)
	if err != nil {
		return nil, err
	}
	return s.im, nil
}

// A plate is a picture being drawn.
type plate struct {
	*sheet
	part     *specimen.Part
	finding  *verify.Finding
	options  PictureOptions
	layout   layout
	terms    []Term
	field    *field
	surfaces []surface
	peak     r2.Vec
	top      float64 // the field at the peak
	quill    float64 // its largest size along the notch
	look     look
}

func picture(f *verify.Finding, part *specimen.Part, o PictureOptions) (*sheet, error) {
	c := &f.Computed
	switch {
	case c.Last == nil:
		return nil, errors.New("picture: the finding holds no solution")
	case !(c.Peak.Factor > 0) || math.IsInf(c.Peak.Factor, 0):
		return nil, fmt.Errorf("picture: peak factor %g cannot be drawn", c.Peak.Factor)
	}
	p := &plate{part: part, finding: f, options: o, terms: o.Terms, top: c.Peak.Factor}
	p.peak = r2.Vec{X: c.Peak.X, Y: c.Peak.Y}
	if len(p.terms) == 0 {
		p.terms = []Term{{Solution: c.Last, Load: f.Load, Scale: 1}}
	}
	if err := p.read(); err != nil {
		return nil, err
	}
	p.survey()
	p.spread()
	p.legend(p.box(p.layout.legend), p.title(), p.note(), p.look.scale())
	p.titleBlock(p.box(p.layout.block))
	p.draw()
	return p.sheet, nil
}

// read finds the field and how it looks.
func (p *plate) read() error {
	o := p.options
	name := o.Field
	if name == "" {
		name = FieldPrincipal
	}
	read, err := readingOf(name, round(p.part), p.twistAlone())
	switch {
	case err != nil:
		return err
	case o.Style == StyleFringe && o.Field != "":
		return &FieldError{o.Field, "fringes show the difference of the principal stresses alone"}
	case o.Style == StyleFringe && p.twistAlone():
		read = reading{of: twistDifference}
	case o.Style == StyleFringe:
		read = reading{of: principalDifference}
	case o.Style != "" && o.Style != StyleWash:
		return fmt.Errorf("picture: no style %q", o.Style)
	}
	if p.field, err = newField(p.terms, p.part.Half, o.Whole, read); err != nil {
		return err
	}
	low, high := p.field.low, p.field.high
	if p.plain() {
		high = p.top
	}
	unbound := !p.settled() && high > unboundTop
	if unbound {
		p.top, high = unboundTop, unboundTop
	}
	if !(high > low) || math.IsInf(high, 0) || math.IsInf(low, 0) {
		return &FieldError{name, "the stress is the same everywhere"}
	}
	if o.Style == StyleFringe {
		p.look = newFringes(high)
		return nil
	}
	if !read.signed {
		low = 0
	}
	w := newWash(math.Min(low, 0), math.Max(high, 0))
	w.more = unbound
	p.look = w
	return nil
}

// settled tells that the ladder gave a factor.
func (p *plate) settled() bool { return p.finding.Computed.Factor.Status.Settled() }

// unboundTop is the dark end of the ramp where there is no factor, as at a sharp
// corner: what is above has the same tone, for its value is that of the mesh
// alone.
const unboundTop = 3

// survey reads the field along the notch. Of one load the peak is where the
// factor sits, of several where the field is highest.
func (p *plate) survey() {
	p.surfaces = surfaces(p.terms, p.part, p.field.read)
	if len(p.options.Terms) > 0 {
		best := math.Inf(-1)
		for i := range p.surfaces {
			if n := p.surfaces[i].highest(); n.Value > best {
				best, p.peak = n.Value, n.At
			}
		}
	}
	e := extentOf(p.part)
	list := p.along((e.high-e.low)/400, 0.5*(e.high-e.low))
	for _, n := range list {
		if n.behind == 0 && !p.plain() {
			p.top = n.Value
		}
		p.quill = math.Max(p.quill, math.Abs(n.Value))
	}
	if !p.settled() {
		p.quill = math.Min(p.quill, unboundTop)
	}
}

// plain tells that the field is the one whose peak is the factor.
func (p *plate) plain() bool {
	o := p.options
	return (o.Field == "" || o.Field == FieldPrincipal) && o.Style != StyleFringe && len(o.Terms) == 0
}

// twistAlone tells that nothing but torsion acts.
func (p *plate) twistAlone() bool {
	for _, t := range p.terms {
		if !(strandOf(t, false).twist) {
			return false
		}
	}
	return true
}

// antisymmetric tells that the half that is not modelled carries the opposite
// stresses.
func (p *plate) antisymmetric() bool {
	for _, t := range p.terms {
		if !strandOf(t, p.part.Half).odd {
			return false
		}
	}
	return true
}

// spread lays out the sheet and takes the paper.
func (p *plate) spread() {
	width := p.options.Width
	if width == 0 {
		width = defaultWidth
	}
	wide := unitsAcross(float64(width) / p.options.dpi() * millimetresPerInch)
	scale := float64(width) / wide
	ruler := rulerOf(scale)
	main, _, _ := partView(p.part, partRoom(wide), p.options.Whole, 1)
	high := main.bounds().height() - 2*viewSpare
	block := heightOf(p.rows(ruler, blockWidth(wide)*scale)) / scale
	p.layout = arrange(wide, high, dimensionRows(main, p.part), block)
	p.sheet = newSheetOf(width, wide, p.layout.high)
}

func (s *sheet) box(b box) box { return s.area(b.X0, b.Y0, b.X1, b.Y1) }

func (s *sheet) point(p point) point { return point{s.u(p.X), s.u(p.Y)} }
