package render

func (p *plate) reference() string {
	if p.options.Reference != "" {
		return p.options.Reference
	}
	return "nominal"
}

// title says what the tones mean.
func (p *plate) title() string {
	ratio := " ÷ " + p.reference()
	twist := p.twistAlone()
	if p.options.Style == StyleFringe {
		return p.look.title(p.reference())
	}
	switch p.options.Field {
	case FieldMises:
		if twist {
			return "von Mises stress ÷ √3 " + p.reference()
		}
		return "von Mises stress" + ratio
	case FieldShear:
		if !twist {
			return "largest shear in the drawn plane" + ratio
		}
	case FieldAxial:
		return "axial stress" + ratio
	case FieldTransverse:
		if round(p.part) {
			return "radial stress" + ratio
		}
		return "transverse stress" + ratio
	case FieldShearXY:
		return "shear stress xy" + ratio
	case FieldHoop:
		return "hoop stress" + ratio
	}
	if twist {
		return "shear stress" + ratio
	}
	return "first principal stress" + ratio
}

// note says what else a reader must know of the field.
func (p *plate) note() string {
	text := p.look.note(p)
	if p.part.Half && p.options.Whole {
		half := "lower half: mirror image"
		if p.antisymmetric() {
			half = "lower half: the same stresses with the opposite sign"
		}
		if text != "" {
			text += "; "
		}
		text += half
	}
	return text
}
