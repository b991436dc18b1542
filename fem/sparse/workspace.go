package sparse

// A Workspace keeps the memory of factorisations for the next one: at the
// usual sizes the first touch of fresh memory takes a tenth of the time.
// The zero value is ready. A workspace serves one factorisation at a time, and
// any plans one after the other; a Factor is good until its workspace is used
// for the next.
type Workspace struct {
	factor  []float64
	shared  []float64 // Schur complements that pass between goroutines
	hands   []hand
	judges  []judge
	version int
}

// A hand is the private memory of one goroutine.
type hand struct {
	stack    []float64 // Schur complements within a subtree
	matrix   []float64 // an element matrix
	diagonal []float64
	panel    panel
}

// prepare makes room for a factorisation of p.
func (w *Workspace) prepare(p *Plan, workers, shared int) {
	w.version++
	w.factor = grown(w.factor, p.factorLen)
	w.shared = grown(w.shared, shared)
	w.judges = grown(w.judges, len(p.fronts))
	if len(w.hands) < workers {
		w.hands = append(w.hands, make([]hand, workers-len(w.hands))...)
	}
	for i := range w.hands[:workers] {
		h := &w.hands[i]
		h.stack = grown(h.stack, p.stackLen)
		h.matrix = grown(h.matrix, p.listed*p.listed)
		h.diagonal = grown(h.diagonal, p.largest+edge)
	}
}

// grown returns a slice of length n, s itself where it is long enough. Old
// contents stay.
func grown[T any](s []T, n int) []T {
	if cap(s) < n {
		return make([]T, n)
	}
	return s[:n]
}
