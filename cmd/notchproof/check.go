package main

import (
	"fmt"

	"notchproof/scf"
	"notchproof/verify"
	"notchproof/verify/specimen"
)

func checkCommand() *command {
	return &command{
		name:  "check",
		args:  "[PART [dimension=value ...]] [flags]",
		short: "compute the factor with its uncertainty and judge handbook and claim",
		long: `Solves the part on a ladder of finite element meshes and orders, states the
factor with its uncertainty, holds the handbook factors and your own claim
against it, and says which of them can be trusted and why. Without a part it
checks the demonstration part.

  notchproof check shaft-shoulder D=72mm d=48mm r=3mm --load bending \
      --claim 1.85 --claim-from "chart, by eye"
  notchproof check seat.json

A claim from a finite element mesh of your own may say how fine the mesh was at
the root: the order of its elements (1 straight-sided, 2 with mid-nodes) and
their number per 90° of arc. Such meshes are then made and read as usual, at the
nodes and inside the elements, to see whether the density explains the claim.

  notchproof check shaft-shoulder D=90mm d=75mm r=6mm --load bending \
      --claim 1.62 --claim-mesh order=1,arc=12

A claim that disagrees is tried on the slips people make (another load, gross
for net section, diameter for radius, bar for shaft, ...). Those it meets are
named, each with the share of claims wrong for no such reason that would meet
some slip as well.

A part file is JSON: title, shape (a family with its dimensions, or an outline
of your own as path data), loads, material and claims. To start one, let
"notchproof parts shaft-shoulder D=72mm d=48mm r=3mm --as-file" print it. What
the flags say goes before what the file says.

-o writes the solution for other programs: FILE.vtu the field of stresses and
displacements (VTK XML unstructured grid of Lagrange triangles), FILE.csv the
stress along the free surface. Stresses are multiples of the nominal stress. With
several loads the name of each goes before the ending: field-tension.vtu.

  notchproof check bar-hole W=60mm d=20mm -o field.vtu -o surface.csv

Exit status: 0 agrees or nothing to compare with, 1 disagrees, 2 bad input,
3 undecided, 130 interrupted.
`,
		run: runCheck,
	}
}

func runCheck(c *call) (int, error) {
	var q questions
	q.loadFlag(c.flags)
	q.claimFlags(c.flags)
	q.targetFlag(c.flags)
	q.partFlags(c.flags)
	asJSON := c.flags.Bool("json", false, "print one JSON object instead of text")
	files := c.flags.StringArrayP("output", "o", nil, "write the field to this .vtu file, the surface stress to this .csv file; several may be named")
	args, err := c.parse()
	if err != nil {
		return 0, err
	}
	job, err := q.job(args)
	if err != nil {
		return 0, err
	}
	if err := checkExports(*files, job.loads); err != nil {
		return 0, err
	}
	result, err := c.verified(job)
	if err != nil {
		return 0, err
	}
	written, err := writeExports(*files, result)
	if err != nil {
		return 0, err
	}
	if *asJSON {
		return statusOf(result), writeJSON(c.stdout, result)
	}
	if err := writeText(c.stdout, result, c.style()); err != nil {
		return 0, err
	}
	for _, file := range written {
		fmt.Fprintf(c.stdout, "written to %s\n", file)
	}
	return statusOf(result), nil
}

// verified runs the ladders of a job and tells how far they are.
func (c *call) verified(j *job) (*verify.Result, error) {
	bar := c.progress()
	defer bar.clear()
	j.options.Progress = bar.tell
	return verify.Run(c.ctx, j.part, j.loads, j.options)
}

// A job is a part with what is asked about it.
type job struct {
	part    *specimen.Part
	loads   []scf.Load
	options verify.Options
	file    *specimen.File // that it was read from; nil: from the command line
}

// job reads the arguments and flags; without arguments it is the demonstration.
func (q *questions) job(args []string) (*job, error) {
	if len(args) == 0 {
		if q.claim != "" || len(q.load) > 0 {
			return nil, &inputError{text: "no part given", hint: "name a family and its dimensions, as in: shaft-shoulder D=72mm d=48mm r=3mm"}
		}
		return demonstration(q)
	}
	if isFile(args[0]) {
		if len(args) > 1 {
			return nil, &inputError{text: quoted(args[1]) + ": a part file takes no dimensions", hint: "write them into the file, or name a family instead"}
		}
		return fileJob(args[0], q)
	}
	o, err := q.options()
	if err != nil {
		return nil, err
	}
	part, err := partOf(args, o)
	if err != nil {
		return nil, err
	}
	loads, err := q.loads(part.Family)
	if err != nil {
		return nil, err
	}
	if len(loads) == 0 {
		loads = part.Family.Loads
	}
	options, err := q.verify(loads)
	return &job{part: part, loads: loads, options: options}, err
}

// statusOf is the exit status that a result comes to: a disagreement is the
// alarm that must not be drowned, then what could not be decided.
func statusOf(r *verify.Result) int {
	status := exitAgrees
	for _, f := range r.Findings {
		switch f.Verdict {
		case verify.Disagrees:
			return exitDisagrees
		case verify.Undecided:
			status = exitUndecided
		}
	}
	return status
}
