package fem

import (
	"math"

	"gonum.org/v1/gonum/spatial/r2"

	"notchproof/fem/cubature"
	"notchproof/mesh"
	"notchproof/mesh/lagrange"
)

// forces gives the work-equivalent nodal forces of one load case, by place.
func (p *Problem) forces(c Case, a *assembler) []float64 {
	f := make([]float64, len(p.Shape.Nodes)*p.Model.Unknowns())
	trace := newTrace(p.Shape)
	// Tractions on straight sides are polynomials of low degree; on bent ones
	// order+2 points leave an error far below that of the solution.
	points, weights := cubature.Interval(p.Shape.Element.Order + 2)
	for _, t := range c.Tractions {
		for i := range p.Shape.Mesh.Boundary {
			edge := &p.Shape.Mesh.Boundary[i]
			if int(edge.Side) != t.Side {
				continue
			}
			for q, s := range points {
				at, tangent := trace.point(edge, s)
				w := weights[q] * math.Hypot(tangent.X, tangent.Y)
				if p.Model.Revolved() {
					w *= at.Y
				}
				p.addWork(f, trace.nodes, trace.phi, t.On(at), w)
			}
		}
	}
	if c.Body != nil {
		p.addBody(f, c.Body, a)
	}
	return f
}

// addWork adds the work that a force does on the displacements of the nodes.
func (p *Problem) addWork(f []float64, nodes []int32, phi []float64, force [3]float64, w float64) {
	u := p.Model.Unknowns()
	kin := p.Model.Kinematics()
	for c := range u {
		along := kin.Displacement[0][c]*force[0] + kin.Displacement[1][c]*force[1] + kin.Displacement[2][c]*force[2]
		for i, node := range nodes {
			f[int(node)*u+c] += phi[i] * along * w
		}
	}
}

func (p *Problem) addBody(f []float64, body func(r2.Vec) [3]float64, a *assembler) {
	n := p.Shape.Element.Count
	phi := make([]float64, n)
	for tri := range p.Shape.Mesh.Triangles {
		t := a.operators(tri)
		nodes := p.Shape.Triangle(tri)
		for q := range t.points {
			var at r2.Vec
			for i, node := range nodes {
				phi[i] = t.phi[i*t.points+q]
				at = r2.Add(at, r2.Scale(phi[i], p.Shape.Nodes[node]))
			}
			p.addWork(f, nodes, phi, body(at), a.weight[q])
		}
	}
}

// A trace evaluates the map along boundary edges.
type trace struct {
	shape     *mesh.Curved
	line      *lagrange.Line
	nodes     []int32
	phi, dphi []float64
}

func newTrace(shape *mesh.Curved) *trace {
	n := shape.Element.Order + 1
	return &trace{
		shape: shape, line: lagrange.NewLine(shape.Element.Order),
		nodes: make([]int32, n), phi: make([]float64, n), dphi: make([]float64, n),
	}
}

// point sets nodes, phi and dphi for parameter s in [0, 1] of an edge and gives
// the point and its derivative with respect to s.
func (t *trace) point(e *mesh.Edge, s float64) (at, tangent r2.Vec) {
	nodes := t.shape.Triangle(int(e.Triangle))
	for i, k := range t.shape.Element.Edge(int(e.Opposite)) {
		t.nodes[i] = nodes[k]
	}
	t.line.Gradients(s, t.phi, t.dphi)
	for i, node := range t.nodes {
		p := t.shape.Nodes[node]
		at = r2.Add(at, r2.Scale(t.phi[i], p))
		tangent = r2.Add(tangent, r2.Scale(t.dphi[i], p))
	}
	return at, tangent
}
