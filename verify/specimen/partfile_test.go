package specimen

import (
	"errors"
	"math"
	"os"
	"path/filepath"
	"reflect"
	"strings"
	"testing"
	"unicode"

	"notchproof/scf"
)

const stepped = `"M -216 0 H 147 V 24 H 3 A 3 3 0 0 0 0 27 V 36 H -216 Z"`

// good is a file that uses every key.
const good = `{
  "title": "Welle für Ø 48, «Querstrahler»",
  "shape": {
    "model": "shaft", "unit": "mm",
    "outline": ` + stepped + `,
    "names": {"A4": "fillet"}, "notch": ["fillet"],
    "nominal": {"x": "0.3cm", "fibre": 24}, "forceLine": "net"
  },
  "loads": ["torsion", "bending"],
  "material": {"name": "steel", "nu": 0.29, "E": "206 GPa", "yield": "51ksi"},
  "claims": [
    {"load": "bending", "factor": "2.10", "from": "chart", "tolerance": "5%", "mesh": {"order": 2, "arc": "6"}},
    {"load": "torsion", "factor": 1.5}
  ]
}`

func TestReadPart(t *testing.T) {
	f, err := ReadPart([]byte("\ufeff"+good+"\n"), "good.json", Over{})
	if err != nil {
		t.Fatal(err)
	}
	p := f.Part
	if p.Title != "Welle für Ø 48, «Querstrahler»" || p.Name != "outline" || p.Family != nil || p.Unit != "mm" {
		t.Errorf("title %q, name %q, unit %q", p.Title, p.Name, p.Unit)
	}
	if len(f.Loads) != 2 || f.Loads[0] != scf.Torsion || f.Loads[1] != scf.Bending {
		t.Errorf("loads %v", f.Loads)
	}
	m := Material{Name: "steel", Nu: 0.29, E: 206e3}
	if f.Material.Name != m.Name || f.Material.Nu != m.Nu || f.Material.E != m.E || math.Abs(f.Material.Yield.Megapascals()/(51*6.894757293168361)-1) > 1e-14 {
		t.Errorf("material %+v, want %+v", f.Material, m)
	}
	want := []Claim{{scf.Bending, 2.1, 0.01, 0.05, "chart", &Density{2, 6}}, {scf.Torsion, 1.5, 0.1, 0, "", nil}}
	if !reflect.DeepEqual(f.Claims, want) {
		t.Errorf("claims %+v, want %+v", f.Claims, want)
	}
	if got, want := p.Loads[1].Nominal.Net, 32/(math.Pi*48*48*48); math.Abs(got/want-1) > 1e-14 {
		t.Errorf("nominal bending stress %g, want %g", got, want)
	}
	if p.Options.Nu != 0.29 || len(p.Notch) != 1 || p.Region.Sides()[p.Notch[0]].Name != "fillet" {
		t.Errorf("options %+v, notch %v", p.Options, p.Notch)
	}
}

func TestFlagsGoBeforeTheFile(t *testing.T) {
	nu := 0.25
	f, err := ReadPart([]byte(good), "good.json", Over{Nu: &nu, ForceLine: scf.ForceLineGross})
	if err != nil {
		t.Fatal(err)
	}
	if o := f.Part.Options; o.Nu != 0.25 || o.ForceLine != scf.ForceLineGross || f.Material.Nu != 0.25 {
		t.Errorf("options %+v, material %+v", o, f.Material)
	}
}

func TestFamilyFile(t *testing.T) {
	f, err := ReadPart([]byte(`{"shape": {"family": "shaft-shoulder", "D": "7.2cm", "d": "48mm", "r": "3 mm"}}`), "f.json", Over{})
	if err != nil {
		t.Fatal(err)
	}
	if d := f.Part.Dims; f.Part.Unit != "cm" || d["D"] != 7.2 || d["d"] != 4.8 || d["r"] != 0.3 || len(f.Loads) != 3 {
		t.Errorf("%v %s, loads %v", d, f.Part.Unit, f.Loads)
	}
}

