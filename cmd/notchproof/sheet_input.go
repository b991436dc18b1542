package main

import (
	"encoding/json"
	"strconv"
	"strings"

	"github.com/spf13/pflag"

	"notchproof/render/report"
	"notchproof/scf"
	"notchproof/verify"
)

// askedBy are the flags that belong to the question; the others say what
// becomes of the answer.
var askedBy = []string{"load", "claim", "claim-from", "claim-tolerance", "claim-mesh", "target", "nu", "force-line"}

// job reads the part, and what the sheet must carry to be made again.
func (s *sheetFlags) job(args []string) (*job, report.Input, error) {
	q := &s.questions
	input := report.Input{Arguments: append(append([]string{}, args...), asked(q.flags)...)}
	if len(args) == 1 && isFile(args[0]) {
		data, err := readPartFile(args[0])
		if err != nil {
			return nil, input, err
		}
		input.File, input.Read = string(data), true
		job, err := partFileJob(data, args[0], q)
		return job, input, err
	}
	job, err := q.job(args)
	if err != nil {
		return nil, input, err
	}
	input.File = familyFile(job, q)
	return job, input, nil
}

// asked gives the flags of the question as words.
func asked(flags *pflag.FlagSet) (words []string) {
	for _, name := range askedBy {
		f := flags.Lookup(name)
		if f == nil || !f.Changed {
			continue
		}
		text := f.Value.String()
		if list, ok := f.Value.(pflag.SliceValue); ok {
			text = strings.Join(list.GetSlice(), ",")
		}
		words = append(words, "--"+name, text)
	}
	return words
}

// familyFile writes a job on a family as the part file that says the same.
func familyFile(j *job, q *questions) string {
	shape := []pair{{"family", j.part.Name}}
	for _, d := range j.part.Family.Dimensions {
		if v, given := j.part.Given[d.Name]; given && d.Angle {
			shape = append(shape, pair{d.Name, exact(v)})
		} else if given {
			shape = append(shape, pair{d.Name, exact(v) + j.part.Unit})
		}
	}
	if line := j.part.Options.ForceLine; line != "" && line != scf.ForceLineNet {
		shape = append(shape, pair{"forceLine", line})
	}
	var loads, claims []string
	for _, load := range j.loads {
		loads = append(loads, jsonText(string(load)))
		if c := j.options.Claims[load]; c != nil {
			claims = append(claims, claimObject(load, c, q))
		}
	}
	lines := []string{
		`"shape": ` + object(shape),
		`"loads": [` + strings.Join(loads, ", ") + `]`,
		`"material": ` + object([]pair{{"nu", exact(j.part.Options.Nu)}}),
	}
	if j.part.Title != "" {
		lines = append([]string{`"title": ` + jsonText(j.part.Title)}, lines...)
	}
	if len(claims) > 0 {
		lines = append(lines, `"claims": [`+strings.Join(claims, ", ")+`]`)
	}
	return "{\n  " + strings.Join(lines, ",\n  ") + "\n}\n"
}

// claimObject writes a claim with the digits that the user gave.
func claimObject(load scf.Load, c *verify.Claim, q *questions) string {
	factor := q.claim
	if factor == "" { // the demonstration's
		factor = exact(c.Factor)
	}
	list := []pair{{"load", string(load)}, {"factor", factor}}
	if c.From != "" {
		list = append(list, pair{"from", oneLine(c.From)})
	}
	if c.Reading > 0 {
		list = append(list, pair{"tolerance", exact(c.Reading)})
	}
	text := object(list)
	if m := c.Mesh; m != nil {
		mesh := object([]pair{{"order", exact(float64(m.Order))}, {"arc", exact(m.Arc)}})
		text = strings.TrimSuffix(text, "}") + `, "mesh": ` + mesh + "}"
	}
	return text
}

// A pair is a key of a part file with its value, which may always be a text.
type pair struct{ name, text string }

// object writes pairs as one line of JSON.
func object(list []pair) string {
	words := make([]string, len(list))
	for i, p := range list {
		words[i] = jsonText(p.name) + ": " + jsonText(p.text)
	}
	return "{" + strings.Join(words, ", ") + "}"
}

func jsonText(s string) string {
	var b strings.Builder
	encoder := json.NewEncoder(&b)
	encoder.SetEscapeHTML(false)
	if err := encoder.Encode(s); err != nil {
		panic("notchproof: a text that is not JSON")
	}
	return strings.TrimSuffix(b.String(), "\n")
}

// exact writes a number so that it reads back to the last bit.
func exact(v float64) string { return strconv.FormatFloat(v, 'g', -1, 64) }
