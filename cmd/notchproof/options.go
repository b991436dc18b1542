package main

import (
	"fmt"
	"math"
	"strconv"
	"strings"

	"github.com/spf13/pflag"

	"notchproof/scf"
	"notchproof/verify"
	"notchproof/verify/specimen"
)

// questions are the flags that the commands share.
type questions struct {
	nu        string
	forceLine string
	load      []string
	target    string

	claim          string
	claimFrom      string
	claimTolerance string
	claimMesh      string

	flags *pflag.FlagSet // those of the part, to tell what was given
}

func (q *questions) partFlags(f *pflag.FlagSet) {
	q.flags = f
	f.StringVar(&q.nu, "nu", "0.3", "Poisson's ratio")
	f.StringVar(&q.forceLine, "force-line", scf.ForceLineNet, "where the force of a one-sided notch in tension passes: net or gross")
}

func (q *questions) loadFlag(f *pflag.FlagSet) {
	f.StringSliceVar(&q.load, "load", nil, "tension, bending or torsion; all that the part carries when left out")
}

// oneLoadFlag is that of commands that look at one load.
func (q *questions) oneLoadFlag(f *pflag.FlagSet) {
	f.StringSliceVar(&q.load, "load", nil, "tension, bending or torsion; the first that the part carries when left out")
}

func (q *questions) targetFlag(f *pflag.FlagSet) {
	f.StringVar(&q.target, "target", "0.1%", "uncertainty wished for, relative to the factor")
}

func (q *questions) claimFlags(f *pflag.FlagSet) {
	f.StringVar(&q.claim, "claim", "", "your own factor, judged by the computed one")
	f.StringVar(&q.claimFrom, "claim-from", "", "where that factor came from")
	f.StringVar(&q.claimMesh, "claim-mesh", "", "the finite element mesh that it came from, as in order=2,arc=6: order 1 or 2, elements per 90° of the root")
	f.StringVar(&q.claimTolerance, "claim-tolerance", "3%", "reading tolerance of that factor")
}

func (q *questions) options() (scf.Options, error) {
	nu, err := plainNumber(q.nu)
	if err != nil || nu < 0 || nu >= 0.5 {
		return scf.Options{}, &inputError{text: "--nu " + quoted(q.nu) + ": not a Poisson's ratio", hint: "metals lie near 0.3; give a number from 0 up to, but not including, 0.5"}
	}
	if q.forceLine != scf.ForceLineNet && q.forceLine != scf.ForceLineGross {
		return scf.Options{}, &inputError{text: "--force-line " + quoted(q.forceLine) + ": no such line", hint: "net (middle of the net section) or gross (middle of the gross section)"}
	}
	return scf.Options{Nu: nu, ForceLine: q.forceLine}, nil
}

// loads checks the loads asked for against what the family carries.
func (q *questions) loads(family *scf.Family) ([]scf.Load, error) {
	var loads []scf.Load
	for _, name := range q.load {
		load := scf.Load(strings.TrimSpace(name))
		if !family.Carries(load) {
			return nil, &inputError{text: fmt.Sprintf("--load %s: %s does not carry it", quoted(name), family.Name), hint: "its loads are " + loadNames(family)}
		}
		for _, l := range loads {
			if l == load {
				return nil, &inputError{text: "--load " + name + ": given twice", hint: "name each load once"}
			}
		}
		loads = append(loads, load)
	}
	return loads, nil
}

func loadNames(family *scf.Family) string {
	var names []string
	for _, l := range family.Loads {
		names = append(names, string(l))
	}
	return strings.Join(names, ", ")
}

// verify collects what the flags ask of a check of the given loads.
func (q *questions) verify(loads []scf.Load) (verify.Options, error) {
	var o verify.Options
	if q.target == "" { // the command has no such flag
		q.target = "0.1%"
	}
	target, err := share(q.target)
	if err != nil || target < 1e-9 || target > 0.1 {
		return o, &inputError{text: "--target " + quoted(q.target) + ": not a target", hint: "give a share of the factor from 1e-9 to 0.1, as in 0.1% or 0.001"}
	}
	o.Target = target
	if q.claim == "" {
		if q.claimFrom != "" {
			return o, &inputError{text: "--claim-from without --claim", hint: "give the factor itself with --claim"}
		}
		if q.claimMesh != "" {
			return o, &inputError{text: "--claim-mesh without --claim", hint: "give the factor itself with --claim"}
		}
		if q.flags.Changed("claim-tolerance") {
			return o, &inputError{text: "--claim-tolerance without --claim", hint: "give the factor itself with --claim"}
		}
		return o, nil
	}
	if len(loads) != 1 {
		return o, &inputError{text: "--claim " + q.claim + ": for which load?", hint: "name the one load that it is meant for with --load"}
	}
	claim, err := q.claimed()
	o.Claims = map[scf.Load]*verify.Claim{loads[0]: claim}
	return o, err
}

func (q *questions) claimed() (*verify.Claim, error) {
	factor, err := plainNumber(q.claim)
	if err != nil || factor <= 0 || factor > 1e6 {
		return nil, &inputError{text: "--claim " + quoted(q.claim) + ": not a stress concentration factor", hint: "give a plain number, as in 1.85"}
	}
	tolerance, err := share(q.claimTolerance)
	if err != nil || tolerance < 0 || tolerance > 0.5 {
		return nil, &inputError{text: "--claim-tolerance " + quoted(q.claimTolerance) + ": not a tolerance", hint: "give a share of the claim, as in 3% or 0.03"}
	}
	claim := &verify.Claim{Factor: factor, LastDigit: specimen.LastDigit(q.claim), Reading: tolerance, From: q.claimFrom}
	if q.claimMesh == "" {
		return claim, nil
	}
	density, err := specimen.ParseDensity(q.claimMesh)
	claim.Mesh = &density
	return claim, named(err, "--claim-mesh")
}

// plainNumber reads a plain finite decimal number.
func plainNumber(text string) (float64, error) {
	if strings.ContainsAny(text, "xX_pP") {
		return 0, strconv.ErrSyntax
	}
	v, err := strconv.ParseFloat(text, 64)
	if err == nil && (math.IsNaN(v) || math.IsInf(v, 0)) {
		return 0, strconv.ErrRange
	}
	return v, err
}

// share reads a share, plain or in percent.
func share(text string) (float64, error) {
	plain, percent := strings.CutSuffix(strings.TrimSpace(text), "%")
	v, err := plainNumber(strings.TrimSpace(plain))
	if percent {
		v /= 100
	}
	return v, err
}
