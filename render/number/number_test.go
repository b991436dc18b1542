package number

import (
	"math"
	"math/big"
	"math/rand/v2"
	"strings"
	"testing"
)

var nan, inf = math.NaN(), math.Inf(1)

// plain shows the special spaces as "_" (no-break) and "'" (thin).
func plain(s string) string {
	return strings.NewReplacer(noBreak, "_", thin, "'", minus, "~").Replace(s)
}

func equal(t *testing.T, what, got, want string) {
	t.Helper()
	if plain(got) != want {
		t.Errorf("%s: %q, want %q", what, plain(got), want)
	}
}

func TestUncertain(t *testing.T) {
	for _, c := range []struct {
		value, bar float64
		want       string
	}{
		{1.87412, 0.0004, "1.8741_±_0.0004"},
		{1.87412, 0.00041, "1.8741_±_0.0005"}, // up, never down
		{1.87412, 0.00101, "1.8741_±_0.0011"}, // two digits after a 1 (0.00102 would be 0.0011 too)
		{1.8741, 0.001, "1.8741_±_0.0010"},
		{1.8745, 0.003, "1.875_±_0.003"}, // a tie, half away from zero
		{1.005, 0.01, "1.005_±_0.010"},
		{2.5, 0.96, "2.5_±_1.0"},     // carries
		{2.5, 0.0999, "2.50_±_0.10"}, // carries
		{2.5, 0.196, "2.50_±_0.20"},  // carries inside two digits
		{9.99996, 0.0004, "10.0000_±_0.0004"},
		{-1.8741, 0.02, "~1.87_±_0.02"},
		{-0.001, 0.02, "0.00_±_0.02"}, // no minus zero
		{0, 0.02, "0.00_±_0.02"},
		{1.9, 3, "2_±_3"}, // larger than the value
		{1.9, 16, "2_±_16"},
		{1.9, 400, "0_±_400"},
		{260, 400, "300_±_400"},
		{1234567, 4321, "1'235'000_±_5000"},
		{123456, 95000, "120'000_±_100'000"},
		{1.87412345678, 3e-12, "1.87412346_±_0.00000001"},
		{1.87412345678, 1.2e-8, "1.87412346_±_0.00000002"},
		{2, 5e-324, "2.00000000_±_0.00000001"},
		{1.8741, 0, "1.8741"},
		{1.874123456789, 0, "1.87412346"},
		{2, 0, "2"},
		{math.Copysign(0, -1), 0, "0"},
		{1.8741, inf, "1.9_±_∞"},
		{1.8741, nan, "1.9_±_–"},
		{nan, 0.1, "–"},
		{nan, inf, "–"},
		{inf, 0.1, "∞"},
		{-inf, 0.1, "~∞"},
	} {
		equal(t, "Uncertain", Uncertain(c.value, c.bar), c.want)
	}
	defer func() {
		if recover() == nil {
			t.Error("no panic at a negative uncertainty")
		}
	}()
	Uncertain(1, -1)
}

// What is shown must contain what is known: the bar never shrinks by more than
// the value moves by rounding, both end at the same decimal, and the bar is not
// blown up by more than half (a first digit of 2 becoming 3).
func TestUncertainHonest(t *testing.T) {
	r := rand.New(rand.NewPCG(1, 5))
	read := func(s string) *big.Rat {
		x, ok := new(big.Rat).SetString(strings.NewReplacer(thin, "", minus, "-").Replace(s))
		if !ok {
			t.Fatalf("%q is no number", s)
		}
		return x
	}
	for range 20000 {
		value, bar := r.NormFloat64()*math.Pow(10, r.Float64()*8-2), math.Pow(10, r.Float64()*12-7)
		v, b := UncertainParts(value, bar)
		shown, _ := read(b).Float64()
		if shown < bar || shown > 1.5*bar+1e-8 {
			t.Fatalf("%g shown as ± %s", bar, b)
		}
		_, dv, _ := strings.Cut(v, ".")
		_, db, _ := strings.Cut(b, ".")
		if len(dv) != len(db) || len(dv) > MostDecimals {
			t.Fatalf("%s ± %s: decimals differ or are too many", v, b)
		}
		near, _ := read(v).Float64()
		if math.Abs(near-value) > 0.5*bar+0.5e-8+1e-12*math.Abs(value) {
			t.Fatalf("%.12g ± %g shown as %s ± %s", value, bar, v, b)
		}
	}
}

