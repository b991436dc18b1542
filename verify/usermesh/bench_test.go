package usermesh_test

import (
	"context"
	"testing"

	"notchproof/verify/specimen"
)

// BenchmarkRead and BenchmarkGuide are what a claim from a mesh adds to a check.
func BenchmarkRead(b *testing.B) {
	p := part(b, shapes[0].family, shapes[0].dims)
	s := subject(b, p, shapes[0].load)
	for b.Loop() {
		if _, err := s.Read(context.Background(), specimen.Density{Order: 2, Arc: 6}); err != nil {
			b.Fatal(err)
		}
	}
}

func BenchmarkGuide(b *testing.B) {
	p := part(b, shapes[0].family, shapes[0].dims)
	s := subject(b, p, shapes[0].load)
	for b.Loop() {
		if _, err := s.Guide(context.Background(), 1.8145, 0.0002); err != nil {
			b.Fatal(err)
		}
	}
}
