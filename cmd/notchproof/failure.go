package main

import (
	"errors"
	"fmt"
	"io"
	"strings"
	"unicode"
	"unicode/utf8"

	"notchproof/scf"
	"notchproof/verify/quantity"
	"notchproof/verify/specimen"
)

// An inputError is a fault of the input: one line, and what to do about it.
type inputError struct{ text, hint string }

func (e *inputError) Error() string { return e.text }

// Hint says what to do.
func (e *inputError) Hint() string { return e.hint }

// fail prints an error and its hint; the status is that of bad input.
func fail(stderr io.Writer, err error) int {
	fmt.Fprintln(stderr, "notchproof: "+oneLine(err.Error()))
	if hint := hintOf(err); hint != "" {
		fmt.Fprintln(stderr, "hint: "+hint)
	}
	return exitUsage
}

func hintOf(err error) string {
	var hinted interface{ Hint() string }
	if errors.As(err, &hinted) {
		return hinted.Hint()
	}
	var dimension *scf.DimensionError
	if errors.As(err, &dimension) {
		return dimension.Hint
	}
	var input *specimen.InputError
	if errors.As(err, &input) {
		return input.Hint
	}
	var amount *quantity.Error
	if errors.As(err, &amount) {
		return amount.Hint
	}
	return ""
}

// oneLine keeps what a user typed from breaking the line or the terminal.
func oneLine(s string) string {
	return strings.Map(func(r rune) rune {
		if unicode.IsControl(r) {
			return '·'
		}
		return r
	}, s)
}

func quoted(s string) string {
	const longest = 60
	if utf8.RuneCountInString(s) > longest {
		s = string([]rune(s)[:longest]) + "…"
	}
	return fmt.Sprintf("%q", s)
}

func lowerFirst(s string) string {
	r, n := utf8.DecodeRuneInString(s)
	if n == 0 {
		return s
	}
	return string(unicode.ToLower(r)) + s[n:]
}
