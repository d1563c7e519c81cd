// Package fit works out harmonic constants from a gauge record, and how good
// predictions are beside one.
//
//	record ──Rayleigh──► constituents ──► robust fit of a thinned record
//	                                        │ residual: spikes, stuck values, clock, datum
//	                                        ▼ left out or put right
//	                          fit of every height, weighted ──► constants
//	                                        │ spectrum of the residual
//	                                        ▼
//	                          standard errors, signal-to-noise ──► Result
//
// Heights are least squares of h = Z0 + sum of f H cos(V + u - G), that is of
// h = Z0 + sum of (H cos G) f cos(V+u) + (H sin G) f sin(V+u), with the
// arguments and node factors of package predict (Pugh, chapter 4). The normal
// equations are gathered block by block, so that no matrix of all heights is
// held.
//
// # Sources
//
//   - Pugh: D. Pugh and P. Woodworth, Sea-Level Science, Cambridge 2014, chapter
//     4: least squares, the Rayleigh criterion, related constituents, errors from
//     the residual spectrum.
//   - Godin: G. Godin, The Analysis of Tides, Toronto 1972: resolution and
//     inference.
//   - Huber: P. J. Huber, Robust Statistics, Wiley 1981: weights 1.345.
//   - Holland: P. W. Holland and R. E. Welsch, Robust regression using iteratively
//     reweighted least-squares, Commun. Statist. A6 (1977): tuning constants.
//   - Munk: W. H. Munk and D. E. Cartwright, Tidal spectroscopy and prediction,
//     Phil. Trans. R. Soc. A 259 (1966): noise rises towards the tidal bands.
//   - Mallows: C. L. Mallows, Some comments on Cp, Technometrics 15 (1973).
//
// All are quoted from memory. Numbers that are ours are called so where they
// stand.
package fit
