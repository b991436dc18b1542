package lagrange

import (
	"math"
	"testing"

	"gonum.org/v1/gonum/integrate/quad"
)

// points of the reference triangle that like trouble: corners (the collapsed
// one of the modes among them), edges, close to edges, the inside, and a
// little outside, where Newton's method may stray.
var points = [][2]float64{
	{0, 0}, {1, 0}, {0, 1}, {0.5, 0.5}, {0, 0.3}, {0.7, 0},
	{1e-15, 1 - 1e-15}, {1e-9, 1 - 3e-9}, {0, 1 - 1e-16},
	{1. / 3, 1. / 3}, {0.21, 0.13}, {0.05, 0.9}, {0.6, 0.37}, {-0.02, 1.01}, {0.4, -0.03},
}

// rounding is what sums of about Count terms, each up to the basis functions'
// size, may lose: a few hundred units in the last place at order 12.
const rounding = 2e-13

func TestNodesAreKronecker(t *testing.T) {
	for order := 1; order <= MaxOrder; order++ {
		el := New(order)
		if len(el.Nodes) != el.Count {
			t.Fatalf("order %d: %d nodes, want %d", order, len(el.Nodes), el.Count)
		}
		phi := make([]float64, el.Count)
		for k, x := range el.Nodes {
			el.Basis(x[0], x[1], phi)
			for n, v := range phi {
				want := 0.0
				if n == k {
					want = 1
				}
				if math.Abs(v-want) > rounding {
					t.Errorf("order %d: function %d at node %d is %g", order, n, k, v)
				}
			}
		}
	}
}

// Every polynomial of the order is its own interpolant, and so are its
// derivatives: that holds for x^a y^b, and the functions sum to 1.
func TestReproducesPolynomials(t *testing.T) {
	for order := 1; order <= MaxOrder; order++ {
		el := New(order)
		phi, dx, de := make([]float64, el.Count), make([]float64, el.Count), make([]float64, el.Count)
		alone := make([]float64, el.Count)
		for _, x := range points {
			el.Gradients(x[0], x[1], phi, dx, de)
			el.Basis(x[0], x[1], alone)
			for a := 0; a <= order; a++ {
				for b := 0; a+b <= order; b++ {
					var f, g, h, f1 float64
					for n, y := range el.Nodes {
						v := math.Pow(y[0], float64(a)) * math.Pow(y[1], float64(b))
						f += phi[n] * v
						g += dx[n] * v
						h += de[n] * v
						f1 += alone[n] * v
					}
					wantF := math.Pow(x[0], float64(a)) * math.Pow(x[1], float64(b))
					var wantG, wantH float64
					if a > 0 {
						wantG = float64(a) * math.Pow(x[0], float64(a-1)) * math.Pow(x[1], float64(b))
					}
					if b > 0 {
						wantH = float64(b) * math.Pow(x[0], float64(a)) * math.Pow(x[1], float64(b-1))
					}
					// Markov: derivatives are larger by at most about order².
					slope := rounding * float64(order*order)
					if math.Abs(f-wantF) > rounding || math.Abs(f1-wantF) > rounding ||
						math.Abs(g-wantG) > slope || math.Abs(h-wantH) > slope {
						t.Fatalf("order %d, x^%d y^%d at %v: %g %g (%g, %g), want %g (%g, %g)",
							order, a, b, x, f, f1, g, h, wantF, wantG, wantH)
					}
				}
			}
		}
	}
}

func TestGradientsWithoutValues(t *testing.T) {
	el := New(5)
	n := el.Count
	phi, dx, de, dx2, de2 := make([]float64, n), make([]float64, n), make([]float64, n), make([]float64, n), make([]float64, n)
	el.Gradients(0.2, 0.3, phi, dx, de)
	el.Gradients(0.2, 0.3, nil, dx2, de2)
	for i := range dx {
		if dx[i] != dx2[i] || de[i] != de2[i] {
			t.Fatalf("function %d: derivatives depend on whether values are asked", i)
		}
	}
}

// The modes are orthonormal over the triangle, shown by a Gauss rule on the
// square that collapses onto it: ξ = x (1−y), η = y, area element 1−y.
func TestModesAreOrthonormal(t *testing.T) {
	m := newModal(MaxOrder)
	norms := m.norms()
	n := len(norms)
	gram := make([]float64, n*n)
	x, w := make([]float64, MaxOrder+2), make([]float64, MaxOrder+2)
	quad.Legendre{}.FixedLocations(x, w, 0, 1)
	var psi [MaxCount]float64
	for i := range x {
		for j := range x {
			m.values(x[i]*(1-x[j]), x[j], &psi)
			for a := range n {
				for b := range n {
					gram[a*n+b] += w[i] * w[j] * (1 - x[j]) * psi[a] * norms[a] * psi[b] * norms[b]
				}
			}
		}
	}
	for a := range n {
		for b := range n {
			want := 0.0
			if a == b {
				want = 1
			}
			if math.Abs(gram[a*n+b]-want) > rounding {
				t.Errorf("product of modes %d and %d is %g", a, b, gram[a*n+b])
			}
		}
	}
}

