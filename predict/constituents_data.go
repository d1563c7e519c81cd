package predict

// The astronomical constituents, in three blocks. In each row stand the name,
// the multiples of T, s, h, p and p1, the constant of the argument in degrees,
// the node rule and the coefficient in the equilibrium tide.
//
// Multiples and constants of those among the 37 in common use are from
// Schureman, tables 2 and 2a, with T counted from midnight; the others are
// Doodson's argument numbers, schedules 1 to 3, quoted from memory, as are all
// coefficients. A node rule that Schureman does not give follows from the part
// of the potential that the term belongs to: those of sin 2I take J1's, those
// of sin I cos^2(I/2) O1's, of sin I sin^2(I/2) OO1's, of cos^4(I/2) M2's, of
// sin^2 I in the semidiurnal tide KJ2's and in the long-period one Mf's, and
// those of 2/3 - sin^2 I Mm's (Schureman 73 to 79).

// longPeriod holds the terms of less than a cycle a day. SA is reckoned from
// the equinox, as Schureman does: see remarks.
var longPeriod = []Constituent{
	{Name: "SA", Arg: [5]int{0, 0, 1, 0, 0}, Node: solar},
	{Name: "SSA", Arg: [5]int{0, 0, 2, 0, 0}, Node: solar, Equilibrium: 0.07281},
	{Name: "STA", Arg: [5]int{0, 0, 3, 0, -1}, Node: solar, Equilibrium: 0.00427},
	{Name: "MSM", Arg: [5]int{0, 1, -2, 1, 0}, Node: like(nodeMm), Equilibrium: 0.01578},
	{Name: "MM", Arg: [5]int{0, 1, 0, -1, 0}, Node: like(nodeMm), Equilibrium: 0.08254},
	{Name: "MSF", Arg: [5]int{0, 2, -2, 0, 0}, Node: NodeRule{{nodeM2, 1, -1}}, Equilibrium: 0.01369},
	{Name: "MF", Arg: [5]int{0, 2, 0, 0, 0}, Node: like(nodeMf), Equilibrium: 0.15642},
	{Name: "MSTM", Arg: [5]int{0, 3, -2, 1, 0}, Node: like(nodeMf), Equilibrium: 0.00569},
	{Name: "MTM", Arg: [5]int{0, 3, 0, -1, 0}, Node: like(nodeMf), Equilibrium: 0.02995},
	{Name: "MSQM", Arg: [5]int{0, 4, -2, 0, 0}, Node: like(nodeMf), Equilibrium: 0.00478},
	{Name: "MQM", Arg: [5]int{0, 4, 0, -2, 0}, Node: like(nodeMf), Equilibrium: 0.00396},
}

// diurnal holds the terms of one cycle a day.
var diurnal = []Constituent{
	{Name: "ALP1", Arg: [5]int{1, -5, 3, 1, 0}, Phase: -90, Node: like(nodeO1), Equilibrium: 0.00278},
	{Name: "2Q1", Arg: [5]int{1, -4, 1, 2, 0}, Phase: -90, Node: like(nodeO1), Equilibrium: 0.00954},
	{Name: "SIG1", Arg: [5]int{1, -4, 3, 0, 0}, Phase: -90, Node: like(nodeO1), Equilibrium: 0.01153},
	{Name: "Q1", Arg: [5]int{1, -3, 1, 1, 0}, Phase: -90, Node: like(nodeO1), Equilibrium: 0.07216},
	{Name: "RHO1", Arg: [5]int{1, -3, 3, -1, 0}, Phase: -90, Node: like(nodeO1), Equilibrium: 0.01371},
	{Name: "O1", Arg: [5]int{1, -2, 1, 0, 0}, Phase: -90, Node: like(nodeO1), Equilibrium: 0.37689},
	{Name: "TAU1", Arg: [5]int{1, -2, 3, 0, 0}, Phase: 90, Node: like(nodeJ1), Equilibrium: 0.00491},
	{Name: "BET1", Arg: [5]int{1, -1, -1, 1, 0}, Phase: 90, Node: like(nodeJ1), Equilibrium: 0.00278},
	{Name: "M1", Arg: [5]int{1, -1, 1, 1, 0}, Phase: 90, Node: like(nodeM1), Equilibrium: 0.02961},
	{Name: "CHI1", Arg: [5]int{1, -1, 3, -1, 0}, Phase: 90, Node: like(nodeJ1), Equilibrium: 0.00566},
	{Name: "PI1", Arg: [5]int{1, 0, -2, 0, 1}, Phase: -90, Node: solar, Equilibrium: 0.01029},
	{Name: "P1", Arg: [5]int{1, 0, -1, 0, 0}, Phase: -90, Node: solar, Equilibrium: 0.17554},
	{Name: "S1", Arg: [5]int{1, 0, 0, 0, 0}, Phase: 180, Node: solar},
	{Name: "K1", Arg: [5]int{1, 0, 1, 0, 0}, Phase: 90, Node: like(nodeK1), Equilibrium: 0.53050},
	{Name: "PSI1", Arg: [5]int{1, 0, 2, 0, -1}, Phase: 90, Node: solar, Equilibrium: 0.00423},
	{Name: "PHI1", Arg: [5]int{1, 0, 3, 0, 0}, Phase: 90, Node: solar, Equilibrium: 0.00756},
	{Name: "THE1", Arg: [5]int{1, 1, -1, 1, 0}, Phase: 90, Node: like(nodeJ1), Equilibrium: 0.00566},
	{Name: "J1", Arg: [5]int{1, 1, 1, -1, 0}, Phase: 90, Node: like(nodeJ1), Equilibrium: 0.02964},
	{Name: "SO1", Arg: [5]int{1, 2, -1, 0, 0}, Phase: 90, Node: like(nodeJ1), Equilibrium: 0.00492},
	{Name: "OO1", Arg: [5]int{1, 2, 1, 0, 0}, Phase: 90, Node: like(nodeOO1), Equilibrium: 0.01623},
	{Name: "UPS1", Arg: [5]int{1, 3, 1, -1, 0}, Phase: 90, Node: like(nodeOO1), Equilibrium: 0.00311},
}

