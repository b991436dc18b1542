package main

import "notchproof/verify/chart"

func chartCommand() *command {
	return &command{
		name:  "chart",
		args:  "PART [dimension=value ...] --along RATIO=RANGE [--curves RATIO=LIST] --load LOAD [-o FILE ...] [flags]",
		short: "compute a design chart, with a formula fitted to it",
		long: `Solves the part over a range of one ratio of its dimensions, or of one dimension,
with a curve for each value of another, and prints the factors with their bars
and a formula fitted to them, the shortest that cross-validation finds close
enough (--within). Its error is the largest at the fitted points and at others
solved for that alone; it says nothing outside its range.

  notchproof chart shaft-shoulder --load bending --along r/d=0.02:0.3 --curves D/d=1.1,1.5,2 -o chart.png
  notchproof chart bar-collar D/d=2 --load tension --along r/d=0.05:0.3:8 --curves L/d=0.2,0.4,1 -o collar.csv
  notchproof chart shaft-groove r/D=0.05 --load torsion --along angle=0:120:9 --curves d/D=0.7,0.8

A range is low:high or low:high:points (12 points along, 4 curves unless said),
by equal factors, for angles and offsets by equal steps; a list is a,b,c. What
else the shape needs follows as dimensions or ratios. Of a part file the
dimension that an axis gives, of a ratio the one above the line, need not be
there and is replaced where it is. Points that cannot be drawn are left out and
named.

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
