package main

import (
	"encoding/json"
	"fmt"
	"io"
	"strings"

	"notchproof/render/report"
	"notchproof/verify"
)

func reportCommand() *command {
	return &command{
		name:  "report",
		args:  "PART [dimension=value ...] -o SHEET.html [flags]",
		short: "write the calculation sheet: one page that prints, and can be checked again",
		long: `Checks the part under all loads that it carries, or those of --load, and writes
a calculation sheet: question, part, answer with its uncertainty, verdict,
handbook values, claim, checks, ladder, stress picture, method, and the input
from which all of it follows. The sheet is one HTML file without links, for
A4 and Letter paper. The same input gives the same bytes.

  notchproof report shaft-shoulder D=72mm d=48mm r=3mm --load bending \
      --claim 1.85 --claim-from "chart, by eye" -o shaft.html
  notchproof report --check shaft.html

--check runs the input that a sheet carries and says whether its numbers still
hold: status 0 when they do, 1 when they do not, 2 when the file is no sheet or
was changed after it was made. Else the exit status is that of check.
`,
		run: runReport,
	}
}

// sheetFlags are those of a sheet alone.
type sheetFlags struct {
	file, check string
	json, text  bool
	sheet       report.Sheet
	questions   questions
}

func (s *sheetFlags) register(c *call) {
	f := c.flags
	f.StringVarP(&s.file, "output", "o", "", "the HTML file to write")
	f.BoolVar(&s.json, "json", false, "print the content of the sheet as one JSON object")
	f.BoolVar(&s.text, "text", false, "print the content of the sheet as text")
	f.StringVar(&s.check, "check", "", "run the input of this sheet again and compare")
	f.StringVar(&s.sheet.Title, "title", "", "title of the sheet; the part's when left out")
	f.StringVar(&s.sheet.By, "by", "", "who made the sheet")
	f.StringVar(&s.sheet.Date, "date", "", "date of the sheet, as it is to stand there")
	s.questions.loadFlag(f)
	s.questions.claimFlags(f)
	s.questions.targetFlag(f)
	s.questions.partFlags(f)
}

func runReport(c *call) (int, error) {
	var s sheetFlags
	s.register(c)
	args, err := c.parse()
	if err != nil {
		return 0, err
	}
	if s.check != "" {
		return checkSheet(c, &s, args)
	}
	if err := s.validate(); err != nil {
		return 0, err
	}
	job, input, err := s.job(args)
	if err != nil {
		return 0, err
	}
	bar := c.progress()
	made, err := makeSheet(c, bar, job, input, s.sheet, s.file != "")
	bar.clear()
	if err != nil {
		return 0, err
	}
	return statusOf(made.result), s.write(c, made)
}

// validate refuses before any work is done what could not be written.
func (s *sheetFlags) validate() error {
	switch {
	case s.file == "" && !s.json && !s.text:
		return &inputError{text: "no file to write the sheet to", hint: "name one with -o, as in -o sheet.html, or print it with --text or --json"}
	case s.json && s.text:
		return &inputError{text: "--json and --text: both", hint: "choose one of them"}
	}
	const longest = 200
	for _, l := range []struct{ flag, text string }{{"--title", s.sheet.Title}, {"--by", s.sheet.By}, {"--date", s.sheet.Date}, {"--claim-from", s.questions.claimFrom}} {
		if len([]rune(l.text)) > longest {
			return &inputError{text: fmt.Sprintf("%s %s: longer than %d characters", l.flag, quoted(l.text), longest), hint: "shorten it"}
		}
		if strings.ToValidUTF8(l.text, "") != l.text {
			return &inputError{text: l.flag + " " + quoted(l.text) + ": not UTF-8", hint: "write it in UTF-8"}
		}
	}
	return checkOutput(s.file, ".html")
}

// write puts the sheet where it was asked for.
func (s *sheetFlags) write(c *call, made *sheet) error {
	if s.file != "" {
		if err := writeFile(s.file, func(w io.Writer) error { return report.Page(w, made.content, made.pictures) }); err != nil {
			return err
		}
	}
	switch {
	case s.json:
		encoder := json.NewEncoder(c.stdout)
		encoder.SetEscapeHTML(false)
		encoder.SetIndent("", "  ")
		return encoder.Encode(made.content)
	case s.text:
		return report.Text(c.stdout, made.content)
	}
	_, err := fmt.Fprintf(c.stdout, "%s: sheet written to %s\n", made.result.Part.Name, s.file)
	return err
}

// A sheet is what was made for one.
type sheet struct {
	result   *verify.Result
	content  *report.Content
	pictures [][]byte
}

// makeSheet runs the job and puts the sheet together.
func makeSheet(c *call, bar *progress, job *job, input report.Input, labels report.Sheet, drawn bool) (*sheet, error) {
	job.options.Progress = bar.tell
	result, err := verify.Run(c.ctx, job.part, job.loads, job.options)
	if err != nil {
		return nil, err
	}
	made := &sheet{result: result}
	made.content = report.New(result, report.Source{
		Sheet: labels, Program: edition(), Input: input, Target: job.options.Target, Caution: caution,
	})
	if drawn {
		bar.tell("drawing")
		collectOften()
		made.pictures, err = report.Draw(made.content, result)
	}
	return made, err
}
