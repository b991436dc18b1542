package main

import (
	"runtime/debug"

	"notchproof/scf"
	"notchproof/verify/specimen"
)

// A shape is a family with dimensions that need not be complete, and the loads
// that are asked for.
type shape struct {
	family  *scf.Family
	dims    scf.Dims
	unit    string
	options scf.Options
	loads   []scf.Load
	title   string
	file    *specimen.File // nil: from the command line
}

// shape reads PART for commands that vary its dimensions.
func (q *questions) shape(args []string) (*shape, error) {
	if len(args) > 0 && isFile(args[0]) {
		job, err := q.job(args)
		if err != nil {
			return nil, err
		}
		if job.part.Family == nil {
			return nil, &inputError{text: quoted(args[0]) + ": an outline of one's own has no named dimensions", hint: "give a family with its dimensions, or a part file that names one"}
		}
		return &shape{job.part.Family, job.part.Given, job.part.Unit, job.part.Options, job.loads, job.part.Title, job.file}, nil
	}
	if len(args) == 0 {
		_, err := partOf(args, scf.Options{})
		return nil, err
	}
	family, err := familyOf(args[0])
	if err != nil {
		return nil, err
	}
	s := &shape{family: family}
	if s.dims, s.unit, err = dimensions(family, args[1:]); err != nil {
		return nil, err
	}
	if s.options, err = q.options(); err != nil {
		return nil, err
	}
	s.loads, err = q.loads(family)
	return s, err
}

// load is the one load that is meant.
func (s *shape) load() (scf.Load, error) {
	loads := s.loads
	if len(loads) == 0 {
		loads = s.family.Loads
	}
	if len(loads) != 1 {
		return "", &inputError{text: "for which load?", hint: "name one with --load: " + loadNames(s.family)}
	}
	return loads[0], nil
}

// collectSometimes lets memory be used again in a run that solves dozens of
// parts: fresh pages cost more than the collector does.
func collectSometimes() { debug.SetGCPercent(400) }
