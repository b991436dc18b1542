package strength

import (
	"math"
	"sort"

	"gonum.org/v1/gonum/spatial/r2"

	"notchproof/fem"
)

// competing is the share of the largest stress above which another place is
// worth a line.
const competing = 0.5

// places judges every candidate: the maxima of the summed field on the notch
// and on the other free sides, and the plain sections.
func (q *Question) places(s *solved) []Place {
	of := q.Material.quantity()
	var found []Place
	for i, p := range s.fine.maxima(q.Part.Notch, of) {
		place := q.place(s, p)
		if i > 0 && place.Equivalent < competing*found[0].Equivalent {
			break
		}
		place.Notch = true
		found = append(found, place)
	}
	plain := q.plainPlaces()
	for _, side := range q.Part.Watch {
		if p, ok := q.highestOff(&s.fine, side); ok {
			if place := q.place(s, p); place.Equivalent >= competing*found[0].Equivalent && !amongst(plain, place.Equivalent) {
				found = append(found, place)
			}
		}
	}
	found = append(found, plain...)
	sort.SliceStable(found, func(i, j int) bool { return found[i].Equivalent > found[j].Equivalent })
	return found
}

// place describes a point of the notch or another side. What the orders still
// move it by is part of its bar.
func (q *Question) place(s *solved, p fem.SurfacePoint) Place {
	of := q.Material.quantity()
	at, theta := s.fine.worst(p, of)
	before, _ := s.coarse.worst(p, of)
	place := Place{
		Name: q.Part.Region.Sides()[s.fine.side(p)].Name,
		X:    s.fine.rounded(p, p.At.X), Y: s.fine.rounded(p, p.At.Y), Degrees: theta * 180 / math.Pi,
		Along: at.Tangential, Hoop: at.Hoop, Shear: at.Shear,
		Equivalent:  of(at),
		Uncertainty: s.fine.bar(p) + math.Abs(of(at)-of(before)),
	}
	place.Safety = safety(q.Material.strength().Megapascals(), place.Equivalent, place.Uncertainty)
	return place
}

func (f *field) side(p fem.SurfacePoint) int {
	return int(f.parts[0].solution.Problem.Shape.Mesh.Boundary[p.Edge].Side)
}

// highestOff is the most stressed place of a side off the notch. Where it meets
// the notch the stress is the notch's, at a corner without radius it is
// whatever the mesh makes of it, and at a loaded end it is the load.
func (q *Question) highestOff(f *field, side int) (fem.SurfacePoint, bool) {
	for _, p := range f.maxima([]int{side}, q.Material.quantity()) {
		if !q.excepted(f, p) {
			return p, true
		}
	}
	return fem.SurfacePoint{}, false
}

func (q *Question) excepted(f *field, p fem.SurfacePoint) bool {
	const share = 1e-2 // of the edge it lies on
	near := share * f.edgeLength(p)
	for _, j := range q.Part.Joints {
		if r2.Norm(r2.Sub(p.At, j.At)) <= near {
			return true
		}
	}
	for _, c := range q.Part.Sharp {
		if r2.Norm(r2.Sub(p.At, c.At)) <= near {
			return true
		}
	}
	for _, plain := range q.Part.Plain {
		if math.Abs(p.At.X-plain.To) <= near {
			return true
		}
	}
	return false
}

// rounded brings a coordinate of a maximum to a decimal step no larger than what
// is known of it: a maximum is flat, and its place is good to 1e-4 of the edge
// that it lies on.
func (f *field) rounded(p fem.SurfacePoint, v float64) float64 {
	const share = 1e-4
	step := math.Pow(10, math.Floor(math.Log10(share*f.edgeLength(p))))
	return math.Round(v/step) * step
}

func (f *field) edgeLength(p fem.SurfacePoint) float64 {
	s := f.parts[0].solution
	return r2.Norm(r2.Sub(s.Surface(p.Edge, 1).At, s.Surface(p.Edge, 0).At))
}

// amongst tells that a stress is one of those of the plain sections.
func amongst(plain []Place, stress float64) bool {
	const same = 0.02
	for _, p := range plain {
		if math.Abs(stress-p.Equivalent) <= same*p.Equivalent {
			return true
		}
	}
	return false
}

// plainPlaces are the plain sections by beam theory, which is exact there: the
// far stress of every load at the outermost fibres. Two that are alike are one.
func (q *Question) plainPlaces() []Place {
	var places []Place
	for i, plain := range q.Part.Plain {
		place := q.plainPlace(i, plain.High, 1)
		others := []Place{q.plainPlace(i, plain.Low, 1)}
		if q.around() != once {
			others = []Place{q.plainPlace(i, plain.High, -1)}
		}
		for _, other := range others {
			if other.Equivalent > place.Equivalent {
				place = other
			}
		}
		if !alike(places, place) {
			places = append(places, place)
		}
	}
	return places
}

// plainPlace is the stress at y in a plain stretch, at θ = 0 (turn 1) or 180°
// (turn −1).
func (q *Question) plainPlace(stretch int, y, turn float64) Place {
	plain := q.Part.Plain[stretch]
	p := Place{Name: plain.Name, Beam: true, X: (plain.From + plain.To) / 2, Y: y}
	if turn < 0 {
		p.Degrees = 180
	}
	for _, name := range q.loads() {
		l := q.find(name)
		stress := q.nominal(l) * l.Far(stretch, y)
		switch {
		case l.Shear:
			p.Shear += stress
		case q.around() != once && turning(name):
			p.Along += turn * stress
		default:
			p.Along += stress
		}
	}
	p.Equivalent = q.Material.equivalent(p.Along, p.Shear)
	p.Safety = safety(q.Material.strength().Megapascals(), p.Equivalent, 0)
	return p
}

func alike(places []Place, p Place) bool {
	for _, other := range places {
		if math.Abs(other.Equivalent-p.Equivalent) <= 1e-9*p.Equivalent {
			return true
		}
	}
	return false
}
