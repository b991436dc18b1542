package scf

// Sources, cited in full once.
const (
	roark7  = "W. C. Young, R. G. Budynas, Roark's Formulas for Stress and Strain, 7th ed., McGraw-Hill 2002, Table 17.1, "
	pilkey3 = "W. D. Pilkey, D. F. Pilkey, Peterson's Stress Concentration Factors, 3rd ed., Wiley 2008, "
)

// A cubicCase is a published cubic with what is printed beside its values.
type cubicCase struct {
	id       string
	source   string
	sureness Sureness
	bias     string
	ratio    string // what q is; empty: h/r
	fit      cubic
}

// value evaluates the case for the shape ratio q and the depth ratio x.
func (c cubicCase) value(q, x float64) Value {
	ratio := c.ratio
	if ratio == "" {
		ratio = "h/r"
	}
	v := Value{
		ID:       c.id,
		Factor:   c.fit.factor(q, x),
		Accuracy: fitAccuracy,
		Source:   c.source,
		Sureness: c.sureness,
		Bias:     c.bias,
	}
	v.hold(c.fit.limit(ratio, q))
	return v
}
