package specimen

import (
	"math"
	"slices"

	"gonum.org/v1/gonum/spatial/r2"

	"notchproof/fem"
	"notchproof/mesh/outline"
	"notchproof/scf"
)

// WholeBar completes a half model of a bar by its mirror image and loads and
// supports it as a whole.
func WholeBar(p *Part) (*Part, error) {
	region, err := p.Region.Whole()
	if err != nil {
		return nil, err
	}
	w := &Part{Name: p.Name, Family: p.Family, Dims: p.Dims, Given: p.Given, Options: p.Options, Region: region, Net: p.Net}
	old := p.Region.Sides()
	for i, s := range region.Sides() {
		if slices.ContainsFunc(p.Notch, func(k int) bool { return old[k].Name == s.Name }) {
			w.Notch = append(w.Notch, i)
		}
	}
	w.Joints = findJoints(region, w.Notch)
	for _, s := range p.Plain {
		s.Low = -s.High
		w.Plain = append(w.Plain, s)
	}
	w.addBarLoads(p.Family.Loads, func(load scf.Load) scf.Nominal { return p.Family.Nominal(load, p.Dims, p.Options) })
	for i := range w.Loads {
		w.Loads[i].spread(w)
	}
	return w, nil
}

// spread puts the end tractions on all sides at each end: completing a half
// leaves two where there was one.
func (l *Load) spread(p *Part) {
	var all []fem.Traction
	for k, plain := range p.Plain {
		for i, s := range p.Region.Sides() {
			if line, ok := s.Curve.(outline.Line); ok && near(line.A, plain.To) && near(line.B, plain.To) {
				all = append(all, fem.Traction{Side: i, On: l.Tractions[k].On})
			}
		}
	}
	l.Tractions = all
}

func near(at r2.Vec, x float64) bool { return math.Abs(at.X-x) < 1e-9*math.Abs(x) }
