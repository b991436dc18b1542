package specimen

// AngleFrom says what the angle at a peak is counted from, to follow "17.8°".
// It is the angle between the surface normal and the transverse direction, which
// reads differently on a fillet, in a groove and on a hole.
func (p *Part) AngleFrom() string {
	if len(p.Sharp) > 0 {
		return "between normal and transverse"
	}
	switch p.Name {
	case "bar-notch", "bar-edge-notch", "shaft-groove":
		return "from the bottom"
	case "bar-hole", "bar-ellipse":
		return "from the net section"
	case "outline":
		return "between normal and transverse"
	}
	return "up the arc"
}
