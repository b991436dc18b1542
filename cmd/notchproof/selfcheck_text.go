package main

import (
	"encoding/json"
	"fmt"
	"io"
	"math"
	"strconv"
	"strings"

	"notchproof/verify/evidence"
)

// writeSelfcheck prints the table: one block a case, one row a number.
func writeSelfcheck(w io.Writer, head build, outcomes []evidence.Outcome, s style) error {
	var b strings.Builder
	fmt.Fprintf(&b, "%s\n\n", head)
	fmt.Fprintf(&b, readingColumns, "", "expected", "got", "bar", "")
	passed, rows, kept := 0, 0, 0
	for i := range outcomes {
		o := &outcomes[i]
		fmt.Fprintf(&b, "\n%s\n  %s; %s\n", s.bold(o.Case.Name), o.Case.Source, o.Case.Sureness)
		if o.Err != nil {
			fmt.Fprintf(&b, "  %s not computed: %s\n", s.bad("failed"), oneLine(o.Err.Error()))
		}
		for _, r := range o.Readings {
			rows++
			if r.Passed {
				kept++
			}
			readingText(&b, r, s)
		}
		if o.Passed() {
			passed++
		}
	}
	verdict := s.good("all passed")
	if passed < len(outcomes) {
		verdict = s.bad("failed")
	}
	fmt.Fprintf(&b, "\n%s: %d of %d cases, %d of %d numbers within their bars\n", verdict, passed, len(outcomes), kept, rows)
	_, err := io.WriteString(w, b.String())
	return err
}

const readingColumns = "  %-46s %14s %14s %10s  %s\n"

func readingText(b *strings.Builder, r evidence.Reading, s style) {
	mark := s.good("pass")
	if !r.Passed {
		mark = s.bad("failed")
	}
	bar := r.Bar + r.Accuracy
	want, got := asKnown(r), to(r.Got, bar)
	if r.Value == 0 {
		want, got = "0", upTo(r.Got)
	}
	fmt.Fprintf(b, readingColumns, r.What, want, got, "± "+strconv.FormatFloat(bar, 'g', 2, 64), mark)
}

// asKnown writes an expected number with the digits that are known of it.
func asKnown(r evidence.Reading) string {
	if r.Accuracy == 0 {
		return to(r.Value, r.Bar)
	}
	digits := math.Ceil(-math.Log10(2*r.Accuracy) - 1e-9)
	return minus(strconv.FormatFloat(r.Value, 'f', int(math.Max(0, math.Min(10, digits))), 64))
}

// upTo is a miss of a number that ought to be zero. Rounding differs from machine
// to machine: what is below that is not told apart.
func upTo(v float64) string {
	const seen = 1e-11
	if math.Abs(v) < seen {
		return "< " + oneDigit(seen)
	}
	return oneDigit(v)
}

// oneDigit is a size.
func oneDigit(v float64) string { return strconv.FormatFloat(v, 'g', 1, 64) }

// to writes a number to one decimal more than its bar has, ten at most.
func to(v, bar float64) string {
	decimals := 10
	if bar > 0 {
		decimals = int(math.Max(1, math.Min(10, 1-math.Floor(math.Log10(bar)))))
	}
	return minus(strconv.FormatFloat(v, 'f', decimals, 64))
}

// minus has the sign that print has.
func minus(text string) string { return strings.Replace(text, "-", "−", 1) }

// The object that selfcheck --json prints.
type jsonSelfcheck struct {
	Schema int                `json:"schema"`
	Build  build              `json:"build"`
	Passed bool               `json:"passed"`
	Cases  []jsonEvidenceCase `json:"cases"`
}

type jsonEvidenceCase struct {
	Name     string                `json:"name"`
	Source   string                `json:"source"`
	Sureness string                `json:"sureness"`
	Passed   bool                  `json:"passed"`
	Error    string                `json:"error,omitempty"`
	Readings []jsonEvidenceReading `json:"readings"`
}

type jsonEvidenceReading struct {
	What     string  `json:"what"`
	Expected float64 `json:"expected"`
	Accuracy float64 `json:"accuracy"`
	Got      maybe   `json:"got"`
	Bar      maybe   `json:"bar"`
	Passed   bool    `json:"passed"`
}

func writeSelfcheckJSON(w io.Writer, head build, outcomes []evidence.Outcome, _ style) error {
	out := jsonSelfcheck{Schema: 1, Build: head, Passed: true, Cases: []jsonEvidenceCase{}}
	for i := range outcomes {
		o := &outcomes[i]
		c := jsonEvidenceCase{Name: o.Case.Name, Source: o.Case.Source, Sureness: o.Case.Sureness.String(), Passed: o.Passed(), Readings: []jsonEvidenceReading{}}
		if o.Err != nil {
			c.Error = o.Err.Error()
		}
		for _, r := range o.Readings {
			c.Readings = append(c.Readings, jsonEvidenceReading{r.What, r.Value, r.Accuracy, maybe(r.Got), maybe(r.Bar), r.Passed})
		}
		out.Passed = out.Passed && c.Passed
		out.Cases = append(out.Cases, c)
	}
	encoder := json.NewEncoder(w)
	encoder.SetEscapeHTML(false)
	encoder.SetIndent("", "  ")
	return encoder.Encode(out)
}
