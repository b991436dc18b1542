package scf

// Roark, 7th ed., Table 17.1 case 3: flat bar, a U notch on one side. Here
// x = h/D. 3a is tension with the force through the middle of the net section,
// 3b bending in the plane. Case 4 (one V notch) is in leven_frocht.go.

var roarkEdgeNotchTension = cubicCase{
	id: "roark-7-3", source: roark7 + "case 3a (tension)", sureness: Sure,
	fit: cubic{
		{0.5, 4, [4]abc{
			{0.721, 2.394, -0.127},
			{1.978, -11.489, 2.211},
			{-4.413, 18.751, -4.596},
			{2.714, -9.655, 2.512},
		}},
	},
}

var roarkEdgeNotchBending = cubicCase{
	id: "roark-7-3", source: roark7 + "case 3b (in-plane bending)", sureness: Sure,
	fit: cubic{
		{0.5, 4, [4]abc{
			{0.721, 2.394, -0.127},
			{-0.426, -8.827, 1.518},
			{2.161, 10.968, -2.455},
			{-1.456, -4.535, 1.064},
		}},
	},
}

func roarkEdgeNotch(load Load, n edgeNotch) Value {
	if load == Bending {
		return roarkEdgeNotchBending.value(n.q(), n.x())
	}
	return roarkEdgeNotchTension.value(n.q(), n.x())
}
