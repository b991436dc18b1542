package specimen

import "maps"

// Sharpened is the part without the radius of its roots, as a mesh draws it whose
// elements are too large to follow them. A part that is none without its radius,
// as a notch with parallel flanks, and an outline of the user's own come back as
// they are, with changed unset.
func (p *Part) Sharpened() (sharp *Part, changed bool) {
	if p.Family == nil || p.Family.Sharp(p.Dims) {
		return p, false
	}
	dims := maps.Clone(p.Given)
	for _, d := range p.Family.Dimensions {
		if d.Sharp {
			dims[d.Name] = 0
		}
	}
	delete(dims, "ra")
	if !p.Family.Sharp(dims) {
		return p, false
	}
	sharp, err := New(p.Family, dims, p.Unit, p.Options)
	if err != nil {
		return p, false
	}
	return sharp, true
}
