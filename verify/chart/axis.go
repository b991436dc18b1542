package chart

import (
	"math"
	"slices"
	"strconv"
	"strings"

	"notchproof/scf"
	"notchproof/verify/specimen"
)

// An Axis is a variable with the values that it takes.
type Axis struct {
	Variable
	Values []float64 // rising
	Log    bool      // spaced by equal factors
	Unit   string    // "mm", "°", or empty

	words axisWords
}

// What can be asked for. A chart of more curves cannot be read.
const (
	defaultAlong  = 12
	defaultCurves = 4
	mostAlong     = 200
	mostCurves    = 20
)

// axisWords is an axis as it was written: a list of values, or two ends and a
// number of points.
type axisWords struct {
	variable Variable
	text     string // for errors
	values   []specimen.Length
	count    int // 0: a list
}

// readAxis reads "r/d=0.02:0.3", "r/d=0.02:0.3:12" or "D/d=1.1,1.5,2".
func readAxis(family *scf.Family, flag, text string, count, most int) (w axisWords, err error) {
	hint := "write a range or a list, as in r/d=0.02:0.3:12 or D/d=1.1,1.5,2"
	name, values, ok := strings.Cut(text, "=")
	if !ok || strings.TrimSpace(values) == "" {
		return w, fault(hint, "%s %q: no values", flag, text)
	}
	w.text = flag + " " + text
	if w.variable, err = readVariable(family, name); err != nil {
		return w, err
	}
	list := strings.Split(values, ",")
	if strings.Contains(values, ":") {
		list = strings.Split(values, ":")
		if w.count = count; len(list) == 3 {
			if w.count, err = strconv.Atoi(strings.TrimSpace(list[2])); err != nil || w.count < 2 || w.count > most {
				return w, fault("give 2 to "+strconv.Itoa(most), "%s: %q points", w.text, list[2])
			}
		}
		if len(list) != 2 && len(list) != 3 || strings.Contains(values, ",") {
			return w, fault(hint, "%s: neither a range nor a list", w.text)
		}
		list = list[:2]
	}
	if len(list) > most {
		return w, fault("give at most "+strconv.Itoa(most), "%s: %d values", w.text, len(list))
	}
	for _, item := range list {
		v, err := readValue(family, w.variable, item)
		if err != nil {
			return w, err
		}
		w.values = append(w.values, v)
	}
	w.spreadUnit()
	return w, nil
}

// readValue reads one value; ratios and angles are lengths without a unit.
func readValue(family *scf.Family, v Variable, text string) (specimen.Length, error) {
	if v.Over == "" && v.angle(family) {
		a, err := specimen.ParseAngle(text)
		return specimen.Length{Value: a}, called(err, v.String())
	}
	l, err := specimen.ParseLength(text)
	if err != nil {
		return l, called(err, v.String())
	}
	if v.Over != "" && l.Unit != "" {
		return l, fault("write it without a unit", "%s %q: a ratio has no unit", v, text)
	}
	return l, nil
}

// called names what an input error is about.
func called(err error, name string) error {
	if input, ok := err.(*specimen.InputError); ok {
		input.What = name
	}
	return err
}

// spreadUnit gives the unit of the last value to those before it that have
// none: 0:10mm.
func (w *axisWords) spreadUnit() {
	unit := w.values[len(w.values)-1].Unit
	for i := range w.values {
		if w.values[i].Unit == "" {
			w.values[i].Unit = unit
		}
	}
}

// axis spaces the values, which are in the unit of the question by now.
func (w axisWords) axis(family *scf.Family, values []float64) (a Axis, err error) {
	a = Axis{Variable: w.variable, Values: values, Log: !w.variable.linear(family), words: w}
	for _, v := range values {
		if err := w.allowed(family, v); err != nil {
			return a, err
		}
	}
	if w.count == 0 {
		slices.Sort(a.Values)
	} else {
		if !(values[0] < values[1]) {
			return a, fault("write the smaller end first", "%s: the range does not rise", w.text)
		}
		a.Values = spaced(values[0], values[1], w.count, a.Log)
	}
	for i := 1; i < len(a.Values); i++ {
		if !(a.Values[i] > a.Values[i-1]) {
			return a, fault("give each value once, and ends far enough apart", "%s: %g twice", w.text, a.Values[i])
		}
	}
	return a, nil
}

// allowed refuses what no shape has.
func (w axisWords) allowed(family *scf.Family, v float64) error {
	d := dimension(family, w.variable.Name)
	switch {
	case v < 0 && !d.Signed:
		return fault("begin at a value above zero", "%s: %g is below zero", w.text, v)
	case v == 0 && !d.Zero && !d.Signed && !d.Angle:
		return fault("begin at a value above zero", "%s: %s cannot be zero on a chart", w.text, w.variable)
	}
	return nil
}

// placeDigits is how finely values between the ends of a range are placed, in
// significant digits: round numbers are easier to handle, and the same on every
// machine, whose logarithms may differ in the last bit.
const placeDigits = 6

// spaced divides a range by equal factors or by equal steps.
func spaced(low, high float64, n int, log bool) []float64 {
	values := make([]float64, n)
	for i := range values {
		values[i] = rounded(between(low, high, float64(i)/float64(n-1), log))
	}
	values[0], values[n-1] = low, high
	return values
}

// between is the place a share of the way from low to high.
func between(low, high, share float64, log bool) float64 {
	if log {
		return math.Exp(math.Log(low) + share*(math.Log(high)-math.Log(low)))
	}
	return low + share*(high-low)
}

func rounded(x float64) float64 { return roundedTo(x, placeDigits) }

func roundedTo(x float64, digits int) float64 {
	y, err := strconv.ParseFloat(strconv.FormatFloat(x, 'e', digits-1, 64), 64)
	if err != nil {
		panic("chart: a number that does not read back")
	}
	return y
}

// text is the axis as it is written, in the unit of the question.
func (a Axis) text() string {
	unit := a.Unit
	if unit == "°" {
		unit = ""
	}
	if a.words.count > 0 {
		return a.String() + "=" + exact(a.Values[0]) + unit + ":" + exact(a.Values[len(a.Values)-1]) + unit + ":" + strconv.Itoa(len(a.Values))
	}
	list := make([]string, len(a.Values))
	for i, v := range a.Values {
		list[i] = exact(v) + unit
	}
	return a.String() + "=" + strings.Join(list, ",")
}

// exact writes a number the shortest way that reads back the same.
func exact(v float64) string { return strconv.FormatFloat(v, 'g', -1, 64) }
