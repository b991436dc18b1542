package scf

// A TableRow is one printed entry: where, and the factor.
type TableRow struct {
	At, Factor float64
}

// Howland is the table of R. C. J. Howland, Phil. Trans. R. Soc. A 229 (1930)
// 49, as textbooks quote it: a circular hole in the middle of a strip under
// tension, the factor on the gross section over d/W. From memory, unchecked;
// the old figures are up to 0.7 % low, so no test tighter than 1 % may rest on
// them.
func Howland() []TableRow {
	return []TableRow{
		{0, 3.00},
		{0.1, 3.03},
		{0.2, 3.14},
		{0.3, 3.36},
		{0.4, 3.74},
		{0.5, 4.32},
	}
}
