package specimen

import (
	"errors"
	"math"
	"strings"
	"testing"
)

func TestParseLength(t *testing.T) {
	for _, c := range []struct {
		text  string
		value float64
		unit  string
	}{
		{"60mm", 60, "mm"}, {"60 mm", 60, "mm"}, {" 60\tmm ", 60, "mm"}, {"60\u00a0mm", 60, "mm"},
		{"6cm", 6, "cm"}, {"0.06m", 0.06, "m"}, {"0.125in", 0.125, "in"}, {".5in", 0.5, "in"}, {"5.", 5, ""},
		{"60", 60, ""}, {"1e3mm", 1000, "mm"}, {"1E-3 m", 0.001, "m"}, {"+2mm", 2, "mm"}, {"-2mm", -2, "mm"}, {"−2mm", -2, "mm"},
		{"3/8in", 0.375, "in"}, {"1-3/8in", 1.375, "in"}, {"1 3/8 in", 1.375, "in"}, {"1  3 / 8 in", 1.375, "in"},
		{"11/8in", 1.375, "in"}, {"-1-3/8in", -1.375, "in"}, {"1/3in", 1.0 / 3, "in"}, {"0-1/64in", 1.0 / 64, "in"},
		{"0", 0, ""}, {"-0", 0, ""}, {"0e5mm", 0, "mm"}, {"0.1mm", 0.1, "mm"},
	} {
		l, err := ParseLength(c.text)
		if err != nil || l.Value != c.value || l.Unit != c.unit || l.Text != c.text || math.Signbit(l.Value) != (c.value < 0) {
			t.Errorf("%q: %+v, %v", c.text, l, err)
		}
	}
}

// Micrometres are read in every spelling and become millimetres, exactly.
func TestMicrometres(t *testing.T) {
	for _, text := range []string{"20\u00b5m", "20 \u03bcm", "20um"} {
		if l, err := ParseLength(text); err != nil || l.Value != 0.02 || l.Unit != "mm" {
			t.Errorf("%s: %+v, %v, want 0.02 mm", text, l, err)
		}
	}
	if l, err := ParseLength("3um"); err != nil || l.In("mm") != 0.003 {
		t.Errorf("3um: %v mm, %v", l.In("mm"), err)
	}
}

func TestParseLengthRefuses(t *testing.T) {
	for _, c := range []struct{ text, reason, hint string }{
		{"", "no number", "60mm"}, {"  ", "no number", ""}, {"mm", "no number", ""}, {"NaN", "no number", ""}, {"nan mm", "no number", ""},
		{"Inf", "no number", ""}, {"-inf", "no number", ""}, {"infinity", "no number", ""}, {"-", "no number", ""},
		{"0x10", "not a number", ""}, {"0x1p4mm", "not a number", ""}, {"1_000mm", "not a number", ""}, {"1 000mm", "not a number", ""},
		{"1.2.3", "not a number", "point"}, {"--1", "not a number", ""}, {".", "not a number", ""}, {"1-2mm", "not a number", ""}, {"e5", "not a number", ""},
		{"٣mm", "no number", ""}, {"2×3mm", "not a number", ""},
		{"12,5mm", "decimal comma", "write 12.5mm, with a point"}, {"12,5", "decimal comma", "write 12.5, with a point"},
		{"1,234.5mm", "comma in a number", "1234.5"},
		{"1e400mm", "number too large", ""}, {"1e-400mm", "number too small", ""},
		{"60MM", `unknown unit "MM"`, "did you mean 60mm?"}, {"60nm", `unknown unit "nm"`, "60mm"}, {"2ih", `unknown unit "ih"`, "2in"},
		{`2"`, `unknown unit "\""`, "write 2in"}, {"2inch", `unknown unit "inch"`, "write 2in"}, {"2ft", `unknown unit "ft"`, "mm, cm, m or in"},
		{"2 light years", `unknown unit "light years"`, "mm, cm, m or in"}, {"5e", `unknown unit "e"`, ""}, {"5%", `unknown unit "%"`, ""},
		{"3/8", reasonFraction, "write 3/8in"}, {"3/8mm", reasonFraction, "3/8in"}, {"1/0in", "fraction with denominator 0", ""},
		{"1-8/8in", "fraction of an inch or more after whole inches", "decimal"}, {"1/2/3in", "not a fraction", "1-3/8in"}, {"1.5/8in", "not a fraction", ""},
		{"/8in", "not a fraction", ""}, {"1-/8in", "not a fraction", ""}, {"--1/8in", "not a fraction", ""}, {"1/-8in", "not a fraction", ""}, {"1234567/8in", "not a fraction", ""},
	} {
		_, err := ParseLength(c.text)
		var e *InputError
		if !errors.As(err, &e) {
			t.Errorf("%q: error %v", c.text, err)
			continue
		}
		if e.What != "length" || e.Value != c.text || e.Reason != c.reason || !strings.Contains(e.Hint, c.hint) {
			t.Errorf("%q: %+v, want reason %q, hint with %q", c.text, *e, c.reason, c.hint)
		}
		if strings.Contains(e.Hint, "{unit}") || strings.ContainsAny(e.Error()+e.Hint, "\n\t") {
			t.Errorf("%q: error %q, hint %q", c.text, e.Error(), e.Hint)
		}
	}
	for _, far := range []string{"5km", "5dm", "5%", "5k", "5ft", "5mil"} {
		var e *InputError
		if _, err := ParseLength(far); !errors.As(err, &e) || strings.Contains(e.Hint, "did you mean") {
			t.Errorf("%s: %v, with a guess that is wrong by powers of ten", far, e)
		}
	}
	_, err := ParseLength(strings.Repeat("9", 50) + "\nfurlong")
	if got := err.Error(); len(got) > 130 || strings.Contains(got, "\n") {
		t.Errorf("error is not one short line: %q", got)
	}
}

