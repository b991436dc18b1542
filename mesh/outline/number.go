package outline

import (
	"strconv"

	"gonum.org/v1/gonum/spatial/r2"
)

// number writes a coordinate for messages, to nine digits.
func number(x float64) string { return strconv.FormatFloat(x, 'g', 9, 64) }

// place writes a point for messages.
func place(p r2.Vec) string { return "(" + number(p.X) + ", " + number(p.Y) + ")" }
