package cubature

import (
	"math"
	"testing"
)

// exactness is the error allowed per integral; the integrals are at most 1/2,
// the weights positive, so rounding stays near one unit of 1e-16.
const exactness = 1e-15

// monomial integrates x^a y^b over the reference triangle exactly:
// a! b! / (a+b+2)!
func monomial(a, b int) float64 {
	v := 1 / float64((a+b+1)*(a+b+2))
	for i := 1; i <= b; i++ {
		v *= float64(i) / float64(a+i)
	}
	return v
}

func (r Rule) integral(a, b int) float64 {
	var sum float64
	for i, x := range r.Points {
		sum += r.Weights[i] * math.Pow(x[0], float64(a)) * math.Pow(x[1], float64(b))
	}
	return sum
}

func TestTriangleRules(t *testing.T) {
	for degree := 0; degree <= MaxDegree; degree++ {
		r := Triangle(degree)
		if r.Degree < degree {
			t.Errorf("degree %d: rule has degree %d", degree, r.Degree)
		}
		for a := 0; a <= r.Degree; a++ {
			for b := 0; a+b <= r.Degree; b++ {
				if got, want := r.integral(a, b), monomial(a, b); math.Abs(got-want) > exactness {
					t.Errorf("degree %d: x^%d y^%d gives %g, want %g", degree, a, b, got, want)
				}
			}
		}
		for i, x := range r.Points {
			if !(r.Weights[i] > 0 && x[0] > 0 && x[1] > 0 && x[0]+x[1] < 1) {
				t.Errorf("degree %d: point %v weight %g", degree, x, r.Weights[i])
			}
		}
	}
}

// Symmetric rules are carried onto themselves, weights included, by every
// exchange of corners.
func TestSymmetry(t *testing.T) {
	for i := range symmetric {
		r := symmetric[i].rule()
		for j, x := range r.Points {
			l := [3]float64{1 - x[0] - x[1], x[0], x[1]}
			for _, y := range [][2]float64{{l[2], l[1]}, {l[0], l[1]}, {l[2], l[0]}} {
				found := false
				for k, z := range r.Points {
					if math.Hypot(y[0]-z[0], y[1]-z[1]) < 4e-16 && r.Weights[k] == r.Weights[j] {
						found = true
					}
				}
				if !found {
					t.Errorf("degree %d: point %v has no image at %v", r.Degree, x, y)
				}
			}
		}
	}
}

// The sizes are those of Triangle's comment.
func TestSizes(t *testing.T) {
	want := []int{1, 1, 3, 6, 6, 7, 12, 15, 16, 19, 25, 28, 33, 37, 42, 49, 55, 60, 67, 73, 82, 121, 144, 144}
	for degree, n := range want {
		if got := len(Triangle(degree).Points); got != n {
			t.Errorf("degree %d: %d points, documented %d", degree, got, n)
		}
	}
}

// The degree stated is the true one: one degree further some polynomial is
// missed. Legendre products show it more clearly than monomials, whose
// integrals shrink with the degree.
func TestDegreeIsTrue(t *testing.T) {
	for degree := 0; degree <= MaxDegree; degree++ {
		r := Triangle(degree)
		worst := 0.0
		for a := 0; a <= r.Degree+1; a++ {
			b := r.Degree + 1 - a
			var got, want float64
			exact := conical(r.Degree/2 + 2)
			for i, x := range r.Points {
				p, _ := jacobi(a, 0, 2*x[0]-1)
				q, _ := jacobi(b, 0, 2*x[1]-1)
				got += r.Weights[i] * p * q
			}
			for i, x := range exact.Points {
				p, _ := jacobi(a, 0, 2*x[0]-1)
				q, _ := jacobi(b, 0, 2*x[1]-1)
				want += exact.Weights[i] * p * q
			}
			worst = max(worst, math.Abs(got-want))
		}
		if worst < 1e-9 {
			t.Errorf("degree %d: exact beyond the stated degree %d (%g)", degree, r.Degree, worst)
		}
	}
}

func TestInterval(t *testing.T) {
	for n := 1; n <= MaxPoints; n++ {
		x, w := Interval(n)
		for a := 0; a < 2*n; a++ {
			var sum float64
			for i := range x {
				sum += w[i] * math.Pow(x[i], float64(a))
			}
			if want := 1 / float64(a+1); math.Abs(sum-want) > exactness {
				t.Errorf("n %d: x^%d gives %g, want %g", n, a, sum, want)
			}
		}
		for i := range x {
			if x[i] <= 0 || x[i] >= 1 || w[i] <= 0 || i > 0 && x[i] <= x[i-1] {
				t.Errorf("n %d: point %d is %g, weight %g", n, i, x[i], w[i])
			}
			if j := n - 1 - i; math.Abs(x[i]+x[j]-1) > 2e-16 || math.Abs(w[i]-w[j]) > 1e-16 {
				t.Errorf("n %d: points %d and %d not symmetric", n, i, j)
			}
		}
	}
}

func TestOutOfRangePanics(t *testing.T) {
	for name, f := range map[string]func(){
		"degree -1":  func() { Triangle(-1) },
		"degree max": func() { Triangle(MaxDegree + 1) },
		"0 points":   func() { Interval(0) },
		"65 points":  func() { Interval(MaxPoints + 1) },
	} {
		t.Run(name, func(t *testing.T) {
			defer func() {
				if recover() == nil {
					t.Error("accepted")
				}
			}()
			f()
		})
	}
}

func BenchmarkTriangle(b *testing.B) {
	for b.Loop() {
		Triangle(12)
	}
}

func BenchmarkInterval(b *testing.B) {
	for b.Loop() {
		Interval(8)
	}
}
