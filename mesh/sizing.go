package mesh

import "gonum.org/v1/gonum/spatial/r2"

// Sizing says how large the triangles' edges should be. The size wished for
// at a point is the least over all wishes of (its size + Growth × distance to
// it), never above Largest. The zero value wishes for nothing but a valid mesh
// of the default growth.
type Sizing struct {
	Largest float64    // longest edge anywhere; 0: no limit
	Growth  float64    // increase of size per unit of distance; 0: 0.5
	Sides   []SideWish // sizes along whole sides
	Spots   []SpotWish // sizes at points
}

// A SideWish asks for a size along one side of the region. Where both fields
// are given the smaller size holds.
type SideWish struct {
	Side       int     // index in Region.Sides()
	Size       float64 // edge length along the side; 0: none asked
	PerQuarter float64 // edges per 90° of turning of the curve; 0: none asked
}

// A SpotWish asks for a size at one point.
type SpotWish struct {
	At   r2.Vec
	Size float64
}
