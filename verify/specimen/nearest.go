package specimen

// Nearest picks the name that takes the fewest edits to reach from a word, the
// first of equals; empty when all take more than the given number of them.
func Nearest(word string, names []string, most int) string {
	best := ""
	for _, n := range names {
		if d := edits(word, n); d <= most {
			best, most = n, d-1
		}
	}
	return best
}

// edits is Levenshtein's distance (1966): insertions, deletions, substitutions.
func edits(a, b string) int {
	x, y := []rune(a), []rune(b)
	row := make([]int, len(y)+1)
	for j := range row {
		row[j] = j
	}
	for i := range x {
		diagonal := row[0]
		row[0] = i + 1
		for j := range y {
			cost := 1
			if x[i] == y[j] {
				cost = 0
			}
			diagonal, row[j+1] = row[j+1], min(diagonal+cost, row[j]+1, row[j+1]+1)
		}
	}
	return row[len(y)]
}
