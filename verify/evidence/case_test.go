package evidence

import (
	"testing"
	"time"
)

// Every case holds.
func TestCases(t *testing.T) {
	for _, c := range Cases() {
		t0 := time.Now()
		out := c.run(t.Context())
		t.Log(c.Name, time.Since(t0))
		if out.Err != nil {
			t.Errorf("%s: %v", c.Name, out.Err)
		}
		for _, r := range out.Readings {
			t.Logf("  %s: %.10g ± %.2g, want %.10g (off by %.2g)", r.What, r.Got, r.Bar, r.Value, r.Got-r.Value)
			if !r.Passed {
				t.Errorf("%s, %s: %.10g ± %.2g, want %.10g ± %.2g", c.Name, r.What, r.Got, r.Bar, r.Value, r.Accuracy)
			}
		}
	}
}
