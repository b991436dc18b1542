package main

// starts were found by the command with -search.
var starts = []start{
	{1, structure{1, 0, 0}, 1},     // 1 points
	{2, structure{0, 1, 0}, 1},     // 3 points
	{4, structure{0, 2, 0}, 1},     // 6 points
	{5, structure{1, 2, 0}, 1},     // 7 points
	{6, structure{0, 2, 1}, 1},     // 12 points
	{7, structure{0, 3, 1}, 1},     // 15 points
	{8, structure{1, 3, 1}, 1},     // 16 points
	{9, structure{1, 4, 1}, 3},     // 19 points
	{10, structure{1, 4, 2}, 13},   // 25 points
	{11, structure{1, 5, 2}, 2},    // 28 points
	{12, structure{0, 5, 3}, 2},    // 33 points
	{13, structure{1, 6, 3}, 11},   // 37 points
	{14, structure{0, 6, 4}, 8},    // 42 points
	{15, structure{1, 6, 5}, 82},   // 49 points
	{16, structure{1, 6, 6}, 3},    // 55 points
	{17, structure{0, 8, 6}, 403},  // 60 points
	{18, structure{1, 6, 8}, 45},   // 67 points
	{19, structure{1, 8, 8}, 31},   // 73 points
	{20, structure{1, 9, 9}, 2838}, // 82 points
}
