package usermesh

import (
	"context"
	"slices"
	"testing"

	"notchproof/fem"
	"notchproof/verify/specimen"
)

// Single reads one mesh of one growth.
func Single(ctx context.Context, s *Subject, d specimen.Density, growth float64) (nodes, interior float64, err error) {
	v, err := s.value(ctx, d, growth, new(fem.Workspace))
	return v.nodes, v.interior, err
}

// Wanted is need.
func Wanted(tried []Trial, order int, level float64) Need { return need(tried, order, level) }

// RootEdges counts the edges of a mesh on the notch.
func RootEdges(t *testing.T, s *Subject, arc, growth float64) (count int) {
	t.Helper()
	m, err := s.mesh(arc, growth)
	if err != nil {
		t.Fatal(err)
	}
	for _, e := range m.Boundary {
		if slices.Contains(s.Part.Notch, int(e.Side)) {
			count++
		}
	}
	return count
}
