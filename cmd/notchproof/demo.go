package main

import (
	"notchproof/scf"
	"notchproof/verify"
	"notchproof/verify/specimen"
)

// demonstration is the part that is checked when none is given: invented, the
// step at the bearing seat of the drive shaft of a harbour ferry's bow thruster.
func demonstration(q *questions) (*job, error) {
	family, _ := scf.Lookup("shaft-shoulder")
	o, err := q.options()
	if err != nil {
		return nil, err
	}
	part, err := specimen.New(family, scf.Dims{"D": 90, "d": 75, "r": 6}, "mm", o)
	if err != nil {
		return nil, err
	}
	part.Title = "bow thruster drive shaft, step at the bearing seat (demonstration)"
	options, err := q.verify([]scf.Load{scf.Torsion})
	if err != nil {
		return nil, err
	}
	options.Claims = map[scf.Load]*verify.Claim{scf.Torsion: {Factor: 1.36, LastDigit: 0.01, From: "design note of the thruster (invented)"}}
	return &job{part: part, loads: []scf.Load{scf.Torsion}, options: options}, nil
}