func TestLastDigit(t *testing.T) {
	for text, want := range map[string]float64{"1.90": 0.01, "2": 1, "1.9": 0.1, "19e-1": 0.1, "1.90E2": 1, " 3.125 ": 0.001} {
		if got := LastDigit(text); math.Abs(got/want-1) > 1e-12 {
			t.Errorf("%q: %g, want %g", text, got, want)
		}
	}
}

// shapeOf puts a shape into a file of one line.
func shapeOf(keys string) string { return `{"shape": {` + keys + `}}` }

const bar = `"model": "bar", "outline": "M -90 -20 H 90 V 20 H 5 A 5 5 0 0 0 -5 20 H -90 Z"`

// hostile files, with the place, the key and the reason that the error names.
func hostileFiles() []struct{ name, file, place, key, reason string } {
	deep := strings.Repeat("[", 5000)
	return []struct{ name, file, place, key, reason string }{
		{"empty", "", "1:1", "file", "empty"},
		{"spaces", " \n\t ", "1:1", "file", "empty"},
		{"truncated", good[:len(good)/2], "8:2", "file", "ends too early"},
		{"open quote", `{"title": "x`, "1:13", "file", "ends too early"},
		{"binary", "\x7fELF\x02\x01\x01\x00", "1:8", "file", "not text"},
		{"zero byte", "{\"title\": \"a\x00b\"}", "1:13", "file", "not text"},
		{"not UTF-8", "{\"title\": \"a\xffb\"}", "1:13", "file", "not text"},
		{"UTF-16", "\xff\xfe{\x00}\x00", "1:1", "file", "not text"},
		{"not an object", `["shape"]`, "1:1", "file", "not an object"},
		{"trailing garbage", good + " x", "15:3", "file", "not JSON"},
		{"two objects", `{"shape": 1} {}`, "1:14", "file", "not JSON"},
		{"trailing comma", `{"shape": {},}`, "1:14", "file", "not JSON"},
		{"comment", "{ // shape\n}", "1:3", "file", "not JSON"},
		{"single quotes", "{'title': 1}", "1:2", "file", "not JSON"},
		{"not a number", shapeOf(`"family": "bar-hole", "W": NaN`), "1:", "file", "not JSON"},
		{"deep", `{"shape": ` + deep, "1:26", "file", "nested more than 16 deep"},
		{"deep objects", strings.Repeat(`{"a":`, 5000), "1:81", "file", "nested more than 16 deep"},
		{"large", `{"title": "` + strings.Repeat("a", 2<<20), "1:1", "file", "too large"},
		{"unknown key", "{\n  \"tilte\": \"x\"}", "2:3", "key", "no such key"},
		{"unknown key in shape", shapeOf(bar + `, "notches": []`), "1:92", "key in shape", "no such key"},
		{"case of a key", shapeOf(`"Family": "bar-hole"`), "1:12", "key in shape", "no such key"},
		{"duplicate key", "{\"title\": \"a\",\n \"title\": \"b\"}", "2:2", "key", "given twice, first in line 1"},
		{"duplicate dimension", shapeOf(`"family": "bar-hole", "W": 60, "d": 10, "W": 61`), "1:52", "key", "given twice"},
		{"no shape", `{"title": "x"}`, "1:1", "shape", "missing"},
		{"shape is a text", `{"shape": "bar-hole"}`, "1:11", "shape", "not an object"},
		{"title is a number", `{"title": 12}`, "1:11", "title", "not a text"},
		{"control in title", `{"title": "a\u001b[2J"}`, "1:11", "title", "control character"},
		{"long title", `{"title": "` + strings.Repeat("ä", 201) + `"}`, "1:11", "title", "longer than 200"},
		{"no family", shapeOf(`"family": "bar-holes", "W": 1`), "1:22", "shape.family", "no such family"},
		{"unknown unit", shapeOf(`"family": "bar-hole", "W": "60 mn", "d": 10`), "1:39", "shape.W", `unknown unit "mn"`},
		{"decimal comma", shapeOf(`"family": "bar-hole", "W": "60,5", "d": 10`), "1:39", "shape.W", "decimal comma"},
		{"mixed units", shapeOf(`"family": "bar-hole", "W": "60mm", "d": 10`), "1:11", "shape.dimensions", "has a unit"},
		{"huge number", shapeOf(`"family": "bar-hole", "W": 1e999, "d": 10`), "1:39", "shape.W", "number too large"},
		{"tiny number", shapeOf(`"family": "bar-hole", "W": 1e-999, "d": 10`), "1:39", "shape.W", "number too small"},
		{"null", shapeOf(`"family": "bar-hole", "W": null, "d": 10`), "1:39", "shape.W", "not a number"},
		{"missing dimension", shapeOf(`"family": "bar-hole", "W": 60`), "1:11", "shape.d", "missing"},
		{"impossible dimension", shapeOf(`"family": "bar-hole", "W": 60, "d": 61`), "1:48", "shape.d", "hole is not smaller"},
		{"model", shapeOf(`"model": "Bar", "outline": ""`), "1:21", "shape.model", "no such model"},
		{"no outline", shapeOf(`"model": "bar"`), "1:11", "shape.outline", "missing"},
		{"no model", shapeOf(`"outline": ""`), "1:11", "shape.model", "missing"},
		{"path", shapeOf(`"model": "bar", "outline": "M 0 0 H 1 X"`), "1:50", "shape.outline", "not a path command"},
		{"path behind escapes", shapeOf(`"model": "bar", "outline": "M\t0\u00200 H 1 X"`), "1:56", "shape.outline", "not a path command"},
		{"path number", shapeOf(`"model": "bar", "outline": "M 0 1e300"`), "1:44", "shape.outline", "number too large"},
		{"outline unit", shapeOf(`"unit": "ft", ` + bar), "1:20", "shape.unit", "unknown unit"},
		{"crossing", shapeOf(`"model": "bar", "outline": "M 0 0 H 90 L 0 20 H 90 Z"`), "1:", "shape.outline", ""},
		{"hole outside", shapeOf(bar + `, "holes": ["M 200 0 h 5 v 5 h -5 z"]`), "1:39", "shape.outline", "lies outside"},
		{"two holes in a path", shapeOf(bar + `, "holes": ["M 0 0 h 5 v 5 z M -20 0 h 5 v 5 z"]`), "1:102", "shape.holes[1]", "more than one hole"},
		{"holes of a shaft", shapeOf(`"model": "shaft", "outline": ` + stepped + `, "holes": ["M 20 5 h 5 v 5 z"]`), "1:", "shape.outline", "a shaft with a hole"},
		{"slanting end", shapeOf(`"model": "bar", "outline": "M -90 -20 H 90 V 20 H 5 A 5 5 0 0 0 -5 20 H -95 Z"`), "1:39", "shape.outline", "no straight side across the axis at the left end"},
		{"round end", shapeOf(`"model": "bar", "outline": "M -90 -20 H 90 A 20 20 0 0 1 90 20 H 5 A 5 5 0 0 0 -5 20 H -90 Z"`), "1:39", "shape.outline", "at the right end"},
		{"forked end", shapeOf(`"model": "bar", "outline": "M -90 -20 H 90 V -5 H 60 V 5 H 90 V 20 H -90 Z"`), "1:39", "shape.outline", "right end at x = 90 in several pieces"},
		{"long", shapeOf(`"model": "shaft", "outline": "M -1500 0 H 1500 V 5 H 1 A 1 1 0 0 0 -1 5 H -1500 Z"`), "1:41", "shape.outline", "300 times longer"},
		{"nothing concave", shapeOf(`"model": "bar", "outline": "M -90 -20 H 90 V 20 H -90 Z"`), "1:39", "shape.outline", "nothing concave"},
		{"below the axis", shapeOf(`"model": "shaft", "outline": "M -90 -2 H 90 V 20 H 5 A 5 5 0 0 0 -5 20 H -90 Z"`), "1:41", "shape.outline", "lies below y = 0"},
		{"mirror without axis", shapeOf(`"mirror": true, "model": "bar", "outline": "M -90 2 H 90 V 20 H 5 A 5 5 0 0 0 -5 20 H -90 Z"`), "1:22", "shape.mirror", "no straight side on y = 0"},
		{"mirror as text", shapeOf(bar + `, "mirror": "yes"`), "1:102", "shape.mirror", "neither true nor false"},
		{"notch unknown", shapeOf(bar + `, "notch": ["A5"]`), "1:101", "shape.notch", "no such side"},
		{"notch empty", shapeOf(bar + `, "notch": []`), "1:101", "shape.notch", "no sides"},
		{"notch on an end", shapeOf(bar + `, "notch": ["L2"]`), "1:101", "shape.notch", "no notch"},
		{"name of nothing", shapeOf(bar + `, "names": {"A9": "x"}`), "1:101", "shape.names", "no such side"},
		{"name as drawn", shapeOf(bar + `, "names": {"A4": "L3"}`), "1:108", "shape.names.A4", "name of the kind"},
		{"nominal", shapeOf(bar + `, "nominal": {"y": 3}`), "1:104", "key in shape.nominal", "no such key"},
		{"nominal of two kinds", shapeOf(bar + `, "nominal": {"x": 3, "from": [0, 0], "to": [0, 1]}`), "1:103", "shape.nominal", "not one section"},
		{"nominal off the part", shapeOf(bar + `, "nominal": {"x": 300}`), "1:103", "shape.nominal", "no material"},
		{"nominal with a unit", shapeOf(bar + `, "nominal": {"x": "3mm"}`), "1:109", "shape.nominal.x", "has no name"},
		{"nominal along the part", shapeOf(bar + `, "nominal": {"from": [0, 0], "to": [9, 0]}`), "1:", "shape.nominal.to", "runs along"},
		{"nominal point", shapeOf(bar + `, "nominal": {"from": [0], "to": [9, 0]}`), "1:112", "shape.nominal.from", "not a point"},
		{"fibre in the middle", shapeOf(bar + `, "nominal": {"x": -50, "fibre": 0}`), "1:", "shape.nominal.fibre", "centroid"},
		{"force line", shapeOf(bar + `, "forceLine": "middle"`), "1:105", "shape.forceLine", "no such line"},
		{"load", `{"loads": ["torsion"], ` + shapeOf(bar)[1:], "1:12", "loads[1]", "no such load here"},
		{"load twice", `{"loads": ["bending", "bending"], ` + shapeOf(bar)[1:], "1:23", "loads[2]", "given twice"},
		{"loads as text", `{"loads": "bending", ` + shapeOf(bar)[1:], "1:11", "loads", "not a list"},
		{"no loads", `{"loads": [], ` + shapeOf(bar)[1:], "1:11", "loads", "no loads"},
		{"nu", `{"material": {"nu": 0.5}}`, "1:21", "material.nu", "not a Poisson's ratio"},
		{"modulus", `{"material": {"E": "206 GPA"}}`, "1:20", "material.E", "unknown unit"},
		{"negative yield", `{"material": {"yield": -5}}`, "1:24", "material.yield", "not a modulus or stress"},
		{"claim without a load", `{"claims": [{"factor": 2}], ` + shapeOf(bar)[1:], "1:13", "claims[1].load", "missing"},
		{"claim without a factor", `{"claims": [{"load": "bending"}], ` + shapeOf(bar)[1:], "1:13", "claims[1].factor", "missing"},
		{"claim of zero", `{"claims": [{"load": "bending", "factor": 0}], ` + shapeOf(bar)[1:], "1:43", "claims[1].factor", "not a stress concentration factor"},
		{"claim for a load not asked", `{"loads": ["tension"], "claims": [{"load": "bending", "factor": 2}], ` + shapeOf(bar)[1:], "1:44", "claims[1].load", "no such load here"},
		{"two claims", `{"claims": [{"load": "bending", "factor": 2}, {"load": "bending", "factor": 3}], ` + shapeOf(bar)[1:], "1:47", "claims[2]", "second claim"},
		{"mesh without its density", `{"claims": [{"load": "bending", "factor": 2, "mesh": {"order": 2}}], ` + shapeOf(bar)[1:], "1:54", "claims[1].mesh.arc", "missing"},
		{"mesh of order 3", `{"claims": [{"load": "bending", "factor": 2, "mesh": {"order": 3, "arc": 6}}], ` + shapeOf(bar)[1:], "1:64", "claims[1].mesh.order", "not the order"},
		{"mesh of no elements", `{"claims": [{"load": "bending", "factor": 2, "mesh": {"order": 2, "arc": 0}}], ` + shapeOf(bar)[1:], "1:74", "claims[1].mesh.arc", "not a number of elements"},
		{"mesh with a strange key", `{"claims": [{"load": "bending", "factor": 2, "mesh": {"order": 2, "arcs": 6}}], ` + shapeOf(bar)[1:], "1:67", "key in claims[1].mesh", "no such key"},
		{"no tolerance", `{"claims": [{"load": "bending", "factor": 2, "tolerance": "0%"}], ` + shapeOf(bar)[1:], "1:59", "claims[1].tolerance", "without any tolerance"},
		{"tolerance", `{"claims": [{"load": "bending", "factor": 2, "tolerance": 3}], ` + shapeOf(bar)[1:], "1:59", "claims[1].tolerance", "not a tolerance"},
	}
}

