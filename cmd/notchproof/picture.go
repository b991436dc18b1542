package main

import (
	"fmt"
	"io"

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

Exit status as that of check.
`,
		run: runPicture,
	}
}

func runPicture(c *call) (int, error) {
	var q questions
	file := c.flags.StringP("output", "o", "", "the PNG file to write")
	width := c.flags.Int("width", 1600, "width of the picture in pixels, 400 to 6000")
	mesh := c.flags.Bool("mesh", false, "draw the edges of the elements too")
	q.loadFlag(c.flags)
	q.claimFlags(c.flags)
	q.targetFlag(c.flags)
	q.partFlags(c.flags)
	args, err := c.parse()
	if err != nil {
		return 0, err
	}
	if *file == "" {
		return 0, &inputError{text: "no file to draw to", hint: "name one with -o, as in -o part.png"}
	}
	if *width < 400 || *width > 6000 {
		return 0, &inputError{text: fmt.Sprintf("--width %d: too small or too large", *width), hint: "give 400 to 6000 pixels"}
	}
	if err := checkOutput(*file, ".png"); err != nil {
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
		err = draw(*file, result, render.PictureOptions{Width: *width, Mesh: *mesh})
	}
	bar.clear()
	if err != nil {
		return 0, err
	}
	fmt.Fprintf(c.stdout, "%s, %s: picture written to %s\n", job.part.Name, load.Name, *file)
	return statusOf(result), nil
}

func draw(file string, r *verify.Result, o render.PictureOptions) error {
	im, err := render.Picture(&r.Findings[0], r.Part, o)
	if err != nil {
		return err
	}
	return writeFile(file, func(w io.Writer) error { return render.WritePNG(w, im) })
}
