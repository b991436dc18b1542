package usermesh

import (
	"context"
	"math"

	"gonum.org/v1/gonum/stat"
	"gonum.org/v1/gonum/stat/distuv"

	"notchproof/fem"
	"notchproof/verify/specimen"
)

// A Reading is what meshes of one density say.
type Reading struct {
	Density  specimen.Density
	Nodes    Span // stress averaged at the nodes of the notch
	Interior Span // stress at the sample points of the elements that touch it
	Unknowns int  // of the largest of the meshes
}

// A Span is what one more mesh of the same density is expected to say: nine in
// ten lie within Value ± Scatter.
type Span struct{ Value, Scatter float64 }

// growths are the shares of the distance from the root by which edges grow in
// the meshes that a reading is taken from: from careful to hasty.
func growths() []float64 { return []float64{0.2, 0.3, 0.4, 0.5} }

// nineInTen is the share of further meshes that a span is to hold.
const nineInTen = 0.9

// Read solves meshes of one density that differ in how they grow away from the
// root, since nobody knows how the user's did. Errors are a density that the
// part cannot be meshed with, or ctx's.
func (s *Subject) Read(ctx context.Context, d specimen.Density) (*Reading, error) {
	grown := growths()
	found := make([]values, len(grown))
	err := s.each(len(grown), func(i int, w *fem.Workspace) (err error) {
		found[i], err = s.value(ctx, d, grown[i], w)
		return err
	})
	if err != nil {
		return nil, err
	}
	r := &Reading{Density: d}
	nodes, interior := make([]float64, len(found)), make([]float64, len(found))
	for i, v := range found {
		nodes[i], interior[i] = v.nodes, v.interior
		r.Unknowns = max(r.Unknowns, v.unknowns)
	}
	r.Nodes, r.Interior = span(nodes), span(interior)
	return r, nil
}

// span is the prediction interval for one more draw from a normal distribution
// of which the sample is known, mean ± t s √(1 + 1/n) (W. G. Cochran & G. W.
// Snedecor, Statistical Methods, from memory). Four meshes are no random sample;
// the interval is the plainest one that widens as they differ.
func span(sample []float64) Span {
	mean, deviation := stat.MeanStdDev(sample, nil)
	n := float64(len(sample))
	t := distuv.StudentsT{Mu: 0, Sigma: 1, Nu: n - 1}.Quantile((1 + nineInTen) / 2)
	return Span{mean, t * deviation * math.Sqrt(1+1/n)}
}

// A Match says which reading a factor is. The zero value is none.
type Match int

const (
	None Match = iota
	Nodes
	Interior
	Both
)

func (m Match) String() string {
	switch m {
	case Nodes:
		return "nodes"
	case Interior:
		return "interior"
	case Both:
		return "both"
	}
	return "none"
}

// MarshalText writes the match as it stands in JSON.
func (m Match) MarshalText() ([]byte, error) { return []byte(m.String()), nil }

// Match tells which reading a factor, written to a last digit, is.
func (r *Reading) Match(factor, lastDigit float64) Match {
	within := func(s Span) bool { return math.Abs(factor-s.Value) <= s.Scatter+lastDigit/2 }
	switch nodes, interior := within(r.Nodes), within(r.Interior); {
	case nodes && interior:
		return Both
	case nodes:
		return Nodes
	case interior:
		return Interior
	}
	return None
}
