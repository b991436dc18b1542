package main

import (
	"io"
	"path/filepath"
	"strings"

	"notchproof/render"
)

// figureFormats are the endings of what line drawings are written to.
var figureFormats = []string{".png", ".svg"}

// writeFigure writes a line drawing in the format that the file's name ends in.
func writeFigure(file string, f *render.Figure, o render.FigureOptions) error {
	return writeFile(file, func(w io.Writer) error {
		if strings.EqualFold(filepath.Ext(file), ".svg") {
			_, err := w.Write(f.SVG(o))
			return err
		}
		return render.WritePNG(w, f.Image(o))
	})
}
