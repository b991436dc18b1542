package misreading

import "notchproof/scf"

// otherNotches: two notches for one, one for two; a shoulder for a collar; the
// two limits of a ring groove. What stays the same is either the net width or the depth.
func otherNotches(q *Question) []wrong {
	if q.Part.Family == nil {
		return nil
	}
	d := q.Part.Dims
	D, net := d["D"], d["d"]
	switch q.Part.Family.Name {
	case "bar-edge-notch":
		return append(
			q.inFamily("bar-notch", "two opposite notches of the same net width instead of one", q.given(nil)),
			q.inFamily("bar-notch", "two opposite notches of the same depth instead of one", q.given(scf.Dims{"d": 2*net - D}))...)
	case "bar-notch":
		return append(
			q.inFamily("bar-edge-notch", "one notch of the same net width instead of two", q.given(nil)),
			q.inFamily("bar-edge-notch", "one notch of the same depth instead of two", q.given(scf.Dims{"d": (D + net) / 2}))...)
	case "bar-collar":
		return q.inFamily("bar-shoulder", "a shoulder instead of the collar", without(q, "L"))
	case "shaft-collar":
		return q.inFamily("shaft-shoulder", "a shoulder instead of the collar", without(q, "L"))
	case "shaft-ring-groove":
		return append(
			q.inFamily("shaft-groove", "a U groove instead of the ring groove", without(q, "w")),
			q.inFamily("shaft-shoulder", "a shoulder instead of the ring groove", without(q, "w"))...)
	}
	return nil
}
