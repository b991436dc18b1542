package quantity

import "strconv"

// amount is what all kinds share: a number and a unit.
type amount struct {
	value float64
	unit  unit
}

// Value is the number in the quantity's own unit.
func (a amount) Value() float64 { return a.value }

// Unit is the name of that unit, "" of a quantity that was never given.
func (a amount) Unit() string { return a.unit.name }

// Given tells a quantity that was read or made from the zero value.
func (a amount) Given() bool { return a.unit.name != "" }

// String gives four significant digits, for messages; package number writes
// what is printed for people.
func (a amount) String() string {
	if !a.Given() {
		return "none"
	}
	return strconv.FormatFloat(a.value, 'g', 4, 64) + " " + a.unit.name
}

func (a amount) in(to unit) float64 {
	if !a.Given() {
		return 0
	}
	return convert(a.value, a.unit, to)
}

// like is a value in the kind's first unit, told in the unit of a.
func (a amount) like(k kind, value float64) amount {
	u := k.units[0]
	if a.Given() {
		u = a.unit
	}
	return amount{convert(value, k.units[0], u), u}
}

// A Force, positive in tension. The zero value was not given and is no force.
type Force struct{ amount }

// ParseForce reads "12kN". The error is an *Error.
func ParseForce(text string) (Force, error) {
	a, err := forces().parse(text)
	return Force{a}, err
}

// Newtons makes a force.
func Newtons(value float64) Force { return Force{amount{value, forces().units[0]}} }

// Newtons is the force in N.
func (f Force) Newtons() float64 { return f.in(forces().units[0]) }

// Like is a force of so many newtons in the unit of f, or in N where f was not
// given.
func (f Force) Like(newtons float64) Force { return Force{f.like(forces(), newtons)} }

// A Moment bends or twists. The zero value was not given and is no moment.
type Moment struct{ amount }

// ParseMoment reads "300N·m", also written N*m, N m, Nm. The error is an *Error.
func ParseMoment(text string) (Moment, error) {
	a, err := moments().parse(text)
	return Moment{a}, err
}

// NewtonMillimetres makes a moment.
func NewtonMillimetres(value float64) Moment { return Moment{amount{value, moments().units[0]}} }

// NewtonMillimetres is the moment in N·mm.
func (m Moment) NewtonMillimetres() float64 { return m.in(moments().units[0]) }

// Like is a moment of so many N·mm in the unit of m, or in N·mm where m was
// not given.
func (m Moment) Like(newtonMillimetres float64) Moment {
	return Moment{m.like(moments(), newtonMillimetres)}
}

// A Stress, or a strength. The zero value was not given and is no stress.
type Stress struct{ amount }

// ParseStress reads "355MPa". The error is an *Error.
func ParseStress(text string) (Stress, error) {
	a, err := stresses().parse(text)
	return Stress{a}, err
}

// Megapascals makes a stress.
func Megapascals(value float64) Stress { return Stress{amount{value, stresses().units[0]}} }

// Megapascals is the stress in MPa, which is N/mm².
func (s Stress) Megapascals() float64 { return s.in(stresses().units[0]) }

// Like is a stress of so many MPa in the unit of s, or in MPa where s was not
// given.
func (s Stress) Like(megapascals float64) Stress { return Stress{s.like(stresses(), megapascals)} }
