package main

import (
	"bytes"
	"context"
	"encoding/json"
	"math"
	"os"
	"path/filepath"
	"regexp"
	"slices"
	"strings"
	"testing"

	"notchproof/render/report"
)

// typed runs words as they stand.
func typed(words ...string) (status int, stdout, stderr string) {
	var out, errs bytes.Buffer
	status = run(context.Background(), words, &out, &errs)
	return status, out.String(), errs.String()
}

// sheetOf makes a sheet and reads it.
func sheetOf(t testing.TB, want int, words ...string) (file, page string) {
	t.Helper()
	file = filepath.Join(t.TempDir(), "sheet.html")
	status, _, errs := typed(append([]string{"report", "-o", file}, words...)...)
	data, err := os.ReadFile(file)
	if status != want || errs != "" || err != nil {
		t.Fatalf("%q: exit status %d instead of %d, %s%v", words, status, want, errs, err)
	}
	return file, string(data)
}

var steppedShaft = []string{"shaft-shoulder", "D=72mm", "d=48mm", "r=3mm"}

func with(words []string, more ...string) []string {
	return append(append([]string{}, words...), more...)
}

// wicked is what a title or a source might hold: markup, references, quotes, the
// end of the record, template and shell syntax, letters that turn text around.
const wicked = `</script><script>alert(1)</script>"'&amp;<img src=http://a.b/c onerror=x>{{.}}$(id)` + "`\\ \u202e\u2028 <!-- ]]>"

// TestSheetsAreWellFormed holds sheets of every kind against the rules.
func TestSheetsAreWellFormed(t *testing.T) {
	folder := t.TempDir()
	link := filepath.Join(folder, `o'link <&" ü.json`)
	data, err := os.ReadFile("../../testdata/parts/slotted-link.json")
	if err != nil {
		t.Fatal(err)
	}
	if err := os.WriteFile(link, data, 0o644); err != nil {
		t.Fatal(err)
	}
	for _, row := range []struct {
		words  []string
		status int
		says   []string // in the page
	}{
		{with(steppedShaft, "--load", "bending", "--claim", "1.85", "--claim-from", "chart, by eye"), exitDisagrees,
			[]string{"12.0\u00a0% too low", "2.1012\u00a0±", "tipton-1996", "chart, by eye", "not an approval"}},
		{with(steppedShaft, "--title", wicked, "--by", wicked, "--date", wicked), exitDisagrees, []string{`<a href="#torsion">`, "Summary"}},
		{with(steppedShaft, "--load", "torsion", "--claim", "1.5", "--claim-from", wicked), exitAgrees, []string{"√3"}},
		{with(steppedShaft, "--load", "bending", "--claim", "1.53"), exitDisagrees, []string{"Torsion read for bending"}},
		{[]string{link}, exitAgrees, []string{"o&#39;link &lt;&amp;&#34; ü.json", "part file below"}},
		{[]string{"bar-notch", "D=2", "d=1", "r=0.1", "angle=30", "--load", "tension"}, exitDisagrees, []string{"one unnamed unit", "°"}},
		{[]string{"bar-collar", "D=60mm", "d=40mm", "r=4mm", "L=30mm", "--load", "bending"}, exitAgrees, []string{"hint from a neighbouring shape"}},
		{[]string{"bar-shoulder", "D=60mm", "d=40mm", "r=0mm", "--load", "tension"}, exitUndecided, []string{"no factor: diverging", "270°"}},
		{nil, exitAgrees, []string{"demonstration"}},
	} {
		file, page := sheetOf(t, row.status, row.words...)
		if !strings.Contains(page, "Summary") { // several loads are more work and nothing new
			if status, out, errs := typed("report", "--check", file); status != exitAgrees {
				t.Errorf("%q: does not hold: %s%s", row.words, out, errs)
			}
		}
		for _, fault := range markup(page) {
			t.Errorf("%q: %s", row.words, fault)
		}
		for _, says := range row.says {
			if !strings.Contains(page, says) {
				t.Errorf("%q: the page does not say %q", row.words, says)
			}
		}
		if visible, _, _ := strings.Cut(page, "<script"); !slices.Contains(row.words, "--claim-from") && strings.ContainsRune(visible, '\u202e') {
			t.Errorf("%q: text on the page is turned around", row.words)
		}
		if n := strings.Count(page, "<script"); n != 1 {
			t.Errorf("%q: %d scripts", row.words, n)
		}
	}
}

