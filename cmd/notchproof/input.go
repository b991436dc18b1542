package main

import (
	"errors"
	"fmt"
	"strings"

	"notchproof/scf"
	"notchproof/verify/specimen"
)

// partOf reads PART [dim=value ...] into a part.
func partOf(args []string, o scf.Options) (*specimen.Part, error) {
	if len(args) == 0 {
		return nil, &inputError{text: "no part given", hint: "name a family and its dimensions, as in: shaft-shoulder D=72mm d=48mm r=3mm"}
	}
	family, err := familyOf(args[0])
	if err != nil {
		return nil, err
	}
	dims, unit, err := dimensions(family, args[1:])
	if err != nil {
		return nil, err
	}
	return specimen.New(family, dims, unit, o)
}

func familyOf(name string) (*scf.Family, error) {
	if f, ok := scf.Lookup(name); ok {
		return f, nil
	}
	var names []string
	for _, f := range scf.Families() {
		names = append(names, f.Name)
	}
	hint := "notchproof parts lists the families"
	if n := specimen.Nearest(name, names, len(name)/2); n != "" {
		hint = "did you mean " + n + "? " + hint
	}
	return nil, &inputError{text: quoted(name) + ": no such family of parts", hint: hint}
}

// dimensions reads words of the form name=value. Lengths come out in one unit.
func dimensions(family *scf.Family, words []string) (scf.Dims, string, error) {
	dims := make(scf.Dims)
	var lengths []specimen.Dimension
	for _, word := range words {
		name, text, ok := strings.Cut(word, "=")
		if !ok || name == "" {
			return nil, "", &inputError{text: quoted(word) + ": not a dimension", hint: "write dimensions as name=value, as in D=60mm"}
		}
		known := dimensionOf(family, name)
		if known == nil {
			return nil, "", unknownDimension(family, name)
		}
		if _, twice := dims[name]; twice {
			return nil, "", &inputError{text: name + ": given twice", hint: "give each dimension once"}
		}
		if known.Angle {
			angle, err := specimen.ParseAngle(text)
			if err != nil {
				return nil, "", named(err, name)
			}
			dims[name] = angle
			continue
		}
		length, err := specimen.ParseLength(text)
		if err != nil {
			return nil, "", named(err, name)
		}
		dims[name] = length.Value
		lengths = append(lengths, specimen.Dimension{Name: name, Length: length})
	}
	values, unit, err := specimen.Common(lengths)
	if err != nil {
		return nil, "", err
	}
	for i, l := range lengths {
		dims[l.Name] = values[i]
	}
	return dims, unit, nil
}

// named puts the dimension's name on a fault found in its text.
func named(err error, name string) error {
	var input *specimen.InputError
	if errors.As(err, &input) {
		input.What = name
	}
	return err
}

func dimensionOf(family *scf.Family, name string) *scf.Dimension {
	for i := range family.Dimensions {
		if family.Dimensions[i].Name == name {
			return &family.Dimensions[i]
		}
	}
	return nil
}

func unknownDimension(family *scf.Family, name string) error {
	var names []string
	for _, d := range family.Dimensions {
		names = append(names, d.Name)
	}
	hint := fmt.Sprintf("%s has the dimensions %s", family.Name, family.Usage())
	if n := specimen.Nearest(name, names, len(name)/2); n != "" {
		hint += "; did you mean " + n + "?"
	}
	return &inputError{text: quoted(name) + ": no such dimension", hint: hint}
}
