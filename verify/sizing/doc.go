// Package sizing turns a check round: given the factor or the stress that a
// part may have, it finds the dimension that just meets it.
//
// A Question names the family, the dimensions that stay, the one that is
// sought, a Measure and the largest value that the measure may take. Find scans
// what can be drawn on a coarse grid, brackets the places where the measure
// passes the limit, finds the one that matters by Brent's method and says how
// well it is known: the bar of the measure over its slope. The measure is
// computed at every step; published factors play no part here.
//
// Lengths are in the unit of the question. What a limit means for safety, and
// what it costs, is left to the caller; Alternatives lists other ways to meet
// the same limit in the same envelope.
package sizing
