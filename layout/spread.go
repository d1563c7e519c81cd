package layout

// spreadOut moves labels apart that stand too close. Wants are the places their
// middles should have, ascending, sizes how much room each takes. The middles
// returned keep the labels clear of each other and between first and last where
// there is room for that, as near to the wanted ones as can be (least squares:
// neighbours that push each other share the push, as in the
// pool-adjacent-violators method of isotonic regression).
func spreadOut(wants, sizes []float64, first, last float64) []float64 {
	if len(wants) == 0 {
		return nil
	}
	// With each label's least distance from the first taken off, places need only
	// not descend.
	offset := make([]float64, len(wants))
	for i := 1; i < len(wants); i++ {
		offset[i] = offset[i-1] + (sizes[i-1]+sizes[i])/2
	}
	type block struct {
		sum float64
		n   int
	}
	var blocks []block
	for i, want := range wants {
		b := block{want - offset[i], 1}
		for len(blocks) > 0 {
			before := blocks[len(blocks)-1]
			if before.sum/float64(before.n) <= b.sum/float64(b.n) {
				break
			}
			b.sum += before.sum
			b.n += before.n
			blocks = blocks[:len(blocks)-1]
		}
		blocks = append(blocks, b)
	}
	least := first + sizes[0]/2
	most := max(least, last-sizes[len(sizes)-1]/2-offset[len(offset)-1])
	var places []float64
	for _, b := range blocks {
		for range b.n {
			places = append(places, min(max(b.sum/float64(b.n), least), most)+offset[len(places)])
		}
	}
	return places
}
