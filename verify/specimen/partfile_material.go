package specimen

import (
	"errors"

	"notchproof/verify/quantity"
)

// Material is what the part is made of. What is not given is zero.
type Material struct {
	Name       string
	Nu         float64 // Poisson's ratio, 0.3 when not given
	E          float64 // Young's modulus, MPa
	Yield      quantity.Stress
	Tensile    quantity.Stress // strength
	Elongation float64         // after fracture, a share
	Brittle    bool
	Metal      string // kind of metal, as it was written
}

// material reads what the part is made of.
func (d *document) material(n *node) (Material, error) {
	m := Material{Nu: defaultNu}
	if err := d.object(n, materialKeys...); err != nil {
		return m, err
	}
	for _, read := range []struct {
		key string
		by  func(*node) error
	}{
		{"name", func(v *node) (err error) { m.Name, err = d.label(v); return err }},
		{"nu", func(v *node) (err error) { m.Nu, err = d.poisson(v); return err }},
		{"E", func(v *node) error { s, err := d.stress(v); m.E = s.Megapascals(); return err }},
		{"yield", func(v *node) (err error) { m.Yield, err = d.stress(v); return err }},
		{"tensile", func(v *node) (err error) { m.Tensile, err = d.stress(v); return err }},
		{"elongation", func(v *node) (err error) { m.Elongation, err = d.elongation(v); return err }},
		{"brittle", func(v *node) (err error) { m.Brittle, err = d.truth(v); return err }},
		{"metal", func(v *node) (err error) { m.Metal, err = d.label(v); return err }},
	} {
		if v := n.member(read.key); v != nil {
			if err := read.by(v); err != nil {
				return m, err
			}
		}
	}
	return m, nil
}

func (d *document) poisson(n *node) (float64, error) {
	const hint = "metals lie near 0.3; give a number from 0 up to, but not including, 0.5"
	nu, err := d.number(n, hint)
	if err == nil && (nu < 0 || nu >= 0.5) {
		err = d.refuse(n, "not a Poisson's ratio", hint)
	}
	return nu, err
}

func (d *document) elongation(n *node) (float64, error) {
	const hint = `give the elongation after fracture as a share, such as 0.18 or "18%"`
	x, err := d.share(n, hint)
	if err == nil && !(x > 0 && x <= 1) {
		err = d.refuse(n, "not an elongation", hint)
	}
	return x, err
}

// stress reads a modulus or a stress; a plain number is in MPa.
func (d *document) stress(n *node) (quantity.Stress, error) {
	const hint = `give a number in MPa, or a text such as "355 MPa", "210 GPa" or "51 ksi"`
	s, err := d.written(n, hint)
	if err != nil {
		return quantity.Stress{}, err
	}
	if number, unit := splitUnit(s); unit == "" && number != "" {
		s = number + "MPa"
	}
	x, err := quantity.ParseStress(s)
	if err != nil {
		return x, d.misread(n, err, hint)
	}
	if x.Megapascals() <= 0 {
		return x, d.refuse(n, "not a modulus or stress of a solid", hint)
	}
	return x, nil
}

// misread places a fault that was found in the text of a quantity.
func (d *document) misread(n *node, err error, hint string) error {
	var fault *quantity.Error
	if !errors.As(err, &fault) {
		return d.refuse(n, err.Error(), hint)
	}
	if fault.Hint != "" {
		hint = fault.Hint
	}
	return d.refuse(n, fault.Reason, hint)
}
