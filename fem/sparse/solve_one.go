package sparse

// oneSide treats a single right-hand side: a block is four numbers. The
// operations are those of fourSides in the same order, so that a side gives
// the same bits alone and among others.
var oneSide = kernels{
	width:              1,
	subtractProduct:    subtractProductOne,
	solve:              solveOne,
	subtractTransposed: subtractTransposedOne,
	solveTransposed:    solveTransposedOne,
}

func subtractProductOne(c, a, b []float64) {
	var c0, c1, c2, c3 float64
	for len(a) >= edge && len(b) >= area {
		p, q := (*[edge]float64)(a), (*tile)(b)
		x := p[0]
		c0 += float64(x * q[0])
		c1 += float64(x * q[1])
		c2 += float64(x * q[2])
		c3 += float64(x * q[3])
		x = p[1]
		c0 += float64(x * q[4])
		c1 += float64(x * q[5])
		c2 += float64(x * q[6])
		c3 += float64(x * q[7])
		x = p[2]
		c0 += float64(x * q[8])
		c1 += float64(x * q[9])
		c2 += float64(x * q[10])
		c3 += float64(x * q[11])
		x = p[3]
		c0 += float64(x * q[12])
		c1 += float64(x * q[13])
		c2 += float64(x * q[14])
		c3 += float64(x * q[15])
		a, b = a[edge:], b[area:]
	}
	d := (*[edge]float64)(c)
	d[0] -= c0
	d[1] -= c1
	d[2] -= c2
	d[3] -= c3
}

func solveOne(c, l []float64) {
	x, t := (*[edge]float64)(c), (*tile)(l)
	x[0] = float64(x[0] * t[0])
	x[1] = float64((x[1] - float64(x[0]*t[1])) * t[5])
	x[2] = float64((x[2] - float64(x[0]*t[2]) - float64(x[1]*t[6])) * t[10])
	x[3] = float64((x[3] - float64(x[0]*t[3]) - float64(x[1]*t[7]) - float64(x[2]*t[11])) * t[15])
}

func subtractTransposedOne(c, x, l []float64) {
	y := (*[edge]float64)(x)
	x0, x1, x2, x3 := y[0], y[1], y[2], y[3]
	l = l[:edge*len(c)]
	for i := range c {
		b := (*[edge]float64)(l)
		c[i] -= float64(x0*b[0]) + float64(x1*b[1]) + (float64(x2*b[2]) + float64(x3*b[3]))
		l = l[edge:]
	}
}

func solveTransposedOne(c, l []float64) {
	x, t := (*[edge]float64)(c), (*tile)(l)
	x[3] = float64(x[3] * t[15])
	x[2] = float64((x[2] - float64(x[3]*t[11])) * t[10])
	x[1] = float64((x[1] - float64(x[3]*t[7]) - float64(x[2]*t[6])) * t[5])
	x[0] = float64((x[0] - float64(x[3]*t[3]) - float64(x[2]*t[2]) - float64(x[1]*t[1])) * t[0])
}
