package page

import "math"

// Contrast returns the contrast ratio of two inks, 1 (none) to 21 (black on
// white): (L1 + 0.05) / (L2 + 0.05) with the relative luminances L1 of the
// lighter and L2 of the darker one. 7 is what the guidelines ask of text for
// readers with low vision.
//
// Source: W3C, Web Content Accessibility Guidelines (WCAG) 2.1, 2018, terms
// "contrast ratio" and "relative luminance", and success criterion 1.4.6.
func Contrast(a, b Ink) float64 {
	la, lb := luminance(a), luminance(b)
	return (max(la, lb) + 0.05) / (min(la, lb) + 0.05)
}

// luminance returns the relative luminance, 0 for black and 1 for white
// [WCAG 2.1, "relative luminance"; its 0.03928 stands against 0.04045 in the
// sRGB standard, which makes no difference to any of the 256 steps].
func luminance(k Ink) float64 {
	linear := func(v uint8) float64 {
		s := float64(v) / 255
		if s <= 0.03928 {
			return s / 12.92
		}
		return math.Pow((s+0.055)/1.055, 2.4)
	}
	return 0.2126*linear(k.R) + 0.7152*linear(k.G) + 0.0722*linear(k.B)
}
