// Command generate finds the fully symmetric rules of the package cubature.
//
// Without flags it solves the moment equations again from the recorded starts
// and writes the table. With -search it looks for rules of few points from many
// starts and prints what to record.
package main

import (
	"flag"
	"fmt"
	"os"
	"slices"
)

func main() {
	searching := flag.Bool("search", false, "look for rules instead of writing the table")
	low := flag.Int("low", 1, "lowest degree to search")
	high := flag.Int("high", 20, "highest degree to search")
	tries := flag.Uint64("starts", 2000, "starts for one structure")
	flag.Parse()
	if *searching {
		for degree := *low; degree <= *high; degree++ {
			search(degree, *tries)
		}
		return
	}
	if err := write(os.Stdout); err != nil {
		fmt.Fprintln(os.Stderr, err)
		os.Exit(1)
	}
}

// search tries the structures with enough unknowns, those of fewest points
// first, and stops at the first that yields a rule.
func search(degree int, tries uint64) {
	for _, shape := range candidates(degree) {
		s := newSystem(degree, shape)
		for n := uint64(1); n <= tries; n++ {
			y, ok := s.solve(s.start(n))
			if !ok {
				continue
			}
			if list, _, _ := s.orbits(y); usable(list) {
				fmt.Printf("\t{%d, structure{%d, %d, %d}, %d}, // %d points\n",
					degree, shape.centroid, shape.median, shape.general, n, shape.points())
				return
			}
		}
		fmt.Fprintf(os.Stderr, "degree %d: %d points %v: none\n", degree, shape.points(), shape)
	}
}

// candidates lists the structures that the count of equations allows, those of
// fewest points first. The invariant polynomials that vanish on the medians are
// the multiples of ((λ0−λ1)(λ1−λ2)(λ2−λ0))², of degree 6; only general orbits
// serve them. Those that vanish at the centroid are all but one.
func candidates(degree int) []structure {
	equations := len(exponents(degree))
	off := len(exponents(degree - 6))
	var list []structure
	for c := range 2 {
		for m := range 20 {
			for g := range 20 {
				s := structure{c, m, g}
				n := s.unknowns()
				if n >= equations && n <= equations+3 && 3*g >= off && 2*m+3*g >= equations-1 {
					list = append(list, s)
				}
			}
		}
	}
	slices.SortFunc(list, func(a, b structure) int {
		if a.points() != b.points() {
			return a.points() - b.points()
		}
		return b.unknowns() - a.unknowns()
	})
	return list
}
