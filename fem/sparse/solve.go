package sparse

// Solve replaces each right-hand side by the solution. Every side has one
// number per unknown. They are treated four at a time; each gives the bits
// that it gives alone. Several goroutines may call Solve at once.
func (f *Factor) Solve(b ...[]float64) {
	f.check()
	for _, side := range b {
		if len(side) != f.plan.unknowns {
			panic("sparse: length of a right-hand side")
		}
	}
	for ; len(b) > 2; b = b[min(edge, len(b)):] {
		f.substitute(&fourSides, b[:min(edge, len(b))])
	}
	for i := range b {
		f.substitute(&oneSide, b[i:i+1])
	}
}

func (f *Factor) check() {
	if f.version != f.workspace.version {
		panic("sparse: factor used after its workspace went on")
	}
}

func (f *Factor) substitute(k *kernels, sides [][]float64) {
	p := f.plan
	s := &substitution{
		kernels: k, factor: f,
		x:   make([]float64, k.width*p.unknowns),
		row: make([]float64, k.width*edge*tiles(p.largest)),
	}
	for j, side := range sides {
		for n, u := range p.order {
			s.x[k.width*n+j] = side[u]
		}
	}
	for i := range p.fronts {
		s.forward(&p.fronts[i])
	}
	for i := len(p.fronts) - 1; i >= 0; i-- {
		s.backward(&p.fronts[i])
	}
	for j, side := range sides {
		for n, u := range p.order {
			side[u] = s.x[k.width*n+j]
		}
	}
}

// kernels are the operations on right-hand sides, for one number of sides at
// a time: the width. Sides lie in memory as rows: side j of place i is number
// width·i + j. A block is four places, as long as a tile is wide.
type kernels struct {
	width int

	// subtractProduct sets the block c to c − a·bᵀ, for blocks a and tiles b.
	subtractProduct func(c, a, b []float64)
	// solve sets the block c to c·l⁻ᵀ, for a tile l on the diagonal.
	solve func(c, l []float64)
	// subtractTransposed sets the blocks c to c − x·l, for a block x and tiles l.
	subtractTransposed func(c, x, l []float64)
	// solveTransposed sets the block c to c·l⁻¹.
	solveTransposed func(c, l []float64)
}

// substitution solves for up to width sides at once.
type substitution struct {
	*kernels
	factor *Factor
	x      []float64 // in the order of elimination
	row    []float64 // the part of x that belongs to the pivots of a front
	part   tile      // a block of its border
}

// load copies the pivots' part of x, with zeros up to whole blocks.
func (s *substitution) load(f *front) []float64 {
	row := s.row[:s.width*edge*tiles(f.pivots)]
	n := copy(row, s.pivots(f))
	clear(row[n:])
	return row
}

func (s *substitution) pivots(f *front) []float64 {
	return s.x[s.width*int(f.first):][:s.width*f.pivots]
}

func (s *substitution) panel(f *front) panel {
	return panel{values: s.factor.values[f.factor:][:panelLen(f.pivots, len(f.border))], pivots: f.pivots}
}

// forward solves for the pivots of a front and takes their part out of its
// border.
func (s *substitution) forward(f *front) {
	p, row := s.panel(f), s.load(f)
	k, block := p.columns(), s.width*edge
	for j := range k {
		l, c := p.row(j), row[block*j:][:block]
		s.subtractProduct(c, row[:block*j], l[:area*j])
		s.solve(c, l[area*j:])
	}
	copy(s.pivots(f), row)
	for i := range tiles(len(f.border)) {
		s.part = tile{}
		c := s.part[:block]
		s.subtractProduct(c, row, p.row(k+i))
		for j, n := range f.border[edge*i : min(edge*i+edge, len(f.border))] {
			x := s.x[s.width*int(n):][:s.width]
			for side := range x {
				x[side] += c[s.width*j+side]
			}
		}
	}
}

// backward solves for the pivots of a front when its border is known.
func (s *substitution) backward(f *front) {
	p, row := s.panel(f), s.load(f)
	k, block := p.columns(), s.width*edge
	for i := range tiles(len(f.border)) {
		s.part = tile{}
		c := s.part[:block]
		for j, n := range f.border[edge*i : min(edge*i+edge, len(f.border))] {
			copy(c[s.width*j:], s.x[s.width*int(n):][:s.width])
		}
		s.subtractTransposed(row, c, p.row(k+i))
	}
	for j := k - 1; j >= 0; j-- {
		l, c := p.row(j), row[block*j:][:block]
		s.solveTransposed(c, l[area*j:])
		s.subtractTransposed(row[:block*j], c, l[:area*j])
	}
	copy(s.pivots(f), row)
}
