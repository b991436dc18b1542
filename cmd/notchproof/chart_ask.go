package main

import (
	"fmt"
	"path/filepath"
	"strconv"
	"strings"

	"notchproof/scf"
	"notchproof/verify/chart"
	"notchproof/verify/specimen"
)

// checkFiles refuses, before any work is done, names that could not be written.
func (s *chartQuestion) checkFiles() error {
	if s.csv != "" {
		s.outputs = append(s.outputs, s.csv)
	}
	if within, err := share(s.within); err != nil || within < 1e-4 || within > 0.2 {
		return &inputError{text: "--within " + quoted(s.within) + ": not what a formula may be off", hint: "give a share of the factor from 0.01% to 20%, as in 1%"}
	}
	seen := make(map[string]bool)
	tables := 0
	for _, name := range s.outputs {
		if name == "" {
			return &inputError{text: "-o without a name", hint: "name a file that ends in .png, .svg or .csv"}
		}
		if err := checkOutput(name, ".png", ".svg", ".csv"); err != nil {
			return err
		}
		if seen[filepath.Clean(name)] {
			return &inputError{text: "-o " + quoted(name) + ": given twice", hint: "name each file once"}
		}
		seen[filepath.Clean(name)] = true
		if isTable(name) {
			s.csv = name
			tables++
		} else if s.share != "" {
			return &inputError{text: "-o " + quoted(name) + " with --share: a share is no chart yet", hint: "write a .csv file, and draw when the shares are joined"}
		}
	}
	if tables > 1 {
		return &inputError{text: "more than one table", hint: "name one .csv file"}
	}
	return s.paper.find()
}

func isTable(name string) bool { return strings.EqualFold(filepath.Ext(name), ".csv") }

// words puts the question together.
func (s *chartQuestion) words(q *questions, args []string) (w chart.Words, err error) {
	if len(args) == 0 {
		_, err := partOf(args, scf.Options{})
		return w, err
	}
	w = chart.Words{Along: s.along, Curves: s.curves, Given: args[1:]}
	if isFile(args[0]) {
		err = s.fromFile(q, args[0], &w)
	} else {
		if w.Family, err = familyOf(args[0]); err != nil {
			return w, err
		}
		w.Options, err = q.options()
	}
	if err != nil {
		return w, err
	}
	loads, err := q.loads(w.Family)
	if err != nil {
		return w, err
	}
	if len(loads) == 0 && w.Load == "" && len(w.Family.Loads) == 1 {
		loads = w.Family.Loads
	}
	if len(loads) == 1 {
		w.Load = loads[0]
	}
	if w.Load == "" || len(loads) > 1 {
		return w, &inputError{text: "a chart of which load?", hint: "name one with --load: " + loadNames(w.Family)}
	}
	options, err := q.verify(nil)
	w.Target = options.Target
	return w, err
}

// fromFile takes from a part file what the axes and the other words do not give.
func (s *chartQuestion) fromFile(q *questions, path string, w *chart.Words) error {
	data, err := readPartFile(path)
	if err != nil {
		return err
	}
	over, err := q.over()
	if err != nil {
		return err
	}
	over.Open = true
	file, err := specimen.ReadPart(data, path, over)
	if err != nil {
		return err
	}
	part := file.Part
	if part.Family == nil {
		return &inputError{text: quoted(path) + ": an outline of one's own has no named dimensions", hint: "give a family with its dimensions, or a part file that names one"}
	}
	w.Family, w.Options, s.title = part.Family, part.Options, part.Title
	if w.Options.ForceLine == "" {
		w.Options.ForceLine = scf.ForceLineNet
	}
	if len(file.Loads) == 1 {
		w.Load = file.Loads[0]
	}
	replaced := make(map[string]bool)
	for _, word := range append([]string{s.along, s.curves}, w.Given...) {
		name, _, _ := strings.Cut(word, "=")
		name, _, _ = strings.Cut(name, "/")
		replaced[strings.TrimSpace(name)] = true
	}
	for _, d := range part.Family.Dimensions {
		v, given := part.Given[d.Name]
		if !given || replaced[d.Name] {
			continue
		}
		unit := part.Unit
		if d.Angle {
			unit = ""
		}
		w.Given = append(w.Given, fmt.Sprintf("%s=%v%s", d.Name, v, unit))
	}
	return nil
}

// effort reads --share.
func (s *chartQuestion) effort() (e chart.Effort, err error) {
	if s.share == "" {
		return e, nil
	}
	no, of, _ := strings.Cut(s.share, "/")
	var bad [2]error
	e.Share.No, bad[0] = strconv.Atoi(no)
	e.Share.Of, bad[1] = strconv.Atoi(of)
	if bad[0] != nil || bad[1] != nil || e.Share.No < 1 || e.Share.No > e.Share.Of {
		return e, &inputError{text: "--share " + quoted(s.share) + ": no such share", hint: "give its number and how many there are, as in 1/3, 2/3 and 3/3"}
	}
	if s.csv == "" {
		return e, &inputError{text: "--share without a table", hint: "name a .csv file of its own for each share with -o"}
	}
	return e, nil
}
