package mesh

import (
	"fmt"
	"math"

	"notchproof/mesh/outline"
)

// sideCuts cuts every side by the size field, each into equal steps of the
// integral of its density of pieces.
func sideCuts(region *outline.Region, field *sizeField, wishes []SideWish) ([][]float64, error) {
	sides := region.Sides()
	cuts := make([][]float64, len(sides))
	total := 0
	for i, s := range sides {
		d := pieceDensity{curve: s.Curve, field: field, straight: straight(s.Curve)}
		for _, w := range wishes {
			if w.Side == i {
				d.perQuarter = max(d.perQuarter, w.PerQuarter)
			}
		}
		ts, err := d.cut(maxPieces - total)
		if err != nil {
			return nil, fmt.Errorf("side %d (%q): %w", i, s.Name, err)
		}
		cuts[i] = ts
		total += len(ts)
	}
	i := 0
	for _, loop := range loops(region) { // no loop of fewer than three pieces
		for n := len(loop); n < 3; n++ {
			if len(cuts[i]) == 2 {
				cuts[i] = []float64{0, 0.5, 1}
			}
		}
		i += len(loop)
	}
	return cuts, nil
}

// A pieceDensity is the number of pieces wished for per unit of a curve's
// parameter.
type pieceDensity struct {
	curve      outline.Curve
	field      *sizeField
	straight   bool
	perQuarter float64

	ts  []float64 // ends of the intervals of integration
	sum []float64 // integral up to there
}

func (d *pieceDensity) at(t float64) float64 {
	speed := norm(d.curve.Deriv(t))
	n := speed / d.field.at(d.curve.At(t))
	if !d.straight {
		// 90/45 pieces a quarter keep to the turning allowed.
		per := max(d.perQuarter, 90/maxPieceTurn)
		n = max(n, curvature(d.curve, t)*speed*per*2/math.Pi)
	}
	return n
}

// cut gives the parameters from 0 to 1 at which the curve is cut.
func (d *pieceDensity) cut(most int) ([]float64, error) {
	d.ts, d.sum = append(d.ts, 0), append(d.sum, 0)
	steps := 1
	if !d.straight {
		steps = 8
	}
	for i := range steps {
		if !d.integrate(float64(i)/float64(steps), float64(i+1)/float64(steps), 50, most) {
			return nil, fmt.Errorf("more than %d pieces", maxPieces)
		}
	}
	total := d.sum[len(d.sum)-1]
	if !(total < float64(most)) {
		return nil, fmt.Errorf("%.3g pieces are more than %d", total, maxPieces)
	}
	n := max(1, int(math.Ceil(total-1e-6)))
	cuts := make([]float64, 1, n+1)
	k := 0
	for i := 1; i < n; i++ {
		want := total * float64(i) / float64(n)
		for d.sum[k+1] < want {
			k++
		}
		f := (want - d.sum[k]) / (d.sum[k+1] - d.sum[k])
		cuts = append(cuts, d.ts[k]+float64(f*(d.ts[k+1]-d.ts[k])))
	}
	return append(cuts, 1), nil
}

// integrate adds the integral over an interval, halved until it covers a third
// of a piece: over so little the size changes by less than a tenth of itself
// and the midpoint rule is good to a few parts in a thousand.
func (d *pieceDensity) integrate(t0, t1 float64, depth, most int) bool {
	tm := (t0 + t1) / 2
	n := float64(d.at(tm) * (t1 - t0))
	if n > 1.0/3 && depth > 0 {
		return d.integrate(t0, tm, depth-1, most) && d.integrate(tm, t1, depth-1, most)
	}
	d.ts = append(d.ts, t1)
	d.sum = append(d.sum, d.sum[len(d.sum)-1]+n)
	return d.sum[len(d.sum)-1] < float64(most) && len(d.ts) < 8*maxPieces
}
