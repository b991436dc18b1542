package verify

import (
	"notchproof/fem"
	"notchproof/scf"
	"notchproof/verify/specimen"
)

// A Result is the answer about a part: one finding a load.
type Result struct {
	Part     *specimen.Part
	Findings []Finding
}

// A Finding is the answer about a part under one load.
type Finding struct {
	Load     *specimen.Load
	Computed Computed
	Handbook []HandbookComparison
	Claim    *ClaimComparison // nil: none was made
	// MeshClaim is what the mesh that the claim came from gives; nil where it
	// came from none, or where there is no factor to judge by.
	MeshClaim *MeshReading
	Checks    []Check
	Corners   []Corner // concave corners without a radius, those of the notch first
	// Verdict is the claim's where there is one, else that of the handbook
	// value in range with the best accuracy.
	Verdict     Verdict
	Because     []string // what the verdict rests on, and what is missing
	Warnings    []string // what the factor does not tell, such as a place off the notch that is stressed higher
	Misreadings []Misreading
}

// Computed is the factor that the ladder gives.
type Computed struct {
	Factor   Estimate // on the net nominal stress
	VonMises Estimate // von Mises stress ÷ nominal (in torsion ÷ √3 nominal shear)
	Gross    float64  // the factor on the gross section
	Peak     Peak     // where the factor sits
	Others   []Peak   // other local maxima on the notch that compete, largest first, then higher ones off it
	Ladder   []Rung
	Last     *fem.Solution // of the last rung

	peaks  []fem.SurfacePoint
	apart  float64 // how far the second mesh may be, relative
	checks []Check // of the last rung, nil where not yet made
}

// Converged tells that three pieces of evidence agree: the differences between
// rungs shrink towards a limit, the traction left on the free surface shrinks
// with them, and a second mesh gives the same factor, within a few bars of both or
// within the target.
func (c *Computed) Converged() bool {
	return c.Factor.Status.Settled() && c.Factor.Signals.Second <= c.apart*c.Factor.Value
}

// State is what the ladder has come to, in words.
func (c *Computed) State() string {
	switch {
	case c.Converged():
		return "converged"
	case c.Factor.Status.Settled():
		return "undecided"
	}
	return c.Factor.Status.String()
}

// A Peak is a local maximum of the stress on the notch.
type Peak struct {
	X, Y       float64
	ArcDegrees float64 // angle between the surface normal and the transverse direction
	Factor     float64
	Side       string // name of the side it lies on
}

// A Rung is one solve of a ladder.
type Rung struct {
	Order      int
	Triangles  int
	PerQuarter float64 // elements per 90° of arc on the notch
	Unknowns   int
	Factor     float64
	VonMises   float64
	Leftover   float64 // traction left on the free surface at the peak, at unit nominal stress
	Around     float64 // the largest such traction on the edge of the peak and its neighbours
}

// A Check is one of the conditions without which no factor is judged.
type Check struct {
	Name   string
	Value  float64
	Limit  float64
	Above  bool // the value must be above the limit, not below it
	Passed bool

	discretisation bool // a finer rung may mend it
}

func below(name string, value, limit float64) Check {
	return Check{Name: name, Value: value, Limit: limit, Passed: value <= limit}
}

func above(name string, value, limit float64) Check {
	return Check{Name: name, Value: value, Limit: limit, Above: true, Passed: value >= limit}
}

// A Claim is the user's own factor.
type Claim struct {
	Factor    float64
	LastDigit float64           // one unit of its last digit, as it was written
	Reading   float64           // relative tolerance of the reading; 0: 3 %
	From      string            // where it came from
	Mesh      *specimen.Density // of the finite element mesh it came from; nil: not from one
}

// reading is the claim's reading tolerance with its default.
func (c *Claim) reading() float64 {
	if c.Reading == 0 {
		return defaultReading
	}
	return c.Reading
}

// ClaimComparison holds the claim against the computed factor.
type ClaimComparison struct {
	Claim Claim
	Comparison
}

// HandbookComparison holds a published factor against the computed one.
type HandbookComparison struct {
	Value scf.Value
	Comparison
}

// A Misreading is a known slip whose factor would explain a claim.
type Misreading struct {
	What   string
	Factor float64 // what the slip gives
	From   string  // the chart that gives it, or "computed"
	// Chance is the share of claims wrong for no such reason that a slip at
	// least as specific meets as closely; package misreading says how.
	Chance float64
}