// semidiurnal holds the terms of two cycles a day, and the lunar one of three.
var semidiurnal = []Constituent{
	{Name: "3N2", Arg: [5]int{2, -5, 2, 3, 0}, Node: like(nodeM2), Equilibrium: 0.00259},
	{Name: "EPS2", Arg: [5]int{2, -5, 4, 1, 0}, Node: like(nodeM2), Equilibrium: 0.00671},
	{Name: "2N2", Arg: [5]int{2, -4, 2, 2, 0}, Node: like(nodeM2), Equilibrium: 0.02301},
	{Name: "MU2", Arg: [5]int{2, -4, 4, 0, 0}, Node: like(nodeM2), Equilibrium: 0.02777},
	{Name: "N2", Arg: [5]int{2, -3, 2, 1, 0}, Node: like(nodeM2), Equilibrium: 0.17387},
	{Name: "NU2", Arg: [5]int{2, -3, 4, -1, 0}, Node: like(nodeM2), Equilibrium: 0.03303},
	{Name: "GAM2", Arg: [5]int{2, -2, 0, 2, 0}, Phase: 180, Node: like(nodeM2), Equilibrium: 0.00273},
	{Name: "ALF2", Arg: [5]int{2, -2, 1, 0, 1}, Phase: 180, Node: like(nodeM2), Equilibrium: 0.00313},
	{Name: "M2", Arg: [5]int{2, -2, 2, 0, 0}, Node: like(nodeM2), Equilibrium: 0.90812},
	{Name: "BET2", Arg: [5]int{2, -2, 3, 0, -1}, Node: like(nodeM2), Equilibrium: 0.00277},
	{Name: "LAM2", Arg: [5]int{2, -1, 0, 1, 0}, Phase: 180, Node: like(nodeM2), Equilibrium: 0.00670},
	{Name: "L2", Arg: [5]int{2, -1, 2, -1, 0}, Phase: 180, Node: like(nodeL2), Equilibrium: 0.02567},
	{Name: "T2", Arg: [5]int{2, 0, -1, 0, 1}, Node: solar, Equilibrium: 0.02479},
	{Name: "S2", Arg: [5]int{2, 0, 0, 0, 0}, Node: solar, Equilibrium: 0.42286},
	{Name: "R2", Arg: [5]int{2, 0, 1, 0, -1}, Phase: 180, Node: solar, Equilibrium: 0.00354},
	{Name: "K2", Arg: [5]int{2, 0, 2, 0, 0}, Node: like(nodeK2), Equilibrium: 0.11498},
	{Name: "ZET2", Arg: [5]int{2, 1, 0, 1, 0}, Node: like(nodeKJ2), Equilibrium: 0.00123},
	{Name: "ETA2", Arg: [5]int{2, 1, 2, -1, 0}, Node: like(nodeKJ2), Equilibrium: 0.00643},
	{Name: "M3", Arg: [5]int{3, -3, 3, 0, 0}, Phase: 180, Node: NodeRule{{nodeM2, 1.5, 1.5}}},
}
