package report

import (
	"bytes"
	_ "embed"
	"encoding/base64"
	"encoding/json"
	"errors"
	"fmt"
	"html/template"
	"io"
	"strings"

	"notchproof/render/number"
)

//go:embed page.html.tmpl
var pageText string

//go:embed sheet.css
var sheetStyle string

// Page writes a content with its pictures as HTML. Everything that people wrote
// is escaped by html/template for the place where it stands. The same content
// and pictures give the same bytes.
func Page(w io.Writer, c *Content, pictures [][]byte) error {
	if len(pictures) != len(c.Figures) {
		return errors.New("report: pictures and figures differ in number")
	}
	record, err := json.Marshal(c) // escapes <, > and &
	if err != nil {
		return fmt.Errorf("report: %w", err)
	}
	t, err := template.New("page").Funcs(functions()).Parse(pageText)
	if err != nil {
		return fmt.Errorf("report: %w", err)
	}
	return t.Execute(w, &page{c, template.CSS(sheetStyle), template.JS(record), pictures})
}

// A page is what the template sees.
type page struct {
	*Content
	Style    template.CSS
	Record   template.JS
	pictures [][]byte
}

// A findingView is one load on the page.
type findingView struct {
	*Finding
	Page    *page
	No      int // of the section
	Several bool
	Unit    string
}

// A figureView is a figure with its picture: the address of an image, or the
// drawing itself.
type figureView struct {
	Figure
	Address template.URL
	Drawing template.HTML
}

func functions() template.FuncMap {
	return template.FuncMap{
		"finding": func(p *page, i int) findingView {
			return findingView{&p.Results[i], p, i + 3, len(p.Results) > 1, p.Part.Unit}
		},
		"figures":          (*page).figures,
		"add":              func(a, b int) int { return a + b },
		"first":            upperFirst,
		"symbol":           symbolMarkup,
		"command":          Input.Command,
		"answer":           Computed.answer,
		"passed":           passed,
		"lost":             Handbook.lost,
		"lengthsIn":        lengthsIn,
		"unit":             unitText,
		"count":            number.Count,
		"compact":          number.Compact,
		"decimal":          number.Decimal,
		"length":           func(v float64) string { return number.Length(v, "") },
		"coordinate":       coordinate,
		"percent":          func(v float64) string { return number.Percent(v, 0) },
		"percentFine":      percentFine,
		"signed":           func(v Number) string { return number.SignedPercent(float64(v), 1) },
		"significant":      func(v Number, digits int) string { return number.Significant(float64(v), digits) },
		"significantPlain": number.Significant,
		"fixed":            func(v Number, decimals int) string { return number.Decimal(float64(v), decimals) },
		"scientific":       scientific,
	}
}

// figures are those of a load and kind.
func (p *page) figures(load, kind string) []figureView {
	var list []figureView
	for i, f := range p.Figures {
		if f.Load != load || f.Kind != kind {
			continue
		}
		v := figureView{Figure: f}
		if f.Media == mediaSVG {
			v.Drawing = template.HTML(p.pictures[i])
		} else {
			v.Address = template.URL(pngAddress + base64.StdEncoding.EncodeToString(p.pictures[i]))
		}
		list = append(list, v)
	}
	return list
}

const (
	mediaPNG   = "image/png"
	mediaSVG   = "image/svg+xml"
	pngAddress = "data:image/png;base64,"
)

// symbolMarkup sets K with its subscript.
func symbolMarkup(symbol string) template.HTML {
	k, sub, ok := strings.Cut(symbol, "K")
	if !ok || k != "" || sub != "t" && sub != "ts" {
		return template.HTML(template.HTMLEscapeString(symbol))
	}
	return template.HTML("K<sub>" + sub + "</sub>")
}

// bytesOf is a page in memory.
func bytesOf(c *Content, pictures [][]byte) ([]byte, error) {
	var b bytes.Buffer
	err := Page(&b, c, pictures)
	return b.Bytes(), err
}
