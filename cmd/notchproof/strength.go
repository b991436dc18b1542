package main

import (
	"errors"

	"github.com/spf13/pflag"

	"notchproof/render"
	"notchproof/scf"
	"notchproof/verify/quantity"
	"notchproof/verify/specimen"
	"notchproof/verify/strength"
)

func strengthCommand() *command {
	return &command{
		name:  "strength",
		args:  "PART [dimension=value ...] [--axial FORCE] [--bending MOMENT] [--torque MOMENT] --yield STRESS [flags]",
		short: "add up the loads and hold every critical place against the material",
		long: `Leads from the factor to a decision. The fields of all loads are computed, each
with its ladder and checks, and added at every point of the surface and at every
angle around a shaft. The governing place, the rule of the design office beside
it (every nominal stress times its own factor, all taken to act at one point),
the plain sections, and what the net section bears as a whole are set against
the strength of the material.

  notchproof strength shaft-shoulder D=72mm d=48mm r=3mm --axial 12kN \
      --bending 300N·m --torque 450N·m --yield 355MPa --safety 1.8
  notchproof strength link.json

Units are written out: N, kN, MN, lbf, kip; N·m (or Nm), N·mm, kN·m, lbf·in,
lbf·ft; MPa, N/mm², GPa, psi, ksi. A negative axial force presses; a negative
bending moment puts y < 0 in tension, in a bar that is notched on one side the
edge without the notch. Bars need --thickness and carry no torque.

A metal of less than 5 % elongation, or with --brittle, is judged by the largest
principal stress against its tensile strength, any other by von Mises against
its yield stress.

A part file may hold all of it: "forces" {"axial", "bending", "torque"},
"thickness", "safety", and under "material" "yield", "tensile", "elongation",
"brittle", "metal". What the flags say goes before what the file says. Claims of
the file are carried through the rule by hand too.

-o draws the governing ratio, von Mises over yield stress (or the largest
principal stress over tensile strength), of all loads together.

--json prints, with stresses in stressUnit: factors (nominal stress, computed
and best handbook factor of every load), byHand, places (smallest safety first;
along the outline, hoop around the axis, shear between them, equivalent),
section (load factors of firstYield, elastic and plastic limit of the net
section), fluctuating (G in 1/mm, Kf by every rule), cover, decision, because.

Exit status: 0 the safety asked for is met, or none was asked for, 1 not met,
2 bad input, 3 undecided: a factor is not settled, or the safety is too close to
call, 130 interrupted.
`,
		run: runStrength,
	}
}

// strengthFlags are the flags as they were written.
type strengthFlags struct {
	axial, bending, torque string
	thickness              string
	yield, tensile         string
	elongation, metal      string
	slipLayer              string
	brittle                bool
	safety                 string
	flags                  *pflag.FlagSet
}

// act takes what acts on a part and what it is made of.
func (s *strengthFlags) act(f *pflag.FlagSet) {
	s.flags = f
	f.StringVar(&s.axial, "axial", "", "axial force, positive in tension, as in 12kN")
	f.StringVar(&s.bending, "bending", "", "bending moment, as in 300N·m")
	f.StringVar(&s.torque, "torque", "", "torque of a shaft, as in 450N·m")
	f.StringVar(&s.thickness, "thickness", "", "thickness of a bar, as in 8mm")
	f.StringVar(&s.yield, "yield", "", "yield stress, as in 355MPa")
	f.StringVar(&s.tensile, "tensile", "", "tensile strength, as in 510MPa")
	f.StringVar(&s.elongation, "elongation", "", "elongation after fracture, as in 18%")
	f.BoolVar(&s.brittle, "brittle", false, "cast or otherwise brittle, whatever the elongation")
}

func (s *strengthFlags) define(f *pflag.FlagSet) {
	s.act(f)
	f.StringVar(&s.metal, "metal", "", "kind of metal for the rules of notch sensitivity (steel): stainless, cast-steel, nodular-iron, malleable-iron, grey-iron, annealed-aluminium, hardened-aluminium, cast-aluminium")
	f.StringVar(&s.slipLayer, "slip-layer", "", "thickness of the slip layer of Siebel and Stieler, as in 0.05mm, to use their rule too")
	f.StringVar(&s.safety, "safety", "", "smallest safety that is asked for, as in 1.8")
}

