package specimen

import (
	"errors"
	"unicode/utf8"

	"gonum.org/v1/gonum/spatial/r2"

	"notchproof/mesh/outline"
	"notchproof/scf"
)

// The keys of a shape that is an outline, and of its nominal section.
var (
	outlineKeys = []string{"model", "unit", "outline", "holes", "names", "notch", "nominal", "mirror", "forceLine"}
	nominalKeys = []string{"x", "from", "to", "fibre"}
)

// family draws a family with its dimensions.
func (d *document) family(n *node, o scf.Options) (*Part, error) {
	name, err := d.text(n.member("family"))
	if err != nil {
		return nil, err
	}
	family, ok := scf.Lookup(name)
	if !ok {
		var names []string
		for _, f := range scf.Families() {
			names = append(names, f.Name)
		}
		hint := "notchproof parts lists the families"
		if near := Nearest(name, names, len(name)/2); near != "" {
			hint = "did you mean " + near + "? " + hint
		}
		return nil, d.refuse(n.member("family"), "no such family of parts", hint)
	}
	keys := []string{"family", "forceLine"}
	for _, dim := range family.Dimensions {
		keys = append(keys, dim.Name)
	}
	if err := d.object(n, keys...); err != nil {
		return nil, err
	}
	dims, unit, err := d.dimensions(n, family)
	if err != nil {
		return nil, err
	}
	p, err := New(family, dims, unit, o)
	return p, d.dimensionFault(n, err)
}

// dimensions reads a family's dimensions in one unit.
func (d *document) dimensions(n *node, family *scf.Family) (scf.Dims, string, error) {
	dims := make(scf.Dims)
	var lengths []Dimension
	for _, dim := range family.Dimensions {
		v := n.member(dim.Name)
		if v == nil {
			continue
		}
		if dim.Angle {
			a, err := d.angle(v)
			if err != nil {
				return nil, "", err
			}
			dims[dim.Name] = a
			continue
		}
		l, err := d.length(v)
		if err != nil {
			return nil, "", err
		}
		lengths = append(lengths, Dimension{dim.Name, l})
	}
	values, unit, err := Common(lengths)
	if err != nil {
		return nil, "", d.under(n, err)
	}
	for i, l := range lengths {
		dims[l.Name] = values[i]
	}
	return dims, unit, nil
}

// dimensionFault places a fault that a family found in its dimensions.
func (d *document) dimensionFault(n *node, err error) error {
	var fault *scf.DimensionError
	if err == nil || !errors.As(err, &fault) {
		return d.placed(n, err)
	}
	if v := n.member(fault.Name); v != nil {
		return d.refuse(v, fault.Reason, fault.Hint)
	}
	return d.fail(n.at, InputError{What: n.path + "." + fault.Name, Reason: fault.Reason, Hint: fault.Hint})
}

// under places a fault whose What names a member, or a member of a member.
func (d *document) under(n *node, err error) error {
	var fault *InputError
	if err == nil || !errors.As(err, &fault) {
		return d.placed(n, err)
	}
	at := n
	for _, m := range n.members {
		if m.name == fault.What {
			at = m.value
		}
		for _, inner := range m.value.members {
			if m.name+"."+inner.name == fault.What {
				at = inner.value
			}
		}
	}
	placed := *fault
	placed.What = n.path + "." + fault.What
	return d.fail(at.at, placed)
}

// outline draws an outline of the user's own.
func (d *document) outline(n *node, o scf.Options) (*Part, error) {
	if err := d.object(n, outlineKeys...); err != nil {
		return nil, err
	}
	own := &Drawing{Options: o}
	steps := []struct {
		key  string
		must bool
		read func(*node) error
	}{
		{"model", true, func(v *node) (err error) { own.Kind, err = d.model(v); return err }},
		{"unit", false, func(v *node) (err error) { own.Unit, err = d.unit(v); return err }},
		{"outline", true, func(v *node) (err error) { own.Loops, err = d.path(v); return err }},
		{"holes", false, func(v *node) (err error) { own.Holes, err = d.holes(v); return err }},
		{"names", false, func(v *node) (err error) { own.Names, err = d.names(v); return err }},
		{"notch", false, func(v *node) (err error) { own.Notch, err = d.notch(v); return err }},
		{"nominal", false, func(v *node) error { return d.nominal(v, own) }},
		{"mirror", false, func(v *node) (err error) { own.Mirror, err = d.truth(v); return err }},
	}
	for _, step := range steps {
		v := n.member(step.key)
		if v == nil && step.must {
			return nil, d.fail(n.at, InputError{What: n.path + "." + step.key, Reason: "missing", Hint: `a shape is {"family": …} with dimensions, or {"model": "bar" or "shaft", "outline": "M …"}`})
		}
		if v == nil {
			continue
		}
		if err := step.read(v); err != nil {
			return nil, err
		}
	}
	p, err := own.Part()
	return p, d.under(n, err)
}

