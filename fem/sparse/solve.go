package sparse

// Solve replaces each right-hand side by the solution. Every side has one
// number per unknown. They are treated four at a time; each gives the bits
// that it gives alone.
func (f *Factor) Solve(b ...[]float64) {
	f.check()
	p := f.plan
	s := &substitution{factor: f, x: make([]float64, edge*p.unknowns), row: make([]float64, area*tiles(p.largest))}
	for ; len(b) > 0; b = b[min(edge, len(b)):] {
		sides := b[:min(edge, len(b))]
		clear(s.x)
		for j, side := range sides {
			if len(side) != p.unknowns {
				panic("sparse: length of a right-hand side")
			}
			for n, u := range p.order {
				s.x[edge*n+j] = side[u]
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
				side[u] = s.x[edge*n+j]
			}
		}
	}
}

func (f *Factor) check() {
	if f.version != f.workspace.version {
		panic("sparse: factor used after its workspace went on")
	}
}

// substitution solves for up to four sides at once. They lie in x as rows of
// tiles: side j of the unknown with elimination number n is x[4n+j].
type substitution struct {
	factor *Factor
	x      []float64
	row    []float64 // the part of x that belongs to the pivots of a front
}

// load copies the pivots' part of x, with zeros up to whole tiles.
func (s *substitution) load(f *front) []float64 {
	row := s.row[:area*tiles(f.pivots)]
	n := copy(row, s.x[edge*f.first:][:edge*f.pivots])
	clear(row[n:])
	return row
}

func (s *substitution) panel(f *front) panel {
	return panel{values: s.factor.values[f.factor:][:panelLen(f.pivots, len(f.border))], pivots: f.pivots}
}

// forward solves for the pivots of a front and takes their part out of its
// border.
func (s *substitution) forward(f *front) {
	p, row := s.panel(f), s.load(f)
	k := p.columns()
	p.solveRow(row, 0, k)
	copy(s.x[edge*f.first:][:edge*f.pivots], row)
	for i := range tiles(len(f.border)) {
		var c tile
		subtractProduct(&c, row, p.row(k+i))
		for j, n := range f.border[edge*i : min(edge*i+edge, len(f.border))] {
			x := (*[edge]float64)(s.x[edge*n:])
			for side := range x {
				x[side] += c[edge*j+side]
			}
		}
	}
}

// backward solves for the pivots of a front when its border is known.
func (s *substitution) backward(f *front) {
	p, row := s.panel(f), s.load(f)
	k := p.columns()
	for i := range tiles(len(f.border)) {
		var c tile
		for j, n := range f.border[edge*i : min(edge*i+edge, len(f.border))] {
			copy(c[edge*j:], s.x[edge*n:][:edge])
		}
		subtractTransposed(row, &c, p.row(k+i))
	}
	for j := k - 1; j >= 0; j-- {
		l, c := p.row(j), (*tile)(row[area*j:])
		solveTileTransposed(c, (*tile)(l[area*j:]))
		subtractTransposed(row[:area*j], c, l[:area*j])
	}
	copy(s.x[edge*f.first:][:edge*f.pivots], row)
}
