package sparse

import (
	"math"
	"math/rand/v2"
)

// A system is a test matrix: a pattern with element matrices.
type system struct {
	Pattern
	matrices [][]float64
}

func (s *system) fill(_, element int, matrix []float64) { copy(matrix, s.matrices[element]) }

// dense returns the assembled matrix, row by row.
func (s *system) dense() []float64 {
	n := s.Unknowns
	a := make([]float64, n*n)
	for e, m := range s.matrices {
		list := s.list(int32(e))
		for i, u := range list {
			for j, v := range list[:i+1] {
				if u >= 0 && v >= 0 {
					a[int(u)*n+int(v)] += m[i*len(list)+j]
					if u != v {
						a[int(v)*n+int(u)] += m[i*len(list)+j]
					}
				}
			}
		}
	}
	return a
}

// A triangulation is the least a pattern needs to know: corners.
type triangulation struct {
	points    [][2]float64
	triangles [][3]int32
}

// rectangle splits nx by ny squares into two triangles each.
func rectangle(nx, ny int) triangulation {
	var t triangulation
	for y := range ny + 1 {
		for x := range nx + 1 {
			t.points = append(t.points, [2]float64{float64(x), float64(y)})
		}
	}
	row := int32(nx + 1)
	for y := range int32(ny) {
		for x := range int32(nx) {
			a := y*row + x
			if (x+y)%2 == 0 {
				t.triangles = append(t.triangles, [3]int32{a, a + 1, a + row + 1}, [3]int32{a, a + row + 1, a + row})
			} else {
				t.triangles = append(t.triangles, [3]int32{a, a + 1, a + row}, [3]int32{a + 1, a + row + 1, a + row})
			}
		}
	}
	return t
}

// fan grades rings of triangles towards a point: a rectangle bent into half a
// ring whose radii double.
func fan(around, rings int) triangulation {
	t := rectangle(around, rings)
	for i, p := range t.points {
		r, angle := math.Pow(1.6, p[1]), math.Pi*p[0]/float64(around)
		t.points[i] = [2]float64{r * math.Cos(angle), r * math.Sin(angle)}
	}
	return t
}

// pattern numbers the nodes of triangles of order p with c unknowns each:
// corners, edges, insides.
func (t triangulation) pattern(p, c int) Pattern {
	var pat Pattern
	edges := map[[2]int32]int32{}
	next := int32(len(t.points))
	add := func(node int32) {
		for k := range int32(c) {
			pat.Index = append(pat.Index, node*int32(c)+k)
		}
	}
	pat.Start = append(pat.Start, 0)
	for _, tri := range t.triangles {
		var centre [2]float64
		for k := range 3 {
			add(tri[k])
			centre[0] += t.points[tri[k]][0] / 3
			centre[1] += t.points[tri[k]][1] / 3
		}
		for k := range 3 {
			a, b := tri[k], tri[(k+1)%3]
			first, ok := edges[[2]int32{min(a, b), max(a, b)}]
			if !ok {
				first = next
				edges[[2]int32{min(a, b), max(a, b)}] = first
				next += int32(p - 1)
			}
			for i := range int32(p - 1) {
				if a < b {
					add(first + i)
				} else {
					add(first + int32(p-2) - i)
				}
			}
		}
		for range (p - 1) * (p - 2) / 2 {
			add(next)
			next++
		}
		pat.Center = append(pat.Center, centre)
		pat.Start = append(pat.Start, int32(len(pat.Index)))
	}
	pat.Unknowns = int(next) * c
	return pat
}

// randomMatrices makes positive definite element matrices: a unit matrix plus
// products of a few random vectors.
func randomMatrices(p Pattern, seed uint64) *system {
	rng := rand.New(rand.NewPCG(seed, 1))
	s := &system{Pattern: p}
	for e := range int32(p.Elements()) {
		n := len(p.list(e))
		m := make([]float64, n*n)
		for i := range n {
			m[i*n+i] = 0.1
		}
		v := make([]float64, n)
		for range 3 {
			for i := range v {
				v[i] = rng.Float64() - 0.5
			}
			for i := range n {
				for j := range n {
					m[i*n+j] += v[i] * v[j]
				}
			}
		}
		s.matrices = append(s.matrices, m)
	}
	return s
}

// random makes a pattern without any geometry behind it.
func random(rng *rand.Rand, unknowns, elements, most int) Pattern {
	p := Pattern{Unknowns: unknowns, Start: []int32{0}}
	for e := range elements {
		for k, u := range rng.Perm(unknowns)[:rng.IntN(min(most, unknowns)+1)] {
			if rng.IntN(10) == 0 && k > 0 {
				u = -1
			}
			p.Index = append(p.Index, int32(u))
		}
		if e == elements-1 { // the last element takes what no other has
			met := make([]bool, unknowns)
			for _, u := range p.Index {
				if u >= 0 {
					met[u] = true
				}
			}
			for u, ok := range met {
				if !ok {
					p.Index = append(p.Index, int32(u))
				}
			}
		}
		p.Start = append(p.Start, int32(len(p.Index)))
		p.Center = append(p.Center, [2]float64{rng.Float64(), rng.Float64()})
	}
	return p
}
