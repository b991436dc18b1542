package specimen

import (
	"bytes"
	"fmt"
	"strings"
	"unicode"
	"unicode/utf8"
)

// A FileError says what is wrong with a part file and where. Its InputError
// holds the key ("shape.nominal.x"), the value as written, the reason and the
// hint; Value is empty where something is missing.
type FileError struct {
	InputError
	File         string
	Line, Column int // from 1, columns in characters
}

func (e *FileError) Error() string {
	text := e.What + ": " + e.Reason
	if e.Value != "" {
		text = e.InputError.Error()
	}
	return fmt.Sprintf("%s:%d:%d: %s", visible(e.File), e.Line, e.Column, visible(text))
}

// Unwrap gives the fault without its place.
func (e *FileError) Unwrap() error { return &e.InputError }

// visible keeps names from breaking the line that they are printed in.
func visible(s string) string {
	return strings.Map(func(r rune) rune {
		if unicode.IsControl(r) {
			return '·'
		}
		return r
	}, s)
}

// A document is the text of a part file.
type document struct {
	name string
	data []byte // without the byte order mark
}

// fail makes the error about a byte of the document.
func (d *document) fail(at int, fault InputError) *FileError {
	at = max(0, min(at, len(d.data)))
	before := d.data[:at]
	start := bytes.LastIndexByte(before, '\n') + 1
	return &FileError{
		InputError: fault,
		File:       d.name,
		Line:       bytes.Count(before, []byte{'\n'}) + 1,
		Column:     utf8.RuneCount(before[start:]) + 1,
	}
}

// refuse makes the error about a value.
func (d *document) refuse(n *node, reason, hint string) *FileError {
	what := n.path
	if what == "" {
		what = "file"
	}
	return d.fail(n.at, InputError{What: what, Value: n.shown(), Reason: reason, Hint: hint})
}
