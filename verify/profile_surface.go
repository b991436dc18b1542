package verify

import (
	"math"
	"slices"

	"gonum.org/v1/gonum/spatial/r2"

	"notchproof/fem"
	"notchproof/verify/specimen"
)

// A SurfaceProfile is the stress along the surface of a notch, in multiples of
// the nominal stress: over the whole run of the notch that holds the peak, and
// over half as much of the free surface on either side.
type SurfaceProfile struct {
	Points []ProfilePoint // in the order of arc length
	// From and To are the arc lengths at which the notch itself begins and ends;
	// those of the first and last point where it takes up all of the surface.
	From, To   float64
	Closed     bool        // the surface is a ring, cut open opposite the peak
	References []Reference // over the arc length
}

// A ProfilePoint is a place on the surface.
type ProfilePoint struct {
	Arc      float64 // length along the surface from the peak, positive towards larger x
	At       r2.Vec
	Normal   r2.Vec  // out of the material
	Value    float64 // what the factor is the largest of: first principal or shear stress
	VonMises float64 // of the surface's stresses; in torsion ÷ √3
	Along    float64 // stress along the drawn boundary, with its sign
}

// SurfaceProfile samples the last solution of a finding along the notch. It
// fails on a finding without solution or peak.
func (f *Finding) SurfaceProfile(p *specimen.Part) (*SurfaceProfile, error) {
	root, err := f.root(p)
	if err != nil {
		return nil, err
	}
	w := newWalk(f.Computed.Last, p)
	edges, closed := w.around(root.Edge)
	profile := &SurfaceProfile{Closed: closed}
	peak := w.arcs(edges, root)
	for _, e := range edges {
		profile.sample(f, e, peak)
	}
	profile.From, profile.To = math.Inf(1), math.Inf(-1)
	for _, e := range edges {
		if e.notch {
			profile.From, profile.To = math.Min(profile.From, e.from-peak), math.Max(profile.To, e.from+e.length-peak)
		}
	}
	profile.rightwards()
	profile.References = f.surfaceReferences(p, profile)
	return profile, nil
}

// rightwards turns the profile so that arc length grows with x.
func (s *SurfaceProfile) rightwards() {
	if s.Points[0].At.X <= s.Points[len(s.Points)-1].At.X {
		return
	}
	slices.Reverse(s.Points)
	for i := range s.Points {
		s.Points[i].Arc = -s.Points[i].Arc
	}
	s.From, s.To = -s.To, -s.From
}

// perEdge is the number of samples on each boundary edge.
const perEdge = 24

func (s *SurfaceProfile) sample(f *Finding, e surfaceEdge, peak float64) {
	first := 0
	if len(s.Points) > 0 {
		first = 1 // the corner is there already
	}
	for k := first; k <= perEdge; k++ {
		share := float64(k) / perEdge
		q := f.Computed.Last.Surface(e.index, share)
		point := ProfilePoint{Arc: e.from + share*e.length - peak, At: q.At, Normal: q.Normal, Value: quantity(f.Load)(q), VonMises: q.VonMises(), Along: q.Tangential}
		if f.Load.Shear {
			point.VonMises /= math.Sqrt(3)
		}
		s.Points = append(s.Points, point)
	}
}

// A surfaceEdge is a boundary edge on the way along the surface.
type surfaceEdge struct {
	index        int
	from, length float64 // arc length where it begins
	notch        bool
}

// A walk goes along the free surface of a mesh from edge to edge.
type walk struct {
	solution    *fem.Solution
	notch, free map[int]bool
	after       map[int32]int // the edge that begins at a corner
	before      map[int32]int // the edge that ends there
}

func newWalk(s *fem.Solution, p *specimen.Part) *walk {
	w := &walk{s, make(map[int]bool), make(map[int]bool), make(map[int32]int), make(map[int32]int)}
	for _, side := range p.Notch {
		w.notch[side], w.free[side] = true, true
	}
	for _, side := range p.Watch {
		w.free[side] = true
	}
	for i := range s.Problem.Shape.Mesh.Boundary {
		from, to := w.corners(i)
		w.after[from], w.before[to] = i, i
	}
	return w
}

