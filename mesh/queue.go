package mesh

import "math"

// A queue of triangles by size: those with the shortest edges first, equally
// short ones in the order in which they came. Lengths count as equal if they
// share a bucket; the buckets grow by a factor of about 1.2. That is fine enough
// to let good triangles grow from the small to the large, and coarse enough for
// neighbours to follow each other, which keeps them in the processor's cache.
type queue struct {
	buckets []bucket
	base    int // place of the first bucket among those of all numbers
	least   int // no bucket before this holds anything
	count   int
}

type bucket struct {
	entries []entry
	head    int
}

// An entry names a triangle as it was at a stamp.
type entry struct {
	tri   int32
	stamp uint32
}

// newQueue makes a queue for squares of lengths between two bounds; those
// beyond share the outermost buckets.
func newQueue(least2, most2 float64) queue {
	base := place(least2)
	return queue{buckets: make([]bucket, place(most2)-base+1), base: base}
}

// place numbers the buckets of positive numbers by exponent and the first two
// bits after the leading one.
func place(x float64) int { return int(math.Float64bits(x) >> 50) }

// push adds a triangle with the square of its shortest edge.
func (q *queue) push(short2 float64, e entry) {
	i := min(max(place(short2)-q.base, 0), len(q.buckets)-1)
	b := &q.buckets[i]
	b.entries = append(b.entries, e)
	q.least = min(q.least, i)
	q.count++
}

func (q *queue) pop() (entry, bool) {
	if q.count == 0 {
		return entry{}, false
	}
	q.count--
	for len(q.buckets[q.least].entries) == 0 {
		q.least++
	}
	b := &q.buckets[q.least]
	e := b.entries[b.head]
	if b.head++; b.head == len(b.entries) {
		b.entries, b.head = b.entries[:0], 0
	}
	return e, true
}
