package mesh

// A queue of triangles, the smallest key first; equal keys in no order but
// always the same one. It is a binary heap without the indirections of
// container/heap.
type queue []entry

// An entry names a triangle as it was at a stamp.
type entry struct {
	key   float32
	tri   int32
	stamp uint32
}

func (q *queue) push(e entry) {
	h := append(*q, e)
	i := len(h) - 1
	for i > 0 {
		up := (i - 1) / 2
		if h[up].key <= e.key {
			break
		}
		h[i] = h[up]
		i = up
	}
	h[i] = e
	*q = h
}

func (q *queue) pop() (entry, bool) {
	h := *q
	if len(h) == 0 {
		return entry{}, false
	}
	top, e := h[0], h[len(h)-1]
	h = h[:len(h)-1]
	*q = h
	if len(h) == 0 {
		return top, true
	}
	i := 0
	for {
		c := 2*i + 1
		if c >= len(h) {
			break
		}
		if c+1 < len(h) && h[c+1].key < h[c].key {
			c++
		}
		if h[c].key >= e.key {
			break
		}
		h[i] = h[c]
		i = c
	}
	h[i] = e
	return top, true
}
