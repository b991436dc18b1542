package chart

import (
	"fmt"
	"slices"
	"strings"

	"notchproof/scf"
	"notchproof/verify/specimen"
)

// Words are a question as it is written.
type Words struct {
	Family  *scf.Family
	Load    scf.Load
	Options scf.Options
	Along   string   // "r/d=0.02:0.3"
	Curves  string   // "D/d=1.1,1.5,2"; empty: one curve
	Given   []string // "L/d=0.5", "angle=60": what stays the same
	Target  float64  // relative uncertainty wished for; 0: 0.001
}

// A Question asks for the factor over a grid of shapes.
type Question struct {
	Family  *scf.Family
	Load    scf.Load
	Options scf.Options
	Along   Axis
	Curves  *Axis // nil: one curve
	Given   []Setting
	Unit    string // of lengths; empty: unnamed
	Target  float64

	steps []step
}

// A Setting is a variable that is the same all over the chart.
type Setting struct {
	Variable
	Value float64
}

const defaultTarget = 1e-3

// Read reads a question. Its errors are *Fault and *specimen.InputError.
func (w Words) Read() (*Question, error) {
	q := &Question{Family: w.Family, Load: w.Load, Options: w.Options, Target: w.Target}
	if q.Target == 0 {
		q.Target = defaultTarget
	}
	if w.Along == "" {
		return nil, fault("name a ratio or a dimension with its range, as in --along r/d=0.02:0.3", "along what?")
	}
	axes := make([]axisWords, 1, 2)
	var err error
	if axes[0], err = readAxis(w.Family, "--along", w.Along, defaultAlong, mostAlong); err != nil {
		return nil, err
	}
	if w.Curves != "" {
		second, err := readAxis(w.Family, "--curves", w.Curves, defaultCurves, mostCurves)
		if err != nil {
			return nil, err
		}
		axes = append(axes, second)
	}
	if err := q.readGiven(w.Given, axes); err != nil {
		return nil, err
	}
	q.steps, err = settle(w.Family, q.relations())
	return q, err
}

// readGiven reads what stays the same, and brings all lengths to one unit.
func (q *Question) readGiven(words []string, axes []axisWords) error {
	var given []axisWords
	for _, word := range words {
		name, text, ok := strings.Cut(word, "=")
		if !ok {
			return fault("write name=value, as in D=60mm or L/d=0.5", "%q: not a dimension", word)
		}
		v, err := readVariable(q.Family, name)
		if err != nil {
			return err
		}
		value, err := readValue(q.Family, v, text)
		if err != nil {
			return err
		}
		given = append(given, axisWords{variable: v, text: word, values: []specimen.Length{value}})
	}
	values, err := q.common(slices.Concat(axes, given))
	if err != nil {
		return err
	}
	for i, a := range axes {
		axis, err := a.axis(q.Family, values[i])
		if err != nil {
			return err
		}
		switch {
		case a.variable.length(q.Family):
			axis.Unit = q.Unit
		case a.variable.angle(q.Family):
			axis.Unit = "°"
		}
		if i == 0 {
			q.Along = axis
		} else {
			q.Curves = &axis
		}
	}
	for i, g := range given {
		q.Given = append(q.Given, Setting{g.variable, values[len(axes)+i][0]})
	}
	return nil
}

// common gives all values with the lengths among them in one unit.
func (q *Question) common(words []axisWords) ([][]float64, error) {
	var lengths []specimen.Dimension
	for _, w := range words {
		for _, v := range w.values {
			if w.variable.length(q.Family) {
				lengths = append(lengths, specimen.Dimension{Name: w.variable.Name, Length: v})
			}
		}
	}
	var converted []float64
	if len(lengths) > 0 {
		var err error
		if converted, q.Unit, err = specimen.Common(lengths); err != nil {
			return nil, err
		}
	}
	out := make([][]float64, len(words))
	for i, w := range words {
		for _, v := range w.values {
			value := v.Value
			if w.variable.length(q.Family) {
				value, converted = converted[0], converted[1:]
			}
			out[i] = append(out[i], value)
		}
	}
	return out, nil
}

func (q *Question) relations() []relation {
	var list []relation
	for _, g := range q.Given {
		list = append(list, relation{Variable: g.Variable, from: fixed, value: g.Value})
	}
	list = append(list, relation{Variable: q.Along.Variable, from: along})
	if q.Curves != nil {
		list = append(list, relation{Variable: q.Curves.Variable, from: curves})
	}
	return list
}

// Setting is a setting as it is written.
func (q *Question) Setting(s Setting) string {
	unit := ""
	if s.length(q.Family) {
		unit = q.Unit
	}
	return s.String() + "=" + exact(s.Value) + unit
}

// Lines are the whole question, a word and its value each: two questions are the
// same when their lines are.
func (q *Question) Lines() []string {
	lines := []string{
		"family " + q.Family.Name,
		"load " + string(q.Load),
	}
	for _, g := range q.Given {
		lines = append(lines, "given "+q.Setting(g))
	}
	lines = append(lines, "along "+q.Along.text())
	if q.Curves != nil {
		lines = append(lines, "curves "+q.Curves.text())
	}
	line := q.Options.ForceLine
	if line == "" {
		line = scf.ForceLineNet
	}
	return append(lines, "nu "+exact(q.Options.Nu), "force-line "+line, "target "+exact(q.Target))
}

// differs gives the first line in which two questions differ.
func (q *Question) differs(other *Question) (mine, theirs string, differ bool) {
	a, b := q.Lines(), other.Lines()
	for i := range max(len(a), len(b)) {
		switch {
		case i >= len(a):
			return "nothing", b[i], true
		case i >= len(b):
			return a[i], "nothing", true
		case a[i] != b[i]:
			return a[i], b[i], true
		}
	}
	return "", "", false
}

// Symbol is what the factor is called.
func (q *Question) Symbol() string {
	if q.Load == scf.Torsion {
		return "Kts"
	}
	return "Kt"
}

// Place writes where a point stands.
func (q *Question) Place(x, y float64) string {
	text := fmt.Sprintf("%s = %s", q.Along.Variable, q.Along.value(x))
	if q.Curves != nil {
		text += ", " + q.CurveName(y)
	}
	return text
}

// CurveName is what tells a curve from others: "D/d = 1.5".
func (q *Question) CurveName(y float64) string {
	return q.Curves.String() + " = " + q.Curves.value(y)
}

// value writes a value of the axis to the digits that a reader needs.
func (a Axis) value(v float64) string {
	text := exact(rounded(v))
	if a.Unit == "°" || a.Unit == "" {
		return text + a.Unit
	}
	return text + " " + a.Unit
}
