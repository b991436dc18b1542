package main

import (
	"fmt"
	"io"
	"os"
	"sync"
)

// A style is how text is set off: on a terminal in colour, elsewhere not.
type style struct{ colour bool }

func (c *call) style() style {
	return style{colour: isTerminal(c.stdout) && os.Getenv("NO_COLOR") == ""}
}

func (s style) in(code, text string) string {
	if !s.colour {
		return text
	}
	return "\x1b[" + code + "m" + text + "\x1b[0m"
}

func (s style) good(text string) string { return s.in("32", text) }
func (s style) bad(text string) string  { return s.in("1;31", text) }
func (s style) weak(text string) string { return s.in("33", text) }
func (s style) bold(text string) string { return s.in("1", text) }

func isTerminal(w io.Writer) bool {
	f, ok := w.(*os.File)
	if !ok {
		return false
	}
	info, err := f.Stat()
	return err == nil && info.Mode()&os.ModeCharDevice != 0
}

// progress is a line on standard error that says what is being done. Where
// that is no terminal nothing is written: a log has no use for it.
type progress struct {
	mu    sync.Mutex
	w     io.Writer
	shown bool
}

func (c *call) progress() *progress {
	if !isTerminal(c.stderr) {
		return &progress{}
	}
	return &progress{w: c.stderr}
}

func (p *progress) tell(text string) {
	p.mu.Lock()
	defer p.mu.Unlock()
	if p.w != nil {
		p.shown = true
		fmt.Fprintf(p.w, "\r\x1b[K%s", text)
	}
}

func (p *progress) clear() {
	p.mu.Lock()
	defer p.mu.Unlock()
	if p.shown {
		fmt.Fprint(p.w, "\r\x1b[K")
	}
}
