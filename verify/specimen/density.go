package specimen

import (
	"fmt"
	"strconv"
	"strings"
)

// A Density says how fine a finite element mesh of the user's own was at the
// root: the order of its elements and their number per 90° of arc.
type Density struct {
	Order int     // 1 (straight sides) or 2 (mid-nodes on the curve)
	Arc   float64 // elements per 90° of the root, LeastArc to MostArc
}

// Bounds of what can be asked for. Coarser than two elements per 90° no root is
// meshed here; finer than 200 order 1 itself has converged to a percent or so.
const (
	LeastArc = 2
	MostArc  = 200
)

func (d Density) String() string {
	return fmt.Sprintf("order %d with %s elements per 90°", d.Order, text(d.Arc))
}

const densityHint = "give the order of the elements (1 or 2) and their number per 90° of the root (2 to 200), as in order=2,arc=6"

// ParseDensity reads "order=2,arc=6".
func ParseDensity(s string) (Density, error) {
	var d Density
	fail := func(reason string) (Density, error) {
		return Density{}, &InputError{What: "mesh", Value: s, Reason: reason, Hint: densityHint}
	}
	for _, word := range strings.Split(s, ",") {
		key, value, ok := strings.Cut(strings.TrimSpace(word), "=")
		switch {
		case !ok:
			return fail(quote(word) + " is not a key with its value")
		case key == "order" && d.Order != 0, key == "arc" && d.Arc != 0:
			return fail(key + ": given twice")
		case key == "order":
			if d.Order = readOrder(value); d.Order == 0 {
				return fail("order " + quote(value) + " is not 1 or 2")
			}
		case key == "arc":
			if d.Arc = readArc(value); d.Arc == 0 {
				return fail("arc " + quote(value) + " is not a number from 2 to 200")
			}
		default:
			return fail(quote(key) + ": no such key")
		}
	}
	switch {
	case d.Order == 0:
		return fail("order: missing")
	case d.Arc == 0:
		return fail("arc: missing")
	}
	return d, nil
}

// readOrder gives 0 for what is no order.
func readOrder(s string) int {
	n, err := strconv.Atoi(s)
	if err != nil || n < 1 || n > 2 {
		return 0
	}
	return n
}

// readArc gives 0 for what is no number of elements.
func readArc(s string) float64 {
	x, problem := parseNumber(s)
	if problem != nil || !(x >= LeastArc && x <= MostArc) {
		return 0
	}
	return x
}

// density reads {"order": 2, "arc": 6}.
func (d *document) density(n *node) (*Density, error) {
	if err := d.object(n, "order", "arc"); err != nil {
		return nil, err
	}
	order, arc := n.member("order"), n.member("arc")
	for _, m := range []struct {
		key  string
		node *node
	}{{"order", order}, {"arc", arc}} {
		if m.node == nil {
			return nil, d.fail(n.at, InputError{What: n.path + "." + m.key, Reason: "missing", Hint: `write {"order": 2, "arc": 6}`})
		}
	}
	var out Density
	s, err := d.written(order, "write 1 or 2")
	if err != nil {
		return nil, err
	}
	if out.Order = readOrder(s); out.Order == 0 {
		return nil, d.refuse(order, "not the order of such elements", "write 1 (straight sides) or 2 (with mid-nodes)")
	}
	if s, err = d.written(arc, "write a number from 2 to 200"); err != nil {
		return nil, err
	}
	if out.Arc = readArc(s); out.Arc == 0 {
		return nil, d.refuse(arc, "not a number of elements per 90°", "write a number from 2 to 200")
	}
	return &out, nil
}
