package fem

import (
	"context"
	"errors"
	"fmt"
	"math"
	"runtime"
	"sync"

	"notchproof/fem/sparse"
)

// A Workspace keeps memory from one solve to the next. The zero value is ready.
// It must not be shared by solves that run at the same time.
type Workspace struct {
	factor sparse.Workspace
}

// A Solution holds the unknowns of one load case and what the solver saw.
type Solution struct {
	Problem  *Problem
	Values   []float64 // unknown c of node i at i·u + c
	Unknowns int       // unknowns that were solved for
	// Pivots are the extreme pivots of the factorisation.
	Pivots sparse.Pivots

	load   []float64 // nodal forces of the loads, by place
	number *numbering
	sampler
}

// Balance is how well the nodal forces of a solution balance the loads.
type Balance struct {
	// Residual is the norm of the unbalanced nodal forces at free unknowns over
	// the norm of all nodal forces.
	Residual float64
	// Reactions are the forces of the pins over the norm of all nodal forces.
	// Where loads balance and pins only hold rigid motion they are rounding.
	Reactions []Reaction
}

// Reaction is the force of one pin, relative to all nodal forces.
type Reaction struct {
	Pin   Pin
	Force float64
}

// UnsupportedError says that the supports leave the part a motion of its own.
type UnsupportedError struct {
	Node    int
	Unknown int
	X, Y    float64
	Err     error
}

func (e *UnsupportedError) Error() string {
	return fmt.Sprintf("unknown %d of the node at (%g, %g) is not supported: %v", e.Unknown+1, e.X, e.Y, e.Err)
}

func (e *UnsupportedError) Unwrap() error { return e.Err }

// Solve solves all load cases of a problem with one factorisation. workers is
// the number of goroutines (0: one a processor); the result does not depend on
// it. w may be nil.
func (p *Problem) Solve(ctx context.Context, w *Workspace, workers int) ([]*Solution, error) {
	if w == nil {
		w = new(Workspace)
	}
	if !(p.Material.E > 0) || math.IsInf(p.Material.E, 0) || !(p.Material.Nu > -1 && p.Material.Nu < 0.5) {
		return nil, fmt.Errorf("material: E=%g, nu=%g: want a finite E > 0 and −1 < nu < 0.5", p.Material.E, p.Material.Nu)
	}
	num := p.number()
	plan, err := sparse.Analyse(p.pattern(&num))
	if err != nil {
		return nil, err
	}
	tabs := newTables(p.Shape.Element, p.Model.Revolved())
	if workers <= 0 {
		workers = runtime.GOMAXPROCS(0)
	}
	assemblers := make([]*assembler, workers)
	for i := range assemblers {
		assemblers[i] = newAssembler(p.Shape, p.Model, p.Material, tabs)
	}
	fill := func(worker, element int, k []float64) { assemblers[worker].stiffness(element, k) }
	factor, err := plan.Factor(ctx, fill, &w.factor, workers)
	if err != nil {
		return nil, p.explain(err, &num)
	}
	solutions := p.solveCases(factor, &num, assemblers[0])
	for i, s := range solutions {
		if size := norm(s.Values); math.IsNaN(size) || math.IsInf(size, 0) {
			return nil, fmt.Errorf("load case %d: a load or prescribed displacement is not a finite number", i+1)
		}
	}
	return solutions, nil
}

func (p *Problem) solveCases(factor *sparse.Factor, num *numbering, a *assembler) []*Solution {
	lifted := p.internal(num.value, a)
	solutions := make([]*Solution, len(p.Cases))
	loads := make([][]float64, len(p.Cases))
	right := make([][]float64, len(p.Cases))
	for i, c := range p.Cases {
		loads[i] = p.forces(c, a)
		right[i] = make([]float64, num.count)
		for place, e := range num.equation {
			if e >= 0 {
				right[i][e] = loads[i][place] - lifted[place]
			}
		}
	}
	factor.Solve(right...)
	for i := range solutions {
		values := append([]float64(nil), num.value...)
		for place, e := range num.equation {
			if e >= 0 {
				values[place] = right[i][e]
			}
		}
		s := &Solution{Problem: p, Values: values, Unknowns: num.count, Pivots: factor.Pivots()}
		s.load, s.number, s.sampler = loads[i], num, newSampler(p)
		solutions[i] = s
	}
	return solutions
}

