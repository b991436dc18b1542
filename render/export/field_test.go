package export

import (
	"bytes"
	"context"
	"encoding/base64"
	"encoding/binary"
	"encoding/xml"
	"fmt"
	"math"
	"math/rand/v2"
	"slices"
	"strings"
	"testing"

	"gonum.org/v1/gonum/spatial/r2"

	"notchproof/scf"
	"notchproof/verify"
	"notchproof/verify/specimen"
)

// checked gives the findings of a part of a family.
func checked(t testing.TB, name string, dims scf.Dims, target float64) *verify.Result {
	t.Helper()
	family, ok := scf.Lookup(name)
	if !ok {
		t.Fatalf("no family %s", name)
	}
	part, err := specimen.New(family, dims, "mm", scf.Options{Nu: 0.3})
	if err != nil {
		t.Fatal(err)
	}
	part.Title = `seat -- of "ü" <&`
	r, err := verify.Run(context.Background(), part, nil, verify.Options{Target: target})
	if err != nil {
		t.Fatal(err)
	}
	return r
}

// barycentric gives the place of a node of VTK_LAGRANGE_TRIANGLE by counting
// down from its number, the other way round from lagrangeNodes: rings of 3·order
// nodes, corners first, then edges.
func barycentric(index, order int) (b [3]int) {
	low, high := 0, order
	for index != 0 && index >= 3*order {
		index -= 3 * order
		high -= 2
		low++
		order -= 3
	}
	if index < 3 {
		b = [3]int{low, low, low}
		b[index] = high
		return b
	}
	edge, offset := (index-3)/(order-1), (index-3)%(order-1)
	b[(edge+1)%3] = low + 1 + offset
	b[edge] = high - 1 - offset
	b[(edge+2)%3] = low
	return b
}

func TestOrderOfNodes(t *testing.T) {
	for order := 1; order <= 12; order++ {
		nodes := lagrangeNodes(order)
		seen := map[node]bool{}
		for i, n := range nodes {
			if n != node(barycentric(i, order)) {
				t.Errorf("order %d: node %d is %v, want %v", order, i, n, barycentric(i, order))
			}
			if seen[n] || n[0]+n[1]+n[2] != order || min(n[0], n[1], n[2]) < 0 {
				t.Errorf("order %d: node %d, %v, is there twice or outside", order, i, n)
			}
			seen[n] = true
		}
		if len(nodes) != (order+1)*(order+2)/2 {
			t.Errorf("order %d has %d nodes", order, len(nodes))
		}
	}
	// Order 4 written out: corners, three nodes inside each edge, the triangle of
	// order 1 inside.
	want := []node{{4, 0, 0}, {0, 4, 0}, {0, 0, 4}, {3, 1, 0}, {2, 2, 0}, {1, 3, 0}, {0, 3, 1}, {0, 2, 2}, {0, 1, 3},
		{1, 0, 3}, {2, 0, 2}, {3, 0, 1}, {2, 1, 1}, {1, 2, 1}, {1, 1, 2}}
	if got := lagrangeNodes(4); !slices.Equal(got, want) {
		t.Errorf("order 4: %v", got)
	}
}

// A vtu is a file as another program reads it.
type vtu struct {
	XMLName xml.Name `xml:"VTKFile"`
	Type    string   `xml:"type,attr"`
	Endian  string   `xml:"byte_order,attr"`
	Header  string   `xml:"header_type,attr"`
	Grid    struct {
		Field []vtuArray `xml:"FieldData>DataArray"`
		Piece struct {
			Points int        `xml:"NumberOfPoints,attr"`
			Cells  int        `xml:"NumberOfCells,attr"`
			Data   []vtuArray `xml:"PointData>DataArray"`
			At     []vtuArray `xml:"Points>DataArray"`
			Conn   []vtuArray `xml:"Cells>DataArray"`
		}
	} `xml:"UnstructuredGrid"`
}

type vtuArray struct {
	Type       string `xml:"type,attr"`
	Name       string `xml:"Name,attr"`
	Components int    `xml:"NumberOfComponents,attr"`
	Format     string `xml:"format,attr"`
	Text       string `xml:",chardata"`
}

