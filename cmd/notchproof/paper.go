package main

import (
	"fmt"
	"math"
	"slices"
	"strconv"
	"strings"

	"github.com/spf13/pflag"

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
	if err := d.paper.find(); err != nil {
		return err
	}
	d.o.Width, d.o.DPI = d.pixels, d.perInch
	return nil
}

// A paper is the width of what is drawn, as it was asked for and in pixels.
type paper struct {
	width   string
	dpi     float64
	pixels  int
	perInch float64 // pixels an inch
	mm      float64 // the width on paper
}

func (p *paper) flags(f *pflag.FlagSet) {
	f.StringVar(&p.width, "width", "1600", "width in pixels, 400 to 6000, or on paper, as in 160mm")
	f.Float64Var(&p.dpi, "dpi", 0, "pixels an inch, 72 to 1200 (default 300 for a width on paper, else 190)")
}

// find works out the width in pixels and the pixels an inch.
func (p *paper) find() error {
	if p.dpi != 0 && !(p.dpi >= leastDPI && p.dpi <= mostDPI) {
		return &inputError{text: fmt.Sprintf("--dpi %g: too few or too many", p.dpi), hint: fmt.Sprintf("give %d to %d pixels an inch; printers want 300", leastDPI, mostDPI)}
	}
	p.perInch = p.dpi
	pixels, err := strconv.Atoi(p.width)
	if err != nil {
		length, err := specimen.ParseLength(p.width)
		if err != nil || length.Unit == "" {
			return &inputError{text: "--width " + quoted(p.width) + ": not a width", hint: "give pixels, as in 1600, or a width on paper, as in 160mm"}
		}
		if p.perInch == 0 {
			p.perInch = paperDPI
		}
		p.mm = length.In("mm")
		pixels = int(math.Round(math.Min(length.In("in")*p.perInch, 1e6)))
	}
	if p.perInch == 0 {
		p.perInch = screenDPI
	}
	if p.mm == 0 {
		p.mm = float64(pixels) / p.perInch * 25.4
	}
	if pixels < leastPixels || pixels > mostPixels {
		return &inputError{text: "--width " + p.width + ": too small or too large", hint: fmt.Sprintf("give %d to %d pixels, or a width on paper that comes to as many", leastPixels, mostPixels)}
	}
	p.pixels = pixels
	return nil
}
