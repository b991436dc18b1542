package evidence

// Cases lists what proves the most in the least time, a few seconds in all: the
// fields first, then published values, arithmetic, and the program as a whole.
func Cases() []Case {
	return []Case{
		patchTest(),
		convergence(),
		kirsch(),
		inglis(),
		lame(),
		spinning(),
		goodier(),
		creagerParis(),
		neuberCase(),
		wedges(),
		semicircular(),
		ling(),
		le1(),
		celik(),
		sections(),
		program(),
	}
}
