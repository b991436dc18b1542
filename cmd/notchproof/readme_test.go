package main

import (
	"bytes"
	"context"
	"os"
	"path/filepath"
	"regexp"
	"strings"
	"testing"
)

// TestReadmeShowsWhatTheProgramPrints runs the README's first example and holds
// the output that stands under it against what is printed.
func TestReadmeShowsWhatTheProgramPrints(t *testing.T) {
	text, err := os.ReadFile("../../README.md")
	if err != nil {
		t.Fatal(err)
	}
	block := regexp.MustCompile("(?s)\\$ notchproof (check [^\n]*--claim-from \"chart, by eye\")[^\n]*\n(.*?)\n```").FindStringSubmatch(string(text))
	if block == nil {
		t.Fatal("the example is not in the README")
	}
	before, _, _ := strings.Cut(block[1], ` "chart, by eye"`)
	args := append(strings.Fields(before), "chart, by eye")
	var out, errs bytes.Buffer
	if status := run(context.Background(), args, &out, &errs); status != exitDisagrees || errs.Len() > 0 {
		t.Fatalf("exit status %d, %s", status, errs.String())
	}
	want, got := strings.Split(block[2], "\n"), strings.Split(strings.TrimRight(out.String(), "\n"), "\n")
	for i := range max(len(want), len(got)) {
		w, g := "", ""
		if i < len(want) {
			w = want[i]
		}
		if i < len(got) {
			g = got[i]
		}
		if w != g {
			t.Errorf("line %d\nREADME  %s\nprinted %s", i+1, w, g)
		}
	}
}

// TestReadmePartFile checks the part file that the README shows.
func TestReadmePartFile(t *testing.T) {
	text, err := os.ReadFile("../../README.md")
	if err != nil {
		t.Fatal(err)
	}
	block := regexp.MustCompile("(?s)```json\n(.*?)```").FindSubmatch(text)
	if block == nil {
		t.Fatal("the part file is not in the README")
	}
	file := filepath.Join(t.TempDir(), "a link of its own.json")
	if err := os.WriteFile(file, block[1], 0o644); err != nil {
		t.Fatal(err)
	}
	var out, errs bytes.Buffer
	status := run(context.Background(), []string{"check", file}, &out, &errs)
	if status != exitAgrees || errs.Len() > 0 || !strings.Contains(out.String(), "claim      1.8") {
		t.Errorf("exit status %d\n%s%s", status, out.String(), errs.String())
	}
}

// TestReadmeClaimFromAMesh holds the lines of the README's claim from a mesh
// against what is printed.
func TestReadmeClaimFromAMesh(t *testing.T) {
	text, err := os.ReadFile("../../README.md")
	if err != nil {
		t.Fatal(err)
	}
	block := regexp.MustCompile("(?s)\\$ notchproof (check [^\n]*--claim-mesh \\S+)[^\n]*\n  …\n(.*?)  …\n```").FindStringSubmatch(string(text))
	if block == nil {
		t.Fatal("the example is not in the README")
	}
	if _, out, _ := program(t, block[1]); !strings.Contains(out, block[2]) {
		t.Errorf("README\n%sprinted\n%s", block[2], out)
	}
}

// TestReadmeMisreading: the lines shown of a claim that is a known slip.
func TestReadmeMisreading(t *testing.T) {
	text, err := os.ReadFile("../../README.md")
	if err != nil {
		t.Fatal(err)
	}
	block := regexp.MustCompile("(?s)\\$ notchproof ([^\n]* --claim 1.55)  # exit 1\n  …\n(.*?)\n  …\n").FindStringSubmatch(string(text))
	if block == nil {
		t.Fatal("the example is not in the README")
	}
	var out, errs bytes.Buffer
	status := run(context.Background(), strings.Fields(block[1]), &out, &errs)
	if status != exitDisagrees || errs.Len() > 0 || !strings.Contains(out.String(), block[2]+"\n") {
		t.Errorf("exit status %d, the README shows\n%s\nprinted\n%s%s", status, block[2], errs.String(), out.String())
	}
}

// TestReadmeOnCorners holds the statement about a sharp corner against what is
// printed; what is measured may move within its bar.
func TestReadmeOnCorners(t *testing.T) {
	text, err := os.ReadFile("../../README.md")
	if err != nil {
		t.Fatal(err)
	}
	block := regexp.MustCompile("(?s)\\$ notchproof (study [^\n]*r=0 --load bending)[^\n]*\n(.*?)\n\\$").FindStringSubmatch(string(text))
	if block == nil {
		t.Fatal("the example is not in the README")
	}
	status, out, errs := program(t, block[1])
	if status != exitUndecided || errs != "" {
		t.Fatalf("exit status %d, %s", status, errs)
	}
	measured := regexp.MustCompile("measured −0.455[0-9]+ ± 0.000[0-9]+")
	out = measured.ReplaceAllString(out, "measured")
	for _, line := range strings.Split(measured.ReplaceAllString(block[2], "measured"), "\n") {
		if !strings.Contains(out, line) {
			t.Errorf("README  %s\nprinted %s", line, out)
		}
	}
}
