package scf

import (
	"encoding/csv"
	"math"
	"os"
	"strconv"
	"strings"
	"testing"
)

// readTable returns the data rows of a file in testdata.
func readTable(t *testing.T, name string) [][]string {
	t.Helper()
	file, err := os.Open("testdata/" + name)
	if err != nil {
		t.Fatal(err)
	}
	defer file.Close()
	r := csv.NewReader(file)
	r.Comment = '#'
	rows, err := r.ReadAll()
	if err != nil {
		t.Fatal(err)
	}
	return rows[1:]
}

func mustFloat(t *testing.T, s string) float64 {
	t.Helper()
	v, err := strconv.ParseFloat(s, 64)
	if err != nil {
		t.Fatal(err)
	}
	return v
}

func mustLookup(t *testing.T, name string) *Family {
	t.Helper()
	f, ok := Lookup(name)
	if !ok {
		t.Fatalf("no family %s", name)
	}
	return f
}

// Every fit gives the published values to their last digit: six digits, so
// half a unit of the sixth, at most 5e-6 of the value.
func TestPublishedFits(t *testing.T) {
	const half = 5.01e-6
	for _, row := range readTable(t, "published_fits.csv") {
		f := mustLookup(t, row[0])
		load := Load(row[1])
		dims := Dims{"D": mustFloat(t, row[2]), "d": 1, "r": mustFloat(t, row[3])}
		want := mustFloat(t, row[5])
		if err := f.Check(dims); err != nil {
			t.Fatal(row, err)
		}
		found := false
		for _, v := range f.Handbook(load, dims, Options{Nu: 0.3}) {
			if !strings.HasPrefix(v.ID, row[4]) {
				continue
			}
			found = true
			if math.Abs(v.Factor-want) > half*want {
				t.Errorf("%v: %s gives %.6g", row[:6], v.ID, v.Factor)
			}
			if !v.InRange {
				t.Errorf("%v: %s out of range: %v", row[:4], v.ID, v.Outside)
			}
		}
		if !found {
			t.Errorf("%v: no value from %s", row[:4], row[4])
		}
	}
}
