package main

import (
	"context"
	"os"
	"os/signal"
	"runtime/debug"
)

// The program is run; main only connects it to the process.
func main() {
	// A run lasts a fraction of a second; collecting rubbish at every few
	// megabytes would take a good part of it. Studies, which may be large, go
	// back to the ordinary way.
	debug.SetGCPercent(-1)
	debug.SetMemoryLimit(1 << 30)
	ctx, stop := signal.NotifyContext(context.Background(), os.Interrupt)
	defer stop()
	os.Exit(run(ctx, os.Args[1:], os.Stdout, os.Stderr))
}
