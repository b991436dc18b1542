// Package render draws findings like sheets of a drawing office: the stress
// picture of a part, the dimensioned sketch of a family, and the plot of a
// convergence study, profiles and families of curves.
//
// It computes no mechanics. Stresses come from a solved problem whose nominal
// stress is one, so that every stress read from it is a ratio to the nominal
// stress; verdicts, factors and their uncertainties come from package verify.
//
// Lengths on a sheet are given in units of about an eighth of a millimetre, so
// that the smallest lettering has capitals of 1.6 mm. A sheet has at most 1600
// of them across; narrower paper has fewer, and a layout that follows: letters
// keep their height. Line drawings (Figure) can be written as SVG too.
package render
