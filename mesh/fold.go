package mesh

import (
	"fmt"
	"math"

	"gonum.org/v1/gonum/spatial/r2"
)

// A Fold is a curved triangle whose map is not one-to-one, or not provably so.
type Fold struct {
	Triangle int
	Edge     int     // index in Mesh.Boundary of its most bent edge, −1 if it is straight
	Low      float64 // lower bound of det J / det J_straight, as JacobianBounds gives it
}

func (f *Fold) Error() string {
	if f.Edge < 0 {
		return fmt.Sprintf("triangle %d is turned over", f.Triangle)
	}
	return fmt.Sprintf("triangle %d folds over at its curved edge (boundary edge %d): jacobian down to %.3g of the straight triangle's",
		f.Triangle, f.Edge, f.Low)
}

// Validate returns a *Fold as error for the first triangle whose Jacobian is
// not positive throughout.
func (c *Curved) Validate() error {
	if _, folds := c.LeastJacobian(); len(folds) > 0 {
		return &folds[0]
	}
	return nil
}

// LeastJacobian gives the least ratio of a Jacobian to the straight triangle's over
// the whole mesh, by its lower bound: 1 if no triangle is bent, near 1 for
// gentle bends, at most 0 if triangles fold over. Those are listed.
//
// The remedy for a fold is in the mesh, not in the nodes: halve Fold.Edge,
// which makes the bulge a quarter, or give the triangle more height.
func (c *Curved) LeastJacobian() (least float64, folds []Fold) {
	least = 1
	b := newBounder(c.Element.Order)
	for t := range c.Straight {
		low := 1.0
		switch {
		case !(determinant(c.affine(t).jacobian()) > 0):
			low = -1
		case !c.Straight[t]:
			low = b.low(c, t)
		}
		least = min(least, low)
		if !(low > 0) {
			folds = append(folds, Fold{t, c.mostBent(t), low})
		}
	}
	return least, folds
}

// mostBent finds the boundary edge of a triangle that leaves its chord the
// most, in proportion to the chord.
func (c *Curved) mostBent(tri int) int {
	found, most := -1, 0.0
	for i, e := range c.Mesh.Boundary {
		if int(e.Triangle) != tri {
			continue
		}
		t, k := c.Triangle(tri), int(e.Opposite)
		a, b := c.Nodes[t[(k+1)%3]], c.Nodes[t[(k+2)%3]]
		chord := r2.Sub(b, a)
		for _, n := range c.inner(tri, k) {
			off := math.Abs(r2.Cross(chord, r2.Sub(c.Nodes[n], a))) / r2.Norm2(chord)
			if off > most {
				found, most = i, off
			}
		}
	}
	return found
}
