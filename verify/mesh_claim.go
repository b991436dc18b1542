package verify

import (
	"context"
	"fmt"
	"math"
	"strings"

	"notchproof/fem"
	"notchproof/mesh"
	"notchproof/verify/specimen"
	"notchproof/verify/usermesh"
)

// A MeshReading is what a mesh of the density that a claim came from gives.
type MeshReading struct {
	usermesh.Reading
	DifferenceNodes    float64 // (averaged at the nodes − computed) ÷ computed
	DifferenceInterior float64 // (at the sample points − computed) ÷ computed
	Matches            usermesh.Match
	Guidance           *usermesh.Guidance
}

// Guide says how fine meshes of order 1 and 2 must be at the root of a part for
// errors of 5, 2 and 1 % of a finding's factor. It is nil where the finding has
// no factor to count from.
func Guide(ctx context.Context, p *specimen.Part, f *Finding, o Options) (*usermesh.Guidance, error) {
	e := f.Computed.Factor
	if !e.Status.Settled() || f.Verdict == Undecided {
		return nil, nil
	}
	o.tell(fmt.Sprintf("%s: elements needed at the root", f.Load.Name))
	return subject(p, f.Load, o).Guide(ctx, e.Value, e.Uncertainty)
}

func subject(p *specimen.Part, l *specimen.Load, o Options) *usermesh.Subject {
	return &usermesh.Subject{Part: p, Load: l, Workers: o.Workers,
		Solve: func(ctx context.Context, shape *mesh.Curved, w *fem.Workspace) (*fem.Solution, error) {
			return solve(ctx, p, l, shape, w, 1)
		}}
}

// readMesh holds a claim that came from a mesh against what such a mesh gives.
// The verdict is on the factor and stays; why it fails is said.
func (f *Finding) readMesh(ctx context.Context, p *specimen.Part, o Options) error {
	if f.Claim == nil || f.Claim.Claim.Mesh == nil {
		return nil
	}
	if f.Verdict == Undecided {
		f.because("nothing is said of the mesh that the claim came from: there is no converged factor to count its error from")
		return nil
	}
	claim, e := f.Claim.Claim, f.Computed.Factor
	o.tell(fmt.Sprintf("%s: meshes of %v", f.Load.Name, *claim.Mesh))
	read, err := subject(p, f.Load, o).Read(ctx, *claim.Mesh)
	if err != nil {
		return err
	}
	guidance, err := Guide(ctx, p, f, o)
	if err != nil {
		return err
	}
	f.MeshClaim = &MeshReading{
		Reading:            *read,
		DifferenceNodes:    (read.Nodes.Value - e.Value) / e.Value,
		DifferenceInterior: (read.Interior.Value - e.Value) / e.Value,
		Matches:            read.Match(claim.Factor, claim.LastDigit),
		Guidance:           guidance,
	}
	if f.Verdict == Disagrees {
		f.because("%s", f.MeshClaim.explanation(f.Claim))
	}
	return nil
}

// explanation says whether the mesh is why the claim disagrees.
func (m *MeshReading) explanation(c *ClaimComparison) string {
	nodes := m.off(m.Nodes, m.DifferenceNodes) + " averaged at the nodes"
	interior := m.off(m.Interior, m.DifferenceInterior) + " at the " + m.Points()
	switch m.Matches {
	case usermesh.None:
		return fmt.Sprintf("the mesh does not explain it: %v comes out %s and %s%s", m.Density, nodes, interior, m.elsewhere(c.Difference))
	case usermesh.Interior:
		nodes = interior
	}
	return fmt.Sprintf("the mesh explains it: %v comes out %s, and so does the claim; %s", m.Density, nodes, m.remedy())
}

// off writes how far a reading lies from the converged factor, with its scatter,
// in percent.
func (m *MeshReading) off(s usermesh.Span, difference float64) string {
	side := "high"
	if difference < 0 {
		side = "low"
	}
	scatter := s.Scatter / s.Value * (1 + difference)
	return fmt.Sprintf("%.1f ± %.1f %% %s", 100*math.Abs(difference), 100*scatter, side)
}

// elsewhere says which density of the same order does give a claim at the nodes,
// where one of those tried for guidance is too low for it and the next too high.
func (m *MeshReading) elsewhere(difference float64) string {
	trials := m.Guidance.Trials
	for i := 1; i < len(trials); i++ {
		a, b := trials[i-1], trials[i]
		if a.Density.Order == m.Density.Order && b.Density.Order == a.Density.Order && (a.Error-difference)*(b.Error-difference) <= 0 {
			return fmt.Sprintf("; between %g and %g elements per 90° would give the claim at the nodes", a.Density.Arc, b.Density.Arc)
		}
	}
	return ", and no density of that order gives the claim at the nodes: look at loads, supports, dimensions and the nominal stress"
}

// Points names the interior points at which the order is read.
func (m *MeshReading) Points() string {
	if m.Density.Order == 1 {
		return "centroids"
	}
	return "integration points"
}

// remedy says what would do at the middle level.
func (m *MeshReading) remedy() string {
	level := usermesh.Levels()[1]
	var words []string
	for _, n := range m.Guidance.Needed {
		if n.Level != level {
			continue
		}
		many := fmt.Sprintf("%g", n.Arc)
		if n.Arc == 0 {
			many = fmt.Sprintf("more than %g", n.MoreThan)
		}
		words = append(words, fmt.Sprintf("order %d needs %s", n.Order, many))
	}
	return fmt.Sprintf("to stay within %g %% at the nodes %s elements per 90°", 100*level, strings.Join(words, ", "))
}
