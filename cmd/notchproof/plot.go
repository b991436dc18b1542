package main

import (
	"fmt"

	"notchproof/render"
	"notchproof/verify"
	"notchproof/verify/specimen"
)

func plotCommand() *command {
	return &command{
		name:  "plot",
		args:  "PART [dimension=value ...] -o FILE.png|FILE.svg [flags]",
		short: "plot the stress below the root or along the notch, or the ladder of factors",
		long: `Checks the part under one load (the first that it carries unless --load names
another) and plots what --of names:

  section   the stress from the root into the material, over the section and
            close to the root, beside elementary theory on that section and, where
            they apply, Kirsch's hole and the tail of Creager and Paris
  surface   the stress along the surface of the notch, against the length from the peak
  ladder    the factor of every rung, the answer with its uncertainty, your claim and
            the handbook, each with what it is good for

Stresses are multiples of the nominal stress. The ending of the file's name chooses
pixels or SVG. --width is the width on paper: letters keep their height and the
layout follows, down to the column of a journal.

  notchproof plot shaft-shoulder D=72mm d=48mm r=3mm --load bending --of section -o section.svg
  notchproof plot shaft-shoulder D=72mm d=48mm r=3mm --load bending --claim 1.85 --of ladder --width 80mm -o ladder.png

Exit status as that of check.
`,
		run: runPlot,
	}
}

// A finder draws one kind of plot of a finding.
type finder = func(*verify.Finding, *specimen.Part) (*render.Figure, error)

func plotOfFinding(kind string) (finder, error) {
	switch kind {
	case "section":
		return render.SectionFigure, nil
	case "surface":
		return render.SurfaceFigure, nil
	case "ladder":
		return render.LadderFigure, nil
	}
	return nil, &inputError{text: "--of " + quoted(kind) + ": no such plot", hint: "section, surface or ladder"}
}

func runPlot(c *call) (int, error) {
	var q questions
	var out figureFile
	kind := c.flags.String("of", "section", "what is plotted: section, surface or ladder")
	out.flags(c.flags, "the .png or .svg file to write")
	q.oneLoadFlag(c.flags)
	q.claimFlags(c.flags)
	q.targetFlag(c.flags)
	q.partFlags(c.flags)
	args, err := c.parse()
	if err != nil {
		return 0, err
	}
	draw, err := plotOfFinding(*kind)
	if err != nil {
		return 0, err
	}
	if out.name == "" {
		return 0, &inputError{text: "no file to plot to", hint: "name one with -o, as in -o section.svg"}
	}
	if err := out.check(); err != nil {
		return 0, err
	}
	job, load, err := q.one(args)
	if err != nil {
		return 0, err
	}
	result, err := c.verified(job)
	if err != nil {
		return 0, err
	}
	f := &result.Findings[0]
	if status := f.Computed.Factor.Status; !status.Settled() {
		fmt.Fprintf(c.stdout, "%s, %s: no factor and no plot: the ladder is %s\n", job.part.Name, load.Name, status)
		return exitUndecided, nil
	}
	figure, err := draw(f, result.Part)
	if err != nil {
		return 0, err
	}
	if err := out.write(figure); err != nil {
		return 0, err
	}
	fmt.Fprintf(c.stdout, "%s, %s: plot of the %s written to %s\n", job.part.Name, load.Name, *kind, out.name)
	return statusOf(result), nil
}
