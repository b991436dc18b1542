package main

import (
	"context"
	"fmt"
	"io"
	"math"
	"runtime/debug"
	"strings"

	"notchproof/render"
	"notchproof/render/number"
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
By size the elements keep their order (2 unless --order says otherwise) and the
every element is split into four from rung to rung; the limit is Richardson's, its bar the grid
convergence index of Roache (1994) by the procedure of Celik et al. (2008).
By order the mesh stays and the order climbs from 1 to 8. The last column is the
traction that the solution leaves on the free surface at the peak, where there
is none in truth, at unit nominal stress.

Below it stands how fine a mesh of your own must be at the root: elements per 90°
of arc for errors of 5, 2 and 1 % at order 1 and 2, read at the nodes as usual.

  notchproof study bar-shoulder D=60mm d=40mm r=4mm --load tension --by size -o study.png
`,
		run: runStudy,
	}
}

func runStudy(c *call) (int, error) {
	var q questions
	by := c.flags.String("by", "size", "what is refined: size or order")
	order := c.flags.Int("order", 0, "order of the elements in a study by size, 1 to 8 (default 2)")
	rungs := c.flags.Int("rungs", 0, "number of meshes in a study by size, 3 to 6 (default 4)")
	file := c.flags.StringP("output", "o", "", "write the plot to this .png or .svg file")
	q.loadFlag(c.flags)
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
	if err := checkOutput(*file, figureFormats...); err != nil {
		return 0, err
	}
	debug.SetGCPercent(100)
	debug.SetMemoryLimit(math.MaxInt64)
	bar := c.progress()
	s, err := climb(c.ctx, job.part, load, verify.StudyOptions{Order: *order, Rungs: *rungs, Progress: bar.tell})
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
	if *file != "" {
		figure, err := render.StudyFigure(plotOf(s))
		if err != nil {
			return 0, err
		}
		if err := writeFigure(*file, figure, render.FigureOptions{}); err != nil {
			return 0, err
		}
		fmt.Fprintf(c.stdout, "\nplot written to %s\n", *file)
	}
	if !s.Estimate.Status.Settled() {
		return exitUndecided, nil
	}
	return exitAgrees, nil
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

// writeStudy prints the table.
func writeStudy(w io.Writer, s *verify.Study, st style) error {
	var b strings.Builder
	fmt.Fprintf(&b, "%s  %s\n%s, nominal stress %s (%s)\n\n", st.bold(s.Part.Name), dimensionText(s.Part),
		st.bold(string(s.Load.Name)), s.Load.Nominal.Formula, s.Load.Nominal.Section)
	fmt.Fprintf(&b, "%5s %10s %8s %9s %12s %11s %9s %9s\n", "order", "triangles", "per 90°", "unknowns", "factor", "change", "observed", "traction")
	for _, r := range s.Rows {
		fmt.Fprintf(&b, "%5d %10d %8.1f %9d %12.7f %11s %9s %9.1e\n", r.Order, r.Triangles, r.PerQuarter, r.Unknowns, r.Factor,
			orNothing("%+.2e", r.Change), orNothing("%.2f", r.ObservedOrder), r.Leftover)
	}
	e := s.Estimate
	switch {
	case !e.Status.Settled():
		fmt.Fprintf(&b, "\n%s\n", st.weak("no limit: "+e.Status.String()))
	case s.Sizes != nil:
		fmt.Fprintf(&b, "\nobserved order %.2f (%s); extrapolated limit %.6f\ngrid convergence index of the finest mesh %s, with the traction left on its surface its factor is %s\n",
			s.Sizes.Order, e.Status, s.Sizes.Limit, number.Percent(s.Sizes.GCI, 3), number.Uncertain(e.Value, e.Uncertainty))
	default:
		fmt.Fprintf(&b, "\none order more leaves about %.2f of the error (%s); the factor is %s\n", e.Order, e.Status, number.Uncertain(e.Value, e.Uncertainty))
	}
	for _, note := range e.Notes {
		fmt.Fprintf(&b, "note: %s\n", note)
	}
	_, err := io.WriteString(w, b.String())
	return err
}

func orNothing(format string, v float64) string {
	if math.IsNaN(v) || math.IsInf(v, 0) {
		return "–"
	}
	return fmt.Sprintf(format, v)
}

func plotOf(s *verify.Study) render.Study {
	p := render.Study{Title: s.Part.Name + ", " + string(s.Load.Name), Note: dimensionText(s.Part), Limit: math.NaN(), Uncertainty: math.NaN()}
	if s.Estimate.Status.Settled() {
		p.Limit, p.Uncertainty = s.Estimate.Value, s.Estimate.Uncertainty
		if s.Sizes != nil {
			p.Limit = s.Sizes.Limit
		}
	}
	if s.Sizes != nil {
		p.Order = float64(s.Rows[0].Order) // surface stresses of elements of order p converge with h^p
	}
	for _, r := range s.Rows {
		label := fmt.Sprintf("order %d", r.Order)
		if s.Sizes != nil {
			label = fmt.Sprintf("%.3g per 90°", r.PerQuarter)
		}
		p.Points = append(p.Points, render.StudyPoint{Label: label, Unknowns: r.Unknowns, Factor: r.Factor, Change: math.Abs(r.Change), Traction: r.Leftover})
	}
	return p
}
