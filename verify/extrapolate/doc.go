// Package extrapolate turns the values of a ladder of solves into a value with
// an error bar. It is arithmetic alone and knows nothing of what was solved.
//
// Two kinds of ladder are read: Sizes takes ever finer meshes of one order
// (Richardson, Roache, Celik et al.), Orders takes ever higher orders on one
// mesh. Both work from the differences between rungs; what all rungs have
// wrong in common (a wrong load, a wrong shape) leaves no trace in them.
//
// Nothing here fails with an error. A ladder from which nothing can be said
// gives a status that says so, and the zero value of every result is undecided.
package extrapolate
