package render

import (
	"runtime"
	"sync"
	"sync/atomic"
)

// concurrently does n independent pieces of work on all processors. worker is
// called once for each goroutine and gives what does piece i, so that a
// goroutine can have memory of its own. Each piece must write to places of its
// own; the result then does not depend on who does what.
func concurrently(n int, worker func() func(i int)) {
	var next atomic.Int64
	var all sync.WaitGroup
	for range min(n, runtime.GOMAXPROCS(0)) {
		all.Add(1)
		go func() {
			defer all.Done()
			do := worker()
			for {
				i := int(next.Add(1)) - 1
				if i >= n {
					return
				}
				do(i)
			}
		}()
	}
	all.Wait()
}