func (a vtuArray) bytes(t *testing.T) []byte {
	t.Helper()
	data, err := base64.StdEncoding.DecodeString(strings.TrimSpace(a.Text))
	if err != nil || a.Format != "binary" || len(data) < 8 || binary.LittleEndian.Uint64(data) != uint64(len(data)-8) {
		t.Fatalf("%s: %d bytes of %s, %v", a.Name, len(data), a.Format, err)
	}
	return data[8:]
}

func (a vtuArray) floats(t *testing.T) (list []float64) {
	t.Helper()
	for data := a.bytes(t); len(data) > 0; data = data[8:] {
		list = append(list, math.Float64frombits(binary.LittleEndian.Uint64(data)))
	}
	return list
}

func (a vtuArray) integers(t *testing.T) (list []int64) {
	t.Helper()
	for data := a.bytes(t); len(data) > 0; data = data[8:] {
		list = append(list, int64(binary.LittleEndian.Uint64(data)))
	}
	return list
}

func named(t *testing.T, list []vtuArray, name string) vtuArray {
	t.Helper()
	for _, a := range list {
		if a.Name == name {
			return a
		}
	}
	t.Fatalf("no array %q", name)
	return vtuArray{}
}

// interpolated evaluates the polynomial through evenly spaced nodes: Silvester's
// products (P. Silvester, Int. J. Eng. Sci. 7 (1969) 849, from memory).
func interpolated(order int, lambda [3]float64, values func(i int) []float64) []float64 {
	var sum []float64
	for i := range (order + 1) * (order + 2) / 2 {
		weight := 1.0
		for k, n := range barycentric(i, order) {
			for j := range n {
				weight *= (float64(order)*lambda[k] - float64(j)) / float64(j+1)
			}
		}
		for c, v := range values(i) {
			if len(sum) <= c {
				sum = append(sum, 0)
			}
			sum[c] += weight * v
		}
	}
	return sum
}

