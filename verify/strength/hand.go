package strength

import (
	"math"

	"notchproof/verify"
)

// byHand works out the rule of the design office with the computed factors, with
// the handbook's, and with those that the user claims, where there are some.
func (q *Question) byHand(checked *verify.Result, computed float64) []Hand {
	own, book, claimed := Hand{With: "computed factors"}, Hand{With: "handbook factors"}, Hand{With: "claimed factors"}
	claims := false
	for i := range checked.Findings {
		f := &checked.Findings[i]
		e := f.Computed.Factor
		factor := HandFactor{f.Load.Name, e.Value, e.Uncertainty, ""}
		own.Factors = append(own.Factors, factor)
		if f.Claim != nil {
			claims = true
			factor = HandFactor{f.Load.Name, f.Claim.Factor, f.Claim.Tolerance, "claim"}
		}
		claimed.Factors = append(claimed.Factors, factor)
		if best, ok := bestInRange(f.Handbook); ok {
			v := best.Value
			book.Factors = append(book.Factors, HandFactor{f.Load.Name, v.Factor, v.Accuracy * v.Factor, v.ID})
		} else {
			book.Missing = append(book.Missing, string(f.Load.Name))
		}
	}
	list := []Hand{own, book}
	if claims {
		list = append(list, claimed)
	}
	for i := range list {
		if len(list[i].Missing) == 0 {
			q.combine(&list[i], computed)
		}
	}
	return list
}

// bestInRange is the published factor that covers the shape with the best
// accuracy, the first of equals.
func bestInRange(values []verify.HandbookComparison) (best verify.HandbookComparison, ok bool) {
	for _, h := range values {
		if h.Value.InRange && !h.Value.Hint && (!ok || h.Value.Accuracy < best.Value.Accuracy) {
			best, ok = h, true
		}
	}
	return best, ok
}

// combine adds the peaks as if they lay in one point, and lets the bending turn
// against the axial force where the part has both sides of it.
func (q *Question) combine(h *Hand, computed float64) {
	var fixed, turned, normal, shear float64 // stresses, and what they are good for
	for _, f := range h.Factors {
		l := q.find(f.Load)
		stress, bar := q.nominal(l)*f.Factor, math.Abs(q.nominal(l))*f.Tolerance
		switch {
		case l.Shear:
			h.Shear, shear = math.Abs(stress), bar
		case turning(f.Load):
			turned, normal = stress, normal+bar
		default:
			fixed, normal = stress, normal+bar
		}
	}
	h.Normal = fixed + turned
	if other := fixed - turned; q.bothSides() && q.Material.equivalent(other, h.Shear) > q.Material.equivalent(h.Normal, h.Shear) {
		h.Normal = other
	}
	h.Equivalent = q.Material.equivalent(h.Normal, h.Shear)
	// Both criteria grow by no more than the direct stress and √3 times the shear.
	h.Uncertainty = normal + math.Sqrt(3)*shear
	h.Difference = h.Equivalent/computed - 1
	h.Safety = safety(q.Material.strength().Megapascals(), h.Equivalent, h.Uncertainty)
}

// bothSides tells that the notch lies on the tensile and on the compressive side
// of bending: around a shaft, on both edges of a bar, or around a hole.
func (q *Question) bothSides() bool {
	if q.around() != once {
		return true
	}
	for _, side := range q.Part.Notch {
		if side >= len(q.Part.Region.Outer) {
			return true
		}
	}
	return false
}
