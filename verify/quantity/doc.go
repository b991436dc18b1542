// Package quantity reads, converts and names forces, moments and stresses, each
// a type of its own, so that a torque cannot stand where a force belongs.
//
// A quantity keeps the number and the unit that it was written in; results are
// given back in that unit (Like). Calculations use newtons, newton millimetres
// and megapascals, which go together: N/mm² = MPa. Text must name its unit: a
// bare number of a force says nothing. Lengths are not here; they come in the
// unit of a part, see package specimen.
//
// Units are SI (The International System of Units, BIPM, 9th ed. 2019) and the
// pound-force with inch and foot (NIST Special Publication 811, 2008, appendix
// B): 1 lbf = 0.45359237 kg × 9.80665 m/s² = 4.4482216152605 N and 1 in =
// 25.4 mm, exact both. Conversions are exact but for one rounding.
package quantity
