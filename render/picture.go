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

func (p *plate) reference() string {
	if p.options.Reference != "" {
		return p.options.Reference
	}
	return "nominal"
}

// title says what the tones mean.
func (p *plate) title() string {
	ratio := " ÷ " + p.reference()
	twist := p.twistAlone()
	if p.options.Style == StyleFringe {
		return p.look.title(p.reference())
	}
	switch p.options.Field {
	case FieldMises:
		if twist {
			return "von Mises stress ÷ √3 " + p.reference()
		}
		return "von Mises stress" + ratio
	case FieldShear:
		if !twist {
			return "largest shear in the drawn plane" + ratio
		}
	case FieldAxial:
		return "axial stress" + ratio
	case FieldTransverse:
		if round(p.part) {
			return "radial stress" + ratio
		}
		return "transverse stress" + ratio
	case FieldShearXY:
		return "shear stress xy" + ratio
	case FieldHoop:
		return "hoop stress" + ratio
	}
	if twist {
		return "shear stress" + ratio
	}
	return "first principal stress" + ratio
}

// note says what else a reader must know of the field.
func (p *plate) note() string {
	text := p.look.note(p)
	if p.part.Half && p.options.Whole {
		half := "lower half: mirror image"
		if p.antisymmetric() {
			half = "lower half: the same stresses with the opposite sign"
		}
		if text != "" {
			text += "; "
		}
		text += half
	}
	return text
}

// Quills: the distance between them and the length of the largest, in units.
const (
	mainStep, mainQuill   = 7, 70
	closeStep, closeQuill = 9, 100
)

func (p *plate) draw() {
	main, left, right := partView(p.part, p.box(p.layout.main), p.options.Whole, p.scale)
	close, times := detail(p.part, p.peak, main, p.point(p.layout.detail), p.u(p.layout.radius))
	p.captions(times)

	field := p.paint(main)
	e := extentOf(p.part)
	p.quills(main, p.needles(main, 0.5*(e.high-e.low)), p.quillLength(main, mainQuill)/p.quill, p.u(mainStep), p.look.mark())
	p.annotate(main, p.part, left, right, false)
	p.magnified(main, close, main.loops(p.part), "A")
	p.lines(main, field, 2)
	p.breaks(main, p.part, left, right)
	if p.part.Half {
		p.symmetry(main, symmetryPast)
	}
	lift := 0
	for _, t := range p.terms {
		p.load(main, p.part, t, lift, left, right, p.look.mark())
		if p.part.Half {
			lift++ // all act along the axis
		}
	}
	p.closeUp(close)
}

func (p *plate) captions(times float64) {
	at := p.point(p.layout.caption)
	a := p.text(at, 0, 0, "A", head, ink)
	p.text(point{a.X1 + p.u(10), at.Y + p.u(3)}, 0, 0, levelText(times)+" : 1 of the view above", normal, grey)
}

// closeUp draws the magnified root in its circle.
func (p *plate) closeUp(v *view) {
	b := v.bounds()
	x, y := b.middle()
	field := p.paint(v)
	needles := p.needles(v, 1.5*b.width()/v.scale)
	p.within(v)
	p.quills(v, needles, p.quillLength(v, closeQuill)/p.quill, p.u(closeStep), p.look.mark())
	p.dc.ResetClip()
	p.lines(v, field, 1)
	if v.mirror {
		p.within(v)
		p.symmetry(v, 0)
		p.dc.ResetClip()
	}
	p.pen(ink, wide)
	p.dc.DrawCircle(x, y, b.width()/2)
	p.dc.Stroke()
	p.markPeak(v)
}

// paint lays the field of a view on the sheet, with soft edges, and gives its
// values.
func (p *plate) paint(v *view) *raster {
	r := p.field.shade(v)
	mask := coverage(r.area, v.loops(p.part)...)
	multiply(mask, coverage(r.area, v.window))
	r.lay(p.im, mask, p.look.painter(r))
	return r
}

// lines draws elements, contours and edges over the field of a view; most is
// the number of labels a level.
func (p *plate) lines(v *view, r *raster, most int) {
	cs := p.look.contours(r)
	p.label(v, r, cs, most, p.look)
	p.within(v)
	if p.options.Mesh {
		p.elements(v, p.finding.Computed.Last.Problem.Shape)
	}
	p.contours(cs, p.look)
	p.edges(v, p.part, wide, ink)
	p.dc.ResetClip()
	p.letter(cs, p.look)
}

// quillLength is the length of the largest quill in a view, in pixels: in a hole
// that is wide enough for it not beyond its middle.
func (p *plate) quillLength(v *view, units float64) float64 {
	_, radius := root(p.part, p.peak)
	most := 0.8 * radius / 1.5 * v.scale
	if full := p.u(units); most >= full || most < full/3 {
		return full
	}
	return most
}

// needles gives the field along the surface that the peak lies on, as far as
// reach (a length of the part) to both sides of the peak, fine enough for a view.
func (p *plate) needles(v *view, reach float64) []needle {
	const spacing = 1.5 // units
	return p.along(p.u(spacing)/v.scale, reach)
}

// along is needles at steps of a length of the part.
func (p *plate) along(step, reach float64) []needle {
	var on *surface
	at, gap := 0.0, math.Inf(1)
	for i := range p.surfaces {
		if a, g := p.surfaces[i].nearest(p.peak); g < gap {
			on, at, gap = &p.surfaces[i], a, g
		}
	}
	if on == nil {
		return nil
	}
	list := on.needles(at, step, reach)
	if !p.settled() {
		for i := range list {
			list[i].Value = math.Min(list[i].Value, unboundTop)
		}
	}
	return list
}

func multiply(a, b *image.Alpha) {
	for i, v := range b.Pix {
		a.Pix[i] = uint8(int(a.Pix[i]) * int(v) / 255)
	}
}
