package scf

// What is known of the published fits: their deviation from converged
// independent solutions with ν = 0.3, over D/d 1.02 to 3 and r/d 0.02 to 0.3,
// inside each fit's own range. A fit that is low is unsafe. These texts
// explain a difference; no tolerance is derived from them.
const (
	biasFlatShoulderTension  = biasBasis + "fits of this case are 3 % low on average, 10 % low at worst (r/d = 0.02), 5 % high at most"
	biasFlatShoulderBending  = biasBasis + "fits of this case are 3 % low on average, 9 % low at worst (r/d = 0.02), 1 % high at most"
	biasRoundShoulderTension = biasBasis + "fits of this case are 10 % low on average, from 2 % low to 21 % low (r/d = 0.02)"
	biasRoundShoulderBending = biasBasis + "fits of this case are 2 to 3 % low on average, 10 % low at worst, 4 % high at most"
	biasRoundShoulderTorsion = biasBasis + "fits of this case are 1 % high on average, 2 % low at worst, 3 % high at most"
	biasTipton               = biasBasis + "this fit is 0.3 % high on average, 0.3 % low at worst, 1.2 % high at most"
	biasTwoNotchesTension    = biasBasis + "fits of this case are 3 to 7 % low on average, 11 % low at worst, 2 % high at most"
	biasTwoNotchesBending    = biasBasis + "fits of this case are 0 to 3 % high on average, 10 % low at worst, 11 % high at most"
	biasGrooveTension        = biasBasis + "fits of this case are 2 % low on average, 10 % low at worst, 7 % high at most"
	biasGrooveBending        = biasBasis + "fits of this case are 1 % low on average, 11 % low at worst, 6 % high at most"
	biasGrooveTorsion        = biasBasis + "fits of this case are 1 % low on average, 15 % low at worst, 5 % high at most"
	biasStripHole            = biasBasisHole + "fits of this case are 0.5 % low on average and 0.8 % low at worst"
	biasStripHoleHeywood     = biasBasisHole + "this fit is 2 % low at worst and never high"

	biasBasis     = "against converged solutions (ν = 0.3; D/d 1.02 to 3, r/d 0.02 to 0.3) "
	biasBasisHole = "against converged solutions "
)
