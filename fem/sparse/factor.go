package sparse

import "context"

// A Fill writes the matrix of one element: row by row, in the order of the
// element's list, n² numbers for a list of n. Only the lower triangle is read
// (columns up to the row's own), without the rows and columns of prescribed
// unknowns. The memory comes with old contents. Elements that have prescribed
// unknowns only are left out.
//
// Fill is called from several goroutines at once. Calls with the same worker
// number, which is below the number of workers, follow one another.
type Fill func(worker, element int, matrix []float64)

// A Factor is a factorised matrix. It lives in its workspace and ends with the
// next factorisation there; using it after that is a panic.
type Factor struct {
	plan      *Plan
	workspace *Workspace
	version   int
	workers   int
	values    []float64
	pivots    Pivots
}

// Pivots reports the extremes of the pivots.
func (f *Factor) Pivots() Pivots { return f.pivots }

// Factor assembles and factorises a matrix. It uses up to the given number of
// goroutines, GOMAXPROCS if that is 0; the bits of the result do not depend on
// it. A nil workspace stands for a new one. The error is a *PivotError when
// the matrix is not positive definite to working precision, or the context's
// when that ends first.
func (p *Plan) Factor(ctx context.Context, fill Fill, w *Workspace, workers int) (*Factor, error) {
	if w == nil {
		w = new(Workspace)
	}
	workers = crewSize(workers)
	n := &numeric{plan: p, ctx: ctx, fill: fill, workspace: w}
	if err := n.run(workers); err != nil {
		return nil, err
	}
	f := &Factor{plan: p, workspace: w, version: w.version, workers: workers, values: w.factor}
	j := newJudge(0)
	for i := range p.fronts {
		j.merge(&w.judges[i])
	}
	if j.failed >= 0 {
		return nil, &PivotError{Unknown: int(p.order[j.failed]), Pivot: j.pivot, Diagonal: j.diagonal, Limit: pivotLimit(p.unknowns)}
	}
	if j.at >= 0 {
		f.pivots = Pivots{Smallest: j.smallest, Largest: j.largest, Unknown: int(p.order[j.at])}
	}
	return f, nil
}

// numeric is one factorisation under way.
type numeric struct {
	plan      *Plan
	ctx       context.Context
	fill      Fill
	workspace *Workspace
	shared    []int // where each front's Schur complement begins in workspace.shared, −1 if in a stack
}

// front works on front i: gathers it, eliminates its pivots, and leaves its
// Schur complement for the parent.
func (n *numeric) front(worker int, i int32, share sharing) {
	w, p := n.workspace, n.plan
	f, h := &p.fronts[i], &w.hands[worker]
	k, r := f.pivots, len(f.border)
	handed := n.handed(worker, i)
	a := assembly{
		pivots:   k,
		panel:    w.factor[f.factor:][:panelLen(k, r)],
		schur:    handed[:schurLen(r)],
		diagonal: h.diagonal[:k+r],
	}
	clear(a.panel)
	clear(a.schur)
	clear(a.diagonal)
	for _, e := range f.elements {
		size := len(p.pattern.list(e))
		n.fill(worker, int(e), h.matrix[:size*size])
		a.addElement(h.matrix, size, p.runs[e])
	}
	for _, c := range f.children {
		child := &p.fronts[c]
		a.addChild(n.handed(worker, c), len(child.border), child.toward)
	}
	w.judges[i] = newJudge(pivotLimit(p.unknowns))
	m := &h.panel
	*m = panel{values: a.panel, pivots: k, first: f.first, diagonal: a.diagonal}
	m.eliminate(tiles(k)+tiles(r), &w.judges[i], share)
	m.complete(a.schur, tiles(r), share)
	copy(handed[schurLen(r):], a.diagonal[k:])
}

// handed returns the memory in which front i hands over its Schur complement.
func (n *numeric) handed(worker int, i int32) []float64 {
	f := &n.plan.fronts[i]
	length := handedLen(len(f.border))
	if n.shared != nil && n.shared[i] >= 0 {
		return n.workspace.shared[n.shared[i]:][:length]
	}
	return n.workspace.hands[worker].stack[f.handed:][:length]
}
