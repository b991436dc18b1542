package main

import (
	"go/parser"
	"go/token"
	"io/fs"
	"path"
	"path/filepath"
	"strconv"
	"strings"
	"testing"
)

// allowed is the floor plan: which packages of this module a package may
// import. The computed number (fem, mesh) and the handbook number (scf) meet
// only in verify; that is why their agreement means something.
var allowed = map[string]string{
	"mesh/predicate":     "",
	"mesh/lagrange":      "",
	"mesh/outline":       "",
	"mesh":               "mesh/outline mesh/predicate mesh/lagrange",
	"fem/cubature":       "",
	"fem/sparse":         "",
	"fem":                "mesh mesh/outline mesh/lagrange fem/cubature fem/sparse",
	"scf":                "",
	"verify/extrapolate": "",
	"verify/quantity":    "",
	"verify/specimen":    "mesh/outline fem scf verify/quantity",
	"verify/usermesh":    "mesh fem verify/specimen",
	"verify":             "mesh mesh/outline fem scf verify/extrapolate verify/specimen verify/usermesh verify/misreading",
	"verify/misreading":  "scf verify/specimen",
	"verify/strength":    "mesh mesh/outline fem scf verify verify/specimen verify/quantity",
	"render/number":      "",
	"render":             "mesh mesh/outline mesh/lagrange fem scf verify verify/specimen render/number",
	"verify/sizing":      "mesh/outline scf verify verify/specimen verify/strength",
	"verify/tolerance":   "scf verify verify/specimen",
	"verify/chart":       "scf verify verify/specimen",
	"verify/evidence":    "mesh mesh/outline fem scf verify verify/specimen verify/extrapolate",
	"render/export":      "mesh mesh/outline fem verify verify/specimen",
	"render/report":      "scf verify verify/specimen verify/usermesh render render/number",
	"cmd/notchproof":     "render/export render/report scf verify verify/sizing verify/specimen verify/quantity verify/strength render render/number verify/usermesh verify/tolerance verify/evidence verify/chart",
}

// TestImportsFollowTheFloorPlan names the file and the arrow that broke it.
// Tests of a package may look further up than the package itself, but never
// across between the two towers.
func TestImportsFollowTheFloorPlan(t *testing.T) {
	const root = "../.."
	seen := 0
	err := filepath.WalkDir(root, func(file string, d fs.DirEntry, err error) error {
		if err != nil || d.IsDir() || !strings.HasSuffix(file, ".go") {
			return err
		}
		rel, err := filepath.Rel(root, file)
		if err != nil {
			return err
		}
		room := path.Dir(filepath.ToSlash(rel))
		list, planned := allowed[room]
		parsed, err := parser.ParseFile(token.NewFileSet(), file, nil, parser.ImportsOnly|parser.ParseComments)
		if err != nil {
			return err
		}
		if parsed.Name.Name == "main" && !strings.HasPrefix(room, "cmd/") {
			return nil // a generator beside its table
		}
		if !planned {
			t.Errorf("%s: room %q is not in the floor plan", rel, room)
			return nil
		}
		seen++
		for _, spec := range parsed.Imports {
			name, err := strconv.Unquote(spec.Path.Value)
			if err != nil {
				return err
			}
			arrow, ours := strings.CutPrefix(name, "notchproof/")
			if !ours || arrow == room {
				continue
			}
			if strings.HasSuffix(file, "_test.go") {
				if crosses(room, arrow) {
					t.Errorf("%s: the test crosses between the towers: %s → %s", rel, room, arrow)
				}
				continue
			}
			if !contains(list, arrow) {
				t.Errorf("%s: arrow %s → %s is not in the floor plan", rel, room, arrow)
			}
		}
		return nil
	})
	if err != nil {
		t.Fatal(err)
	}
	if seen < 50 {
		t.Fatalf("only %d files seen: the walk does not reach the house", seen)
	}
}

func contains(list, room string) bool {
	for _, r := range strings.Fields(list) {
		if r == room {
			return true
		}
	}
	return false
}

// crosses tells that one of the two is handbook knowledge and the other is
// computation.
func crosses(a, b string) bool {
	handbook := func(r string) bool { return r == "scf" }
	computed := func(r string) bool {
		return r == "mesh" || r == "fem" || strings.HasPrefix(r, "mesh/") || strings.HasPrefix(r, "fem/")
	}
	return handbook(a) && computed(b) || computed(a) && handbook(b)
}
