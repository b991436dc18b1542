package specimen

import (
	"bytes"
	"encoding/json"
	"errors"
	"fmt"
	"io"
	"strings"
	"unicode/utf8"
)

// Bounds of what a part file may be. Four levels are all that one needs.
const (
	longestFile = 1 << 20 // bytes
	deepestFile = 16
)

// A node is a value of the file with its place.
type node struct {
	path    string // key by key from the top: "shape.nominal.x"
	at      int    // byte of its first character
	kind    byte   // one of the kinds below
	text    string // of a string, decoded; of anything else plain, as written
	members []member
	items   []*node
}

type member struct {
	name  string
	at    int // byte of the key
	value *node
}

const (
	isText   = 's'
	isNumber = 'n'
	isTruth  = 't' // true or false
	isNull   = '0'
	isObject = '{'
	isList   = '['
)

// member finds the value of a key; nil: it is not there.
func (n *node) member(name string) *node {
	for _, m := range n.members {
		if m.name == name {
			return m.value
		}
	}
	return nil
}

// shown is a value as an error quotes it.
func (n *node) shown() string {
	switch n.kind {
	case isObject:
		return "{…}"
	case isList:
		return "[…]"
	}
	if n.text == "" {
		return `""`
	}
	return n.text
}

// readTree takes a document apart.
func (d *document) readTree() (*node, error) {
	if len(d.data) > longestFile {
		return nil, d.fail(0, InputError{What: "file", Value: fmt.Sprintf("%d bytes", len(d.data)), Reason: "too large for a part file", Hint: "up to 1 MiB can be read"})
	}
	if err := d.checkText(); err != nil {
		return nil, err
	}
	// A check of the whole text first: what follows meets no broken syntax,
	// except that nesting is bounded here already.
	if err := d.checkDepth(); err != nil {
		return nil, err
	}
	var raw json.RawMessage
	if err := json.Unmarshal(d.data, &raw); err != nil {
		return nil, d.syntax(err)
	}
	t := treeReader{document: d, tokens: json.NewDecoder(bytes.NewReader(d.data))}
	t.tokens.UseNumber()
	return t.value("")
}

// checkText refuses what is no text at all.
func (d *document) checkText() error {
	for at := 0; at < len(d.data); {
		r, n := utf8.DecodeRune(d.data[at:])
		if r == utf8.RuneError && n == 1 || r == 0 {
			return d.fail(at, InputError{What: "file", Value: fmt.Sprintf("byte 0x%02x", d.data[at]), Reason: "not text", Hint: "a part file is JSON in UTF-8"})
		}
		at += n
	}
	return nil
}

// checkDepth counts brackets outside of strings.
func (d *document) checkDepth() error {
	depth, quoted := 0, false
	for at := 0; at < len(d.data); at++ {
		switch c := d.data[at]; {
		case quoted && c == '\\':
			at++
		case c == '"':
			quoted = !quoted
		case quoted:
		case c == '{' || c == '[':
			if depth++; depth > deepestFile {
				return d.fail(at, InputError{What: "file", Value: string(c), Reason: fmt.Sprintf("nested more than %d deep", deepestFile), Hint: "a part file needs four levels"})
			}
		case c == '}' || c == ']':
			depth--
		}
	}
	return nil
}

// syntax words an error of the JSON reader.
func (d *document) syntax(err error) error {
	var s *json.SyntaxError
	if !errors.As(err, &s) {
		return d.fail(0, InputError{What: "file", Reason: "not readable as JSON: " + err.Error()})
	}
	at := int(s.Offset) - 1 // the offset is behind the offending byte
	if len(bytes.TrimSpace(d.data)) == 0 {
		return d.fail(0, InputError{What: "file", Reason: "empty", Hint: `a part file is {"shape": {…}, …}`})
	}
	if strings.Contains(s.Error(), "unexpected end") {
		return d.fail(len(d.data), InputError{What: "file", Reason: "ends too early", Hint: "a bracket or a quote is not closed"})
	}
	fault := InputError{What: "file", Reason: "not JSON: " + s.Error(), Hint: "keys and texts stand in double quotes, entries are separated by commas, and nothing follows the last bracket"}
	return d.fail(at, fault)
}

// A treeReader builds nodes from tokens.
type treeReader struct {
	*document
	tokens *json.Decoder
}

// next gives the next token and the byte at which it begins: what lies between
// the end of the last token and it are spaces, a comma or a colon.
func (t *treeReader) next() (json.Token, int, error) {
	at := int(t.tokens.InputOffset())
	for at < len(t.data) && strings.IndexByte(" \t\r\n,:", t.data[at]) >= 0 {
		at++
	}
	token, err := t.tokens.Token()
	if err != nil {
		if errors.Is(err, io.EOF) {
			err = io.ErrUnexpectedEOF
		}
		return nil, at, t.fail(at, InputError{What: "file", Reason: "not JSON: " + err.Error()})
	}
	return token, at, nil
}

func (t *treeReader) value(path string) (*node, error) {
	token, at, err := t.next()
	if err != nil {
		return nil, err
	}
	n := &node{path: path, at: at}
	switch v := token.(type) {
	case string:
		n.kind, n.text = isText, v
	case json.Number:
		n.kind, n.text = isNumber, v.String()
	case bool:
		n.kind, n.text = isTruth, fmt.Sprint(v)
	case nil:
		n.kind, n.text = isNull, "null"
	case json.Delim:
		n.kind = byte(v)
		if v == '{' {
			err = t.object(n)
		} else {
			err = t.list(n)
		}
	}
	return n, err
}

func (t *treeReader) object(n *node) error {
	seen := make(map[string]int)
	for t.tokens.More() {
		token, at, err := t.next()
		if err != nil {
			return err
		}
		name := token.(string)
		if twin, twice := seen[name]; twice {
			first := t.fail(twin, InputError{})
			return t.fail(at, InputError{What: "key", Value: name, Reason: fmt.Sprintf("given twice, first in line %d", first.Line), Hint: "give each key once"})
		}
		seen[name] = at
		v, err := t.value(strings.TrimPrefix(n.path+"."+name, "."))
		if err != nil {
			return err
		}
		n.members = append(n.members, member{name, at, v})
	}
	_, _, err := t.next()
	return err
}

func (t *treeReader) list(n *node) error {
	for t.tokens.More() {
		v, err := t.value(fmt.Sprintf("%s[%d]", n.path, len(n.items)+1))
		if err != nil {
			return err
		}
		n.items = append(n.items, v)
	}
	_, _, err := t.next()
	return err
}
