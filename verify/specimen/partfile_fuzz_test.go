package specimen

import (
	"encoding/json"
	"errors"
	"math"
	"os"
	"path/filepath"
	"strings"
	"testing"
	"unicode"
)

// FuzzReadPart: whatever the bytes, either there is one line that says where
// the fault is, or a part whose outline is valid, whose ends face outwards and
// which can be written and read again.
func FuzzReadPart(f *testing.F) {
	names, _ := filepath.Glob("../../testdata/parts/*.json")
	for _, name := range names {
		data, err := os.ReadFile(name)
		if err != nil {
			f.Fatal(err)
		}
		f.Add(data)
	}
	f.Add([]byte(good))
	for _, h := range hostileFiles() {
		if len(h.file) < 4096 {
			f.Add([]byte(h.file))
		}
	}
	f.Fuzz(func(t *testing.T, data []byte) {
		file, err := ReadPart(data, "part.json", Over{})
		if err != nil {
			faultIsPlaced(t, data, err)
			return
		}
		soundPart(t, file)
	})
}

// FuzzOutline: whatever the outline, and whatever is asked of it. Fuzzing the
// bytes of a file seldom gets past its syntax.
func FuzzOutline(f *testing.F) {
	f.Add("M -216 0 H 147 V 24 H 3 A 3 3 0 0 0 0 27 V 36 H -216 Z", "", true, false, 0.0, 0.0)
	f.Add("M -300 0 H 210 V 50 H 8 A 8 8 0 0 0 0 58 V 80 H -300 Z", "M -52 44 A 12 12 0 0 0 -28 44 A 12 12 0 0 0 -52 44 Z", false, false, 0.0, 0.0)
	f.Add("M -200 17.5 H 200 V 32.5 H 3 V 31.5 A 3 3 0 0 0 -3 31.5 V 32.5 H -200 Z", "", true, false, 0.0, 17.5)
	f.Add("M -210 0 H -28 A 8 8 0 0 0 -20 8 H 20 A 8 8 0 0 0 28 0 H 210 V 30 H -210 Z", "", false, true, 0.0, 8.0)
	f.Add("M -160 0 H 120 V 15 H 14 C 6 15 0 17.5 0 25 H -160 Z", "M 30 5 h 5 v 5 z", false, true, 14.0, 15.0)
	f.Add("M -90 0 H 8 A 2 2 0 0 1 10 2 V 5 H 80 V 20 H -90 Z", "", true, false, -3.5, 20.0)
	f.Fuzz(func(t *testing.T, path, hole string, shaft, mirror bool, x, fibre float64) {
		shape := map[string]any{"model": "bar", "outline": path}
		if shaft {
			shape["model"] = "shaft"
		}
		if mirror {
			shape["mirror"] = true
		}
		if hole != "" {
			shape["holes"] = []string{hole}
		}
		if x != 0 {
			shape["nominal"] = map[string]float64{"x": x, "fibre": fibre}
		}
		data, err := json.Marshal(map[string]any{"shape": shape})
		if err != nil {
			t.Skip() // not a number
		}
		file, err := ReadPart(data, "part.json", Over{})
		if err != nil {
			faultIsPlaced(t, data, err)
			return
		}
		soundPart(t, file)
	})
}

// soundPart holds what every part that was read must fulfil.
func soundPart(t *testing.T, file *File) {
	t.Helper()
	p := file.Part
	if err := p.Region.Validate(); err != nil {
		t.Fatal(err)
	}
	if len(p.Notch) == 0 || len(p.Loads) < 2 || len(file.Loads) == 0 {
		t.Fatalf("notch %v, %d loads, %v asked for", p.Notch, len(p.Loads), file.Loads)
	}
	if a, b := p.Plain[0], p.Plain[1]; !(a.To <= a.From && a.From <= b.To && b.From <= b.To && a.Low < a.High && b.Low < b.High) {
		t.Fatalf("plain ends %+v", p.Plain)
	}
	for _, l := range p.Loads {
		if n := l.Nominal; !(n.Net > 0) || !(n.Gross > 0) {
			t.Fatalf("%s: nominal stress %g, gross %g", l.Name, n.Net, n.Gross)
		}
	}
	written, err := p.AsFile()
	if err != nil {
		t.Fatal(err)
	}
	again, err := ReadPart(written, "written.json", Over{})
	if err != nil {
		t.Fatalf("%v in\n%s", err, written)
	}
	if len(again.Part.Region.Sides()) != len(p.Region.Sides()) {
		t.Fatalf("%d sides became %d", len(p.Region.Sides()), len(again.Part.Region.Sides()))
	}
	for i, l := range p.Loads {
		if got := again.Part.Loads[i].Nominal.Net; math.Abs(got/l.Nominal.Net-1) > 1e-6 {
			t.Fatalf("%s: nominal stress %g became %g in\n%s", l.Name, l.Nominal.Net, got, written)
		}
	}
}

func faultIsPlaced(t *testing.T, data []byte, err error) {
	var fault *FileError
	if !errors.As(err, &fault) {
		t.Fatalf("error without a place: %v", err)
	}
	lines := strings.Count(string(data), "\n") + 1
	if fault.Line < 1 || fault.Line > lines || fault.Column < 1 || fault.Column > len(data)+1 {
		t.Fatalf("%d:%d in a file of %d lines and %d bytes", fault.Line, fault.Column, lines, len(data))
	}
	if text := err.Error(); strings.ContainsFunc(text, unicode.IsControl) {
		t.Fatalf("not one line: %q", text)
	}
}
