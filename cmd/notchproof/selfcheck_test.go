package main

import (
	"bytes"
	"encoding/json"
	"math"
	"slices"
	"strings"
	"testing"

	"github.com/spf13/pflag"

	"notchproof/verify/evidence"
)

// selfcheckOf runs the command on a list of cases.
func selfcheckOf(t *testing.T, cases []evidence.Case, args ...string) (status int, out string) {
	t.Helper()
	var stdout, stderr bytes.Buffer
	flags := pflag.NewFlagSet("selfcheck", pflag.ContinueOnError)
	status, err := runSelfcheck(&call{ctx: t.Context(), args: args, flags: flags, stdout: &stdout, stderr: &stderr}, cases)
	if err != nil || stderr.Len() > 0 {
		t.Fatalf("%v, %s", err, stderr.String())
	}
	return status, stdout.String()
}

// few are cases that take no time to speak of.
func few() []evidence.Case {
	return slices.DeleteFunc(evidence.Cases(), func(c evidence.Case) bool {
		return !strings.HasPrefix(c.Name, "Richardson") && !strings.HasPrefix(c.Name, "nominal") && !strings.HasPrefix(c.Name, "slender")
	})
}

// An expected value that is wrong in its last known digits fails its case, is
// named, and ends in status 1; the list as it is passes.
func TestSelfcheckFailsOnAWrongValue(t *testing.T) {
	if status, out := selfcheckOf(t, few()); status != exitAgrees || !strings.Contains(out, "all passed: 3 of 3 cases, 10 of 10 numbers") {
		t.Errorf("exit status %d\n%s", status, out)
	}
	for i := range few() {
		cases := few()
		e := slices.Clone(cases[i].Expected)
		wrong := &e[len(e)-1]
		wrong.Value *= 1 + 1e-6
		wrong.Value += 2 * wrong.Accuracy
		cases[i].Expected = e
		status, out := selfcheckOf(t, cases)
		if status != exitDisagrees || !strings.Contains(out, "failed: 2 of 3 cases, 9 of 10 numbers") {
			t.Errorf("%s: exit status %d\n%s", cases[i].Name, status, out)
		}
		for line := range strings.Lines(out) {
			if strings.Contains(line, wrong.What) && strings.HasPrefix(line, "  "+wrong.What) && strings.Contains(line, "failed") {
				wrong = nil
				break
			}
		}
		if wrong != nil {
			t.Errorf("%s: the row that failed is not marked\n%s", cases[i].Name, out)
		}
	}
}

// What is printed is the same in every run, holds the build, and the date only
// where it is asked for.
func TestSelfcheckIsReproducible(t *testing.T) {
	_, first := selfcheckOf(t, few())
	_, second := selfcheckOf(t, few())
	_, dated := selfcheckOf(t, few(), "--date")
	if first != second {
		t.Errorf("two runs differ:\n%s\n%s", first, second)
	}
	head, _, _ := strings.Cut(first, "\n")
	if !strings.Contains(head, "go1.") || !strings.Contains(head, "/") || !strings.HasPrefix(dated, head+", 20") {
		t.Errorf("head %q, with the date %q", head, strings.SplitN(dated, "\n", 2)[0])
	}
}

// The JSON object says the same.
func TestSelfcheckJSON(t *testing.T) {
	cases := few()
	cases[0].Expected = slices.Clone(cases[0].Expected)
	cases[0].Expected[0].Value += 1
	status, out := selfcheckOf(t, cases, "--json")
	var got jsonSelfcheck
	if err := json.Unmarshal([]byte(out), &got); err != nil {
		t.Fatal(err)
	}
	if status != exitDisagrees || got.Passed || got.Cases[0].Passed || !got.Cases[1].Passed || len(got.Cases) != 3 || got.Build.Go == "" {
		t.Errorf("exit status %d, %+v", status, got)
	}
	for _, c := range got.Cases {
		if c.Source == "" || c.Sureness == "" || len(c.Readings) == 0 {
			t.Errorf("%+v", c)
		}
	}
}

func (m *maybe) UnmarshalJSON(text []byte) error {
	if string(text) == "null" {
		*m = maybe(math.NaN())
		return nil
	}
	return json.Unmarshal(text, (*float64)(m))
}
