package misreading

import (
	"fmt"

	"notchproof/scf"
)

// leftOut: a feature that was not looked at, such as the opening angle of a
// notch, the chamfer of a shoulder, the offset of a hole. Also the other force
// line of a bar that is notched on one side.
func leftOut(q *Question) []wrong {
	f := q.Part.Family
	if f == nil {
		return nil
	}
	var list []wrong
	for _, n := range f.Dimensions {
		v, given := q.Part.Given[n.Name]
		if !n.Optional || !given || v == f.Complete(without(q, n.Name))[n.Name] {
			continue
		}
		list = append(list, wrong{
			what:   fmt.Sprintf("%s left out of account", n.Meaning),
			family: f, dims: without(q, n.Name), load: q.Load.Name, options: q.Part.Options,
		})
	}
	if f.Name == "bar-edge-notch" && q.Load.Name == scf.Tension {
		list = append(list, otherLine(q))
	}
	return list
}

func without(q *Question, name string) scf.Dims {
	dims := q.given(nil)
	delete(dims, name)
	return dims
}

func otherLine(q *Question) wrong {
	o := q.Part.Options
	from, to := "net", scf.ForceLineGross
	if o.ForceLine == scf.ForceLineGross {
		from, to = "gross", scf.ForceLineNet
	}
	o.ForceLine = to
	return wrong{
		what:   fmt.Sprintf("force through the middle of the %s section, not of the %s one", to, from),
		family: q.Part.Family, dims: q.given(nil), load: q.Load.Name, options: o,
	}
}