func (d *document) model(n *node) (scf.Kind, error) {
	s, err := d.text(n)
	for _, k := range []scf.Kind{scf.Bar, scf.Shaft} {
		if err == nil && s == k.String() {
			return k, nil
		}
	}
	if err == nil {
		err = d.refuse(n, "no such model", "bar (flat, of constant thickness) or shaft (round, turned about y = 0)")
	}
	return 0, err
}

func (d *document) unit(n *node) (string, error) {
	s, err := d.text(n)
	if err == nil && tenthsOf(s) == 0 {
		err = d.refuse(n, "unknown unit", "lengths are in "+unitNames+"; leave the key out for an unnamed unit")
	}
	return s, err
}

// path reads path data; a fault is placed inside of the text.
func (d *document) path(n *node) ([]outline.Loop, error) {
	s, err := d.text(n)
	if err != nil {
		return nil, err
	}
	loops, err := outline.ParsePath(s)
	var fault *outline.PathError
	if errors.As(err, &fault) {
		at := d.inside(n.at, fault.Offset)
		return nil, d.fail(at, InputError{What: n.path, Value: fault.Token, Reason: fault.Problem, Hint: fault.Hint})
	}
	return loops, err
}

// inside finds the byte of the document that holds byte offset of the string
// which begins at a quote: escapes take more room than what they stand for.
func (d *document) inside(quote, offset int) int {
	at := quote + 1
	for done := 0; done < offset && at < len(d.data); {
		switch {
		case d.data[at] != '\\':
			_, n := utf8.DecodeRune(d.data[at:])
			at, done = at+n, done+n
		case at+1 < len(d.data) && d.data[at+1] == 'u':
			at, done = at+6, done+1 // path data is ASCII
		default:
			at, done = at+2, done+1
		}
	}
	return at
}

func (d *document) holes(n *node) ([]outline.Loop, error) {
	items, err := d.list(n, `write a list of paths, such as ["M 5 5 H 6 V 6 H 5 Z"]`)
	var holes []outline.Loop
	for _, item := range items {
		loops, err := d.path(item)
		if err != nil {
			return nil, err
		}
		if len(loops) != 1 {
			return nil, d.refuse(item, "more than one hole in a path", "give each hole a path of its own")
		}
		holes = append(holes, loops[0])
	}
	return holes, err
}

// names reads what sides are called, by their names as drawn.
func (d *document) names(n *node) (map[string]string, error) {
	if n.kind != isObject {
		return nil, d.refuse(n, "not an object", `write {"A4": "fillet"}: names as drawn and the names to call them by`)
	}
	names := make(map[string]string)
	for _, m := range n.members {
		s, err := d.label(m.value)
		if err != nil {
			return nil, err
		}
		if s == "" {
			return nil, d.refuse(m.value, "empty name", "give it a name or leave it out")
		}
		names[m.name] = s
	}
	return names, nil
}

func (d *document) notch(n *node) ([]string, error) {
	const hint = `write a list of sides, such as ["A4", "hole 1"], or leave the key out for all that is concave`
	items, err := d.list(n, hint)
	var sides []string
	for _, item := range items {
		s, err := d.label(item)
		if err != nil {
			return nil, err
		}
		sides = append(sides, s)
	}
	if err == nil && len(sides) == 0 {
		err = d.refuse(n, "no sides", hint)
	}
	return sides, err
}

// nominal reads which section the nominal stress is taken on.
func (d *document) nominal(n *node, own *Drawing) error {
	if err := d.object(n, nominalKeys...); err != nil {
		return err
	}
	read := func(v *node) (float64, error) {
		l, err := d.length(v)
		if err != nil {
			return 0, err
		}
		if l.Unit != "" && own.Unit == "" {
			return 0, d.refuse(v, "the outline's unit has no name", "write plain numbers, or give the shape its unit")
		}
		if l.Unit == "" {
			return l.Value, nil
		}
		return l.In(own.Unit), nil
	}
	x, from, to, fibre := n.member("x"), n.member("from"), n.member("to"), n.member("fibre")
	if (x != nil) == (from != nil) || (from != nil) != (to != nil) {
		return d.refuse(n, "not one section", `give {"x": …}, or {"from": [x, y], "to": [x, y]}`)
	}
	section := &Section{}
	points := []*r2.Vec{&section.From, &section.To}
	for i, v := range []*node{from, to} {
		if v == nil {
			continue
		}
		if v.kind != isList || len(v.items) != 2 {
			return d.refuse(v, "not a point", "write [x, y]")
		}
		for k, c := range []*float64{&points[i].X, &points[i].Y} {
			var err error
			if *c, err = read(v.items[k]); err != nil {
				return err
			}
		}
	}
	var err error
	if x != nil {
		section.Across = true
		section.From.X, err = read(x)
	}
	if fibre != nil && err == nil {
		var y float64
		y, err = read(fibre)
		section.Fibre = &y
	}
	own.Nominal = section
	return err
}
