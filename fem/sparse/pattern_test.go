package sparse

import (
	"math"
	"strings"
	"testing"
)

func TestAnalyseNamesWhatIsWrong(t *testing.T) {
	centres := [][2]float64{{0, 0}, {1, 0}}
	for _, c := range []struct {
		pattern Pattern
		want    string
	}{
		{Pattern{Unknowns: -1}, "-1 unknowns"},
		{Pattern{Unknowns: 1}, "unknown 0 belongs to no element"},
		{Pattern{Unknowns: 2, Start: []int32{0, 1, 2}, Index: []int32{0, 1}, Center: centres[:1]}, "1 centres for 2 elements"},
		{Pattern{Unknowns: 2, Start: []int32{0, 1, 2}, Index: []int32{0, 2}, Center: centres}, "element 1 lists unknown 2 of 2"},
		{Pattern{Unknowns: 2, Start: []int32{0, 1, 2}, Index: []int32{-2, 1}, Center: centres}, "element 0 lists unknown -2 of 2"},
		{Pattern{Unknowns: 2, Start: []int32{0, 1, 3}, Index: []int32{0, 1, 1}, Center: centres}, "element 1 lists unknown 1 twice"},
		{Pattern{Unknowns: 3, Start: []int32{0, 1, 3}, Index: []int32{0, 0, 2}, Center: centres}, "unknown 1 belongs to no element"},
		{Pattern{Unknowns: 1, Start: []int32{0, 2, 1}, Index: []int32{0}, Center: centres}, "element 1 starts at 2 and ends at 1"},
		{Pattern{Unknowns: 1, Start: []int32{0, 1, 2}, Index: []int32{0}, Center: centres}, "index has length 1"},
		{Pattern{Unknowns: 1, Start: []int32{0, 1}, Index: []int32{0}, Center: [][2]float64{{math.NaN(), 0}}}, "element 0 has centre (NaN, 0)"},
	} {
		if _, err := Analyse(c.pattern); err == nil || !strings.Contains(err.Error(), c.want) {
			t.Errorf("got error %v, want one with %q", err, c.want)
		}
	}
}
