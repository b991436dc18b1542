package main

import (
	"fmt"
	"io"
	"strings"

	"notchproof/render"
	"notchproof/scf"
	"notchproof/verify/specimen"
)

func partsCommand() *command {
	return &command{
		name:  "parts",
		args:  "[FAMILY [dimension=value ...]] [flags]",
		short: "list the families of parts, or show one with its dimensions",
		long: `Without arguments lists the families with their dimensions and loads. With a
family explains its dimensions, sketches it and says what is published; -o draws a
dimensioned sketch, of the dimensions given or of typical ones. --as-file prints
the part as a part file with its outline, to start one of your own from.

  notchproof parts shaft-shoulder -o sketch.png
  notchproof parts shaft-shoulder D=72mm d=48mm r=3mm --as-file > shaft.json
`,
		run: runParts,
	}
}

func runParts(c *call) (int, error) {
	var q questions
	var out figureFile
	out.flags(c.flags, "write a dimensioned sketch to this .png or .svg file")
	asFile := c.flags.Bool("as-file", false, "print the part as a part file")
	q.partFlags(c.flags)
	args, err := c.parse()
	if err != nil {
		return 0, err
	}
	if len(args) == 0 {
		if *asFile {
			return 0, &inputError{text: "no family to write", hint: "name one, as in: parts shaft-shoulder --as-file"}
		}
		if out.name != "" {
			return 0, &inputError{text: "no family to sketch", hint: "name one, as in: parts shaft-shoulder -o sketch.png"}
		}
		return exitAgrees, listFamilies(c.stdout)
	}
	family, err := familyOf(args[0])
	if err != nil {
		return 0, err
	}
	o, err := q.options()
	if err != nil {
		return 0, err
	}
	var part *specimen.Part
	if len(args) > 1 {
		part, err = partOf(args, o)
	} else {
		part, err = specimen.New(family, typical(family), "", o)
	}
	if err != nil {
		return 0, err
	}
	if err := out.check(); err != nil {
		return 0, err
	}
	if *asFile {
		return exitAgrees, printAsFile(c.stdout, part)
	}
	if err := describe(c.stdout, family, part, len(args) > 1); err != nil {
		return 0, err
	}
	if out.name == "" {
		return exitAgrees, nil
	}
	if err := out.write(render.SketchFigure(part)); err != nil {
		return 0, err
	}
	fmt.Fprintf(c.stdout, "\nsketch written to %s\n", out.name)
	return exitAgrees, nil
}

func printAsFile(w io.Writer, part *specimen.Part) error {
	text, err := part.AsFile()
	if err == nil {
		_, err = w.Write(text)
	}
	return err
}

func listFamilies(w io.Writer) error {
	var b strings.Builder
	for _, f := range scf.Families() {
		fmt.Fprintf(&b, "%-18s %s\n%18s dimensions %s; loads %s\n", f.Name, f.Title, "", f.Usage(), loadNames(f))
	}
	b.WriteString("\nnotchproof parts FAMILY explains one of them.\n")
	_, err := io.WriteString(w, b.String())
	return err
}

// describe explains a family, and what is known of the given dimensions.
func describe(w io.Writer, family *scf.Family, part *specimen.Part, given bool) error {
	var b strings.Builder
	fmt.Fprintf(&b, "%s  %s\n\ndimensions\n", family.Name, family.Title)
	for _, d := range family.Dimensions {
		fmt.Fprintf(&b, "  %-6s %s\n", d.Name, dimensionMeaning(d))
	}
	if given {
		fmt.Fprintf(&b, "\nwith %s\n", dimensionText(part))
	} else {
		fmt.Fprintf(&b, "\nwith typical proportions, %s\n", dimensionText(part))
	}
	b.WriteString("\n" + render.SketchText(part) + "\n")
	for i := range part.Loads {
		l := &part.Loads[i]
		fmt.Fprintf(&b, "  %s: nominal stress %s (%s)\n", l.Name, l.Nominal.Formula, l.Nominal.Section)
		values := family.Handbook(l.Name, part.Dims, part.Options)
		for _, v := range values {
			state := "in range"
			if !v.InRange {
				state = "out of range"
			}
			fmt.Fprintf(&b, "    %-22s %7.3f  %s (%s)\n", v.ID, v.Factor, state, v.Range)
		}
		switch {
		case len(part.Sharp) > 0:
			b.WriteString("    no factor: the corner has no radius\n")
		case len(values) == 0:
			b.WriteString("    nothing published\n")
		}
	}
	_, err := io.WriteString(w, b.String())
	return err
}

func dimensionMeaning(d scf.Dimension) string {
	if d.Optional {
		return d.Meaning + " (may be left out)"
	}
	return d.Meaning
}

// typical are dimensions that show what a family looks like.
func typical(family *scf.Family) scf.Dims {
	all := scf.Dims{"D": 60, "d": 40, "r": 5, "L": 30, "w": 16, "W": 60, "a": 12, "b": 8}
	if family.Name == "bar-hole" {
		all["d"] = 20
	}
	dims := make(scf.Dims)
	for _, d := range family.Dimensions {
		if v, ok := all[d.Name]; ok && !d.Optional {
			dims[d.Name] = v
		}
	}
	return dims
}
