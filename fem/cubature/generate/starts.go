package main

// starts were found by the command with -search.
var starts = []start{
	{1, structure{1, 0, 0}, 1},   // 1 points
	{2, structure{0, 1, 0}, 1},   // 3 points
	{4, structure{0, 2, 0}, 1},   // 6 points
	{5, structure{1, 2, 0}, 4},   // 7 points
	{6, structure{0, 2, 1}, 2},   // 12 points
	{7, structure{0, 3, 1}, 1},   // 15 points
	{8, structure{1, 3, 1}, 3},   // 16 points
	{9, structure{1, 4, 1}, 1},   // 19 points
	{10, structure{1, 4, 2}, 20}, // 25 points
}
