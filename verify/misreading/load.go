package misreading

import "fmt"

// otherLoad: the chart or result of the same part under another load.
func otherLoad(q *Question) []wrong {
	var list []wrong
	for i := range q.Part.Loads {
		l := &q.Part.Loads[i]
		if l.Name == q.Load.Name {
			continue
		}
		list = append(list, wrong{
			what: fmt.Sprintf("%s read for %s", l.Name, q.Load.Name),
			part: q.Part, load: l.Name,
		})
	}
	return list
}
