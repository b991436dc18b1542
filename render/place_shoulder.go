package render

import (
	"gonum.org/v1/gonum/spatial/r2"

	"notchproof/render/number"
	"notchproof/scf"
)

// shoulderPlacements: both sizes at the broken ends, the fillet and a chamfer
// by leaders in the lower half.
func shoulderPlacements() []placement {
	return []placement{
		{Dim: "D", Kind: acrossLeft, At: func(g geometry) (a, b r2.Vec) {
			return r2.Vec{X: g.left, Y: g.d["D"] / 2}, r2.Vec{X: g.left, Y: -g.d["D"] / 2}
		}},
		{Dim: "d", Kind: acrossRight, At: func(g geometry) (a, b r2.Vec) {
			return r2.Vec{X: g.right, Y: g.d["d"] / 2}, r2.Vec{X: g.right, Y: -g.d["d"] / 2}
		}},
		{Dim: "r", Kind: leaderTo, At: radiusBelow("fillet"), Text: filletText},
		{Dim: "c", Kind: leaderTo, At: func(g geometry) (a, b r2.Vec) {
			mid := mirrored(g.side("chamfer").At(0.5))
			return mid, r2.Add(mid, r2.Vec{X: -0.5, Y: -1})
		}, Text: func(d scf.Dims) string { return number.Length(d["c"], "") + " × 45°" },
			Skip: func(d scf.Dims) bool { return d["c"] == 0 }},
	}
}

// filletText is the radius of a round fillet and both semi-axes of an elliptic
// one, the radial one first.
func filletText(d scf.Dims) string {
	if ra, r := d["ra"], d["r"]; ra != 0 && ra != r {
		return "ellipse r " + number.Length(r, "") + ", ra " + number.Length(ra, "")
	}
	return radiusText(d)
}
