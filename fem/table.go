package fem

import (
	"notchproof/fem/cubature"
	"notchproof/mesh/lagrange"
)

// A table holds the basis of the reference triangle and its derivatives at the
// points of a cubature rule, node by node: entry i*points+q.
type table struct {
	points       int
	weights      []float64
	phi, dxi, de []float64
}

func newTable(t *lagrange.Triangle, rule cubature.Rule) *table {
	n, nq := t.Count, len(rule.Weights)
	tab := &table{
		points:  nq,
		weights: rule.Weights,
		phi:     make([]float64, n*nq),
		dxi:     make([]float64, n*nq),
		de:      make([]float64, n*nq),
	}
	phi, dxi, de := make([]float64, n), make([]float64, n), make([]float64, n)
	for q, p := range rule.Points {
		t.Gradients(p[0], p[1], phi, dxi, de)
		for i := range n {
			tab.phi[i*nq+q], tab.dxi[i*nq+q], tab.de[i*nq+q] = phi[i], dxi[i], de[i]
		}
	}
	return tab
}

// tables are what elements of one order are integrated with.
type tables struct {
	straight, bent *table
	affine         *affineTable
}

// maxNodes is the number of nodes of the highest order.
const maxNodes = lagrange.MaxCount

// newTables chooses the rules. On a straight triangle the gradients are
// polynomials of degree p−1; on a bent one the Jacobian adds to that, and its
// inverse is no polynomial at all, so that four more degrees are spent there. A constant
// stress is integrated exactly on any bent triangle of a body of revolution from
// degree 3p−2 on: (p−1) of the gradient, (p−1) of the Jacobian's cofactor, p of y.
// In bodies of revolution the terms divided by y are no polynomials where a
// triangle touches the axis with one corner; on straight triangles three
// degrees more are for those.
func newTables(t *lagrange.Triangle, revolved bool) tables {
	degree := max(2*t.Order-2, 1)
	if revolved {
		degree = 2*t.Order + 1
	}
	rule := cubature.Triangle(degree)
	straight := newTable(t, rule)
	return tables{
		straight: straight,
		bent:     newTable(t, cubature.Triangle(max(2*t.Order+2, 3*t.Order-2))),
		affine:   newAffineTable(straight, t.Count, revolved, rule.Points),
	}
}
