package main

import (
	"context"
	"fmt"
	"path/filepath"
	"runtime/debug"
	"strconv"
	"strings"
	"time"

	"notchproof/render"
	"notchproof/scf"
	"notchproof/verify/chart"
	"notchproof/verify/specimen"
)

func chartCommand() *command {
	return &command{
		name:  "chart",
		args:  "PART [dimension=value ...] --along RATIO=RANGE [--curves RATIO=LIST] --load LOAD [-o FILE ...] [flags]",
		short: "compute a design chart, with a formula fitted to it",
		long: `Solves the part over a range of one ratio of its dimensions, or of one dimension,
with a curve for each value of another, and prints the factors with their bars
and a formula fitted to them. Its error is stated as measured at points between
the fitted ones too; it says nothing outside its range.

  notchproof chart shaft-shoulder --load bending --along r/d=0.02:0.3 --curves D/d=1.1,1.5,2 -o chart.png
  notchproof chart bar-collar L/d=0.4 --load tension --along r/d=0.05:0.3:8 --curves D/d=1.5,2,3 -o collar.csv
  notchproof chart shaft-groove d/D=0.8 r/D=0.05 --load torsion --along angle=0:120:9 --curves d/D=0.7,0.8

A range is low:high or low:high:points (12 points along, 4 curves unless said),
by equal factors, for angles and offsets by equal steps; a list is a,b,c. What
else the shape needs follows as dimensions or ratios. Of a part file the
dimension that an axis gives, of a ratio the one above the line, need not be
there and is replaced where it is.
Points that cannot be drawn are left out and named.

-o may be repeated: .png and .svg are the chart, with the best published fit as
a faint band as wide as its accuracy; .csv is the table (--csv FILE too), whose
head of # lines is the question and whose records are the points. The table
grows with every point, and the same words go on with one that was stopped;
under another question it is left alone. --share 2/4 computes every fourth point,
from the second, and --join puts the tables together:

  notchproof chart --join a.csv b.csv -o chart.png -o chart.csv

--json prints schema, family, load, along, across (the variable of the curves),
curves (value, points of x, factor, uncertainty, status, note and handbook by
id), and fit (formula: its lines, largestError as a share, onCurves, worst,
fitted, between, range).

Exit status: 0 all points settled, 2 bad input, 3 some are not, 130 interrupted.
`,
		run: runChart,
	}
}

// A chartQuestion is what a user asks of chart, and the answer.
type chartQuestion struct {
	along, curves string
	outputs       []string
	csv           string
	share         string
	join          bool
	paper         paper
	bare          bool
	within        string
	asJSON        bool

	title string
	table *chart.Table
	fit   *chart.Fit
	notes []string // what happened on the way
}

func runChart(c *call) (int, error) {
	var q questions
	var s chartQuestion
	f := c.flags
	f.StringVar(&s.along, "along", "", "what runs along the axis, as in r/d=0.02:0.3")
	f.StringVar(&s.curves, "curves", "", "what the curves are for, as in D/d=1.1,1.5,2")
	f.StringArrayVarP(&s.outputs, "output", "o", nil, "a .png, .svg or .csv file to write; may be repeated")
	s.paper.flags(f)
	f.StringVar(&s.csv, "csv", "", "the table to keep, and to go on with")
	f.StringVar(&s.share, "share", "", "compute one share of the points only, as in 2/4")
	f.BoolVar(&s.join, "join", false, "join the tables that are named")
	f.StringVar(&s.within, "within", "0.5%", "what the formula may be off in cross-validation; the shortest that meets it is taken")
	f.BoolVar(&s.bare, "bare", false, "leave out the formula")
	q.loadFlag(f)
	q.targetFlag(f)
	q.partFlags(f)
	f.BoolVar(&s.asJSON, "json", false, "print one JSON object instead of text")
	args, err := c.parse()
	if err != nil {
		return 0, err
	}
	if err := s.checkFiles(); err != nil {
		return 0, err
	}
	if s.join {
		err = s.joined(args, c)
	} else {
		err = s.computed(&q, args, c)
	}
	if err != nil {
		return 0, err
	}
	if err := s.write(c); err != nil {
		return 0, err
	}
	if s.table.Count(chart.Undecided) > 0 || s.share == "" && len(s.table.Absent()) > 0 {
		return exitUndecided, nil
	}
	return exitAgrees, nil
}

