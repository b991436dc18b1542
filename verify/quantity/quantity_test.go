package quantity

import (
	"errors"
	"math"
	"strings"
	"testing"
	"unicode"
)

// force, moment and stress read a text and give the value in the unit of
// calculation.
func force(s string) (float64, error)  { f, err := ParseForce(s); return f.Newtons(), err }
func moment(s string) (float64, error) { m, err := ParseMoment(s); return m.NewtonMillimetres(), err }
func stress(s string) (float64, error) { x, err := ParseStress(s); return x.Megapascals(), err }

// TestReads holds the conversions against the table of NIST SP 811 (2008),
// appendix B.8, whose factors have seven digits where they are not exact.
func TestReads(t *testing.T) {
	const exact, table = 0, 5e-7
	for _, c := range []struct {
		read      func(string) (float64, error)
		text      string
		want      float64
		tolerance float64
	}{
		{force, "12kN", 12000, exact}, {force, "12 kN", 12000, exact}, {force, "−3.5e3N", -3500, exact}, {force, ".5MN", 5e5, exact},
		{force, "1lbf", 4.4482216152605, exact}, {force, "1 kip", 4448.2216152605, exact}, {force, "1lbf", 4.448222, table},
		{force, "0kN", 0, exact}, {force, "+7.N", 7, exact}, {force, "12\u00a0kN", 12000, exact},
		{moment, "300N·m", 3e5, exact}, {moment, "300 N*m", 3e5, exact}, {moment, "300Nm", 3e5, exact}, {moment, "300 N m", 3e5, exact},
		{moment, "300 N.m", 3e5, exact}, {moment, "300N-m", 3e5, exact}, {moment, "1.1N⋅mm", 1.1, exact}, {moment, "2kN·m", 2e6, exact}, {moment, "2kNm", 2e6, exact},
		{moment, "1 in·lbf", 112.9848, table}, {moment, "1 lbf·in", 112.9848, table}, {moment, "1in-lbf", 112.9848, table},
		{moment, "1ft·lbf", 1355.818, table}, {moment, "1 lbf ft", 1355.818, table}, {moment, "1kip·ft", 1355818, table}, {moment, "1kip·in", 112984.8, table},
		{stress, "300 MPa", 300, exact}, {stress, "300N/mm²", 300, exact}, {stress, "300N/mm2", 300, exact}, {stress, "300 N/mm^2", 300, exact},
		{stress, "210GPa", 210000, exact}, {stress, "5kPa", 0.005, exact}, {stress, "5e6Pa", 5, exact},
		{stress, "1psi", 6.894757e-3, table}, {stress, "51ksi", 51 * 6.894757, table},
	} {
		got, err := c.read(c.text)
		if err != nil || math.Abs(got-c.want) > c.tolerance*math.Abs(c.want) {
			t.Errorf("%q: %.17g, %v, want %.17g", c.text, got, err, c.want)
		}
	}
}

// The ratios of moments and stresses follow from those of force and length.
func TestRatiosGoTogether(t *testing.T) {
	lbf, _ := forces().find("lbf")
	for name, arm := range map[string]string{"lbf·in": "25.4", "lbf·ft": "304.8", "kip·in": "25400", "kip·ft": "304800"} {
		u, ok := moments().find(name)
		want := rational(arm)
		if want.Mul(want, lbf.exact()); !ok || u.exact().Cmp(want) != 0 {
			t.Errorf("%s is %s N·mm, want %s", name, u.exact().FloatString(15), want.FloatString(15))
		}
	}
	psi, _ := stresses().find("psi")
	want := rational("25.4")
	want.Quo(lbf.exact(), want.Mul(want, want))
	if psi.exact().Cmp(want) != 0 {
		t.Errorf("psi is %s MPa, want %s", psi.exact().FloatString(15), want.FloatString(15))
	}
}

