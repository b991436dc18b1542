package verify

import (
	"sync"

	"notchproof/mesh"
	"notchproof/verify/specimen"
)

// A grading says how fine the mesh is: a number of elements per 90° of arc on
// the notch, growing away from it at a fixed rate.
type grading struct {
	perQuarter float64
	growth     float64
	// joint is the size wished for at points where the curvature of the
	// boundary jumps, as a share of the size on the arc beside them.
	joint float64
}

// sizing turns a grading into wishes for the mesher.
func (g grading) sizing(p *specimen.Part) mesh.Sizing {
	s := mesh.Sizing{Growth: g.growth}
	sides := p.Region.Sides()
	for _, side := range p.Notch {
		s.Sides = append(s.Sides, mesh.SideWish{
			Side: side, PerQuarter: g.perQuarter,
			// An arc that is cut off may turn by a few degrees only; it is not
			// left to one element for that.
			Size: sides[side].Curve.Length(0, 1) * leastPieces / g.perQuarter,
		})
	}
	for _, j := range p.Joints {
		s.Spots = append(s.Spots, mesh.SpotWish{At: j.At, Size: g.joint * j.Radius * quarter / g.perQuarter})
	}
	return s
}

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
