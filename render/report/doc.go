// Package report writes the calculation sheet of a check: one HTML file that
// stands alone, prints to clean pages, and carries what is needed to run the
// check again.
//
// A sheet is made in two steps. New puts everything that is said into a
// Content, plain data that is also what a program may read as JSON. Page then
// writes the content as HTML, Text as text; both are pure functions of it. The
// page embeds its content, so that Read can tell whether the words on a page are
// still those that follow from it, and Holds whether its numbers are still those
// that come out of its input.
//
// Nothing is computed here: numbers come from package verify, pictures from
// package render.
package report
