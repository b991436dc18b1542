package chart

import (
	"bytes"
	"encoding/csv"
	"errors"
	"fmt"
	"io"
	"io/fs"
	"math"
	"os"
	"slices"
	"strings"

	"notchproof/scf"
)

// What reading a table found out besides the table.
type found struct {
	whole   int   // bytes up to the end of the last whole record
	cut     bool  // something stood behind them: a record that was not finished
	indices []int // of the points, in the order of the file
}

// longestTable bounds what is read, far above the largest chart.
const longestTable = 1 << 24

// ReadFile reads the table of a chart. A last line without an end was cut off
// while it was written and is left out; cut tells so. Errors are *Fault.
func ReadFile(name string) (t *Table, cut bool, err error) {
	file, err := os.Open(name)
	if err != nil {
		return nil, false, unreadable(name, err)
	}
	defer file.Close()
	data, err := readAll(file, name)
	if err != nil {
		return nil, false, err
	}
	t, f, err := read(data, name)
	return t, f.cut, err
}

func readAll(r io.Reader, name string) ([]byte, error) {
	data, err := io.ReadAll(io.LimitReader(r, longestTable+1))
	if err != nil {
		return nil, unreadable(name, err)
	}
	if len(data) > longestTable {
		return nil, fault("name another file", "%q: too long for the table of a chart", name)
	}
	return data, nil
}

func unreadable(name string, err error) error {
	var path *fs.PathError
	if errors.As(err, &path) {
		err = path.Err
	}
	if errors.Is(err, fs.ErrNotExist) {
		return fault("name files that chart wrote", "%q: no such file", name)
	}
	return fault("choose a file that may be read and written", "%q: %v", name, err)
}

func read(data []byte, name string) (*Table, found, error) {
	var f found
	f.whole = bytes.LastIndexByte(data, '\n') + 1
	f.cut = f.whole < len(data)
	data = data[:f.whole]
	words, head, err := readHead(data, name)
	if err != nil {
		return nil, f, err
	}
	t, err := words.table()
	if err != nil {
		return nil, f, fault("it was changed by hand, or made by another version", "%q: its question cannot be read: %v", name, err)
	}
	r := csv.NewReader(bytes.NewReader(data[head:]))
	columns := t.columns()
	r.FieldsPerRecord = len(columns)
	line := bytes.Count(data[:head], []byte("\n"))
	place := func() string {
		at, _ := r.FieldPos(0)
		return fmt.Sprintf("%q line %d", name, line+at)
	}
	first, err := r.Read()
	if err != nil || !slices.Equal(first, columns) {
		return nil, f, fault("it was changed by hand, or made by another version", "%q: its columns are not those of its question, %s", name, strings.Join(columns, ", "))
	}
	for {
		fields, err := r.Read()
		if errors.Is(err, io.EOF) {
			return t, f, nil
		}
		if err != nil {
			return nil, f, fault("remove the line, and it is computed again", "%q: not the table of a chart: %v", name, shifted(err, line))
		}
		i, err := t.take(fields)
		if err != nil {
			return nil, f, fault("remove the line, and it is computed again", "%s: %v", place(), err)
		}
		f.indices = append(f.indices, i)
	}
}

// shifted counts the lines of an error from the top of the file.
func shifted(err error, lines int) error {
	var parse *csv.ParseError
	if errors.As(err, &parse) {
		return fmt.Errorf("line %d: %w", lines+parse.Line, parse.Err)
	}
	return err
}

// readHead reads the question and gives the length of its lines.
func readHead(data []byte, name string) (w Words, length int, err error) {
	refuse := func(format string, args ...any) (Words, int, error) {
		return w, 0, fault("give a file that chart wrote", "%q: %s", name, fmt.Sprintf(format, args...))
	}
	for no := 0; bytes.HasPrefix(data[length:], []byte("#")); no++ {
		end := length + bytes.IndexByte(data[length:], '\n')
		line := strings.TrimSpace(string(data[length+1 : end]))
		length = end + 1
		key, value, _ := strings.Cut(line, " ")
		if no == 0 {
			if line != firstLine {
				return refuse("not the table of a chart")
			}
			continue
		}
		if err := w.set(key, value); err != nil {
			return refuse("line %d: %v", no+1, err)
		}
	}
	if length == 0 {
		return refuse("not the table of a chart")
	}
	if w.Family == nil || !w.Family.Carries(w.Load) {
		return refuse("its head says nothing of a family with a load")
	}
	return w, length, nil
}

