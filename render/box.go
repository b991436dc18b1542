package render

// A box is a rectangle on the sheet in pixels, y downwards.
type box struct{ X0, Y0, X1, Y1 float64 }

func (b box) width() float64  { return b.X1 - b.X0 }
func (b box) height() float64 { return b.Y1 - b.Y0 }

func (b box) middle() (x, y float64) { return (b.X0 + b.X1) / 2, (b.Y0 + b.Y1) / 2 }

// grown gives the box with a margin added all round.
func (b box) grown(m float64) box { return box{b.X0 - m, b.Y0 - m, b.X1 + m, b.Y1 + m} }

// widened gives the box with a margin added on its left and right.
func (b box) widened(m float64) box { return box{b.X0 - m, b.Y0, b.X1 + m, b.Y1} }

// meets tells whether two boxes share an area.
func (b box) meets(o box) bool {
	return b.X0 < o.X1 && o.X0 < b.X1 && b.Y0 < o.Y1 && o.Y0 < b.Y1
}

// holds tells whether o lies inside b.
func (b box) holds(o box) bool {
	return b.X0 <= o.X0 && o.X1 <= b.X1 && b.Y0 <= o.Y0 && o.Y1 <= b.Y1
}

// has tells whether a point lies inside b.
func (b box) has(p point) bool { return b.X0 <= p.X && p.X <= b.X1 && b.Y0 <= p.Y && p.Y <= b.Y1 }

// A point is a place on the sheet in pixels, y downwards.
type point struct{ X, Y float64 }

func (p point) plus(dx, dy float64) point { return point{p.X + dx, p.Y + dy} }

// toward goes from p a distance along a direction.
func (p point) toward(dir point, distance float64) point {
	return point{p.X + dir.X*distance, p.Y + dir.Y*distance}
}
