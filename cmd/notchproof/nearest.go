package main

// nearest picks the name that takes the fewest edits to reach, the first of
// equals; empty when even that one is more than half rewritten.
func nearest(word string, names []string) string {
	best, least := "", len(word)/2+2
	for _, n := range names {
		if d := edits(word, n); d < least {
			best, least = n, d
		}
	}
	return best
}

// edits is the distance of Levenshtein (1966): insertions, deletions and
// replacements of bytes.
func edits(a, b string) int {
	row := make([]int, len(b)+1)
	for j := range row {
		row[j] = j
	}
	for i := range len(a) {
		diagonal := row[0]
		row[0] = i + 1
		for j := range len(b) {
			replace := diagonal
			if a[i] != b[j] {
				replace++
			}
			diagonal = row[j+1]
			row[j+1] = min(replace, row[j]+1, row[j+1]+1)
		}
	}
	return row[len(b)]
}
