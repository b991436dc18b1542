package scf

import "math"

// What notches and grooves have in common: a circular root of radius r,
// tangent to two flanks that open by the angle α. A notch so shallow that the
// flanks would begin above the surface is a plain arc, whatever the angle.

func angleDimension() Dimension {
	return Dimension{Name: "angle", Meaning: "opening angle between the flanks", Optional: true, Angle: true, Zero: true}
}

// flankStart is the height above the root where the arc ends and a flank
// begins.
func flankStart(r, angle float64) float64 {
	return r * (1 - math.Sin(radians(angle/2)))
}

// hasFlanks reports whether a notch of depth h shows any of its flanks.
func hasFlanks(h, r, angle float64) bool { return h > flankStart(r, angle) }

// opened reports whether the angle changes the shape: there are flanks and
// they are not parallel.
func opened(h, r, angle float64) bool { return angle > 0 && hasFlanks(h, r, angle) }

// halfWidth is half the width of a notch at the surface.
func halfWidth(h, r, angle float64) float64 {
	if !hasFlanks(h, r, angle) {
		return cutRun(h, r, r)
	}
	half := radians(angle / 2)
	return r*math.Cos(half) + (h-flankStart(r, angle))*math.Tan(half)
}

// checkOpening refuses a notch that runs too far along the part, or whose
// flanks open so wide that they leave hardly any arc between them.
func checkOpening(h, r, angle, D float64) error {
	half := halfWidth(h, r, angle)
	if err := notLonger("angle", angle, "half width of the notch", half, "D", D); err != nil {
		return err
	}
	switch {
	case r == 0 && angle == 0:
		return &DimensionError{Name: "r", Value: r,
			Reason: "parallel flanks without a radius enclose nothing",
			Hint:   "give the radius that the notch is made with, or the opening angle of a sharp one",
		}
	case r == 0:
		return notBelow("angle", angle, "half width of the notch/D", half, D)
	case !hasFlanks(h, r, angle):
		return nil
	}
	if err := notBelow("angle", angle, "root arc/length", r*radians(180-angle), D+2*half); err != nil {
		return err
	}
	flank := (h - flankStart(r, angle)) / math.Cos(radians(angle/2))
	return noSliver("r", r, "flank", flank, r, D, 2*half)
}

func radians(degrees float64) float64 { return degrees * (math.Pi / 180) }

const (
	uNotchInstead = "parallel flanks, not the opening angle"
	uNotchUpper   = "an upper value: opening the flanks lowers the factor"
)
