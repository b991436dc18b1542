package scf

import (
	"fmt"
	"math"
)

// roarkHoleBending is Roark, 7th ed., Table 17.1, central circular hole in
// in-plane bending: 2 times the stress that section property gives at the
// hole's edge, 12 M r / (t (W³ − d³)). From memory. 2 is exact for a hole much
// smaller than the strip.
func roarkHoleBending(y float64) Value {
	v := Value{
		ID:       "roark-7-hole",
		Factor:   2,
		Accuracy: fitAccuracy,
		Source:   roark7 + "central circular hole, in-plane bending",
		Sureness: Memory,
		Warnings: []string{"one number for all proportions: the limit of a small hole"},
	}
	v.hold(limit{name: "d/W", value: y, lo: 0, hi: 1})
	return v
}

// holeBendingNominal is the linear bending stress at the edge of a hole of the
// height d across a strip of the width W, centred offset from the strip's
// middle. Of the hole's two edges the one farther from the net section's
// middle counts; small is the factor of a small hole, for the warning.
func holeBendingNominal(W, d, offset, small float64) Nominal {
	n := Nominal{
		Section: "net, at the hole's edge",
		Formula: "6 M d / ((W³ − d³) t)",
		Gross:   barBending(W),
		Notes:   []string{"the nominal stress is that at the hole's edge, not the larger one at the strip's edge"},
	}
	left := float64(W*W*W) - float64(d*d*d)
	hole, edge := 6*d/left, 6*W/left
	if offset != 0 {
		n.Formula = "M y / I at the hole's edge, I and y of the net section"
		hole, edge = eccentricSection(W, d, math.Abs(offset))
	}
	n.Net = hole
	// The strip's edge is stressed higher than the hole's unless the factor
	// exceeds the ratio of the two linear stresses.
	if ratio := edge / hole; ratio > small {
		n.Warnings = append(n.Warnings, fmt.Sprintf(
			"the strip's edge carries %s times the nominal stress: it is stressed higher than the hole unless the factor exceeds %[1]s", three(ratio)))
	}
	return n
}

// eccentricSection gives the linear stress under a unit moment at the hole's
// farther edge and at the strip's farther edge, for an offset above zero.
// Elementary: second moments about the middle of what is left.
func eccentricSection(W, d, offset float64) (hole, edge float64) {
	middle := -d * offset / (W - d)
	strip := W*W*W/12 + float64(W*middle*middle)
	gap := d*d*d/12 + float64(d*(offset-middle)*(offset-middle))
	moment := strip - gap
	return (offset + d/2 - middle) / moment, (W/2 - middle) / moment
}
