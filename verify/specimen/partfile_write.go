package specimen

import (
	"bytes"
	"encoding/json"
	"fmt"
	"math"
	"slices"
	"strings"

	"notchproof/mesh/outline"
	"notchproof/scf"
)

// The shape of a part file that is an outline, in the order of its keys.
type writtenFile struct {
	Title    string          `json:"title,omitempty"`
	Shape    writtenShape    `json:"shape"`
	Loads    []scf.Load      `json:"loads"`
	Material writtenMaterial `json:"material"`
}

type writtenShape struct {
	Model     string            `json:"model"`
	Unit      string            `json:"unit,omitempty"`
	Outline   string            `json:"outline"`
	Holes     []string          `json:"holes,omitempty"`
	Names     map[string]string `json:"names,omitempty"`
	Notch     []string          `json:"notch"`
	Nominal   writtenSection    `json:"nominal"`
	Mirror    bool              `json:"mirror,omitempty"`
	ForceLine string            `json:"forceLine,omitempty"`
}

type writtenSection struct {
	X     *float64  `json:"x,omitempty"`
	From  []float64 `json:"from,omitempty"`
	To    []float64 `json:"to,omitempty"`
	Fibre *float64  `json:"fibre,omitempty"`
}

type writtenMaterial struct {
	Nu float64 `json:"nu"`
}

// AsFile writes a part, of a family or not, as a part file that holds its
// outline: read back, it gives the same factors. Lengths are written so that
// they read back to the last bit.
func (p *Part) AsFile() ([]byte, error) {
	shape := writtenShape{Model: p.kind().String(), Unit: p.Unit, Mirror: p.Half && p.kind() == scf.Bar}
	shape.Outline = outline.FormatPath([]outline.Loop{p.Region.Outer})
	for _, hole := range p.Region.Holes {
		shape.Holes = append(shape.Holes, outline.FormatPath([]outline.Loop{hole}))
	}
	shape.Names, shape.Notch = p.namesAsWritten()
	var err error
	if shape.Nominal, err = p.sectionAsWritten(); err != nil {
		return nil, err
	}
	if p.kind() == scf.Bar && !p.Half {
		if shape.ForceLine, err = p.forceLineAsWritten(shape.Nominal); err != nil {
			return nil, err
		}
	}
	file := writtenFile{Title: p.title(), Shape: shape, Material: writtenMaterial{p.Options.Nu}}
	for _, l := range p.Loads {
		file.Loads = append(file.Loads, l.Name)
	}
	var b bytes.Buffer
	encoder := json.NewEncoder(&b)
	encoder.SetEscapeHTML(false)
	encoder.SetIndent("", "  ")
	if err := encoder.Encode(file); err != nil {
		return nil, fmt.Errorf("part file: %w", err)
	}
	return b.Bytes(), nil
}

func (p *Part) title() string {
	if p.Title == "" && p.Family != nil {
		return p.Family.Title
	}
	return p.Title
}

// kind tells a bar from a shaft.
func (p *Part) kind() scf.Kind {
	if p.Loads[0].Model.Revolved() {
		return scf.Shaft
	}
	return scf.Bar
}

// namesAsWritten gives the sides' names as the reader of path data will: by
// kind and number, arcs in several parts by several names. names are those
// that the sides had here, notch is that of the notch.
func (p *Part) namesAsWritten() (names map[string]string, notch []string) {
	names = make(map[string]string)
	take := func(i int, drawn, name string) {
		if name != "" && !nameAsDrawn(name) {
			names[drawn] = name
		}
		if slices.Contains(p.Notch, i) && !slices.Contains(notch, drawn) {
			notch = append(notch, drawn)
		}
	}
	number := 0
	for i, s := range p.Region.Outer {
		// One command for every part that the side is read back as.
		kind := letter(s.Curve)
		next := p.Region.Outer[(i+1)%len(p.Region.Outer)].Curve.At(0)
		back := outline.Side{Curve: outline.Line{A: next, B: s.Curve.At(0)}}
		data := outline.FormatPath([]outline.Loop{{s, back}})
		parts := strings.Count(data, string(kind))
		if kind == 'L' {
			parts-- // the way back
		}
		for range parts {
			number++
			take(i, fmt.Sprintf("%c%d", kind, number), s.Name)
		}
	}
	first := len(p.Region.Outer)
	for k, hole := range p.Region.Holes {
		for i := range hole {
			take(first+i, fmt.Sprintf("hole %d", k+1), hole[0].Name)
		}
		first += len(hole)
	}
	return names, notch
}

func letter(c outline.Curve) byte {
	switch c.(type) {
	case outline.Line:
		return 'L'
	case outline.Bezier:
		return 'C'
	}
	return 'A'
}

// drawing is what of a drawing the section's properties depend on.
func (p *Part) drawing() *Drawing {
	return &Drawing{Kind: p.kind(), Unit: p.Unit, Mirror: p.Half && p.kind() == scf.Bar, Options: p.Options}
}

// sectionAsWritten is the nominal section: an outline's own, or the smallest of
// a family's part, with the fibre whose stress is the family's nominal one.
func (p *Part) sectionAsWritten() (writtenSection, error) {
	if s := p.Section; s != nil {
		w := writtenSection{Fibre: s.Fibre}
		if s.Across {
			w.X = &s.From.X
		} else {
			w.From, w.To = []float64{s.From.X, s.From.Y}, []float64{s.To.X, s.To.Y}
		}
		return w, nil
	}
	o := p.drawing()
	x, err := o.smallest(p)
	if err != nil {
		return writtenSection{}, err
	}
	net := o.across(p.Region, x)
	fibre, err := p.familyFibre(&net)
	return writtenSection{X: &x, Fibre: &fibre}, err
}

// familyFibre is the fibre at which a family's bending is nominal: an end of
// the material on the side that is in tension.
func (p *Part) familyFibre(net *crossSection) (float64, error) {
	bending, ok := p.Load(scf.Bending)
	if !ok {
		return net.hi, nil
	}
	for i := len(net.cut) - 1; i >= 0; i-- {
		for _, at := range [2]float64{net.cut[i].Hi, net.cut[i].Lo} {
			same := math.Abs(bending.Nominal.Net*net.modulus(at)-1) <= sameShape
			if same && p.Opposite == (at < net.centroid) {
				return at, nil
			}
		}
	}
	return 0, fmt.Errorf("%s: no fibre of the net section bears the nominal stress of bending", p.Name)
}

func (p *Part) forceLineAsWritten(s writtenSection) (string, error) {
	o := p.drawing()
	var net crossSection
	if s.X != nil {
		net = o.across(p.Region, *s.X)
	} else {
		var err error
		if net, err = o.between(p.Region, p.Section.From, p.Section.To); err != nil {
			return "", err
		}
	}
	near := slack(p.Region)
	for _, line := range []string{scf.ForceLineNet, scf.ForceLineGross} {
		o.Options.ForceLine = line
		if math.Abs(o.forceLine(p, &net)-p.ForceLine) <= near {
			return line, nil
		}
	}
	return "", fmt.Errorf("%s: the force line y = %s passes through no section's middle", p.Name, text(p.ForceLine))
}
