package verify

import (
	"context"
	"fmt"
	"math"

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
	if f.Claim == nil || f.Claim.Claim.Mesh == nil || f.Verdict == Undecided {
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
		f.because("%s", f.MeshClaim.explanation())
	}
	return nil
}

// explanation says whether the mesh is why the claim disagrees.
func (m *MeshReading) explanation() string {
	nodes := gives(m.Nodes, m.DifferenceNodes) + " averaged at the nodes"
	interior := gives(m.Interior, m.DifferenceInterior) + " at the " + m.Points()
	switch m.Matches {
	case usermesh.None:
		return fmt.Sprintf("the mesh does not explain it: %v gives %s and %s; look at loads, supports, dimensions and the nominal stress", m.Density, nodes, interior)
	case usermesh.Interior:
		nodes = interior
	}
	return fmt.Sprintf("the mesh explains it: %v gives %s, and the claim lies within that; %s", m.Density, nodes, m.remedy())
}

// gives writes a reading with its scatter and its distance from the converged
// factor.
func gives(s usermesh.Span, difference float64) string {
	side := "above"
	if difference < 0 {
		side = "below"
	}
	return fmt.Sprintf("%.4g to %.4g (%.1f %% %s the converged factor)", s.Value-s.Scatter, s.Value+s.Scatter, 100*math.Abs(difference), side)
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
	text := fmt.Sprintf("for %g %% at the nodes", 100*level)
	sep := " "
	for _, n := range m.Guidance.Needed {
		if n.Level != level {
			continue
		}
		many := fmt.Sprintf("%g", n.Arc)
		if n.Arc == 0 {
			many = fmt.Sprintf("more than %g", n.MoreThan)
		}
		text += fmt.Sprintf("%sorder %d needs %s", sep, n.Order, many)
		sep = ", "
	}
	return text + " elements per 90°"
}
