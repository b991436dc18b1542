package main

import (
	"time"

	"notchproof/verify/evidence"
)

func selfcheckCommand() *command {
	return &command{
		name:  "selfcheck",
		args:  "[flags]",
		short: "hold this build against exact solutions and published values",
		long: `Computes problems whose answers are known from outside, and prints for each
number what is expected and from where, what was got, and the bar within which
the two must meet: that of the computation and that of the published digits.
The head names the build, so that the print can go into a quality file; it is
the same on every run. Takes a few seconds.

  notchproof selfcheck
  notchproof selfcheck --json > selfcheck.json

Exit status: 0 all passed, 1 one failed, 2 bad usage, 130 interrupted.
`,
		run: func(c *call) (int, error) { return runSelfcheck(c, evidence.Cases()) },
	}
}

func runSelfcheck(c *call, cases []evidence.Case) (int, error) {
	asJSON := c.flags.Bool("json", false, "print one JSON object instead of text")
	dated := c.flags.Bool("date", false, "print today's date too, in UTC")
	args, err := c.parse()
	if err != nil {
		return 0, err
	}
	if len(args) > 0 {
		return 0, &inputError{text: quoted(args[0]) + ": takes no part", hint: "check PART checks a part"}
	}
	bar := c.progress()
	outcomes, err := evidence.Run(c.ctx, cases, bar.tell)
	bar.clear()
	if err != nil {
		return 0, err
	}
	head := buildOf()
	if *dated {
		head.Date = time.Now().UTC().Format(time.DateOnly)
	}
	write := writeSelfcheck
	if *asJSON {
		write = writeSelfcheckJSON
	}
	if err := write(c.stdout, head, outcomes, c.style()); err != nil {
		return 0, err
	}
	for i := range outcomes {
		if !outcomes[i].Passed() {
			return exitDisagrees, nil
		}
	}
	return exitAgrees, nil
}
