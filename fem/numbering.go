package fem

import "math"

// A numbering says which unknowns are solved for. Unknown c of node i has the
// place i·u + c among all unknowns.
type numbering struct {
	equation []int32   // by place: its equation, −1 where prescribed
	value    []float64 // by place: the prescribed value
	pinned   []int     // places held by pins
	count    int       // number of equations
}

func (p *Problem) number() numbering {
	u := p.Model.Unknowns()
	total := len(p.Shape.Nodes) * u
	n := numbering{equation: make([]int32, total), value: make([]float64, total)}
	for _, f := range p.Fixed {
		p.eachSideNode(f.Side, func(node int) {
			place := node*u + f.Unknown
			n.equation[place] = -1
			if f.Value != nil {
				n.value[place] = f.Value(p.Shape.Nodes[node])
			}
		})
	}
	if p.Model.Revolved() {
		p.fixAxis(&n)
	}
	for _, pin := range p.Pinned {
		place := pin.Point*u + pin.Unknown
		n.equation[place] = -1
		n.pinned = append(n.pinned, place)
	}
	for place, e := range n.equation {
		if e == 0 {
			n.equation[place] = int32(n.count)
			n.count++
		}
	}
	return n
}

// fixAxis holds what must vanish where the radius does. A node counts as lying
// on the axis when its radius is nothing but rounding.
func (p *Problem) fixAxis(n *numbering) {
	u := p.Model.Unknowns()
	largest := 0.0
	for _, node := range p.Shape.Nodes {
		largest = math.Max(largest, node.Y)
	}
	for i, node := range p.Shape.Nodes {
		if node.Y > 1e-14*largest {
			continue
		}
		for _, c := range p.Model.Axis() {
			n.equation[i*u+c] = -1
			n.value[i*u+c] = 0
		}
	}
}

func (p *Problem) eachSideNode(side int, visit func(node int)) {
	for _, e := range p.Shape.Mesh.Boundary {
		if int(e.Side) != side {
			continue
		}
		nodes := p.Shape.Triangle(int(e.Triangle))
		for _, i := range p.Shape.Element.Edge(int(e.Opposite)) {
			visit(int(nodes[i]))
		}
	}
}
