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

func newTable(t *lagrange.Triangle, degree int) *table {
	rule := cubature.Triangle(degree)
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

// tables are the two rules of one order. On a straight triangle the gradients
// are polynomials of degree p−1 and the weight y adds one; on a bent one the
// Jacobian adds more, and its inverse is no polynomial at all, so that two more
// degrees are spent there.
type tables struct {
	straight, bent *table
}

func newTables(t *lagrange.Triangle, revolved bool) tables {
	degree := 2*t.Order - 2
	if revolved {
		// The terms divided by y are no polynomials where a triangle touches
		// the axis with one corner; the spare degree is for those.
		degree += 3
	}
	return tables{newTable(t, max(degree, 1)), newTable(t, 2*t.Order+2)}
}
