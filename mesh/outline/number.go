package outline

import (
	"math"
	"strconv"

	"gonum.org/v1/gonum/spatial/r2"
)

// number writes a coordinate for messages, to six digits.
func number(x float64) string { return strconv.FormatFloat(x, 'g', 6, 64) }

// place writes a point for messages. A coordinate that is nothing but the
// rounding error of the other shows as zero.
func place(p r2.Vec) string {
	const rounding = 1e-9
	switch ax, ay := math.Abs(p.X), math.Abs(p.Y); {
	case ax < rounding*ay:
		p.X = 0
	case ay < rounding*ax:
		p.Y = 0
	}
	return "(" + number(p.X) + ", " + number(p.Y) + ")"
}
