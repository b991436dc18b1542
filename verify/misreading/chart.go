package misreading

// chart: the claim is what a chart for this very case gives, and the chart is
// wrong. No slip of the reader's; said first because nothing else need be
// looked for.
func chart(q *Question) []wrong {
	var list []wrong
	for _, v := range q.handbook() {
		if v.InRange {
			list = append(list, wrong{
				what:  "no slip: read well off a chart that is itself off here",
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
				what:  "a chart used outside its range",
				known: []value{{v.Factor, v.ID}},
			})
		}
	}
	return list
}