// TestFieldReadsBack reads files as another program would and holds what it
// interpolates at random places against the solution. Shape and displacements
// are polynomials of the elements' order: equal but for rounding, in every
// triangle. Stresses are polynomials in straight triangles of bars; elsewhere
// they are interpolated; the share of the peak that this may bring is some ten
// times what was measured.
func TestFieldReadsBack(t *testing.T) {
	const rounding = 1e-9
	for _, row := range []struct {
		name   string
		dims   scf.Dims
		target float64
		bent   float64 // share of the peak
	}{
		{"bar-hole", scf.Dims{"W": 60, "d": 20, "e": 5}, 1e-3, 1e-5},
		{"bar-shoulder", scf.Dims{"D": 60, "d": 40, "r": 4}, 1e-9, 1e-9},
		{"shaft-shoulder", scf.Dims{"D": 72, "d": 48, "r": 3}, 1e-3, 1e-3},
	} {
		r := checked(t, row.name, row.dims, row.target)
		for k := range r.Findings {
			f := &r.Findings[k]
			s := f.Computed.Last
			order := s.Problem.Shape.Element.Order
			where := fmt.Sprintf("%s, %s, order %d", row.name, f.Load.Name, order)
			g := readField(t, f, r.Part)
			piece := &g.Grid.Piece
			count := (order + 1) * (order + 2) / 2
			conn := named(t, piece.Conn, "connectivity").integers(t)
			offsets := named(t, piece.Conn, "offsets").integers(t)
			if len(conn) != count*piece.Cells || len(offsets) != piece.Cells || piece.Cells != len(s.Problem.Shape.Mesh.Triangles) {
				t.Fatalf("%s: %d points in %d cells", where, len(conn), piece.Cells)
			}
			for i, kind := range named(t, piece.Conn, "types").bytes(t) {
				if kind != 69 || offsets[i] != int64((i+1)*count) {
					t.Fatalf("%s: cell %d is of type %d and ends at %d", where, i, kind, offsets[i])
				}
			}
			at := named(t, piece.At, "points").floats(t)
			if len(at) != 3*piece.Points {
				t.Fatalf("%s: %d coordinates of %d points", where, len(at), piece.Points)
			}
			arrays := map[string][]float64{"points": at}
			for _, a := range piece.Data {
				arrays[a.Name] = a.floats(t)
			}
			at3 := func(name string, tri int, lambda [3]float64) []float64 {
				width := len(arrays[name]) / piece.Points
				return interpolated(order, lambda, func(i int) []float64 {
					from := int(conn[tri*count+i]) * width
					return arrays[name][from : from+width]
				})
			}
			peak := f.Computed.Factor.Value
			random := rand.New(rand.NewPCG(7, uint64(order)))
			worst := 0.0
			for range 150 {
				tri := random.IntN(piece.Cells)
				xi, eta := random.Float64(), random.Float64()
				if xi+eta > 1 {
					xi, eta = 1-xi, 1-eta
				}
				lambda := [3]float64{1 - xi - eta, xi, eta}
				p, d, st := s.Problem.Shape.At(tri, xi, eta), s.Displacement(tri, xi, eta), s.Stress(tri, xi, eta)
				size := math.Max(1, r2.Norm(p))
				if off := distance(at3("points", tri, lambda), []float64{p.X, p.Y, 0}); off > rounding*size {
					t.Errorf("%s: triangle %d is %g off its shape", where, tri, off)
				}
				if off := distance(at3("displacement", tri, lambda), d[:]); off > rounding*math.Max(size, math.Hypot(d[0], math.Hypot(d[1], d[2]))) {
					t.Errorf("%s: triangle %d: displacement off by %g", where, tri, off)
				}
				off := distance(at3("stress", tri, lambda), []float64{st.XX, st.YY, st.ZZ, st.XY, st.YZ, st.XZ})
				if s.Problem.Shape.Straight[tri] && !f.Load.Model.Revolved() && off > rounding*peak {
					t.Errorf("%s: straight triangle %d: stress off by %g", where, tri, off)
				}
				worst = math.Max(worst, off/peak)
				if v := at3("von Mises stress", tri, [3]float64{0, 1, 0})[0]; math.Abs(v-s.Stress(tri, 1, 0).VonMises()) > rounding*peak {
					t.Errorf("%s: triangle %d: von Mises stress at a corner %g", where, tri, v)
				}
				if v := at3("first principal stress", tri, [3]float64{0, 0, 1})[0]; math.Abs(v-s.Stress(tri, 0, 1).Principal()[0]) > rounding*peak {
					t.Errorf("%s: triangle %d: first principal stress at a corner %g", where, tri, v)
				}
			}
			t.Logf("%s: stresses interpolated to %.1e of the peak", where, worst)
			if worst > row.bent {
				t.Errorf("%s: stresses interpolated to %.1e of the peak", where, worst)
			}
		}
	}
}

func distance(a, b []float64) float64 {
	if len(a) != len(b) {
		return math.Inf(1)
	}
	sum := 0.0
	for i := range a {
		sum += (a[i] - b[i]) * (a[i] - b[i])
	}
	return math.Sqrt(sum)
}

func readField(t *testing.T, f *verify.Finding, part *specimen.Part) *vtu {
	t.Helper()
	var b, again bytes.Buffer
	if err := Field(&b, f, part); err != nil {
		t.Fatal(err)
	}
	if err := Field(&again, f, part); err != nil || !bytes.Equal(b.Bytes(), again.Bytes()) {
		t.Fatalf("two files differ, %v", err)
	}
	g := new(vtu)
	if err := xml.Unmarshal(b.Bytes(), g); err != nil {
		t.Fatal(err)
	}
	if g.Type != "UnstructuredGrid" || g.Endian != "LittleEndian" || g.Header != "UInt64" {
		t.Fatalf("%s %s %s", g.Type, g.Endian, g.Header)
	}
	for _, want := range []string{"part", "title", "load", "length unit", "scales", "nominal stress", "ladder", "factor and uncertainty"} {
		named(t, g.Grid.Field, want)
	}
	if a := named(t, g.Grid.Field, "length unit"); strings.TrimSpace(a.Text) != "109 109 0" {
		t.Fatalf("the unit reads %q", a.Text)
	}
	return g
}

// TestNoSolution: nothing is written of a finding that was not solved.
func TestNoSolution(t *testing.T) {
	var b bytes.Buffer
	f := new(verify.Finding)
	if Field(&b, f, nil) == nil || Surface(&b, f, nil) == nil || b.Len() > 0 {
		t.Errorf("%d bytes of nothing", b.Len())
	}
}
