// Package misreading looks for the slip behind a claimed factor that disagrees.
//
// In: the part, the load, the claim as it was written, and what was computed.
// Out: the slips people make whose factor the claim meets, at most three, what
// needs least to go wrong first, each with the chance that a claim wrong for no
// such reason is met as well. A slip asks a wrong question: another load, another
// section, another shape. Its factors are those of the published fits for the
// wrong question, where they cover it, and the one that is computed for it;
// people read charts as well as results. The solver comes in as a function.
//
// # When a slip is suggested
//
// Once every slip has been tried, two to four dozen values stand about the right
// factor, and a window of a claim's 3 % around each would catch most wrong
// claims. What counts is therefore not how close a slip comes but how many wrong
// claims any slip would meet as well.
//
// Take all claims that disagree with the computed factor by up to 30 %, or by as
// much as this one where that is more, on both sides and evenly on a logarithmic
// scale: the null hypothesis of a claim that is wrong for no reason known here.
// The score of a match is the distance of claim and slip on that scale, no less
// than half a unit of the claim's last digit, which is all the claim tells, times
// the cost of the slip, which rises with how much has to go wrong. Around every
// factor of every slip lies a window in which a claim would score at least as
// well. The share of the wrong claims that the windows cover together is the
// chance of a match like this one by accident, all candidates counted. A slip is
// suggested when its chance is at most one in five and the claim lies nearer to
// it than the claim's own tolerance.
//
// So a part with few slips has wide windows and one with many has narrow ones,
// more slips on the list never make more accidents, and two figures can hardly be
// explained. One in five means: if half of all wrong claims come from the list,
// a suggestion is right five times of six.
//
// # Measured
//
// The costs were settled on random parts of one seed, where they shift finds
// from one kind of slip to another; the chance stays what it is. On another seed
// (TestSuggestionsByChance, NOTCHPROOF_LONG=1, 200 parts of all families), claims
// wrong by 4 to 30 % for no reason met a suggestion in 5.6, 16.3 and 18.7 % of
// cases when written with two, three and four figures; of 12000 claims that agree
// none did. Slips written with three figures were among the best three in these
// shares of cases, by how well the factor was read:
//
//	                        exactly   ± 0.5 %   ± 1 %  (standard deviation)
//	line, of 1623             99 %      78 %     57 %
//	table, of 386             96 %      72 %     55 %
//	choice, of 1221           74 %      47 %     31 %
//	free, of 468              28 %      12 %      7 %
package misreading