func TestDecimal(t *testing.T) {
	for _, c := range []struct {
		x        float64
		decimals int
		want     string
	}{
		{1.005, 2, "1.01"}, {0.125, 2, "0.13"}, {-0.125, 2, "~0.13"}, {0.999, 2, "1.00"},
		{9.5, 0, "10"}, {0.5, 0, "1"}, {0.49, 0, "0"}, {-0.49, 0, "0"}, {0, 3, "0.000"},
		{99999.5, 0, "100'000"}, {9999, 1, "9999.0"}, {12345.678, 2, "12'345.68"},
		{1, 12, "1.00000000"}, {149, -2, "100"}, {150, -2, "200"}, {49, -2, "0"}, {50, -2, "100"}, {5, -3, "0"},
		{999, -3, "1000"}, {nan, 2, "–"}, {-inf, 2, "~∞"}, {5e-324, 2, "0.00"},
	} {
		equal(t, "Decimal", Decimal(c.x, c.decimals), c.want)
	}
}

func TestSignificant(t *testing.T) {
	for _, c := range []struct {
		x      float64
		digits int
		want   string
	}{
		{1.5, 3, "1.50"}, {0.00012345, 3, "0.000123"}, {9.99, 2, "10"}, {9.95, 2, "10"}, {9.94, 2, "9.9"},
		{0.0999, 2, "0.10"}, {123456, 3, "123'000"}, {1.04, 1, "1"}, {1.06, 2, "1.1"}, {10, 3, "10.0"},
		{0, 3, "0"}, {-2.345, 3, "~2.35"}, {1e15, 2, "1.0×10¹⁵"}, {-3e-9, 1, "~3×10⁻⁹"}, {nan, 3, "–"}, {inf, 3, "∞"},
		{1e-8, 3, "0.00000001"}, {7, 0, "7"},
	} {
		equal(t, "Significant", Significant(c.x, c.digits), c.want)
	}
}

func TestPercent(t *testing.T) {
	for _, c := range []struct {
		x        float64
		decimals int
		want     string
	}{
		{0.032, 1, "+3.2_%"}, {-0.005, 1, "~0.5_%"}, {0, 1, "0.0_%"}, {0.0004, 1, "0.0_%"}, {-0.0004, 1, "0.0_%"},
		{0.0005, 1, "+0.1_%"}, {-0.0005, 1, "~0.1_%"}, {0.00049999, 1, "0.0_%"}, {0.285, 0, "+29_%"}, {1, 0, "+100_%"},
		{123.4567, 1, "+12'345.7_%"}, {nan, 1, "–_%"}, {inf, 1, "+∞_%"}, {-inf, 1, "~∞_%"}, {1.7e308, 0, "+∞_%"},
	} {
		equal(t, "SignedPercent", SignedPercent(c.x, c.decimals), c.want)
	}
	equal(t, "Percent", Percent(0.05, 0), "5_%")
	equal(t, "Percent", Percent(-0.05, 0), "~5_%")
}

func TestCount(t *testing.T) {
	for n, want := range map[int]string{0: "0", 7: "7", 9999: "9999", 10000: "10'000", 12345: "12'345", 1234567: "1'234'567",
		-12345: "~12'345", math.MinInt64: "~9'223'372'036'854'775'808"} {
		equal(t, "Count", Count(n), want)
	}
	equal(t, "CountOf", CountOf(1, "rung", "rungs"), "1_rung")
	equal(t, "CountOf", CountOf(0, "rung", "rungs"), "0_rungs")
	equal(t, "CountOf", CountOf(12345, "triangle", "triangles"), "12'345_triangles")
}

func TestQuantity(t *testing.T) {
	equal(t, "Quantity", Quantity(12.3456, 4, "kN"), "12.35_kN")
	equal(t, "Quantity", Quantity(-450, 4, "N·m"), "~450_N·m")
	equal(t, "Quantity", Quantity(nan, 4, "MPa"), "–_MPa")
}

func TestLength(t *testing.T) {
	for _, c := range []struct {
		x    float64
		unit string
		want string
	}{
		{12.5, "mm", "12.5_mm"}, {60, "mm", "60_mm"}, {34.925, "mm", "34.925_mm"}, {0.125, "in", "0.125_in"}, {2, "", "2"},
		{0.1 + 0.2, "m", "0.3_m"}, {1.0 / 3, "in", "0.3333333_in"}, {12345.5, "mm", "12'345.5_mm"}, {-3, "mm", "~3_mm"}, {100, "mm", "100_mm"},
		{0, "mm", "0_mm"}, {nan, "mm", "–_mm"}, {inf, "", "∞"}, {1e-12, "m", "1.000000×10⁻¹²_m"},
	} {
		equal(t, "Length", Length(c.x, c.unit), c.want)
	}
}
