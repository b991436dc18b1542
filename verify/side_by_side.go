package verify

import "sync"

// SideBySide calls f for 0 … n−1 on a number of goroutines, in order of start.
// What is asked with many parts keeps each result in a place of its own, so that
// nothing depends on who does what.
func SideBySide(n, workers int, f func(i int)) {
	var group sync.WaitGroup
	next := make(chan int)
	for range min(n, workers) {
		group.Go(func() {
			for i := range next {
				f(i)
			}
		})
	}
	for i := range n {
		next <- i
	}
	close(next)
	group.Wait()
}
