package misreading

import "fmt"

// chart: the claim is what a chart for this very case gives, and the chart is
// wrong. No slip of the reader's; said first because nothing else need be
// looked for.
func chart(q *Question) []wrong {
	var list []wrong
	for _, v := range q.handbook() {
		if v.InRange {
			list = append(list, wrong{
				what:  fmt.Sprintf("no slip: read well from %s, which is itself off here", v.ID),
				known: []value{{v.Factor, v.ID}},
			})
		}
	}
	return list
}

// outsideRange: a fit for this case used where its source does not cover it.
func outsideRange(q *Question) []wrong {
	var list []wrong
	for _, v := range q.handbook() {
		if !v.InRange {
			list = append(list, wrong{
				what:  fmt.Sprintf("%s used outside its range", v.ID),
				known: []value{{v.Factor, v.ID}},
			})
		}
	}
	return list
}
