package main

import "runtime/debug"

// edition names the program as its sheets do, with the version that the build
// carries; one built from a folder of sources carries none.
func edition() string {
	info, ok := debug.ReadBuildInfo()
	if !ok || info.Main.Version == "" || info.Main.Version == "(devel)" {
		return "notchproof, development build"
	}
	return "notchproof " + info.Main.Version
}
