package report

import (
	"encoding/json"
	"math"
)

// Number is a number that may be missing: NaN and infinities are null in JSON,
// and null is read as NaN.
type Number float64

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
