package verify

import (
	"math"

	"notchproof/mesh/outline"
	"notchproof/scf"
	"notchproof/verify/specimen"
)

// sectionReferences lists what a section profile can be held against.
func (f *Finding) sectionReferences(p *specimen.Part, s *SectionProfile) []Reference {
	var list []Reference
	add := func(label string, reach float64, of func(depth float64) float64) {
		r := Reference{Label: label}
		for _, q := range s.Points {
			if q.Depth <= reach {
				r.Points = append(r.Points, ReferencePoint{q.Depth, of(q.Depth)})
			}
		}
		list = append(list, r)
	}
	if s.Across {
		beam := linearStress(p, f.Load, p.Region.CutX(s.Root.X))
		add("elementary theory on this section", s.Length, func(depth float64) float64 { return beam(s.Root.Y + depth*s.Into.Y) })
	}
	if k, ok := kirsch(p, f.Load); ok {
		add("hole in an infinite plate, Kirsch 1898", s.Length, func(depth float64) float64 { return k.Stress(k.Radius+depth, math.Pi/2).Hoop })
	}
	if radius, ok := slender(p); ok && s.Across && !f.Load.Shear {
		// The intensity that gives the computed peak: only the shape of the tail
		// is the formula's own.
		K := s.Points[0].Value * math.Sqrt(math.Pi*radius) / 2
		add("tail of a slender notch, Creager and Paris 1967", radius, func(depth float64) float64 { return scf.CreagerParis(K, radius, radius/2+depth, 0).YY })
	}
	return list
}

// linearStress is the stress of beam and shaft theory over a cut of the part
// under the load: axial force and moment over area and second moment of this
// cut, for torsion the torque over the polar one.
func linearStress(p *specimen.Part, l *specimen.Load, cut []outline.Interval) func(y float64) float64 {
	r := l.Resultant
	if l.Model.Revolved() { // resultants are per radian, the moment is ∫σ r² dr
		var ring, fourth float64
		for _, iv := range cut {
			ring += (iv.Hi*iv.Hi - iv.Lo*iv.Lo) / 2
			fourth += (math.Pow(iv.Hi, 4) - math.Pow(iv.Lo, 4)) / 4
		}
		uniform, slope := r.Axial/ring, (r.Moment+r.Torque)/fourth
		return func(y float64) float64 { return uniform + slope*y }
	}
	b := outline.Bar(cut)
	if p.Half { // its image carries the other half of the force and of the moment
		if l.Name == scf.Bending {
			slope := r.Moment / (b.SecondMoment + b.Area*b.Centroid*b.Centroid)
			return func(y float64) float64 { return slope * y }
		}
		return func(float64) float64 { return r.Axial / b.Area }
	}
	uniform, slope := r.Axial/b.Area, (r.Moment-r.Axial*b.Centroid)/b.SecondMoment
	return func(y float64) float64 { return uniform + slope*(y-b.Centroid) }
}

// kirsch is the infinite plate whose hole and remote stress are those of a bar
// in tension with a circular hole in its middle.
func kirsch(p *specimen.Part, l *specimen.Load) (scf.KirschPlate, bool) {
	if p.Name != "bar-hole" || l.Name != scf.Tension || p.Dims["e"] != 0 {
		return scf.KirschPlate{}, false
	}
	return scf.KirschPlate{Radius: p.Dims["d"] / 2, Remote: scf.Plane{XX: l.Nominal.Gross / l.Nominal.Net}}, true
}

// slender gives the root radius of notches that the asymptotic field of Creager
// and Paris belongs to: deeper than twice their radius, with flanks that open by
// no more than 30° (common practice), and one root.
func slender(p *specimen.Part) (radius float64, ok bool) {
	d := p.Dims
	depth := 0.0
	switch p.Name {
	case "bar-notch", "shaft-groove":
		radius, depth = d["r"], (d["D"]-d["d"])/2
	case "bar-edge-notch":
		radius, depth = d["r"], d["D"]-d["d"]
	case "bar-ellipse":
		radius, depth = d["b"]*d["b"]/d["a"], d["a"]
	default:
		return 0, false
	}
	return radius, depth >= 2*radius && d["angle"] <= 30
}
