package usermesh

import (
	"context"

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
