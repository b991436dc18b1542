package strength

import "notchproof/verify/quantity"

// Judged names the equivalent stress that the material is judged by, and the
// strength that it is held against.
func (m *Material) Judged() (of string, against quantity.Stress) {
	if m.brittle() {
		return "largest principal stress", m.Tensile
	}
	return "von Mises stress", m.Yield
}