// internal gives the nodal forces that a displacement field exerts.
func (p *Problem) internal(values []float64, a *assembler) []float64 {
	f := make([]float64, len(values))
	if norm(values) == 0 {
		return f
	}
	for tri := range p.Shape.Mesh.Triangles {
		a.addForces(tri, values, f)
	}
	return f
}

// internalByHalves does the same with two goroutines, one half of the triangles
// each, whatever the machine has: the sum has one order.
func (p *Problem) internalByHalves(values []float64) []float64 {
	tables := newTables(p.Shape.Element, p.Model.Revolved())
	middle := len(p.Shape.Mesh.Triangles) / 2
	var halves [2][]float64
	var group sync.WaitGroup
	for i, part := range [2][2]int{{0, middle}, {middle, len(p.Shape.Mesh.Triangles)}} {
		group.Go(func() {
			a := newAssembler(p.Shape, p.Model, p.Material, tables)
			halves[i] = make([]float64, len(values))
			for tri := part[0]; tri < part[1]; tri++ {
				a.addForces(tri, values, halves[i])
			}
		})
	}
	group.Wait()
	for i, v := range halves[1] {
		halves[0][i] += v
	}
	return halves[0]
}

// Balance compares the nodal forces of the stresses with the loads. The forces
// are integrated from the stresses anew and know nothing of the matrix that was
// factorised, so that a fault in either shows.
func (s *Solution) Balance() Balance {
	p := s.Problem
	f := p.internalByHalves(s.Values)
	total, free := 0.0, 0.0
	for place, e := range s.number.equation {
		total += f[place] * f[place]
		if e >= 0 {
			d := f[place] - s.load[place]
			free += d * d
		}
	}
	var b Balance
	scale := math.Sqrt(total)
	if scale == 0 {
		return b
	}
	b.Residual = math.Sqrt(free) / scale
	u := p.Model.Unknowns()
	for _, place := range s.number.pinned {
		pin := Pin{Point: place / u, Unknown: place % u}
		b.Reactions = append(b.Reactions, Reaction{pin, (f[place] - s.load[place]) / scale})
	}
	return b
}

// pattern describes the elements to the solver.
func (p *Problem) pattern(num *numbering) sparse.Pattern {
	shape, u := p.Shape, p.Model.Unknowns()
	nt, n := len(shape.Mesh.Triangles), shape.Element.Count
	pat := sparse.Pattern{
		Unknowns: num.count,
		Start:    make([]int32, nt+1),
		Index:    make([]int32, 0, nt*n*u),
		Center:   make([][2]float64, nt),
	}
	for tri, corners := range shape.Mesh.Triangles {
		for _, node := range shape.Triangle(tri) {
			for c := range u {
				pat.Index = append(pat.Index, num.equation[int(node)*u+c])
			}
		}
		pat.Start[tri+1] = int32(len(pat.Index))
		for _, k := range corners {
			pat.Center[tri][0] += shape.Mesh.Points[k].X / 3
			pat.Center[tri][1] += shape.Mesh.Points[k].Y / 3
		}
	}
	return pat
}

// explain turns a failed pivot into the place and unknown it belongs to.
func (p *Problem) explain(err error, num *numbering) error {
	var pivot *sparse.PivotError
	if !errors.As(err, &pivot) {
		return err
	}
	u := p.Model.Unknowns()
	for place, e := range num.equation {
		if int(e) == int(pivot.Unknown) {
			at := p.Shape.Nodes[place/u]
			return &UnsupportedError{Node: place / u, Unknown: place % u, X: at.X, Y: at.Y, Err: err}
		}
	}
	return err
}
