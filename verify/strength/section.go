package strength

import (
	"math"

	"notchproof/mesh/outline"
)

// A section is the net section as a whole, in millimetres: strips of a bar of
// one thickness, or rings of a shaft.
type section struct {
	cut       []outline.Interval // of y, or of the radius
	shaft     bool
	thickness float64 // of a bar
}

// resultants are what a section carries, N and N·mm. The moment is about its
// centroid, positive where y above the centroid is in tension.
type resultants struct{ axial, moment, torque float64 }

func (s *section) low() float64 {
	if s.shaft {
		return -s.high()
	}
	return s.cut[0].Lo
}

func (s *section) high() float64 { return s.cut[len(s.cut)-1].Hi }

// above gives area and first moment about y = 0 of what lies above y.
func (s *section) above(y float64) (area, first float64) {
	for _, iv := range s.cut {
		if s.shaft {
			outer, inner := discAbove(iv.Hi, y), discAbove(iv.Lo, y)
			area += outer[0] - inner[0]
			first += outer[1] - inner[1]
			continue
		}
		lo, hi := math.Max(iv.Lo, y), iv.Hi
		if lo < hi {
			area += s.thickness * (hi - lo)
			first += s.thickness * (hi - lo) * (hi + lo) / 2
		}
	}
	return area, first
}

// discAbove gives area and first moment of the part of a disc above y:
// elementary integrals of 2√(R²−y²) and 2y√(R²−y²).
func discAbove(radius, y float64) [2]float64 {
	y = math.Max(-radius, math.Min(radius, y))
	half := math.Sqrt((radius - y) * (radius + y))
	if radius == 0 {
		return [2]float64{}
	}
	return [2]float64{radius*radius*math.Acos(y/radius) - y*half, half * half * half * 2 / 3}
}

// whole gives area and centroid.
func (s *section) whole() (area, centroid float64) {
	area, first := s.above(s.low())
	if s.shaft {
		return area, 0
	}
	return area, first / area
}

// second is the second moment about the centroid, of a shaft about a diameter.
func (s *section) second() float64 {
	_, centroid := s.whole()
	sum := 0.0
	for _, iv := range s.cut {
		if s.shaft {
			sum += math.Pi / 4 * (math.Pow(iv.Hi, 4) - math.Pow(iv.Lo, 4))
			continue
		}
		sum += s.thickness / 3 * (math.Pow(iv.Hi-centroid, 3) - math.Pow(iv.Lo-centroid, 3))
	}
	return sum
}

// elastic gives the largest von Mises stress by beam theory, in an outermost
// fibre: P/A ± M c/I with the shear T R/J.
func (s *section) elastic(r resultants) float64 {
	area, centroid := s.whole()
	second := s.second()
	worst := 0.0
	for _, y := range [2]float64{s.low(), s.high()} {
		normal := r.axial/area + r.moment*(y-centroid)/second
		shear := 0.0
		if s.shaft {
			shear = r.torque * y / (2 * second)
		}
		worst = math.Max(worst, math.Sqrt(normal*normal+3*shear*shear))
	}
	return worst
}
