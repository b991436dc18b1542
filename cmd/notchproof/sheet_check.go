package main

import (
	"errors"
	"fmt"
	"io"
	"os"
	"strings"

	"github.com/spf13/pflag"

	"notchproof/render/report"
)

// checkSheet runs the input that a sheet carries and compares.
func checkSheet(c *call, s *sheetFlags, args []string) (int, error) {
	if others := others(c.flags, "check"); len(args) > 0 || others != "" {
		return 0, &inputError{text: "--check goes alone, not with " + strings.TrimSpace(strings.Join(args, " ")+" "+others), hint: "the sheet carries all that is asked: notchproof report --check sheet.html"}
	}
	page, err := readSheet(s.check)
	if err != nil {
		return 0, err
	}
	then, verbatim, err := report.Read(page, edition())
	if err != nil {
		hint := "give a file that notchproof report -o has written"
		if !errors.Is(err, report.ErrNoSheet) {
			hint = "ask for the sheet as it was made, or make it again"
		}
		return 0, &inputError{text: quoted(s.check) + ": " + err.Error(), hint: hint}
	}
	job, input, err := sheetJob(then.Input)
	if err != nil {
		return 0, &inputError{text: quoted(s.check) + ": its input cannot be run: " + err.Error(), hint: hintOf(err)}
	}
	bar := c.progress()
	made, err := makeSheet(c, bar, job, input, then.Sheet, then.Program == edition())
	bar.clear()
	if err != nil {
		return 0, err
	}
	now := made.content
	faults := report.Holds(then, now)
	if then.Program != now.Program { // another title block, not another answer
		now.Figures = then.Figures
	}
	if err := tellSheet(c.stdout, s.check, then, now, faults, verbatim); err != nil {
		return 0, err
	}
	if len(faults) > 0 {
		return exitDisagrees, nil
	}
	return exitAgrees, nil
}

// others lists the flags that were given beside one.
func others(flags *pflag.FlagSet, but string) string {
	var names []string
	flags.Visit(func(f *pflag.Flag) {
		if f.Name != but {
			names = append(names, "--"+f.Name)
		}
	})
	return strings.Join(names, " ")
}

func readSheet(path string) ([]byte, error) {
	f, err := os.Open(path)
	if err != nil {
		return nil, sheetError(path, err)
	}
	defer f.Close()
	data, err := io.ReadAll(io.LimitReader(f, report.LongestPage+1))
	if err != nil {
		return nil, sheetError(path, err)
	}
	return data, nil
}

func sheetError(path string, err error) error {
	fault := fileError(path, err)
	return &inputError{text: fault.Error(), hint: "give a file that notchproof report -o has written"}
}

// sheetJob is the job that a sheet's input asks for. Only what stands in the
// sheet is used: no file is opened, whatever its arguments name.
func sheetJob(in report.Input) (*job, report.Input, error) {
	var s sheetFlags
	c := &call{args: in.Arguments, flags: pflag.NewFlagSet("report", pflag.ContinueOnError)}
	c.flags.SetOutput(io.Discard)
	s.register(c)
	args, err := c.parse()
	if err != nil {
		return nil, in, errors.New(strings.TrimPrefix(err.Error(), "pflag: "))
	}
	if s.file != "" || s.check != "" {
		return nil, in, &inputError{text: "its arguments name files", hint: "ask for the sheet as it was made"}
	}
	if in.Read && len(args) == 1 {
		job, err := partFileJob([]byte(in.File), args[0], &s.questions)
		return job, in, err
	}
	if len(args) > 0 {
		if _, err := familyOf(args[0]); err != nil {
			return nil, in, err
		}
	}
	return s.job(args)
}

// tellSheet prints what came of it.
func tellSheet(w io.Writer, path string, then, now *report.Content, faults []string, verbatim bool) error {
	var b strings.Builder
	head := "holds"
	if len(faults) > 0 {
		head = "does not hold"
	}
	fmt.Fprintf(&b, "%s: %s\n", oneLine(path), head)
	for i := range now.Results {
		f := &now.Results[i]
		fmt.Fprintf(&b, "  %-9s %s = %s; %s\n", f.Load, f.Symbol, f.Computed.Factor, f.Verdict.Words())
	}
	for _, fault := range faults {
		fmt.Fprintf(&b, "  %s\n", oneLine(fault))
	}
	fmt.Fprintf(&b, "  made by %s, checked by %s\n", oneLine(then.Program), now.Program)
	if !verbatim {
		b.WriteString("  its words could not be compared: another version of the program made it\n")
	}
	_, err := io.WriteString(w, b.String())
	return err
}
