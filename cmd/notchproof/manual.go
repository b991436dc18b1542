package main

import (
	"context"
	"fmt"
	"io"
	"strings"

	"github.com/spf13/pflag"

	"notchproof/verify/specimen"
)

const promise = `notchproof verifies stress concentration factors of notched parts: it solves
the part on a ladder of finite element meshes, states the factor with an error
bar, and holds it against the handbook and against your own number.
`

const caution = `An elastic factor is not an approval: material, fatigue, residual stress,
surface and load uncertainty stay with the engineer responsible, under the
codes and the licensed practice that apply where the part is used.
`

// manual is the text of the program as a whole.
func manual() string {
	var b strings.Builder
	b.WriteString(promise)
	b.WriteString("\nusage: notchproof COMMAND PART [dimension=value ...] [flags]\n\n")
	for _, c := range commands() {
		fmt.Fprintf(&b, "  %-9s %s\n", c.name, c.short)
	}
	b.WriteString("  help      the manual of a command: notchproof help check\n")
	b.WriteString("  --version name and version of this build\n")
	b.WriteString("\n" + caution)
	return b.String()
}

// manual is the text of one command.
func (c *command) manual(flags *pflag.FlagSet) string {
	text := "usage: notchproof " + strings.TrimSpace(c.name+" "+c.args) + "\n\n" + c.long
	if usage := flags.FlagUsages(); usage != "" {
		text += "\nFlags\n" + usage
	}
	return text
}

func help(args []string, stdout, stderr io.Writer) int {
	if len(args) > 1 {
		return fail(stderr, &inputError{
			text: "help " + quoted(strings.Join(args, " ")) + ": one command at a time",
			hint: "notchproof help " + oneLine(args[0]),
		})
	}
	if len(args) == 0 || args[0] == "help" {
		fmt.Fprint(stdout, manual())
		return exitAgrees
	}
	for _, c := range commands() {
		if c.name == args[0] {
			return c.call(context.Background(), []string{"--help"}, stdout, stderr)
		}
	}
	return fail(stderr, &inputError{
		text: fmt.Sprintf("%s: no such command", quoted(args[0])),
		hint: "the commands are " + commandNames(),
	})
}

func commandNames() string {
	names := make([]string, 0, len(commands()))
	for _, c := range commands() {
		names = append(names, c.name)
	}
	return strings.Join(names, ", ")
}

// nearCommand is the end of a hint, empty where no command is near.
func nearCommand(word string) string {
	word = strings.ToLower(word)
	if n := specimen.Nearest(word, strings.Split(commandNames(), ", "), min(3, len(word)/2)); n != "" {
		return "; did you mean " + n + "?"
	}
	return ""
}
