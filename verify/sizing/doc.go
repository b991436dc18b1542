// Package sizing turns a check round: given the factor or the stress that a
// part may have, it finds the dimension that just meets it.
//
// A Question names the family, the dimensions that stay, the one that is
// sought, a Measure and the largest value that the measure may take. Find scans
// what can be drawn on a coarse grid of single solves. Places too near to the
// limit for those are solved better, and stretches where the curve may reach over
// the limit between two places are looked at closer, by its second differences.
// Of the places where the measure passes the limit the one that matters is found
// by Chandrupatla's method, confirmed by a full ladder, and known to the bar of
// the measure over its slope. That nothing or everything keeps the limit is said
// when a full ladder at the extreme place has shown it. The measure is computed at
// every step; published factors play no part here.
//
// Lengths are in the unit of the question. What a limit means for safety, and
// what it costs, is left to the caller; Alternatives lists other ways to meet
// the same limit in the same envelope.
package sizing