func TestHostileFiles(t *testing.T) {
	for _, h := range hostileFiles() {
		_, err := ReadPart([]byte(h.file), "part.json", Over{})
		var fault *FileError
		if !errors.As(err, &fault) {
			t.Errorf("%s: %v", h.name, err)
			continue
		}
		text := err.Error()
		if strings.ContainsFunc(text, unicode.IsControl) || len(text) > 400 {
			t.Errorf("%s: not one short line: %q", h.name, text)
		}
		if !strings.HasPrefix(text, "part.json:"+h.place) || fault.What != h.key || !strings.Contains(fault.Reason, h.reason) {
			t.Errorf("%s: %q, want %s %s: …%s…", h.name, text, h.place, h.key, h.reason)
		}
		var input *InputError
		if !errors.As(err, &input) || input.Hint == "" && fault.What != "file" && !strings.Contains(text, "hole is not") {
			t.Errorf("%s: %q: no hint", h.name, text)
		}
	}
}

func TestNameAsDrawn(t *testing.T) {
	for name, want := range map[string]bool{"L1": true, "A25": true, "C3": true, "hole 12": true,
		"": false, "L": false, "A4b": false, "M1": false, "hole": false, "hole ": false, "fillet": false, "l1": false, "L 1": false} {
		if nameAsDrawn(name) != want {
			t.Errorf("%q: %t", name, !want)
		}
	}
}

func TestExampleFiles(t *testing.T) {
	names, err := filepath.Glob("../../testdata/parts/*.json")
	if err != nil || len(names) < 6 {
		t.Fatalf("%v, %v", names, err)
	}
	for _, name := range names {
		data, err := os.ReadFile(name)
		if err != nil {
			t.Fatal(err)
		}
		f, err := ReadPart(data, filepath.Base(name), Over{})
		if err != nil {
			t.Error(err)
			continue
		}
		if f.Part.Title == "" || len(f.Part.Sharp) > 0 {
			t.Errorf("%s: title %q, sharp corners %v", name, f.Part.Title, f.Part.Sharp)
		}
		for _, plain := range f.Part.Plain {
			size := plain.High - plain.Low
			if f.Part.Half {
				size = 2 * plain.High
			}
			if math.Abs(plain.To-plain.From) < 2.4*size {
				t.Errorf("%s: %s is short: %g for a size of %g", name, plain.Name, plain.To-plain.From, size)
			}
		}
	}
}
