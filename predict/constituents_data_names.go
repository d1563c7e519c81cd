package predict

// common holds the names of the 37 constituents in common use.
var common = []string{
	"SA", "SSA", "MM", "MSF", "MF",
	"2Q1", "Q1", "RHO1", "O1", "M1", "P1", "S1", "K1", "J1", "OO1",
	"2N2", "MU2", "N2", "NU2", "M2", "LAM2", "L2", "T2", "S2", "R2", "K2", "2SM2",
	"2MK3", "M3", "MK3", "MN4", "M4", "MS4", "S4", "M6", "S6", "M8",
}

// aliases maps spellings in use to the name in the table of constituents. Most
// are the Greek names of Darwin's and Doodson's letters written out; H1 and H2
// are another hand's ALF2 and BET2, and Schureman's KQ1 is UPS1 with the node
// factor of OO1. From memory.
var aliases = map[string]string{
	"ALF1": "ALP1", "ALPHA1": "ALP1", "SIGMA1": "SIG1", "SGM1": "SIG1",
	"RHO": "RHO1", "RO1": "RHO1", "BETA1": "BET1", "THETA1": "THE1", "FI1": "PHI1",
	"UPSILON1": "UPS1", "KQ1": "UPS1",
	"EPSILON2": "EPS2", "GAMMA2": "GAM2", "ALPHA2": "ALF2", "ALP2": "ALF2", "H1": "ALF2",
	"BETA2": "BET2", "H2": "BET2", "LAMBDA2": "LAM2", "LABDA2": "LAM2", "LDA2": "LAM2", "LA2": "LAM2",
	"ZETA2": "ZET2",
}

// greek holds how the table spells Greek letters.
var greek = map[rune]string{
	'α': "ALF", 'β': "BET", 'γ': "GAM", 'δ': "DEL", 'ε': "EPS", 'ϵ': "EPS", 'ζ': "ZET", 'η': "ETA",
	'θ': "THE", 'ϑ': "THE", 'λ': "LAM", 'μ': "MU", 'µ': "MU", 'ν': "NU", 'π': "PI", 'ρ': "RHO", 'ϱ': "RHO",
	'σ': "SIG", 'τ': "TAU", 'υ': "UPS", 'φ': "PHI", 'ϕ': "PHI", 'χ': "CHI", 'ψ': "PSI",
}

// refused holds names that are in use for two things, or whose meaning we could
// not make sure of: a phase lag read for the wrong one would be off by up to
// half a turn. Each ends the sentence that begins with the name.
var refused = map[string]string{
	"MA2": "means two things: with the Sun's perigee in its argument it is ALF2, also H1, and without it is to be given by its " +
		"extended Doodson number, BZYZZZZ; the lags differ",
	"MB2": "means two things: with the Sun's perigee in its argument it is BET2, also H2, and without it is to be given by its " +
		"extended Doodson number, BZAZZZZ; the lags differ",
	"OQ2": "means two things, O1 + Q1 (BWZAZZB) and what is also named 3N2 (BWZCZZZ): " +
		"write 3N2, or give it by its extended Doodson number",
	"KJ2": "means two things, whose lags differ by 180 degrees: ETA2 (BCZYZZZ) and K1 + J1 (BCZYZZB): " +
		"write ETA2, or give it by its extended Doodson number",
	"LP1": "means two things, whose lags differ by 180 degrees: CHI1 (AZBYZZA) and L2 - P1 (AZBYZZY): " +
		"write CHI1, or give it by its extended Doodson number",
	"K3": "means two things, K1 + K2 and K1 three times: give it by its extended Doodson number",
	"K4": "means two things, K2 twice and K1 four times: give it by its extended Doodson number",
	"K6": "means two things, K2 three times and K1 six times: give it by its extended Doodson number",
	"DEL2": "has no meaning that is beyond doubt: write MKS2 for the twin of M2 that is faster by twice the Sun, MSK2 for the " +
		"slower, or give it by its extended Doodson number",
	"DELTA2": "has no meaning that is beyond doubt: write MKS2 for the twin of M2 that is faster by twice the Sun, MSK2 for the " +
		"slower, or give it by its extended Doodson number",
	"M1A": "is one of the parts of M1, whose letters are not the same everywhere: give it by its extended Doodson number",
	"M1B": "is one of the parts of M1, whose letters are not the same everywhere: give it by its extended Doodson number",
	"M1C": "is one of the parts of M1, whose constant is not the same everywhere: give it by its extended Doodson number",
	"S3":  "comes from the air's daily round, and the constant in its argument is not the same everywhere: give it by its extended Doodson number",
	"S5":  "comes from the air's daily round, and the constant in its argument is not the same everywhere: give it by its extended Doodson number",
}

// remarks says what should be known of some constituents before their constants
// are taken from elsewhere. All are in it that share their multiples with
// another in the table: those differ in the node rule, in the constant or in both.
var remarks = map[string]string{
	"SA": "reckoned from the equinox; where it is reckoned from the Sun's perigee (ZZAZZYZ) the lag differs by its longitude, " +
		"283 degrees in 2000",
	"S1": "the constant is Schureman's 180 degrees; where S1 is given with the Sun's perigee (AAYZZAA) the lag differs",
	"M1": "its node factor follows the Moon's perigee as well (Schureman 202 to 207); NO1 has the same speed and " +
		"the node factor of N2 and O1",
	"NO1":  "N2 - O1 by its parts; M1 has the same speed and a node factor that follows the Moon's perigee",
	"TAU1": "the astronomical term, with the node factor of J1; MP1 has the same argument and the node factor of M2",
	"MP1":  "the shallow-water term; TAU1 has the same argument and the node factor of J1",
	"SO1":  "the astronomical term, with the node factor of J1; by its letters, S2 - O1, it would have that of O1",
	"EPS2": "the astronomical term, with the node factor of M2; MNS2 has the same argument and that factor squared",
	"MNS2": "the shallow-water term; EPS2 has the same argument and the node factor of M2 once",
	"MU2":  "the astronomical term, with the node factor of M2; 2MS2 has the same argument and that factor squared",
	"2MS2": "the shallow-water term; MU2 has the same argument and the node factor of M2 once",
	"LAM2": "the astronomical term; SNM2 has the same speed, another node factor, and lags that differ by 180 degrees",
	"SNM2": "the shallow-water term; LAM2 has the same speed, another node factor, and lags that differ by 180 degrees",
	"L2": "the astronomical term, whose node factor follows the Moon's perigee; 2MN2 has the same speed, another node factor, " +
		"and lags that differ by 180 degrees",
	"2MN2": "the shallow-water term; L2 has the same speed, another node factor, and lags that differ by 180 degrees",
	"MO3":  "M2 + O1; 2MK3 has the same argument and the node factor of its parts",
	"2MK3": "2 M2 - K1; MO3 has the same argument and the node factor of its parts",
}
