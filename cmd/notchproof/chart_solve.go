package main

import (
	"context"
	"fmt"
	"runtime/debug"
	"time"

	"notchproof/render"
	"notchproof/verify/chart"
)

// computed solves the points that the table does not have yet.
func (s *chartQuestion) computed(q *questions, args []string, c *call) error {
	words, err := s.words(q, args)
	if err != nil {
		return err
	}
	effort, err := s.effort()
	if err != nil {
		return err
	}
	question, err := words.Read()
	if err != nil {
		return err
	}
	if s.table, err = question.Table(); err != nil {
		return err
	}
	// The many points of a chart would fill new memory for a second or more: to
	// use the old again is faster by a third.
	debug.SetGCPercent(200)
	bar := c.progress()
	defer bar.clear()
	effort.Progress = remaining(bar, "point")
	if err := s.solved(c, effort); err != nil {
		return err
	}
	return s.fitted(c.ctx, effort, bar)
}

// solved keeps every point in the table's file as soon as it is there.
func (s *chartQuestion) solved(c *call, effort chart.Effort) error {
	if s.csv == "" {
		return s.table.Run(c.ctx, effort, func(int) error { return nil })
	}
	journal, err := chart.Open(s.csv, s.table)
	if err != nil {
		return err
	}
	s.tellResumed(journal, c)
	err = s.table.Run(c.ctx, effort, journal.Keep)
	mixed, fault := journal.Close()
	switch {
	case err != nil:
		return err
	case fault != nil:
		return fault
	case mixed:
		return writeFile(s.csv, s.table.Write)
	}
	return nil
}

func (s *chartQuestion) tellResumed(j *chart.Journal, c *call) {
	if j.Cut {
		fmt.Fprintf(c.stderr, "%s: its last line was cut off, that point is computed again\n", oneLine(s.csv))
	}
	if j.Kept > 0 {
		fmt.Fprintf(c.stderr, "%s: %d of %d points are there already\n", oneLine(s.csv), j.Kept, len(s.table.Points))
	}
}

// fitted finds the formula, unless it is not wanted or cannot be had.
func (s *chartQuestion) fitted(ctx context.Context, e chart.Effort, bar *progress) (err error) {
	if s.bare || s.share != "" || len(s.table.Absent()) > 0 {
		return nil
	}
	within, err := share(s.within)
	if err != nil {
		return err
	}
	e.Share, e.Progress = chart.Share{}, remaining(bar, "formula: point")
	s.fit, err = s.table.Fit(ctx, within, e)
	return err
}

// remaining tells how far a run is, and from its pace how long it will take.
func remaining(bar *progress, what string) func(done, all int) {
	begin := time.Now()
	return func(done, all int) {
		left := time.Duration(float64(time.Since(begin)) / float64(done) * float64(all-done))
		bar.tell(fmt.Sprintf("%s %d of %d, about %v left", what, done, all, left.Round(time.Second)))
	}
}

// joined puts tables together.
func (s *chartQuestion) joined(names []string, c *call) error {
	if s.along != "" || s.curves != "" || s.share != "" {
		return &inputError{text: "--join with a question: the tables have theirs", hint: "leave out --along, --curves and --share"}
	}
	if len(names) == 0 {
		return &inputError{text: "--join without tables", hint: "name the .csv files, as in --join a.csv b.csv"}
	}
	for i, name := range names {
		t, cut, err := chart.ReadFile(name)
		if err != nil {
			return err
		}
		if cut {
			s.notes = append(s.notes, fmt.Sprintf("%s: its last line was cut off, and is left out", oneLine(name)))
		}
		if i == 0 {
			s.table = t
		} else if err := s.table.Join(t, names[0], name); err != nil {
			return err
		}
	}
	bar := c.progress()
	defer bar.clear()
	return s.fitted(c.ctx, chart.Effort{}, bar)
}

// write writes what was asked for: files first, so that the text can say so.
func (s *chartQuestion) write(c *call) error {
	for _, name := range s.outputs {
		if isTable(name) {
			if !s.join { // else it is there
				continue
			}
			if err := writeFile(name, s.table.Write); err != nil {
				return err
			}
			continue
		}
		plot := s.plot()
		figure, err := render.Chart(plot)
		if err != nil {
			return &inputError{text: "nothing to draw: no point is settled", hint: "the table says why"}
		}
		out := figureFile{s.paper, name}
		if err := out.write(figure); err != nil {
			return err
		}
	}
	if s.asJSON {
		return s.writeJSON(c.stdout)
	}
	return s.writeText(c.stdout, c.style())
}
