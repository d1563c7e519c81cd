// Package predict works out the tide at a harbour from its harmonic
// constants: heights, high and low waters, springs and neaps.
//
//	Harbour ──New──► Tide ──Heights──► heights at equal steps
//	                      ──Turns────► high and low waters
//	                                       └─Fortnight─► springs and neaps
//
// A secondary port has a Reduction in place of constants: its high and low waters
// are those of a standard port, corrected by a table. Open takes either kind.
//
// Heights are metres above the harbour's datum, phase lags are degrees on the
// Greenwich equilibrium argument, times are UT (UT1 and UTC are within a
// second of each other and are taken as one). Predictions are meant for the
// years 1900 to 2100 and for average weather.
//
// # Sources
//
// Keys in the code stand for:
//
//   - Schureman: P. Schureman, Manual of Harmonic Analysis and Prediction of
//     Tides, US Coast and Geodetic Survey Special Publication 98, 1940 edition.
//   - Doodson: A. T. Doodson, The harmonic development of the tide-generating
//     potential, Proc. R. Soc. A 100 (1921).
//   - Pugh: D. Pugh and P. Woodworth, Sea-Level Science, Cambridge 2014.
//   - NOS 1: US National Ocean Service, Tidal Datums and Their Applications,
//     Special Publication NOS CO-OPS 1, 2001; from memory.
//   - Meeus: J. Meeus, Astronomical Algorithms, 2nd edition, 1998.
package predict
