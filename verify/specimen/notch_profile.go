package specimen

import "math"

// A notchProfile is a notch seen along the part: a root arc of radius r,
// tangent to flanks that open by the angle 2·slope, or so shallow that the
// surface cuts the arc off before any flank begins.
type notchProfile struct {
	depth, radius float64
	rootHalf      float64 // half width of the root arc
	rootRise      float64 // height of its ends above the bottom
	half          float64 // half width at the surface
}

// newNotchProfile fits a notch of an opening angle in degrees into a part of
// the given length. Flanks shorter than a sliver of it are not drawn.
func newNotchProfile(depth, radius, degrees, length float64) notchProfile {
	slope := degrees / 2 * math.Pi / 180
	n := notchProfile{depth: depth, radius: radius}
	n.rootRise = radius * (1 - math.Sin(slope))
	n.rootHalf = radius * math.Cos(slope)
	n.half = n.rootHalf + (depth-n.rootRise)*math.Tan(slope)
	if depth-n.rootRise < sliver*length*math.Cos(slope) {
		n.radius = math.Max(radius, depth)
		n.rootRise = depth
		n.rootHalf, _ = cutArc(depth, n.radius)
		n.half = n.rootHalf
	}
	return n
}

// draw goes from the surface, at the right of the notch, over its bottom at the
// height bottom to the surface at its left, and tells the side of the root.
func (n notchProfile) draw(t *trace, bottom float64) int {
	surface, flanks := t.at.Y, n.rootRise < n.depth
	if flanks {
		t.line("right flank", n.rootHalf, bottom+n.rootRise)
	}
	root := noSide
	if n.radius > 0 {
		root = t.arc("root", -n.rootHalf, t.at.Y, 0, bottom+n.radius)
	}
	if flanks {
		t.line("left flank", -n.half, surface)
	}
	return root
}

// net is where the net section is cut for the balance of forces: close to the
// middle, beside the mesh points that symmetry likes to put there.
func (n notchProfile) net() float64 {
	if n.radius == 0 {
		return 0.23 * n.half // a mesh that is graded to a sharp root has its points closer to it
	}
	return 0.23 * n.rootHalf
}
