package report

import (
	"notchproof/render/number"
	"notchproof/verify"
)

// Verdict is a verdict as it stands in JSON: agrees, disagrees, undecided,
// outOfRange or nothingToCompare.
type Verdict string

// Words are for people.
func (v Verdict) Words() string {
	switch v {
	case "agrees", "disagrees":
		return string(v)
	case "outOfRange":
		return "out of range"
	case "nothingToCompare":
		return "nothing to compare with"
	}
	return "undecided"
}

func verdictOf(v verify.Verdict) Verdict { return Verdict(v.String()) }

// sentence says what a finding comes to; Because says why.
func sentence(f *verify.Finding) string {
	if c := f.Claim; c != nil && f.Verdict != verify.Undecided {
		share := number.Percent(abs(c.Difference), 1)
		switch {
		case c.Unsafe():
			return "The claim is " + share + " too low: a part designed with it bears more stress than was thought."
		case c.Verdict == verify.Disagrees:
			return "The claim is " + share + " too high: it does not agree, but errs on the safe side."
		}
		return "The claim agrees with the computed factor."
	}
	switch f.Verdict {
	case verify.Agrees:
		return "The handbook agrees with the computed factor."
	case verify.Disagrees:
		return "The handbook does not agree with the computed factor."
	case verify.OutOfRange:
		return "No handbook value covers this part: the computed factor stands alone."
	case verify.NothingToCompare:
		return "There is nothing to compare with: the computed factor stands alone."
	}
	return "Nothing is judged: the computed factor is not settled."
}

func abs(x float64) float64 {
	if x < 0 {
		return -x
	}
	return x
}
