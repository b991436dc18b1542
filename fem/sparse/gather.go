package sparse

// assembly is a front while it is being filled: its two parts and the diagonal
// sums, addressed by places.
type assembly struct {
	pivots   int
	width    int       // length of a tile row of the panel
	panel    []float64 // zero in the beginning, as all of these
	schur    []float64
	diagonal []float64 // of all rows: what elements alone contribute
}

// row returns the part of the front that holds row i and columns of the side
// of column j (pivots or border), and the index there of column j. Columns of
// one side lie edge apart. Row i must not lie above column j.
func (a *assembly) row(i, j int32) (part []float64, at int) {
	k := int32(a.pivots)
	switch {
	case i < k:
		return a.panel, int(i>>2)*a.width + int(edge*j+i&3)
	case j < k:
		b := i - k
		return a.panel, (tiles(a.pivots)+int(b>>2))*a.width + int(edge*j+b&3)
	}
	b, c := i-k, j-k
	t := int(b >> 2)
	return a.schur, area*t*(t+1)/2 + int(edge*c+b&3)
}

// addElement adds the lower triangle of an element matrix of n rows, given row
// by row.
func (a *assembly) addElement(matrix []float64, n int, runs []run) {
	for i, r := range runs {
		for k := range r.length {
			row := matrix[int(r.from+k)*n:][:n]
			a.diagonal[r.to+k] += row[r.from+k]
			for _, s := range runs[:i] {
				if s.to < r.to {
					a.addAlong(r.to+k, s.to, row[s.from:s.from+s.length])
				} else {
					a.addDown(s.to, r.to+k, row[s.from:s.from+s.length])
				}
			}
			a.addAlong(r.to+k, r.to, row[r.from:r.from+k+1])
		}
	}
}

// addAlong adds values to row i, from column j on.
func (a *assembly) addAlong(i, j int32, values []float64) {
	part, at := a.row(i, j)
	part = part[at:]
	part = part[:edge*(len(values)-1)+1]
	for k, v := range values {
		part[edge*k] += v
	}
}

// addDown adds values to column j, from row i on.
func (a *assembly) addDown(i, j int32, values []float64) {
	for k, v := range values {
		part, at := a.row(i+int32(k), j)
		part[at] += v
	}
}

// addChild adds what a child with r border rows handed over.
func (a *assembly) addChild(handed []float64, r int, toward []run) {
	schur := handed[:schurLen(r)]
	diagonal := handed[schurLen(r):]
	for n, down := range toward {
		for k := range down.length {
			i := down.from + k
			t := int(i >> 2)
			row := schur[area*t*(t+1)/2+int(i&3):]
			for _, along := range toward[:n] {
				part, at := a.row(down.to+k, along.to)
				addStrided(part[at:], row[edge*along.from:], int(along.length))
			}
			part, at := a.row(down.to+k, down.to)
			addStrided(part[at:], row[edge*down.from:], int(k)+1)
			a.diagonal[down.to+k] += diagonal[i]
		}
	}
}

// addStrided adds n numbers of src to numbers of dst; in both, they lie edge
// apart.
func addStrided(dst, src []float64, n int) {
	for ; n >= edge && len(dst) >= 13 && len(src) >= 13; n -= edge {
		d, s := (*[13]float64)(dst), (*[13]float64)(src)
		d[0] += s[0]
		d[4] += s[4]
		d[8] += s[8]
		d[12] += s[12]
		if n == edge {
			return
		}
		dst, src = dst[area:], src[area:]
	}
	for k := range n {
		dst[edge*k] += src[edge*k]
	}
}
