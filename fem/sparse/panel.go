package sparse

// A front is stored in two parts, both in rows of tiles.
//
// The panel holds the columns of the pivots; it lies in the factor from the
// beginning. Its first tiles(pivots) tile rows are the pivots' own, the
// tiles(border) rows below them the border's, each tiles(pivots) tiles long.
//
// The Schur complement over the border, lower triangle only: tile row i has
// the tiles 0 to i and begins at tile i(i+1)/2. It is handed to the parent,
// together with the diagonal entries that the border's unknowns had before any
// elimination.

// panelLen returns the length of a panel of k pivots and r border rows.
func panelLen(k, r int) int { return area * tiles(k) * (tiles(k) + tiles(r)) }

// schurLen returns the length of a Schur complement over r rows.
func schurLen(r int) int { return area * tiles(r) * (tiles(r) + 1) / 2 }

// handedLen returns the length of what a front hands to its parent.
func handedLen(r int) int { return schurLen(r) + r }

// eliminationFlops counts additions and multiplications of eliminating k
// pivots with r border rows, without the padding to whole tiles.
func eliminationFlops(k, r int) (flops float64) {
	for i := range k {
		below := float64(k - i - 1 + r)
		flops += 1 + below + below*(below+1)
	}
	return flops
}

// band is the number of tile columns of a panel that are finished together,
// before later columns are begun: rows below the diagonal of one band do not
// depend on each other and may be shared among goroutines.
const band = 16

// A panel is the dense matrix above with its dimensions.
type panel struct {
	values   []float64
	pivots   int
	first    int32     // elimination number of the first pivot
	diagonal []float64 // diagonal entries before any elimination
}

func (p *panel) columns() int { return tiles(p.pivots) }

// eliminate turns the panel into columns of the Cholesky factor; rows is its
// number of tile rows.
func (p *panel) eliminate(rows int, j *judge, share sharing) {
	k := p.columns()
	for from := 0; from < k; from += band {
		to := min(k, from+band)
		for i := from; i < to; i++ {
			p.eliminateRow(i, from, i)
			p.eliminateDiagonal(i, j)
		}
		if share == nil {
			for i := to; i < rows; i++ {
				p.eliminateRow(i, from, to)
			}
			continue
		}
		share(rows-to, func(i int) { p.eliminateRow(to+i, from, to) })
	}
}

// row returns tile row i, the pivots' rows first.
func (p *panel) row(i int) []float64 {
	width := area * p.columns()
	return p.values[i*width : (i+1)*width]
}

// eliminateRow finishes the tiles [from, to) of tile row i, left of the
// diagonal; all columns before are finished already.
func (p *panel) eliminateRow(i, from, to int) {
	row := p.row(i)
	for j := from; j < to; j++ {
		l, c := p.row(j), (*tile)(row[area*j:])
		subtractProduct(c, row[:area*j], l[:area*j])
		solveTile(c, (*tile)(l[area*j:]))
	}
}

// eliminateDiagonal finishes the tile on the diagonal of tile row i.
func (p *panel) eliminateDiagonal(i int, j *judge) {
	row := p.row(i)
	c := (*tile)(row[area*i:])
	subtractProduct(c, row[:area*i], row[:area*i])
	factorTile(c, min(edge, p.pivots-edge*i), p.diagonal[edge*i:], p.first+int32(edge*i), j)
}

// complete subtracts from the Schur complement what the elimination of the
// panel takes away; rows is the number of tile rows of the border.
func (p *panel) complete(schur []float64, rows int, share sharing) {
	if share == nil {
		for i := range rows {
			p.completeRow(schur, i)
		}
		return
	}
	share(rows, func(i int) { p.completeRow(schur, rows-1-i) }) // long rows first
}

// completeRow is complete for one tile row.
func (p *panel) completeRow(schur []float64, i int) {
	k := p.columns()
	a := p.row(k + i)
	s := schur[area*i*(i+1)/2:]
	for j := range i + 1 {
		subtractProduct((*tile)(s[area*j:]), a, p.row(k+j))
	}
}

// A sharing runs f(0) to f(n−1), in any order and possibly at once; nil stands
// for a plain loop.
type sharing func(n int, f func(i int))
