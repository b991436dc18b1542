package render

import "math"

// A unit of a picture's sheet is so large that the smallest lettering, 17
// units with capitals of 0.72 of that, has capitals of 1.6 mm.
const (
	unitMillimetres = 1.6 / (17 * 0.72)
	mostUnits       = 1600
	leastUnits      = 480
)

// usualDPI puts 1600 pixels on the width of A4.
const usualDPI = 190

const millimetresPerInch = 25.4

// unitsAcross is the width in units of a sheet of so many millimetres: wider
// sheets have larger letters, narrower ones fewer columns.
func unitsAcross(millimetres float64) float64 {
	return math.Round(math.Max(leastUnits, math.Min(mostUnits, millimetres/unitMillimetres)))
}

// A layout says where the parts of a picture stand, in units.
type layout struct {
	wide, high float64
	main       box // room for the part itself
	caption    point
	detail     point // centre of the magnified view
	radius     float64
	legend     box
	block      box
}

// The room around the part: above it for quills and letters, below for
// dimensions, beside it for dimension lines and loads.
const (
	roomAbove    = 112
	roomBelow    = 74
	roomBeside   = 165
	narrowBeside = 138
	mostHigh     = 400
	legendHigh   = 100
	captionHigh  = 40
)

// twoColumns is the least width that has the magnified view beside the title
// block.
const twoColumns = 1180

func columns(wide float64) int {
	if wide >= twoColumns {
		return 2
	}
	return 1
}

// blockWidth is the width of the title block on a sheet.
func blockWidth(wide float64) float64 {
	if columns(wide) == 2 {
		return math.Round(0.596 * wide)
	}
	return wide - 2*frameMargin
}

// partRoom is the room for a part that may be as high as the width allows.
func partRoom(wide float64) box {
	beside := float64(roomBeside)
	if columns(wide) == 1 {
		beside = narrowBeside
	}
	return box{beside, roomAbove, wide - beside, roomAbove + mostHigh}
}

// arrange lays a sheet out around a part that is drawn high units high, with
// rows of dimensions above it and below, and a title block of a height.
func arrange(wide, high float64, rows [2]int, block float64) layout {
	l := layout{wide: wide, main: partRoom(wide)}
	l.main.Y0 += dimensionRow * math.Max(0, float64(rows[0]))
	l.main.Y1 = l.main.Y0 + math.Round(high)
	top := l.main.Y1 + roomBelow + dimensionRow*math.Max(0, float64(rows[1]-1)) // of the lower part
	left := wide - frameMargin - blockWidth(wide)
	const side = 20
	if columns(wide) == 1 {
		l.radius = math.Min(200, (wide-2*frameMargin-200)/2)
		l.caption = point{frameMargin + side, top}
		l.detail = point{wide / 2, top + captionHigh + l.radius}
		under := l.detail.Y + l.radius + 30
		l.legend = box{frameMargin + side, under, wide - frameMargin - side, under + legendHigh}
		l.block = box{frameMargin, l.legend.Y1, wide - frameMargin, l.legend.Y1 + block}
		l.high = l.block.Y1 + frameMargin
		return l
	}
	l.radius = math.Min(222, (left-frameMargin-120)/2)
	lower := math.Max(legendHigh+block, captionHigh+2*l.radius+32)
	l.high = top + lower + frameMargin
	bottom := l.high - frameMargin
	l.caption = point{frameMargin + side, top}
	l.detail = point{(frameMargin+left)/2 - 24, (top + captionHigh + bottom) / 2}
	l.legend = box{left, top, wide - frameMargin - side, top + legendHigh}
	l.block = box{left, bottom - (lower - legendHigh), wide - frameMargin, bottom}
	return l
}
