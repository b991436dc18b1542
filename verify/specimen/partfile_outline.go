package specimen

import (
	"errors"
	"unicode/utf8"

	"notchproof/mesh/outline"
	"notchproof/scf"
)

// The keys of a shape that is an outline, and of its nominal section.
var (
	outlineKeys = []string{"model", "unit", "outline", "holes", "names", "notch", "nominal", "mirror", "forceLine"}
	nominalKeys = []string{"x", "from", "to", "fibre"}
)

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
	if err == nil && microsOf(s) == 0 {
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
		if nameAsDrawn(s) {
			return nil, d.refuse(m.value, "name of the kind that sides have as drawn", "call it by what it is, such as fillet")
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
