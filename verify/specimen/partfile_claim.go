package specimen

import (
	"strings"

	"notchproof/scf"
)

// claims reads the list of claims, each for one of the loads checked.
func (d *document) claims(n *node, loads []scf.Load) ([]Claim, error) {
	if n == nil {
		return nil, nil
	}
	items, err := d.list(n, `write [{"load": "bending", "factor": 1.85, "from": "chart"}]`)
	if err != nil {
		return nil, err
	}
	var claims []Claim
	for _, item := range items {
		c, err := d.claim(item, loads)
		if err != nil {
			return nil, err
		}
		for _, other := range claims {
			if other.Load == c.Load {
				return nil, d.fail(item.at, InputError{What: item.path, Value: string(c.Load), Reason: "second claim for this load", Hint: "give one claim a load"})
			}
		}
		claims = append(claims, c)
	}
	return claims, nil
}

func (d *document) claim(n *node, loads []scf.Load) (c Claim, err error) {
	if err = d.object(n, claimKeys...); err != nil {
		return c, err
	}
	factor, load := n.member("factor"), n.member("load")
	switch {
	case factor == nil:
		return c, d.fail(n.at, InputError{What: n.path + ".factor", Reason: "missing", Hint: "a claim is a factor for one of the loads"})
	case load != nil:
		if c.Load, err = d.load(load, loads); err != nil {
			return c, err
		}
	case len(loads) == 1:
		c.Load = loads[0]
	default:
		return c, d.fail(n.at, InputError{What: n.path + ".load", Reason: "missing", Hint: "name the one load that the factor is meant for"})
	}
	const hint = "give a plain number above 0, such as 1.85"
	if c.Factor, err = d.number(factor, hint); err != nil {
		return c, err
	}
	if c.Factor <= 0 || c.Factor > 1e6 {
		return c, d.refuse(factor, "not a stress concentration factor", hint)
	}
	c.LastDigit = LastDigit(factor.text)
	if from := n.member("from"); from != nil {
		if c.From, err = d.label(from); err != nil {
			return c, err
		}
	}
	if tolerance := n.member("tolerance"); tolerance != nil {
		const hint = `give a share of the factor, such as 0.03 or "3%"`
		if c.Tolerance, err = d.share(tolerance, hint); err != nil {
			return c, err
		}
		if c.Tolerance == 0 {
			return c, d.refuse(tolerance, "a factor without any tolerance", "leave it out for 3%, or give a small one")
		}
		if c.Tolerance < 0 || c.Tolerance > 0.5 {
			return c, d.refuse(tolerance, "not a tolerance", hint)
		}
	}
	if mesh := n.member("mesh"); mesh != nil {
		c.Mesh, err = d.density(mesh)
	}
	return c, err
}

// material reads what the part is made of.
func (d *document) material(n *node) (Material, error) {
	m := Material{Nu: defaultNu}
	err := d.object(n, materialKeys...)
	if v := n.member("name"); v != nil && err == nil {
		m.Name, err = d.label(v)
	}
	if v := n.member("nu"); v != nil && err == nil {
		const hint = "metals lie near 0.3; give a number from 0 up to, but not including, 0.5"
		if m.Nu, err = d.number(v, hint); err == nil && (m.Nu < 0 || m.Nu >= 0.5) {
			err = d.refuse(v, "not a Poisson's ratio", hint)
		}
	}
	if v := n.member("E"); v != nil && err == nil {
		m.E, err = d.stress(v)
	}
	if v := n.member("yield"); v != nil && err == nil {
		m.Yield, err = d.stress(v)
	}
	return m, err
}

// pressures in MPa. The psi is the pound-force (0.45359237 kg × 9.80665 m/s²)
// on the square of an inch of 25.4 mm, all exact by definition.
var pressures = []struct {
	name string
	mpa  float64
}{{"MPa", 1}, {"GPa", 1e3}, {"kPa", 1e-3}, {"Pa", 1e-6}, {"psi", psi}, {"ksi", 1e3 * psi}}

const psi = 0.45359237 * 9.80665 / (25.4 * 25.4)

// stress reads a modulus or a stress and gives it in MPa.
func (d *document) stress(n *node) (float64, error) {
	const hint = `give a number in MPa, or a text such as "355 MPa", "210 GPa" or "51 ksi"`
	s, err := d.written(n, hint)
	if err != nil {
		return 0, err
	}
	number, unit := splitUnit(s)
	x, problem := parseNumber(number)
	if problem != nil {
		return 0, d.refuse(n, problem.Reason, hint)
	}
	factor := 0.0
	for _, p := range pressures {
		if p.name == unit || unit == "" && p.name == "MPa" {
			factor = p.mpa
		}
	}
	switch {
	case factor == 0:
		return 0, d.refuse(n, "unknown unit "+quote(strings.TrimSpace(unit)), hint)
	case x <= 0 || x*factor > 1e9 || x*factor < 1e-9:
		return 0, d.refuse(n, "not a modulus or stress of a solid", hint)
	}
	return x * factor, nil
}