// What goes out in the unit of the input comes back.
func TestLike(t *testing.T) {
	f, _ := ParseForce("2.5kip")
	if back := f.Like(f.Newtons()); math.Abs(back.Value()-2.5) > 1e-15 || back.Unit() != "kip" {
		t.Errorf("2.5 kip came back as %v", back)
	}
	m, _ := ParseMoment("7 in·lbf")
	if back := m.Like(2 * m.NewtonMillimetres()); math.Abs(back.Value()-14) > 1e-14 || back.Unit() != "lbf·in" {
		t.Errorf("twice 7 lbf·in came back as %v", back)
	}
	var none Stress
	if none.Given() || none.Megapascals() != 0 || none.Like(3) != Megapascals(3) {
		t.Errorf("a stress that was not given: %v, %v", none, none.Like(3))
	}
}

// TestRefuses: one clear line with a hint.
func TestRefuses(t *testing.T) {
	for _, c := range []struct {
		read         func(string) (float64, error)
		text         string
		reason, hint string
	}{
		{force, "450N·m", "a moment where a force belongs", "12kN"},
		{force, "300MPa", "a stress where a force belongs", "12kN"},
		{moment, "12kN", "a force where a moment belongs", "300N·m"},
		{stress, "12 lbf ft", "a moment where a stress belongs", "355MPa"},
		{force, "12", "no unit", "N, kN, MN, lbf or kip"},
		{stress, "355", "no unit", "MPa"},
		{force, "12KN", `unknown unit "KN"`, "did you mean 12kN?"},
		{stress, "12mpa", `unknown unit "mpa"`, "did you mean 12MPa?"},
		{force, "12kg", `"kg" is a mass`, "kN"},
		{force, "12 lb", `"lb" is a mass`, "lbf"},
		{force, "1,5kN", "comma in a number", "1.5"},
		{force, "1,200.5kN", "comma in a number", "1.5"},
		{force, "1 200kN", "not a number", "12kN"},
		{force, "0x10N", `unknown unit "x10N"`, "kN"},
		{force, "3/8kN", "not a number", "12kN"},
		{force, "1.2.3kN", "not a number", "12kN"},
		{force, "12 furlongs", `unknown unit "furlongs"`, "kN"},
		{force, "", "no number", "12kN"}, {force, "kN", "no number", "12kN"}, {force, "NaN N", "no number", "12kN"}, {force, "-kN", "no number", "12kN"},
		{force, "InfN", "no number", "12kN"}, {force, "1e400N", "number too large", "kN"}, {force, "1e-400N", "number too small", "kN"},
		{force, "1e300N", "beyond a force of a part", "kN"}, {stress, "1e-200Pa", "beyond a stress of a part", "MPa"},
		{force, "5\x00N", `unknown unit "\x00N"`, "kN"}, {force, "5e", `unknown unit "e"`, "kN"}, {moment, "5mN", `unknown unit "mN"`, "N·m"},
	} {
		_, err := c.read(c.text)
		var fault *Error
		if !errors.As(err, &fault) {
			t.Errorf("%q: %v, want %q", c.text, err, c.reason)
			continue
		}
		if fault.Reason != c.reason || !strings.Contains(fault.Hint, c.hint) {
			t.Errorf("%q: %v; %s, want %q; …%s…", c.text, err, fault.Hint, c.reason, c.hint)
		}
	}
}

// FuzzParse: whatever is written, a finite value or one printable line.
func FuzzParse(f *testing.F) {
	for _, s := range []string{"12kN", "300 N·m", "−5e3 psi", "1,5MPa", "\xff", "٣N", strings.Repeat("9", 400) + "N"} {
		f.Add(s)
	}
	f.Fuzz(func(t *testing.T, s string) {
		for _, read := range []func(string) (float64, error){force, moment, stress} {
			v, err := read(s)
			if err == nil && (math.IsNaN(v) || math.IsInf(v, 0)) {
				t.Errorf("%q read as %g", s, v)
			}
			var fault *Error
			if err != nil && (!errors.As(err, &fault) || fault.Hint == "" || strings.ContainsFunc(err.Error(), unicode.IsControl) || len([]rune(err.Error())) > 400) {
				t.Errorf("%q: %v", s, err)
			}
		}
	})
}
