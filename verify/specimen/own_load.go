package specimen

import (
	"math"

	"notchproof/scf"
)

// load settles nominal section, force line and sense of bending, and adds the
// loads: tension and bending, on a shaft torsion as well.
func (o *Drawing) load(p *Part) error {
	net, words, err := o.nominal(p)
	if err != nil {
		return err
	}
	fibre, which, err := o.fibre(p, &net)
	if err != nil {
		return err
	}
	gross, err := o.largest(p)
	if err != nil {
		return err
	}
	y := net.point(fibre).Y
	p.Section.Fibre = &y
	p.Net = p.balanceCut(&net)
	if o.Kind == scf.Bar {
		p.Opposite = fibre < net.centroid
		p.ForceLine = o.forceLine(p, &net)
	}
	s := strength{o, p, net, gross, fibre, words, which}
	loads := []scf.Load{scf.Tension, scf.Bending}
	if o.Kind == scf.Shaft {
		loads = append(loads, scf.Torsion)
	}
	p.addLoads(o.Kind, loads, s.nominal)
	return nil
}

// forceLine is the y of the axial force: the centroid of the nominal section,
// or of the larger of the two end sections, the left one of equals.
func (o *Drawing) forceLine(p *Part, net *crossSection) float64 {
	if o.Mirror {
		return 0
	}
	if o.Options.ForceLine != scf.ForceLineGross {
		return net.point(net.centroid).Y
	}
	a, b := p.Plain[0], p.Plain[1]
	if b.High-b.Low > (a.High-a.Low)*(1+sameShape) {
		a = b
	}
	return (a.Low + a.High) / 2
}

// balanceCut is the x on which the balance of forces is checked: inside of the
// nominal section where that has a length, in the plain stretch next to it
// where the section goes on there.
func (p *Part) balanceCut(net *crossSection) float64 {
	x := net.point((net.lo + net.hi) / 2).X
	for _, s := range p.Plain {
		ahead := (s.From - x) * math.Copysign(1, s.To-s.From)
		if math.Abs(s.High-net.hi) <= sameShape*s.High && ahead <= sameShape*s.High && ahead > -math.Abs(s.To-s.From)/2 && s.To != s.From {
			return s.From + math.Copysign(math.Min(0.37*(s.High-s.Low), math.Abs(s.To-s.From)/2), s.To-s.From)
		}
	}
	return x
}

// strength gives the nominal stresses of a part by elementary strength of
// materials on its nominal section.
type strength struct {
	*Drawing
	part       *Part
	net, gross crossSection
	fibre      float64 // along the nominal section
	words      string  // which section
	which      string  // which fibre
}

func (s *strength) nominal(load scf.Load) scf.Nominal {
	n := scf.Nominal{Section: s.words}
	c := math.Abs(s.fibre - s.net.centroid)
	outer := math.Max(s.gross.hi-s.gross.centroid, s.gross.centroid-s.gross.lo)
	area, second := s.units(2, 1), s.units(4, 3)
	note := func(text string) { n.Notes = append(n.Notes, text) }
	distance := "c = " + measure(c, s.Unit) + " from the centroid to the fibre at " + coordinate("y", s.net.point(s.fibre).Y, s.Unit) + ", " + s.which
	switch load {
	case scf.Tension:
		n.Formula, n.Net, n.Gross = "P / A", 1/s.net.area, 1/s.gross.area
		note("A = " + text(s.net.area) + area)
		if s.Kind == scf.Bar {
			line := "the middle of the nominal section"
			if s.Options.ForceLine == scf.ForceLineGross && !s.Mirror {
				line = "the middle of the larger end section"
			}
			note("the force passes through " + line + ", " + coordinate("y", s.part.ForceLine, s.Unit) + "; P / A carries no bending term")
		}
	case scf.Bending:
		n.Formula, n.Net, n.Gross = "M c / I", 1/s.net.modulus(s.fibre), outer/s.gross.second
		note("I = " + text(s.net.second) + second)
		note(distance + "; bending puts it in tension")
	case scf.Torsion:
		n.Formula, n.Net, n.Gross = "T c / J", c/(2*s.net.second), outer/(2*s.gross.second)
		note("J = " + text(2*s.net.second) + second)
		note(distance)
	}
	note("the gross section is the largest of the part, at " + coordinate("x", s.gross.start.X, s.Unit))
	return n
}

// units writes the unit of a shaft's property of one power of length, or of a
// bar's of another times the thickness.
func (s *strength) units(shaft, bar int) string {
	power, thickness := shaft, ""
	if s.Kind == scf.Bar {
		power, thickness = bar, " · t"
	}
	if s.Unit == "" {
		return thickness
	}
	return " " + s.Unit + []string{"", "", "²", "³", "⁴"}[power] + thickness
}

func measure(x float64, unit string) string {
	if unit == "" {
		return text(x)
	}
	return text(x) + " " + unit
}
