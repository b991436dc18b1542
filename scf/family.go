package scf

import "slices"

// Kind tells bars, flat and of constant thickness, from shafts, round.
type Kind int

const (
	Bar Kind = iota + 1
	Shaft
)

func (k Kind) String() string {
	switch k {
	case Bar:
		return "bar"
	case Shaft:
		return "shaft"
	}
	return "no kind"
}

// A Family is a parametrised shape with a known nominal section.
type Family struct {
	Name       string // "shaft-shoulder"
	Title      string // "stepped round shaft with shoulder fillet"
	Kind       Kind
	Dimensions []Dimension
	Loads      []Load

	// shape tells whether dimensions that are fine one by one make a shape.
	shape func(Dims) error

	nominal  func(Load, Dims, Options) Nominal
	handbook func(Load, Dims, Options) []Value
	hints    func(Load, Dims, Options) []Value
}

// Families lists all families, shafts after bars.
func Families() []*Family {
	return []*Family{
		barShoulder(),
		barNotch(),
		barEdgeNotch(),
		barHole(),
		barEllipse(),
		barCollar(),
		shaftShoulder(),
		shaftGroove(),
		shaftRingGroove(),
		shaftCollar(),
	}
}

// Lookup finds a family by its name.
func Lookup(name string) (*Family, bool) {
	for _, f := range Families() {
		if f.Name == name {
			return f, true
		}
	}
	return nil, false
}

// Carries reports whether the family has the load.
func (f *Family) Carries(load Load) bool {
	for _, l := range f.Loads {
		if l == load {
			return true
		}
	}
	return false
}

// Usage lists the dimensions as a user types them: "D, d, r, [ra], [c]".
func (f *Family) Usage() string { return usage(f.Dimensions) }

// Check tells whether the dimensions make a shape that can be drawn and
// meshed with doubles. Its error is a *DimensionError.
func (f *Family) Check(dims Dims) error {
	if err := checkDimensions(f.Dimensions, dims); err != nil {
		return err
	}
	return f.shape(f.Complete(dims))
}

// Complete returns a copy of the dimensions with the defaults filled in.
func (f *Family) Complete(dims Dims) Dims {
	full := make(Dims, len(f.Dimensions))
	for name, v := range dims {
		full[name] = v
	}
	for _, n := range f.Dimensions {
		if _, given := full[n.Name]; given {
			continue
		}
		if n.Default != nil {
			full[n.Name] = n.Default(dims)
		} else if n.Optional {
			full[n.Name] = 0
		}
	}
	return full
}

// Sharp tells that the dimensions leave a corner without a radius, of which no
// handbook has anything to say: its stress has no bound.
func (f *Family) Sharp(dims Dims) bool {
	return slices.ContainsFunc(f.Dimensions, func(n Dimension) bool {
		v, given := dims[n.Name]
		return n.Sharp && given && v == 0
	})
}

// Nominal is the stress that the family's factors are referred to. The
// dimensions must have passed Check, the load must be one of Loads.
func (f *Family) Nominal(load Load, dims Dims, opt Options) Nominal {
	f.mustCarry(load)
	return f.nominal(load, f.Complete(dims), opt)
}

// Handbook lists the published factors for the shape, best accuracy first and
// among equals the surer, then the later publication. It is empty where
// nothing is published. The dimensions must have passed Check.
func (f *Family) Handbook(load Load, dims Dims, opt Options) []Value {
	f.mustCarry(load)
	if f.handbook == nil {
		return nil
	}
	if f.Sharp(dims) {
		return nil
	}
	values := f.handbook(load, f.Complete(dims), opt)
	for i := range values {
		values[i].holdAboveOne()
	}
	return values
}

// Hints lists factors of neighbouring shapes, where the shape's own are not
// published. No verdict may rest on them; all have Hint set and InRange unset.
func (f *Family) Hints(load Load, dims Dims, opt Options) []Value {
	f.mustCarry(load)
	if f.hints == nil || f.Sharp(dims) {
		return nil
	}
	return f.hints(load, f.Complete(dims), opt)
}

func (f *Family) mustCarry(load Load) {
	if !f.Carries(load) {
		panic("scf: load that the family does not carry")
	}
}
