package mesh

import (
	"math/bits"
	"slices"

	"gonum.org/v1/gonum/spatial/r2"
)

// insertionOrder gives an order of the points in which each is near the one
// before it, in rounds that double in size, so that the walks are short and no
// input makes the cavities large: a biased randomised insertion order (Amenta,
// Choi and Rote 2003), sorted along a Hilbert curve within each round. The
// points' rounds come from a fixed sequence: the same points always give the
// same order.
func insertionOrder(points []r2.Vec, box r2.Box) []int32 {
	type key struct {
		place uint64
		i     int32
	}
	keys := make([]key, len(points))
	size := extentOf(box)
	state := uint64(0x9e3779b97f4a7c15)
	for i, p := range points {
		state ^= state << 13 // Marsaglia's xorshift, 2003
		state ^= state >> 7
		state ^= state << 17
		round := min(bits.TrailingZeros64(state), 15)
		const cells = 1<<24 - 1
		x := uint64((p.X - box.Min.X) / size * cells)
		y := uint64((p.Y - box.Min.Y) / size * cells)
		keys[i] = key{uint64(15-round)<<48 | hilbert(x, y), int32(i)}
	}
	slices.SortFunc(keys, func(a, b key) int {
		switch {
		case a.place < b.place:
			return -1
		case a.place > b.place:
			return 1
		}
		return int(a.i) - int(b.i)
	})
	order := make([]int32, len(points))
	for k := range keys {
		order[k] = keys[k].i
	}
	return order
}

// hilbert gives the position along the Hilbert curve of a cell of a 2²⁴×2²⁴ grid.
func hilbert(x, y uint64) uint64 {
	var d uint64
	for s := uint64(1) << 23; s > 0; s >>= 1 {
		var rx, ry uint64
		if x&s != 0 {
			rx = 1
		}
		if y&s != 0 {
			ry = 1
		}
		d = d<<2 | (3*rx ^ ry)
		if ry == 0 {
			if rx == 1 {
				x, y = 1<<24-1-x, 1<<24-1-y
			}
			x, y = y, x
		}
	}
	return d
}
