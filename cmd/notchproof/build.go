package main

import (
	"runtime"
	"runtime/debug"
)

// A build names the program that is running. Empty fields are not known, as the
// commit of a program that was built outside its repository.
type build struct {
	Version  string `json:"version"`
	Commit   string `json:"commit"`
	Modified bool   `json:"modified"` // built with changes that are in no commit
	Go       string `json:"go"`
	System   string `json:"system"`
	Machine  string `json:"machine"`
	Date     string `json:"date,omitempty"` // of the run, where it was asked for
}

func buildOf() build {
	b := build{Go: runtime.Version(), System: runtime.GOOS, Machine: runtime.GOARCH}
	info, ok := debug.ReadBuildInfo()
	if !ok {
		return b
	}
	b.Version = info.Main.Version
	for _, s := range info.Settings {
		switch s.Key {
		case "vcs.revision":
			b.Commit = s.Value
		case "vcs.modified":
			b.Modified = s.Value == "true"
		}
	}
	return b
}

// String is the build in one line.
func (b build) String() string {
	text := "notchproof"
	if b.Version != "" {
		text += " " + b.Version
	}
	switch {
	case b.Commit == "":
		text += ", commit unknown"
	case b.Modified:
		text += ", commit " + b.Commit + " with changes"
	default:
		text += ", commit " + b.Commit
	}
	text += ", " + b.Go + ", " + b.System + "/" + b.Machine
	if b.Date != "" {
		text += ", " + b.Date
	}
	return text
}