// checkFiles refuses, before any work is done, names that could not be written.
func (s *chartQuestion) checkFiles() error {
	if s.csv != "" {
		s.outputs = append(s.outputs, s.csv)
	}
	if within, err := share(s.within); err != nil || within < 1e-4 || within > 0.2 {
		return &inputError{text: "--within " + quoted(s.within) + ": not what a formula may be off", hint: "give a share of the factor from 0.01% to 20%, as in 1%"}
	}
	seen := make(map[string]bool)
	tables := 0
	for _, name := range s.outputs {
		if name == "" {
			return &inputError{text: "-o without a name", hint: "name a file that ends in .png, .svg or .csv"}
		}
		if err := checkOutput(name, ".png", ".svg", ".csv"); err != nil {
			return err
		}
		if seen[filepath.Clean(name)] {
			return &inputError{text: "-o " + quoted(name) + ": given twice", hint: "name each file once"}
		}
		seen[filepath.Clean(name)] = true
		if isTable(name) {
			s.csv = name
			tables++
		} else if s.share != "" {
			return &inputError{text: "-o " + quoted(name) + " with --share: a share is no chart yet", hint: "write a .csv file, and draw when the shares are joined"}
		}
	}
	if tables > 1 {
		return &inputError{text: "more than one table", hint: "name one .csv file"}
	}
	return s.paper.find()
}

func isTable(name string) bool { return strings.EqualFold(filepath.Ext(name), ".csv") }

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
	keep := func(int) error { return nil }
	if s.csv != "" {
		journal, err := chart.Open(s.csv, s.table)
		if err != nil {
			return err
		}
		keep = journal.Keep
		defer journal.Close()
		s.tellResumed(journal, c)
	}
	// The many points of a chart would fill new memory for a second or more: to
	// use the old again is faster by a third.
	debug.SetGCPercent(200)
	bar := c.progress()
	defer bar.clear()
	effort.Progress = remaining(bar, "point")
	if err := s.table.Run(c.ctx, effort, keep); err != nil {
		return err
	}
	return s.fitted(c.ctx, effort, bar)
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

// words puts the question together.
func (s *chartQuestion) words(q *questions, args []string) (w chart.Words, err error) {
	if len(args) == 0 {
		_, err := partOf(args, scf.Options{})
		return w, err
	}
	w = chart.Words{Along: s.along, Curves: s.curves, Given: args[1:]}
	if isFile(args[0]) {
		err = s.fromFile(q, args[0], &w)
	} else {
		if w.Family, err = familyOf(args[0]); err != nil {
			return w, err
		}
		w.Options, err = q.options()
	}
	if err != nil {
		return w, err
	}
	loads, err := q.loads(w.Family)
	if err != nil {
		return w, err
	}
	if len(loads) == 0 && w.Load == "" && len(w.Family.Loads) == 1 {
		loads = w.Family.Loads
	}
	if len(loads) == 1 {
		w.Load = loads[0]
	}
	if w.Load == "" || len(loads) > 1 {
		return w, &inputError{text: "a chart of which load?", hint: "name one with --load: " + loadNames(w.Family)}
	}
	options, err := q.verify(nil)
	w.Target = options.Target
	return w, err
}

// fromFile takes from a part file what the axes and the other words do not give.
func (s *chartQuestion) fromFile(q *questions, path string, w *chart.Words) error {
	data, err := readPartFile(path)
	if err != nil {
		return err
	}
	over, err := q.over()
	if err != nil {
		return err
	}
	over.Open = true
	file, err := specimen.ReadPart(data, path, over)
	if err != nil {
		return err
	}
	part := file.Part
	if part.Family == nil {
		return &inputError{text: quoted(path) + ": an outline of one's own has no named dimensions", hint: "give a family with its dimensions, or a part file that names one"}
	}
	w.Family, w.Options, s.title = part.Family, part.Options, part.Title
	if w.Options.ForceLine == "" {
		w.Options.ForceLine = scf.ForceLineNet
	}
	if len(file.Loads) == 1 {
		w.Load = file.Loads[0]
	}
	replaced := make(map[string]bool)
	for _, word := range append([]string{s.along, s.curves}, w.Given...) {
		name, _, _ := strings.Cut(word, "=")
		name, _, _ = strings.Cut(name, "/")
		replaced[strings.TrimSpace(name)] = true
	}
	for _, d := range part.Family.Dimensions {
		v, given := part.Given[d.Name]
		if !given || replaced[d.Name] {
			continue
		}
		unit := part.Unit
		if d.Angle {
			unit = ""
		}
		w.Given = append(w.Given, fmt.Sprintf("%s=%v%s", d.Name, v, unit))
	}
	return nil
}

// effort reads --share.
func (s *chartQuestion) effort() (e chart.Effort, err error) {
	if s.share == "" {
		return e, nil
	}
	no, of, _ := strings.Cut(s.share, "/")
	var bad [2]error
	e.Share.No, bad[0] = strconv.Atoi(no)
	e.Share.Of, bad[1] = strconv.Atoi(of)
	if bad[0] != nil || bad[1] != nil || e.Share.No < 1 || e.Share.No > e.Share.Of {
		return e, &inputError{text: "--share " + quoted(s.share) + ": no such share", hint: "give its number and how many there are, as in 1/3, 2/3 and 3/3"}
	}
	if s.csv == "" {
		return e, &inputError{text: "--share without a table", hint: "name a .csv file of its own for each share with -o"}
	}
	return e, nil
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
