package specimen

import (
	"errors"
	"testing"
)

func TestParseDensity(t *testing.T) {
	for text, want := range map[string]Density{
		"order=2,arc=6":      {2, 6},
		"arc=6.5, order=1":   {1, 6.5},
		" order=1 , arc=2":   {1, 2},
		"order=2,arc=2e2":    {2, 200},
		"order=2,arc=+12.00": {2, 12},
	} {
		if got, err := ParseDensity(text); err != nil || got != want {
			t.Errorf("%q: %v, %v", text, got, err)
		}
	}
	for _, text := range []string{
		"", ",", "order", "order=2", "arc=6", "order=2,arc=", "order=,arc=6", "order=0,arc=6", "order=3,arc=6", "order=1.0,arc=6",
		"order=2,arc=1", "order=2,arc=0", "order=2,arc=-6", "order=2,arc=201", "order=2,arc=1e9", "order=2,arc=1e999", "order=2,arc=NaN",
		"order=2,arc=0x8", "order=2,order=2,arc=6", "order=2,arc=6,arc=6", "order=2,arc=6,", "Order=2,arc=6", "order=2;arc=6", "order=2,arc=6 6",
	} {
		var fault *InputError
		if got, err := ParseDensity(text); !errors.As(err, &fault) || fault.Hint == "" || fault.Reason == "" || got != (Density{}) {
			t.Errorf("%q: %v, %v", text, got, err)
		}
	}
}
