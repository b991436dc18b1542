package outline_test

import (
	"fmt"

	"notchproof/mesh/outline"
)

// A hatch hanger: a strap 40 mm wide with an eye of 16 mm, from path data.
func ExampleParsePath() {
	loops, err := outline.ParsePath("M 0 -20 H 120 V 20 H 0 Z M 60 -8 a 8 8 0 0 1 0 16 8 8 0 0 1 0 -16 z")
	if err != nil {
		fmt.Println(err)
		return
	}
	r := &outline.Region{Outer: loops[0], Holes: loops[1:]}
	if err := r.Validate(); err != nil {
		fmt.Println(err)
		return
	}
	s, err := r.SmallestSection(0, 120, func(cut []outline.Interval) float64 { return outline.Bar(cut).Area })
	fmt.Printf("area %.3f\n", r.Properties().Area)
	fmt.Printf("least width %g at x = %g: %v %v\n", s.Value, s.From, s.Cut, err)
	for _, run := range r.ConcaveRuns() {
		fmt.Println("concave sides", run.Sides)
	}

	// Output:
	// area 4598.938
	// least width 24 at x = 60: [{-20 -8} {8 20}] <nil>
	// concave sides [4 5]
}

// A hole that reaches the edge is refused, with the place.
func ExampleRegion_Validate() {
	loops, err := outline.ParsePath("M 0 -20 H 120 V 20 H 0 Z M 60 4 a 8 8 0 0 1 0 16 8 8 0 0 1 0 -16 z")
	if err != nil {
		fmt.Println(err)
		return
	}
	r := &outline.Region{Outer: loops[0], Holes: loops[1:]}
	fmt.Println(r.Validate())

	_, err = outline.ParsePath("M 0 -20 H 120 V 20 H O Z")
	fmt.Println(err)

	// Output:
	// "L3" (side 3 of the outer loop) and "A6" (side 1 of hole 1) cross or touch at (60, 20)
	// path data, byte 21: "O": not a number
}
