package main

import (
	"context"
	"fmt"
	"io"
	"math"
	"runtime/debug"
	"strings"

	"notchproof/render"
	"notchproof/verify"
	"notchproof/verify/specimen"
)

func studyCommand() *command {
	return &command{
		name:  "study",
		args:  "PART [dimension=value ...] [--by size|order] [flags]",
		short: "show how the factor converges with the mesh or the order",
		long: `Solves the part on a ladder and prints every rung: triangles, elements per 90°
of arc on the notch, unknowns, factor, change, observed order, then the limit.
By size the elements keep their order (2 unless --order says otherwise) and
every element is split into four from rung to rung; the limit is Richardson's, its
bar the grid convergence index of Roache (1994) by the procedure of Celik et al.
(2008). The first mesh has three elements on 90° of the notch, or with --size
elements of that length there: where they are larger than the root, a mesh leaves
it out, and the study shows the growth at the sharp corner that is left.
By order the mesh stays and the order climbs from 1 to 8. The last column is the
traction that the solution leaves on the free surface at the peak, where there
is none in truth, at unit nominal stress.

Below it stands how fine a mesh of your own must be at the root: elements per 90°
of arc for errors of 5, 2 and 1 % at order 1 and 2, read at the nodes as usual.

  notchproof study bar-shoulder D=60mm d=40mm r=4mm --load tension --by size -o study.png
  notchproof study bar-shoulder D=60mm d=40mm r=0 -o corner.png

Exit status: 0 the ladder has a limit, 2 bad input, 3 it has none or shows none
yet, 130 interrupted.
`,
		run: runStudy,
	}
}

func runStudy(c *call) (int, error) {
	var q questions
	var out figureFile
	by := c.flags.String("by", "size", "what is refined: size or order")
	order := c.flags.Int("order", 0, "order of the elements in a study by size, 1 to 8 (default 2)")
	rungs := c.flags.Int("rungs", 0, "number of meshes in a study by size, 3 to 6 (default 4, and one more where these leave it undecided)")
	size := c.flags.String("size", "", "length of the elements at the notch that a study by size begins with, as in 1mm")
	out.flags(c.flags, "write the plot to this .png or .svg file")
	q.oneLoadFlag(c.flags)
	q.partFlags(c.flags)
	args, err := c.parse()
	if err != nil {
		return 0, err
	}
	job, load, err := q.one(args)
	if err != nil {
		return 0, err
	}
	climb, err := studyKind(*by, *order, *rungs)
	if err != nil {
		return 0, err
	}
	begin, err := elementSize(*size, *by, job.part)
	if err != nil {
		return 0, err
	}
	if err := out.check(); err != nil {
		return 0, err
	}
	debug.SetGCPercent(100)
	debug.SetMemoryLimit(math.MaxInt64)
	bar := c.progress()
	s, err := climb(c.ctx, job.part, load, verify.StudyOptions{Order: *order, Rungs: *rungs, Size: begin, Progress: bar.tell})
	if err != nil {
		bar.clear()
		return 0, err
	}
	own, err := meshGuidance(c.ctx, job, load, bar.tell)
	bar.clear()
	if err != nil {
		return 0, err
	}
	if err := writeStudy(c.stdout, s, c.style()); err != nil {
		return 0, err
	}
	if _, err := io.WriteString(c.stdout, own); err != nil {
		return 0, err
	}
	if out.name != "" {
		figure, err := render.StudyFigure(plotOf(s))
		if err != nil {
			return 0, err
		}
		if err := out.write(figure); err != nil {
			return 0, err
		}
		fmt.Fprintf(c.stdout, "\nplot written to %s\n", out.name)
	}
	if !s.Estimate.Status.Settled() {
		return exitUndecided, nil
	}
	return exitAgrees, nil
}

// elementSize reads the size of elements in the part's unit; 0: none asked.
func elementSize(text, by string, part *specimen.Part) (float64, error) {
	if text == "" {
		return 0, nil
	}
	if by != "size" {
		return 0, &inputError{text: "--size belongs to a study by size", hint: "a study by order stays on the mesh that a check begins with"}
	}
	length, err := specimen.ParseLength(text)
	if err != nil {
		return 0, named(err, "--size")
	}
	if (length.Unit == "") != (part.Unit == "") {
		return 0, &inputError{text: "--size " + quoted(text) + ": one of part and size has a unit and the other has none", hint: "write the size in the way of the part's lengths"}
	}
	box := part.Region.Bounds()
	size, extent := length.In(part.Unit), math.Max(box.Max.X-box.Min.X, box.Max.Y-box.Min.Y)
	if !(size >= 1e-8*extent) || size > extent {
		return 0, &inputError{text: "--size " + quoted(text) + ": too small or too large for the part", hint: "give the length of an element's edge at the notch"}
	}
	return size, nil
}

// one reads a part and the one load that a study or picture is about: the one
// that is named, else the first of those asked for.
func (q *questions) one(args []string) (*job, *specimen.Load, error) {
	if len(q.load) > 1 {
		return nil, nil, &inputError{text: "--load " + strings.Join(q.load, ",") + ": more than one", hint: "name the one load that is wanted"}
	}
	job, err := q.job(args)
	if err != nil {
		return nil, nil, err
	}
	job.loads = job.loads[:1]
	load, _ := job.part.Load(job.loads[0])
	return job, load, nil
}

// A climber makes one kind of study.
type climber = func(context.Context, *specimen.Part, *specimen.Load, verify.StudyOptions) (*verify.Study, error)

func studyKind(by string, order, rungs int) (climber, error) {
	if order != 0 && (order < 1 || order > 8) {
		return nil, &inputError{text: fmt.Sprintf("--order %d: no such order", order), hint: "give an order from 1 to 8"}
	}
	if rungs != 0 && (rungs < 3 || rungs > 6) {
		return nil, &inputError{text: fmt.Sprintf("--rungs %d: too few or too many", rungs), hint: "give 3 to 6; three are needed to observe an order"}
	}
	switch by {
	case "size":
		return verify.BySize, nil
	case "order":
		if order != 0 || rungs != 0 {
			return nil, &inputError{text: "--order and --rungs belong to a study by size", hint: "a study by order climbs from 1 to 8 on one mesh"}
		}
		return verify.ByOrder, nil
	}
	return nil, &inputError{text: "--by " + quoted(by) + ": no such study", hint: "size or order"}
}
