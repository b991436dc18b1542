package main

import (
	"errors"
	"fmt"
	"io"
	"runtime/debug"
	"strings"

	"github.com/spf13/pflag"

	"notchproof/render"
	"notchproof/verify"
)

func pictureCommand() *command {
	return &command{
		name:  "picture",
		args:  "PART [dimension=value ...] -o FILE.png [flags]",
		short: "draw the stresses of the part as a sheet for the calculation file",
		long: `Checks the part under one load (the first that it carries unless --load names
another) and draws it to scale: the stress as a multiple of the nominal stress
with contour lines, the stress along the notch as quills, the root magnified,
and a title block with factor, uncertainty, verdict and mesh.

  notchproof picture shaft-shoulder D=72mm d=48mm r=3mm --load bending -o shaft.png

--field chooses the stress: principal (the first principal stress; in torsion the
shear), mises, shear (the largest in the drawn plane), axial, transverse (radial
in shafts), shear-xy, or hoop of shafts. --style fringe draws the dark-field
isochromatic fringes that a photoelastic model of the part would show, bands of
equal principal stress difference, from which many charts were once measured.

Where one half of the part is modelled, that half is drawn; --whole adds the
other. The width is in pixels or, with a unit, on paper: --width 160mm --dpi 300.
Letters keep a readable height: on narrow paper the sheet has one column.

Exit status as that of check.
`,
		run: runPicture,
	}
}

// drawing are the flags of a picture.
type drawing struct {
	paper
	file string
	o    render.PictureOptions
}

func (d *drawing) flags(f *pflag.FlagSet) {
	f.StringVarP(&d.file, "output", "o", "", "the PNG file to write")
	f.StringVar(&d.o.Field, "field", "", "stress to draw: "+strings.Join(render.Fields(), ", ")+" (default principal)")
	f.StringVar(&d.o.Style, "style", render.StyleWash, "how: "+strings.Join(render.Styles(), " or "))
	f.BoolVar(&d.o.Whole, "whole", false, "draw both halves of a symmetric part")
	f.BoolVar(&d.o.Mesh, "mesh", false, "draw the edges of the elements too")
	d.paper.flags(f)
}

func runPicture(c *call) (int, error) {
	var q questions
	var d drawing
	d.flags(c.flags)
	q.oneLoadFlag(c.flags)
	q.claimFlags(c.flags)
	q.targetFlag(c.flags)
	q.partFlags(c.flags)
	args, err := c.parse()
	if err != nil {
		return 0, err
	}
	if err := d.check(); err != nil {
		return 0, err
	}
	job, load, err := q.one(args)
	if err != nil {
		return 0, err
	}
	bar := c.progress()
	job.options.Progress = bar.tell
	result, err := verify.Run(c.ctx, job.part, job.loads, job.options)
	if err == nil {
		bar.tell("drawing")
		err = d.draw(result)
	}
	bar.clear()
	if err != nil {
		return 0, err
	}
	fmt.Fprintf(c.stdout, "%s, %s: picture written to %s\n", job.part.Name, load.Name, d.file)
	return statusOf(result), nil
}

// collectOften lets the layers of a picture use the same memory one after the
// other: each is larger than all of a solve, and fresh pages cost more than the
// collector does.
func collectOften() { debug.SetGCPercent(100) }

// draw draws and writes the picture.
func (d *drawing) draw(r *verify.Result) error {
	collectOften()
	im, err := render.Picture(&r.Findings[0], r.Part, d.o)
	if fault := (*render.FieldError)(nil); errors.As(err, &fault) {
		return &inputError{text: "--field " + fault.Field + ": " + fault.Reason, hint: "leave --field out, or choose another of " + strings.Join(render.Fields(), ", ")}
	}
	if err != nil {
		return err
	}
	return writeFile(d.file, func(w io.Writer) error { return render.WritePNGAt(w, im, d.o.DPI) })
}
