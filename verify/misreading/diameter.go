package misreading

import "notchproof/scf"

// diameterForRadius: radius and diameter interchanged. Of a hole the diameter is the
// dimension, of an ellipse the semi-axes are.
func diameterForRadius(q *Question) []wrong {
	d := q.Part.Dims
	change := func(what string, dims scf.Dims) wrong {
		return wrong{what: what, family: q.Part.Family, dims: q.given(dims), load: q.Load.Name, options: q.Part.Options}
	}
	switch {
	case q.Part.Family == nil:
		return nil
	case has(d, "a"):
		return []wrong{
			change("semi-axes of the hole taken for its axes", scf.Dims{"a": d["a"] / 2, "b": d["b"] / 2}),
			change("axes of the hole taken for its semi-axes", scf.Dims{"a": 2 * d["a"], "b": 2 * d["b"]}),
		}
	case has(d, "W"):
		return []wrong{
			change("diameter of the hole taken for its radius", scf.Dims{"d": 2 * d["d"]}),
			change("radius of the hole taken for its diameter", scf.Dims{"d": d["d"] / 2}),
		}
	}
	return []wrong{
		change("radius taken for a diameter, r halved", scaledRoot(d, 0.5)),
		change("diameter taken for the radius, r doubled", scaledRoot(d, 2)),
	}
}

// scaledRoot is the root radius times k; an elliptic fillet keeps its shape.
func scaledRoot(d scf.Dims, k float64) scf.Dims {
	dims := scf.Dims{"r": k * d["r"]}
	if ra, there := d["ra"]; there && ra != d["r"] {
		dims["ra"] = k * ra
	}
	return dims
}

func has(d scf.Dims, name string) bool {
	_, there := d[name]
	return there
}
