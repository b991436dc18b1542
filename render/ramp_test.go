package render

import (
	"image/color"
	"math"
	"testing"
)

// The tests measure the ramp in CIELAB (CIE 1976, white D65), another space
// than the one it was built in.

func lightOf(c color.RGBA) [3]float64 { return [3]float64{decode(c.R), decode(c.G), decode(c.B)} }

// cielab takes linear sRGB light (primaries of IEC 61966-2-1) to L*, a*, b*.
func cielab(c [3]float64) [3]float64 {
	x := (0.4124*c[0] + 0.3576*c[1] + 0.1805*c[2]) / 0.9505
	y := 0.2126*c[0] + 0.7152*c[1] + 0.0722*c[2]
	z := (0.0193*c[0] + 0.1192*c[1] + 0.9505*c[2]) / 1.0890
	f := func(t float64) float64 {
		if t > 216./24389 {
			return math.Cbrt(t)
		}
		return (24389./27*t + 16) / 116
	}
	return [3]float64{116*f(y) - 16, 500 * (f(x) - f(y)), 200 * (f(y) - f(z))}
}

func difference(a, b [3]float64) float64 {
	return math.Sqrt((a[0]-b[0])*(a[0]-b[0]) + (a[1]-b[1])*(a[1]-b[1]) + (a[2]-b[2])*(a[2]-b[2]))
}

// dichromat simulates how a colour looks without the long (protanopia) or the
// middle (deuteranopia) cones. (Viénot, Brettel & Mollon, Color Research and
// Application 24 (1999) 243; matrices from memory.)
func dichromat(c [3]float64, protan bool) [3]float64 {
	l := 17.8824*c[0] + 43.5161*c[1] + 4.11935*c[2]
	m := 3.45565*c[0] + 27.1554*c[1] + 3.86714*c[2]
	s := 0.0299566*c[0] + 0.184309*c[1] + 1.46709*c[2]
	if protan {
		l = 2.02344*m - 2.52581*s
	} else {
		m = 0.494207*l + 1.24827*s
	}
	return [3]float64{
		max(0, 0.0809444479*l-0.130504409*m+0.116721066*s),
		max(0, -0.0102485335*l+0.0540193266*m-0.113614708*s),
		max(0, -0.000365296938*l-0.00412161469*m+0.693511405*s),
	}
}

const rampSamples = 33

// ramps are the ramp of fields without a sign and those of fields with one, zero
// anywhere.
func ramps() map[string]*ramp {
	return map[string]*ramp{
		"plain": newRamp(0, 2.1), "even": newRamp(-1.8, 1.8), "little below": newRamp(-0.1, 2.3), "little above": newRamp(-3, 0.2),
		"third below": newRamp(-1, 2),
	}
}

// sampledRamp goes from the end that is light, the smaller one, to the dark one.
func sampledRamp(r *ramp) (light [rampSamples][3]float64) {
	from, to := lightToDark(r)
	for i := range light {
		light[i] = lightOf(r.tone(from + (to-from)*float64(i)/(rampSamples-1)))
	}
	return light
}

func lightToDark(r *ramp) (from, to float64) {
	if -r.low > r.high {
		return r.high, r.low
	}
	return r.low, r.high
}

// Equal steps of value look about equally large: no step differs from the mean
// by more than 40 % in CIELAB, which is the disagreement between the two spaces
// more than the ramp's own. Where the hue turns at zero it may be half.
func TestRampIsEven(t *testing.T) {
	for name, r := range ramps() {
		ramp := sampledRamp(r)
		off := 0.4
		if r.low < 0 {
			off = 0.5
		}
		mean := 0.0
		steps := make([]float64, rampSamples-1)
		for i := range steps {
			steps[i] = difference(cielab(ramp[i]), cielab(ramp[i+1]))
			mean += steps[i] / float64(len(steps))
		}
		for i, d := range steps {
			if d < (1-off)*mean || d > (1+off)*mean {
				t.Errorf("%s: step %d to %d looks %.2f wide, the mean is %.2f", name, i, i+1, d, mean)
			}
		}
		if whole := cielab(ramp[0])[0] - cielab(ramp[rampSamples-1])[0]; whole < 75 {
			t.Errorf("%s: lightness spans only %.1f of 100", name, whole)
		}
	}
}

// Lightness falls all the way, for full sight and for both kinds of red-green
// blindness, and no sample falls by less than half of the even step.
func TestRampLightnessFalls(t *testing.T) {
	sights := map[string]func([3]float64) [3]float64{
		"full sight":   func(c [3]float64) [3]float64 { return c },
		"protanopia":   func(c [3]float64) [3]float64 { return dichromat(c, true) },
		"deuteranopia": func(c [3]float64) [3]float64 { return dichromat(c, false) },
	}
	for kind, r := range ramps() {
		ramp := sampledRamp(r)
		for name, sight := range sights {
			first, last := cielab(sight(ramp[0]))[0], cielab(sight(ramp[rampSamples-1]))[0]
			even := (first - last) / (rampSamples - 1)
			for i := 1; i < rampSamples; i++ {
				fall := cielab(sight(ramp[i-1]))[0] - cielab(sight(ramp[i]))[0]
				if fall < even/2 {
					t.Errorf("%s, %s: lightness falls by %.2f from sample %d to %d, even would be %.2f", kind, name, fall, i-1, i, even)
				}
			}
		}
	}
}

// Zero has the tone that lies at its share of the ramp's lightness, so that grey
// print reads signed values too.
func TestZeroHasOneTone(t *testing.T) {
	for _, r := range ramps() {
		from, to := lightToDark(r)
		zero := -from / (to - from)
		want := lightEnd + zero*(darkEnd-lightEnd)
		linear := lightOf(r.tone(0))
		grey := cielab(linear)[0]
		c := oklab{L: want}
		if even := cielab(lightOf(c.rgba()))[0]; math.Abs(grey-even) > 4 {
			t.Errorf("zero at %.2f of the ramp has lightness %.1f, even would be %.1f", zero, grey, even)
		}
	}
}

// The curves stay inside what a screen can show, or clipping would bend them.
func TestRampInGamut(t *testing.T) {
	for _, zero := range []float64{0, 0.05, 0.3, 0.5, 0.9} {
		for i := range 101 {
			c := rampCurve(float64(i) / 100)
			if zero > 0 {
				c = signedCurve(float64(i)/100, zero)
			}
			for k, v := range c.linear() {
				if v < 0 || v > 1 {
					t.Errorf("zero at %g, %d %%: primary %d is %.4f", zero, i, k, v)
				}
			}
		}
	}
}

// Lettering on a tone has a contrast of at least 4.5 : 1 (the ratio that WCAG
// 2.1, 1.4.3, asks for body text).
func TestLetteringContrast(t *testing.T) {
	luminance := func(c [3]float64) float64 { return 0.2126*c[0] + 0.7152*c[1] + 0.0722*c[2] }
	for i := range 101 {
		v := float64(i) / 100
		o := over(v)
		a, b := luminance(lightOf(tone(v))), luminance(lightOf(color.RGBA{o.R, o.G, o.B, 255}))
		if ratio := (max(a, b) + 0.05) / (min(a, b) + 0.05); ratio < 4.5 {
			t.Errorf("at %d %%: contrast %.2f", i, ratio)
		}
	}
}
