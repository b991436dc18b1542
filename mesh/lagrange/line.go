package lagrange

// A Line is the Lagrange basis on [0, 1] with Gauss-Lobatto nodes: the trace
// of the Triangle of the same order on an edge.
type Line struct {
	Order int
	Nodes []float64 // Order+1 ascending parameters, 0 and 1 included
	scale []float64 // 1 / Π (node i − node j), j ≠ i
}

// NewLine builds the basis of an order from 1 to MaxOrder.
func NewLine(order int) *Line {
	if order < 1 || order > MaxOrder {
		panic("lagrange: order out of range")
	}
	l := &Line{Order: order, Nodes: lobatto(order), scale: make([]float64, order+1)}
	for i, vi := range l.Nodes {
		product := 1.0
		for j, vj := range l.Nodes {
			if j != i {
				product *= vi - vj
			}
		}
		l.scale[i] = 1 / product
	}
	return l
}

// Basis sets phi[i] to the value at s of the function that is 1 at node i and
// 0 at the others. Phi has length Order+1.
func (l *Line) Basis(s float64, phi []float64) {
	phi = phi[:len(l.Nodes)]
	left := 1.0
	for i, v := range l.Nodes {
		phi[i] = left * l.scale[i]
		left *= s - v
	}
	right := 1.0
	for i := len(phi) - 1; i >= 0; i-- {
		phi[i] *= right
		right *= s - l.Nodes[i]
	}
}

// Gradients sets phi as Basis does, and dphi to the derivatives with respect
// to s. Phi may be nil.
func (l *Line) Gradients(s float64, phi, dphi []float64) {
	// A basis function is the product of the factors left of its node and those
	// right of it; both running products carry their derivative along.
	var left, dleft [MaxOrder + 1]float64
	p, d := 1.0, 0.0
	for i, v := range l.Nodes {
		left[i], dleft[i] = p*l.scale[i], d*l.scale[i]
		p, d = p*(s-v), float64(d*(s-v))+p
	}
	dphi = dphi[:len(l.Nodes)]
	p, d = 1, 0
	for i := len(dphi) - 1; i >= 0; i-- {
		if phi != nil {
			phi[i] = left[i] * p
		}
		dphi[i] = float64(left[i]*d) + float64(dleft[i]*p)
		p, d = p*(s-l.Nodes[i]), float64(d*(s-l.Nodes[i]))+p
	}
}
