package scf

// Force lines of a bar notched on one side, in tension.
const (
	ForceLineNet   = "net"   // through the middle of the net section
	ForceLineGross = "gross" // through the middle of the gross section
)

// Options hold what belongs to a question but not to a shape.
type Options struct {
	Nu        float64 // Poisson's ratio, taken as it stands (0 is a ratio)
	ForceLine string  // ForceLineNet, the default when empty, or ForceLineGross
}

// grossLine reports whether the force passes through the middle of the gross
// section.
func (o Options) grossLine() bool {
	switch o.ForceLine {
	case "", ForceLineNet:
		return false
	case ForceLineGross:
		return true
	}
	panic("scf: unknown force line")
}
