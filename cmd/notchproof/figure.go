package main

import (
	"io"
	"path/filepath"
	"strings"

	"github.com/spf13/pflag"

	"notchproof/render"
)

// A figureFile is where a line drawing goes, and on what paper.
type figureFile struct {
	paper
	name string
}

// figureFormats are the endings of what line drawings are written to.
var figureFormats = []string{".png", ".svg"}

func (o *figureFile) flags(f *pflag.FlagSet, usage string) {
	f.StringVarP(&o.name, "output", "o", "", usage)
	o.paper.flags(f)
}

// check refuses what could not be written or read, before any work is done.
func (o *figureFile) check() error {
	if err := checkOutput(o.name, figureFormats...); err != nil {
		return err
	}
	return o.paper.find()
}

// write writes a line drawing in the format that the file's name ends in.
func (o *figureFile) write(f *render.Figure) error {
	options := render.FigureOptions{Millimetres: o.mm, Pixels: o.pixels}
	return writeFile(o.name, func(w io.Writer) error {
		if strings.EqualFold(filepath.Ext(o.name), ".svg") {
			_, err := w.Write(f.SVG(options))
			return err
		}
		return render.WritePNGAt(w, f.Image(options), o.perInch)
	})
}
