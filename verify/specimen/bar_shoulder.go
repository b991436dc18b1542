package specimen

import "notchproof/scf"

// barShoulder is a flat bar with two opposite shoulder fillets.
func barShoulder(family *scf.Family, dims scf.Dims, _ scf.Options) *Part {
	p := shoulder(dims)
	for _, load := range family.Loads {
		p.Loads = append(p.Loads, halfBar(p, load, dims["d"], shoulderAxis))
	}
	return p
}
