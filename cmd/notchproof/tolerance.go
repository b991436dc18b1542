package main

import (
	"errors"
	"fmt"
	"strings"

	"notchproof/scf"
	"notchproof/verify/tolerance"
)

func toleranceCommand() *command {
	return &command{
		name:  "tolerance",
		args:  "PART [dimension=value ...] dimension=±deviation ... [flags]",
		short: "carry the tolerances of a drawing over to the factor and the peak stress",
		long: `Solves the part at the corners of its tolerances, in the middles of the faces
between them and as drawn, and states the range of the factor and of the peak
stress under the same load, the sensitivity to each dimension, who contributes
most, and what dimensions that vary independently would give (root of the sum of
squares, common practice) beside the worst corner.

  notchproof tolerance shaft-shoulder D=72mm d=48mm r=3mm r=±0.2mm d=+0.05/-0
  notchproof tolerance seat.json r=+-0.2mm

A tolerance is a word with two deviations or with ±, also written +- or +/-; the
dimension itself is given as well. The peak stress is in nominal stresses of the
part as drawn, so that it follows the section as well as the notch. Up to four
tolerances all corners are solved, beyond that those that matter.

Exit status: 0 done, 2 bad input, 3 undecided, 130 interrupted.
`,
		run: runTolerance,
	}
}

func runTolerance(c *call) (int, error) {
	var q questions
	q.loadFlag(c.flags)
	c.flags.StringVar(&q.target, "target", "0.02%", "uncertainty wished for, relative to the factor")
	q.partFlags(c.flags)
	asJSON := c.flags.Bool("json", false, "print one JSON object instead of text")
	args, err := c.parse()
	if err != nil {
		return 0, err
	}
	question, s, err := q.tolerance(args)
	if err != nil {
		return 0, err
	}
	collectSometimes()
	bar := c.progress()
	question.Progress = bar.tell
	answer, err := question.Find(c.ctx)
	bar.clear()
	if err != nil {
		return 0, cornerFault(err, question)
	}
	if *asJSON {
		err = writeToleranceJSON(c.stdout, answer)
	} else {
		err = writeToleranceText(c.stdout, s, answer, c.style())
	}
	for _, l := range answer.Loads {
		if !l.Decided {
			return exitUndecided, err
		}
	}
	return exitAgrees, err
}

// tolerance reads the part and its tolerances.
func (q *questions) tolerance(args []string) (*tolerance.Question, *shape, error) {
	var plain, words []string
	for i, word := range args {
		if i > 0 && isDeviation(word) {
			words = append(words, word)
			continue
		}
		if err := loneDeviation(word, plain); err != nil {
			return nil, nil, err
		}
		plain = append(plain, word)
	}
	s, err := q.shape(plain)
	if err != nil {
		return nil, nil, err
	}
	if err := s.family.Check(s.dims); err != nil {
		return nil, nil, err
	}
	if s.family.Sharp(s.dims) {
		return nil, nil, &inputError{text: "r=0: a sharp corner has no factor", hint: "give the radius it is made with"}
	}
	if len(words) == 0 {
		return nil, nil, &inputError{text: "no tolerances", hint: "write them after the dimensions, as in r=±0.2mm or d=+0.05/-0"}
	}
	options, err := q.verify(s.loads)
	if err != nil {
		return nil, nil, err
	}
	question := &tolerance.Question{Family: s.family, Dims: s.dims, Unit: s.unit, Options: s.options, Loads: s.loads, Target: options.Target}
	for _, word := range words {
		d, err := s.deviation(word)
		if err != nil {
			return nil, nil, err
		}
		for _, other := range question.Deviations {
			if other.Name == d.Name {
				return nil, nil, &inputError{text: quoted(word) + ": a second tolerance of " + d.Name, hint: "give each tolerance once"}
			}
		}
		question.Deviations = append(question.Deviations, d)
	}
	return question, s, nil
}

// cornerFault says in one line which shape within the tolerances cannot be drawn.
func cornerFault(err error, q *tolerance.Question) error {
	var corner *tolerance.CornerError
	if !errors.As(err, &corner) {
		return err
	}
	var words []string
	for _, d := range q.Deviations {
		words = append(words, fmt.Sprintf("%s=%.6g%s", d.Name, corner.Dims[d.Name], unitOf(q.Family, d.Name, q.Unit)))
	}
	return &inputError{
		text: fmt.Sprintf("the tolerances allow %s, which has no factor: %v", strings.Join(words, " "), corner.Err),
		hint: "narrow the tolerances",
	}
}

func unitOf(family *scf.Family, name, unit string) string {
	if dimensionOf(family, name).Angle {
		return "°"
	}
	return unit
}
