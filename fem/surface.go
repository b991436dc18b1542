package fem

import (
	"math"

	"gonum.org/v1/gonum/spatial/r2"
)

// SurfacePoint is the stress state of a free surface at one of its points. On
// a free surface only the tangential stresses can be there, so they follow
// from the strains within the surface alone, which the displacements along the
// boundary edge give without any derivative across it.
type SurfacePoint struct {
	At         r2.Vec
	Normal     r2.Vec  // unit normal out of the material
	Edge       int     // index in Mesh.Boundary
	S          float64 // position along the edge, 0 to 1
	Tangential float64 // stress along the drawn boundary
	Hoop       float64 // stress along z
	Shear      float64 // shear stress between the two
}

// FirstPrincipal is the largest principal stress.
func (p SurfacePoint) FirstPrincipal() float64 {
	return math.Max(0, (p.Tangential+p.Hoop)/2+math.Hypot((p.Tangential-p.Hoop)/2, p.Shear))
}

// VonMises is the equivalent stress of von Mises (1913).
func (p SurfacePoint) VonMises() float64 {
	t, h, s := p.Tangential, p.Hoop, p.Shear
	return math.Sqrt(t*t - t*h + h*h + 3*s*s)
}

// ShearSize is the size of the shear stress within the surface.
func (p SurfacePoint) ShearSize() float64 { return math.Abs(p.Shear) }

// Surface evaluates the surface stress at s in [0, 1] along boundary edge i,
// on the drawn plane.
func (s *Solution) Surface(i int, at float64) SurfacePoint {
	return s.surface(i, at, s.drawnShearless)
}

// SurfaceAmplitude is Surface with all three amplitudes: for the bending
// harmonic Tangential and Hoop go with cosθ around the axis, Shear with sinθ.
func (s *Solution) SurfaceAmplitude(i int, at float64) SurfacePoint {
	return s.surface(i, at, false)
}

func (s *Solution) surface(i int, at float64, shearless bool) SurfacePoint {
	tr := s.trace
	edge := &s.Problem.Shape.Mesh.Boundary[i]
	p, tangent := tr.point(edge, at)
	length := math.Hypot(tangent.X, tangent.Y)
	t := r2.Vec{X: tangent.X / length, Y: tangent.Y / length}
	// The derivative along the normal does not enter the strains within the
	// surface, so it is left at zero.
	var grad [3][strainOperators]float64
	u := s.unknowns
	for c := range u {
		along, value := 0.0, 0.0
		for k, node := range tr.nodes {
			v := s.Values[int(node)*u+c]
			along += tr.dphi[k] * v
			value += tr.phi[k] * v
		}
		along /= length
		grad[c] = [strainOperators]float64{t.X * along, t.Y * along, 0}
		if s.revolved {
			grad[c][overY] = overRadius(value, along, p.Y, t.Y, length)
		}
	}
	e := s.kin.strains(&grad, u)
	if shearless {
		e[xz], e[yz] = 0, 0
	}
	sp := SurfacePoint{At: p, Normal: r2.Vec{X: t.Y, Y: -t.X}, Edge: i, S: at}
	tangential := t.X*t.X*e[xx] + t.Y*t.Y*e[yy] + t.X*t.Y*e[xy]
	sp.Tangential, sp.Hoop = s.freeSurface(tangential, e[zz])
	sp.Shear = s.elastic[xz][xz] * (t.X*e[xz] + t.Y*e[yz])
	return sp
}

// overRadius divides by the radius what vanishes on the axis. Close to it the
// quotient is the derivative along the radius, which is that along the surface
// over the surface's slope, as derivatives along the axis vanish there too. The
// axis itself is no surface; zero keeps its points finite.
func overRadius(value, along, radius, slope, length float64) float64 {
	switch {
	case radius > nearAxis*length:
		return value / radius
	case slope == 0:
		return 0
	}
	return along / slope
}

// freeSurface gives the stresses of a free surface from the two direct strains
// within it: the strain across it is the one that leaves no normal stress.
// Hooke's law is isotropic, so its constants hold in any direction of the plane.
func (s *sampler) freeSurface(along, hoop float64) (tangential, z float64) {
	d := &s.elastic
	across := -(d[yy][xx]*along + d[yy][zz]*hoop) / d[yy][yy]
	return d[xx][xx]*along + d[xx][yy]*across + d[xx][zz]*hoop,
		d[zz][xx]*along + d[zz][yy]*across + d[zz][zz]*hoop
}

// Leftover gives the traction that the full stress tensor leaves on the free
// surface at a point, normal and tangential: exactly zero in truth, so its size
// measures how wrong the stresses of this solution still are.
func (s *Solution) Leftover(p SurfacePoint) (normal, shear float64) {
	st := s.SurfaceTensor(p)
	n := p.Normal
	tx, ty := st.XX*n.X+st.XY*n.Y, st.XY*n.X+st.YY*n.Y
	tz := st.XZ*n.X + st.YZ*n.Y
	normal = tx*n.X + ty*n.Y
	return normal, math.Hypot(ty*n.X-tx*n.Y, tz)
}

// SurfaceTensor is the full stress tensor at a surface point, on the drawn plane.
func (s *Solution) SurfaceTensor(p SurfacePoint) Stress {
	e := s.Problem.Shape.Mesh.Boundary[p.Edge]
	var bary [3]float64
	bary[(e.Opposite+1)%3] = 1 - p.S
	bary[(e.Opposite+2)%3] = p.S
	return s.Stress(int(e.Triangle), bary[1], bary[2])
}
