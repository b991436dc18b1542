package scf

import "math"

// Proportions beyond these are refused. A root of 1e-6 of the part is still
// placed to ten digits of its own size by doubles; ten times less would start
// to show in the factor, and no tool makes it.
const (
	leastRatio  = 1e-6 // of a radius, step, ligament or length to the part's width
	largestStep = 300  // D/d; heavy parts on a thread: rounding takes over in bending
	longestRun  = 100  // of a fillet, notch or groove along the axis, in part widths
)

// notBelow refuses a length that is too small a fraction of the part's width.
// what is the name of the ratio, as in "r/D".
func notBelow(name string, value float64, what string, length, width float64) error {
	if length >= leastRatio*width {
		return nil
	}
	return &DimensionError{
		Name: name, Value: value,
		Reason: what + " = " + short(length/width) + " is below " + short(leastRatio),
		Hint:   "a smaller proportion cannot be meshed",
	}
}

// notLonger refuses a feature that is too long for the part.
func notLonger(name string, value float64, what string, length float64, widthName string, width float64) error {
	if length <= longestRun*width {
		return nil
	}
	return &DimensionError{
		Name: name, Value: value,
		Reason: what + " " + short(length) + " is more than " + short(longestRun) + " times " + widthName + " = " + number(width),
	}
}

// noSliver refuses a straight piece beside a root arc that is there, but is too
// short to be drawn in a part of width D with a feature of the given run: an
// outline needs sides of at least 1e-8 of its size, ends included. Pieces below
// 1e-4 of the radius pass, since leaving them out changes nothing that shows.
func noSliver(name string, value float64, what string, piece, r, D, run float64) error {
	const (
		unseen = 1e-4
		ends   = 9 // lengths of both plain ends and the width, in D
	)
	if piece <= unseen*r || piece >= 1.5e-8*(ends*D+run) {
		return nil
	}
	return &DimensionError{
		Name: name, Value: value,
		Reason: "leaves a " + what + " of " + short(piece) + ", which is too short to be meshed",
		Hint:   "leave none or a longer one",
	}
}

// checkStep holds the two sizes and the root radius of a part against each
// other; depth is D − d for a notch on one side, half of that otherwise.
func checkStep(D, d, r float64) error {
	switch {
	case d >= D:
		return &DimensionError{Name: "d", Value: d,
			Reason: "not smaller than D = " + number(D),
			Hint:   "D is the larger size, d the net one",
		}
	case D/d > largestStep:
		return &DimensionError{Name: "d", Value: d,
			Reason: "D/d = " + short(D/d) + " is above " + short(largestStep),
			Hint:   "such a step cannot be solved; its factor is that of an endless one",
		}
	case D-d < leastRatio*d:
		return &DimensionError{Name: "d", Value: d,
			Reason: "D/d − 1 = " + short((D-d)/d) + " is below " + short(leastRatio),
			Hint:   "such a step cannot be meshed",
		}
	}
	if r > 0 && r < leastRatio*D {
		return &DimensionError{Name: "r", Value: r,
			Reason: "r/D = " + short(r/D) + " is below " + short(leastRatio),
			Hint:   "a smaller proportion cannot be meshed; r=0 shows how the stress of the sharp corner grows",
		}
	}
	return notLonger("r", r, "radius", r, "D", D)
}

// cutRun is the length along the axis of an elliptic quarter arc (radial
// semi-axis r, axial ra) of which only the height h is there.
func cutRun(h, r, ra float64) float64 {
	if h >= r {
		return ra
	}
	return ra * math.Sqrt(h*(2*r-h)) / r
}
