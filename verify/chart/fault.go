package chart

import "fmt"

// A Fault is something wrong with a question or a file: one line, and what to
// do about it.
type Fault struct{ text, hint string }

func (f *Fault) Error() string { return f.text }

// Hint says what to do.
func (f *Fault) Hint() string { return f.hint }

func fault(hint, format string, args ...any) *Fault {
	return &Fault{text: fmt.Sprintf(format, args...), hint: hint}
}
