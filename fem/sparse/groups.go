package sparse

// groups are the classes of unknowns that belong to exactly the same elements:
// all unknowns of a vertex, of the inside of an edge, of the inside of an
// element. They are eliminated together, so that the analysis handles seven of
// them per triangle and not every unknown.
type groups struct {
	start   []int32 // group g has the unknowns members[start[g]:start[g+1]]
	members []int32
	of      []int32 // group of each unknown
	rank    []int32 // place of each unknown within its group

	elemStart []int32 // element e touches the groups elem[elemStart[e]:elemStart[e+1]]
	elem      []int32
	elements  []int32 // number of elements of each group
}

func (g *groups) size(i int32) int32        { return g.start[i+1] - g.start[i] }
func (g *groups) ofElement(e int32) []int32 { return g.elem[g.elemStart[e]:g.elemStart[e+1]] }
func (g *groups) unknowns(i int32) []int32  { return g.members[g.start[i]:g.start[i+1]] }
func (g *groups) count() int                { return len(g.start) - 1 }

// groupUnknowns finds the groups of a valid pattern.
func groupUnknowns(p *Pattern) *groups {
	class := refine(p)
	g := &groups{of: make([]int32, p.Unknowns), rank: make([]int32, p.Unknowns)}
	g.number(p, class)
	g.collect(p)
	return g
}

// refine splits the set of all unknowns by one element after the other: within
// each class, the unknowns that the element lists move to a new class. In the
// end two unknowns share a class exactly if they share all their elements. The
// time is linear in the length of the pattern.
func refine(p *Pattern) []int32 {
	class := make([]int32, p.Unknowns)
	split := []int32{-1} // last element that split a class
	heir := []int32{0}   // and the class its unknowns went to
	for e := range int32(p.Elements()) {
		for _, u := range p.list(e) {
			if u < 0 {
				continue
			}
			c := class[u]
			if split[c] != e {
				split[c], heir[c] = e, int32(len(split))
				split, heir = append(split, -1), append(heir, 0)
			}
			class[u] = heir[c]
		}
	}
	return class
}

// number renumbers the classes in the order in which the elements meet them,
// and lists the unknowns of each in the order of the first element that has
// them, which makes for long runs when element matrices are assembled.
func (g *groups) number(p *Pattern, class []int32) {
	name := make([]int32, 0)
	for i := range g.of {
		g.of[i] = -1
	}
	sizes := make([]int32, 0, 7*p.Elements())
	for _, u := range p.Index {
		if u < 0 || g.of[u] >= 0 {
			continue
		}
		c := int(class[u])
		for len(name) <= c {
			name = append(name, -1)
		}
		if name[c] < 0 {
			name[c] = int32(len(sizes))
			sizes = append(sizes, 0)
		}
		i := name[c]
		g.of[u], g.rank[u] = i, sizes[i]
		sizes[i]++
	}
	g.start = make([]int32, len(sizes)+1)
	for i, s := range sizes {
		g.start[i+1] = g.start[i] + s
	}
	g.members = make([]int32, p.Unknowns)
	for u, i := range g.of {
		g.members[g.start[i]+g.rank[u]] = int32(u)
	}
}

// collect lists the groups of each element.
func (g *groups) collect(p *Pattern) {
	n := p.Elements()
	g.elemStart = make([]int32, n+1)
	g.elem = make([]int32, 0, 7*n)
	g.elements = make([]int32, g.count())
	for e := range int32(n) {
		for _, u := range p.list(e) {
			if u >= 0 && g.rank[u] == 0 {
				g.elem = append(g.elem, g.of[u])
				g.elements[g.of[u]]++
			}
		}
		g.elemStart[e+1] = int32(len(g.elem))
	}
}
