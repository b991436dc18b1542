package chart

import (
	"bytes"
	"encoding/csv"
	"io"
	"math"
	"strconv"
	"strings"
)

// A chart's table as text. First the question, a line each that begins with #
// and holds neither commas nor quotes, so that it is a comment to those who know
// comments and a record of one field to those who do not; then records as RFC
// 4180 has them: a header, and a point a record. Numbers read back the same; a
// number that is not there is an empty field.
//
//	# notchproof chart 1
//	# family shaft-shoulder
//	# load bending
//	# along r/d=0.02:0.3:12
//	# curves D/d=1.1 1.5 2
//	# nu 0.3
//	# force-line net
//	# target 0.001
//	r/d,D/d,factor,uncertainty,status,note,tipton-1996
//	0.02,1.1,2.31,0.0004,settled,,2.29
const firstLine = "notchproof chart 1"

const lineEnd = "\r\n"

// Head is what stands above the first point.
func (t *Table) Head() []byte {
	var b bytes.Buffer
	for _, line := range append([]string{firstLine}, t.Question.Lines()...) {
		b.WriteString("# " + strings.ReplaceAll(line, ",", " ") + lineEnd)
	}
	b.Write(record(t.columns()))
	return b.Bytes()
}

func (t *Table) columns() []string {
	names := []string{t.Question.Along.String()}
	if t.Question.Curves != nil {
		names = append(names, t.Question.Curves.String())
	}
	names = append(names, "factor", "uncertainty", "status", "note")
	for _, b := range t.Books {
		names = append(names, b.ID)
	}
	return names
}

// Row is the record of a point.
func (t *Table) Row(i int) []byte {
	p := t.Points[i]
	fields := []string{field(p.X)}
	if t.Question.Curves != nil {
		fields = append(fields, field(p.Y))
	}
	fields = append(fields, field(p.Factor), field(p.Uncertainty), p.Status.String(), p.Why)
	for _, v := range p.Handbook {
		fields = append(fields, field(v))
	}
	return record(fields)
}

// Write writes all points that are known.
func (t *Table) Write(w io.Writer) error {
	b := t.Head()
	for i := range t.Points {
		if t.held[i] {
			b = append(b, t.Row(i)...)
		}
	}
	_, err := w.Write(b)
	return err
}

func field(v float64) string {
	if math.IsNaN(v) || math.IsInf(v, 0) {
		return ""
	}
	return exact(v)
}

// record writes one record; a line break in a note would break it in two for
// readers that go by lines.
func record(fields []string) []byte {
	for i := range fields {
		fields[i] = strings.Join(strings.FieldsFunc(fields[i], func(r rune) bool { return r == '\r' || r == '\n' }), " ")
	}
	var b bytes.Buffer
	w := csv.NewWriter(&b)
	w.UseCRLF = true
	w.Write(fields)
	w.Flush()
	if w.Error() != nil {
		panic("chart: a buffer that does not take bytes")
	}
	return b.Bytes()
}

// number reads a field; an empty one is NaN.
func number(text string) (float64, error) {
	if text == "" {
		return math.NaN(), nil
	}
	v, err := strconv.ParseFloat(text, 64)
	if err == nil && (math.IsNaN(v) || math.IsInf(v, 0)) {
		return 0, strconv.ErrRange
	}
	return v, err
}
