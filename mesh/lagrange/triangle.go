package lagrange

import "sync"

// A Triangle is the Lagrange element of one order on the reference triangle
// (0,0), (1,0), (0,1). It is immutable and safe for concurrent use.
//
// Corner k has the barycentric coordinate λ_k, with λ_0 = 1−ξ−η, λ_1 = ξ,
// λ_2 = η. Edge k lies opposite corner k and runs from corner k+1 to corner
// k+2 (mod 3), so the three follow one another counter-clockwise.
type Triangle struct {
	Order int
	Count int // (Order+1)(Order+2)/2 nodes

	// Nodes are the reference coordinates: corners 0, 1, 2; the Order−1 inner
	// nodes of edge 0, of edge 1 and of edge 2 in running order; the interior.
	Nodes [][2]float64

	// EdgeNodes are the parameters in (0, 1) of an edge's inner nodes, in
	// running order; they are symmetric about 1/2.
	EdgeNodes []float64

	modal modal
	coef  []float64 // Count × Count; row n expands basis function n in the modes
	edges [3][]int

	once      sync.Once
	bernstein []float64
}

// New builds the element of an order from 1 to MaxOrder.
func New(order int) *Triangle {
	if order < 1 || order > MaxOrder {
		panic("lagrange: order out of range")
	}
	v := lobatto(order)
	t := &Triangle{
		Order:     order,
		Count:     (order + 1) * (order + 2) / 2,
		Nodes:     grid(v),
		EdgeNodes: v[1:order],
		modal:     newModal(order),
	}
	t.coef = t.modal.interpolation(t.Nodes)
	for k := range t.edges {
		t.edges[k] = edge(k, order)
	}
	return t
}

// grid places the nodes of Blyth & Pozrikidis, IMA J. Appl. Math. 71 (2006)
// 153-169, built from the points v of one edge.
func grid(v []float64) [][2]float64 {
	p := len(v) - 1
	nodes := make([][2]float64, 0, (p+1)*(p+2)/2)
	nodes = append(nodes, [2]float64{0, 0}, [2]float64{1, 0}, [2]float64{0, 1})
	for i := 1; i < p; i++ {
		nodes = append(nodes, [2]float64{v[p-i], v[i]})
	}
	for i := 1; i < p; i++ {
		nodes = append(nodes, [2]float64{0, v[p-i]})
	}
	for i := 1; i < p; i++ {
		nodes = append(nodes, [2]float64{v[i], 0})
	}
	for j := 1; j < p; j++ {
		for i := 1; i < p-j; i++ {
			vi, vj, vk := v[i], v[j], v[p-i-j]
			nodes = append(nodes, [2]float64{(1 + 2*vi - vj - vk) / 3, (1 + 2*vj - vi - vk) / 3})
		}
	}
	return nodes
}

// edge lists the nodes along edge k.
func edge(k, order int) []int {
	nodes := []int{(k + 1) % 3}
	for i := range order - 1 {
		nodes = append(nodes, 3+k*(order-1)+i)
	}
	return append(nodes, (k+2)%3)
}

// Edge lists the numbers of the Order+1 nodes on edge k in running order, both
// corners included. The caller must not change the list.
func (t *Triangle) Edge(k int) []int { return t.edges[k] }

// Basis sets phi[n] to the value at (ξ, η) of the polynomial that is 1 at node
// n and 0 at the others. Phi has length Count. The point may lie anywhere, but
// the values grow fast outside the triangle.
func (t *Triangle) Basis(xi, eta float64, phi []float64) {
	var modes [MaxCount]float64
	t.modal.values(xi, eta, &modes)
	psi := modes[:t.Count]
	phi = phi[:t.Count]
	for n := range phi {
		row := t.coef[n*t.Count:][:len(psi)]
		// Even and odd modes apart: two short chains of additions, not one long.
		var even, odd float64
		m := 0
		for ; m+1 < len(psi); m += 2 {
			even += float64(row[m] * psi[m])
			odd += float64(row[m+1] * psi[m+1])
		}
		if m < len(psi) {
			even += float64(row[m] * psi[m])
		}
		phi[n] = even + odd
	}
}

// Gradients sets dxi and deta, each of length Count, to the derivatives of the
// basis functions with respect to ξ and η, and phi as Basis does to their
// values unless it is nil.
func (t *Triangle) Gradients(xi, eta float64, phi, dxi, deta []float64) {
	var psi, px, pe [MaxCount]float64
	t.modal.gradients(xi, eta, &psi, &px, &pe)
	dxi, deta = dxi[:t.Count], deta[:t.Count]
	for n := range dxi {
		row := t.coef[n*t.Count:][:t.Count]
		var v, x, e float64
		for m, c := range row {
			v += float64(c * psi[m])
			x += float64(c * px[m])
			e += float64(c * pe[m])
		}
		dxi[n], deta[n] = x, e
		if phi != nil {
			phi[n] = v
		}
	}
}