func (w *walk) corners(i int) (from, to int32) {
	m := w.solution.Problem.Shape.Mesh
	e := m.Boundary[i]
	c := m.Triangles[e.Triangle]
	return c[(e.Opposite+1)%3], c[(e.Opposite+2)%3]
}

func (w *walk) edge(i int) surfaceEdge {
	m := w.solution.Problem.Shape.Mesh
	e := m.Boundary[i]
	return surfaceEdge{index: i, length: m.Region.Sides()[e.Side].Curve.Length(e.T0, e.T1), notch: w.notch[int(e.Side)]}
}

// next is the free edge that follows, or comes before.
func (w *walk) next(i int, forward bool) (int, bool) {
	from, to := w.corners(i)
	n, ok := w.before[from]
	if forward {
		n, ok = w.after[to]
	}
	return n, ok && w.free[int(w.solution.Problem.Shape.Mesh.Boundary[n].Side)]
}

// around lists the edges of the notch that holds edge i and of the free surface
// beyond it on either side, half as long as the notch, in order.
func (w *walk) around(i int) (edges []surfaceEdge, closed bool) {
	notch := []surfaceEdge{w.edge(i)}
	total := notch[0].length
	for _, forward := range [2]bool{true, false} {
		for at := i; ; {
			n, ok := w.next(at, forward)
			if n == i && ok {
				return w.ring(i), true
			}
			if !ok || !w.edge(n).notch {
				break
			}
			e := w.edge(n)
			total += e.length
			notch = joined(notch, e, forward)
			at = n
		}
	}
	edges = notch
	for _, forward := range [2]bool{true, false} {
		at := notch[0].index
		if forward {
			at = notch[len(notch)-1].index
		}
		for left := total / 2; left > 0; {
			n, ok := w.next(at, forward)
			if !ok {
				break
			}
			e := w.edge(n)
			if e.length > 2*left {
				break // a long edge would tell of the plain part alone
			}
			edges = joined(edges, e, forward)
			left -= e.length
			at = n
		}
	}
	return edges, false
}

func joined(edges []surfaceEdge, e surfaceEdge, behind bool) []surfaceEdge {
	if behind {
		return append(edges, e)
	}
	return append([]surfaceEdge{e}, edges...)
}

// ring lists all edges of a closed surface, from opposite edge i round to there.
func (w *walk) ring(i int) []surfaceEdge {
	edges := []surfaceEdge{w.edge(i)}
	for n, ok := w.next(i, true); ok && n != i; n, ok = w.next(n, true) {
		edges = append(edges, w.edge(n))
	}
	half := (len(edges) + 1) / 2
	return append(append([]surfaceEdge{}, edges[half:]...), edges[:half]...)
}

// arcs fills in where each edge begins and gives the arc length of the root.
func (w *walk) arcs(edges []surfaceEdge, root fem.SurfacePoint) (peak float64) {
	length := 0.0
	for k := range edges {
		edges[k].from = length
		if edges[k].index == root.Edge {
			peak = length + root.S*edges[k].length
		}
		length += edges[k].length
	}
	return peak
}

// surfaceReferences lists what a surface profile can be held against.
func (f *Finding) surfaceReferences(p *specimen.Part, s *SurfaceProfile) []Reference {
	k, ok := kirsch(p, f.Load)
	if !ok {
		return nil
	}
	r := Reference{Label: "hole in an infinite plate, Kirsch 1898"}
	for _, q := range s.Points {
		if q.Arc >= s.From && q.Arc <= s.To {
			hoop := k.Stress(k.Radius, math.Atan2(q.At.Y, q.At.X)).Hoop
			r.Points = append(r.Points, ReferencePoint{q.Arc, hoop})
		}
	}
	return []Reference{r}
}
