package report

import (
	"encoding/json"
	"math"
)

// Number is a number that may be missing, NaN then, which is null in JSON.
type Number float64

// numberOf takes what is not finite as missing, so that a content says the same
// before it is written and after it is read.
func numberOf(v float64) Number {
	if math.IsInf(v, 0) {
		v = math.NaN()
	}
	return Number(v)
}

// MarshalJSON writes a number that reads back to the last bit, or null.
func (n Number) MarshalJSON() ([]byte, error) {
	if v := float64(n); math.IsNaN(v) || math.IsInf(v, 0) {
		return []byte("null"), nil
	}
	return json.Marshal(float64(n))
}

// UnmarshalJSON reads a number or null.
func (n *Number) UnmarshalJSON(data []byte) error {
	if string(data) == "null" {
		*n = Number(math.NaN())
		return nil
	}
	return json.Unmarshal(data, (*float64)(n))
}

func (n Number) finite() bool { return !math.IsNaN(float64(n)) && !math.IsInf(float64(n), 0) }
