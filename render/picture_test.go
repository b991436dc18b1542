package render

import (
	"io"
	"testing"

	"gonum.org/v1/gonum/spatial/r2"

	"notchproof/scf"
	"notchproof/verify"
)

func TestPictureRefusesWithoutSolution(t *testing.T) {
	part := newPart(t, "shaft-shoulder", scf.Dims{"D": 60, "d": 40, "r": 5})
	f := solved(t, part, scf.Torsion, 2)
	f.Computed.Peak = verify.Peak{}
	if _, err := Picture(f, part, PictureOptions{}); err == nil {
		t.Error("a peak of zero was drawn")
	}
	f.Computed.Last = nil
	if _, err := Picture(f, part, PictureOptions{}); err == nil {
		t.Error("a finding without a solution was drawn")
	}
}

// The picture does not depend on how the work was shared out.
func TestPictureTwice(t *testing.T) {
	part := newPart(t, "bar-shoulder", scf.Dims{"D": 60, "d": 40, "r": 5})
	f := solved(t, part, scf.Bending, 3)
	first, err := Picture(f, part, PictureOptions{Width: 400, Mesh: true})
	if err != nil {
		t.Fatal(err)
	}
	second, _ := Picture(f, part, PictureOptions{Width: 400, Mesh: true})
	b := first.Bounds()
	for y := b.Min.Y; y < b.Max.Y; y++ {
		for x := b.Min.X; x < b.Max.X; x++ {
			if first.At(x, y) != second.At(x, y) {
				t.Fatalf("pixel %d,%d differs", x, y)
			}
		}
	}
}

// The colours of the field are those of the stresses: far from the notch a
// stretched plain bar has the tone of its uniform stress.
func TestPictureTones(t *testing.T) {
	part := newPart(t, "bar-shoulder", scf.Dims{"D": 60, "d": 40, "r": 5})
	f := solved(t, part, scf.Tension, 4)
	s, err := picture(f, part, PictureOptions{Width: 800, DPI: 95, Whole: true})
	if err != nil {
		t.Fatal(err)
	}
	room := partRoom(1600)
	v, left, right := partView(part, s.box(room), true, s.scale)
	for i, x := range []float64{left, right} {
		p := v.at(r2.Vec{X: x, Y: part.Dims["d"] / 4})
		p.X += []float64{20, -20}[i]
		got := s.im.RGBAAt(int(p.X), int(p.Y))
		stress := part.Dims["d"] / (2 * part.Plain[i].High)
		want := tone(stress / f.Computed.Peak.Factor)
		if d := difference(cielab(lightOf(got)), cielab(lightOf(want))); d > 1.5 {
			t.Errorf("end %d: tone %v instead of %v", i, got, want)
		}
	}
}

// BenchmarkPicture is all that a picture takes beyond the solve: drawing it at
// the default width and writing the PNG.
func BenchmarkPicture(b *testing.B) {
	part := newPart(b, "shaft-shoulder", scf.Dims{"D": 60, "d": 40, "r": 3})
	f := solved(b, part, scf.Bending, 7)
	for _, c := range []struct {
		name string
		o    PictureOptions
	}{{"half", PictureOptions{}}, {"whole", PictureOptions{Whole: true}}, {"mesh", PictureOptions{Mesh: true}}, {"fringe", PictureOptions{Style: StyleFringe}}} {
		b.Run(c.name, func(b *testing.B) {
			for b.Loop() {
				im, err := Picture(f, part, c.o)
				if err != nil {
					b.Fatal(err)
				}
				if err := WritePNG(io.Discard, im); err != nil {
					b.Fatal(err)
				}
			}
		})
	}
}

func BenchmarkShade(b *testing.B) {
	part := newPart(b, "shaft-shoulder", scf.Dims{"D": 60, "d": 40, "r": 3})
	f := solved(b, part, scf.Bending, 7)
	field, err := newField([]Term{{f.Computed.Last, f.Load, 1}}, true, true, reading{of: firstPrincipal})
	if err != nil {
		b.Fatal(err)
	}
	v, _, _ := mainView(part, box{165, 112, 1435, 512}, 1)
	for b.Loop() {
		field.shade(v)
	}
}
