package extrapolate

import (
	"fmt"
	"math"
	"slices"
)

// A tally collects how bars compare with true errors.
type tally struct {
	n, none, missed int
	worst           float64   // largest error ÷ bar among those missed
	widths          []float64 // bar ÷ error
}

func (c *tally) add(e Estimate, limit float64) {
	c.n++
	if math.IsNaN(e.Value) {
		c.none++
		return
	}
	off := math.Abs(e.Value - limit)
	if !(off <= e.Uncertainty) {
		c.missed++
		c.worst = math.Max(c.worst, off/e.Uncertainty)
	}
	c.widths = append(c.widths, e.Uncertainty/off)
}

func (c *tally) merge(d *tally) {
	c.n, c.none, c.missed = c.n+d.n, c.none+d.none, c.missed+d.missed
	c.worst = math.Max(c.worst, d.worst)
	c.widths = append(c.widths, d.widths...)
}

func (c *tally) cover() float64 {
	return 100 * (1 - float64(c.missed)/float64(c.n-c.none))
}

func (c *tally) quantile(q float64) float64 {
	slices.Sort(c.widths)
	return c.widths[int(q*float64(len(c.widths)-1))]
}

func (c *tally) String() string {
	return fmt.Sprintf("%9.3f %8.2f %8.1f %9.2f %8d", c.cover(), c.quantile(0.5), c.quantile(0.9), c.worst, c.none)
}
