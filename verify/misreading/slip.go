package misreading

import (
	"notchproof/scf"
	"notchproof/verify/specimen"
)

// A slip is a mistake that people make.
type slip struct {
	name  string
	grade grade
	// wrong lists the wrong questions that the slip asks of this part, none
	// where it cannot be made.
	wrong func(*Question) []wrong
}

// A grade says how much has to go wrong for a slip: what needs least comes
// first.
type grade int

const (
	none   grade = iota // no slip: the chart was read well and is off itself
	line                // a wrong line of the right table: one mistake that leaves no choice
	table               // the wrong table, or the wrong quantity
	choice              // one mistake with a choice of how to make it
	free                // a parameter that nothing fixes
)

// cost is what the distance of a match is multiplied with: the more has to go
// wrong, the closer a match must be to mean as much. The order is common
// practice; the steps are small because no more than the order is known, except
// where a parameter is free.
func (g grade) cost() float64 {
	switch g {
	case none:
		return 0.5
	case line:
		return 1
	case table:
		return 1.25
	case choice:
		return 1.5
	}
	return 3
}

// slips lists all of them.
func slips() []slip {
	return []slip{
		{"chart", none, chart},
		{"load", line, otherLoad},
		{"section", line, grossSection},
		{"diameter", line, diameterForRadius},
		{"left out", line, leftOut},
		{"range", line, outsideRange},
		{"stress", table, otherStress},
		{"kind", table, otherKind},
		{"notches", choice, otherNotches},
		{"sizes", choice, sizes},
		{"curve", free, neighbouringCurve},
		{"sensitivity", free, sensitivity},
	}
}

// A wrong question is what somebody looked up or computed instead. It has a
// part of a family with changed dimensions, a part as it stands, or factors
// that are known.
type wrong struct {
	what string

	family  *scf.Family
	dims    scf.Dims
	part    *specimen.Part
	load    scf.Load
	options scf.Options

	// times is what the factor is multiplied with; 0: 1.
	times float64
	// chartsOnly: the right part, for which nothing needs to be solved again.
	chartsOnly bool
	// chartFirst: solved only where no chart has anything to say.
	chartFirst bool
	// known are factors that are there already, with where they come from.
	known []value
}

// A value is one factor of a slip.
type value struct {
	factor float64
	from   string
}

const computed = "computed"
