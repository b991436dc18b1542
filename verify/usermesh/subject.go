package usermesh

import (
	"context"
	"math"
	"runtime"
	"sync"

	"notchproof/fem"
	"notchproof/mesh"
	"notchproof/verify/specimen"
)

// A Subject is a part under one load, with the means to solve it.
type Subject struct {
	Part *specimen.Part
	Load *specimen.Load
	// Solve solves the load on a mesh with one goroutine. It is called from
	// several at a time, with a workspace each.
	Solve func(ctx context.Context, shape *mesh.Curved, w *fem.Workspace) (*fem.Solution, error)
	// Workers is the number of goroutines; 0: one a processor.
	Workers int
}

// sharesAcross is the number of elements across the part's width or diameter
// that no mesh goes below.
const sharesAcross = 8

// mesh makes a mesh with a number of elements per 90° of the root.
func (s *Subject) mesh(arc, growth float64) (*mesh.Mesh, error) {
	size := mesh.Sizing{Growth: growth, Largest: s.across() / sharesAcross}
	for _, side := range s.Part.Notch {
		size.Sides = append(size.Sides, mesh.SideWish{Side: side, PerQuarter: arc})
	}
	return mesh.Generate(s.Part.Region, size)
}

// across is the larger of the widths or diameters of the plain ends; of a hollow
// shaft twice its wall, so that the wall too is four elements thick at least.
func (s *Subject) across() float64 {
	widest := 0.0
	for _, p := range s.Part.Plain {
		width := p.High - p.Low
		if s.Part.Half {
			width *= 2
		}
		widest = math.Max(widest, width)
	}
	return widest
}

// each runs n tasks on the subject's workers, every worker with a workspace of
// its own, and gives the error of the first task that failed.
func (s *Subject) each(n int, task func(i int, w *fem.Workspace) error) error {
	workers := s.Workers
	if workers <= 0 {
		workers = runtime.GOMAXPROCS(0)
	}
	errs := make([]error, n)
	next := make(chan int, n)
	for i := range n {
		next <- i
	}
	close(next)
	var group sync.WaitGroup
	for range min(workers, n) {
		group.Go(func() {
			var w fem.Workspace
			for i := range next {
				errs[i] = task(i, &w)
			}
		})
	}
	group.Wait()
	for _, err := range errs {
		if err != nil {
			return err
		}
	}
	return nil
}