// TestMarkupIsStrict: the reader of the test above must be able to find faults.
func TestMarkupIsStrict(t *testing.T) {
	_, page := sheetOf(t, exitAgrees)
	for _, row := range [][2]string{
		{"</h1>", ""}, {"</table>", "</div>"}, {` lang="en"`, ""}, {` scope="col"`, ""}, {`alt="`, `title="`},
		{"<main>", `<main onclick="x">`}, {`src="data:`, `src="http:`}, {`id="part"`, `id="question"`}, {"<h1>", "<h1>a < b "},
		{"<h1>", "<h1>AT&T "}, {"<h2 id=\"question\">", "<h4>"}, {"<main>", "<main><script>alert(1)</script>"}, {"</style>", "@import 'x';</style>"},
		{"<!DOCTYPE html>\n", ""}, {"<footer>", "<footer><link href=\"#part\">"}, {"<caption>Title block</caption>", ""},
	} {
		if !strings.Contains(page, row[0]) {
			t.Errorf("%q is not on the page", row[0])
		} else if len(markup(strings.Replace(page, row[0], row[1], 1))) == 0 {
			t.Errorf("%q made into %q: no fault found", row[0], row[1])
		}
	}
}

// TestSameSheet: the same input gives the same bytes; by text and JSON the sheet
// says the same as on the page.
func TestSameSheet(t *testing.T) {
	words := with(steppedShaft, "--load", "tension,bending", "--date", "2026-12-01")
	_, a := sheetOf(t, exitDisagrees, words...)
	_, b := sheetOf(t, exitDisagrees, words...)
	if a != b {
		t.Error("two runs gave two sheets")
	}
	_, text, _ := typed(with([]string{"report", "--text"}, words...)...)
	_, object, _ := typed(with([]string{"report", "--json"}, words...)...)
	var c report.Content
	if err := json.Unmarshal([]byte(object), &c); err != nil {
		t.Fatal(err)
	}
	for _, f := range c.Results {
		factor := f.Computed.Factor.String()
		if !strings.Contains(a, factor) || !strings.Contains(text, factor) || math.IsNaN(float64(f.Computed.Factor.Value)) {
			t.Errorf("%s: the factor %s is not on the page or not in the text", f.Load, factor)
		}
	}
	for i, line := range strings.Split(text, "\n") {
		if len([]rune(line)) > 110 {
			t.Errorf("line %d of the text has %d characters", i+1, len([]rune(line)))
		}
	}
}

// TestFamilyFileSaysTheSame: the part file on the sheet of a family, given to
// check, brings the same answer to the last bit.
func TestFamilyFileSaysTheSame(t *testing.T) {
	for _, words := range [][]string{
		with(steppedShaft, "--load", "bending", "--claim", "2.10", "--claim-from", `chart "3"`, "--claim-tolerance", "1%", "--nu", "0.28"),
		with(steppedShaft, "--load", "bending", "--claim", "1.90", "--claim-mesh", "order=1,arc=4"),
		{"bar-edge-notch", "D=2.5in", "d=1.75in", "r=0.1in", "angle=12.5", "--force-line", "gross", "--load", "tension"},
		{"bar-hole", "W=6", "d=2", "e=-0.7"},
	} {
		status, object, errs := typed(with([]string{"report", "--json"}, words...)...)
		var c report.Content
		if err := json.Unmarshal([]byte(object), &c); err != nil {
			t.Fatalf("%q: %v %s", words, err, errs)
		}
		file := filepath.Join(t.TempDir(), "part.json")
		if err := os.WriteFile(file, []byte(c.Input.File), 0o644); err != nil {
			t.Fatal(err)
		}
		again, object, errs := typed("report", "--json", file)
		var d report.Content
		if err := json.Unmarshal([]byte(object), &d); err != nil {
			t.Fatalf("%q: %v %s", words, err, errs)
		}
		if again != status {
			t.Errorf("%q: exit status %d by the file, %d by the words", words, again, status)
		}
		d.Input = c.Input
		if faults := report.Holds(&c, &d); len(faults) > 0 {
			t.Errorf("%q: by its file %q", words, faults)
		}
	}
}

