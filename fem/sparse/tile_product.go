package sparse

// A tile is a 4×4 block: the number in row i and column j is tile[4*j+i].
// Matrices are stored as rows of tiles, so that four numbers of a column lie
// side by side and a row of tiles can be read from end to end.
type tile [16]float64

// edge is the number of rows and columns of a tile, area its numbers.
const (
	edge = 4
	area = edge * edge
)

// tiles returns the number of tiles that n rows need.
func tiles(n int) int { return (n + edge - 1) / edge }

// subtractProduct sets c to c − a·bᵀ, where a and b are rows of tiles of equal
// length. Nearly all arithmetic of the package happens here.
//
// Two columns of c at a time leave eight sums, two factors and two products at
// work: what the sixteen registers of amd64 hold. The products over one tile
// are written out, because the compiler keeps sums in registers well only
// inside a basic block. Each entry is summed in the order of the columns and
// subtracted from c in the end.
func subtractProduct(c *tile, a, b []float64) {
	subtractLeft(c, a, b)
	subtractRight(c, a, b)
}

// subtractLeft does subtractProduct for columns 0 and 1 of c.
func subtractLeft(c *tile, a, b []float64) {
	var c00, c01, c10, c11, c20, c21, c30, c31 float64
	for len(a) >= 16 && len(b) >= 16 {
		p, q := (*tile)(a), (*tile)(b)
		x, y := q[0], q[1]
		v := p[0]
		c00 += float64(v * x)
		c01 += float64(v * y)
		v = p[1]
		c10 += float64(v * x)
		c11 += float64(v * y)
		v = p[2]
		c20 += float64(v * x)
		c21 += float64(v * y)
		v = p[3]
		c30 += float64(v * x)
		c31 += float64(v * y)
		x, y = q[4], q[5]
		v = p[4]
		c00 += float64(v * x)
		c01 += float64(v * y)
		v = p[5]
		c10 += float64(v * x)
		c11 += float64(v * y)
		v = p[6]
		c20 += float64(v * x)
		c21 += float64(v * y)
		v = p[7]
		c30 += float64(v * x)
		c31 += float64(v * y)
		x, y = q[8], q[9]
		v = p[8]
		c00 += float64(v * x)
		c01 += float64(v * y)
		v = p[9]
		c10 += float64(v * x)
		c11 += float64(v * y)
		v = p[10]
		c20 += float64(v * x)
		c21 += float64(v * y)
		v = p[11]
		c30 += float64(v * x)
		c31 += float64(v * y)
		x, y = q[12], q[13]
		v = p[12]
		c00 += float64(v * x)
		c01 += float64(v * y)
		v = p[13]
		c10 += float64(v * x)
		c11 += float64(v * y)
		v = p[14]
		c20 += float64(v * x)
		c21 += float64(v * y)
		v = p[15]
		c30 += float64(v * x)
		c31 += float64(v * y)
		a, b = a[16:], b[16:]
	}
	c[0] -= c00
	c[1] -= c10
	c[2] -= c20
	c[3] -= c30
	c[4] -= c01
	c[5] -= c11
	c[6] -= c21
	c[7] -= c31
}

// subtractRight does subtractProduct for columns 2 and 3 of c.
func subtractRight(c *tile, a, b []float64) {
	var c00, c01, c10, c11, c20, c21, c30, c31 float64
	for len(a) >= 16 && len(b) >= 16 {
		p, q := (*tile)(a), (*tile)(b)
		x, y := q[2], q[3]
		v := p[0]
		c00 += float64(v * x)
		c01 += float64(v * y)
		v = p[1]
		c10 += float64(v * x)
		c11 += float64(v * y)
		v = p[2]
		c20 += float64(v * x)
		c21 += float64(v * y)
		v = p[3]
		c30 += float64(v * x)
		c31 += float64(v * y)
		x, y = q[6], q[7]
		v = p[4]
		c00 += float64(v * x)
		c01 += float64(v * y)
		v = p[5]
		c10 += float64(v * x)
		c11 += float64(v * y)
		v = p[6]
		c20 += float64(v * x)
		c21 += float64(v * y)
		v = p[7]
		c30 += float64(v * x)
		c31 += float64(v * y)
		x, y = q[10], q[11]
		v = p[8]
		c00 += float64(v * x)
		c01 += float64(v * y)
		v = p[9]
		c10 += float64(v * x)
		c11 += float64(v * y)
		v = p[10]
		c20 += float64(v * x)
		c21 += float64(v * y)
		v = p[11]
		c30 += float64(v * x)
		c31 += float64(v * y)
		x, y = q[14], q[15]
		v = p[12]
		c00 += float64(v * x)
		c01 += float64(v * y)
		v = p[13]
		c10 += float64(v * x)
		c11 += float64(v * y)
		v = p[14]
		c20 += float64(v * x)
		c21 += float64(v * y)
		v = p[15]
		c30 += float64(v * x)
		c31 += float64(v * y)
		a, b = a[16:], b[16:]
	}
	c[8] -= c00
	c[9] -= c10
	c[10] -= c20
	c[11] -= c30
	c[12] -= c01
	c[13] -= c11
	c[14] -= c21
	c[15] -= c31
}
