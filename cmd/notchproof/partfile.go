package main

import (
	"errors"
	"fmt"
	"io"
	"io/fs"
	"os"
	"slices"
	"strings"

	"notchproof/scf"
	"notchproof/verify"
	"notchproof/verify/specimen"
)

// longestPartFile bounds what is read; the reader has its own, lower bound.
const longestPartFile = 1 << 21

// isFile tells whether an argument means a part file and not a family.
func isFile(arg string) bool {
	if _, family := scf.Lookup(arg); family {
		return false
	}
	if strings.HasSuffix(strings.ToLower(arg), ".json") {
		return true
	}
	info, err := os.Stat(arg)
	return err == nil && !info.IsDir()
}

// fileJob reads a part file. What the flags say goes before what it says.
func fileJob(path string, q *questions) (*job, error) {
	data, err := readPartFile(path)
	if err != nil {
		return nil, err
	}
	return partFileJob(data, path, q)
}

// partFileJob reads the text of a part file; name is for errors.
func partFileJob(data []byte, name string, q *questions) (*job, error) {
	over, err := q.over()
	if err != nil {
		return nil, err
	}
	file, err := specimen.ReadPart(data, name, over)
	if err != nil {
		return nil, err
	}
	loads, err := q.among(file)
	if err != nil {
		return nil, err
	}
	options, err := q.verify(loads)
	if err != nil {
		return nil, err
	}
	if options.Claims == nil {
		options.Claims = make(map[scf.Load]*verify.Claim)
	}
	for _, c := range file.Claims {
		if options.Claims[c.Load] == nil {
			options.Claims[c.Load] = &verify.Claim{Factor: c.Factor, LastDigit: c.LastDigit, Reading: c.Tolerance, From: c.From, Mesh: c.Mesh}
		}
	}
	return &job{file.Part, loads, options, file}, nil
}

func readPartFile(path string) ([]byte, error) {
	f, err := os.Open(path)
	if err != nil {
		return nil, fileError(path, err)
	}
	defer f.Close()
	data, err := io.ReadAll(io.LimitReader(f, longestPartFile))
	if err != nil {
		return nil, fileError(path, err)
	}
	return data, nil
}

// fileError names the file once, as it was typed.
func fileError(path string, err error) error {
	hint := "a part is a family with its dimensions, or the path of a part file"
	var fault *fs.PathError
	if errors.As(err, &fault) {
		err = fault.Err
	}
	if errors.Is(err, fs.ErrNotExist) {
		return &inputError{text: quoted(path) + ": no such file", hint: hint}
	}
	return &inputError{text: fmt.Sprintf("%s: cannot be read: %v", quoted(path), err), hint: hint}
}

// over is what the flags say over a part file's head.
func (q *questions) over() (specimen.Over, error) {
	o, err := q.options()
	if err != nil {
		return specimen.Over{}, err
	}
	var over specimen.Over
	if q.flags.Changed("nu") {
		over.Nu = &o.Nu
	}
	if q.flags.Changed("force-line") {
		over.ForceLine = o.ForceLine
	}
	return over, nil
}

// among checks the loads asked for against what the part carries; without any
// the file's are meant.
func (q *questions) among(file *specimen.File) ([]scf.Load, error) {
	if len(q.load) == 0 {
		return file.Loads, nil
	}
	var carried []string
	for _, l := range file.Part.Loads {
		carried = append(carried, string(l.Name))
	}
	var loads []scf.Load
	for _, name := range q.load {
		load := scf.Load(strings.TrimSpace(name))
		if !slices.Contains(carried, string(load)) {
			return nil, &inputError{text: fmt.Sprintf("--load %s: the part does not carry it", quoted(name)), hint: "its loads are " + strings.Join(carried, ", ")}
		}
		if slices.Contains(loads, load) {
			return nil, &inputError{text: "--load " + name + ": given twice", hint: "name each load once"}
		}
		loads = append(loads, load)
	}
	return loads, nil
}
