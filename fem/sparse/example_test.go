package sparse_test

import (
	"context"
	"fmt"

	"notchproof/fem/sparse"
)

// Three springs in a row, fixed at the left end, pulled at the right: each
// stretches by force ÷ stiffness.
func Example() {
	pattern := sparse.Pattern{
		Unknowns: 3,
		Start:    []int32{0, 2, 4, 6},
		Index:    []int32{-1, 0, 0, 1, 1, 2},
		Center:   [][2]float64{{0.5, 0}, {1.5, 0}, {2.5, 0}},
	}
	plan, err := sparse.Analyse(pattern)
	if err != nil {
		fmt.Println(err)
		return
	}
	stiffness := []float64{1, 2, 4}
	fill := func(_, element int, matrix []float64) {
		k := stiffness[element]
		copy(matrix, []float64{k, 0, -k, k}) // the upper triangle is not read
	}
	factor, err := plan.Factor(context.Background(), fill, nil, 0)
	if err != nil {
		fmt.Println(err)
		return
	}
	x := []float64{0, 0, 8} // the forces, then the displacements
	factor.Solve(x)
	fmt.Printf("%.12g\n", x)
	// Output: [8 12 14]
}
