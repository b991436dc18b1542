package specimen

import "notchproof/verify/quantity"

// Forces is what acts on the part, and what is asked of it. What is not given
// is zero.
type Forces struct {
	Axial     quantity.Force
	Bending   quantity.Moment
	Torque    quantity.Moment
	Thickness Length  // of a bar
	Safety    float64 // that is asked for
}

// forces reads the loads with their sizes, the thickness and the safety.
func (d *document) forces(top *node) (f Forces, err error) {
	if n := top.member("forces"); n != nil {
		if f, err = d.acting(n); err != nil {
			return f, err
		}
	}
	if n := top.member("thickness"); n != nil {
		if f.Thickness, err = d.length(n); err != nil {
			return f, err
		}
		if !(f.Thickness.Value > 0) {
			return f, d.refuse(n, "not above zero", `give the thickness of the bar, such as "8mm"`)
		}
	}
	if n := top.member("safety"); n != nil {
		const hint = "give the safety that is asked for, such as 1.8"
		if f.Safety, err = d.number(n, hint); err == nil && !(f.Safety >= 1 && f.Safety <= 100) {
			err = d.refuse(n, "not a safety between 1 and 100", hint)
		}
	}
	return f, err
}

func (d *document) acting(n *node) (f Forces, err error) {
	if err = d.object(n, forceKeys...); err != nil {
		return f, err
	}
	for _, read := range []struct {
		key, such string
		by        func(text string) error
	}{
		{"axial", "12 kN", func(s string) (err error) { f.Axial, err = quantity.ParseForce(s); return err }},
		{"bending", "300 N·m", func(s string) (err error) { f.Bending, err = quantity.ParseMoment(s); return err }},
		{"torque", "450 N·m", func(s string) (err error) { f.Torque, err = quantity.ParseMoment(s); return err }},
	} {
		v := n.member(read.key)
		if v == nil {
			continue
		}
		hint := `write a text with a unit, such as "` + read.such + `"`
		s, err := d.written(v, hint)
		if err == nil {
			if err = read.by(s); err != nil {
				err = d.misread(v, err, hint)
			}
		}
		if err != nil {
			return f, err
		}
	}
	return f, nil
}
