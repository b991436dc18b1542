package render

import (
	"image/color"
	"math"
)

// oklab is a colour in a space where equal distances look about equal: L is
// lightness from 0 (black) to 1 (white), A runs from green to red, B from blue
// to yellow. (B. Ottosson, "A perceptual color space for image processing",
// 2020; matrices from memory, held against CIELAB by the tests.)
type oklab struct{ L, A, B float64 }

// polar gives a colour by lightness, chroma and hue in degrees.
func polar(l, chroma, hue float64) oklab {
	sin, cos := math.Sincos(hue * math.Pi / 180)
	return oklab{l, chroma * cos, chroma * sin}
}

// linear gives red, green and blue light of the sRGB primaries, in gamut when
// all are between 0 and 1.
func (c oklab) linear() [3]float64 {
	cube := func(v float64) float64 { return v * v * v }
	l := cube(c.L + 0.3963377774*c.A + 0.2158037573*c.B)
	m := cube(c.L - 0.1055613458*c.A - 0.0638541728*c.B)
	s := cube(c.L - 0.0894841775*c.A - 1.2914855480*c.B)
	return [3]float64{
		+4.0767416621*l - 3.3077115913*m + 0.2309699292*s,
		-1.2684380046*l + 2.6097574011*m - 0.3413193965*s,
		-0.0041960863*l - 0.7034186147*m + 1.7076147010*s,
	}
}

// rgba gives the nearest colour of a screen.
func (c oklab) rgba() color.RGBA {
	var v [3]uint8
	for i, light := range c.linear() {
		v[i] = uint8(math.Round(255 * encode(math.Max(0, math.Min(1, light)))))
	}
	return color.RGBA{v[0], v[1], v[2], 255}
}

// encode is the sRGB transfer curve (IEC 61966-2-1).
func encode(light float64) float64 {
	if light <= 0.0031308 {
		return 12.92 * light
	}
	return 1.055*math.Pow(light, 1/2.4) - 0.055
}

func (c oklab) distance(o oklab) float64 {
	return math.Sqrt((c.L-o.L)*(c.L-o.L) + (c.A-o.A)*(c.A-o.A) + (c.B-o.B)*(c.B-o.B))
}

// decode is the inverse of encode for a screen's 8 bits.
func decode(v uint8) float64 {
	c := float64(v) / 255
	if c <= 0.04045 {
		return c / 12.92
	}
	return math.Pow((c+0.055)/1.055, 2.4)
}
