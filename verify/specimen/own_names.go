package specimen

import (
	"fmt"
	"maps"
	"slices"
	"strings"

	"notchproof/mesh/outline"
)

// A marker calls sides by the names that the drawing gives them and marks those
// of the notch.
type marker struct {
	*Drawing
	drawn []string        // names as drawn, in order
	met   map[string]bool // names of either kind
}

// mark takes a side by its name as drawn.
func (m *marker) mark(side outline.Side) drawnSide {
	drawn := side.Name
	m.drawn = append(m.drawn, drawn)
	if called, ok := m.Names[drawn]; ok {
		side.Name = called
	}
	m.met[drawn], m.met[side.Name] = true, true
	return drawnSide{side, slices.Contains(m.Notch, drawn) || slices.Contains(m.Notch, side.Name)}
}

// check tells whether all that the drawing names is there.
func (m *marker) check() error {
	for _, name := range slices.Sorted(maps.Keys(m.Names)) {
		if !slices.Contains(m.drawn, name) {
			return m.unknown("names", name)
		}
	}
	for _, name := range m.Notch {
		if !m.met[name] {
			return m.unknown("notch", name)
		}
	}
	return nil
}

func (m *marker) unknown(key, name string) error {
	known := slices.Compact(m.drawn)
	hint := "the sides are " + strings.Join(known, ", ")
	if len(known) > 12 {
		hint = fmt.Sprintf("the sides are %s, … %s", strings.Join(known[:8], ", "), known[len(known)-1])
	}
	return drawingFault(key, name, "no such side", hint)
}

// nameAsDrawn tells whether a name is of the kind that sides and holes have
// before they are named: L1, A2, C3, hole 4.
func nameAsDrawn(name string) bool {
	digits := strings.TrimPrefix(name, "hole ")
	if digits == name && name != "" && strings.IndexByte("LAC", name[0]) >= 0 {
		digits = name[1:]
	}
	return digits != name && digits != "" && strings.Trim(digits, "0123456789") == ""
}
