package cubature

//go:generate sh -c "go run ./generate > table.go.new && mv table.go.new table.go"

// orbits describe a rule that is unchanged by the six symmetries of the
// triangle, as its points do in the plane of barycentric coordinates: weight
// of the centroid (0: none), weight and a of the three points (a, a, 1−2a) on
// the medians, weight, a and b of the six points (a, b, 1−a−b).
type orbits struct {
	degree   int
	centroid float64
	median   [][2]float64
	general  [][3]float64
}

// rule lists the points of all orbits.
func (o *orbits) rule() Rule {
	n := 1 + 3*len(o.median) + 6*len(o.general)
	r := Rule{o.degree, make([][2]float64, 0, n), make([]float64, 0, n)}
	add := func(w, xi, eta float64) {
		r.Points = append(r.Points, [2]float64{xi, eta})
		r.Weights = append(r.Weights, w)
	}
	if o.centroid > 0 {
		add(o.centroid, 1./3, 1./3)
	}
	for _, m := range o.median {
		w, a := m[0], m[1]
		c := 1 - 2*a
		add(w, a, a)
		add(w, c, a)
		add(w, a, c)
	}
	for _, g := range o.general {
		w, a, b := g[0], g[1], g[2]
		c := 1 - a - b
		for _, p := range [6][2]float64{{a, b}, {b, a}, {b, c}, {c, b}, {c, a}, {a, c}} {
			add(w, p[0], p[1])
		}
	}
	return r
}
