//go:build !linux

package sparse

// adviseLargePages does nothing where there is no such advice.
func adviseLargePages([]float64) {}
