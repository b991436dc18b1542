package verify

import (
	"fmt"
	"strings"
)

// Endless tells that the last rung's shape has a corner at the notch without a
// radius, and therefore no factor.
func (s *Study) Endless() bool { return endless(s.Corners) }

// Says tells in words why a study has no limit, and what would give it one.
func (s *Study) Says() []string {
	var says []string
	blind := 0
	for _, r := range s.Rows {
		if r.Blind {
			blind++
		}
	}
	if blind > 0 {
		says = append(says, s.blindness(blind)...)
	}
	if first := s.Rows[0]; !first.Blind && first.Size < s.SizeAsked/2 {
		says = append(says, fmt.Sprintf("the first mesh has elements of %s at the peak, not %s: the ends of a root are corners of every mesh, and this part's cannot be left out",
			s.length(first.Size), s.length(s.SizeAsked)))
	}
	if !s.Endless() {
		return says
	}
	for _, c := range s.Corners {
		if !c.OnNotch || c.Bounded() {
			continue
		}
		if blind > 0 {
			return append(says, "the factors grow with a power of the size instead: "+c.exponents(s.Part.Unit))
		}
		says = append(says, c.Says(s.Part.Unit)...)
	}
	return append(says, remedy)
}

// blindness speaks of rungs whose elements are larger than the root.
func (s *Study) blindness(blind int) []string {
	root := rootLength(s.Part)
	rungs := fmt.Sprintf("the first %d rungs have", blind)
	if blind == len(s.Rows) {
		rungs = "all rungs have"
	}
	says := []string{fmt.Sprintf("%s elements larger than the root, an arc of %s, and leave it out: their factors are those of a sharp corner and not the part's",
		rungs, s.length(root))}
	return append(says, fmt.Sprintf("elements of %s and less, three and more on the arc, see the root; rungs of that size can converge", s.length(root/3)))
}

func (s *Study) length(v float64) string {
	return strings.TrimSpace(fmt.Sprintf("%.2g %s", v, s.Part.Unit))
}
