package outline

import (
	"math"
	"slices"
)

// An Interval is a stretch of a straight cut that lies in the material.
type Interval struct{ Lo, Hi float64 }

// union joins two ascending lists of disjoint intervals into one.
func union(a, b []Interval) []Interval {
	all := slices.Concat(a, b)
	slices.SortFunc(all, func(p, q Interval) int {
		switch {
		case p.Lo < q.Lo:
			return -1
		case p.Lo > q.Lo:
			return 1
		}
		return 0
	})
	var joined []Interval
	for _, iv := range all {
		if n := len(joined); n > 0 && iv.Lo <= joined[n-1].Hi {
			joined[n-1].Hi = max(joined[n-1].Hi, iv.Hi)
			continue
		}
		joined = append(joined, iv)
	}
	return joined
}

// A BarSection is the cross-section of a bar of unit thickness, cut into
// intervals across it; its length unit is the outline's. Multiply Area and
// SecondMoment by the thickness.
type BarSection struct {
	Area         float64 // length
	Centroid     float64 // position along the cut
	SecondMoment float64 // about the centroid, length³
	Lo, Hi       float64 // extreme fibres
}

// Bar gives the bar section of a cut. The section of an empty cut is zero.
func Bar(cut []Interval) BarSection {
	if len(cut) == 0 {
		return BarSection{}
	}
	s := BarSection{Lo: cut[0].Lo, Hi: cut[len(cut)-1].Hi}
	mid := s.Lo + (s.Hi-s.Lo)/2 // cancels less than the origin
	first := 0.0
	for _, iv := range cut {
		l := iv.Hi - iv.Lo
		s.Area += l
		first += float64(l * ((iv.Lo - mid) + l/2))
	}
	if s.Area > 0 {
		s.Centroid = mid + first/s.Area
	}
	for _, iv := range cut {
		l, d := iv.Hi-iv.Lo, iv.Lo+(iv.Hi-iv.Lo)/2-s.Centroid
		s.SecondMoment += float64(l*l*l)/12 + float64(l*d*d)
	}
	return s
}

// A ShaftSection is the cross-section of a body of revolution: rings.
type ShaftSection struct {
	Area         float64 // length²
	SecondMoment float64 // about a diameter, length⁴
	PolarMoment  float64 // twice that
	Inner, Outer float64 // extreme radii
}

// Shaft gives the section that arises when a cut turns about y = 0. Of a cut
// through a whole outline the part below the axis is left out.
func Shaft(cut []Interval) ShaftSection {
	var s ShaftSection
	empty := true
	for _, iv := range cut {
		lo, hi := max(iv.Lo, 0), iv.Hi
		if hi <= lo {
			continue
		}
		if empty {
			s.Inner, empty = lo, false
		}
		s.Outer = hi
		// b² − a² and b⁴ − a⁴ in factors, which do not cancel in thin rings.
		ring := (hi - lo) * (hi + lo)
		s.Area += float64(math.Pi * ring)
		s.SecondMoment += float64(math.Pi / 4 * ring * (float64(hi*hi) + float64(lo*lo)))
	}
	s.PolarMoment = 2 * s.SecondMoment
	return s
}
