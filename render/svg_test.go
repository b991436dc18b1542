package render

import (
	"bytes"
	"encoding/xml"
	"errors"
	"fmt"
	"io"
	"math"
	"strings"
	"testing"

	"notchproof/scf"
)

// checkSVG reads what was written as XML and holds it against what the doors
// promise: a size in millimetres with the proportions of the viewBox, a title
// and a description that are named, ids with the prefix, no id twice, no
// reference to what is not there.
func checkSVG(t *testing.T, data []byte) (ids []string) {
	t.Helper()
	d := xml.NewDecoder(bytes.NewReader(data))
	d.Strict = true
	seen := make(map[string]int)
	var wanted, titles []string
	for {
		token, err := d.Token()
		if errors.Is(err, io.EOF) {
			break
		}
		if err != nil {
			t.Fatalf("not XML: %v\n%s", err, data)
		}
		e, ok := token.(xml.StartElement)
		if !ok {
			continue
		}
		attributes := make(map[string]string)
		for _, a := range e.Attr {
			attributes[a.Name.Local] = a.Value
			if strings.Contains(a.Value, "NaN") || strings.Contains(a.Value, "Inf") {
				t.Errorf("%s has %s = %q", e.Name.Local, a.Name.Local, a.Value)
			}
		}
		if id, ok := attributes["id"]; ok {
			ids = append(ids, id)
			seen[id]++
		}
		if ref, ok := attributes["clip-path"]; ok {
			wanted = append(wanted, strings.TrimSuffix(strings.TrimPrefix(ref, "url(#"), ")"))
		}
		switch e.Name.Local {
		case "svg":
			wanted = append(wanted, strings.Fields(attributes["aria-labelledby"])...)
			checkSize(t, attributes)
		case "title", "desc":
			titles = append(titles, e.Name.Local)
		}
	}
	if strings.Join(titles, " ") != "title desc" {
		t.Errorf("titles %v", titles)
	}
	for _, id := range wanted {
		if seen[id] != 1 {
			t.Errorf("id %q is there %d times", id, seen[id])
		}
	}
	return ids
}

func checkSize(t *testing.T, a map[string]string) {
	t.Helper()
	var w, h, vw, vh float64
	if _, err := fmt.Sscanf(a["width"]+" "+a["height"], "%fmm %fmm", &w, &h); err != nil {
		t.Errorf("size %q by %q: %v", a["width"], a["height"], err)
	}
	if _, err := fmt.Sscanf(a["viewBox"], "0 0 %f %f", &vw, &vh); err != nil {
		t.Errorf("viewBox %q: %v", a["viewBox"], err)
	}
	if math.Abs(w/h-vw/vh) > 1e-3 {
		t.Errorf("%g mm by %g mm for %g by %g", w, h, vw, vh)
	}
}

func TestSVGIsTheSameAgainAndPrefixed(t *testing.T) {
	part := newPart(t, "shaft-groove", scf.Dims{"D": 60, "d": 40, "r": 5})
	f := SketchFigure(part)
	o := FigureOptions{Millimetres: 160, Prefix: "a-"}
	first := f.SVG(o)
	if !bytes.Equal(first, f.SVG(o)) {
		t.Error("other bytes the second time")
	}
	ids := checkSVG(t, first)
	if len(ids) < 3 { // title, desc, the view's window
		t.Errorf("ids %v", ids)
	}
	for _, id := range ids {
		if !strings.HasPrefix(id, "a-") {
			t.Errorf("id %q has no prefix", id)
		}
	}
	if !strings.Contains(string(first), ` width="160mm"`) {
		t.Errorf("not 160 mm wide: %.200s", first)
	}
	const most = 20_000 // bytes: a page of a report holds many
	if len(first) > most {
		t.Errorf("%d bytes", len(first))
	}
}

// What people write in titles is text, not markup.
func TestSVGEscapes(t *testing.T) {
	study := geometric()
	study.Title, study.Note = `<script>"&'</script>`, "a < b & c"
	f, err := StudyFigure(study)
	if err != nil {
		t.Fatal(err)
	}
	data := f.SVG(FigureOptions{})
	checkSVG(t, data)
	if strings.Contains(string(data), "<script") {
		t.Error("markup came through")
	}
}

// Simplified lines keep within their tolerance of every point left out, and
// their ends.
func TestSimplified(t *testing.T) {
	var ps []point
	for i := range 3000 {
		a := float64(i) / 2999 * 2 * math.Pi
		ps = append(ps, point{300 * math.Cos(a), 100*math.Sin(a) + 20*math.Sin(9*a)})
	}
	out := simplified(ps)
	if len(out) > len(ps)/4 || out[0] != ps[0] || out[len(out)-1] != ps[len(ps)-1] {
		t.Errorf("%d points of %d, from %v to %v", len(out), len(ps), out[0], out[len(out)-1])
	}
	for _, p := range ps {
		least := math.Inf(1)
		for i := 1; i < len(out); i++ {
			least = math.Min(least, offSegment(p, out[i-1], out[i]))
		}
		if least > unseen {
			t.Fatalf("%v is %.3f off", p, least)
		}
	}
}

// A tiny arc is drawn: the rasteriser alone would lose chords of a fraction of a
// pixel.
func TestTinyArcsAreDrawn(t *testing.T) {
	f := &Figure{height: func(float64) float64 { return 400 }, draw: func(s *sheet) {
		ps := make([]point, 49)
		for i := range ps {
			sin, cos := math.Sincos(math.Pi / 2 * float64(i) / 48)
			ps[i] = point{60 + 2.3*cos, 60 + 2.3*sin}
		}
		s.pen(ink, wide)
		s.polyline(ps)
		s.dc.Stroke()
	}}
	if r, _, _, _ := f.Image(FigureOptions{}).At(61, 61).RGBA(); r > 0x8000 {
		t.Errorf("the middle of the arc is as light as %#x", r)
	}
}
