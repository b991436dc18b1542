package chart

import (
	"fmt"
	"strings"
)

// Formula writes a fit as lines to be typed into a calculation: what x and y
// are, the scaled variables, and the factor, with the operations + − * / and the
// functions exp, ln and sqrt alone. ln is the natural logarithm.
func (q *Question) Formula(f *Fit) []string {
	lines := []string{"x = " + q.Along.named()}
	if f.form.q > 0 {
		lines = append(lines, "y = "+q.Curves.named())
	}
	lines = append(lines, "u = "+f.u.text(f.form.x, "x"))
	if f.form.q > 0 {
		lines = append(lines, "v = "+f.v.text(f.form.y, "y"))
	}
	return append(lines, q.Symbol()+" = "+fmt.Sprintf(f.form.outer.text, f.polynomial()))
}

// named is the variable with its unit.
func (a Axis) named() string {
	switch a.Unit {
	case "":
		return a.String()
	case "°":
		return a.String() + " in degrees"
	}
	return a.String() + " in " + a.Unit
}

// polynomial writes P by Horner's rule: no powers, and few roundings.
func (f *Fit) polynomial() string {
	rows := f.rows()
	list := make([]string, len(rows))
	for j, row := range rows {
		numbers := make([]string, len(row))
		for i, c := range row {
			numbers[i] = exact(c)
		}
		list[j] = nested(numbers, "u")
	}
	return nested(list, "v")
}

// nested writes a0 + u*(a1 + u*(a2)).
func nested(terms []string, name string) string {
	text := terms[len(terms)-1]
	for i := len(terms) - 2; i >= 0; i-- {
		if strings.ContainsAny(text, " -") {
			text = "(" + text + ")"
		}
		text = terms[i] + " + " + name + "*" + text
	}
	return text
}

// Range writes where a fit holds.
func (q *Question) Range(f *Fit) string {
	text := q.Along.value(f.xs.low) + " ≤ " + q.Along.String() + " ≤ " + q.Along.value(f.xs.high)
	if f.across {
		text += ", " + q.Curves.value(f.ys.low) + " ≤ " + q.Curves.String() + " ≤ " + q.Curves.value(f.ys.high)
	}
	return text
}

// Ranges are the same by variable.
func (q *Question) Ranges(f *Fit) map[string][2]float64 {
	list := map[string][2]float64{q.Along.String(): {f.xs.low, f.xs.high}}
	if f.across {
		list[q.Curves.String()] = [2]float64{f.ys.low, f.ys.high}
	}
	return list
}
