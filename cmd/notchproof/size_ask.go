package main

import (
	"fmt"
	"math"
	"strings"

	"github.com/spf13/pflag"

	"notchproof/render/number"
	"notchproof/scf"
	"notchproof/verify/quantity"
	"notchproof/verify/sizing"
	"notchproof/verify/strength"
)

// A sizeQuestion is what a user asks of size, and the answer.
type sizeQuestion struct {
	goal
	dimension string

	shape        *shape
	question     *sizing.Question
	answer       *sizing.Answer
	alternatives []sizing.Alternative
	unsettled    []sizing.Alternative // of which it can only be said why
}

// A goal is what the dimension must meet: the flags as they were written, and
// what they come to.
type goal struct {
	flags               *pflag.FlagSet
	kt, stress, nominal string
	loads               strengthFlags

	load     scf.Load          // the one load of a factor or of a nominal stress
	limit    quantity.Stress   // of a stress
	strength strength.Question // of a stress under given loads
	safety   float64           // 0: none asked for
	words    string            // the goal for people
}

func (s *sizeQuestion) define(f *pflag.FlagSet) {
	f.StringVar(&s.dimension, "for", "", "the dimension that is sought (r where the part has one)")
	f.StringVar(&s.kt, "kt", "", "the largest stress concentration factor allowed, as in 1.8")
	f.StringVar(&s.stress, "stress", "", "the largest stress allowed, as in 120MPa")
	f.StringVar(&s.nominal, "nominal", "", "nominal stress of the one load in the part as given, as in 60MPa")
	l := &s.loads
	f.StringVar(&l.safety, "safety", "", "the smallest safety allowed, as in 2")
	l.act(f)
}

// ask puts the question together.
func (s *sizeQuestion) ask(q *questions, args []string) (err error) {
	if s.shape, err = q.shape(args); err != nil {
		return err
	}
	if err = s.choose(); err != nil {
		return err
	}
	options, err := q.verify(s.shape.loads)
	if err != nil {
		return err
	}
	s.question = &sizing.Question{
		Family: s.shape.family, Dims: s.shape.dims, Unit: s.shape.unit, Options: s.shape.options,
		Dimension: s.dimension, Target: options.Target,
	}
	set, err := s.kind()
	if err != nil {
		return err
	}
	return set()
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
	if s.dimension != "r" && family.Sharp(s.shape.dims) {
		return &inputError{text: "r=0: a sharp corner has no factor, whatever " + s.dimension + " is", hint: "give the radius it is made with, or seek r itself"}
	}
	for _, d := range family.Dimensions {
		if _, given := s.shape.dims[d.Name]; !given && !d.Optional && d.Name != s.dimension {
			return &inputError{text: fmt.Sprintf("%s: missing, the %s", d.Name, d.Meaning), hint: "all but the dimension that is sought are needed: " + family.Usage()}
		}
	}
	return nil
}

// kind tells which goal the flags, or the part file, set.
func (s *sizeQuestion) kind() (set func() error, err error) {
	var goals []string
	for _, name := range []string{"kt", "stress", "safety"} {
		if s.flags.Changed(name) {
			goals = append(goals, "--"+name)
		}
	}
	forces := ""
	for _, name := range []string{"axial", "bending", "torque"} {
		if s.flags.Changed(name) {
			forces = "--" + name
		}
	}
	file := s.shape.file
	switch {
	case len(goals) > 1:
		return nil, &inputError{text: strings.Join(goals, " and ") + ": more than one goal", hint: "give one of --kt, --stress and --safety"}
	case s.flags.Changed("kt") && (forces != "" || s.flags.Changed("nominal")):
		return nil, &inputError{text: "--kt with loads: a factor needs none", hint: "give --load alone, or a goal in --stress or --safety"}
	case s.flags.Changed("kt"):
		return s.setFactor, nil
	case s.flags.Changed("nominal") && !s.flags.Changed("stress"):
		return nil, &inputError{text: "--nominal without --stress", hint: "give the largest stress allowed, as in --stress 120MPa"}
	case s.flags.Changed("nominal") && forces != "":
		return nil, &inputError{text: "--nominal and " + forces + ": one or the other", hint: "a nominal stress goes with --load, forces and moments stand for themselves"}
	case s.flags.Changed("nominal"):
		return s.setPeak, nil
	case len(goals) == 1 && s.flags.Changed("load") && s.flags.Changed("stress") && forces == "":
		return nil, &inputError{text: "--stress with --load: at which nominal stress?", hint: "give the nominal stress of the part as given, as in --nominal 60MPa, or the load itself, as in --axial 12kN"}
	case len(goals) == 1 && s.flags.Changed("load"):
		return nil, &inputError{text: "--load with " + goals[0] + ": the forces and moments say which loads act", hint: "leave --load out"}
	case len(goals) == 1 || file != nil && file.Forces.Safety != 0:
		return s.setEquivalent, nil
	}
	return nil, &inputError{text: "nothing to meet", hint: "give the largest factor allowed, as in --kt 1.8, or --stress, or --safety"}
}

