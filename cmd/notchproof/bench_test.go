package main

import (
	"bytes"
	"context"
	"path/filepath"
	"testing"
)

// BenchmarkReport is a whole sheet of one load but for starting the process:
// check, pictures, page, file.
func BenchmarkReport(b *testing.B) {
	file := filepath.Join(b.TempDir(), "sheet.html")
	words := append([]string{"report", "--load", "bending", "-o", file}, steppedShaft...)
	for b.Loop() {
		var out, errs bytes.Buffer
		if status := run(context.Background(), words, &out, &errs); status != exitAgrees {
			b.Fatalf("exit status %d, %s", status, errs.String())
		}
	}
}
