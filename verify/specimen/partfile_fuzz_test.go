package specimen

import (
	"errors"
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
	})
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
