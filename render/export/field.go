package export

import (
	"bufio"
	"encoding/base64"
	"encoding/binary"
	"errors"
	"fmt"
	"io"
	"math"
	"strings"

	"notchproof/fem"
	"notchproof/verify"
	"notchproof/verify/specimen"
)

// lagrangeTriangle is the cell type VTK_LAGRANGE_TRIANGLE.
const lagrangeTriangle = 69

// Field writes the last rung of a finding as a VTK XML unstructured grid (.vtu)
// of Lagrange triangles of the solution's order. Every triangle has its own
// points, so that stresses keep the jumps that they have between elements. At
// the points, which VTK spaces evenly, the values are those of the solution.
// Between them displacements and shape are the solution's own too, as both are
// polynomials of the order; stresses are so in straight triangles of bars, and
// interpolated elsewhere. Values are Float64, little endian, in base64. It fails
// on a finding without a solution and on errors of w.
func Field(w io.Writer, f *verify.Finding, part *specimen.Part) error {
	s := f.Computed.Last
	if s == nil {
		return errors.New("field: the finding holds no solution")
	}
	g := newGrid(s)
	b := bufio.NewWriter(w)
	e := &xmlWriter{Writer: b}
	e.line(`<?xml version="1.0" encoding="UTF-8"?>`)
	e.line("<!-- %s -->", strings.ReplaceAll(scales, "--", "– "))
	e.line(`<VTKFile type="UnstructuredGrid" version="1.0" byte_order="LittleEndian" header_type="UInt64">`)
	e.line("<UnstructuredGrid>")
	e.fieldData(f, part)
	e.line(`<Piece NumberOfPoints="%d" NumberOfCells="%d">`, len(g.points)/3, len(g.offsets))
	e.line(`<PointData Scalars="first principal stress" Vectors="displacement" Tensors="stress">`)
	e.floats("displacement", g.displacement, "x", "y", "z")
	e.floats("stress", g.stress, "XX", "YY", "ZZ", "XY", "YZ", "XZ")
	e.floats("first principal stress", g.first)
	e.floats("von Mises stress", g.mises)
	e.line("</PointData>")
	e.line("<Points>")
	e.floats("points", g.points, "x", "y", "z")
	e.line("</Points>")
	e.line("<Cells>")
	e.integers("connectivity", g.connectivity)
	e.integers("offsets", g.offsets)
	e.array("UInt8", "types", nil, g.types)
	e.line("</Cells>")
	e.line("</Piece>")
	e.line("</UnstructuredGrid>")
	e.line("</VTKFile>")
	if e.err != nil {
		return e.err
	}
	return b.Flush()
}

const scales = "Stresses are multiples of the nominal stress; displacements are those at a Young's modulus of one nominal stress: multiply by nominal stress / Young's modulus."

// A grid is the solution at the nodes of its triangles.
type grid struct {
	points, displacement, stress, first, mises []float64
	connectivity, offsets                      []int64
	types                                      []byte
}

func newGrid(s *fem.Solution) *grid {
	shape := s.Problem.Shape
	order := shape.Element.Order
	nodes := lagrangeNodes(order)
	g := &grid{}
	for tri := range shape.Mesh.Triangles {
		for _, n := range nodes {
			xi, eta := n.at(order)
			g.connectivity = append(g.connectivity, int64(len(g.points)/3))
			p, d, st := shape.At(tri, xi, eta), s.Displacement(tri, xi, eta), s.Stress(tri, xi, eta)
			g.points = append(g.points, p.X, p.Y, 0)
			g.displacement = append(g.displacement, d[:]...)
			g.stress = append(g.stress, st.XX, st.YY, st.ZZ, st.XY, st.YZ, st.XZ)
			g.first = append(g.first, st.Principal()[0])
			g.mises = append(g.mises, st.VonMises())
		}
		g.offsets = append(g.offsets, int64(len(g.connectivity)))
		g.types = append(g.types, lagrangeTriangle)
	}
	return g
}

// An xmlWriter keeps the first error of many writes.
type xmlWriter struct {
	io.Writer
	err error
}

func (e *xmlWriter) line(format string, args ...any) {
	if e.err == nil {
		_, e.err = fmt.Fprintf(e.Writer, format+"\n", args...)
	}
}

// fieldData says what the grid is, for people and programs.
func (e *xmlWriter) fieldData(f *verify.Finding, part *specimen.Part) {
	e.line("<FieldData>")
	unit := part.Unit
	if unit == "" {
		unit = "unnamed"
	}
	for _, t := range [][2]string{
		{"part", part.Name}, {"title", part.Title}, {"load", string(f.Load.Name)}, {"length unit", unit}, {"scales", scales},
		{"nominal stress", f.Load.Nominal.Formula + ", " + f.Load.Nominal.Section},
		{"ladder", f.Computed.State()},
	} {
		e.line(`<DataArray type="String" Name="%s" NumberOfTuples="1" format="ascii">`, t[0])
		codes := make([]string, 0, len(t[1])+1)
		for _, b := range append([]byte(t[1]), 0) {
			codes = append(codes, fmt.Sprint(b))
		}
		e.line("%s\n</DataArray>", strings.Join(codes, " "))
	}
	if v := f.Computed.Factor; f.Computed.Factor.Status.Settled() {
		e.line(`<DataArray type="Float64" Name="factor and uncertainty" NumberOfComponents="2" NumberOfTuples="1" format="ascii">`)
		e.line("%g %g\n</DataArray>", v.Value, v.Uncertainty)
	}
	e.line("</FieldData>")
}

func (e *xmlWriter) floats(name string, values []float64, components ...string) {
	data := make([]byte, 0, 8*len(values))
	for _, v := range values {
		data = binary.LittleEndian.AppendUint64(data, math.Float64bits(v))
	}
	e.array("Float64", name, components, data)
}

func (e *xmlWriter) integers(name string, values []int64) {
	data := make([]byte, 0, 8*len(values))
	for _, v := range values {
		data = binary.LittleEndian.AppendUint64(data, uint64(v))
	}
	e.array("Int64", name, nil, data)
}

// array writes one inline array: the number of its bytes, then these, as one
// run of base64.
func (e *xmlWriter) array(kind, name string, components []string, data []byte) {
	attributes := ""
	if n := len(components); n > 0 {
		attributes = fmt.Sprintf(` NumberOfComponents="%d"`, n)
		for i, c := range components {
			attributes += fmt.Sprintf(` ComponentName%d="%s"`, i, c)
		}
	}
	e.line(`<DataArray type="%s" Name="%s"%s format="binary">`, kind, name, attributes)
	headed := append(binary.LittleEndian.AppendUint64(nil, uint64(len(data))), data...)
	e.line("%s\n</DataArray>", base64.StdEncoding.EncodeToString(headed))
}
