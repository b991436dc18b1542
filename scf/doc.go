// Package scf holds what handbooks and theory know of stress concentration.
//
// In: a family of parts with its dimensions and a load. Out: the nominal
// stress by the family's convention, and every published factor for that
// shape, each with its range, the accuracy it is taken to be good for, its
// source and its warnings. Closed-form solutions stand beside them in files
// of their own, for whoever wants to hold a computation against them.
//
// The package solves nothing and draws nothing. It does not judge either: two
// published factors for one shape may differ, and both are returned.
//
// # Conventions
//
// Lengths carry one common unit, which never matters here; angles are in
// degrees. D is the large and d the net width or diameter, r the radius at
// the root. Factors of tension and bending are the largest first principal
// stress over the nominal stress on the net section, those of torsion the
// largest shear stress over the nominal shear stress.
//
// Inside, the books' symbols are kept: h is the height of the step or the
// depth of the notch, x = 2h/D (h/D for a notch on one side), q = h/r and
// s = √q; Kt is the factor on the net section, Ktg that on the gross section,
// Ktu that of the notch with parallel flanks.
package scf