// What is accepted is finite and carries a known unit; what is refused says so
// in one line, whatever the input.
func FuzzParseLength(f *testing.F) {
	for _, s := range []string{"60mm", "1-3/8in", "12,5", "NaN", "0x1p4", "\xff\x00", "1/0in", "−3 mm", "1e-400", "''"} {
		f.Add(s)
	}
	f.Fuzz(func(t *testing.T, s string) {
		l, err := ParseLength(s)
		if err != nil {
			var e *InputError
			if !errors.As(err, &e) || e.Reason == "" || strings.Contains(err.Error(), "\n") {
				t.Fatalf("%q: %v", s, err)
			}
			return
		}
		if math.IsNaN(l.Value) || math.IsInf(l.Value, 0) || l.Unit != "" && microsOf(l.Unit) == 0 {
			t.Fatalf("%q: %+v", s, l)
		}
		if _, err := ParseAngle(s); err == nil && l.Unit != "" {
			t.Fatalf("%q is a length and an angle", s)
		}
	})
}

// The inch is 25.4 mm exactly (1959): decimals convert as they read.
func TestLengthIn(t *testing.T) {
	for _, c := range []struct {
		text, unit string
		want       float64
	}{
		{"1in", "mm", 25.4}, {"1.1in", "mm", 27.94}, {"0.1in", "mm", 2.54}, {"0.7in", "cm", 1.778}, {"1-3/8in", "mm", 34.925}, {"3/8in", "mm", 9.525},
		{"25.4mm", "in", 1}, {"27.94mm", "in", 1.1}, {"0.07m", "mm", 70}, {"70mm", "m", 0.07}, {"1.1cm", "mm", 11}, {"-0.3in", "mm", -7.62}, {"0in", "mm", 0},
		{"60", "", 60},
	} {
		l, err := ParseLength(c.text)
		if err != nil {
			t.Fatal(err)
		}
		if got := l.In(c.unit); got != c.want {
			t.Errorf("%s = %.17g %s, want %.17g", c.text, got, c.unit, c.want)
		}
	}
	defer func() {
		if recover() == nil {
			t.Error("no panic between plain and mm")
		}
	}()
	Length{Value: 1}.In("mm")
}

func dimensions(t *testing.T, args ...string) []Dimension {
	t.Helper()
	var dims []Dimension
	for _, a := range args {
		name, text, _ := strings.Cut(a, "=")
		l, err := ParseLength(text)
		if err != nil {
			t.Fatal(err)
		}
		dims = append(dims, Dimension{name, l})
	}
	return dims
}

func TestCommon(t *testing.T) {
	for _, c := range []struct {
		args   []string
		values []float64
		unit   string
	}{
		{nil, nil, "mm"},
		{[]string{"D=60mm", "d=40mm"}, []float64{60, 40}, "mm"},
		{[]string{"D=6cm", "d=4cm"}, []float64{6, 4}, "cm"},
		{[]string{"D=60", "d=40"}, []float64{60, 40}, ""},
		{[]string{"D=60mm", "r=1/8in", "d=4cm"}, []float64{60, 3.175, 40}, "mm"},
		{[]string{"D=2in", "r=2.54mm"}, []float64{2, 0.1}, "in"},
	} {
		values, unit, err := Common(dimensions(t, c.args...))
		if err != nil || unit != c.unit || len(values) != len(c.values) {
			t.Errorf("%v: %v %q %v", c.args, values, unit, err)
			continue
		}
		for i := range values {
			if values[i] != c.values[i] {
				t.Errorf("%v: %v, want %v", c.args, values, c.values)
			}
		}
	}
}

func TestCommonRefuses(t *testing.T) {
	for _, c := range []struct {
		args       []string
		text, hint string
	}{
		{[]string{"D=60mm", "d=40mm", "r=3"}, `dimensions "D=60mm r=3": D has a unit and r has none`, "write r=3mm, or leave the units off all lengths"},
		{[]string{"D=60", "r=0.125in"}, `dimensions "D=60 r=0.125in": r has a unit and D has none`, "write D=60in, or leave the units off all lengths"},
		{[]string{"D=1mm", "r=1e308in"}, `r "1e308in": beyond what can be expressed in mm`, ""},
		{[]string{"D=1in", "r=5e-324mm"}, `r "5e-324mm": beyond what can be expressed in in`, ""},
	} {
		_, _, err := Common(dimensions(t, c.args...))
		var e *InputError
		if !errors.As(err, &e) || e.Error() != c.text || e.Hint != c.hint {
			t.Errorf("%v: %+v, want %s", c.args, err, c.text)
		}
	}
}

func TestParseAngle(t *testing.T) {
	for text, want := range map[string]float64{"60": 60, "60deg": 60, "60 deg": 60, "60°": 60, "22.5 °": 22.5, "0": 0, "-10deg": -10} {
		if got, err := ParseAngle(text); err != nil || got != want {
			t.Errorf("%q: %g, %v", text, got, err)
		}
	}
	for text, want := range map[string]string{
		"": "such as 60", "deg": "such as 60", "NaN": "such as 60", "1rad": "write 57.2958deg", "0.5 radians": "write 28.6479deg", "60mm": "60deg",
		"60 degrees": "60deg", "22,5°": "write 22.5°, with a point", "1/2": "point", "0x10": "point", "1e999": "",
	} {
		_, err := ParseAngle(text)
		var e *InputError
		if !errors.As(err, &e) || e.What != "angle" || !strings.Contains(e.Hint, want) {
			t.Errorf("%q: %v, want a hint with %q", text, err, want)
		}
	}
}
