package verify

import (
	"math"
	"sync"

	"gonum.org/v1/gonum/spatial/r2"

	"notchproof/mesh"
	"notchproof/mesh/outline"
	"notchproof/verify/specimen"
)

// A grading says how fine the mesh is: a number of elements per 90° of arc on
// the notch, growing away from it at a fixed rate, and finer at known points
// where the solution is less smooth than the order.
type grading struct {
	perQuarter float64
	growth     float64
	// joint is the size wished for at points where the curvature of the
	// boundary jumps and at obtuse corners, as a share of the size around them.
	joint float64
	// spots are further wishes, found by looking at a solution.
	spots []mesh.SpotWish
}

// sizing turns a grading into wishes for the mesher.
func (g grading) sizing(p *specimen.Part) mesh.Sizing {
	s := mesh.Sizing{Growth: g.growth}
	sides := p.Region.Sides()
	for _, side := range p.Notch {
		s.Sides = append(s.Sides, mesh.SideWish{Side: side, PerQuarter: g.perQuarter, Size: g.piece(sides[side].Curve)})
	}
	box := p.Region.Bounds()
	least := tiny * r2.Norm(r2.Sub(box.Max, box.Min))
	for _, j := range p.Joints {
		size := j.Radius * quarter / g.perQuarter
		for _, side := range p.Notch {
			if c := sides[side].Curve; ends(c, j.At) {
				size = math.Min(size, g.piece(c))
			}
		}
		s.Spots = append(s.Spots, mesh.SpotWish{At: j.At, Size: math.Max(g.joint*size, least)})
	}
	for _, c := range p.Region.Corners() {
		if share := g.cornerShare(c); share < 1 {
			s.Spots = append(s.Spots, mesh.SpotWish{At: c.At, Size: math.Max(share*g.around(p, sides, c.At), least)})
		}
	}
	s.Spots = append(s.Spots, g.spots...)
	return s
}

// cornerShare is how much finer the mesh is at a corner than around it. The
// stress at a free corner goes with distance^(λ−1) (M. L. Williams, J. Appl.
// Mech. 19 (1952) 526): at 90° of material λ is 2.7 and there is nothing to
// resolve; up to 180° it falls to 1, and beyond the stress has no bound: there λ
// is about a half, and what the last element leaves reaches the factor with its
// size to the power 2λ.
func (g grading) cornerShare(c outline.Corner) float64 {
	const smooth, flat = 100.0, 181.0 // what turns in by less than a degree is rounding of coordinates
	switch {
	case c.Degrees > flat:
		return math.Pow(g.joint, 5)
	case c.Degrees > smooth:
		return g.joint
	}
	return 1
}

// around is the size that the notch sides alone ask for at a place.
func (g grading) around(p *specimen.Part, sides []outline.Side, at r2.Vec) float64 {
	least := math.Inf(1)
	for _, side := range p.Notch {
		c := sides[side].Curve
		t := c.Nearest(at)
		size := g.piece(c)
		if k := math.Abs(outline.Curvature(c, t)); k > 0 {
			size = math.Min(size, quarter/(g.perQuarter*k))
		}
		least = math.Min(least, size+g.growth*r2.Norm(r2.Sub(c.At(t), at)))
	}
	return least
}

// tiny is the smallest size at a joint or corner, as a share of the part's:
// coordinates have few digits left below it.
const tiny = 2e-9

// ends tells whether a curve begins or ends at a point.
func ends(c outline.Curve, at r2.Vec) bool {
	const slack = 1e-6 // of the chord: corners are given to rounding
	near := slack * r2.Norm(r2.Sub(c.At(1), c.At(0)))
	return r2.Norm(r2.Sub(c.At(0), at)) <= near || r2.Norm(r2.Sub(c.At(1), at)) <= near
}

// piece is the largest size of an element along a notch side. An arc that is
// cut off may turn by a few degrees only; it is not left to one element for
// that.
func (g grading) piece(c outline.Curve) float64 { return c.Length(0, 1) * leastPieces / g.perQuarter }

// leastPieces: a notch side gets at least half as many elements as a quarter
// turn would, however little it turns.
const leastPieces = 2

const quarter = 1.5707963267948966 // 90° in radians

// A shape is a part's mesh at one grading, bent to the orders that are asked
// for. All loads of a part share it.
type shape struct {
	grading grading
	mesh    *mesh.Mesh

	mu     sync.Mutex
	curved map[int]*mesh.Curved
}

func newShape(p *specimen.Part, g grading) (*shape, error) {
	m, err := mesh.Generate(p.Region, g.sizing(p))
	if err != nil {
		return nil, err
	}
	return &shape{grading: g, mesh: m, curved: make(map[int]*mesh.Curved)}, nil
}

// order gives the mesh bent at an order.
func (s *shape) order(p int) *mesh.Curved {
	s.mu.Lock()
	defer s.mu.Unlock()
	c := s.curved[p]
	if c == nil {
		c = s.mesh.Curve(p)
		s.curved[p] = c
	}
	return c
}

// halved is the shape with every element split into four.
func (s *shape) halved() *shape {
	g := s.grading
	g.perQuarter, g.growth = 2*g.perQuarter, g.growth/2
	return &shape{grading: g, mesh: s.mesh.Halved(), curved: make(map[int]*mesh.Curved)}
}
