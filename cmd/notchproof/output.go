package main

import (
	"bufio"
	"io"
	"os"
	"path/filepath"
	"slices"
	"strings"
)

// checkOutput refuses, before any work is done, a name that could not be
// written. An empty name asks for no file. The extensions are those of the
// formats that there are.
func checkOutput(name string, extensions ...string) error {
	if name == "" {
		return nil
	}
	if !slices.ContainsFunc(extensions, func(e string) bool { return strings.EqualFold(filepath.Ext(name), e) }) {
		hint := "the file is written in that format alone"
		if len(extensions) > 1 {
			hint = "the ending of the name chooses the format"
		}
		return &inputError{text: "-o " + quoted(name) + ": not a name that ends in " + strings.Join(extensions, " or "), hint: hint}
	}
	info, err := os.Stat(filepath.Dir(name))
	if err != nil || !info.IsDir() {
		return &inputError{text: "-o " + quoted(name) + ": its folder does not exist", hint: "make the folder first"}
	}
	if info, err := os.Stat(name); err == nil && info.IsDir() {
		return &inputError{text: "-o " + quoted(name) + ": is a folder", hint: "name a file in it"}
	}
	return nil
}

// writeFile writes a file whole or not at all: to a neighbour first, which
// takes the name only when all of it is there.
func writeFile(name string, write func(io.Writer) error) (err error) {
	f, err := os.CreateTemp(filepath.Dir(name), ".notchproof-*")
	if err != nil {
		return &inputError{text: "-o " + quoted(name) + ": cannot be written", hint: "choose a folder that may be written to"}
	}
	defer func() {
		if err != nil {
			f.Close()
			os.Remove(f.Name())
		}
	}()
	buffer := bufio.NewWriter(f)
	if err = write(buffer); err != nil {
		return err
	}
	if err = buffer.Flush(); err != nil {
		return err
	}
	if err = f.Chmod(0o644); err != nil {
		return err
	}
	if err = f.Close(); err != nil {
		return err
	}
	if err = os.Rename(f.Name(), name); err != nil {
		return &inputError{text: "-o " + quoted(name) + ": cannot be written", hint: "choose another name"}
	}
	return nil
}