// TestSheetHolds: a sheet as it was made holds; one that was changed is refused
// or found out, wherever it was changed.
func TestSheetHolds(t *testing.T) {
	file, page := sheetOf(t, exitDisagrees, with(steppedShaft, "--load", "bending", "--claim", "1.85", "--by", wicked)...)
	if status, out, errs := typed("report", "--check", file); status != exitAgrees || errs != "" || !strings.Contains(out, "sheet.html: holds\n") {
		t.Fatalf("exit status %d, %s%s", status, out, errs)
	}
	everywhere := func(old, new string) func(string) string {
		return func(p string) string { return strings.ReplaceAll(p, old, new) }
	}
	// foreign passes the sheet off as another version's, whose words and pictures
	// cannot be compared; its numbers still can.
	foreign := func(old, new string) func(string) string {
		return func(p string) string {
			return strings.ReplaceAll(strings.ReplaceAll(p, edition(), "notchproof v0.0.9"), old, new)
		}
	}
	record := regexp.MustCompile(`"factor":\{"value":([0-9.]+),"uncertainty":([0-9.e-]+)\}`).FindStringSubmatch(page)
	if record == nil {
		t.Fatal("no factor in the record")
	}
	for _, row := range []struct {
		name   string
		change func(string) string
		status int
		says   string
	}{
		{"a visible digit", func(p string) string { return strings.Replace(p, "<strong>2.1012", "<strong>1.9012", 1) }, exitUsage, "line"},
		{"a stylesheet that hides", everywhere("</style>", ".stamp{display:none}</style>"), exitUsage, "line"},
		{"something after the end", func(p string) string { return p + "<!-- -->" }, exitUsage, "line"},
		{"the record alone", func(p string) string { return strings.Replace(p, record[1], "1.9", 1) }, exitUsage, "line"},
		{"a picture", func(p string) string {
			return strings.Replace(p, "base64,iVBORw0KGgoAAAANSUhEUgAA", "base64,iVBORw0KGgoAAAANSUhEUgAB", 1)
		}, exitUsage, "figure 3"},
		{"a drawing", func(p string) string { return strings.Replace(p, "<desc ", "<text>Kt = 1</text><desc ", 1) }, exitUsage, "figure 1"},
		{"a drawing more", func(p string) string { return strings.Replace(p, "<main>", "<main><svg>Kt = 1</svg>", 1) }, exitUsage, "line"},
		{"another version", foreign("", ""), exitAgrees, "made by notchproof v0.0.9"},
		{"another version's wording", foreign("<h1>", "<h1>A "), exitAgrees, "words could not be compared"},
		{"its factor in the record", foreign(record[1], "1.9"), exitDisagrees, "the factor is 1.9"},
		{"its bar", foreign(`"uncertainty":`+record[2], `"uncertainty":0.9`), exitDisagrees, "the factor is"},
		{"its bar below zero", foreign(`"uncertainty":`+record[2], `"uncertainty":-1`), exitDisagrees, "the factor is"},
		{"its verdict", foreign(`"verdict":"disagrees"`, `"verdict":"agrees"`), exitDisagrees, "the verdict is agrees on the sheet"},
		{"its claim", foreign(`"claim":{"factor":1.85`, `"claim":{"factor":2.1`), exitDisagrees, "the claim is"},
		{"its input", foreign(`"r=3mm"`, `"r=4mm"`), exitDisagrees, "the factor is"},
		{"input that is nothing", foreign(`"r=3mm"`, `"q=4mm"`), exitUsage, "cannot be run"},
		{"input that names a file to be written", foreign(`"r=3mm"`, `"-oevil.html"`), exitUsage, "cannot be run"},
		{"input that names a file to be read", foreign(`"arguments":["shaft-shoulder","D=72mm","d=48mm","r=3mm"`, `"arguments":["/etc/passwd"`), exitUsage, "no such family"},
		{"two records", func(p string) string {
			return strings.Replace(p, "<main>", `<main><script type="application/json" id="notchproof-report">{}</script>`, 1)
		}, exitUsage, "record"},
		{"an unknown key", everywhere(`{"schema":1,`, `{"schema":1,"evil":1,`), exitUsage, "record"},
		{"another schema", everywhere(`{"schema":1,`, `{"schema":2,`), exitUsage, "schema 2"},
		{"half of it", func(p string) string { return p[:len(p)/2] }, exitUsage, "not a calculation sheet"},
		{"no end of its record", func(p string) string { return p[:len(p)-60] }, exitUsage, "record"},
		{"not UTF-8", func(p string) string { return p + "\xff" }, exitUsage, "not a calculation sheet"},
		{"nothing", func(string) string { return "" }, exitUsage, "not a calculation sheet"},
		{"another page", func(string) string { return "<!DOCTYPE html>\n<title>x</title>" }, exitUsage, "not a calculation sheet"},
	} {
		changed := row.change(page)
		if changed == page {
			t.Errorf("%s: nothing was changed", row.name)
		}
		if err := os.WriteFile(file, []byte(changed), 0o644); err != nil {
			t.Fatal(err)
		}
		status, out, errs := typed("report", "--check", file)
		if status != row.status || !strings.Contains(out+errs, row.says) {
			t.Errorf("%s: exit status %d instead of %d, want %q in\n%s%s", row.name, status, row.status, row.says, out, errs)
		}
		if lines := strings.Count(errs, "\n"); status == exitUsage && (out != "" || lines < 1 || lines > 2) {
			t.Errorf("%s: not one line and a hint: %s%s", row.name, out, errs)
		}
	}
}

