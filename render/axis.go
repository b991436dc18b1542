package render

import (
	"math"
	"strconv"

	"notchproof/render/number"
)

// An axis maps values onto pixels along one direction of a plot.
type axis struct {
	low, high float64 // values at the ends
	from, to  float64 // pixels at the ends
	log       bool
	fine      bool // ruled finely
}

func (a axis) at(v float64) float64 {
	t := (v - a.low) / (a.high - a.low)
	if a.log {
		t = math.Log(v/a.low) / math.Log(a.high/a.low)
	}
	return a.from + t*(a.to-a.from)
}

// A mark is a labelled place on an axis.
type mark struct {
	value float64
	text  string
}

// marks gives round values: on a logarithmic axis the powers of ten, with
// multiples of each where there are few of them; on a straight one about as
// many as are wished for.
func (a axis) marks(wish int) []mark {
	if a.log {
		return a.powers()
	}
	step := roundStep((a.high - a.low) / float64(max(3, min(wish, 8))))
	decimals := max(0, -int(math.Floor(math.Log10(step)+1e-9)))
	if m := step * math.Pow(10, float64(decimals)); math.Abs(m-math.Round(m)) > 1e-6 {
		decimals++ // steps of 2.5
	}
	var list []mark
	for k := math.Ceil(a.low/step - 1e-9); k*step <= a.high+1e-9*step; k++ {
		list = append(list, mark{k * step, number.Decimal(k*step, min(decimals, number.MostDecimals))})
	}
	return list
}

func (a axis) powers() []mark {
	decades := math.Log10(a.high / a.low)
	digits := []float64{1}
	switch {
	case decades < 1, a.fine && decades < 2.5:
		digits = []float64{1, 2, 3, 4, 6, 8}
	case decades < 2.5:
		digits = []float64{1, 2, 5}
	}
	every := max(1, int(math.Ceil(decades/7)))
	var list []mark
	for e := int(math.Floor(math.Log10(a.low))); e <= int(math.Ceil(math.Log10(a.high))); e++ {
		if e%every != 0 {
			continue
		}
		for _, d := range digits {
			if v := d * math.Pow(10, float64(e)); v >= a.low*(1-1e-9) && v <= a.high*(1+1e-9) {
				list = append(list, mark{v, powerText(d, e)})
			}
		}
	}
	return list
}

// powerText writes d × 10^e: plain numbers where they are short.
func powerText(d float64, e int) string {
	switch {
	case e >= 0 && e <= 5:
		return number.Count(int(math.Round(d * math.Pow(10, float64(e)))))
	case e >= -2 && e < 0:
		return number.Decimal(d*math.Pow(10, float64(e)), -e)
	}
	text := "10" + superscript(e)
	if d != 1 {
		text = strconv.Itoa(int(d)) + "×" + text
	}
	return text
}

func superscript(n int) string {
	digits := []rune("⁰¹²³⁴⁵⁶⁷⁸⁹")
	var out []rune
	for _, c := range strconv.Itoa(n) {
		if c == '-' {
			out = append(out, '⁻')
		} else {
			out = append(out, digits[c-'0'])
		}
	}
	return string(out)
}

// around widens a range of values to an axis: by a share of its length on both
// sides, or by as much about a single value.
func around(low, high, share float64, log bool) (float64, float64) {
	if log {
		ratio := math.Pow(high/low, share)
		if high < 4*low { // room for at least one round value
			ratio = math.Max(ratio, 1.25)
		}
		return low / ratio, high * ratio
	}
	length := high - low
	if length <= 0 {
		length = math.Max(math.Abs(high), 1e-300) * 1e-6
	}
	return low - share*length, high + share*length
}
