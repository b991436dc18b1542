package render

import (
	"image/color"
	"math"
	"sync"
)

// The ramp of the field is a wash of ink that grows denser: lightness falls in
// one straight line, which is what survives grey print and every kind of colour
// blindness; the hue turns a third of the circle from a greenish paper tone
// through petrol to violet black, which tells neighbouring tones apart where
// lightness alone would not; chroma swells in between and fades at both ends,
// where the screen has none to give. The turn is in blue and green, so that the
// red of the quills stands off it.
const (
	lightEnd, darkEnd = 0.962, 0.235 // lightness
	hueStart, hueTurn = 165, 125     // degrees
	chromaEnds        = 0.018
	chromaSwell       = 0.095
	rampSteps         = 1024
)

// A ramp takes values to tones. Where a field has a sign the lightness falls
// in the same straight line from the lowest value, through zero, to the highest,
// or the other way round where the lowest is the larger: one tone is one value in grey print too, which no ramp that darkens both ways
// can say. On top of that the hue turns from sand through green, at zero, to
// petrol and violet, and the zero line is drawn.
type ramp struct {
	low, high float64
	table     *rampTable
}

type rampTable [rampSteps + 1]color.RGBA

// newRamp gives the ramp from a low to a high value, low ≤ 0 ≤ high, not both 0.
func newRamp(low, high float64) *ramp {
	if low == 0 {
		return &ramp{0, high, plainRamp()}
	}
	if -low > high {
		// Mostly below zero: dark is what is large, so that the plain part of the
		// sheet stays paper.
		table := new(rampTable)
		for i, c := range newRamp(-high, -low).table {
			table[rampSteps-i] = c
		}
		return &ramp{low, high, table}
	}
	table, zero := new(rampTable), -low/(high-low)
	curve := func(t float64) oklab { return signedCurve(t, zero) }
	table.walk(curve, 0, zero)
	table.walk(curve, zero, 1)
	return &ramp{low, high, table}
}

// tone gives the colour of a value; what is beyond takes the end of the ramp.
func (r *ramp) tone(v float64) color.RGBA {
	t := (v - r.low) / (r.high - r.low)
	switch {
	case !(t > 0): // and what is no number
		return r.table[0]
	case t >= 1:
		return r.table[rampSteps]
	}
	return r.table[int(t*rampSteps+0.5)]
}

// over is the ink for lines and lettering on top of a value's tone.
func (r *ramp) over(v float64) color.NRGBA { return inkOver(r.tone(v)) }

// rampCurve is the path through the space of colours, t from 0 (light) to 1.
// Its speed is not yet even.
func rampCurve(t float64) oklab {
	swell := math.Sin(math.Pi * math.Pow(t, 0.85))
	return polar(lightEnd+t*(darkEnd-lightEnd), chromaEnds+chromaSwell*swell, hueStart+hueTurn*t)
}

// signedCurve is the path with zero at a share of it: the hue turns from sand
// to green below zero, from green to violet above.
func signedCurve(t, zero float64) oklab {
	// A short side turns by less: the hue never goes faster than over a third,
	// or over half, of the ramp.
	const green, toSand, toViolet = 150, 78, 140 // degrees
	hue := green - toSand*math.Min(1, 3*zero)*(zero-t)/zero
	if t > zero {
		hue = green + toViolet*math.Min(1, 2*(1-zero))*(t-zero)/(1-zero)
	}
	c := rampCurve(t)
	const chroma = 0.7 // of the plain ramp's: what is near zero is no news
	return polar(c.L, chroma*math.Hypot(c.A, c.B), hue)
}

// plainRamp walks the curve of fields without a sign.
var plainRamp = sync.OnceValue(func() *rampTable {
	table := new(rampTable)
	table.walk(rampCurve, 0, 1)
	return table
})

// walk goes along a piece of a curve in steps of equal length, so that equal
// steps of stress look equal.
func (table *rampTable) walk(curve func(t float64) oklab, from, to float64) {
	const fine = 4 * rampSteps
	piece := func(i float64) oklab { return curve(from + (to-from)*i/fine) }
	along := make([]float64, fine+1)
	last := piece(0)
	for i := 1; i <= fine; i++ {
		c := piece(float64(i))
		along[i] = along[i-1] + c.distance(last)
		last = c
	}
	k := 0
	for i := int(math.Ceil(from * rampSteps)); i <= int(to*rampSteps); i++ {
		want := along[fine] * (float64(i)/rampSteps - from) / (to - from)
		for k < fine && along[k+1] < want {
			k++
		}
		t := float64(k)
		if k < fine && along[k+1] > along[k] {
			t += (want - along[k]) / (along[k+1] - along[k])
		}
		table[i] = piece(t).rgba()
	}
}

// tone gives the colour of a value between 0 and 1 on the plain ramp.
func tone(v float64) color.RGBA { return newRamp(0, 1).tone(v) }

// over is the ink on top of that tone.
func over(v float64) color.NRGBA { return inkOver(tone(v)) }

// inkOver is black or white, whichever has the higher contrast to a tone. By
// the ratio of WCAG 2.1 both are equal, at 4.6 : 1, on a tone of 0.179 of
// white's luminance.
func inkOver(c color.RGBA) color.NRGBA {
	luminance := 0.2126*decode(c.R) + 0.7152*decode(c.G) + 0.0722*decode(c.B)
	if luminance < 0.179 {
		return color.NRGBA{255, 255, 255, 255}
	}
	return color.NRGBA{0, 0, 0, 255}
}
