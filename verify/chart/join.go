package chart

// Join takes over the points of another table of the same question. Points that
// both have must agree within their bars. Names are for errors, which are *Fault.
func (t *Table) Join(other *Table, name, otherName string) error {
	if mine, theirs, differ := t.Question.differs(other.Question); differ {
		return fault("join files that were made with the same words", "%q asks another question than %q: %s, not %s", otherName, name, theirs, mine)
	}
	for i, p := range other.Points {
		if !other.held[i] {
			continue
		}
		if err := t.put(i, p); err != nil {
			return fault("one of them was changed or made by another version; compute it again", "%q and %q: %v", name, otherName, err)
		}
	}
	return nil
}

// Absent are the points that no run or file had.
func (t *Table) Absent() []Point {
	var list []Point
	for i, p := range t.Points {
		if !t.held[i] {
			list = append(list, p)
		}
	}
	return list
}