// set takes one line of the head.
func (w *Words) set(key, value string) (err error) {
	switch key {
	case "family":
		f, ok := scf.Lookup(value)
		if !ok {
			return fmt.Errorf("%q: no such family", value)
		}
		w.Family = f
	case "load":
		w.Load = scf.Load(value)
	case "given":
		w.Given = append(w.Given, value)
	case "along":
		w.Along = strings.ReplaceAll(value, " ", ",")
	case "curves":
		w.Curves = strings.ReplaceAll(value, " ", ",")
	case "nu":
		if w.Options.Nu, err = number(value); err == nil && !(w.Options.Nu >= 0 && w.Options.Nu < 0.5) {
			err = errors.New("not a Poisson's ratio")
		}
	case "force-line":
		if w.Options.ForceLine = value; value != scf.ForceLineNet && value != scf.ForceLineGross {
			err = fmt.Errorf("%q: no such force line", value)
		}
	case "target":
		if w.Target, err = number(value); err == nil && !(w.Target > 0 && w.Target < 1) {
			err = errors.New("not a target")
		}
	default:
		err = fmt.Errorf("%q: nothing that a question has", key)
	}
	return err
}

// table reads the question and lays out its grid.
func (w Words) table() (*Table, error) {
	q, err := w.Read()
	if err != nil {
		return nil, err
	}
	return q.Table()
}

// take reads one record into its point.
func (t *Table) take(fields []string) (int, error) {
	p := Point{Y: math.NaN()}
	numbers := []*float64{&p.X, &p.Factor, &p.Uncertainty}
	if t.Question.Curves != nil {
		numbers = slices.Insert(numbers, 1, &p.Y)
	}
	for k, to := range numbers {
		v, err := number(fields[k])
		if err != nil {
			return 0, fmt.Errorf("%q: not a number", fields[k])
		}
		*to = v
	}
	if math.IsNaN(p.Uncertainty) {
		p.Uncertainty = math.Inf(1)
	}
	rest := fields[len(numbers):]
	status := slices.Index(statusWords[:], rest[0])
	if status <= int(Missing) {
		return 0, fmt.Errorf("%q: no such status", rest[0])
	}
	p.Status, p.Why = Status(status), rest[1]
	if p.Status == Settled && !(p.Factor > 0 && p.Uncertainty >= 0 && p.Uncertainty < math.Inf(1)) {
		return 0, fmt.Errorf("settled without a factor and its uncertainty")
	}
	i := t.find(p.X, p.Y)
	if i < 0 {
		return 0, fmt.Errorf("%s is no point of the chart", t.Question.Place(p.X, p.Y))
	}
	return i, t.put(i, p)
}

// find gives the index of a point, −1 where the grid has none.
func (t *Table) find(x, y float64) int {
	return slices.IndexFunc(t.Points, func(p Point) bool {
		return p.X == x && (p.Y == y || t.Question.Curves == nil)
	})
}

// put takes over a point that was computed elsewhere. What is known already must
// agree within the bars of both.
func (t *Table) put(i int, p Point) error {
	own := &t.Points[i]
	p.Handbook = own.Handbook // of this program, not of the file
	switch {
	case (own.Status == NotDrawn) != (p.Status == NotDrawn):
		return fmt.Errorf("%s: %s, but %s here", t.Question.Place(p.X, p.Y), p.Status, own.Status)
	case !t.held[i] || own.Status != Settled:
		*own = p
	case p.Status == Settled && math.Abs(p.Factor-own.Factor) > p.Uncertainty+own.Uncertainty:
		return fmt.Errorf("%s: %g ± %.2g and %g ± %.2g exclude each other", t.Question.Place(p.X, p.Y), own.Factor, own.Uncertainty, p.Factor, p.Uncertainty)
	}
	t.held[i] = true
	return nil
}
