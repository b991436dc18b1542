package specimen

import (
	"fmt"

	"notchproof/scf"
)

// A drawing turns complete, checked dimensions of a family into a part without
// loads.
type drawing func(dims scf.Dims, o scf.Options) *Part

// drawings lists how each family of package scf is drawn.
func drawings() map[string]drawing {
	return map[string]drawing{
		"bar-shoulder":      shoulder,
		"bar-notch":         notch,
		"bar-edge-notch":    barEdgeNotch,
		"bar-hole":          barHole,
		"bar-ellipse":       barEllipse,
		"bar-collar":        collar,
		"shaft-shoulder":    shoulder,
		"shaft-groove":      notch,
		"shaft-ring-groove": shaftRingGroove,
		"shaft-collar":      collar,
	}
}

// New draws a part of a family. Dimensions are lengths in one unit (angles in
// degrees); unit names it and may be empty. The error is a *scf.DimensionError
// when the dimensions do not make a shape.
func New(family *scf.Family, dims scf.Dims, unit string, o scf.Options) (*Part, error) {
	draw, ok := drawings()[family.Name]
	if !ok {
		return nil, fmt.Errorf("%s: no drawing for this family", family.Name)
	}
	if err := family.Check(dims); err != nil {
		return nil, err
	}
	full := family.Complete(dims)
	p := draw(full, o)
	p.Name, p.Family = family.Name, family
	p.Dims, p.Given, p.Unit, p.Options = full, dims, unit, o
	p.addLoads(family.Kind, family.Loads, func(load scf.Load) scf.Nominal {
		return family.Nominal(load, full, o)
	})
	return p, nil
}

// Load finds one of the part's loads by name.
func (p *Part) Load(name scf.Load) (*Load, bool) {
	for i := range p.Loads {
		if p.Loads[i].Name == name {
			return &p.Loads[i], true
		}
	}
	return nil, false
}
