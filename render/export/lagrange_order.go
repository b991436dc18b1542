package export

// A node of a triangle of an order: its place in barycentric coordinates, in
// units of 1/order, of corners 0, 1 and 2.
type node [3]int

// at gives the reference coordinates ξ = λ1, η = λ2.
func (n node) at(order int) (xi, eta float64) {
	return float64(n[1]) / float64(order), float64(n[2]) / float64(order)
}

// lagrangeNodes lists the evenly spaced nodes of VTK_LAGRANGE_TRIANGLE in its
// order: the corners, the insides of the edges 0-1, 1-2 and 2-0, and then the
// nodes inside, which are those of a triangle three orders lower that lies one
// step from each edge, in the same order again. (W. J. Schroeder, K. Martin, B.
// Lorensen, The Visualization Toolkit, and its file format document; the
// recursion of the inside from memory.)
func lagrangeNodes(order int) []node {
	nodes := make([]node, 0, (order+1)*(order+2)/2)
	for step := 0; order >= 0; step, order = step+1, order-3 {
		corner := func(k int) node {
			n := node{step, step, step}
			n[k] += order
			return n
		}
		if order == 0 {
			return append(nodes, corner(0))
		}
		nodes = append(nodes, corner(0), corner(1), corner(2))
		for k := range 3 {
			from, to := k, (k+1)%3
			for i := 1; i < order; i++ {
				n := corner(from)
				n[from] -= i
				n[to] += i
				nodes = append(nodes, n)
			}
		}
	}
	return nodes
}
