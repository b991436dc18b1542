package specimen

import (
	"math"

	"gonum.org/v1/gonum/spatial/r2"

	"notchproof/mesh/outline"
)

// findJoints lists the ends of notch sides where the curvature of the boundary
// jumps or the boundary has a corner, in the order of the sides.
func findJoints(region *outline.Region, notch []int) []Joint {
	on := make(map[int]bool, len(notch))
	for _, side := range notch {
		on[side] = true
	}
	var joints []Joint
	first := 0
	for _, loop := range append([]outline.Loop{region.Outer}, region.Holes...) {
		for i, side := range loop {
			k := (i + len(loop) - 1) % len(loop)
			if !on[first+i] && !on[first+k] {
				continue
			}
			if j, jumps := jointBetween(loop[k].Curve, side.Curve); jumps {
				joints = append(joints, j)
			}
		}
		first += len(loop)
	}
	return joints
}

// jointBetween looks at the point where one curve hands over to the next.
// Changes within a millionth are rounding, not shape.
func jointBetween(before, after outline.Curve) (j Joint, jumps bool) {
	const slack = 1e-6
	a, b := outline.Curvature(before, 1), outline.Curvature(after, 0)
	turn := angleBetween(before.Deriv(1), after.Deriv(0))
	sharper := math.Max(math.Abs(a), math.Abs(b))
	if math.Abs(a-b) <= slack*sharper && math.Abs(turn) <= slack {
		return j, false
	}
	return Joint{At: after.At(0), Radius: 1 / sharper}, sharper > 0
}

// angleBetween is the turn from u to v, positive to the left.
func angleBetween(u, v r2.Vec) float64 { return math.Atan2(r2.Cross(u, v), r2.Dot(u, v)) }
