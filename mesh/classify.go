package mesh

import "fmt"

// classify decides which triangles are inside the region: those to the left of
// the segments, and whatever can be reached from there without crossing one. It
// fails if the segments contradict each other.
func (t *triangulation) classify() error {
	const unknown, in, out = 0, 1, 2
	label := make([]int8, len(t.tris))
	var todo []int32
	// The box's corners are outside.
	label[t.at[0]] = out
	todo = append(todo, t.at[0])
	spread := func() bool {
		for len(todo) > 0 {
			i := todo[len(todo)-1]
			todo = todo[:len(todo)-1]
			for k, n := range t.tris[i].n {
				if n < 0 || t.tris[i].s[k] >= 0 {
					continue
				}
				if label[n] == unknown {
					label[n] = label[i]
					todo = append(todo, n)
				} else if label[n] != label[i] {
					return false
				}
			}
		}
		return true
	}
	spread()
	for s := range t.segs {
		i, k := t.edge(t.segs[s].a, t.segs[s].b)
		n := t.tris[i].n[k]
		if label[i] == out || label[n] == in {
			p := t.points[t.segs[s].a]
			return fmt.Errorf("side %d has the material on its right at (%g, %g): the outer loop must run counter-clockwise, holes inside it clockwise", t.segs[s].side, p.X, p.Y)
		}
		if label[i] == unknown {
			label[i] = in
			todo = append(todo, i)
		}
		if !spread() {
			p := t.points[t.segs[s].a]
			return fmt.Errorf("side %d does not part inside from outside at (%g, %g)", t.segs[s].side, p.X, p.Y)
		}
		if label[n] == unknown {
			label[n] = out
			todo = append(todo, n)
		}
		if !spread() {
			p := t.points[t.segs[s].a]
			return fmt.Errorf("side %d does not part inside from outside at (%g, %g)", t.segs[s].side, p.X, p.Y)
		}
	}
	for i := range t.tris {
		t.tris[i].inside = label[i] == in
	}
	return nil
}
