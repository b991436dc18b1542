package tolerance

import (
	"strconv"
	"strings"
)

// Place says in words where a point lies: "r +0.2, d −0.05".
func (q *Question) Place(p *Point) string {
	if p.Levels == nil {
		return "the part as drawn"
	}
	var words []string
	for i, d := range q.Deviations {
		words = append(words, d.Name+" "+signed(d.at(p.Levels[i])))
	}
	return strings.Join(words, ", ")
}

// signed writes a deviation with its sign, as drawings do.
func signed(x float64) string {
	text := strconv.FormatFloat(x, 'g', 6, 64)
	switch {
	case x > 0:
		return "+" + text
	case x < 0:
		return "−" + text[1:]
	}
	return "0"
}
