package main

import (
	"runtime"
	"runtime/debug"
)

// edition names the program as its sheets do, with the version that the build
// carries (one built from a folder of sources carries none) and the kind of
// machine, as pictures may differ between kinds in a bit.
func edition() string {
	info, ok := debug.ReadBuildInfo()
	if !ok || info.Main.Version == "" || info.Main.Version == "(devel)" {
		return "notchproof, development build (" + runtime.GOARCH + ")"
	}
	return "notchproof " + info.Main.Version + " (" + runtime.GOARCH + ")"
}
