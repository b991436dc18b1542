package render

import "math"

// between are the places of the finer lines of an axis that values are read off
// from: about a fifth of the distance of its marks, or on a logarithmic axis all
// multiples of the powers of ten.
func (a axis) between(marks []mark) (places []float64) {
	switch {
	case !a.fine || len(marks) < 2:
		return nil
	case a.log:
		return a.multiples()
	}
	step := marks[1].value - marks[0].value
	parts := 5.0
	if lead := step / math.Pow(10, math.Floor(math.Log10(step)+1e-9)); math.Abs(lead-2) < 1e-6 {
		parts = 4
	}
	step /= parts
	for k := math.Ceil(a.low/step - 1e-9); k*step <= a.high+1e-9*step; k++ {
		places = append(places, k*step)
	}
	return places
}

func (a axis) multiples() (places []float64) {
	for e := math.Floor(math.Log10(a.low)); e <= math.Ceil(math.Log10(a.high)); e++ {
		for _, d := range [...]float64{1, 1.5, 2, 2.5, 3, 3.5, 4, 4.5, 5, 6, 7, 8, 9} {
			if v := d * math.Pow(10, e); v >= a.low && v <= a.high {
				places = append(places, v)
			}
		}
	}
	return places
}

// ruleFinely draws the finer lines, fainter than those of the marks.
func (p *panel) ruleFinely(xs, ys []mark) {
	p.pen(hatch, narrow)
	for _, v := range p.y.between(ys) {
		p.line(point{p.frame.X0, p.y.at(v)}, point{p.frame.X1, p.y.at(v)})
	}
	for _, v := range p.x.between(xs) {
		p.line(point{p.x.at(v), p.frame.Y0}, point{p.x.at(v), p.frame.Y1})
	}
}
