package main

import (
	"fmt"
	"io"
	"math"
	"path/filepath"
	"strconv"
	"strings"

	"github.com/spf13/pflag"

	"notchproof/render"
	"notchproof/verify/specimen"
)

// A figureFile is where a line drawing goes, and on what paper.
type figureFile struct {
	name  string
	width string
	dpi   float64
	o     render.FigureOptions
}

// figureFormats are the endings of what line drawings are written to.
var figureFormats = []string{".png", ".svg"}

func (o *figureFile) flags(f *pflag.FlagSet, usage string) {
	f.StringVarP(&o.name, "output", "o", "", usage)
	f.StringVar(&o.width, "width", "1600", "width in pixels, 400 to 6000, or on paper, as in 160mm")
	f.Float64Var(&o.dpi, "dpi", 0, "pixels an inch of a PNG, 72 to 1200 (default 300 for a width on paper)")
}

// check refuses what could not be written or read, before any work is done.
func (o *figureFile) check() error {
	if err := checkOutput(o.name, figureFormats...); err != nil {
		return err
	}
	return o.paper()
}

// paper finds the width on paper and in pixels.
func (o *figureFile) paper() error {
	const leastPixels, mostPixels, leastDPI, mostDPI, printers = 400, 6000, 72, 1200, 300
	const inch = 25.4 // mm
	if o.dpi != 0 && !(o.dpi >= leastDPI && o.dpi <= mostDPI) {
		return &inputError{text: fmt.Sprintf("--dpi %g: too few or too many", o.dpi), hint: fmt.Sprintf("give %d to %d pixels an inch; printers want 300", leastDPI, mostDPI)}
	}
	pixels, err := strconv.Atoi(o.width)
	if err == nil {
		if o.dpi != 0 {
			o.o.Millimetres = float64(pixels) / o.dpi * inch
		}
	} else {
		length, err := specimen.ParseLength(o.width)
		if err != nil || length.Unit == "" {
			return &inputError{text: "--width " + quoted(o.width) + ": not a width", hint: "give pixels, as in 1600, or a width on paper, as in 160mm"}
		}
		if o.dpi == 0 {
			o.dpi = printers
		}
		o.o.Millimetres = length.In("mm")
		pixels = int(math.Round(math.Min(o.o.Millimetres/inch*o.dpi, 1e6)))
	}
	if pixels < leastPixels || pixels > mostPixels {
		return &inputError{text: "--width " + o.width + ": too small or too large", hint: fmt.Sprintf("give %d to %d pixels, or a width on paper that comes to as many", leastPixels, mostPixels)}
	}
	o.o.Pixels = pixels
	return nil
}

// write writes a line drawing in the format that the file's name ends in.
func (o *figureFile) write(f *render.Figure) error {
	return writeFile(o.name, func(w io.Writer) error {
		if strings.EqualFold(filepath.Ext(o.name), ".svg") {
			_, err := w.Write(f.SVG(o.o))
			return err
		}
		return render.WritePNG(w, f.Image(o.o))
	})
}
