package main

import (
	"encoding/json"
	"math"
	"strings"
	"testing"
)

const meshed = "check shaft-shoulder D=90mm d=75mm r=6mm --load bending --claim 1.62 --claim-mesh order=1,arc=12"

// TestClaimFromAMesh: below the claim stands what its mesh gives, beside the
// verdict whether that explains it; the exit status is the verdict's.
func TestClaimFromAMesh(t *testing.T) {
	file := write(t, "part.json", strings.Replace(smallPart, `"from": "chart"`, `"from": "own mesh", "mesh": {"order": 2, "arc": 12}`, 1))
	for _, row := range []struct {
		line   string
		status int
		says   []string
	}{
		{meshed, exitDisagrees, []string{"its mesh   order 1 with 12 elements per 90°", "averaged at the nodes, as the claim", "at the centroids", "the mesh explains it", "order 2, averaged at the nodes"}},
		{strings.Replace(meshed, "1.62", "2.4", 1), exitDisagrees, []string{"neither is the claim", "the mesh does not explain it", "look at loads"}},
		{strings.Replace(meshed, "arc=12", "arc=40", 1), exitDisagrees, []string{"neither is the claim", "elements per 90° would give the claim"}},
		{"check shaft-shoulder D=72 d=48 r=0 --load bending --claim 3 --claim-mesh order=2,arc=4", exitUndecided, []string{"no converged factor to count its error from"}},
		{"check " + file, exitAgrees, []string{"its mesh   order 2 with 12 elements per 90°", "at the integration points"}},
	} {
		status, out, errs := program(t, row.line)
		if status != row.status || errs != "" {
			t.Errorf("%s: exit status %d, want %d\n%s", row.line, status, row.status, errs)
		}
		for _, says := range row.says {
			if !strings.Contains(out, says) {
				t.Errorf("%s: %q does not stand in the output\n%s", row.line, says, out)
			}
		}
	}
}

// TestClaimMeshInJSON holds the names and the meaning of the object that a claim
// from a mesh adds.
func TestClaimMeshInJSON(t *testing.T) {
	_, out, _ := program(t, meshed+" --json")
	var got struct {
		Results []struct {
			Computed struct{ Factor float64 }
			Verdict  string
			Mesh     *struct {
				Order                               int
				Arc, Nodes, NodesScatter            float64
				Interior, InteriorScatter           float64
				DifferenceNodes, DifferenceInterior float64
				Matches                             string
				Needed                              []struct {
					Order    int
					Level    float64
					Arc      *float64
					MoreThan float64
				}
			} `json:"claimMesh"`
		}
	}
	if err := json.Unmarshal([]byte(out), &got); err != nil {
		t.Fatal(err)
	}
	r := got.Results[0]
	m := r.Mesh
	if m == nil || m.Order != 1 || m.Arc != 12 || m.Matches != "nodes" || r.Verdict != "disagrees" || len(m.Needed) != 6 {
		t.Fatalf("%+v", r)
	}
	for _, v := range [][2]float64{{m.Nodes, m.DifferenceNodes}, {m.Interior, m.DifferenceInterior}} {
		if want := v[0]/r.Computed.Factor - 1; math.Abs(v[1]-want) > 1e-12 {
			t.Errorf("difference %g, want %g", v[1], want)
		}
	}
	if math.Abs(m.Nodes-1.62) > m.NodesScatter+0.005 || !(m.InteriorScatter > 0) {
		t.Errorf("1.62 counts as the reading %g ± %g", m.Nodes, m.NodesScatter)
	}
	for _, n := range m.Needed {
		if (n.Arc == nil) != (n.MoreThan > 0) {
			t.Errorf("%+v: want a number of elements or what is too few", n)
		}
	}
	if _, plain, _ := program(t, "check shaft-shoulder D=90mm d=75mm r=6mm --load bending --claim 1.62 --json"); strings.Contains(plain, "claimMesh") {
		t.Error("a claim without a mesh has the object as well")
	}
}

// TestStudySaysHowFineAMeshMustBe: the table stands below both kinds of study.
func TestStudySaysHowFineAMeshMustBe(t *testing.T) {
	for _, by := range []string{"size", "order"} {
		_, out, _ := program(t, "study bar-hole W=60mm d=20mm --load tension --by "+by)
		for _, says := range []string{"elements per 90° for errors below", "order 1, averaged at the nodes", "order 2, averaged at the nodes"} {
			if strings.Count(out, says) != 1 {
				t.Errorf("by %s: %q does not stand in the output once\n%s", by, says, out)
			}
		}
	}
}
