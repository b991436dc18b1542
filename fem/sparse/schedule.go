package sparse

// run works through all fronts.
func (n *numeric) run(workers int) error {
	n.workspace.prepare(n.plan, 1, 0)
	for i := range n.plan.fronts {
		if err := n.ctx.Err(); err != nil {
			return err
		}
		n.front(0, int32(i), nil)
	}
	return nil
}