func runStrength(c *call) (int, error) {
	var q questions
	var s strengthFlags
	s.define(c.flags)
	q.targetFlag(c.flags)
	q.partFlags(c.flags)
	asJSON := c.flags.Bool("json", false, "print one JSON object instead of text")
	var picture drawing
	picture.paper.flags(c.flags)
	picture.o.Style = render.StyleWash
	c.flags.StringVarP(&picture.file, "output", "o", "", "draw the stress of all loads over the strength to this PNG file")
	args, err := c.parse()
	if err != nil {
		return 0, err
	}
	if picture.file != "" {
		if err := picture.check(); err != nil {
			return 0, err
		}
	}
	question, err := s.ask(&q, args)
	if err != nil {
		return 0, err
	}
	bar := c.progress()
	question.Options.Progress = bar.tell
	result, err := strength.Run(c.ctx, question)
	if err == nil && picture.file != "" && result.Settled {
		bar.tell("drawing")
		err = picture.draw(utilisation(result, &picture))
	}
	bar.clear()
	if err != nil {
		return 0, err
	}
	if *asJSON {
		err = writeStrengthJSON(c.stdout, result)
	} else {
		err = writeStrengthText(c.stdout, result, c.style())
	}
	return strengthStatus(result.Decision), err
}

func strengthStatus(d strength.Decision) int {
	switch d {
	case strength.Met, strength.NotAsked:
		return exitAgrees
	case strength.NotMet:
		return exitNotMet
	}
	return exitUndecided
}

// ask puts the question together, the file's part of it first.
func (s *strengthFlags) ask(q *questions, args []string) (strength.Question, error) {
	var out strength.Question
	if len(args) == 0 {
		_, err := partOf(args, scf.Options{})
		return out, err
	}
	job, err := q.job(args)
	if err != nil {
		return out, err
	}
	out.Part, out.Options = job.part, job.options
	if job.file != nil {
		if err := fromFile(&out, job.file); err != nil {
			return out, err
		}
	}
	if err := s.over(&out); err != nil {
		return out, err
	}
	return out, out.Check()
}

func fromFile(q *strength.Question, file *specimen.File) (err error) {
	f, m := file.Forces, file.Material
	q.Axial, q.Bending, q.Torque, q.Thickness, q.Required = f.Axial, f.Bending, f.Torque, f.Thickness, f.Safety
	q.Material = strength.Material{Yield: m.Yield, Tensile: m.Tensile, Elongation: m.Elongation, Brittle: m.Brittle}
	if m.Metal != "" {
		q.Material.Metal, err = strength.ParseMetal(m.Metal)
	}
	return err
}

// over puts what the flags say over what the file said.
func (s *strengthFlags) over(q *strength.Question) error {
	m := &q.Material
	for _, flag := range []struct {
		name, text string
		read       func(text string) error
	}{
		{"axial", s.axial, func(t string) (err error) { q.Axial, err = quantity.ParseForce(t); return err }},
		{"bending", s.bending, func(t string) (err error) { q.Bending, err = quantity.ParseMoment(t); return err }},
		{"torque", s.torque, func(t string) (err error) { q.Torque, err = quantity.ParseMoment(t); return err }},
		{"thickness", s.thickness, func(t string) (err error) { q.Thickness, err = specimen.ParseLength(t); return err }},
		{"yield", s.yield, func(t string) (err error) { m.Yield, err = quantity.ParseStress(t); return err }},
		{"tensile", s.tensile, func(t string) (err error) { m.Tensile, err = quantity.ParseStress(t); return err }},
		{"elongation", s.elongation, func(t string) (err error) { m.Elongation, err = elongation(t); return err }},
		{"metal", s.metal, func(t string) (err error) { m.Metal, err = strength.ParseMetal(t); return err }},
		{"slip-layer", s.slipLayer, func(t string) (err error) { m.SlipLayer, err = slipLayer(t); return err }},
		{"safety", s.safety, func(t string) (err error) { q.Required, err = requiredSafety(t); return err }},
	} {
		if !s.flags.Changed(flag.name) {
			continue
		}
		if err := flag.read(flag.text); err != nil {
			return calledBy("--"+flag.name, err)
		}
	}
	if s.flags.Changed("brittle") {
		m.Brittle = s.brittle
	}
	return nil
}

// calledBy puts the name of a flag on a fault found in its text.
func calledBy(name string, err error) error {
	var amount *quantity.Error
	if errors.As(err, &amount) {
		amount.What = name
	}
	return named(err, name)
}

func elongation(text string) (float64, error) {
	x, err := share(text)
	if err != nil || !(x > 0 && x <= 1) {
		return 0, &inputError{text: "--elongation " + quoted(text) + ": not an elongation", hint: "give the elongation after fracture, as in 18% or 0.18"}
	}
	return x, nil
}

func slipLayer(text string) (float64, error) {
	l, err := specimen.ParseLength(text)
	if err != nil {
		return 0, err
	}
	if l.Unit == "" || !(l.Value > 0) {
		return 0, &inputError{text: "--slip-layer " + quoted(text) + ": not a thickness", hint: "give it with its unit, as in 0.05mm"}
	}
	return l.In("mm"), nil
}

func requiredSafety(text string) (float64, error) {
	x, err := plainNumber(text)
	if err != nil || !(x >= 1 && x <= 100) {
		return 0, &inputError{text: "--safety " + quoted(text) + ": not a safety between 1 and 100", hint: "give what the applicable code asks for, as in 1.8"}
	}
	return x, nil
}
