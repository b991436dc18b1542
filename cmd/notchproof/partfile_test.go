package main

import (
	"bytes"
	"context"
	"encoding/json"
	"os"
	"path/filepath"
	"strings"
	"testing"
)

const smallPart = `{"title": "Probe",
 "shape": {"model": "shaft", "unit": "mm", "outline": "M -216 0 H 147 V 24 H 3 A 3 3 0 0 0 0 27 V 36 H -216 Z"},
 "loads": ["torsion", "bending"],
 "claims": [{"load": "torsion", "factor": "1.53", "from": "chart"}]}`

// write puts a part file into a directory of its own.
func write(t *testing.T, name, text string) string {
	t.Helper()
	path := filepath.Join(t.TempDir(), name)
	if err := os.WriteFile(path, []byte(text), 0o600); err != nil {
		t.Fatal(err)
	}
	return path
}

func called(args ...string) (status int, stdout, stderr string) {
	var out, errs bytes.Buffer
	status = run(context.Background(), args, &out, &errs)
	return status, out.String(), errs.String()
}

func TestCheckPartFile(t *testing.T) {
	for _, name := range []string{"part.json", "Bugstrahl ruder, Größe 2 (März).json", "PART.JSON", "no suffix", "-.json"} {
		path := write(t, name, smallPart)
		status, out, errs := called("check", "--json", "--", path)
		if status != exitAgrees {
			t.Fatalf("%s: status %d\n%s%s", name, status, out, errs)
		}
		var got struct {
			Part struct {
				Family, Unit string
				Dims         map[string]float64
				Nu           float64
			}
			Results []struct {
				Load, Verdict string
				Claim         *struct{ Factor float64 }
			}
		}
		if err := json.Unmarshal([]byte(out), &got); err != nil {
			t.Fatal(err)
		}
		if got.Part.Family != "outline" || got.Part.Dims == nil || len(got.Part.Dims) != 0 || got.Part.Unit != "mm" || got.Part.Nu != 0.3 {
			t.Errorf("%s: part %+v", name, got.Part)
		}
		if len(got.Results) != 2 || got.Results[0].Load != "torsion" || got.Results[0].Claim == nil || got.Results[0].Verdict != "agrees" ||
			got.Results[1].Claim != nil || got.Results[1].Verdict != "nothingToCompare" {
			t.Errorf("%s: results %+v", name, got.Results)
		}
	}
}

func TestFlagsOverPartFile(t *testing.T) {
	path := write(t, "part.json", smallPart)
	status, out, errs := called("check", path, "--load", "torsion", "--claim", "1.2", "--nu", "0.25")
	if status != exitDisagrees || !strings.Contains(out, "ν = 0.25") || strings.Contains(out, "bending,") || !strings.Contains(out, "1.2 ") || strings.Contains(out, "1.53 ") {
		t.Errorf("status %d\n%s%s", status, out, errs)
	}
}

func TestBadPartFiles(t *testing.T) {
	dir := t.TempDir()
	path := write(t, "part.json", smallPart)
	broken := write(t, "broken\n.json", `{"shape": {"family": "bar-hole", "W": "60mn"}}`)
	for _, c := range []struct {
		args []string
		want string
	}{
		{[]string{filepath.Join(dir, "nowhere.json")}, "no such file"},
		{[]string{dir + ".json"}, "no such file"},
		{[]string{path, "D=5"}, "takes no dimensions"},
		{[]string{path, "--load", "shear"}, "does not carry it"},
		{[]string{path, "--claim", "2"}, "for which load?"},
		{[]string{broken}, `1:39: shape.W "60mn": unknown unit "mn"`},
		{[]string{"/dev/zero.json"}, "no such file"},
		{[]string{"/dev/zero"}, "too large"},
	} {
		if c.args[0] == "/dev/zero" {
			if _, err := os.Stat(c.args[0]); err != nil {
				continue
			}
		}
		status, out, errs := called(append([]string{"check"}, c.args...)...)
		lines := strings.Split(strings.TrimSpace(errs), "\n")
		if status != exitUsage || out != "" || len(lines) != 2 || !strings.Contains(lines[0], c.want) || !strings.HasPrefix(lines[1], "hint: ") {
			t.Errorf("%q: status %d, %q, want %s", c.args, status, errs, c.want)
		}
	}
	folder := filepath.Join(dir, "folder.json")
	if err := os.Mkdir(folder, 0o700); err != nil {
		t.Fatal(err)
	}
	if status, _, errs := called("check", folder); status != exitUsage || !strings.Contains(errs, "cannot be read") {
		t.Errorf("status %d, %q", status, errs)
	}
}

// A picture judges by the file's claim for the load that it shows.
func TestPictureKnowsTheClaim(t *testing.T) {
	path := write(t, "part.json", strings.Replace(smallPart, `"1.53"`, `"1.1"`, 1))
	out := filepath.Join(t.TempDir(), "part.png")
	if status, _, errs := called("picture", path, "-o", out, "--width", "400"); status != exitDisagrees {
		t.Errorf("status %d, %s", status, errs)
	}
	if status, _, errs := called("picture", path, "-o", out, "--width", "400", "--load", "bending"); status != exitAgrees {
		t.Errorf("status %d, %s", status, errs)
	}
}
