package fem

import "math"

// Stress is a symmetric stress tensor.
type Stress struct{ XX, YY, ZZ, XY, XZ, YZ float64 }

func stressOf(s *[components]float64) Stress {
	return Stress{s[xx], s[yy], s[zz], s[xy], s[xz], s[yz]}
}

// Principal gives the principal stresses, largest first. The roots of the
// characteristic equation are real; they are taken from the trigonometric
// solution, and from plane formulas where the tensor is uncoupled, which keeps
// full accuracy in the two cases that occur in practice.
func (s Stress) Principal() [3]float64 {
	if s.XZ == 0 && s.YZ == 0 {
		mean, radius := (s.XX+s.YY)/2, math.Hypot((s.XX-s.YY)/2, s.XY)
		return ordered(mean+radius, mean-radius, s.ZZ)
	}
	m := (s.XX + s.YY + s.ZZ) / 3
	a, b, c := s.XX-m, s.YY-m, s.ZZ-m
	j2 := (a*a+b*b+c*c)/2 + s.XY*s.XY + s.XZ*s.XZ + s.YZ*s.YZ
	if j2 == 0 {
		return [3]float64{m, m, m}
	}
	j3 := a*(b*c-s.YZ*s.YZ) - s.XY*(s.XY*c-s.YZ*s.XZ) + s.XZ*(s.XY*s.YZ-b*s.XZ)
	q := math.Sqrt(j2 / 3)
	cos3 := math.Max(-1, math.Min(1, j3/(2*q*q*q)))
	lode := math.Acos(cos3) / 3
	third := 2 * math.Pi / 3
	return ordered(m+2*q*math.Cos(lode), m+2*q*math.Cos(lode-third), m+2*q*math.Cos(lode+third))
}

func ordered(a, b, c float64) [3]float64 {
	if a < b {
		a, b = b, a
	}
	if b < c {
		b, c = c, b
	}
	if a < b {
		a, b = b, a
	}
	return [3]float64{a, b, c}
}

// VonMises is the equivalent stress of von Mises (1913).
func (s Stress) VonMises() float64 {
	a, b, c := s.XX-s.YY, s.YY-s.ZZ, s.ZZ-s.XX
	return math.Sqrt((a*a+b*b+c*c)/2 + 3*(s.XY*s.XY+s.XZ*s.XZ+s.YZ*s.YZ))
}

// MaxShear is half the difference of the extreme principal stresses.
func (s Stress) MaxShear() float64 {
	p := s.Principal()
	return (p[0] - p[2]) / 2
}