// TestSheetOfADeveloper: one program must say the same throughout, also where
// nothing is judged by it.
func TestSheetOfADeveloper(t *testing.T) {
	_, object, _ := typed(with([]string{"report", "--json", "--load", "bending"}, steppedShaft...)...)
	var then, now report.Content
	for _, c := range []*report.Content{&then, &now} {
		if err := json.Unmarshal([]byte(object), c); err != nil {
			t.Fatal(err)
		}
	}
	if faults := report.Holds(&then, &now); len(faults) > 0 {
		t.Fatal(faults)
	}
	then.Results[0].Computed.Ladder[1].Factor *= 1.01
	if faults := report.Holds(&then, &now); len(faults) == 0 {
		t.Error("another ladder passes")
	}
	now.Program = "notchproof v9"
	if faults := report.Holds(&then, &now); len(faults) > 0 {
		t.Errorf("between versions the way to the factor is free: %q", faults)
	}
}

// TestReportRefuses: one line, a hint, status 2, and no file.
func TestReportRefuses(t *testing.T) {
	folder := t.TempDir()
	file := filepath.Join(folder, "x.html")
	for _, row := range []struct {
		words []string
		says  string
	}{
		{with(steppedShaft), "no file"},
		{with(steppedShaft, "-o", "sheet.pdf"), ".html"},
		{with(steppedShaft, "-o", filepath.Join(folder, "no", "x.html")), "folder"},
		{with(steppedShaft, "--text", "--json"), "both"},
		{with(steppedShaft, "-o", file, "--title", strings.Repeat("x", 201)), "--title"},
		{with(steppedShaft, "-o", file, "--by", "a\xffb"), "UTF-8"},
		{with(steppedShaft, "-o", file, "--claim", "2"), "for which load"},
		{[]string{"no-such.json", "-o", file}, "no such file"},
		{[]string{"--check", filepath.Join(folder, "none.html")}, "no such file"},
		{[]string{"--check", folder}, "cannot be read"},
		{with(steppedShaft, "--check", file), "goes alone"},
		{[]string{"--check", file, "--json"}, "goes alone"},
	} {
		status, out, errs := typed(append([]string{"report"}, row.words...)...)
		if status != exitUsage || out != "" || !strings.Contains(errs, row.says) || !strings.Contains(errs, "\nhint: ") || strings.Count(errs, "\n") != 2 {
			t.Errorf("%q: exit status %d, want %q\n%s%s", row.words, status, row.says, out, errs)
		}
	}
	if left, _ := os.ReadDir(folder); len(left) > 0 {
		t.Errorf("%s was written by a run that failed", left[0].Name())
	}
}
