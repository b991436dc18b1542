package specimen

import "notchproof/scf"

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
