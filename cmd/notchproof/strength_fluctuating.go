package main

import (
	"fmt"

	"notchproof/render/number"
	"notchproof/verify/strength"
)

// fluctuating prints the first step towards fluctuating loads.
func (b *strengthSheet) fluctuating() {
	b.line("\n%s", b.style.bold("if a load fluctuates, what of its factor is felt (a first step, no life)"))
	for i := range b.Sensitivity {
		s := &b.Sensitivity[i]
		symbol := "Kf"
		if s.Load.Shear {
			symbol = "Kfs"
		}
		b.line("  %-9s  gradient G = %s /mm at the peak%s", s.Load.Name, number.Uncertain(s.Gradient, s.GradientBar), b.radius(s))
		for _, r := range s.Rules {
			if r.Missing != "" {
				b.line("             %-3s   –      %s: %s", symbol, r.Rule, r.Missing)
				continue
			}
			b.line("             %-3s = %-6s %s: %s", symbol, number.Significant(r.Factor, 3), r.Rule, r.Detail)
		}
	}
	for _, r := range b.rules() {
		b.line("             %s: %s; %s; coefficients %s", r.Rule, r.Source, r.Covers, r.Sureness)
	}
}

// rules lists each rule that gave a factor once.
func (b *strengthSheet) rules() []strength.Reduced {
	seen := make(map[string]bool)
	var list []strength.Reduced
	for _, s := range b.Sensitivity {
		for _, r := range s.Rules {
			if r.Missing == "" && !seen[r.Rule] {
				seen[r.Rule] = true
				list = append(list, r)
			}
		}
	}
	return list
}

func (b *strengthSheet) radius(s *strength.Sensitivity) string {
	if s.Radius == 0 {
		return ""
	}
	return fmt.Sprintf(", radius %s mm", number.Compact(s.Radius, 4))
}
