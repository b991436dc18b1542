// Package evidence holds problems whose answers are known from outside: solutions
// in closed form, published values, sections that can be computed by hand. Tests
// and the command that shows a build right draw on the same list.
//
// What a case expects is data beside its source; what it finds is computed when it
// is run, and nothing of the one enters the other. Problems are meshed and solved
// as they stand here, away from the ladders of package verify, save where a case
// says that it is the whole program that is tried.
package evidence
