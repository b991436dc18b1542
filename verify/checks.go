package verify

import (
	"math"
	"strings"

	"gonum.org/v1/gonum/spatial/r2"

	"notchproof/fem"
	"notchproof/scf"
	"notchproof/verify/extrapolate"
	"notchproof/verify/specimen"
)

// Limits of the checks. They are wide against what a sound solve shows and
// narrow against what a broken one does; none of them enters the factor.
const (
	forceLimit    = 1e-3 // resultant across the net section, relative
	farLimit      = 1e-3 // far stress, relative to its largest
	leftoverLimit = 2e-2 // traction left on the free surface at the peak, relative to the peak
	solveLimit    = 1e-8 // unbalanced nodal forces and support forces, relative; see roundingLimit
	plainLimit    = 1.5  // length of a plain end in units of its size
	angleLimit    = 20.0 // degrees
	secondLimit   = 5.0  // distance to the factor of the second mesh, in units of what ladder and traction leave open
	jacobianLimit = 0.05 // smallest Jacobian of a bent triangle over that of the straight one
)

// Beginnings of the names of checks that a user can mend.
const (
	farField = "far-field stress in the "
	plainEnd = "length of the plain "
)

// checks are the conditions beside the answer.
func (c *climb) checks(s *shape, out *Computed) []Check {
	sol := out.Last
	last := out.Ladder[len(out.Ladder)-1]
	balance := sol.Balance()
	jacobian, _ := s.order(last.Order).LeastJacobian()
	list := []Check{
		below("balance of forces and moments across the net section", imbalance(c.part, c.load, sol), forceLimit),
		below("free-surface traction at the root", last.Leftover/last.Factor, leftoverLimit),
	}
	for i, plain := range c.part.Plain {
		list = append(list, below(farField+plain.Name, farError(c.part, c.load, sol, i), farLimit))
	}
	if out.Factor.Status.Settled() {
		list = append(list, below("distance to the factor of a second mesh, relative", out.Factor.Signals.Second/out.Factor.Value, out.apart))
	}
	for i := range list {
		list[i].discretisation = true
	}
	for _, plain := range c.part.Plain {
		list = append(list, above(plainEnd+plain.Name+" in sizes", plainLength(c.part, plain), plainLimit))
	}
	return append(list,
		below("share of the error left by one order more", contraction(out.Factor), extrapolate.WeakestShare),
		below("unbalanced nodal forces", balance.Residual, c.roundingLimit()),
		below("support forces", largestReaction(balance), c.roundingLimit()),
		above("smallest angle of the mesh in degrees", s.mesh.Quality().SmallestAngle, angleLimit),
		above("smallest Jacobian of the bent triangles", jacobian, jacobianLimit),
	)
}

// roundingLimit bounds what rounding may leave of the balance of nodal forces. A
// missing support or an unbalanced load leaves a good part of the whole; rounding
// leaves 1e-11, and more where heavy ends turn about a thin neck, since strains
// are then small differences of large displacements. It enters the factor with
// about its own size, so a hundredth of the uncertainty that is asked for does
// not matter.
func (c *climb) roundingLimit() float64 { return math.Max(solveLimit, c.options.target()/100) }

// contraction is the observed one; a ladder without a value has none.
func contraction(e Estimate) float64 {
	if math.IsNaN(e.Value) {
		return math.Inf(1)
	}
	return e.Order
}

// remedy is what a user can do about a failed check.
func (c Check) remedy() string {
	if strings.HasPrefix(c.Name, farField) || strings.HasPrefix(c.Name, plainEnd) {
		return ": draw the ends longer"
	}
	return ""
}

// apartLimit is how far the second mesh may be from the first, relative. Both err
// by about as much, so that one or two is what honest bars give, in units of what
// the first leaves open by its own account; a mesh that misses the peak, or an end
// that is too near, gives more. What is well within the target does not matter.
func apartLimit(e Estimate, target float64) float64 {
	open := (e.Signals.Ladder + e.Signals.Witness) / e.Value
	return math.Max(secondLimit*open, target/2)
}

// plainLength is the length of a plain stretch in units of its size.
func plainLength(p *specimen.Part, plain specimen.Plain) float64 {
	return math.Abs(plain.To-plain.From) / plainSize(p, plain)
}

// plainSize is the width or diameter of a plain stretch.
func plainSize(p *specimen.Part, plain specimen.Plain) float64 {
	if p.Half {
		return 2 * plain.High
	}
	return plain.High - plain.Low
}

// imbalance is the largest deviation of the resultants that the outside fixes,
// relative to the load. Forces count by their moment over half the part's size.
func imbalance(p *specimen.Part, l *specimen.Load, s *fem.Solution) float64 {
	got, want := s.Section(p.Net), l.Resultant
	arm := 0.0
	for _, plain := range p.Plain {
		arm = math.Max(arm, plainSize(p, plain)/2)
	}
	axial := math.Abs(got.Axial - want.Axial)
	moment := math.Abs(got.Moment - want.Moment)
	switch {
	case l.Shear:
		return math.Abs(got.Torque/want.Torque - 1)
	case !p.Half:
		worst := math.Max(moment/arm, math.Max(axial, math.Abs(got.Transverse)))
		return worst / math.Max(math.Abs(want.Axial), math.Abs(want.Moment)/arm)
	case l.Name == scf.Bending:
		return math.Max(moment, math.Abs(got.Transverse)*arm) / math.Abs(want.Moment)
	}
	return axial / math.Abs(want.Axial)
}

// farError compares the stress along the part (in torsion the shear around it)
// with the far stress, half a size before the loaded end of a plain stretch, at
// places across the section, relative to the largest far stress there. Further
// off, what a hole close to both edges leaves after two sizes would still show.
func farError(p *specimen.Part, l *specimen.Load, s *fem.Solution, plain int) float64 {
	st := p.Plain[plain]
	back := math.Min(plainSize(p, st), math.Abs(st.To-st.From)) / 2
	x := st.To - math.Copysign(back, st.To-st.From)
	worst, scale := 0.0, 0.0
	const places = 8
	for i := range places {
		y := st.Low + (st.High-st.Low)*(float64(i)+0.5)/places
		want := l.Far(plain, y)
		scale = math.Max(scale, math.Abs(want))
		tri, xi, eta, ok := s.Find(r2.Vec{X: x, Y: y})
		if !ok {
			return math.Inf(1)
		}
		got := s.Amplitude(tri, xi, eta)
		value := got.XX
		if l.Shear {
			value = got.XZ
		}
		worst = math.Max(worst, math.Abs(value-want))
	}
	return worst / scale
}

func largestReaction(b fem.Balance) float64 {
	worst := 0.0
	for _, r := range b.Reactions {
		worst = math.Max(worst, math.Abs(r.Force))
	}
	return worst
}
