package main

import (
	"context"
	"fmt"
	"strings"

	"notchproof/render/number"
	"notchproof/scf"
	"notchproof/verify"
	"notchproof/verify/specimen"
	"notchproof/verify/usermesh"
)

// jsonClaimMesh is what the mesh that the claim came from gives.
type jsonClaimMesh struct {
	Order              int            `json:"order"`
	Arc                float64        `json:"arc"`
	Nodes              float64        `json:"nodes"`
	NodesScatter       float64        `json:"nodesScatter"`
	Interior           float64        `json:"interior"`
	InteriorScatter    float64        `json:"interiorScatter"`
	DifferenceNodes    float64        `json:"differenceNodes"`
	DifferenceInterior float64        `json:"differenceInterior"`
	Matches            usermesh.Match `json:"matches"`
	Needed             []jsonNeed     `json:"needed"`
}

// jsonNeed has the number of elements per 90°, null where none of those tried
// will do.
type jsonNeed struct {
	Order    int      `json:"order"`
	Level    float64  `json:"level"`
	Arc      *float64 `json:"arc"`
	MoreThan float64  `json:"moreThan,omitempty"`
}

func claimMeshOf(m *verify.MeshReading) *jsonClaimMesh {
	out := &jsonClaimMesh{
		Order: m.Density.Order, Arc: m.Density.Arc,
		Nodes: m.Nodes.Value, NodesScatter: m.Nodes.Scatter,
		Interior: m.Interior.Value, InteriorScatter: m.Interior.Scatter,
		DifferenceNodes: m.DifferenceNodes, DifferenceInterior: m.DifferenceInterior,
		Matches: m.Matches, Needed: []jsonNeed{},
	}
	for _, n := range m.Guidance.Needed {
		need := jsonNeed{Order: n.Order, Level: n.Level, MoreThan: n.MoreThan}
		if n.Arc > 0 {
			need.Arc = &n.Arc
		}
		out.Needed = append(out.Needed, need)
	}
	return out
}

// meshClaimText prints, below the claim, what such a mesh gives.
func meshClaimText(b *strings.Builder, f *verify.Finding, s style) {
	m := f.MeshClaim
	fmt.Fprintf(b, "  its mesh   %v of the root: such meshes give\n", m.Density)
	row := func(what string, v usermesh.Span, difference float64, matched bool) {
		mark := ""
		if matched {
			mark = s.bold(", as the claim")
		}
		fmt.Fprintf(b, "             %-15s %8s  %s%s\n", number.Uncertain(v.Value, v.Scatter), number.SignedPercent(difference, 1), what, mark)
	}
	row("averaged at the nodes", m.Nodes, m.DifferenceNodes, m.Matches == usermesh.Nodes || m.Matches == usermesh.Both)
	row("at the "+m.Points(), m.Interior, m.DifferenceInterior, m.Matches == usermesh.Interior || m.Matches == usermesh.Both)
	if m.Matches == usermesh.None {
		b.WriteString("             neither is the claim\n")
	}
	guidanceRows(b, "             ", m.Guidance)
}

// guidanceText prints how fine a mesh must be, for people who make one.
func guidanceText(b *strings.Builder, g *usermesh.Guidance, symbol string) {
	fmt.Fprintf(b, "\nA mesh of your own: the largest stress averaged at the nodes of the root stays within a level\nof %s = %s from so many elements per 90° on, all finer ones that were tried included.\n",
		symbol, number.Uncertain(g.Factor, g.Uncertainty))
	guidanceRows(b, "", g)
	tried := make(map[int][]string)
	for _, t := range g.Trials {
		tried[t.Density.Order] = append(tried[t.Density.Order], number.Compact(t.Density.Arc, 4))
	}
	fmt.Fprintf(b, "Order 1 (straight sides) was tried with %s;\norder 2 (mid-nodes on the curve) with %s.\n",
		strings.Join(tried[1], ", "), strings.Join(tried[2], ", "))
	fmt.Fprintf(b, "Edges grow by %g of the distance from the root, to an eighth of the part's width at most. The\nstresses are averaged part by part, then the principal stress (in torsion the shear) is taken from\nthe mean. A mesh made otherwise may need a step of the row more or less.\n", usermesh.Growth)
}

// guidanceRows prints the table, one row an order.
func guidanceRows(b *strings.Builder, margin string, g *usermesh.Guidance) {
	fmt.Fprintf(b, "%selements per 90° for errors below", margin)
	for _, level := range usermesh.Levels() {
		fmt.Fprintf(b, " %7s", number.Percent(level, 0))
	}
	order := 0
	for _, n := range g.Needed {
		if n.Order != order {
			order = n.Order
			fmt.Fprintf(b, "\n%sorder %d, averaged at the nodes   ", margin, order)
		}
		fmt.Fprintf(b, " %7s", needText(n))
	}
	b.WriteString("\n")
}

func needText(n usermesh.Need) string {
	switch {
	case n.Arc == specimen.LeastArc:
		return "≤ " + number.Compact(n.Arc, 4)
	case n.Arc > 0:
		return number.Compact(n.Arc, 4)
	case n.MoreThan > 0:
		return "> " + number.Compact(n.MoreThan, 4)
	}
	return "–"
}

// meshGuidance checks the part for the factor that guidance counts errors from,
// and gives the table as text; nothing where the part has no factor.
func meshGuidance(ctx context.Context, j *job, load *specimen.Load, tell func(string)) (string, error) {
	o := verify.Options{Progress: tell}
	result, err := verify.Run(ctx, j.part, []scf.Load{load.Name}, o)
	if err != nil {
		return "", err
	}
	g, err := verify.Guide(ctx, j.part, &result.Findings[0], o)
	if err != nil || g == nil {
		return "", err
	}
	symbol := "Kt"
	if load.Shear {
		symbol = "Kts"
	}
	var b strings.Builder
	guidanceText(&b, g, symbol)
	return b.String(), nil
}
