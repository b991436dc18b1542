package main

import (
	"fmt"
	"strings"

	"notchproof/scf"
	"notchproof/verify/sizing"
	"notchproof/verify/specimen"
)

const exitNotMet = 1 // no value of the dimension meets what is asked

func sizeCommand() *command {
	return &command{
		name:  "size",
		args:  "PART [dimension=value ...] [--for dimension] --kt FACTOR [flags]",
		short: "find the smallest radius, or another dimension, that meets a factor",
		long: `Turns the check round: finds the value of one dimension at which the computed
factor is the one that is allowed, with the uncertainty that follows from the
bar of the factor, and takes it to the next drawing step on the safe side. The
dimension may be left out, or given as the part has it now.

  notchproof size shaft-shoulder D=72mm d=48mm --kt 1.8 --load bending
  notchproof size shaft-shoulder D=72mm r=3mm --for d --kt 1.8 --load bending

The factor is looked at over all sizes that can be drawn, from a thousandth of
the part upwards and further where it must be, for it need not fall all the way:
of several values that meet the limit the smallest is given and the others are
named. The nominal stress is that of the part as it is then drawn.

Exit status: 0 met, 1 no value meets it, 2 bad input, 3 undecided, 130 interrupted.
`,
		run: runSize,
	}
}

func runSize(c *call) (int, error) {
	var q questions
	var s sizeQuestion
	c.flags.StringVar(&s.dimension, "for", "", "the dimension that is sought (r where the part has one)")
	c.flags.StringVar(&s.kt, "kt", "", "the largest stress concentration factor allowed")
	q.loadFlag(c.flags)
	q.targetFlag(c.flags)
	q.partFlags(c.flags)
	asJSON := c.flags.Bool("json", false, "print one JSON object instead of text")
	args, err := c.parse()
	if err != nil {
		return 0, err
	}
	shape, err := q.shape(args)
	if err != nil {
		return 0, err
	}
	if err := s.ask(&q, shape); err != nil {
		return 0, err
	}
	bar := c.progress()
	s.question.Progress = bar.tell
	s.answer, err = s.question.Find(c.ctx)
	bar.clear()
	if err != nil {
		return 0, err
	}
	if *asJSON {
		err = writeSizeJSON(c.stdout, &s)
	} else {
		err = writeSizeText(c.stdout, &s, c.style())
	}
	return s.status(), err
}

// A shape is a family with dimensions that need not be complete, and the loads
// that are asked for.
type shape struct {
	family  *scf.Family
	dims    scf.Dims
	unit    string
	options scf.Options
	loads   []scf.Load
	title   string
}

// shape reads PART for commands that vary its dimensions.
func (q *questions) shape(args []string) (*shape, error) {
	if len(args) > 0 && isFile(args[0]) {
		job, err := q.job(args)
		if err != nil {
			return nil, err
		}
		if job.part.Family == nil {
			return nil, &inputError{text: quoted(args[0]) + ": an outline of one's own has no named dimensions", hint: "give a family with its dimensions, or a part file that names one"}
		}
		return &shape{job.part.Family, job.part.Given, job.part.Unit, job.part.Options, job.loads, job.part.Title}, nil
	}
	if len(args) == 0 {
		_, err := partOf(args, scf.Options{})
		return nil, err
	}
	family, err := familyOf(args[0])
	if err != nil {
		return nil, err
	}
	s := &shape{family: family}
	if s.dims, s.unit, err = dimensions(family, args[1:]); err != nil {
		return nil, err
	}
	if s.options, err = q.options(); err != nil {
		return nil, err
	}
	s.loads, err = q.loads(family)
	return s, err
}

// load is the one load that is meant.
func (s *shape) load() (scf.Load, error) {
	loads := s.loads
	if len(loads) == 0 {
		loads = s.family.Loads
	}
	if len(loads) != 1 {
		return "", &inputError{text: "for which load?", hint: "name one with --load: " + loadNames(s.family)}
	}
	return loads[0], nil
}

// A sizeQuestion is what a user asks of size, and the answer.
type sizeQuestion struct {
	dimension string
	kt        string

	shape    *shape
	load     scf.Load
	question *sizing.Question
	answer   *sizing.Answer
}

// ask puts the question together.
func (s *sizeQuestion) ask(q *questions, shape *shape) (err error) {
	s.shape = shape
	if err = s.choose(); err != nil {
		return err
	}
	limit, err := plainNumber(s.kt)
	switch {
	case s.kt == "":
		return &inputError{text: "nothing to meet", hint: "give the largest factor allowed, as in --kt 1.8"}
	case err != nil || limit <= 0 || limit > 1e6:
		return &inputError{text: "--kt " + quoted(s.kt) + ": not a stress concentration factor", hint: "give a plain number, as in 1.8"}
	}
	if s.load, err = shape.load(); err != nil {
		return err
	}
	options, err := q.verify([]scf.Load{s.load})
	if err != nil {
		return err
	}
	s.question = &sizing.Question{
		Family: shape.family, Dims: shape.dims, Unit: shape.unit, Options: shape.options, Dimension: s.dimension,
		Measure: sizing.Factor(s.load, 0), Limit: limit, Target: options.Target,
	}
	return nil
}

// choose settles which dimension is sought, and that the others are there.
func (s *sizeQuestion) choose() error {
	family := s.shape.family
	if s.dimension == "" {
		if s.dimension = "r"; dimensionOf(family, "r") == nil {
			return &inputError{text: "which dimension?", hint: "name one with --for: " + family.Usage()}
		}
	}
	if dimensionOf(family, s.dimension) == nil {
		err := unknownDimension(family, s.dimension).(*inputError)
		err.text = "--for " + err.text
		return err
	}
	for _, d := range family.Dimensions {
		if _, given := s.shape.dims[d.Name]; !given && !d.Optional && d.Name != s.dimension {
			return &inputError{text: fmt.Sprintf("%s: missing, the %s", d.Name, d.Meaning), hint: "all but the dimension that is sought are needed: " + family.Usage()}
		}
	}
	return nil
}

func (s *sizeQuestion) status() int {
	switch s.answer.Outcome {
	case sizing.Met, sizing.Throughout:
		return exitAgrees
	case sizing.Beyond:
		return exitNotMet
	}
	return exitUndecided
}

// part is the part with a value of the dimension, nil where it cannot be drawn.
func (s *sizeQuestion) part(x float64) *specimen.Part {
	p, err := s.question.Part(x)
	if err != nil {
		return nil
	}
	return p
}

// value writes a value of the dimension with its unit.
func (s *sizeQuestion) unit() string {
	if d := dimensionOf(s.shape.family, s.dimension); d.Angle {
		return "°"
	}
	return s.shape.unit
}

func (s *sizeQuestion) others() string {
	var words []string
	for _, w := range strings.Split(givenText(s.shape), ", ") {
		if !strings.HasPrefix(w, s.dimension+" = ") {
			words = append(words, w)
		}
	}
	return strings.Join(words, ", ")
}
