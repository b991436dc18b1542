package verify

import "notchproof/scf"

// Options say what is asked of a check. The zero value is the default.
type Options struct {
	// Target is the uncertainty wished for, relative to the factor; 0: 0.001.
	Target float64
	// Claims are the user's own factors, by load; a load without one is judged
	// by the handbook.
	Claims map[scf.Load]*Claim
	// Workers is the number of goroutines; 0: one a processor.
	Workers int
	// Progress hears what is being done, rung by rung. It may be called from
	// several goroutines; nil: nobody listens.
	Progress func(text string)
}

const (
	defaultTarget  = 1e-3
	defaultReading = 0.03 // reading tolerance of a claim: common practice for charts
)

func (o Options) target() float64 {
	if o.Target > 0 {
		return o.Target
	}
	return defaultTarget
}

func (o Options) tell(text string) {
	if o.Progress != nil {
		o.Progress(text)
	}
}
