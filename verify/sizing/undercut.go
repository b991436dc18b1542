package sizing

import (
	"fmt"

	"gonum.org/v1/gonum/spatial/r2"

	"notchproof/mesh/outline"
	"notchproof/scf"
	"notchproof/verify/specimen"
)

// undercut relieves a shoulder by a groove of half-round section turned into
// its face, tangent to the thinner section, whose full length stays free. The
// radius of the groove is sought; it takes twice that from the face, and is as
// deep as it is wide.
//
//	      ┌── larger size D
//	──────┐
//	      │ what is left of the face
//	    ╭─┘
//	    │    groove
//	    ╰──────────── thinner size d
func (q *Question) undercut(d, D float64, within Interval) way {
	return way{
		what: "half-round undercut into the face", sought: "radius", within: within,
		draw: func(x float64) (*specimen.Part, error) { return q.drawUndercut(d, D, x) },
		changes: func(x float64) []Size {
			return []Size{{"height of the face", -2 * x}}
		},
	}
}

func (q *Question) drawUndercut(d, D, radius float64) (*specimen.Part, error) {
	const ends = 3 // sizes of plain part at either side
	path := fmt.Sprintf("M %.17g 0 H %.17g V %.17g H 0 A %.17g %[4]g 0 0 0 %.17[5]g %.17[6]g A %.17[4]g %.17[4]g 0 0 0 0 %.17[7]g V %.17[8]g H %.17[1]g Z",
		-ends*D, ends*d, d/2, radius, -radius, d/2+radius, d/2+2*radius, D/2)
	loops, err := outline.ParsePath(path)
	if err != nil {
		return nil, err
	}
	drawing := specimen.Drawing{
		Kind: q.Family.Kind, Unit: q.Unit, Loops: loops, Options: q.Options, Mirror: q.Family.Kind == scf.Bar,
		Nominal: &specimen.Section{Across: true, From: r2.Vec{X: d}},
	}
	return drawing.Part()
}
