package mesh

import (
	"fmt"
	"math"

	"gonum.org/v1/gonum/spatial/r2"
)

// The refiner inserts vertices until every triangle inside is small enough and
// has no small angle, except where the outline forbids it.
//
// This is Delaunay refinement in the manner of Chew's second algorithm (Chew
// 1993; Shewchuk, "Delaunay refinement algorithms for triangular mesh
// generation", Computational Geometry 22, 2002): a vertex is put at a bad
// triangle's circumcentre, unless it would lie beyond a piece of the boundary or
// too near to it, in which case that piece is cut instead. In place of the
// circumcentre comes an off-centre where that is nearer (Üngör 2004): a point on
// the bisector of the shortest edge, just far enough to make a good triangle
// with it, or, if the triangle is too large, one of the size wished for (Rebay
// 1993; Engwirda and Ivers 2016). So a front of well-shaped triangles grows from
// the boundary into the inside, and their number stays low.
type refiner struct {
	*triangulation
	outline *boundary
	field   *sizeField
	queue   queue

	shell []int32   // by vertex: the sharp corner whose shell it lies on, or -1
	bound []bool    // by vertex: it lies on the boundary
	free  int32     // no vertex before this one lies inside
	least []float64 // by vertex: 0, or at a sharp corner the radius of its smallest shell

	shortest2 float64 // square of the length below which nothing is cut
}

const (
	goodSin2     = 0.2204035482646266 // sin² 28°, the smallest angle aimed for
	offCentre    = 1.9687             // height over base of the triangle with 28.5° at the top
	oversize     = math.Sqrt2         // an edge this many times longer than wished for is cut: its halves are no better
	maxTriangles = 1 << 21            // a mesh of more is given up
	lensCosine   = -0.5               // of the angle, 120°, at which a point sees a segment that it is too near to
)

// refine does all that.
func refine(t *triangulation, b *boundary, field *sizeField) (*refiner, error) {
	r := &refiner{triangulation: t, outline: b, field: field, shortest2: float64(b.least * b.least)}
	r.free = int32(len(t.points))
	r.bound = make([]bool, len(t.points))
	r.queue = newQueue(r.shortest2, b.extent*b.extent)
	r.markShells()
	for i := range t.tris {
		r.judge(int32(i))
	}
	for {
		e, ok := r.queue.pop()
		if !ok {
			return r, nil
		}
		if t.tris[e.tri].stamp != e.stamp {
			continue
		}
		if err := r.improve(e.tri); err != nil {
			return nil, err
		}
		if len(t.tris) > maxTriangles {
			p := r.point(t.tris[e.tri].v[0])
			return nil, fmt.Errorf("more than %d triangles, many near (%g, %g): sides there nearly touch, or the sizes wished for are too small", maxTriangles, p.X, p.Y)
		}
	}
}

// A shape is what decides about a triangle.
type shape struct {
	k      int     // corner opposite the shortest edge
	short2 float64 // square of the shortest edge
	area2  float64 // twice the area
	small  bool    // it has a small angle
	large  bool    // it has an edge longer than wished for
}

// measure looks at triangle i.
func (r *refiner) measure(i int32) shape {
	tr := &r.tris[i]
	p, q, o := r.point(tr.v[0]), r.point(tr.v[1]), r.point(tr.v[2])
	d := [3]float64{dist2(q, o), dist2(o, p), dist2(p, q)}
	k, l := 0, 0
	for j := 1; j < 3; j++ {
		if d[j] < d[k] {
			k = j
		}
		if d[j] > d[l] {
			l = j
		}
	}
	s := shape{k: k, short2: d[k], area2: area2(p, q, o)}
	// sin α = 2·area / (product of the edges at α).
	s.small = s.area2*s.area2 < goodSin2*d[after[k]]*d[after[after[k]]]
	v := tr.v
	mid := midpoint(r.point(v[after[l]]), r.point(v[after[after[l]]]))
	h := r.field.at(mid)
	limit := min(oversize*h, r.field.largest)
	s.large = d[l] > limit*limit
	return s
}

func (r *refiner) point(v int32) r2.Vec { return r.points[v] }

// judge puts triangle i into the queue if it is bad.
func (r *refiner) judge(i int32) {
	if !r.tris[i].inside {
		return
	}
	if s := r.measure(i); s.small || s.large {
		r.queue.push(s.short2, entry{i, r.tris[i].stamp})
	}
}

// improve inserts a vertex for the sake of triangle i, or cuts a segment that is
// in the way of that.
func (r *refiner) improve(i int32) error {
	s := r.measure(i)
	if s.short2 < r.shortest2 {
		return nil
	}
	v := r.tris[i].v
	if !s.large && r.excused(v[after[s.k]], v[after[after[s.k]]]) {
		return r.unbend(i)
	}
	c := r.steiner(i, s)
	tri, wall := r.walk(i, c)
	if wall >= 0 {
		return r.cutFor(i, r.tris[tri].s[wall], s.large)
	}
	r.find(c, tri)
	for _, e := range r.cavity.ring {
		if e.seg >= 0 && r.encroaches(c, e.seg) {
			return r.cutFor(i, e.seg, s.large)
		}
	}
	if _, ok := r.sound(c); !ok {
		return r.unbend(i)
	}
	r.fill(r.addVertex(c))
	for _, f := range r.cavity.tris {
		r.judge(f)
	}
	return nil
}

func (r *refiner) addVertex(p r2.Vec) int32 {
	v := int32(len(r.points))
	r.points = append(r.points, p)
	r.at = append(r.at, 0)
	r.shell = append(r.shell, -1)
	r.least = append(r.least, 0)
	r.bound = append(r.bound, false)
	return v
}

// encroaches tells whether p sees a segment at more than 120°.
func (r *refiner) encroaches(p r2.Vec, seg int32) bool {
	s := &r.segs[seg]
	u, w := r2.Sub(r.point(s.a), p), r2.Sub(r.point(s.b), p)
	d := dot(u, w)
	return d < 0 && d*d > lensCosine*lensCosine*dot(u, u)*dot(w, w)
}

// steiner gives the point to insert for triangle i: on the bisector of its
// shortest edge, at the circumcentre or before it.
func (r *refiner) steiner(i int32, s shape) r2.Vec {
	v := r.tris[i].v
	p, q, o := r.point(v[after[s.k]]), r.point(v[after[after[s.k]]]), r.point(v[s.k])
	m := midpoint(p, q)
	l := math.Sqrt(s.short2)
	n := r2.Scale(1/l, r2.Vec{X: p.Y - q.Y, Y: q.X - p.X}) // towards o
	// With m the origin and pq along x, o = (x, y) has the circumcentre
	// (0, (x² + y² − l²/4) / 2y).
	d := (dist2(o, m) - s.short2/4) / (2 * s.area2 / l)
	d = min(d, l*offCentre)
	if s.large {
		h := r.field.at(m)
		h = r.field.at(shifted(m, 0.5*min(h, 2*l), n))
		if l < 1.5*h {
			d = min(d, math.Sqrt(float64(h*h)-s.short2/4))
		}
	}
	return shifted(m, d, n)
}

// cutFor cuts a segment for the sake of triangle i, which is looked at again.
func (r *refiner) cutFor(i, seg int32, large bool) error {
	stamp := r.tris[i].stamp
	done, err := r.cutSegment(seg, large, 0)
	if err != nil {
		return err
	}
	if !done {
		return r.unbend(i)
	}
	if r.tris[i].stamp == stamp {
		r.judge(i)
	}
	return nil
}
