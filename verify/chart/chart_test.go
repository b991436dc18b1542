package chart

import (
	"bytes"
	"context"
	"errors"
	"math"
	"os"
	"path/filepath"
	"testing"

	"notchproof/scf"
	"notchproof/verify"
	"notchproof/verify/specimen"
)

// words is a question about a family.
func words(t testing.TB, family string, load scf.Load, along, curves string, given ...string) Words {
	t.Helper()
	f, ok := scf.Lookup(family)
	if !ok {
		t.Fatal(family)
	}
	return Words{Family: f, Load: load, Options: scf.Options{Nu: 0.3}, Along: along, Curves: curves, Given: given}
}

func table(t testing.TB, w Words) *Table {
	t.Helper()
	table, err := w.table()
	if err != nil {
		t.Fatal(err)
	}
	return table
}

// small is a chart of six points, one of which cannot be drawn.
func small(t testing.TB) Words {
	return words(t, "shaft-groove", scf.Torsion, "r/D=0.03:0.09:3", "d/D=0.7,0.9", "angle=20")
}

// TestPointsAreDirectChecks: a point is what a check of the same shape says, bit
// for bit, whatever is the ratio it is asked by; and sizes do not matter.
func TestPointsAreDirectChecks(t *testing.T) {
	a := table(t, small(t))
	if err := a.Run(context.Background(), Effort{}, func(int) error { return nil }); err != nil {
		t.Fatal(err)
	}
	f, _ := scf.Lookup("shaft-groove")
	for _, p := range a.Points {
		for _, size := range []float64{1, 50} {
			part, err := specimen.New(f, scf.Dims{"D": size, "d": size * p.Y, "r": size * p.X, "angle": 20}, "", scf.Options{Nu: 0.3})
			if err != nil {
				t.Fatal(err)
			}
			r, err := verify.Run(context.Background(), part, []scf.Load{scf.Torsion}, verify.Options{Target: 1e-3})
			if err != nil {
				t.Fatal(err)
			}
			e := r.Findings[0].Computed.Factor
			if size == 1 && (e.Value != p.Factor || e.Uncertainty != p.Uncertainty) || math.Abs(e.Value-p.Factor) > e.Uncertainty+p.Uncertainty {
				t.Errorf("%s at size %g: %g ± %g, checked %g ± %g", a.Question.Place(p.X, p.Y), size, p.Factor, p.Uncertainty, e.Value, e.Uncertainty)
			}
		}
	}
}

// whole runs a chart into a file in one go.
func whole(t *testing.T, w Words, file string, e Effort) []byte {
	t.Helper()
	a := table(t, w)
	j, err := Open(file, a)
	if err != nil {
		t.Fatal(err)
	}
	if err := a.Run(context.Background(), e, j.Keep); err != nil {
		t.Fatal(err)
	}
	if _, err := j.Close(); err != nil {
		t.Fatal(err)
	}
	data, err := os.ReadFile(file)
	if err != nil {
		t.Fatal(err)
	}
	return data
}

func written(t *testing.T, a *Table) []byte {
	var b bytes.Buffer
	if err := a.Write(&b); err != nil {
		t.Fatal(err)
	}
	return b.Bytes()
}

// TestSharesJoinToTheWhole: shares computed apart and joined in any order are the
// same bytes as one run; with one missing its points are named.
func TestSharesJoinToTheWhole(t *testing.T) {
	dir := t.TempDir()
	want := whole(t, small(t), filepath.Join(dir, "whole.csv"), Effort{Workers: 3})
	var shares []*Table
	for k := 3; k >= 1; k-- {
		file := filepath.Join(dir, "share.csv")
		whole(t, small(t), file, Effort{Workers: 2, Share: Share{k, 3}})
		a, cut, err := ReadFile(file)
		os.Remove(file)
		if err != nil || cut || len(a.Absent()) != 4 {
			t.Fatalf("share %d: %v, %v, %d points absent", k, err, cut, len(a.Absent()))
		}
		shares = append(shares, a)
	}
	joined := shares[0]
	for _, s := range shares[1:] {
		if bytes.Equal(written(t, joined), want) {
			t.Error("two shares are the whole")
		}
		if err := joined.Join(s, "a", "b"); err != nil {
			t.Fatal(err)
		}
		if err := joined.Join(s, "a", "b"); err != nil {
			t.Errorf("the same again: %v", err)
		}
	}
	if got := written(t, joined); !bytes.Equal(got, want) || len(joined.Absent()) > 0 {
		t.Errorf("joined\n%s\nin one run\n%s", got, want)
	}
}

// TestInterruptedRunGoesOn: a run that is stopped keeps what is done, and the
// next one makes the same table as one that was never stopped, even where the
// last record was cut off in the middle.
func TestInterruptedRunGoesOn(t *testing.T) {
	dir := t.TempDir()
	want := whole(t, small(t), filepath.Join(dir, "whole.csv"), Effort{})
	for _, cut := range []int{0, 1, 7} {
		file := filepath.Join(dir, "stopped.csv")
		os.Remove(file)
		ctx, stop := context.WithCancel(context.Background())
		a := table(t, small(t))
		j, err := Open(file, a)
		if err != nil {
			t.Fatal(err)
		}
		kept := 0
		err = a.Run(ctx, Effort{Workers: 2}, func(i int) error {
			if kept++; kept == 3 {
				stop()
			}
			return j.Keep(i)
		})
		stop()
		j.Close()
		if !errors.Is(err, context.Canceled) || kept < 3 || kept == len(a.Points) {
			t.Fatalf("stopped after 3: %v with %d points", err, kept)
		}
		data, _ := os.ReadFile(file)
		if err := os.Truncate(file, int64(len(data)-cut)); err != nil {
			t.Fatal(err)
		}
		b := table(t, small(t))
		if j, err = Open(file, b); err != nil {
			t.Fatal(err)
		}
		lost := 0
		if cut > 0 {
			lost = 1
		}
		if j.Kept != kept-lost || j.Cut != (cut > 0) {
			t.Errorf("%d bytes cut off: %d points kept of %d, cut %v", cut, j.Kept, kept, j.Cut)
		}
		if err := b.Run(context.Background(), Effort{}, j.Keep); err != nil {
			t.Fatal(err)
		}
		mixed, _ := j.Close()
		got, _ := os.ReadFile(file)
		if !mixed && !bytes.Equal(got, want) || !bytes.Equal(written(t, b), want) {
			t.Errorf("gone on with\n%s\nin one run\n%s", got, want)
		}
	}
}

// BenchmarkChart is a chart of 3 curves with 12 points each and its formula.
func BenchmarkChart(b *testing.B) {
	w := words(b, "shaft-shoulder", scf.Bending, "r/d=0.02:0.3", "D/d=1.1,1.5,2")
	b.Run("points", func(b *testing.B) {
		for b.Loop() {
			a := table(b, w)
			if err := a.Run(context.Background(), Effort{}, func(int) error { return nil }); err != nil {
				b.Fatal(err)
			}
		}
	})
	a := table(b, w)
	if err := a.Run(context.Background(), Effort{}, func(int) error { return nil }); err != nil {
		b.Fatal(err)
	}
	b.Run("formula", func(b *testing.B) {
		for b.Loop() {
			if f, err := a.Fit(context.Background(), 0, Effort{}); err != nil || f == nil {
				b.Fatal(err)
			}
		}
	})
	b.Run("least squares", func(b *testing.B) {
		for b.Loop() {
			if a.Question.fit(a.Points, defaultWithin) == nil {
				b.Fatal("no fit")
			}
		}
	})
}
