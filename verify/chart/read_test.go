package chart

import (
	"bytes"
	"context"
	"testing"
)

// FuzzRead: whatever stands in a file, reading it does not panic, and what was
// read as a whole writes and reads the same again.
func FuzzRead(f *testing.F) {
	a := table(f, small(f))
	if err := a.Run(context.Background(), Effort{}, func(int) error { return nil }); err != nil {
		f.Fatal(err)
	}
	var b bytes.Buffer
	if err := a.Write(&b); err != nil {
		f.Fatal(err)
	}
	f.Add(b.Bytes())
	f.Add(b.Bytes()[:b.Len()-20])
	f.Add(bytes.ReplaceAll(b.Bytes(), []byte("\r\n"), []byte("\n")))
	f.Add(bytes.Replace(b.Bytes(), []byte("settled"), []byte("undecided"), 1))
	f.Add([]byte("# " + firstLine + "\n"))
	f.Add([]byte("#"))
	f.Fuzz(func(t *testing.T, data []byte) {
		if len(data) > 1<<14 {
			return
		}
		read1, _, err := read(data, "fuzz")
		if err != nil {
			return
		}
		var first, second bytes.Buffer
		if err := read1.Write(&first); err != nil {
			t.Fatal(err)
		}
		read2, found, err := read(first.Bytes(), "fuzz")
		if err != nil || found.cut {
			t.Fatalf("%v reading\n%s", err, first.Bytes())
		}
		if err := read2.Write(&second); err != nil {
			t.Fatal(err)
		}
		if !bytes.Equal(first.Bytes(), second.Bytes()) {
			t.Errorf("written\n%s\nread and written again\n%s", first.Bytes(), second.Bytes())
		}
	})
}
