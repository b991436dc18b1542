package specimen

import "notchproof/scf"

// shaftShoulder is a stepped round shaft with a shoulder fillet.
func shaftShoulder(family *scf.Family, dims scf.Dims, _ scf.Options) *Part {
	p := shoulder(dims)
	for _, load := range family.Loads {
		p.Loads = append(p.Loads, shaft(p, load, dims["d"]))
	}
	return p
}
