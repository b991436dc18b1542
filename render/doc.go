// Package render draws findings like sheets of a drawing office: the stress
// picture of a part, the dimensioned sketch of a family, and the plot of a
// convergence study.
//
// It computes no mechanics. Stresses come from a solved problem whose nominal
// stress is one, so that every stress read from it is a ratio to the nominal
// stress; verdicts, factors and their uncertainties come from package verify.
//
// Lengths on a sheet are given in units of 1/1600 of its width:
// on the default sheet of 1600 pixels a unit is a pixel, on any other all of
// it, lettering included, scales along. The paper has the proportions 1 : √2.
package render
