package main

import (
	"fmt"
	"math"
	"slices"
	"strconv"
	"strings"

	"notchproof/render"
	"notchproof/verify/specimen"
)

const (
	leastPixels, mostPixels = 400, 6000
	leastDPI, mostDPI       = 72, 1200
	paperDPI                = 300 // of a width on paper
	screenDPI               = 190 // puts 1600 pixels on A4
)

// check turns the flags of a picture into its options.
func (d *drawing) check() error {
	if d.file == "" {
		return &inputError{text: "no file to draw to", hint: "name one with -o, as in -o part.png"}
	}
	if err := checkOutput(d.file, ".png"); err != nil {
		return err
	}
	if d.o.Field != "" && !slices.Contains(render.Fields(), d.o.Field) {
		return &inputError{text: "--field " + quoted(d.o.Field) + ": no such field", hint: "the fields are " + strings.Join(render.Fields(), ", ")}
	}
	if !slices.Contains(render.Styles(), d.o.Style) {
		return &inputError{text: "--style " + quoted(d.o.Style) + ": no such style", hint: "the styles are " + strings.Join(render.Styles(), ", ")}
	}
	if d.o.Style == render.StyleFringe && d.o.Field != "" {
		return &inputError{text: "--field " + d.o.Field + " with --style fringe", hint: "fringes show the difference of the principal stresses alone; leave --field out"}
	}
	d.o.Edition = edition()
	return d.paper()
}

// paper finds the width in pixels and the pixels an inch.
func (d *drawing) paper() error {
	if d.dpi != 0 && !(d.dpi >= leastDPI && d.dpi <= mostDPI) {
		return &inputError{text: fmt.Sprintf("--dpi %g: too few or too many", d.dpi), hint: fmt.Sprintf("give %d to %d pixels an inch; printers want 300", leastDPI, mostDPI)}
	}
	d.o.DPI = d.dpi
	pixels, err := strconv.Atoi(d.width)
	if err != nil {
		length, err := specimen.ParseLength(d.width)
		if err != nil || length.Unit == "" {
			return &inputError{text: "--width " + quoted(d.width) + ": not a width", hint: "give pixels, as in 1600, or a width on paper, as in 160mm"}
		}
		if d.o.DPI == 0 {
			d.o.DPI = paperDPI
		}
		pixels = int(math.Round(math.Min(length.In("in")*d.o.DPI, 1e6)))
	}
	if d.o.DPI == 0 {
		d.o.DPI = screenDPI
	}
	if pixels < leastPixels || pixels > mostPixels {
		return &inputError{text: "--width " + d.width + ": too small or too large", hint: fmt.Sprintf("give %d to %d pixels, or a width on paper that comes to as many", leastPixels, mostPixels)}
	}
	d.o.Width = pixels
	return nil
}
