package chart

import (
	"strings"

	"notchproof/scf"
)

// A relation is a variable with its value: from one of the axes, or fixed.
type relation struct {
	Variable
	from  source
	value float64 // of a fixed one
}

type source int

const (
	fixed source = iota
	along
	curves
)

// A step gives one dimension from a relation and, of a ratio, from the other
// dimension, which an earlier step gives.
type step struct {
	name     string
	relation relation
	below    bool // the dimension is the one below the line
}

// settle finds the steps that give every dimension. It says what is settled
// twice over or not at all, whatever the values are. Where all is said by
// ratios the size does not matter: one dimension is taken as 1.
func settle(family *scf.Family, relations []relation) ([]step, error) {
	known := make(map[string]bool)
	var steps []step
	scaled := false
	var ratios []relation
	for _, r := range relations {
		switch {
		case r.Over != "":
			ratios = append(ratios, r)
			continue
		case known[r.Name]:
			return nil, fault("give each dimension once", "%s: given twice", r.Name)
		}
		known[r.Name] = true
		steps = append(steps, step{name: r.Name, relation: r})
		if !dimension(family, r.Name).Angle && !(r.from == fixed && r.value == 0) {
			scaled = true
		}
	}
	if !scaled && len(ratios) > 0 {
		base := ratios[0].Over
		known[base] = true
		steps = append(steps, step{name: base, relation: relation{Variable: Variable{Name: base}, value: 1}})
	}
	steps, ratios, err := chain(steps, ratios, known)
	if err != nil {
		return nil, err
	}
	return steps, missing(family, ratios, known)
}

// chain takes up ratios with one side known until none is left that has.
func chain(steps []step, ratios []relation, known map[string]bool) ([]step, []relation, error) {
	for again := true; again; {
		again = false
		var left []relation
		for _, r := range ratios {
			switch {
			case known[r.Name] && known[r.Over]:
				return nil, nil, fault("leave one of them out", "%s: the shape is settled without it, %s and %s are both given otherwise", r, r.Name, r.Over)
			case known[r.Over]:
				steps = append(steps, step{name: r.Name, relation: r})
				known[r.Name] = true
			case known[r.Name]:
				steps = append(steps, step{name: r.Over, relation: r, below: true})
				known[r.Over] = true
			default:
				left = append(left, r)
				continue
			}
			again = true
		}
		ratios = left
	}
	return steps, ratios, nil
}

func missing(family *scf.Family, ratios []relation, known map[string]bool) error {
	var names, wanted []string
	for _, d := range family.Dimensions {
		if !known[d.Name] && !d.Optional {
			names, wanted = append(names, d.Name), append(wanted, d.Name+", the "+d.Meaning)
		}
	}
	hint := "give a value or a ratio to a dimension that is known; " + family.Name + " has " + family.Usage()
	switch {
	case len(names) == 1:
		return fault(hint, "%s: not settled", wanted[0])
	case len(names) > 1:
		return fault(hint, "%s: not settled", strings.Join(names, ", "))
	case len(ratios) > 0:
		return fault(hint, "%s: neither %s nor %s is settled", ratios[0], ratios[0].Name, ratios[0].Over)
	}
	return nil
}

// dims are the dimensions at a place of the chart.
func (q *Question) dims(x, y float64) scf.Dims {
	dims := make(scf.Dims)
	for _, s := range q.steps {
		v := s.relation.value
		switch s.relation.from {
		case along:
			v = x
		case curves:
			v = y
		}
		switch r := s.relation; {
		case r.Over == "":
			dims[s.name] = v
		case s.below:
			dims[s.name] = dims[r.Name] / v
		default:
			dims[s.name] = dims[r.Over] * v
		}
	}
	return dims
}
