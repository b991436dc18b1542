package misreading

import "fmt"

// grossSection: the factor referred to the stress on the gross section.
func grossSection(q *Question) []wrong {
	n := q.Load.Nominal
	if n.Gross == 0 || n.Net == n.Gross {
		return nil
	}
	return []wrong{{
		what: "on the gross section instead of the net one",
		part: q.Part, load: q.Load.Name, chartsOnly: true,
		times: n.Net / n.Gross,
		known: []value{{q.Factor * n.Net / n.Gross, computed}},
	}}
}

// otherStress: the right place, but not the first principal stress there (in
// torsion: not the largest shear stress).
func otherStress(q *Question) []wrong {
	if q.Load.Shear {
		// At the free surface of a twisted shaft the first principal stress is
		// the shear stress, and von Mises' is √3 times it.
		return []wrong{
			{what: "von Mises stress over the nominal shear stress", known: []value{{q.VonMises * sqrt3, computed}}},
		}
	}
	list := []wrong{{what: "von Mises stress instead of the first principal stress", known: []value{{q.VonMises, computed}}}}
	return append(list, wrong{
		what: fmt.Sprintf("largest shear stress over the nominal stress of %s", q.Load.Name),
		// The free surface has no third stress: half of the first is the shear.
		known: []value{{q.Factor / 2, computed}},
	})
}

const sqrt3 = 1.7320508075688772
