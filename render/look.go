package render

import (
	"image/color"
	"math"
)

// A look is how a field is put on paper: as a wash of tones with contour lines,
// or as fringes.
type look interface {
	// scale is what the legend shows.
	scale() scale
	// painter colours the values of a raster; it is used by several goroutines.
	painter(r *raster) func(x, y int, v float64) color.RGBA
	// contours gives the lines over a raster.
	contours(r *raster) []contour
	// over is the ink on top of a value.
	over(v float64) color.NRGBA
	// mark is the colour of quills, loads and the peak.
	mark() color.NRGBA
	// lettering of a level's label, and the paper that it needs below it, nil:
	// none.
	label(level float64) (text string, below color.Color)
	title(reference string) string
	note(p *plate) string
}

// wash is the look of tones with contour lines.
type wash struct {
	ramp   *ramp
	levels []float64
	more   bool // values go on beyond the ramp's end
}

// levelCount is about how many contour lines a picture has.
const levelCount = 10

func newWash(low, high float64) *wash {
	return &wash{ramp: newRamp(low, high), levels: levelsBetween(low, high, levelCount)}
}

func (w *wash) scale() scale {
	return scale{
		low: w.ramp.low, high: w.ramp.high, levels: w.levels,
		paint: w.ramp.tone, over: w.ramp.over, text: levelText, end: w.end,
	}
}

func (w *wash) end(v float64) string {
	if w.more && v == w.ramp.high {
		return "≥ " + rangeText(v)
	}
	return rangeText(v)
}

func (w *wash) painter(*raster) func(x, y int, v float64) color.RGBA {
	return func(_, _ int, v float64) color.RGBA { return w.ramp.tone(v) }
}

func (w *wash) over(v float64) color.NRGBA { return w.ramp.over(v) }

func (w *wash) mark() color.NRGBA { return accent }

func (w *wash) label(level float64) (string, color.Color) { return levelText(level), nil }

func (w *wash) title(string) string { return "" }

func (w *wash) note(*plate) string {
	switch {
	case w.more:
		return "higher values are those of the mesh alone"
	case w.ramp.low < 0:
		return "thick line: zero; dashed: below it"
	}
	return ""
}

// contours gives the lines of the legend's levels, and those of a finer set
// where a view shows little but the lower end of the ramp.
func (w *wash) contours(r *raster) []contour {
	const most, few = 0.98, 0.4
	high := w.ramp.high
	if q := r.quantile(most, high); w.ramp.low == 0 && q < few*high {
		return trace(r, levels(math.Max(q, high/1000), 6))
	}
	return trace(r, w.levels)
}
