package scf

// step is a shape with two sizes and a root radius: a shoulder, a groove, a
// pair of notches. The books' letters.
type step struct {
	D, d, r float64
}

func stepOf(dims Dims) step { return step{D: dims["D"], d: dims["d"], r: dims["r"]} }

func (s step) h() float64 { return (s.D - s.d) / 2 } // height or depth of each side
func (s step) q() float64 { return s.h() / s.r }
func (s step) x() float64 { return (s.D - s.d) / s.D } // 2h/D
