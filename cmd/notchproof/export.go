package main

import (
	"fmt"
	"io"
	"path/filepath"
	"strings"

	"notchproof/render/export"
	"notchproof/scf"
	"notchproof/verify"
	"notchproof/verify/specimen"
)

// An exporter writes a finding in a format.
type exporter = func(io.Writer, *verify.Finding, *specimen.Part) error

// exporterFor chooses the format by the ending of a name.
func exporterFor(name string) exporter {
	if strings.EqualFold(filepath.Ext(name), ".csv") {
		return export.Surface
	}
	return export.Field
}

// nameFor is the name of the file of one load: the name that was given, with
// the load before its ending where there are several.
func nameFor(name string, load scf.Load, loads []scf.Load) string {
	if len(loads) == 1 {
		return name
	}
	ending := filepath.Ext(name)
	return strings.TrimSuffix(name, ending) + "-" + string(load) + ending
}

// checkExports refuses, before any work is done, names that could not be
// written.
func checkExports(names []string, loads []scf.Load) error {
	seen := make(map[string]bool)
	for _, name := range names {
		if name == "" {
			return &inputError{text: "-o without a name", hint: "name a file that ends in .vtu or .csv"}
		}
		for _, load := range loads {
			file := nameFor(name, load, loads)
			if err := checkOutput(file, ".vtu", ".csv"); err != nil {
				return err
			}
			if seen[filepath.Clean(file)] {
				return &inputError{text: "-o " + quoted(file) + ": given twice", hint: "name each file once"}
			}
			seen[filepath.Clean(file)] = true
		}
	}
	return nil
}

// writeExports writes the files, all loads of a name before the next name.
func writeExports(names []string, r *verify.Result) (written []string, err error) {
	var loads []scf.Load
	for i := range r.Findings {
		loads = append(loads, r.Findings[i].Load.Name)
	}
	for _, name := range names {
		for i := range r.Findings {
			file, f := nameFor(name, loads[i], loads), &r.Findings[i]
			if f.Computed.Last == nil {
				return written, fmt.Errorf("%s: %s has no solution to be written", file, loads[i])
			}
			if err := writeFile(file, func(w io.Writer) error { return exporterFor(name)(w, f, r.Part) }); err != nil {
				return written, err
			}
			written = append(written, file)
		}
	}
	return written, nil
}
