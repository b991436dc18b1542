package chart

import (
	"fmt"
	"os"
)

// A Journal is the file of a table that grows with every point. Whatever stops
// the run, the points in it are there for the next one.
type Journal struct {
	file  *os.File
	name  string
	table *Table
	last  int // the point written last
	mixed bool

	Kept int  // points that the file had
	Cut  bool // its last line was not finished, and is gone
}

// Open takes over what a file has of a table, and goes on with it; a file that is
// not there, or empty, is begun. Its errors are *Fault.
func Open(name string, t *Table) (j *Journal, err error) {
	file, err := os.OpenFile(name, os.O_RDWR|os.O_CREATE|os.O_APPEND, 0o644)
	if err != nil {
		return nil, unreadable(name, err)
	}
	defer func() {
		if err != nil {
			file.Close()
		}
	}()
	data, err := readAll(file, name)
	if err != nil {
		return nil, err
	}
	j = &Journal{file: file, name: name, table: t, last: -1}
	if len(data) == 0 {
		return j, j.write(t.Head())
	}
	return j, j.resume(data)
}

// resume takes over the points of the file and makes ready to go on behind them.
func (j *Journal) resume(data []byte) error {
	old, f, err := read(data, j.name)
	if err != nil {
		return err
	}
	if mine, theirs, differ := j.table.Question.differs(old.Question); differ {
		return fault("name another file for the table, or remove that one", "%q holds the points of another question: %s, not %s", j.name, theirs, mine)
	}
	if err := j.table.Join(old, "this chart", j.name); err != nil {
		return err
	}
	j.Kept, j.Cut = len(f.indices), f.cut
	for _, i := range f.indices {
		j.note(i)
	}
	if !f.cut {
		return nil
	}
	if err := j.file.Truncate(int64(f.whole)); err != nil {
		return unreadable(j.name, err)
	}
	return nil
}

// note remembers whether the file has its points in the order of the table.
func (j *Journal) note(i int) {
	j.mixed = j.mixed || i <= j.last
	j.last = i
}

// Keep adds a point.
func (j *Journal) Keep(i int) error {
	j.note(i)
	return j.write(j.table.Row(i))
}

// write writes whole records in one call, so that what stops the program does
// not stop it between them.
func (j *Journal) write(b []byte) error {
	if _, err := j.file.Write(b); err != nil {
		return fmt.Errorf("%q: %w", j.name, err)
	}
	return nil
}

// Close ends the journal. Mixed tells that the points are not in the order of
// the table, as after a run that was stopped: Table.Write has them in order.
func (j *Journal) Close() (mixed bool, err error) { return j.mixed, j.file.Close() }