func (s *sizeQuestion) setFactor() (err error) {
	limit, err := plainNumber(s.kt)
	if err != nil || limit <= 0 || limit > 1e6 {
		return &inputError{text: "--kt " + quoted(s.kt) + ": not a stress concentration factor", hint: "give a plain number, as in 1.8"}
	}
	if s.load, err = s.shape.load(); err != nil {
		return err
	}
	s.question.Limit, s.question.Measure = limit, sizing.Factor(s.load)
	s.words = fmt.Sprintf("%s ≤ %s", s.symbol(), number.Compact(limit, 6))
	return nil
}

// allowed reads --stress.
func (s *sizeQuestion) allowed() (err error) {
	if s.limit, err = quantity.ParseStress(s.stress); err != nil {
		return calledBy("--stress", err)
	}
	if !(s.limit.Megapascals() > 0) {
		return &inputError{text: "--stress " + quoted(s.stress) + ": not above zero", hint: "give the largest stress allowed, as in 120MPa"}
	}
	return nil
}

// setPeak asks for a largest stress at a given nominal one.
func (s *sizeQuestion) setPeak() (err error) {
	if err = s.allowed(); err != nil {
		return err
	}
	nominal, err := quantity.ParseStress(s.nominal)
	if err != nil {
		return calledBy("--nominal", err)
	}
	if !(nominal.Megapascals() > 0) {
		return &inputError{text: "--nominal " + quoted(s.nominal) + ": not above zero", hint: "give its size alone, as in 60MPa"}
	}
	if s.load, err = s.shape.load(); err != nil {
		return err
	}
	reference, err := s.reference()
	if err != nil {
		return err
	}
	s.question.Limit = s.limit.Megapascals()
	s.question.Measure = sizing.PeakStress(s.load, nominal.Megapascals(), reference)
	s.words = fmt.Sprintf("a stress ≤ %s at the notch, %s nominal", s.limitText(s.limit), s.limitText(nominal))
	return nil
}

// reference is the nominal stress under a unit load of the part as given.
func (s *sizeQuestion) reference() (float64, error) {
	in, err := s.question.Drawable()
	if err != nil {
		return 0, err
	}
	net := func(x float64) (float64, error) {
		p, err := s.question.Part(x)
		if err != nil {
			return 0, err
		}
		l, _ := p.Load(s.load)
		return l.Nominal.Net, nil
	}
	if x, given := s.shape.dims[s.dimension]; given {
		return net(x)
	}
	low, err := net(in.From)
	if err != nil {
		return 0, err
	}
	high, err := net(in.To)
	if math.Abs(low-high) > 1e-9*low {
		return 0, &inputError{text: fmt.Sprintf("--nominal %s: of which %s?", s.nominal, s.dimension), hint: "the nominal section changes with it: give " + s.dimension + " as the part has it now, or the load itself"}
	}
	return low, err
}

// setEquivalent asks for a largest equivalent stress under the loads given.
func (s *sizeQuestion) setEquivalent() error {
	q := &s.strength
	if s.shape.file != nil {
		if err := fromFile(q, s.shape.file); err != nil {
			return err
		}
	}
	if err := s.loads.over(q); err != nil {
		return err
	}
	in, err := s.question.Drawable()
	if err != nil {
		return err
	}
	x, given := s.shape.dims[s.dimension]
	if !given {
		x = in.To
	}
	if q.Part, err = s.question.Part(x); err != nil {
		return err
	}
	if s.stress != "" {
		if err := s.allowed(); err != nil {
			return err
		}
		// The limit itself is the strength, whatever the material's is.
		q.Material.Yield, q.Material.Tensile, q.Required = s.limit, s.limit, 1
	} else {
		s.safety = q.Required
	}
	if err := q.Check(); err != nil {
		return err
	}
	of, limit := q.Material.Judged()
	s.limit = limit.Like(limit.Megapascals() / q.Required)
	s.question.Limit, s.question.Measure = s.limit.Megapascals(), sizing.Equivalent(*q)
	s.words = fmt.Sprintf("%s ≤ %s", of, s.limitText(s.limit))
	if s.safety > 0 {
		s.words += fmt.Sprintf(", a safety of %s against %s", number.Compact(s.safety, 4), s.limitText(limit))
	}
	return nil
}

func (s *sizeQuestion) limitText(x quantity.Stress) string {
	return number.Quantity(x.Value(), 6, x.Unit())
}
