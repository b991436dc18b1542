package fem

import (
	"context"
	"math"
	"math/rand/v2"
	"slices"
	"sync"
	"testing"

	"gonum.org/v1/gonum/spatial/r2"

	"notchproof/mesh"
)

// Solutions have the same bits for any number of workers, with a workspace or
// without, and with one that was used for something else before.
func TestSameBits(t *testing.T) {
	var used Workspace
	for _, model := range models {
		p := hollow(model, 0)
		m := generate(t, p.region, mesh.Sizing{Largest: 0.4})
		problem := p.problem(m.Curve(5), p.part)
		problem.Cases = append(problem.Cases, Case{}, problem.Cases[0])
		var want []*Solution
		for _, row := range []struct {
			name    string
			w       *Workspace
			workers int
		}{
			{"one worker", nil, 1},
			{"two workers", nil, 2},
			{"three workers, own workspace", new(Workspace), 3},
			{"seven workers, used workspace", &used, 7},
			{"one worker, used workspace", &used, 1},
			{"workers as they come", &used, 0},
		} {
			got, err := problem.Solve(context.Background(), row.w, row.workers)
			if err != nil {
				t.Fatal(err)
			}
			if want == nil {
				want = got
			}
			for i := range got {
				if !slices.Equal(got[i].Values, want[i].Values) {
					t.Errorf("%s, %s: case %d differs from that by one worker", model.Name(), row.name, i)
				}
			}
		}
		if !slices.Equal(want[0].Values, want[2].Values) {
			t.Errorf("%s: one load gives two solutions as first and as third case", model.Name())
		}
	}
}

// The order of points, triangles and corners in the mesh is of no account.
func TestSameForAnyNumbering(t *testing.T) {
	const rounding = 1e-11
	rng := rand.New(rand.NewPCG(8, 9))
	for _, model := range models {
		p := hollow(model, 0)
		m := generate(t, p.region, mesh.Sizing{Largest: 0.5})
		want := p.problem(m.Curve(5), p.part).mustSolve(t)
		got := p.problem(shuffled(m, rng).Curve(5), p.part).mustSolve(t)
		worst, size := 0.0, 0.0
		for tri := range m.Triangles {
			for _, x := range [][2]float64{{0.3, 0.3}, {0.1, 0.7}, {0.6, 0.2}} {
				at := want.Problem.Shape.At(tri, x[0], x[1])
				other, xi, eta, ok := got.Find(at)
				if !ok {
					t.Fatalf("%v is not found after shuffling", at)
				}
				d, s := difference(got.Stress(other, xi, eta), want.Stress(tri, x[0], x[1]))
				worst, size = max(worst, d), max(size, s)
			}
		}
		if !(worst < rounding*size) {
			t.Errorf("%s: stresses differ by %.2g of %.2g", model.Name(), worst, size)
		}
	}
}

func shuffled(m *mesh.Mesh, rng *rand.Rand) *mesh.Mesh {
	points, triangles := rng.Perm(len(m.Points)), rng.Perm(len(m.Triangles))
	s := &mesh.Mesh{Region: m.Region, Points: make([]r2.Vec, len(points)), Triangles: make([][3]int32, len(triangles))}
	for i, p := range m.Points {
		s.Points[points[i]] = p
	}
	turn := make([]int8, len(triangles))
	for i, v := range m.Triangles {
		turn[i] = int8(rng.IntN(3))
		for k := range 3 {
			s.Triangles[triangles[i]][(k+int(turn[i]))%3] = int32(points[v[k]])
		}
	}
	for _, e := range m.Boundary {
		e.Opposite = (e.Opposite + turn[e.Triangle]) % 3
		e.Triangle = int32(triangles[e.Triangle])
		s.Boundary = append(s.Boundary, e)
	}
	s.Neighbors = neighbours(s.Triangles)
	return s
}

// Clones of one solution may be read at the same time and read the same.
func TestClonesReadAtOnce(t *testing.T) {
	m := generate(t, domed(0), mesh.Sizing{Largest: 1})
	e := &exact{"", Bending{}, steel, wavy(Bending{})}
	s := e.sampled(m.Curve(6))
	read := func(s *Solution) (sum float64) {
		for tri := range m.Triangles {
			sum += s.Amplitude(tri, 0.2, 0.3).XX + s.Displacement(tri, 0.1, 0.2)[0]
		}
		for i := range m.Boundary {
			sum += s.Surface(i, 0.4).Tangential
		}
		return sum + s.Section(1.1).Moment
	}
	want := read(s)
	var wait sync.WaitGroup
	sums := make([]float64, 4)
	for i := range sums {
		c := s.Clone()
		wait.Go(func() { sums[i] = read(c) })
	}
	wait.Wait()
	for _, got := range sums {
		if got != want || math.IsNaN(want) {
			t.Errorf("clone reads %g, want %g", got, want)
		}
	}
}
