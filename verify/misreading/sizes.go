package misreading

import "notchproof/scf"

// sizes: the large size, the net size and the depth taken for one another.
func sizes(q *Question) []wrong {
	if q.Part.Family == nil {
		return nil
	}
	d := q.Part.Dims
	var list []wrong
	change := func(what string, dims scf.Dims) {
		list = append(list, wrong{what: what, family: q.Part.Family, dims: q.given(dims), load: q.Load.Name, options: q.Part.Options})
	}
	switch D, net := d["D"], d["d"]; {
	case has(d, "a"):
		change("semi-axes of the hole exchanged, a/b inverted", scf.Dims{"a": d["b"], "b": d["a"]})
	case has(d, "W"):
		change("net width taken for the diameter of the hole", scf.Dims{"d": d["W"] - d["d"]})
		change("width of the bar taken for half of it", scf.Dims{"W": 2 * d["W"]})
	case q.Part.Family.Name == "bar-edge-notch":
		change("depth of the notch taken for the net width", scf.Dims{"d": D - net})
		change("r/D read as r/d", scaledRoot(d, net/D))
	default:
		change("r/D read as r/d", scaledRoot(d, net/D))
		change("depth taken for the net size", scf.Dims{"d": (D - net) / 2})
		change("step on one side taken for D − d", scf.Dims{"D": (D + net) / 2})
		change("D − d taken for the step on one side", scf.Dims{"D": 2*D - net})
		// (D' − d)/D' = (D − d)/d, the charts' x with the wrong size below.
		change("D/d inverted: the step referred to d instead of D", scf.Dims{"D": net / (2 - D/net)})
	}
	return list
}
