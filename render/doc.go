// Package render draws findings like sheets of a drawing office: the stress
// picture of a part, the dimensioned sketch of a family, and the plot of a
// convergence study, profiles and families of curves.
//
// It computes no mechanics. Stresses come from a solved problem whose nominal
// stress is one, so that every stress read from it is a ratio to the nominal
// stress; verdicts, factors and their uncertainties come from package verify.
//
// Lengths on a sheet are given in units of 1/1600 of its width:
// on the default sheet of 1600 pixels a unit is a pixel, on any other all of
// it, lettering included, scales along. The paper of a picture has the
// proportions 1 : √2. Line drawings (Figure) follow the width of the paper that
// they are meant for and can be written as SVG too.
package render
