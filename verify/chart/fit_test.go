package chart

import (
	"context"
	"go/ast"
	"go/parser"
	"go/token"
	"math"
	"math/rand/v2"
	"os"
	"regexp"
	"strconv"
	"strings"
	"testing"

	"notchproof/scf"
)

// evaluate reads the lines of a formula as a calculation would, with nothing but
// what is printed, and gives the factor.
func evaluate(t *testing.T, lines []string, x, y float64) float64 {
	t.Helper()
	known := map[string]float64{}
	last := math.NaN()
	for i, line := range lines {
		name, text, ok := strings.Cut(line, " = ")
		if !ok {
			t.Fatalf("%q: no =", line)
		}
		switch name {
		case "x":
			last = x
		case "y":
			last = y
		default:
			e, err := parser.ParseExpr(text)
			if err != nil {
				t.Fatalf("line %d, %q: %v", i+1, text, err)
			}
			last = value(t, e, known)
		}
		known[name] = last
	}
	return last
}

func value(t *testing.T, e ast.Expr, known map[string]float64) float64 {
	switch e := e.(type) {
	case *ast.BasicLit:
		v, err := strconv.ParseFloat(e.Value, 64)
		if err != nil {
			t.Fatal(err)
		}
		return v
	case *ast.Ident:
		v, ok := known[e.Name]
		if !ok {
			t.Fatalf("%s: not known", e.Name)
		}
		return v
	case *ast.ParenExpr:
		return value(t, e.X, known)
	case *ast.UnaryExpr:
		if e.Op == token.SUB {
			return -value(t, e.X, known)
		}
	case *ast.BinaryExpr:
		a, b := value(t, e.X, known), value(t, e.Y, known)
		switch e.Op {
		case token.ADD:
			return a + b
		case token.SUB:
			return a - b
		case token.MUL:
			return a * b
		case token.QUO:
			return a / b
		}
	case *ast.CallExpr:
		f := map[string]func(float64) float64{"exp": math.Exp, "ln": math.Log, "sqrt": math.Sqrt}[e.Fun.(*ast.Ident).Name]
		if f != nil && len(e.Args) == 1 {
			return f(value(t, e.Args[0], known))
		}
	}
	t.Fatalf("%v: not a formula", e)
	return 0
}

// TestFormulaHolds: what is printed, read back, is within the stated error of the
// points of the chart and of fresh ones that neither the fit nor the measuring of
// its error has seen.
func TestFormulaHolds(t *testing.T) {
	type row struct {
		Words
		most float64 // an error above this were no formula
	}
	rows := []row{
		{words(t, "bar-hole", scf.Tension, "d/W=0.1:0.6:8", ""), 0.01},
		{words(t, "shaft-shoulder", scf.Torsion, "r/d=0.03:0.2:6", "D/d=1.2,1.6,2"), 0.01},
	}
	fresh := 6
	if os.Getenv("NOTCHPROOF_LONG") != "" {
		fresh = 60
		rows = append(rows,
			row{words(t, "shaft-shoulder", scf.Bending, "r/d=0.02:0.3", "D/d=1.1,1.5,2"), 0.01},
			row{words(t, "bar-collar", scf.Tension, "r/d=0.03:0.3", "L/d=0.1,0.2,0.4,1", "D/d=2"), 0.01},
			row{words(t, "bar-edge-notch", scf.Bending, "angle=0:120:9", "d/D=0.6,0.8", "r/D=0.05"), 0.01},
			row{words(t, "bar-hole", scf.Bending, "e/W=0:0.2", "d/W=0.1,0.2,0.3"), 0.01},
			row{words(t, "bar-ellipse", scf.Tension, "a/b=0.5:8", "a/W=0.05,0.15,0.25"), 0.01},
			row{words(t, "bar-hole", scf.Bending, "d/W=0.05:0.95", "e/W=0,0.1,0.2"), 0.1},
			row{words(t, "shaft-shoulder", scf.Tension, "r/d=0.02:0.3", "D/d=1.02,1.1,1.5,3"), 0.01},
		)
	}
	random := rand.New(rand.NewPCG(3, 9))
	for _, w := range rows {
		a := table(t, w.Words)
		q := a.Question
		if err := a.Run(context.Background(), Effort{}, func(int) error { return nil }); err != nil {
			t.Fatal(err)
		}
		f, err := a.Fit(context.Background(), 0, Effort{})
		if err != nil || f == nil {
			t.Fatalf("%s: no formula, %v", w.Along, err)
		}
		points := a.Points
		for tried := 0; tried < fresh; {
			p := q.point(between(f.xs.low, f.xs.high, random.Float64(), q.Along.Log), math.NaN())
			if q.Curves != nil {
				p.Y = between(f.ys.low, f.ys.high, random.Float64(), q.Curves.Log)
			}
			if !a.Inside(p.X, p.Y) {
				continue
			}
			tried++
			p.Status = Missing
			if err := q.solve(context.Background(), &p); err != nil {
				t.Fatal(err)
			}
			points = append(points, p)
		}
		lines, worst := q.Formula(f), 0.0
		for _, p := range points {
			if p.Status != Settled {
				continue
			}
			k := evaluate(t, lines, p.X, p.Y)
			off := math.Abs(k/p.Factor - 1)
			worst = math.Max(worst, off)
			if math.Abs(k/f.Factor(p.X, p.Y)-1) > 1e-12 {
				t.Errorf("%s at %s: printed it gives %g, in the program %g", w.Along, q.Place(p.X, p.Y), k, f.Factor(p.X, p.Y))
			}
			if off > f.Error {
				t.Errorf("%s at %s: %g for %g, off by %g and not by %g at most", w.Along, q.Place(p.X, p.Y), k, p.Factor, off, f.Error)
			}
		}
		if f.Error > w.most || f.Error > 5*worst+2e-3 {
			t.Errorf("%s: an error of %g, where %g was seen", w.Along, f.Error, worst)
		}
		t.Logf("%s, %s by %s: %d terms, stated %g, seen %g\n%s", w.Family.Name, w.Along, w.Curves, f.Terms, f.Error, worst, strings.Join(lines, "\n"))
	}
}

