package sparse

// A Workspace keeps the memory of factorisations for the next one: at the
// usual sizes the first touch of fresh memory takes as long as the arithmetic.
// The zero value is ready. A workspace serves one factorisation at a time, and
// any plans one after the other; a Factor is good until its workspace is used
// for the next.
type Workspace struct {
	block   []float64 // all that follows is cut from it
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

// smallestBlock is the least memory asked for, in numbers: 8 MB. Pages are
// only taken when they are touched, so a small factorisation does not pay for
// it, and a ladder of growing ones finds the first pages in place.
const smallestBlock = 1 << 20

// prepare makes room for a factorisation of p.
func (w *Workspace) prepare(p *Plan, workers, shared int) {
	w.version++
	each := p.stackLen + p.listed*p.listed + p.largest + edge
	if need := p.factorLen + shared + workers*each; cap(w.block) < need {
		w.block = make([]float64, max(need, smallestBlock))
		adviseLargePages(w.block)
	}
	rest := w.block
	cut := func(n int) []float64 {
		s := rest[:n:n]
		rest = rest[n:]
		return s
	}
	w.factor, w.shared = cut(p.factorLen), cut(shared)
	if cap(w.judges) < len(p.fronts) {
		w.judges = make([]judge, len(p.fronts))
	}
	w.judges = w.judges[:len(p.fronts)]
	if len(w.hands) < workers {
		w.hands = append(w.hands, make([]hand, workers-len(w.hands))...)
	}
	for i := range w.hands[:workers] {
		h := &w.hands[i]
		h.stack, h.matrix, h.diagonal = cut(p.stackLen), cut(p.listed*p.listed), cut(p.largest+edge)
	}
}
