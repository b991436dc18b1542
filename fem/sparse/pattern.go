package sparse

import "fmt"

// A Pattern says which unknowns each element couples.
//
// Element e touches the unknowns Index[Start[e]:Start[e+1]], each in
// [0, Unknowns) or −1 for a prescribed one, which is left out of the system.
// The element matrix has one row and column for every entry of that list, −1
// included. An element must not list an unknown twice, and every unknown must
// appear in some element.
//
// Center[e] is a point of element e. It only guides the order of elimination:
// poor centres make the factorisation slow, never wrong. Unknowns listed node
// by node, edge by edge, in runs of consecutive numbers, are handled fastest.
type Pattern struct {
	Unknowns int
	Start    []int32
	Index    []int32
	Center   [][2]float64
}

// Elements returns the number of elements.
func (p *Pattern) Elements() int { return max(0, len(p.Start)-1) }

// list returns the unknowns of element e.
func (p *Pattern) list(e int32) []int32 { return p.Index[p.Start[e]:p.Start[e+1]] }

// validate checks all that Pattern's documentation asks for.
func (p *Pattern) validate() error {
	n := p.Elements()
	if p.Unknowns < 0 {
		return fmt.Errorf("sparse: %d unknowns", p.Unknowns)
	}
	if len(p.Center) != n {
		return fmt.Errorf("sparse: %d centres for %d elements", len(p.Center), n)
	}
	if n > 0 && (p.Start[0] != 0 || int(p.Start[n]) != len(p.Index)) {
		return fmt.Errorf("sparse: starts run from %d to %d, index has length %d", p.Start[0], p.Start[n], len(p.Index))
	}
	for e := range n {
		if p.Start[e] > p.Start[e+1] {
			return fmt.Errorf("sparse: element %d starts at %d and ends at %d", e, p.Start[e], p.Start[e+1])
		}
		if c := p.Center[e]; c[0]-c[0] != 0 || c[1]-c[1] != 0 {
			return fmt.Errorf("sparse: element %d has centre (%g, %g)", e, c[0], c[1])
		}
	}
	return p.validateLists()
}

// validateLists checks the unknowns that the elements list.
func (p *Pattern) validateLists() error {
	last := make([]int32, p.Unknowns) // 1 + the last element seen with an unknown
	for e := range int32(p.Elements()) {
		for _, u := range p.list(e) {
			switch {
			case u == -1:
			case u < 0 || int(u) >= p.Unknowns:
				return fmt.Errorf("sparse: element %d lists unknown %d of %d", e, u, p.Unknowns)
			case last[u] == e+1:
				return fmt.Errorf("sparse: element %d lists unknown %d twice", e, u)
			default:
				last[u] = e + 1
			}
		}
	}
	for u, e := range last {
		if e == 0 {
			return fmt.Errorf("sparse: unknown %d belongs to no element", u)
		}
	}
	return nil
}
