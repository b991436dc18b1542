package main

import (
	"strings"

	"notchproof/verify/sizing"
	"notchproof/verify/specimen"
)

const exitNotMet = 1 // what is asked for is not met: no value of the dimension does

func sizeCommand() *command {
	return &command{
		name:  "size",
		args:  "PART [dimension=value ...] [--for dimension] --kt FACTOR | --stress STRESS | --safety NUMBER [flags]",
		short: "find the smallest radius, or another dimension, that meets a factor, a stress or a safety",
		long: `Turns the check round: finds the value of one dimension at which the computed
factor, stress or safety is the one that is allowed, with the uncertainty that
follows from the bar of the solution, and takes it to the next drawing step on
the safe side. The dimension may be left out, or given as the part has it now.

  notchproof size shaft-shoulder D=72mm d=48mm --kt 1.8 --load bending
  notchproof size shaft-shoulder D=72mm r=3mm --for d --kt 1.8 --load bending
  notchproof size shaft-shoulder D=72mm d=48mm --stress 120MPa --load bending --nominal 60MPa
  notchproof size shaft-shoulder D=72mm d=48mm --safety 2 --bending 1.2kN·m --torque 900N·m --yield 355MPa

--kt limits the factor on the net section of the part as it is then drawn. A
--stress with --load and --nominal limits the largest stress at the notch, under
the load that gives the nominal stress in the part as given. --safety, or
--stress with --axial, --bending and --torque, limits the equivalent stress at
the place that governs, as the command strength computes it. A load stays what
it is while the dimension changes.

The quantity is looked at over all sizes that can be drawn, from a thousandth of
the part upwards and further where it must be, for it need not run one way: of
several values at which it falls to the limit the smallest is given, and all
stretches that meet it are named. Beside the answer stand other ways to meet the same limit, each computed:
they keep the radius that the part has now, or half of the answer where it has
none, and --bare leaves them out.

--json prints value with valueUncertainty in unit, factor with uncertainty,
rounded, keeps (the stretches that meet the limit), scanned, alternatives (what,
sizes, factor, uncertainty, meets, costs, length along the axis), unsettled (what
else was tried, and why it came to nothing). value is null where nothing meets
the limit, and best is what comes nearest.

Exit status: 0 met, 1 no value meets it, 2 bad input, 3 undecided, 130 interrupted.
`,
		run: runSize,
	}
}

func runSize(c *call) (int, error) {
	var q questions
	s := sizeQuestion{goal: goal{flags: c.flags}}
	s.define(c.flags)
	q.loadFlag(c.flags)
	q.targetFlag(c.flags)
	q.partFlags(c.flags)
	bare := c.flags.Bool("bare", false, "leave out the alternatives")
	asJSON := c.flags.Bool("json", false, "print one JSON object instead of text")
	args, err := c.parse()
	if err != nil {
		return 0, err
	}
	if err := s.ask(&q, args); err != nil {
		return 0, err
	}
	collectSometimes()
	bar := c.progress()
	s.question.Progress = bar.tell
	s.answer, err = s.question.Find(c.ctx)
	if err == nil && !*bare {
		var all []sizing.Alternative
		all, err = s.question.Alternatives(c.ctx, s.answer)
		for _, a := range all {
			if a.Decided {
				s.alternatives = append(s.alternatives, a)
			} else {
				s.unsettled = append(s.unsettled, a)
			}
		}
	}
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
