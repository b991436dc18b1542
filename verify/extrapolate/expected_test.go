package extrapolate

import (
	"math"
	"testing"
)

// TestAgainst: a confirmed order changes nothing, an order above the expected
// one is not believed, one far below is kept but for the floor of a half.
func TestAgainst(t *testing.T) {
	power := func(p, c float64) Study {
		var sizes, values []float64
		for _, h := range []float64{4, 2, 1} {
			sizes, values = append(sizes, h), append(values, 2+c*math.Pow(h, p))
		}
		return Sizes(sizes, values)
	}
	for _, row := range []struct {
		name              string
		observed          float64
		expected          float64
		order, safety     float64
		limitIsTrueAnswer bool
	}{
		{"confirmed", 2, 2, 2, safetyObserved, true},
		{"within a tenth", 2.15, 2, 2.15, safetyObserved, true},
		{"too high to be true", 7, 1, 1, safetyTrusted, false},
		{"low", 1.2, 3, 1.2, safetyTrusted, true},
		{"hardly any", 0.1, 2, 0.5, safetyTrusted, false},
	} {
		for _, c := range []float64{0.01, -0.01} {
			s := power(row.observed, c)
			got := s.Against(row.expected, 2)
			want := row.safety * s.Change / (math.Pow(2, row.order) - 1)
			if math.Abs(got.GCI/want-1) > 1e-9 {
				t.Errorf("%s: grid convergence index %g, want %g", row.name, got.GCI, want)
			}
			if near := math.Abs(got.Limit-2) < 1e-9; near != row.limitIsTrueAnswer {
				t.Errorf("%s: limit %g, true limit 2", row.name, got.Limit)
			}
			if (got.Limit-got.Fine)*(2-got.Fine) <= 0 {
				t.Errorf("%s: the limit %g lies on the wrong side of %g", row.name, got.Limit, got.Fine)
			}
		}
	}
}
