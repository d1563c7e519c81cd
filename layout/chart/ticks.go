package chart

import (
	"math"
	"strconv"
	"strings"
)

// Ticks returns places at round numbers between two values, at most so many,
// labelled with as many decimals as they need, a minus as U+2212 and the
// decimal sign given.
func Ticks(from, to float64, most int, decimal string) []Tick {
	if !(from < to) || most < 1 {
		return nil
	}
	step := math.Pow(10, math.Floor(math.Log10((to-from)/float64(most))))
	for _, k := range []float64{1, 2, 5, 10} {
		if (to-from)/(k*step) <= float64(most) {
			step *= k
			break
		}
	}
	decimals := max(0, -int(math.Floor(math.Log10(step)+1e-9)))
	var list []Tick
	for i := math.Ceil(from/step - 1e-9); i <= to/step+1e-9; i++ {
		label := strconv.FormatFloat(math.Abs(i*step), 'f', decimals, 64)
		label = strings.Replace(label, ".", decimal, 1)
		if i < 0 {
			label = "\u2212" + label
		}
		list = append(list, Tick{i * step, label})
	}
	return list
}
