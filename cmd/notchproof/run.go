package main

import (
	"context"
	"errors"
	"fmt"
	"io"
	"slices"
	"strings"

	"github.com/spf13/pflag"
)

// Exit statuses.
const (
	exitAgrees      = 0 // or nothing to compare with
	exitDisagrees   = 1
	exitUsage       = 2 // bad input or usage
	exitUndecided   = 3
	exitInterrupted = 130
)

// A command is one verb of the program.
type command struct {
	name  string
	args  string // how its arguments are written
	short string // one line
	long  string // the manual, without the flags
	// run parses the flags and does the work. The status is that of the process
	// when the error is nil.
	run func(c *call) (status int, err error)
}

// commands lists all verbs in the order of the help text.
func commands() []*command {
	return []*command{
		checkCommand(), studyCommand(), pictureCommand(), plotCommand(), reportCommand(), partsCommand(),
		strengthCommand(), sizeCommand(), toleranceCommand(), chartCommand(), selfcheckCommand(),
	}
}

// A call is one run of a command.
type call struct {
	ctx    context.Context
	args   []string
	flags  *pflag.FlagSet
	stdout io.Writer
	stderr io.Writer
}

// run is the program: it returns the exit status.
func run(ctx context.Context, args []string, stdout, stderr io.Writer) int {
	if len(args) == 0 {
		fmt.Fprint(stderr, manual())
		return exitUsage
	}
	switch args[0] {
	case "help", "-h", "--help":
		return help(args[1:], stdout, stderr)
	case "--version":
		fmt.Fprintln(stdout, edition())
		return exitAgrees
	}
	for _, c := range commands() {
		if c.name == args[0] {
			return c.call(ctx, args[1:], stdout, stderr)
		}
	}
	return fail(stderr, &inputError{
		text: fmt.Sprintf("%s: no such command", quoted(args[0])),
		hint: "the commands are " + commandNames() + nearCommand(args[0]),
	})
}

func (c *command) call(ctx context.Context, args []string, stdout, stderr io.Writer) int {
	flags := pflag.NewFlagSet(c.name, pflag.ContinueOnError)
	flags.SetOutput(io.Discard)
	flags.SortFlags = false
	status, err := c.run(&call{ctx: ctx, args: args, flags: flags, stdout: stdout, stderr: stderr})
	switch {
	case errors.Is(err, pflag.ErrHelp):
		fmt.Fprint(stdout, c.manual(flags))
		return exitAgrees
	case ctx.Err() != nil && errors.Is(err, context.Canceled):
		fmt.Fprintln(stderr, "interrupted")
		return exitInterrupted
	case err != nil:
		return fail(stderr, err)
	}
	return status
}

// parse reads the flags and returns the other arguments.
func (c *call) parse() ([]string, error) {
	if err := c.flags.Parse(c.args); err != nil {
		if errors.Is(err, pflag.ErrHelp) {
			return nil, err
		}
		return nil, &inputError{text: lowerFirst(err.Error()), hint: fmt.Sprintf("notchproof help %s lists the flags", c.flags.Name())}
	}
	return c.flags.Args(), c.blank()
}

// blank refuses a flag that is given nothing. An empty variable of a script would
// else leave its question unasked, and the answer would look like one to it.
func (c *call) blank() (err error) {
	c.flags.Visit(func(f *pflag.Flag) {
		if slices.Contains(mayBeBlank, f.Name) || err != nil {
			return
		}
		empty := f.Value.Type() == "string" && strings.TrimSpace(f.Value.String()) == ""
		if list, ok := f.Value.(pflag.SliceValue); ok {
			empty = strings.TrimSpace(strings.Join(list.GetSlice(), "")) == ""
		}
		if empty {
			err = &inputError{text: "--" + f.Name + ` "": empty`, hint: "give it a value, or leave the flag out"}
		}
	})
	return err
}

// mayBeBlank are words of the sheet, which may have none.
var mayBeBlank = []string{"title", "by", "date", "claim-from"}
