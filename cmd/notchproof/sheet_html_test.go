package main

import (
	"fmt"
	"html"
	"regexp"
	"slices"
	"strings"
)

// markup finds what is wrong with a page by the rules that its author set
// himself, stricter than the standard: every tag that is opened is closed in
// order, attributes are quoted and single, ids are unique and those that are
// referred to are there, no text holds a bare < or &, no address leaves the page,
// pictures have alternative texts and sizes, header cells a scope, tables a
// caption; one h1, no level of heading left out; the landmarks are there.
func markup(page string) (faults []string) {
	m := &markupReader{rest: page, ids: map[string]bool{}, seen: map[string]int{}}
	m.read()
	return append(m.faults, m.whole(page)...)
}

type markupReader struct {
	rest    string
	open    []string
	ids     map[string]bool
	wanted  []string // ids that are referred to
	seen    map[string]int
	level   int // of the last heading
	faults  []string
	caption bool // seen in the open table
}

func (m *markupReader) fault(format string, args ...any) {
	m.faults = append(m.faults, fmt.Sprintf(format, args...))
}

var (
	tagShape       = regexp.MustCompile(`^<(/?)([a-z][a-zA-Z0-9]*)((?:\s+[a-zA-Z-]+(?:="[^"<]*")?)*)\s*(/?)>`)
	attributeShape = regexp.MustCompile(`\s+([a-zA-Z-]+)(?:="([^"]*)")?`)
	reference      = regexp.MustCompile(`^&(?:[a-z]+|#[0-9]+|#x[0-9a-fA-F]+);`)
	empty          = []string{"meta", "link", "img", "br", "col", "hr", "input"}
)

func (m *markupReader) read() {
	const doctype = "<!DOCTYPE html>\n"
	if !strings.HasPrefix(m.rest, doctype) {
		m.fault("no doctype")
	}
	m.rest = strings.TrimPrefix(m.rest, doctype)
	for m.rest != "" {
		i := strings.IndexAny(m.rest, "<&>")
		if i < 0 {
			break
		}
		m.rest = m.rest[i:]
		switch m.rest[0] {
		case '>':
			m.fault("bare > before %.40q", m.rest)
			m.rest = m.rest[1:]
		case '&':
			r := reference.FindString(m.rest)
			if r == "" {
				m.fault("bare & before %.40q", m.rest)
				r = "&"
			}
			m.rest = m.rest[len(r):]
		default:
			m.tag()
		}
	}
	if len(m.open) > 0 {
		m.fault("left open: %v", m.open)
	}
}

func (m *markupReader) tag() {
	t := tagShape.FindStringSubmatch(m.rest)
	if t == nil {
		m.fault("no tag: %.60q", m.rest)
		m.rest = m.rest[1:]
		return
	}
	m.rest = m.rest[len(t[0]):]
	name := t[2]
	if t[1] == "/" {
		if n := len(m.open); n == 0 || m.open[n-1] != name {
			m.fault("</%s> closes %v", name, m.open)
			return
		}
		m.open = m.open[:len(m.open)-1]
		if name == "table" && !m.caption {
			m.fault("a table without a caption")
		}
		return
	}
	m.element(name, m.attributes(name, t[3]))
	if t[4] == "/" && !slices.Contains(m.open, "svg") {
		m.fault("<%s/> outside a drawing", name)
	}
	if slices.Contains(empty, name) || t[4] == "/" {
		return
	}
	m.open = append(m.open, name)
	if name == "script" || name == "style" { // raw text
		_, after, found := strings.Cut(m.rest, "</"+name+">")
		if !found {
			m.fault("%s is not closed", name)
		}
		m.rest = "</" + name + ">" + after
	}
}

func (m *markupReader) attributes(name, text string) map[string]string {
	list := map[string]string{}
	for _, a := range attributeShape.FindAllStringSubmatch(text, -1) {
		if _, twice := list[a[1]]; twice {
			m.fault("<%s> has %s twice", name, a[1])
		}
		if strings.HasPrefix(a[1], "on") || a[1] == "style" {
			m.fault("<%s> has %s", name, a[1])
		}
		list[a[1]] = html.UnescapeString(a[2])
	}
	return list
}

func (m *markupReader) element(name string, attributes map[string]string) {
	m.seen[name]++
	if id, ok := attributes["id"]; ok {
		if id == "" || m.ids[id] || strings.ContainsAny(id, " \t") {
			m.fault("id %q is empty, has blanks or is not unique", id)
		}
		m.ids[id] = true
	}
	for _, by := range []string{"aria-labelledby", "aria-describedby"} {
		m.wanted = append(m.wanted, strings.Fields(attributes[by])...)
	}
	for _, key := range []string{"src", "href", "action", "data", "poster"} {
		address, ok := attributes[key]
		if to, inside := strings.CutPrefix(address, "#"); inside {
			m.wanted = append(m.wanted, to)
		} else if ok && !strings.HasPrefix(address, "data:image/png;base64,") {
			m.fault("<%s %s=%.40q> leads off the page", name, key, address)
		}
	}
	need := func(keys ...string) {
		for _, k := range keys {
			if attributes[k] == "" {
				m.fault("<%s> has no %s", name, k)
			}
		}
	}
	switch name {
	case "html":
		need("lang")
	case "img":
		need("alt", "width", "height")
	case "svg":
		need("role", "aria-labelledby", "viewBox")
	case "th":
		need("scope")
	case "table":
		m.caption = false
	case "caption":
		m.caption = true
	case "script":
		if attributes["type"] != "application/json" {
			m.fault("a script that runs")
		}
	case "h1", "h2", "h3", "h4":
		level := int(name[1] - '0')
		if level > m.level+1 {
			m.fault("<%s> after a heading of level %d", name, m.level)
		}
		m.level = level
	case "iframe", "object", "embed", "base", "form", "link":
		m.fault("<%s> on a sheet", name)
	}
}

// whole looks at the page as a whole.
func (m *markupReader) whole(page string) (faults []string) {
	for _, id := range m.wanted {
		if !m.ids[id] {
			faults = append(faults, fmt.Sprintf("id %q is referred to and not there", id))
		}
	}
	for name, count := range map[string]int{"h1": 1, "title": 1 + m.seen["svg"], "main": 1, "header": 1, "footer": 1, "html": 1, "head": 1, "body": 1} {
		if m.seen[name] != count {
			faults = append(faults, fmt.Sprintf("<%s> is there %d times", name, m.seen[name]))
		}
	}
	_, style, _ := strings.Cut(page, "<style>")
	style, _, _ = strings.Cut(style, "</style>")
	if strings.Contains(style, "url(") || strings.Contains(style, "@import") || len(style) < 100 {
		faults = append(faults, "the style loads something, or is missing")
	}
	return faults
}
