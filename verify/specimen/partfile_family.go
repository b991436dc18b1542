package specimen

import (
	"errors"

	"notchproof/scf"
)

// family draws a family with its dimensions, unless some may be missing.
func (d *document) family(n *node, o scf.Options, open bool) (*Part, error) {
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
	if open {
		p := &Part{Name: family.Name, Family: family, Given: dims, Unit: unit, Options: o}
		for _, load := range family.Loads {
			p.Loads = append(p.Loads, Load{Name: load})
		}
		return p, nil
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
