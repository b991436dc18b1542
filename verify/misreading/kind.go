package misreading

import (
	"fmt"

	"notchproof/scf"
)

// alike are the families that a flat bar and a round shaft have in common.
var alike = [][2]string{
	{"bar-shoulder", "shaft-shoulder"},
	{"bar-notch", "shaft-groove"},
	{"bar-collar", "shaft-collar"},
}

// otherKind: the chart of the flat bar for the round shaft, and the reverse.
func otherKind(q *Question) []wrong {
	f := q.Part.Family
	if f == nil {
		return nil
	}
	for _, pair := range alike {
		for i, name := range pair {
			if name == f.Name {
				return q.inFamily(pair[1-i], fmt.Sprintf("a %s instead of the %s", kindName(1-i), kindName(i)), q.given(nil))
			}
		}
	}
	return nil
}

func kindName(i int) string {
	if i == 0 {
		return "flat bar"
	}
	return "round shaft"
}

// inFamily asks the question of another family, where that carries the load.
func (q *Question) inFamily(name, what string, dims scf.Dims) []wrong {
	f, ok := scf.Lookup(name)
	if !ok {
		panic("misreading: no such family")
	}
	if !f.Carries(q.Load.Name) {
		return nil
	}
	return []wrong{{what: what, family: f, dims: dims, load: q.Load.Name, options: q.Part.Options}}
}
