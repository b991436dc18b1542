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

// rampCurve is the path through the space of colours, t from 0 (light) to 1.
// Its speed is not yet even.
func rampCurve(t float64) oklab {
	swell := math.Sin(math.Pi * math.Pow(t, 0.85))
	return polar(lightEnd+t*(darkEnd-lightEnd), chromaEnds+chromaSwell*swell, hueStart+hueTurn*t)
}

// rampTable walks the curve in steps of equal length, so that equal steps of
// stress look equal.
var rampTable = sync.OnceValue(func() *[rampSteps + 1]color.RGBA {
	const fine = 8 * rampSteps
	var along [fine + 1]float64
	for i := 1; i <= fine; i++ {
		along[i] = along[i-1] + rampCurve(float64(i)/fine).distance(rampCurve(float64(i-1)/fine))
	}
	table := new([rampSteps + 1]color.RGBA)
	k := 0
	for i := range table {
		want := along[fine] * float64(i) / rampSteps
		for k < fine && along[k+1] < want {
			k++
		}
		t := float64(k)
		if k < fine && along[k+1] > along[k] {
			t += (want - along[k]) / (along[k+1] - along[k])
		}
		table[i] = rampCurve(t / fine).rgba()
	}
	return table
})

// tone gives the colour of a value between 0 and 1; what is beyond takes the
// end of the ramp.
func tone(v float64) color.RGBA {
	return rampTable()[int(math.Round(math.Max(0, math.Min(1, v))*rampSteps))]
}

// over is the ink for lines and lettering on top of a tone: black or white,
// whichever has the higher contrast. By the ratio of WCAG 2.1 both are equal,
// at 4.6 : 1, on a tone of 0.179 of white's luminance.
func over(v float64) color.NRGBA {
	c := tone(v)
	luminance := 0.2126*decode(c.R) + 0.7152*decode(c.G) + 0.0722*decode(c.B)
	if luminance < 0.179 {
		return color.NRGBA{255, 255, 255, 255}
	}
	return color.NRGBA{0, 0, 0, 255}
}
