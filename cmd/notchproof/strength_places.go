package main

import (
	"fmt"
	"math"
	"strings"

	"notchproof/render/number"
	"notchproof/verify/strength"
)

// notch prints the most stressed place of the notch, computed and by hand.
func (b *strengthSheet) notch() {
	n := b.Notch()
	b.line("\n%s", b.style.bold("at the notch, "+b.equivalent()))
	b.line("  as computed                 %s", b.style.bold(b.uncertain(n.Equivalent, n.Uncertainty)))
	b.line("             all fields added; on the %s", b.where(n))
	b.line("             %s", b.tensor(n))
	for i := range b.Hand {
		h := &b.Hand[i]
		if len(h.Missing) > 0 {
			b.line("  by hand, %-18s nothing: no factor in range for %s", h.With, strings.Join(h.Missing, ", "))
			continue
		}
		b.line("  by hand, %-18s %s  %s  %s", h.With, b.uncertain(h.Equivalent, h.Uncertainty), number.SignedPercent(h.Difference, 1), b.side(h, n))
	}
	b.line("             by hand: every nominal stress times its own factor, all at one point")
	if b.apart() {
		var peaks []string
		for _, f := range b.Checked.Findings {
			at := f.Computed.Peak
			peaks = append(peaks, fmt.Sprintf("%s on the %s at x = %s", f.Load.Name, at.Side, number.Length(round(at.X, 3), b.Part().Unit)))
		}
		b.line("             but the peaks lie apart: %s", strings.Join(peaks, ", "))
	}
}

// apart tells that the single loads peak on sides of different names.
func (b *strengthSheet) apart() bool {
	for _, f := range b.Checked.Findings {
		if f.Computed.Peak.Side != b.Checked.Findings[0].Computed.Peak.Side {
			return true
		}
	}
	return false
}

// side tells on which side of the computed stress the rule by hand lies, and
// whether that is more than its factors are good for.
func (b *strengthSheet) side(h *strength.Hand, n *strength.Place) string {
	gap, within := math.Abs(h.Equivalent-n.Equivalent), ""
	if gap <= n.Uncertainty+h.Uncertainty {
		within = ", within its ±"
	}
	switch {
	case h.Equivalent == 0:
		return "nothing pulls"
	case gap <= n.Uncertainty:
		return "the same"
	case h.Difference > 0:
		return b.style.weak("conservative" + within)
	}
	return b.style.bad("not conservative" + within)
}

func (b *strengthSheet) where(p *strength.Place) string {
	unit := b.Part().Unit
	text := fmt.Sprintf("%s at x = %s, y = %s", p.Name, number.Length(round(p.X, 4), unit), number.Length(round(p.Y, 4), unit))
	if p.Degrees == 0 {
		return text
	}
	if b.Part().Loads[0].Model.Revolved() {
		return text + fmt.Sprintf(", %.0f° around from the tensile side of bending", math.Min(p.Degrees, 360-p.Degrees))
	}
	return text + ", on the lower edge"
}

func (b *strengthSheet) tensor(p *strength.Place) string {
	text := "along the outline " + b.stress(p.Along)
	if b.Part().Loads[0].Model.Revolved() {
		text += ", around the axis " + b.stress(p.Hoop) + ", shear " + b.stress(math.Abs(p.Shear))
	}
	return text
}

// places prints the table of critical places, smallest safety first.
func (b *strengthSheet) places() {
	b.line("\n%s", b.style.bold("critical places"))
	least := b.Governing().Safety.Value
	row := func(name, stress string, s strength.Interval, note string) {
		b.line("  %-36s %-22s safety %-6s %s", name, stress, number.Significant(s.Value, 3), note)
	}
	for i := range b.Places {
		p := &b.Places[i]
		name, stress := p.Name+", computed", b.uncertain(p.Equivalent, p.Uncertainty)
		if p.Beam {
			name, stress = p.Name+", plain", b.stress(p.Equivalent)
		}
		note := b.style.bold("governs")
		if i > 0 {
			note = number.Significant(p.Safety.Value/least, 3) + " times that"
		}
		row(name, stress, p.Safety, note)
	}
	for i := range b.Hand {
		if h := &b.Hand[i]; len(h.Missing) == 0 {
			row("by hand, "+h.With, b.uncertain(h.Equivalent, h.Uncertainty), h.Safety, number.Significant(h.Safety.Value/least, 3)+" times that")
		}
	}
}
