package predict

// constituents holds the 37 constituents in common use: argument multiples
// and constants from Schureman, tables 2 and 2a; equilibrium coefficients from
// Doodson, quoted from memory.
var constituents = []Constituent{
	{"SA", [5]int{0, 0, 1, 0, 0}, 0, solar, 0},
	{"SSA", [5]int{0, 0, 2, 0, 0}, 0, solar, 0.07281},
	{"MM", [5]int{0, 1, 0, -1, 0}, 0, like(nodeMm), 0.08254},
	{"MSF", [5]int{0, 2, -2, 0, 0}, 0, NodeRule{{nodeM2, 1, -1}}, 0.01369},
	{"MF", [5]int{0, 2, 0, 0, 0}, 0, like(nodeMf), 0.15642},

	{"2Q1", [5]int{1, -4, 1, 2, 0}, -90, like(nodeO1), 0.00954},
	{"Q1", [5]int{1, -3, 1, 1, 0}, -90, like(nodeO1), 0.07216},
	{"RHO1", [5]int{1, -3, 3, -1, 0}, -90, like(nodeO1), 0.01371},
	{"O1", [5]int{1, -2, 1, 0, 0}, -90, like(nodeO1), 0.37689},
	{"M1", [5]int{1, -1, 1, 1, 0}, 90, like(nodeM1), 0.02961},
	{"P1", [5]int{1, 0, -1, 0, 0}, -90, solar, 0.17554},
	{"S1", [5]int{1, 0, 0, 0, 0}, 180, solar, 0},
	{"K1", [5]int{1, 0, 1, 0, 0}, 90, like(nodeK1), 0.53050},
	{"J1", [5]int{1, 1, 1, -1, 0}, 90, like(nodeJ1), 0.02964},
	{"OO1", [5]int{1, 2, 1, 0, 0}, 90, like(nodeOO1), 0.01623},

	{"2N2", [5]int{2, -4, 2, 2, 0}, 0, like(nodeM2), 0.02301},
	{"MU2", [5]int{2, -4, 4, 0, 0}, 0, like(nodeM2), 0.02777},
	{"N2", [5]int{2, -3, 2, 1, 0}, 0, like(nodeM2), 0.17387},
	{"NU2", [5]int{2, -3, 4, -1, 0}, 0, like(nodeM2), 0.03303},
	{"M2", [5]int{2, -2, 2, 0, 0}, 0, like(nodeM2), 0.90812},
	{"LAM2", [5]int{2, -1, 0, 1, 0}, 180, like(nodeM2), 0.00670},
	{"L2", [5]int{2, -1, 2, -1, 0}, 180, like(nodeL2), 0.02567},
	{"T2", [5]int{2, 0, -1, 0, 1}, 0, solar, 0.02479},
	{"S2", [5]int{2, 0, 0, 0, 0}, 0, solar, 0.42286},
	{"R2", [5]int{2, 0, 1, 0, -1}, 180, solar, 0.00354},
	{"K2", [5]int{2, 0, 2, 0, 0}, 0, like(nodeK2), 0.11498},
	{"2SM2", [5]int{2, 2, -2, 0, 0}, 0, NodeRule{{nodeM2, 1, -1}}, 0},

	{"2MK3", [5]int{3, -4, 3, 0, 0}, -90, NodeRule{{nodeM2, 2, 2}, {nodeK1, 1, -1}}, 0},
	{"M3", [5]int{3, -3, 3, 0, 0}, 180, NodeRule{{nodeM2, 1.5, 1.5}}, 0},
	{"MK3", [5]int{3, -2, 3, 0, 0}, 90, NodeRule{{nodeM2, 1, 1}, {nodeK1, 1, 1}}, 0},

	{"MN4", [5]int{4, -5, 4, 1, 0}, 0, NodeRule{{nodeM2, 2, 2}}, 0},
	{"M4", [5]int{4, -4, 4, 0, 0}, 0, NodeRule{{nodeM2, 2, 2}}, 0},
	{"MS4", [5]int{4, -2, 2, 0, 0}, 0, like(nodeM2), 0},
	{"S4", [5]int{4, 0, 0, 0, 0}, 0, solar, 0},

	{"M6", [5]int{6, -6, 6, 0, 0}, 0, NodeRule{{nodeM2, 3, 3}}, 0},
	{"S6", [5]int{6, 0, 0, 0, 0}, 0, solar, 0},

	{"M8", [5]int{8, -8, 8, 0, 0}, 0, NodeRule{{nodeM2, 4, 4}}, 0},
}
