package report

import (
	"encoding/json"
	"fmt"
	"math"
	"sort"
)

// Holds compares a sheet with what comes out of its input now, and lists what
// no longer holds, one line each; none: the sheet holds.
//
// Between different programs the numbers must agree within their bars, and the
// verdicts, published factors and outcomes of the checks must be the same. The
// same program must say the same throughout.
func Holds(then, now *Content) []string {
	var faults []string
	say := func(format string, args ...any) { faults = append(faults, fmt.Sprintf(format, args...)) }
	if len(then.Results) != len(now.Results) {
		say("%d loads on the sheet, %d now", len(then.Results), len(now.Results))
		return faults
	}
	for i := range then.Results {
		a, b := &then.Results[i], &now.Results[i]
		if a.Load != b.Load {
			say("load %d is %s on the sheet, %s now", i+1, a.Load, b.Load)
			continue
		}
		sameFinding(a, b, func(format string, args ...any) { say(a.Load+": "+format, args...) })
	}
	if len(faults) > 0 || then.Program != now.Program {
		return faults
	}
	return sameThroughout(then, now)
}

// sameFinding compares what is judged by.
func sameFinding(a, b *Finding, say func(string, ...any)) {
	if a.Computed.Settled != b.Computed.Settled {
		say("the ladder is %s on the sheet, %s now", a.Computed.Status, b.Computed.Status)
		return
	}
	if a.Computed.Settled {
		room := b.Computed.TargetShare
		sameValue("the factor", a.Computed.Factor, b.Computed.Factor, room, say)
		sameValue("the von Mises factor", a.Computed.VonMises, b.Computed.VonMises, room, say)
		sameValue("the factor on the gross section", a.Computed.Gross, b.Computed.Gross, room, say)
	}
	if a.Verdict != b.Verdict {
		say("the verdict is %s on the sheet, %s now", a.Verdict.Words(), b.Verdict.Words())
	}
	sameHandbook(a, b, say)
	switch {
	case (a.Claim == nil) != (b.Claim == nil):
		say("a claim is on the sheet or in its input alone")
	case a.Claim != nil && (!near(a.Claim.Factor, b.Claim.Factor) || !near(a.Claim.Tolerance, b.Claim.Tolerance)):
		say("the claim is %g ± %g on the sheet, %g ± %g now", a.Claim.Factor, a.Claim.Tolerance, b.Claim.Factor, b.Claim.Tolerance)
	case a.Claim != nil && a.Claim.Verdict != b.Claim.Verdict:
		say("the claim is judged %s on the sheet, %s now", a.Claim.Verdict.Words(), b.Claim.Verdict.Words())
	}
	if p, q := passed(a.Checks), passed(b.Checks); p != q || len(a.Checks) != len(b.Checks) {
		say("%d of %d checks passed on the sheet, %d of %d now", p, len(a.Checks), q, len(b.Checks))
	}
}

// sameValue holds two values against their bars. A bar that was made wide
// would let anything pass, so it may not be much wider than today's or than
// what was wished for (room, relative).
func sameValue(what string, a, b Value, room float64, say func(string, ...any)) {
	gap := math.Abs(float64(a.Value - b.Value))
	wide := 3 * math.Max(float64(b.Uncertainty), room*math.Abs(float64(b.Value)))
	if !(gap <= float64(a.Uncertainty+b.Uncertainty)) || !(float64(a.Uncertainty) <= wide) {
		say("%s is %s on the sheet, %s now", what, a, b)
	}
}

func sameHandbook(a, b *Finding, say func(string, ...any)) {
	if len(a.Handbook) != len(b.Handbook) {
		say("%d handbook values on the sheet, %d now", len(a.Handbook), len(b.Handbook))
		return
	}
	for i, h := range a.Handbook {
		switch n := b.Handbook[i]; {
		case h.ID != n.ID || !near(h.Factor, n.Factor):
			say("the handbook value %s is %g on the sheet; now %s is %g", h.ID, h.Factor, n.ID, n.Factor)
		case h.Verdict != n.Verdict:
			say("the handbook value %s is judged %s on the sheet, %s now", h.ID, h.Verdict.Words(), n.Verdict.Words())
		}
	}
}

// near allows for the rounding of different machines.
func near(a, b float64) bool { return math.Abs(a-b) <= 1e-9*math.Max(math.Abs(a), math.Abs(b)) }

// sameThroughout compares two contents of one program item by item. Numbers may
// differ by the rounding of a solve.
func sameThroughout(then, now *Content) []string {
	var a, b any
	for _, side := range []struct {
		c  *Content
		to *any
	}{{then, &a}, {now, &b}} {
		data, err := json.Marshal(side.c)
		if err == nil {
			err = json.Unmarshal(data, side.to)
		}
		if err != nil {
			return []string{"the record cannot be compared: " + err.Error()}
		}
	}
	var faults []string
	sameTree("", a, b, &faults)
	return faults
}

func sameTree(path string, a, b any, faults *[]string) {
	differ := func() {
		*faults = append(*faults, fmt.Sprintf("%s is %s on the sheet, %s now", path, brief(a), brief(b)))
	}
	switch x := a.(type) {
	case map[string]any:
		y, ok := b.(map[string]any)
		if !ok || len(x) != len(y) {
			differ()
			return
		}
		names := make([]string, 0, len(x))
		for name := range x {
			names = append(names, name)
		}
		sort.Strings(names)
		for _, name := range names {
			sameTree(path+"."+name, x[name], y[name], faults)
		}
	case []any:
		y, ok := b.([]any)
		if !ok || len(x) != len(y) {
			differ()
			return
		}
		for i := range x {
			sameTree(fmt.Sprintf("%s[%d]", path, i), x[i], y[i], faults)
		}
	case float64:
		const relative, absolute = 1e-6, 1e-8
		if y, ok := b.(float64); !ok || math.Abs(x-y) > relative*math.Abs(x)+absolute {
			differ()
		}
	default:
		if a != b {
			differ()
		}
	}
}

// brief shows an item in a few characters.
func brief(v any) string {
	data, _ := json.Marshal(v)
	if r := []rune(string(data)); len(r) > 40 {
		return string(r[:40]) + "…"
	}
	return string(data)
}
