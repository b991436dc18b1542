package sparse

// A front is one step of the elimination: a dense matrix over pivots and
// border. Places in the front count the pivots first, then the border.
// Elimination numbers count all unknowns in the order in which they are
// eliminated.
type front struct {
	parent   int32 // −1 at the root
	depth    int32
	children []int32
	elements []int32 // at a leaf

	first  int32   // elimination number of the first pivot
	pivots int     // number of pivots
	border []int32 // elimination numbers of the border, ascending
	toward []run   // where the border lies in the parent's front

	factor int // where its columns begin in the factor
	handed int // where its Schur complement begins in a worker's stack
	flops  float64
	start  int32   // first front of the subtree
	work   float64 // of the subtree, for scheduling
}

// A run is a stretch of consecutive rows that stay consecutive on the way from
// one dense matrix to another.
type run struct{ from, to, length int32 }

// A Plan is the symbolic half of a factorisation: everything that depends on
// the pattern alone. It is never changed after Analyse; any number of
// goroutines may use it at once, each with its own Workspace.
type Plan struct {
	unknowns int
	pattern  Pattern
	fronts   []front // in postorder
	order    []int32 // unknown of each elimination number
	number   []int32 // elimination number of each unknown

	runs      [][]run // of each element, from its list to its leaf's front
	largest   int     // rows of the largest front
	listed    int     // length of the longest element list
	factorLen int
	stackLen  int
	entries   int64
	flops     float64
}

// Analyse prepares the factorisation of matrices with the given pattern. The
// plan keeps the pattern's slices, which must not change afterwards. An error
// names the element or unknown that breaks the rules of Pattern.
func Analyse(p Pattern) (*Plan, error) {
	if err := p.validate(); err != nil {
		return nil, err
	}
	g := groupUnknowns(&p)
	a := &analysis{groups: g, plan: &Plan{unknowns: p.Unknowns, pattern: p}}
	a.gather(dissect(&p, g))
	a.numberUnknowns()
	a.connect()
	a.plan.layOut()
	return a.plan, nil
}

// Unknowns returns the order of the system.
func (p *Plan) Unknowns() int { return p.unknowns }

// layOut decides where each front keeps its numbers.
//
// The Schur complement that a front hands over lives until its parent has
// gathered it. While one subtree is worked through, at most one front of each
// depth and birth order is in that state, so that each such pair gets a place
// of its own, large enough for all of its fronts. The places of deep fronts
// are small and stay in the cache.
func (p *Plan) layOut() {
	type place struct{ depth, birth int32 }
	size := map[place]int{}
	var deepest, most int32
	for i := range p.fronts {
		f := &p.fronts[i]
		k, r := f.pivots, len(f.border)
		f.factor = p.factorLen
		p.factorLen += panelLen(k, r)
		p.largest = max(p.largest, k+r)
		p.entries += int64(k)*int64(k+1)/2 + int64(k)*int64(r)
		f.flops = eliminationFlops(k, r)
		p.flops += f.flops
		p.addWork(int32(i))
		for b, c := range f.children {
			at := place{p.fronts[c].depth, int32(b)}
			size[at] = max(size[at], handedLen(len(p.fronts[c].border)))
			deepest, most = max(deepest, at.depth), max(most, at.birth)
		}
	}
	offset := map[place]int{}
	for d := range deepest + 1 {
		for b := range most + 1 {
			at := place{d, b}
			offset[at] = p.stackLen
			p.stackLen += size[at]
		}
	}
	for i := range p.fronts {
		for b, c := range p.fronts[i].children {
			p.fronts[c].handed = offset[place{p.fronts[c].depth, int32(b)}]
		}
	}
	for e := range int32(p.pattern.Elements()) {
		p.listed = max(p.listed, len(p.pattern.list(e)))
	}
}

// fillFlops is a guess at what filling one number of an element matrix costs.
const fillFlops = 50

// addWork sets where the subtree of front i begins and estimates its work.
func (p *Plan) addWork(i int32) {
	f := &p.fronts[i]
	f.start, f.work = i, f.flops
	for _, e := range f.elements {
		n := float64(len(p.pattern.list(e)))
		f.work += fillFlops * n * n
	}
	for _, c := range f.children {
		f.start = min(f.start, p.fronts[c].start)
		f.work += p.fronts[c].work
	}
}
