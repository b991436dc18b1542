package main

import (
	"strings"

	"notchproof/verify/specimen"
	"notchproof/verify/tolerance"
)

// isDeviation tells a word such as r=±0.2mm, r=+-0.2mm or d=+0.05/-0 from a
// dimension.
func isDeviation(word string) bool {
	_, text, ok := strings.Cut(word, "=")
	if !ok {
		return false
	}
	text = strings.TrimSpace(text)
	if _, equal := equalDeviation(text); equal {
		return true
	}
	_, _, two := twoDeviations(text)
	return two
}

// equalDeviation cuts the sign off a deviation to both sides.
func equalDeviation(text string) (string, bool) {
	for _, sign := range []string{"±", "+/-", "+-", "+/−", "+−"} {
		if rest, ok := strings.CutPrefix(text, sign); ok {
			return rest, true
		}
	}
	return "", false
}

// twoDeviations parts "+0.3/-0.1" at the bar before the second sign. A zero needs
// no sign, "+0.2/0" and "0/-0.2"; any other bar without a sign after it belongs to
// a fraction of an inch.
func twoDeviations(text string) (first, second string, ok bool) {
	at := strings.LastIndex(text, "/")
	if at < 0 {
		return "", "", false
	}
	first, second = strings.TrimSpace(text[:at]), strings.TrimSpace(text[at+1:])
	if !hasSign(first) && !hasSign(second) {
		return "", "", false
	}
	return first, second, deviationAlone(first) && deviationAlone(second)
}

// deviationAlone: a deviation has a sign, or is nothing.
func deviationAlone(text string) bool {
	return hasSign(text) || nothing(text)
}

func nothing(text string) bool {
	l, err := specimen.ParseLength(text)
	if err != nil {
		a, wrong := specimen.ParseAngle(text)
		return wrong == nil && a == 0
	}
	return l.Value == 0
}

func hasSign(text string) bool {
	return strings.HasPrefix(text, "+") || strings.HasPrefix(text, "-") || strings.HasPrefix(text, "−")
}

// loneDeviation is the fault of a word such as r=+0.2 after r=3mm.
func loneDeviation(word string, before []string) error {
	name, text, _ := strings.Cut(word, "=")
	if !hasSign(text) {
		return nil
	}
	for _, b := range before {
		if other, _, ok := strings.Cut(b, "="); ok && other == name || isFile(b) {
			return &inputError{text: quoted(word) + ": one deviation alone", hint: "write both, as in " + word + "/-0, or " + name + "=±0.2mm"}
		}
	}
	return nil
}

// deviation reads the tolerance of one of a shape's dimensions.
func (s *shape) deviation(word string) (tolerance.Deviation, error) {
	name, text, _ := strings.Cut(word, "=")
	none := tolerance.Deviation{}
	dim := dimensionOf(s.family, name)
	if dim == nil {
		return none, unknownDimension(s.family, name)
	}
	if _, given := s.dims[name]; !given {
		return none, &inputError{text: quoted(word) + ": a tolerance of a dimension that is not given", hint: "give " + name + " itself as well"}
	}
	read := s.deviationLength
	if dim.Angle {
		read = specimenAngle
	}
	d := tolerance.Deviation{Name: name}
	var err error
	text = strings.TrimSpace(text)
	if half, equal := equalDeviation(text); equal {
		if hasSign(strings.TrimSpace(half)) {
			return none, &inputError{text: quoted(word) + ": a sign behind ±", hint: "write r=±0.2mm, or both deviations, as in r=+0.3/-0.1mm"}
		}
		d.Upper, err = read(word, half, half)
		d.Lower = -d.Upper
	} else {
		first, second, _ := twoDeviations(text)
		if d.Lower, err = read(word, first, second); err == nil {
			d.Upper, err = read(word, second, first)
		}
	}
	if d.Lower > d.Upper {
		d.Lower, d.Upper = d.Upper, d.Lower
	}
	if err == nil && d.Lower == d.Upper {
		err = &inputError{text: quoted(word) + ": a tolerance without width", hint: "write the permitted deviations, as in r=±0.2mm or r=+0.3/-0"}
	}
	return d, err
}

func specimenAngle(word, text, _ string) (float64, error) {
	a, err := specimen.ParseAngle(text)
	return a, named(err, strings.SplitN(word, "=", 2)[0])
}

// deviationLength reads a length in the unit of the shape. Of two deviations
// one may leave its unit to the other, +0.3/-0.1mm, and both to the dimension:
// d=48mm d=+0.05/-0, as drawings write it.
func (s *shape) deviationLength(word, text, other string) (float64, error) {
	name, _, _ := strings.Cut(word, "=")
	l, err := specimen.ParseLength(text)
	if err != nil {
		return 0, named(err, name)
	}
	if l.Value == 0 {
		return 0, nil
	}
	if o, err := specimen.ParseLength(other); err == nil && l.Unit == "" {
		l.Unit = o.Unit
	}
	switch {
	case l.Unit == "":
		return l.Value, nil
	case s.unit == "":
		return 0, &inputError{text: quoted(word) + ": the tolerance has a unit and the dimensions have none", hint: "leave the unit off"}
	}
	return l.In(s.unit), nil
}
