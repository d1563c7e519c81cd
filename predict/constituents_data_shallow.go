package predict

// compounds holds the shallow-water constituents in use with what they are made
// of. The sums of those among the 37 are Schureman's, table 2a; the others are
// names of the standard list of the International Hydrographic Organization or
// made like them, from memory, and say themselves what they are made of.
// Multiples, constants and node rules follow by combine. Where two names would
// have everything alike (MQ3 and NO3, MNO5 and 2MQ5) one stands here, and the
// other is read by rule and found to be the same.
var compounds = []struct {
	name string
	sum  []ingredient
}{
	// One cycle a day.
	{"NO1", []ingredient{{1, "N2"}, {-1, "O1"}}},
	{"MP1", []ingredient{{1, "M2"}, {-1, "P1"}}},
	{"2PO1", []ingredient{{2, "P1"}, {-1, "O1"}}},

	// Two cycles a day.
	{"2MN2S2", []ingredient{{2, "M2"}, {1, "N2"}, {-2, "S2"}}},
	{"2NS2", []ingredient{{2, "N2"}, {-1, "S2"}}},
	{"3M2S2", []ingredient{{3, "M2"}, {-2, "S2"}}},
	{"MNS2", []ingredient{{1, "M2"}, {1, "N2"}, {-1, "S2"}}},
	{"MNUS2", []ingredient{{1, "M2"}, {1, "NU2"}, {-1, "S2"}}},
	{"MNK2", []ingredient{{1, "M2"}, {1, "N2"}, {-1, "K2"}}},
	{"2MS2K2", []ingredient{{2, "M2"}, {1, "S2"}, {-2, "K2"}}},
	{"2MK2", []ingredient{{2, "M2"}, {-1, "K2"}}},
	{"2MS2", []ingredient{{2, "M2"}, {-1, "S2"}}},
	{"2KN2S2", []ingredient{{2, "K2"}, {1, "N2"}, {-2, "S2"}}},
	{"MSK2", []ingredient{{1, "M2"}, {1, "S2"}, {-1, "K2"}}},
	{"MKS2", []ingredient{{1, "M2"}, {1, "K2"}, {-1, "S2"}}},
	{"M2(KS)2", []ingredient{{1, "M2"}, {2, "K2"}, {-2, "S2"}}},
	{"SNM2", []ingredient{{1, "S2"}, {1, "N2"}, {-1, "M2"}}},
	{"2MN2", []ingredient{{2, "M2"}, {-1, "N2"}}},
	{"NKM2", []ingredient{{1, "N2"}, {1, "K2"}, {-1, "M2"}}},
	{"MSNU2", []ingredient{{1, "M2"}, {1, "S2"}, {-1, "NU2"}}},
	{"MSN2", []ingredient{{1, "M2"}, {1, "S2"}, {-1, "N2"}}},
	{"2SM2", []ingredient{{2, "S2"}, {-1, "M2"}}},
	{"2MS2N2", []ingredient{{2, "M2"}, {1, "S2"}, {-2, "N2"}}},
	{"SKM2", []ingredient{{1, "S2"}, {1, "K2"}, {-1, "M2"}}},
	{"2SN2", []ingredient{{2, "S2"}, {-1, "N2"}}},
	{"3S2M2", []ingredient{{3, "S2"}, {-2, "M2"}}},

	// Three cycles a day.
	{"NQ3", []ingredient{{1, "N2"}, {1, "Q1"}}},
	{"MQ3", []ingredient{{1, "M2"}, {1, "Q1"}}},
	{"MO3", []ingredient{{1, "M2"}, {1, "O1"}}},
	{"2MK3", []ingredient{{2, "M2"}, {-1, "K1"}}},
	{"2MP3", []ingredient{{2, "M2"}, {-1, "P1"}}},
	{"NK3", []ingredient{{1, "N2"}, {1, "K1"}}},
	{"SO3", []ingredient{{1, "S2"}, {1, "O1"}}},
	{"MK3", []ingredient{{1, "M2"}, {1, "K1"}}},
	{"2MQ3", []ingredient{{2, "M2"}, {-1, "Q1"}}},
	{"SP3", []ingredient{{1, "S2"}, {1, "P1"}}},
	{"SK3", []ingredient{{1, "S2"}, {1, "K1"}}},
	{"2SO3", []ingredient{{2, "S2"}, {-1, "O1"}}},

	// Four cycles a day.
	{"2MNS4", []ingredient{{2, "M2"}, {1, "N2"}, {-1, "S2"}}},
	{"3MK4", []ingredient{{3, "M2"}, {-1, "K2"}}},
	{"N4", []ingredient{{2, "N2"}}},
	{"3MS4", []ingredient{{3, "M2"}, {-1, "S2"}}},
	{"MN4", []ingredient{{1, "M2"}, {1, "N2"}}},
	{"MNU4", []ingredient{{1, "M2"}, {1, "NU2"}}},
	{"2MSK4", []ingredient{{2, "M2"}, {1, "S2"}, {-1, "K2"}}},
	{"M4", []ingredient{{2, "M2"}}},
	{"2MKS4", []ingredient{{2, "M2"}, {1, "K2"}, {-1, "S2"}}},
	{"SN4", []ingredient{{1, "S2"}, {1, "N2"}}},
	{"3MN4", []ingredient{{3, "M2"}, {-1, "N2"}}},
	{"NK4", []ingredient{{1, "N2"}, {1, "K2"}}},
	{"MT4", []ingredient{{1, "M2"}, {1, "T2"}}},
	{"MS4", []ingredient{{1, "M2"}, {1, "S2"}}},
	{"MK4", []ingredient{{1, "M2"}, {1, "K2"}}},
	{"2SNM4", []ingredient{{2, "S2"}, {1, "N2"}, {-1, "M2"}}},
	{"2MSN4", []ingredient{{2, "M2"}, {1, "S2"}, {-1, "N2"}}},
	{"2MKN4", []ingredient{{2, "M2"}, {1, "K2"}, {-1, "N2"}}},
	{"ST4", []ingredient{{1, "S2"}, {1, "T2"}}},
	{"S4", []ingredient{{2, "S2"}}},
	{"SK4", []ingredient{{1, "S2"}, {1, "K2"}}},
	{"2SMN4", []ingredient{{2, "S2"}, {1, "M2"}, {-1, "N2"}}},
	{"3SM4", []ingredient{{3, "S2"}, {-1, "M2"}}},
	{"2SKM4", []ingredient{{2, "S2"}, {1, "K2"}, {-1, "M2"}}},

	// Five cycles a day.
	{"MNO5", []ingredient{{1, "M2"}, {1, "N2"}, {1, "O1"}}},
	{"2MO5", []ingredient{{2, "M2"}, {1, "O1"}}},
	{"3MP5", []ingredient{{3, "M2"}, {-1, "P1"}}},
	{"NSO5", []ingredient{{1, "N2"}, {1, "S2"}, {1, "O1"}}},
	{"MNK5", []ingredient{{1, "M2"}, {1, "N2"}, {1, "K1"}}},
	{"2MP5", []ingredient{{2, "M2"}, {1, "P1"}}},
	{"2MK5", []ingredient{{2, "M2"}, {1, "K1"}}},
	{"MSP5", []ingredient{{1, "M2"}, {1, "S2"}, {1, "P1"}}},
	{"MSK5", []ingredient{{1, "M2"}, {1, "S2"}, {1, "K1"}}},
	{"2SK5", []ingredient{{2, "S2"}, {1, "K1"}}},

	// Six cycles a day.
	{"3MNS6", []ingredient{{3, "M2"}, {1, "N2"}, {-1, "S2"}}},
	{"4MK6", []ingredient{{4, "M2"}, {-1, "K2"}}},
	{"2NM6", []ingredient{{2, "N2"}, {1, "M2"}}},
	{"4MS6", []ingredient{{4, "M2"}, {-1, "S2"}}},
	{"2MN6", []ingredient{{2, "M2"}, {1, "N2"}}},
	{"2MNU6", []ingredient{{2, "M2"}, {1, "NU2"}}},
	{"3MSK6", []ingredient{{3, "M2"}, {1, "S2"}, {-1, "K2"}}},
	{"M6", []ingredient{{3, "M2"}}},
	{"3MKS6", []ingredient{{3, "M2"}, {1, "K2"}, {-1, "S2"}}},
	{"MSN6", []ingredient{{1, "M2"}, {1, "S2"}, {1, "N2"}}},
	{"4MN6", []ingredient{{4, "M2"}, {-1, "N2"}}},
	{"MNK6", []ingredient{{1, "M2"}, {1, "N2"}, {1, "K2"}}},
	{"2MT6", []ingredient{{2, "M2"}, {1, "T2"}}},
	{"2MS6", []ingredient{{2, "M2"}, {1, "S2"}}},
	{"2MK6", []ingredient{{2, "M2"}, {1, "K2"}}},
	{"2SN6", []ingredient{{2, "S2"}, {1, "N2"}}},
	{"3MSN6", []ingredient{{3, "M2"}, {1, "S2"}, {-1, "N2"}}},
	{"NSK6", []ingredient{{1, "N2"}, {1, "S2"}, {1, "K2"}}},
	{"3MKN6", []ingredient{{3, "M2"}, {1, "K2"}, {-1, "N2"}}},
	{"2SM6", []ingredient{{2, "S2"}, {1, "M2"}}},
	{"MSK6", []ingredient{{1, "M2"}, {1, "S2"}, {1, "K2"}}},
	{"2KM6", []ingredient{{2, "K2"}, {1, "M2"}}},
	{"S6", []ingredient{{3, "S2"}}},

	// Seven cycles a day.
	{"2MNO7", []ingredient{{2, "M2"}, {1, "N2"}, {1, "O1"}}},
	{"3MO7", []ingredient{{3, "M2"}, {1, "O1"}}},
	{"2MNK7", []ingredient{{2, "M2"}, {1, "N2"}, {1, "K1"}}},
	{"2MSO7", []ingredient{{2, "M2"}, {1, "S2"}, {1, "O1"}}},
	{"3MK7", []ingredient{{3, "M2"}, {1, "K1"}}},
	{"2MSK7", []ingredient{{2, "M2"}, {1, "S2"}, {1, "K1"}}},

	// Eight cycles a day.
	{"2(MN)8", []ingredient{{2, "M2"}, {2, "N2"}}},
	{"5MS8", []ingredient{{5, "M2"}, {-1, "S2"}}},
	{"3MN8", []ingredient{{3, "M2"}, {1, "N2"}}},
	{"3MNU8", []ingredient{{3, "M2"}, {1, "NU2"}}},
	{"M8", []ingredient{{4, "M2"}}},
	{"2MSN8", []ingredient{{2, "M2"}, {1, "S2"}, {1, "N2"}}},
	{"2MNK8", []ingredient{{2, "M2"}, {1, "N2"}, {1, "K2"}}},
	{"3MS8", []ingredient{{3, "M2"}, {1, "S2"}}},
	{"3MK8", []ingredient{{3, "M2"}, {1, "K2"}}},
	{"2SMN8", []ingredient{{2, "S2"}, {1, "M2"}, {1, "N2"}}},
	{"MSNK8", []ingredient{{1, "M2"}, {1, "S2"}, {1, "N2"}, {1, "K2"}}},
	{"2(MS)8", []ingredient{{2, "M2"}, {2, "S2"}}},
	{"2MSK8", []ingredient{{2, "M2"}, {1, "S2"}, {1, "K2"}}},
	{"3SM8", []ingredient{{3, "S2"}, {1, "M2"}}},
	{"2SMK8", []ingredient{{2, "S2"}, {1, "M2"}, {1, "K2"}}},
	{"S8", []ingredient{{4, "S2"}}},

	// Nine cycles a day.
	{"3MNK9", []ingredient{{3, "M2"}, {1, "N2"}, {1, "K1"}}},
	{"4MK9", []ingredient{{4, "M2"}, {1, "K1"}}},
	{"3MSK9", []ingredient{{3, "M2"}, {1, "S2"}, {1, "K1"}}},

	// Ten cycles a day.
	{"3M2N10", []ingredient{{3, "M2"}, {2, "N2"}}},
	{"4MN10", []ingredient{{4, "M2"}, {1, "N2"}}},
	{"2(MN)S10", []ingredient{{2, "M2"}, {2, "N2"}, {1, "S2"}}},
	{"M10", []ingredient{{5, "M2"}}},
	{"3MSN10", []ingredient{{3, "M2"}, {1, "S2"}, {1, "N2"}}},
	{"4MS10", []ingredient{{4, "M2"}, {1, "S2"}}},
	{"4MK10", []ingredient{{4, "M2"}, {1, "K2"}}},
	{"2MNSK10", []ingredient{{2, "M2"}, {1, "N2"}, {1, "S2"}, {1, "K2"}}},
	{"3M2S10", []ingredient{{3, "M2"}, {2, "S2"}}},
	{"3MSK10", []ingredient{{3, "M2"}, {1, "S2"}, {1, "K2"}}},

	// Eleven cycles a day.
	{"4MSK11", []ingredient{{4, "M2"}, {1, "S2"}, {1, "K1"}}},

	// Twelve cycles a day.
	{"5MN12", []ingredient{{5, "M2"}, {1, "N2"}}},
	{"M12", []ingredient{{6, "M2"}}},
	{"4MSN12", []ingredient{{4, "M2"}, {1, "S2"}, {1, "N2"}}},
	{"5MS12", []ingredient{{5, "M2"}, {1, "S2"}}},
	{"3M2SN12", []ingredient{{3, "M2"}, {2, "S2"}, {1, "N2"}}},
	{"4M2S12", []ingredient{{4, "M2"}, {2, "S2"}}},
	{"4MSK12", []ingredient{{4, "M2"}, {1, "S2"}, {1, "K2"}}},
}
