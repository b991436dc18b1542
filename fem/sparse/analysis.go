package sparse

import "slices"

// analysis turns the dissection's tree into fronts. Until unknowns are
// numbered, everything is in terms of groups.
type analysis struct {
	groups  *groups
	plan    *Plan
	pivots  [][]int32 // groups eliminated at each front
	border  [][]int32 // groups of each front's border
	stamp   []int32
	scratch []int32
	runs    []run
	first   []int32 // elimination number of each group's first unknown
	place   []int32 // place of each group in the front at hand
}

// gather makes the fronts, bottom up: the border of a front is what its
// elements or children touch, less its pivots. Nodes without pivots disappear,
// their children pass to the parent.
func (a *analysis) gather(nodes []node) {
	a.stamp = make([]int32, a.groups.count())
	for i := range a.stamp {
		a.stamp[i] = -1
	}
	roots := make([][]int32, len(nodes)) // fronts that stand for each node
	for i, n := range nodes {
		f := front{parent: -1, elements: n.elements}
		if n.left >= 0 {
			f.children = slices.Concat(roots[n.left], roots[n.right])
		}
		if len(n.pivots) == 0 && n.left >= 0 && i < len(nodes)-1 {
			roots[i] = f.children
			continue
		}
		roots[i] = []int32{a.add(f, n.pivots)}
	}
}

// add appends a front with its border and returns its number.
func (a *analysis) add(f front, pivots []int32) int32 {
	i := int32(len(a.plan.fronts))
	for _, g := range pivots {
		a.stamp[g] = i
	}
	a.scratch = a.scratch[:0]
	for _, e := range f.elements {
		a.touch(a.groups.ofElement(e), i)
	}
	for _, c := range f.children {
		a.plan.fronts[c].parent = i
		a.touch(a.border[c], i)
	}
	a.plan.fronts = append(a.plan.fronts, f)
	a.pivots, a.border = append(a.pivots, pivots), append(a.border, slices.Clone(a.scratch))
	return i
}

// touch collects the groups that do not bear stamp i yet.
func (a *analysis) touch(list []int32, i int32) {
	for _, g := range list {
		if a.stamp[g] != i {
			a.stamp[g] = i
			a.scratch = append(a.scratch, g)
		}
	}
}

// numberUnknowns gives out the elimination numbers, front by front.
func (a *analysis) numberUnknowns() {
	p := a.plan
	p.order = make([]int32, 0, p.unknowns)
	p.number = make([]int32, p.unknowns)
	a.first = make([]int32, a.groups.count())
	for i := range p.fronts {
		f := &p.fronts[i]
		f.first = int32(len(p.order))
		for _, g := range a.pivots[i] {
			a.first[g] = int32(len(p.order))
			p.order = append(p.order, a.groups.unknowns(g)...)
		}
		f.pivots = len(p.order) - int(f.first)
	}
	for n, u := range p.order {
		p.number[u] = int32(n)
	}
}

// connect works from the root down: it puts every border in ascending order,
// by picking its groups out of the parent's front, and records how borders and
// elements map onto the fronts that gather them.
func (a *analysis) connect() {
	p := a.plan
	a.place = make([]int32, a.groups.count())
	p.runs = make([][]run, p.pattern.Elements())
	for i := range a.stamp {
		a.stamp[i] = -1
	}
	for i := int32(len(p.fronts)) - 1; i >= 0; i-- {
		f := &p.fronts[i]
		if f.parent >= 0 {
			f.depth = p.fronts[f.parent].depth + 1
		}
		at := a.putPlaces(a.pivots[i], 0)
		rows := a.putPlaces(a.border[i], at) - at
		f.border = make([]int32, 0, rows)
		for _, g := range a.border[i] {
			for k := range a.groups.size(g) {
				f.border = append(f.border, a.first[g]+k)
			}
		}
		for _, c := range f.children {
			a.connectChild(f, a.pivots[i], a.border[i], c)
		}
		for _, e := range f.elements {
			p.runs[e] = a.elementRuns(e, at)
		}
	}
}

// putPlaces gives the groups consecutive places from at on and returns the end.
func (a *analysis) putPlaces(list []int32, at int32) int32 {
	for _, g := range list {
		a.place[g] = at
		at += a.groups.size(g)
	}
	return at
}

// connectChild orders the border of child c of front f and sets its runs.
func (a *analysis) connectChild(f *front, pivots, border []int32, c int32) {
	for _, g := range a.border[c] {
		a.stamp[g] = c
	}
	child := &a.plan.fronts[c]
	sorted := a.border[c][:0]
	a.runs = a.runs[:0]
	from := int32(0)
	for _, list := range [2][]int32{pivots, border} {
		for _, g := range list {
			if a.stamp[g] == c {
				sorted = append(sorted, g)
				a.extend(from, a.place[g], a.groups.size(g), int32(f.pivots))
				from += a.groups.size(g)
			}
		}
	}
	child.toward = slices.Clone(a.runs)
}

// elementRuns maps the list of element e onto its leaf's front.
func (a *analysis) elementRuns(e, pivots int32) []run {
	a.runs = a.runs[:0]
	for from, u := range a.plan.pattern.list(e) {
		if u >= 0 {
			to := a.place[a.groups.of[u]] + a.groups.rank[u]
			a.extend(int32(from), to, 1, pivots)
		}
	}
	return slices.Clone(a.runs)
}

// extend adds a stretch to the list of runs, as a part of the last one where
// it continues that and does not cross from the pivots into the border.
func (a *analysis) extend(from, to, length, pivots int32) {
	if n := len(a.runs); n > 0 {
		r := &a.runs[n-1]
		if r.from+r.length == from && r.to+r.length == to && to != pivots {
			r.length += length
			return
		}
	}
	a.runs = append(a.runs, run{from, to, length})
}
