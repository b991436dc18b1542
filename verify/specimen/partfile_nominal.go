package specimen

import "gonum.org/v1/gonum/spatial/r2"

// nominal reads which section the nominal stress is taken on: straight across
// at x, or between two points, and at which fibre.
func (d *document) nominal(n *node, own *Drawing) (err error) {
	if err := d.object(n, nominalKeys...); err != nil {
		return err
	}
	x, from, to, fibre := n.member("x"), n.member("from"), n.member("to"), n.member("fibre")
	if (x != nil) == (from != nil) || (from != nil) != (to != nil) {
		return d.refuse(n, "not one section", `give {"x": …}, or {"from": [x, y], "to": [x, y]}`)
	}
	section := &Section{Across: x != nil}
	if x != nil {
		section.From.X, err = d.placeIn(x, own.Unit)
	} else if section.From, err = d.point(from, own.Unit); err == nil {
		section.To, err = d.point(to, own.Unit)
	}
	if fibre != nil && err == nil {
		var y float64
		y, err = d.placeIn(fibre, own.Unit)
		section.Fibre = &y
	}
	own.Nominal = section
	return err
}

// point reads [x, y].
func (d *document) point(n *node, unit string) (p r2.Vec, err error) {
	if n.kind != isList || len(n.items) != 2 {
		return p, d.refuse(n, "not a point", "write [x, y]")
	}
	if p.X, err = d.placeIn(n.items[0], unit); err == nil {
		p.Y, err = d.placeIn(n.items[1], unit)
	}
	return p, err
}

// placeIn reads a coordinate in the unit of the outline; a plain number is one.
func (d *document) placeIn(n *node, unit string) (float64, error) {
	l, err := d.length(n)
	switch {
	case err != nil:
		return 0, err
	case l.Unit == "":
		return l.Value, nil
	case unit == "":
		return 0, d.refuse(n, "the outline's unit has no name", "write plain numbers, or give the shape its unit")
	}
	return l.In(unit), nil
}
