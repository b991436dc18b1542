// Package tolerance carries the tolerances of a drawing over to the factor and
// to the peak stress: the range over the box of permitted dimensions, first-order
// sensitivities, and who contributes most.
//
// All values are computed at points of the box: its corners, the middles of its
// faces, its middle and the part as drawn. A range is that of the points solved;
// where one that is no corner lies beyond all corners the answer says so. The
// peak stress is that under a load which stays the same, over the nominal stress
// of the part as drawn: it follows the net section as well as the factor.
//
// Lengths are in the unit of the question, sensitivities per that unit. Bars are
// absolute and come from the ladders of the points alone.
package tolerance
