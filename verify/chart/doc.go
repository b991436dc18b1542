// Package chart computes design charts: the factor of a family of parts over
// one ratio of its dimensions, a curve for each value of another, with the bar
// of every point, the published fits beside it and a formula fitted to it.
//
// A question is put in words (Words) and read into a Question; its Table has
// all points of the grid, curve by curve, and is solved by Run, the same
// whatever the number of goroutines or the shares it was divided into. A table
// is kept in a file (Open) to which every point is added as soon as it and those
// before it are there, so that a run that was stopped goes on where it was.
package chart
