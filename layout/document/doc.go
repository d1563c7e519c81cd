// Package document reads the files a club writes: harbours, almanacs, the
// words of a language, and tables of harmonic constants. It explains what is
// wrong in them, all of it at once, by file and line.
//
//	almanac.yaml ─┬─► harbour.yaml ──► constants.csv, or the standard port's harbour.yaml
//	              └─► words of a language
//
//	File ──load──► text ──parse──► tree of YAML nodes ──schema──► Harbour, Almanac, Words
//	       size, encoding    syntax, depth, no anchors    keys, kinds, ranges
//
// Every step reports in words of its own: a reader of these sentences knows
// nothing of the program. The YAML library is asked for its tree of nodes
// alone, never to fill a Go value.
//
// A key of a file is one line in a list of keys (see type key).
package document
