package main

import (
	"bytes"
	"context"
	"fmt"
	"html"
	"os"
	"os/exec"
	"path/filepath"
	"regexp"
	"strconv"
	"strings"
	"testing"
	"time"
)

// browser gives the path of Chromium. Where it is missing the test is skipped,
// but not where every gate must be passed (CI=true): there it must be installed.
func browser(t *testing.T) string {
	t.Helper()
	path, err := exec.LookPath("chromium")
	if err == nil {
		return path
	}
	if os.Getenv("CI") == "true" {
		t.Fatal("chromium is not installed, and CI=true: apt-get install chromium")
	}
	t.Skip("chromium is not installed: sheets are not opened in a browser (apt-get install chromium)")
	return ""
}

// open runs the browser on a file, without a window and without the network,
// and gives what it prints and what it logs.
func open(t *testing.T, path, file string, flags ...string) (out, log string) {
	t.Helper()
	ctx, cancel := context.WithTimeout(context.Background(), 2*time.Minute)
	defer cancel()
	args := append([]string{"--headless", "--no-sandbox", "--disable-gpu", "--disable-quic", "--no-first-run",
		"--disable-background-networking", "--disable-component-update", "--disable-sync", "--disable-dev-shm-usage",
		"--user-data-dir=" + t.TempDir(), "--enable-logging=stderr"}, flags...)
	c := exec.CommandContext(ctx, path, append(args, "file://"+file)...)
	var stdout, stderr bytes.Buffer
	c.Stdout, c.Stderr = &stdout, &stderr
	if err := c.Run(); err != nil {
		t.Fatalf("%v: %v\n%s", flags, err, stderr.String())
	}
	return stdout.String(), stderr.String()
}

// console lists what pages said to the browser's console.
func console(log string) (lines []string) {
	for _, line := range strings.Split(log, "\n") {
		if strings.Contains(line, ":CONSOLE") {
			lines = append(lines, line)
		}
	}
	return lines
}

// TestSheetsInABrowser opens sheets in frames as wide as a telephone and as a
// desk: nothing may reach beyond either side, and the console must stay empty. A
// page that is too wide and one that complains show that both would be seen.
func TestSheetsInABrowser(t *testing.T) {
	chromium := browser(t)
	folder := t.TempDir()
	_, one := sheetOf(t, exitDisagrees, with(steppedShaft, "--load", "bending", "--claim", "1.85", "--claim-from", wicked, "--title", strings.Repeat("W", 180))...)
	_, all := sheetOf(t, exitDisagrees, with(steppedShaft, "--by", wicked)...)
	_, own := sheetOf(t, exitAgrees, "../../testdata/parts/slotted-link.json")
	const wide = `<!DOCTYPE html><html lang="en"><body style="margin:0"><div style="width:1400px">x</div></body></html>`
	pages := []string{one, all, own, wide}
	var b strings.Builder
	b.WriteString("<!DOCTYPE html>\n<body>\n")
	widths := []int{360, 1280}
	for i, page := range pages {
		for _, width := range widths {
			fmt.Fprintf(&b, `<iframe data-page="%d" data-width="%d" style="border:0;width:%dpx;height:3000px" onload="`+
				`var e=this.contentDocument.documentElement;this.dataset.measured=e.clientWidth+' '+e.scrollWidth+' '+this.contentDocument.querySelectorAll('img,svg').length" srcdoc="%s"></iframe>`+"\n",
				i, width, width, html.EscapeString(page))
		}
	}
	frames := filepath.Join(folder, "frames.html")
	writePage(t, frames, b.String())
	dom, log := open(t, chromium, frames, "--dump-dom", "--window-size=1400,1000")
	if lines := console(log); len(lines) > 0 {
		t.Errorf("the console says %q", lines)
	}
	found := 0
	for _, m := range regexp.MustCompile(`data-page="(\d)" data-width="(\d+)"[^>]* data-measured="(\d+) (\d+) (\d+)"`).FindAllStringSubmatch(dom, -1) {
		var v [5]int
		for i := range v {
			v[i], _ = strconv.Atoi(m[i+1])
		}
		page, width, client, scroll, pictures := v[0], v[1], v[2], v[3], v[4]
		found++
		switch {
		case client < width-20 || client > width:
			t.Errorf("page %d is %d wide in a frame of %d", page, client, width)
		case page == len(pages)-1 && scroll <= client:
			t.Errorf("a page of 1400 is not seen to be too wide for %d", width)
		case page < len(pages)-1 && (scroll > client || pictures < 3):
			t.Errorf("page %d, width %d: %d wide, %d pictures", page, client, scroll, pictures)
		}
	}
	if found != len(pages)*len(widths) {
		t.Errorf("%d frames were measured", found)
	}
	bad := filepath.Join(folder, "bad.html")
	writePage(t, bad, `<!DOCTYPE html><title>x</title><script>throw new Error("x")</script>`)
	if _, log := open(t, chromium, bad, "--dump-dom"); len(console(log)) != 1 {
		t.Errorf("a page that fails is not heard: %s", log)
	}
}

// TestSheetsOnPaper prints sheets and counts their pages.
func TestSheetsOnPaper(t *testing.T) {
	chromium := browser(t)
	_, one := sheetOf(t, exitDisagrees, with(steppedShaft, "--load", "bending", "--claim", "1.85")...)
	_, all := sheetOf(t, exitDisagrees, steppedShaft...)
	for _, row := range []struct {
		name, page, paper string
		size              string // of the printed page in points
		most              int
	}{
		{"one load", one, "A4", "594.9", 5},
		{"one load", one, "letter", "612", 5},
		{"three loads", all, "A4", "594.9", 11},
	} {
		folder := t.TempDir()
		file, printed := filepath.Join(folder, "sheet.html"), filepath.Join(folder, "sheet.pdf")
		writePage(t, file, strings.Replace(row.page, "@page {", "@page { size: "+row.paper+";", 1))
		open(t, chromium, file, "--print-to-pdf="+printed, "--no-pdf-header-footer")
		data, err := os.ReadFile(printed)
		if err != nil {
			t.Fatal(err)
		}
		pages := len(regexp.MustCompile(`/Type\s*/Page\b`).FindAll(data, -1))
		t.Logf("%s on %s: %d pages", row.name, row.paper, pages)
		if pages < 3 || pages > row.most {
			t.Errorf("%s on %s: %d pages, at most %d are well", row.name, row.paper, pages, row.most)
		}
		if !bytes.Contains(data, []byte("/MediaBox [0 0 "+row.size)) {
			t.Errorf("%s on %s: the pages have another size: %s", row.name, row.paper, regexp.MustCompile(`/MediaBox \[[^\]]*\]`).Find(data))
		}
	}
}

func writePage(t *testing.T, file, text string) {
	t.Helper()
	if err := os.WriteFile(file, []byte(text), 0o644); err != nil {
		t.Fatal(err)
	}
}