// TestFitFindsTheForm: points that lie on a power law with a term come out to
// rounding, with its coefficients' count or fewer; scattered ones do not.
func TestFitFindsTheForm(t *testing.T) {
	a := table(t, words(t, "shaft-shoulder", scf.Bending, "r/d=0.02:0.3", "D/d=1.1,1.3,1.6,2"))
	law := func(x, y float64) float64 {
		return 1 + 0.4*math.Pow(x, -0.5)*math.Pow(y-1, 0.1+0.02*math.Log(x))
	}
	for i := range a.Points {
		p := &a.Points[i]
		p.Factor, p.Uncertainty, p.Status = law(p.X, p.Y), 1e-6, Settled
	}
	f := a.Question.fit(a.Points, 1e-4)
	for range 20 {
		x, y := 0.02+0.28*rand.Float64(), 1.1+0.9*rand.Float64()
		if off := math.Abs(f.Factor(x, y)/law(x, y) - 1); off > 2e-4 {
			t.Errorf("at %g, %g: off by %g", x, y, off)
		}
	}
	if f.Terms > 4 {
		t.Errorf("%d terms for a law of four", f.Terms)
	}
	short := a.Question.fit(a.Points, 0.2)
	if short.Terms >= f.Terms {
		t.Errorf("%d terms where a fifth is close enough, %d where a ten-thousandth is", short.Terms, f.Terms)
	}
	for i := range a.Points {
		a.Points[i].Status = Undecided
	}
	if a.Question.fit(a.Points, 1e-4) != nil {
		t.Error("a formula from undecided points")
	}
}

// TestLeverageIsTheHatMatrix: leaving a point out is what the short way says.
func TestLeverageIsTheHatMatrix(t *testing.T) {
	a := table(t, words(t, "shaft-shoulder", scf.Bending, "r/d=0.02:0.3", "", "D/d=2"))
	for i := range a.Points {
		p := &a.Points[i]
		p.Factor, p.Uncertainty, p.Status = 1+0.3*math.Pow(p.X, -0.45)+0.01*math.Sin(40*p.X), 1e-4, Settled
	}
	data, _, _ := a.Question.data(a.Points)
	form := form{outer: outers()[0], x: inners()[1], y: inners()[0], p: 3, full: true}
	f := &Fit{xs: extent{0.02, 0.3}, ys: extent{0, 0}}
	all, ok := f.try(form, data)
	if !ok {
		t.Fatal("no fit")
	}
	worst := 0.0
	for i, d := range data {
		rest := append(append([]datum{}, data[:i]...), data[i+1:]...)
		one, ok := f.try(form, rest)
		if !ok {
			t.Fatal("no fit")
		}
		g := &Fit{form: form, coefficients: one.coefficients}
		g.u, g.v = f.scalings(form)
		worst = math.Max(worst, math.Abs(g.Factor(d.x, d.y)/d.k-1))
	}
	if math.Abs(worst/all.left-1) > 1e-6 {
		t.Errorf("largest error at a point left out %g, by leverage %g", worst, all.left)
	}
}

func TestRoundUp(t *testing.T) {
	for _, row := range [][2]float64{{0.0031, 0.004}, {0.003, 0.003}, {0.00141, 0.0015}, {0.0199, 0.02}, {0.097, 0.1}, {0, 0}} {
		if got := RoundUp(row[0]); math.Abs(got-row[1]) > 1e-12 {
			t.Errorf("%g rounded up to %g, not %g", row[0], got, row[1])
		}
	}
}

// TestReadmeFormula: the formula that the README prints gives the factors of the
// chart that it stands under, to within the error that it states.
func TestReadmeFormula(t *testing.T) {
	text, err := os.ReadFile("../../README.md")
	if err != nil {
		t.Fatal(err)
	}
	block := regexp.MustCompile(`(?s)formula, .*?\n(  x = .*?)\n  within ([0-9.]+)\x{00a0}% of`).FindStringSubmatch(string(text))
	if block == nil {
		t.Fatal("no formula in the README")
	}
	lines := strings.Split(block[1], "\n")
	for i := range lines {
		lines[i] = strings.TrimSpace(lines[i])
	}
	percent, err := strconv.ParseFloat(block[2], 64)
	if err != nil {
		t.Fatal(err)
	}
	a := table(t, words(t, "bar-collar", scf.Tension, "r/d=0.03,0.1,0.3", "L/d=0.1,0.3,1", "D/d=2"))
	if err := a.Run(context.Background(), Effort{}, func(int) error { return nil }); err != nil {
		t.Fatal(err)
	}
	for _, p := range a.Points {
		k := evaluate(t, lines, p.X, p.Y)
		if off := math.Abs(k - p.Factor); p.Status != Settled || off > p.Factor*percent/100+p.Uncertainty {
			t.Errorf("%s: %g where %g ± %g is computed", a.Question.Place(p.X, p.Y), k, p.Factor, p.Uncertainty)
		}
	}
}
