package export

import (
	"encoding/csv"
	"errors"
	"io"
	"math"
	"slices"
	"strconv"

	"notchproof/fem"
	"notchproof/mesh"
	"notchproof/mesh/outline"
	"notchproof/verify"
	"notchproof/verify/specimen"
)

// Surface writes the stress along the free surface of a finding's last rung as
// comma-separated values (RFC 4180, with a header row, lines ending in CRLF).
// Each unbroken run of free sides is a surface of its own, numbered from 1, with
// arc length counted from its beginning in the direction that has the material
// on its left. The angle is that between the surface's normal and the
// transverse direction. It fails on a finding without a solution and on errors
// of w.
func Surface(w io.Writer, f *verify.Finding, part *specimen.Part) error {
	s := f.Computed.Last
	if s == nil {
		return errors.New("surface: the finding holds no solution")
	}
	table := csv.NewWriter(w)
	table.UseCRLF = true
	if err := table.Write(headings(part.Unit)); err != nil {
		return err
	}
	for i, run := range freeRuns(s.Problem.Shape.Mesh, part) {
		if err := writeRun(table, s, i+1, run); err != nil {
			return err
		}
	}
	table.Flush()
	return table.Error()
}

// headings are quantities over their units, so that the cells are pure numbers.
func headings(unit string) []string {
	per := " / " + unit
	if unit == "" {
		per = ""
	}
	return []string{"surface", "side", "arc length" + per, "x" + per, "y" + per, "angle / degree",
		"tangential stress / nominal stress", "hoop stress / nominal stress", "shear stress / nominal stress",
		"first principal stress / nominal stress", "von Mises stress / nominal stress"}
}

// writeRun writes the places of one surface: twice the order on each edge, and
// the end of the last. Where two edges meet the place is that of the second; the
// two differ by the error of the solution.
func writeRun(table *csv.Writer, s *fem.Solution, no int, run []int) error {
	m := s.Problem.Shape.Mesh
	sides := m.Region.Sides()
	steps := 2 * s.Problem.Shape.Element.Order
	arc := 0.0
	for k, edge := range run {
		e := m.Boundary[edge]
		curve := sides[e.Side].Curve
		last := steps - 1
		if k == len(run)-1 {
			last = steps
		}
		for i := range last + 1 {
			at := float64(i) / float64(steps)
			along := arc + math.Abs(curve.Length(e.T0, e.T0+at*(e.T1-e.T0)))
			if err := table.Write(row(no, sides[e.Side].Name, along, s.Surface(edge, at))); err != nil {
				return err
			}
		}
		arc += math.Abs(curve.Length(e.T0, e.T1))
	}
	return nil
}

func row(no int, side string, arc float64, p fem.SurfacePoint) []string {
	cells := []string{strconv.Itoa(no), side}
	angle := math.Atan2(math.Abs(p.Normal.X), math.Abs(p.Normal.Y)) * 180 / math.Pi
	for _, v := range []float64{arc, p.At.X, p.At.Y, angle, p.Tangential, p.Hoop, p.Shear, p.FirstPrincipal(), p.VonMises()} {
		cells = append(cells, strconv.FormatFloat(v, 'g', 12, 64))
	}
	return cells
}

// freeRuns lists the boundary edges of each unbroken run of free sides, loop by
// loop.
func freeRuns(m *mesh.Mesh, part *specimen.Part) [][]int {
	edges := make(map[int][]int) // by side
	for i, e := range m.Boundary {
		edges[int(e.Side)] = append(edges[int(e.Side)], i)
	}
	var runs [][]int
	first := 0
	for _, loop := range append([]outline.Loop{part.Region.Outer}, part.Region.Holes...) {
		n := len(loop)
		start := 0 // at a side that is not free, where there is one
		for start < n && free(part, loop[start], first+start) {
			start++
		}
		var run []int
		for k := range n {
			side := (start + k) % n
			if !free(part, loop[side], first+side) {
				runs, run = closed(runs, run), nil
				continue
			}
			run = append(run, edges[first+side]...)
		}
		runs = closed(runs, run)
		first += n
	}
	return runs
}

// closed adds a run unless it is empty.
func closed(runs [][]int, run []int) [][]int {
	if len(run) == 0 {
		return runs
	}
	return append(runs, run)
}

// free tells of a side that it is a surface of the part: neither a loaded end
// nor the line of symmetry of a half model.
func free(part *specimen.Part, side outline.Side, index int) bool {
	if slices.ContainsFunc(part.Plain, func(p specimen.Plain) bool { return p.End == index }) {
		return false
	}
	if !part.Half {
		return true
	}
	b := side.Curve.Bounds()
	return math.Max(math.Abs(b.Min.Y), math.Abs(b.Max.Y)) > 1e-9*(b.Max.X-b.Min.X)
}
