package scf

// Central elliptic hole in a strip under tension, with a across the load and b
// along it: Roark, 7th ed., Table 17.1, and Pilkey & Pilkey, 3rd ed., chart
// 4.51, print one cubic with different ranges. Here x = 2a/W and q = a/b; on
// the net section P / ((W − 2a) t). Coefficients from memory.

var ellipticHole = [4]abc{
	{1.109, -0.188, 2.086},
	{-0.486, 0.213, -2.588},
	{3.816, -5.510, 4.638},
	{-2.438, 5.485, -4.126},
}

var roarkEllipticHole = cubicCase{
	id: "roark-7-ellipse", source: roark7 + "central elliptical hole, tension", sureness: Memory,
	ratio: "a/b",
	fit:   cubic{{0.5, 10, ellipticHole}},
}

var pilkeyEllipticHole = cubicCase{
	id: "pilkey-4.51", source: pilkey3 + "chart 4.51", sureness: Memory,
	ratio: "a/b",
	fit:   cubic{{1, 8, ellipticHole}},
}
