// Package sparse solves symmetric positive definite systems that are sums of
// small dense element matrices, by an element-based multifrontal Cholesky
// factorisation (Duff & Reid, "The multifrontal solution of indefinite sparse
// symmetric linear equations", ACM TOMS 9, 1983).
//
// In comes a Pattern: which global unknowns each element touches, and where
// the element lies. Analyse turns it into a Plan, once for a mesh. Plan.Factor
// then asks for the element matrices one by one and returns a Factor, which
// solves for any number of right-hand sides. The global matrix never exists.
//
// What happens inside, in the words used throughout:
//
//   - The elements are halved again and again by geometry (nested dissection:
//     George, "Nested dissection of a regular finite element mesh", SIAM J.
//     Numer. Anal. 10, 1973). The halves make a binary tree.
//   - Each node of the tree has a front: a dense matrix over its pivots, the
//     unknowns that no element outside the node touches and that were not
//     eliminated further down, and its border, the unknowns that connect the
//     node with the rest.
//   - A front gathers element matrices (at a leaf) or what its children left,
//     eliminates its pivots, keeps those columns as a part of the factor, and
//     hands the Schur complement over its border to its parent.
//
// All dense work is done on tiles of 4×4 numbers. Every entry is computed from
// the same numbers in the same order whatever the number of goroutines, and
// products are rounded before they are added, so the bits of a result depend
// on the pattern and the matrices alone, not on scheduling or the machine.
//
// Units, physics and meshes are the caller's business. Unknowns that have a
// prescribed value are marked −1 in the pattern; moving their effect to the
// right-hand side is left to the caller too.
package sparse
