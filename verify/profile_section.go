package verify

import (
	"errors"
	"fmt"
	"math"
	"slices"
	"sort"

	"gonum.org/v1/gonum/spatial/r2"

	"notchproof/fem"
	"notchproof/verify/specimen"
)

// A SectionProfile is the stress on a straight section from the root of a notch
// into the material, in multiples of the nominal stress.
type SectionProfile struct {
	Root r2.Vec // where the factor sits
	Into r2.Vec // unit vector into the material
	// Length reaches to the axis of symmetry or to where the material ends, in
	// the unit of the part.
	Length float64
	// Across tells that the section is square to the part: its stresses carry
	// the load. It is not where the surface at the root is closer to square than
	// to parallel to the part; the section then follows the surface's normal.
	Across     bool
	Points     []SectionPoint // from the root on, closest where the stress is steepest
	References []Reference    // what to hold it against, where it applies
}

// A SectionPoint is the stress at a place of a section.
type SectionPoint struct {
	Depth float64 // from the root, in the unit of the part
	At    r2.Vec
	// Value is what the factor is the largest of: the first principal stress, in
	// torsion the size of the shear stress.
	Value float64
	// Through is the stress that passes the load on: normal to the section, in
	// torsion the shear stress around the axis.
	Through float64
}

// A Reference is a known distribution over the same section or surface.
type Reference struct {
	Label  string
	Points []ReferencePoint
}

// A ReferencePoint is a stress over a depth or an arc length.
type ReferencePoint struct{ At, Value float64 }

// SectionProfile samples the last solution of a finding from the place of the
// factor into the material. It fails on a finding without solution or peak.
func (f *Finding) SectionProfile(p *specimen.Part) (*SectionProfile, error) {
	root, err := f.root(p)
	if err != nil {
		return nil, err
	}
	s := f.Computed.Last
	profile := &SectionProfile{Root: root.At}
	if !profile.across(p, root) && !profile.inwards(p, root) {
		return nil, fmt.Errorf("section profile: no material behind the root at %.6g, %.6g", root.At.X, root.At.Y)
	}
	l := line{s, f.Load, root.At, profile.Into}
	profile.Points = []SectionPoint{l.surface(root)}
	for _, depth := range profile.depths(edgeLength(s, root)) {
		point, ok := l.at(depth)
		if !ok {
			return nil, fmt.Errorf("section profile: no material at the depth %.6g", depth)
		}
		profile.Points = append(profile.Points, point)
	}
	if end, ok := l.end(profile.Length); ok {
		profile.Points = append(profile.Points, end)
	}
	profile.References = f.sectionReferences(p, profile)
	return profile, nil
}

// root is the place of the factor on the last solution.
func (f *Finding) root(p *specimen.Part) (fem.SurfacePoint, error) {
	if f.Computed.Last == nil {
		return fem.SurfacePoint{}, errors.New("profile: the finding holds no solution")
	}
	peaks := f.Computed.Last.Maxima(p.Notch, quantity(f.Load))
	if len(peaks) == 0 || !(quantity(f.Load)(peaks[0]) > 0) {
		return fem.SurfacePoint{}, errors.New("profile: the notch has no peak")
	}
	return peaks[0], nil
}

// slanted is the cosine of the angle between the surface's normal at the root
// and the transverse direction below which a section across the part would run
// along the surface rather than away from it.
const slanted = 0.5

// across lays the section square to the part.
func (s *SectionProfile) across(p *specimen.Part, root fem.SurfacePoint) bool {
	if math.Abs(root.Normal.Y) < slanted {
		return false
	}
	up := root.Normal.Y < 0
	gap := math.Inf(1)
	for _, iv := range p.Region.CutX(root.At.X) {
		end, far := iv.Hi, iv.Lo
		if up {
			end, far = far, end
		}
		if d := math.Abs(end - root.At.Y); d < gap {
			gap, s.Length = d, math.Abs(far-root.At.Y)
		}
	}
	s.Into, s.Across = r2.Vec{Y: -1}, true
	if up {
		s.Into.Y = 1
	}
	return gap <= 1e-3*s.Length
}

// inwards lays the section along the normal of the surface.
func (s *SectionProfile) inwards(p *specimen.Part, root fem.SurfacePoint) bool {
	s.Into, s.Across = r2.Scale(-1, root.Normal), false
	box := p.Region.Bounds()
	far := r2.Norm(r2.Sub(box.Max, box.Min))
	for _, iv := range p.Region.CutSegment(root.At, r2.Add(root.At, r2.Scale(far, s.Into))) {
		if iv.Lo <= 1e-3*(iv.Hi-iv.Lo) {
			s.Length = iv.Hi
			return true
		}
	}
	return false
}

// depths lists where to sample below the surface: evenly over the section, and
// at even ratios from a twentieth of the boundary element at the root on, so that
// neither the whole nor any magnification of the root shows corners.
func (s *SectionProfile) depths(element float64) []float64 {
	const even, ratio = 80, 1.08
	step := s.Length / even
	var list []float64
	for d := 0.05 * math.Min(element, step); d < s.Length-step/2; d *= ratio {
		list = append(list, d)
	}
	for i := 1; i < even; i++ {
		list = append(list, float64(i)*step)
	}
	sort.Float64s(list)
	return slices.Compact(list)
}

// A line samples a solution along a straight section.
type line struct {
	solution *fem.Solution
	load     *specimen.Load
	from     r2.Vec
	into     r2.Vec
}

// normal is the normal of the section, to the right of the part.
func (l line) normal() r2.Vec {
	n := r2.Vec{X: l.into.Y, Y: -l.into.X}
	if n.X < 0 || n.X == 0 && n.Y < 0 {
		n = r2.Scale(-1, n)
	}
	return n
}

func (l line) at(depth float64) (SectionPoint, bool) {
	at := r2.Add(l.from, r2.Scale(depth, l.into))
	tri, xi, eta, ok := l.solution.Find(at)
	if !ok {
		return SectionPoint{}, false
	}
	st, n := l.solution.Stress(tri, xi, eta), l.normal()
	point := SectionPoint{Depth: depth, At: at}
	if l.load.Shear {
		point.Value, point.Through = math.Hypot(st.XZ, st.YZ), st.XZ*n.X+st.YZ*n.Y
		return point, true
	}
	point.Value = st.Principal()[0]
	point.Through = st.XX*n.X*n.X + 2*st.XY*n.X*n.Y + st.YY*n.Y*n.Y
	return point, true
}

// end is the point at the far end of a section. That belongs to the boundary of
// the mesh, which misses a curved surface by what its order leaves: a hair inside
// there is material.
func (l line) end(length float64) (SectionPoint, bool) {
	for hair := 1e-9; hair < 1e-3; hair *= 10 {
		if point, ok := l.at(length * (1 - hair)); ok {
			return point, true
		}
	}
	return SectionPoint{}, false
}

// surface is the point at depth zero, with the stresses that follow from the
// strain within the surface.
func (l line) surface(root fem.SurfacePoint) SectionPoint {
	n := l.normal()
	along := -root.Normal.Y*n.X + root.Normal.X*n.Y // cosine between the surface and the section's normal
	point := SectionPoint{At: root.At, Value: quantity(l.load)(root), Through: root.Tangential * along * along}
	if l.load.Shear {
		point.Through = root.Shear * along
	}
	return point
}