func TestTraceIsLineBasis(t *testing.T) {
	corners := [3][2]float64{{0, 0}, {1, 0}, {0, 1}}
	for order := 1; order <= MaxOrder; order++ {
		el, line := New(order), NewLine(order)
		phi, trace := make([]float64, el.Count), make([]float64, order+1)
		for k := range 3 {
			a, b := corners[(k+1)%3], corners[(k+2)%3]
			for i, n := range el.Edge(k) {
				s := line.Nodes[i]
				x := [2]float64{a[0] + s*(b[0]-a[0]), a[1] + s*(b[1]-a[1])}
				if math.Hypot(x[0]-el.Nodes[n][0], x[1]-el.Nodes[n][1]) > 1e-15 {
					t.Errorf("order %d: node %d at %v, want parameter %g of edge %d", order, n, el.Nodes[n], s, k)
				}
				if i > 0 && i < order && el.EdgeNodes[i-1] != s {
					t.Errorf("order %d: EdgeNodes differ from the line's nodes", order)
				}
			}
			for _, s := range []float64{0, 0.11, 0.5, 0.83, 1} {
				el.Basis(a[0]+s*(b[0]-a[0]), a[1]+s*(b[1]-a[1]), phi)
				line.Basis(s, trace)
				for i, n := range el.Edge(k) {
					if math.Abs(phi[n]-trace[i]) > rounding {
						t.Errorf("order %d edge %d s %g: trace %g, line %g", order, k, s, phi[n], trace[i])
					}
					phi[n] = 0
				}
				for n, v := range phi {
					if math.Abs(v) > rounding {
						t.Errorf("order %d edge %d s %g: node %d off the edge has trace %g", order, k, s, n, v)
					}
				}
			}
		}
	}
}

// The node set maps onto itself under the symmetries of the triangle, which
// neighbours rely on and results keep when a mesh's corners are renumbered.
func TestNodesAreSymmetric(t *testing.T) {
	for order := 1; order <= MaxOrder; order++ {
		el := New(order)
		for _, x := range el.Nodes {
			l := [3]float64{1 - x[0] - x[1], x[0], x[1]}
			for _, y := range [][2]float64{{l[2], l[1]}, {l[0], l[1]}, {l[2], l[0]}} {
				nearest := math.Inf(1)
				for _, z := range el.Nodes {
					nearest = min(nearest, math.Hypot(y[0]-z[0], y[1]-z[1]))
				}
				if nearest > 1e-15 {
					t.Errorf("order %d: image %v of %v is no node", order, y, x)
				}
			}
			if l[0] < -2e-16 || // λ_0 is a difference, rounded
				l[1] < 0 || l[2] < 0 {
				t.Errorf("order %d: node %v outside", order, x)
			}
		}
	}
}

// The table of the package comment: the constants grow slowly, those of evenly
// spaced nodes double with every order.
func TestLebesgueConstants(t *testing.T) {
	const digits = 0.006 // relative; the table has three digits, the sampling is dense
	lobatto := map[int]float64{1: 1, 2: 1.667, 3: 2.11, 4: 2.66, 5: 3.14, 6: 3.87, 7: 4.66, 8: 5.92, 10: 9.80, 12: 17.8}
	even := map[int]float64{1: 1, 2: 1.667, 3: 2.27, 4: 3.47, 5: 5.45, 6: 8.75, 7: 14.3, 8: 24.0, 10: 70.9, 12: 221}
	for order, want := range lobatto {
		el := New(order)
		if got := lebesgue(el, 240); math.Abs(got-want) > digits*want {
			t.Errorf("order %d: Lebesgue constant %.4g, documented %g", order, got, want)
		}
		v := make([]float64, order+1)
		for i := range v {
			v[i] = float64(i) / float64(order)
		}
		el.Nodes = grid(v)
		el.coef = el.modal.interpolation(el.Nodes)
		if got := lebesgue(el, 240); math.Abs(got-even[order]) > digits*even[order] {
			t.Errorf("order %d: even spacing %.4g, documented %g", order, got, even[order])
		}
	}
}

func lebesgue(el *Triangle, n int) float64 {
	largest := 0.0
	phi := make([]float64, el.Count)
	for i := 0; i <= n; i++ {
		for j := 0; i+j <= n; j++ {
			el.Basis(float64(i)/float64(n), float64(j)/float64(n), phi)
			sum := 0.0
			for _, v := range phi {
				sum += math.Abs(v)
			}
			largest = max(largest, sum)
		}
	}
	return largest
}

func TestOrderOutOfRangePanics(t *testing.T) {
	for _, order := range []int{-1, 0, MaxOrder + 1} {
		for _, f := range []func(){func() { New(order) }, func() { NewLine(order) }} {
			func() {
				defer func() {
					if recover() == nil {
						t.Errorf("order %d accepted", order)
					}
				}()
				f()
			}()
		}
	}
}

func TestEvaluationAllocatesNothing(t *testing.T) {
	el := New(8)
	phi, dx, de := make([]float64, el.Count), make([]float64, el.Count), make([]float64, el.Count)
	if n := testing.AllocsPerRun(10, func() {
		el.Basis(0.2, 0.3, phi)
		el.Gradients(0.2, 0.3, phi, dx, de)
	}); n != 0 {
		t.Errorf("%g allocations", n)
	}
}

func BenchmarkNew(b *testing.B) {
	for _, order := range []int{2, 4, 6, 8, 12} {
		b.Run(string(rune('0'+order/10))+string(rune('0'+order%10)), func(b *testing.B) {
			for b.Loop() {
				New(order)
			}
		})
	}
}

func BenchmarkBasis6(b *testing.B) {
	el := New(6)
	phi := make([]float64, el.Count)
	for b.Loop() {
		el.Basis(0.2, 0.3, phi)
	}
}

func BenchmarkGradients6(b *testing.B) {
	el := New(6)
	phi, dx, de := make([]float64, el.Count), make([]float64, el.Count), make([]float64, el.Count)
	for b.Loop() {
		el.Gradients(0.2, 0.3, phi, dx, de)
	}
}
