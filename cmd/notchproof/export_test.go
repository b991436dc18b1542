package main

import (
	"encoding/csv"
	"encoding/xml"
	"errors"
	"io"
	"os"
	"path/filepath"
	"strings"
	"testing"
)

// TestExports: one file a load under the name that was given, whole and in the
// format of its ending; refused names leave nothing behind.
func TestExports(t *testing.T) {
	folder := t.TempDir()
	in := func(name string) string { return filepath.Join(folder, name) }
	status, out, errs := typed("check", "bar-hole", "W=60mm", "d=20mm", "-o", in("a b.vtu"), "-o", in("s.CSV"))
	if status != exitAgrees || errs != "" {
		t.Fatalf("exit status %d, %s", status, errs)
	}
	for _, name := range []string{"a b-tension.vtu", "a b-bending.vtu", "s-tension.CSV", "s-bending.CSV"} {
		data, err := os.ReadFile(in(name))
		if err != nil || !strings.Contains(out, "written to "+in(name)) {
			t.Fatalf("%s: %v\n%s", name, err, out)
		}
		if strings.HasSuffix(name, ".vtu") {
			wellFormed(t, name, string(data))
		} else if rows, err := csv.NewReader(strings.NewReader(string(data))).ReadAll(); err != nil || len(rows) < 50 {
			t.Errorf("%s: %d rows, %v", name, len(rows), err)
		}
	}
	if status, out, _ := typed("check", "bar-hole", "W=60mm", "d=20mm", "--load", "tension", "--json", "-o", in("one.vtu")); status != exitAgrees || !strings.HasPrefix(out, "{") || !strings.HasSuffix(out, "}\n") {
		t.Errorf("exit status %d, JSON with something beside it: %.100s", status, out)
	}
	before, _ := os.ReadDir(folder)
	for _, row := range [][]string{
		{"-o", in("x.vtk")}, {"-o", in("x.vtu"), "-o", in("x.vtu")}, {"-o", in("no/x.vtu")}, {"-o", ""}, {"-o", in("x.vtu"), "-o", in("x")},
	} {
		status, out, errs := typed(append([]string{"check", "bar-hole", "W=60mm", "d=20mm"}, row...)...)
		if status != exitUsage || out != "" || !strings.Contains(errs, "\nhint: ") {
			t.Errorf("%q: exit status %d, %s%s", row, status, out, errs)
		}
	}
	if after, _ := os.ReadDir(folder); len(after) != len(before) || len(after) != 5 {
		t.Errorf("%d files, %d before", len(after), len(before))
	}
}

func wellFormed(t *testing.T, name, text string) {
	t.Helper()
	for d := xml.NewDecoder(strings.NewReader(text)); ; {
		if _, err := d.Token(); errors.Is(err, io.EOF) {
			return
		} else if err != nil {
			t.Fatalf("%s: %v", name, err)
		}
	}
}
