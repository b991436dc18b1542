package render

import (
	"encoding/binary"
	"image"
	"image/color"
	"math"
	"slices"
)

// A sheet has few colours that matter: paper, inks and the tones of a ramp; the
// thousands of others are edges softened over them, a pixel here and there. With
// 256 of them a file is a third as large and written in half the time, and no
// pixel is off by more than can be seen.

// paletted gives an image in 256 colours, or nil where these would not do.
func paletted(im *image.RGBA) *image.Paletted {
	ids, colours := numbered(im)
	if ids == nil {
		return nil
	}
	chosen := choose(colours)
	nearest := make([]uint8, len(colours))
	const piece = 256
	concurrently((len(colours)+piece-1)/piece, func() func(i int) {
		return func(i int) {
			for k := i * piece; k < min((i+1)*piece, len(colours)); k++ {
				nearest[k] = chosen.nearest(colours[k].rgb)
			}
		}
	})
	for k, c := range colours {
		if chosen.gap(nearest[k], c.rgb) > mostOff {
			return nil
		}
	}
	out := image.NewPaletted(im.Rect, chosen.palette())
	for i, id := range ids {
		out.Pix[i] = nearest[id]
	}
	return out
}

// mostOff is how far a single pixel's red, green or blue may be off, of 255.
// Edges of lines have such pixels; none is more than a pixel wide.
const mostOff = 40

// A counted colour is one of an image with the number of its pixels.
type counted struct {
	rgb    [3]uint8
	key    uint32 // the same in one number
	count  int
	smooth int // of these, those whose left neighbour is alike
}

// numbered numbers the colours of an image in the order in which they come; ids
// are nil where there are too many.
func numbered(im *image.RGBA) (ids []uint16, colours []counted) {
	const most = 1 << 15
	const slots = 1 << 17
	table := make([]uint16, slots) // number + 1 by hash
	ids = make([]uint16, len(im.Pix)/4)
	last, id := uint32(0), -1
	for i := range ids {
		key := binary.LittleEndian.Uint32(im.Pix[4*i:]) & 0xffffff
		if key != last || id < 0 {
			h := (key * 2654435769) >> 15 // the golden ratio of 2^32
			for table[h] != 0 && colours[table[h]-1].key != key {
				h = (h + 1) % slots
			}
			if table[h] == 0 {
				if len(colours) == most {
					return nil, nil
				}
				colours = append(colours, counted{rgb: [3]uint8{uint8(key), uint8(key >> 8), uint8(key >> 16)}, key: key})
				table[h] = uint16(len(colours))
			}
			if near := int(table[h]) - 1; id < 0 || alike(key, last) {
				colours[near].smooth++
			}
			last, id = key, int(table[h])-1
		} else {
			colours[id].smooth++
		}
		colours[id].count++
		ids[i] = uint16(id)
	}
	return ids, colours
}

// alike tells whether two colours differ by four levels at most, as neighbours
// on a surface do.
func alike(a, b uint32) bool {
	for range 3 {
		if d := int(a&0xff) - int(b&0xff); d > 4 || d < -4 {
			return false
		}
		a, b = a>>8, b>>8
	}
	return true
}

// A choice of colours.
type choice [][3]uint8

const (
	mostColours = 256
	// Colours of so many pixels beside their like are surfaces; the others are
	// edges.
	surfacePixels = 16
	surfaceShare  = 200 // of the palette, at most; the rest is for edges
)

// choose takes the colours of surfaces, thinned out evenly until they fit, and
// then whatever is farthest from them.
func choose(colours []counted) choice {
	order := make([]int, len(colours))
	for i := range order {
		order[i] = i
	}
	slices.SortStableFunc(order, func(a, b int) int { return colours[b].smooth - colours[a].smooth })
	if len(colours) <= mostColours {
		var c choice
		for _, i := range order {
			c = append(c, colours[i].rgb)
		}
		return c
	}
	for apart := 0; ; apart++ {
		if c, ok := thinned(colours, order, apart); ok {
			return c.spread(colours)
		}
	}
}

// thinned leaves out colours of surfaces that are within a distance of a
// commoner one; ok is false where too many are left.
func thinned(colours []counted, order []int, apart int) (c choice, ok bool) {
	for n, i := range order {
		if n > 0 && colours[i].smooth < surfacePixels {
			break
		}
		if rgb := colours[i].rgb; c.least(rgb) > apart {
			if len(c) == surfaceShare {
				return nil, false
			}
			c = append(c, rgb)
		}
	}
	return c, true
}

// least is the smallest gap to any of the colours.
func (c choice) least(rgb [3]uint8) int {
	r, g, b := int(rgb[0]), int(rgb[1]), int(rgb[2])
	least := math.MaxInt
	for i := range c {
		p := &c[i]
		dr, dg, db := int(p[0])-r, int(p[1])-g, int(p[2])-b
		least = min(least, max(dr, -dr, dg, -dg, db, -db))
	}
	return least
}

// spread adds, time and again, the colour that is farthest from all chosen.
func (c choice) spread(colours []counted) choice {
	gaps := make([]int, len(colours))
	const piece = 256
	concurrently((len(gaps)+piece-1)/piece, func() func(i int) {
		return func(i int) {
			for k := i * piece; k < min((i+1)*piece, len(gaps)); k++ {
				gaps[k] = c.least(colours[k].rgb)
			}
		}
	})
	for len(c) < mostColours {
		far := 0
		for i, g := range gaps {
			if g > gaps[far] {
				far = i
			}
		}
		if gaps[far] == 0 {
			break
		}
		c = append(c, colours[far].rgb)
		for i := range gaps {
			gaps[i] = min(gaps[i], c.gap(uint8(len(c)-1), colours[i].rgb))
		}
	}
	return c
}

// gap is the largest difference in red, green or blue.
func (c choice) gap(i uint8, rgb [3]uint8) int {
	most := 0
	for k, v := range c[i] {
		d := int(v) - int(rgb[k])
		most = max(most, d, -d)
	}
	return most
}

func (c choice) nearest(rgb [3]uint8) uint8 {
	best, least := 0, math.MaxInt
	r, g, b := int(rgb[0]), int(rgb[1]), int(rgb[2])
	for i := range c {
		p := &c[i]
		dr, dg, db := int(p[0])-r, int(p[1])-g, int(p[2])-b
		if d := 2*dr*dr + 4*dg*dg + db*db; d < least { // the eye's weights, roughly: common practice
			best, least = i, d
		}
	}
	return uint8(best)
}

func (c choice) palette() color.Palette {
	p := make(color.Palette, len(c))
	for i, v := range c {
		p[i] = color.RGBA{v[0], v[1], v[2], 255}
	}
	return p
}
