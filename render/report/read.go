package report

import (
	"bytes"
	"encoding/base64"
	"encoding/json"
	"errors"
	"fmt"
	"html"
	"io"
	"strconv"
	"unicode/utf8"
)

// LongestPage bounds what Read looks at.
const LongestPage = 32 << 20

// ErrNoSheet says that a file is not a calculation sheet.
var ErrNoSheet = errors.New("not a calculation sheet of this program")

// A ChangedError says that a sheet is not as it was made.
type ChangedError struct{ What string }

func (e *ChangedError) Error() string { return "changed after it was made: " + e.What }

// Read takes the content out of a page. Nothing on the page is trusted: the
// record must be whole, and the page must be byte for byte what Page makes of
// the record and of the pictures on it. verbatim is false where that cannot be
// told, because another version of the program, which may word or set things
// otherwise, made the page; then only the record has been read. The errors are
// ErrNoSheet and *ChangedError.
func Read(page []byte, program string) (c *Content, verbatim bool, err error) {
	const begin, end = `<script type="application/json" id="notchproof-report">`, `</script>`
	if len(page) > LongestPage || !utf8.Valid(page) || !bytes.HasPrefix(page, []byte("<!DOCTYPE html>\n")) {
		return nil, false, ErrNoSheet
	}
	_, rest, found := bytes.Cut(page, []byte(begin))
	if !found {
		return nil, false, ErrNoSheet
	}
	record, _, found := bytes.Cut(rest, []byte(end))
	if !found || bytes.Count(page, []byte(begin)) != 1 {
		return nil, false, &ChangedError{"its record is not whole"}
	}
	if c, err = readRecord(record); err != nil {
		return nil, false, err
	}
	again, err := rebuilt(page, c)
	switch {
	case err == nil && bytes.Equal(again, page):
		return c, true, nil
	case c.Program != program:
		return c, false, nil
	case err != nil:
		return nil, false, err
	}
	return nil, false, &ChangedError{"line " + strconv.Itoa(firstDifference(page, again)) + " does not follow from its record"}
}

func readRecord(record []byte) (*Content, error) {
	decoder := json.NewDecoder(bytes.NewReader(record))
	decoder.DisallowUnknownFields()
	c := new(Content)
	if err := decoder.Decode(c); err != nil {
		return nil, &ChangedError{"its record cannot be read"}
	}
	if _, err := decoder.Token(); err != io.EOF {
		return nil, &ChangedError{"something follows its record"}
	}
	if c.Schema != schema {
		return nil, &ChangedError{fmt.Sprintf("its record has the schema %d, this program reads %d", c.Schema, schema)}
	}
	const mostLoads, mostFigures = 16, 64
	if len(c.Results) == 0 || len(c.Results) > mostLoads || len(c.Figures) > mostFigures {
		return nil, &ChangedError{"its record has no results, or more than a sheet can have"}
	}
	return c, nil
}

// rebuilt makes the page anew from its record and its pictures.
func rebuilt(page []byte, c *Content) ([]byte, error) {
	pictures, err := picturesOf(page, c)
	if err != nil {
		return nil, err
	}
	again, err := bytesOf(c, pictures)
	if err != nil {
		return nil, &ChangedError{"its record does not make a page"}
	}
	return again, nil
}

// picturesOf takes the pictures off a page, in the order of the figures.
func picturesOf(page []byte, c *Content) ([][]byte, error) {
	var pictures [][]byte
	rest := page
	for i, f := range c.Figures {
		fault := &ChangedError{fmt.Sprintf("figure %d is not the picture that it was made with", i+1)}
		_, after, found := bytes.Cut(rest, []byte(`<figure class="`+f.Kind+`">`))
		if !found {
			return nil, fault
		}
		body, after, found := bytes.Cut(after, []byte("<figcaption>"))
		if !found {
			return nil, fault
		}
		data, ok := pictureIn(body, f.Media)
		if !ok || digest(data) != f.SHA256 {
			return nil, fault
		}
		pictures, rest = append(pictures, data), after
	}
	return pictures, nil
}

const endSVG = "</svg>\n"

// pictureIn takes the picture out of what stands in a figure.
func pictureIn(body []byte, media string) ([]byte, bool) {
	if media == mediaSVG {
		from, to := bytes.Index(body, []byte("<svg")), bytes.LastIndex(body, []byte(endSVG))
		if from < 0 || to < from {
			return nil, false
		}
		return body[from : to+len(endSVG)], true
	}
	_, after, found := bytes.Cut(body, []byte(`src="`+pngAddress))
	text, _, closed := bytes.Cut(after, []byte(`"`))
	if !found || !closed {
		return nil, false
	}
	// In an attribute the template writes + as a reference.
	data, err := base64.StdEncoding.DecodeString(html.UnescapeString(string(text)))
	return data, err == nil
}

// firstDifference is the line in which two texts part.
func firstDifference(a, b []byte) int {
	line := 1
	for i := range min(len(a), len(b)) {
		if a[i] != b[i] {
			break
		}
		if a[i] == '\n' {
			line++
		}
	}
	return line
}
