package sparse

// Statistics describes the cost of a plan.
type Statistics struct {
	Unknowns     int
	Elements     int
	Fronts       int
	LargestFront int     // rows
	Entries      int64   // numbers in the factor, without padding
	Flops        float64 // additions and multiplications of the factorisation
	Memory       int64   // bytes that a workspace takes with one goroutine
}

// Statistics returns what factorisations by the plan cost.
func (p *Plan) Statistics() Statistics {
	return Statistics{
		Unknowns:     p.unknowns,
		Elements:     p.pattern.Elements(),
		Fronts:       len(p.fronts),
		LargestFront: p.largest,
		Entries:      p.entries,
		Flops:        p.flops,
		Memory:       8 * int64(p.factorLen+p.stackLen+p.listed*p.listed+p.largest),
	}
}
