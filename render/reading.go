package render

import (
	"fmt"
	"math"

	"notchproof/fem"
)

// A tensor is a stress on the drawn plane as fields hold it: xx, yy, xy, zz,
// then the shears xz and yz of twisted shafts.
type tensor [6]float64

func tensorOf(s fem.Stress) tensor { return tensor{s.XX, s.YY, s.XY, s.ZZ, s.XZ, s.YZ} }

func (t *tensor) full() fem.Stress {
	return fem.Stress{XX: t[0], YY: t[1], XY: t[2], ZZ: t[3], XZ: t[4], YZ: t[5]}
}

// A reading says what is drawn of the stresses.
type reading struct {
	of func(t *tensor) float64
	// signed tells that the sign means something: the ramp then runs from the
	// lowest value to the highest, and the zero line is drawn.
	signed bool
}

// The fields that a picture can show.
const (
	FieldPrincipal  = "principal"
	FieldMises      = "mises"
	FieldShear      = "shear"
	FieldAxial      = "axial"
	FieldTransverse = "transverse"
	FieldShearXY    = "shear-xy"
	FieldHoop       = "hoop"
)

// Fields lists the fields by name, the default first.
func Fields() []string {
	return []string{FieldPrincipal, FieldMises, FieldShear, FieldAxial, FieldTransverse, FieldShearXY, FieldHoop}
}

// readingOf finds a field. Only shafts have a hoop stress, and in a shaft that
// is twisted alone nothing but shear around the axis.
func readingOf(name string, shaft, twistAlone bool) (reading, error) {
	list := map[string]reading{
		FieldPrincipal:  {of: firstPrincipal},
		FieldMises:      {of: vonMises},
		FieldShear:      {of: largestShear},
		FieldAxial:      {of: func(t *tensor) float64 { return t[0] }, signed: true},
		FieldTransverse: {of: func(t *tensor) float64 { return t[1] }, signed: true},
		FieldShearXY:    {of: func(t *tensor) float64 { return t[2] }, signed: true},
		FieldHoop:       {of: func(t *tensor) float64 { return t[3] }, signed: true},
	}
	read, ok := list[name]
	switch {
	case !ok:
		return read, fmt.Errorf("picture: no field %q", name)
	case name == FieldHoop && !shaft:
		return read, &FieldError{name, "a bar has no hoop stress"}
	case twistAlone && read.signed:
		return read, &FieldError{name, "a shaft in torsion carries shear around its axis alone"}
	case twistAlone:
		read.of = twist
	}
	return read, nil
}

// A FieldError says that a part under its load has no such field.
type FieldError struct{ Field, Reason string }

func (e *FieldError) Error() string { return "field " + e.Field + ": " + e.Reason }

func firstPrincipal(t *tensor) float64 {
	if t[4] != 0 || t[5] != 0 {
		return t.full().Principal()[0]
	}
	mean, half := (t[0]+t[1])/2, (t[0]-t[1])/2
	return max(mean+math.Sqrt(half*half+t[2]*t[2]), t[3])
}

func vonMises(t *tensor) float64 {
	a, b, c := t[0]-t[1], t[1]-t[3], t[3]-t[0]
	return math.Sqrt((a*a+b*b+c*c)/2 + 3*(t[2]*t[2]+t[4]*t[4]+t[5]*t[5]))
}

// largestShear is the largest shear in the drawn plane or, of a twisted shaft,
// across it.
func largestShear(t *tensor) float64 {
	half := (t[0] - t[1]) / 2
	return math.Sqrt(math.Max(half*half+t[2]*t[2], t[4]*t[4]+t[5]*t[5]))
}

// twist is the size of the shear stress on the cross-section and along the
// axis, which under pure torsion is the largest there is, the first principal
// stress, and von Mises ÷ √3.
func twist(t *tensor) float64 { return math.Sqrt(t[4]*t[4] + t[5]*t[5]) }

// principalDifference is what a photoelastic model shows: σ1 − σ2 in the drawn
// plane; of a shaft that is twisted alone the two of the twist, ±τ.
func principalDifference(t *tensor) float64 {
	half := (t[0] - t[1]) / 2
	return 2 * math.Sqrt(half*half+t[2]*t[2])
}

func twistDifference(t *tensor) float64 { return 2 * twist(t) }
