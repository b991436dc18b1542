// Package lagrange holds the Lagrange finite element on the reference triangle
// with corners (0,0), (1,0), (0,1): where its nodes lie, its basis functions
// and their derivatives, at any order from 1 to MaxOrder, and the matching
// basis on the interval [0, 1].
//
// Nodes on an edge are the Gauss-Lobatto points of the edge, so neighbours
// fit together and the trace of the triangle's basis on an edge is the Line
// basis of the same order. Inside lies the Lobatto grid of Blyth & Pozrikidis,
// which keeps the Lebesgue constant small:
//
//	order                1     2     3     4     5     6     7     8     10    12
//	Lobatto grid      1.00  1.67  2.11  2.66  3.14  3.87  4.66  5.92  9.80  17.8
//	even spacing      1.00  1.67  2.27  3.47  5.45  8.75  14.3  24.0  70.9   221
//
// (largest sum of absolute basis functions, as the package's test measures
// it). Interpolation errors are within one plus that factor of the best
// possible polynomial's.
//
// Evaluation allocates nothing, and its bits do not depend on the machine.
package lagrange

// MaxOrder is the highest order of element that the package builds.
const MaxOrder = 12

// MaxCount is the number of nodes at MaxOrder.
const MaxCount = (MaxOrder + 1) * (MaxOrder + 2) / 2
