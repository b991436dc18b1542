package specimen

import "notchproof/mesh/outline"

// A NetSection is the cut on which the nominal stress is taken.
type NetSection struct {
	Revolved bool // the intervals are of the radius; else of y, of the whole bar
	Cut      []outline.Interval
	Slanting bool // the cut runs along a slanting line, measured from its start
}

// NetSection cuts a part: where its section says, else at its narrowest.
func (p *Part) NetSection() (NetSection, error) {
	o := p.drawing()
	s := NetSection{Revolved: p.Loads[0].Model.Revolved()}
	if p.Section != nil && !p.Section.Across {
		net, err := o.between(p.Region, p.Section.From, p.Section.To)
		s.Cut, s.Slanting = net.cut, net.along.X != 0
		return s, err
	}
	var x float64
	var err error
	if p.Section != nil {
		x = p.Section.From.X
	} else if x, err = o.smallest(p); err != nil {
		return s, err
	}
	net := o.across(p.Region, x)
	s.Cut = net.cut
	return s, nil
}
