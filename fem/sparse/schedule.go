package sparse

import (
	"runtime"
	"sync"
	"sync/atomic"
)

// Which goroutine does what has no influence on the numbers: a front reads
// what its children left, in the order of its list of children, and nothing
// else. So scheduling is free, and does the following. The tree is cut into
// subtrees of bounded work, each of which one goroutine takes as a whole. The
// fronts above the cut become ready when their children are done; those that
// are large are shared among all goroutines, row by row.

// subtreesPerWorker bounds the work of a subtree: small enough for goroutines
// to end at about the same time.
const subtreesPerWorker = 8

// sharedFlops is the size from which a front is shared among goroutines. It
// takes about 0.2 ms, against some microseconds for waking a goroutine.
const sharedFlops = 2e6

// aloneFlops is the work up to which a second goroutine does not pay.
const aloneFlops = 1e6

// run works through all fronts.
func (n *numeric) run(workers int) error {
	root := len(n.plan.fronts) - 1
	if workers == 1 || root < 0 || n.plan.fronts[root].work < aloneFlops {
		n.workspace.prepare(n.plan, 1, 0)
		return n.subtree(0, 0, root+1)
	}
	c := newCrew(n, workers)
	n.workspace.prepare(n.plan, workers, c.cut())
	return c.run()
}

// subtree works through the fronts [from, to).
func (n *numeric) subtree(worker, from, to int) error {
	for i := from; i < to; i++ {
		if err := n.ctx.Err(); err != nil {
			return err
		}
		n.front(worker, int32(i), nil)
	}
	return nil
}

// crewSize returns the number of goroutines that a request for workers means.
func crewSize(workers int) int {
	if workers <= 0 {
		return runtime.GOMAXPROCS(0)
	}
	return workers
}

// A crew is the goroutines of one factorisation.
type crew struct {
	numeric *numeric
	workers int
	ready   chan int32            // fronts or subtrees, by their number
	help    chan func()           // parts of fronts
	waiting []atomic.Int32        // unfinished children of the fronts above the cut
	failure atomic.Pointer[error] // the context's
	whole   []bool                // fronts that stand for their subtree
	leaders []int32               // and a list of them
}

func newCrew(n *numeric, workers int) *crew {
	fronts := len(n.plan.fronts)
	return &crew{
		numeric: n, workers: workers,
		ready:   make(chan int32, fronts),
		help:    make(chan func(), workers),
		waiting: make([]atomic.Int32, fronts),
		whole:   make([]bool, fronts),
	}
}

// cut finds the subtrees and gives each front that hands its Schur complement
// to another goroutine a place in shared memory, whose length it returns.
func (c *crew) cut() (length int) {
	n, p := c.numeric, c.numeric.plan
	n.shared = make([]int, len(p.fronts))
	for i := range n.shared {
		n.shared[i] = -1
	}
	root := int32(len(p.fronts) - 1)
	bound := p.fronts[root].work / float64(subtreesPerWorker*c.workers)
	var visit func(i int32)
	visit = func(i int32) {
		f := &p.fronts[i]
		n.shared[i] = length
		length += handedLen(len(f.border))
		if len(f.children) == 0 || f.work <= bound {
			c.whole[i] = true
			c.leaders = append(c.leaders, i)
			return
		}
		c.waiting[i].Store(int32(len(f.children)))
		for _, child := range f.children {
			visit(child)
		}
	}
	visit(root)
	return length
}

// run starts the goroutines and waits for the root.
func (c *crew) run() error {
	for _, i := range c.leaders {
		c.ready <- i
	}
	var others sync.WaitGroup
	for worker := 1; worker < c.workers; worker++ {
		others.Go(func() { c.work(worker) })
	}
	c.work(0)
	others.Wait()
	if err := c.failure.Load(); err != nil {
		return *err
	}
	return nil
}

// work takes what is ready until the root is done.
func (c *crew) work(worker int) {
	for {
		select {
		case i, more := <-c.ready:
			if !more {
				return
			}
			c.do(worker, i)
		case part := <-c.help:
			part()
		}
	}
}

// do works through front or subtree i and reports to the parent. After the
// context has ended, reports are all that is done.
func (c *crew) do(worker int, i int32) {
	n := c.numeric
	f := &n.plan.fronts[i]
	switch {
	case c.failure.Load() != nil:
	case c.whole[i]:
		if err := n.subtree(worker, int(f.start), int(i)+1); err != nil {
			c.failure.Store(&err)
		}
	case n.ctx.Err() != nil:
		err := n.ctx.Err()
		c.failure.Store(&err)
	case f.flops >= sharedFlops:
		n.front(worker, i, c.share)
	default:
		n.front(worker, i, nil)
	}
	switch {
	case f.parent < 0:
		close(c.ready)
	case c.waiting[f.parent].Add(-1) == 0:
		c.ready <- f.parent
	}
}

// share runs f(0) to f(n−1) together with whoever has nothing else to do.
func (c *crew) share(n int, f func(i int)) {
	var next atomic.Int64
	var left sync.WaitGroup
	left.Add(n)
	part := func() {
		for {
			i := int(next.Add(1)) - 1
			if i >= n {
				return
			}
			f(i)
			left.Done()
		}
	}
	for range c.workers - 1 {
		select {
		case c.help <- part:
		default:
		}
	}
	part()
	left.Wait()
}
