package sparse

// assembly is a front while it is being filled: its two parts and the diagonal
// sums, addressed by places.
type assembly struct {
	pivots   int
	panel    []float64 // zero in the beginning, as all of these
	schur    []float64
	diagonal []float64 // of all rows: what elements alone contribute
}

// row tells where row i lies: column j is number panel+4·j of the panel if it
// belongs to a pivot, number schur+4·j of the Schur complement if not.
func (a *assembly) row(i int) (panel, schur int) {
	k, width := a.pivots, area*tiles(a.pivots)
	if i < k {
		return i>>2*width + i&3, 0
	}
	i -= k
	t := i >> 2
	return (tiles(k)+t)*width + i&3, area*t*(t+1)/2 + i&3 - edge*k
}

// addElement adds the lower triangle of an element matrix of n rows, given row
// by row. A block below the matrix's diagonal goes above the front's where the
// front has the two runs in the opposite order: then it is transposed.
func (a *assembly) addElement(matrix []float64, n int, runs []run) {
	for i, r := range runs {
		block := matrix[int(r.from)*n:]
		for k := range int(r.length) {
			panel, schur := a.row(int(r.to) + k)
			for _, s := range runs[:i] {
				if s.to < r.to {
					add(a.part(panel, schur, int(s.to)), block[k*n+int(s.from):], 1, int(s.length))
				}
			}
			own := block[k*n+int(r.from):]
			add(a.part(panel, schur, int(r.to)), own, 1, k+1)
			a.diagonal[int(r.to)+k] += own[k]
			for _, s := range runs[i+1:] {
				if s.to < r.to {
					add(a.part(panel, schur, int(s.to)), matrix[int(s.from)*n+int(r.from)+k:], n, int(s.length))
				}
			}
		}
	}
}

// part returns the row whose parts begin as given, from column j on.
func (a *assembly) part(panel, schur, j int) []float64 {
	if j < a.pivots {
		return a.panel[panel+edge*j:]
	}
	return a.schur[schur+edge*j:]
}

// addChild adds what a child with r border rows handed over.
func (a *assembly) addChild(handed []float64, r int, toward []run) {
	s, diagonal := handed[:schurLen(r)], handed[schurLen(r):]
	for n, down := range toward {
		for k := range int(down.length) {
			i := int(down.from) + k
			t := i >> 2
			row := s[area*t*(t+1)/2+i&3:]
			panel, schur := a.row(int(down.to) + k)
			for _, along := range toward[:n] {
				add(a.part(panel, schur, int(along.to)), row[edge*along.from:], edge, int(along.length))
			}
			add(a.part(panel, schur, int(down.to)), row[edge*down.from:], edge, k+1)
			a.diagonal[int(down.to)+k] += diagonal[i]
		}
	}
}

// add adds n numbers of src, step apart, to numbers of dst, edge apart.
func add(dst, src []float64, step, n int) {
	s := 0
	for d := 0; d < edge*n; d += edge {
		dst[d] += src[s]
		s += step
	}
}
