package render

import (
	"flag"
	"image"
	"image/png"
	"math"
	"os"
	"path/filepath"
	"strings"
	"testing"

	"notchproof/scf"
)

var update = flag.Bool("update", false, "write the golden pictures anew")

// Golden pictures are compared by eye when they are made and by tolerance ever
// after: a pixel may differ by a few levels (another mesh, another rounding),
// few may differ by more (a line moved by a fraction of its width). When the
// tolerance is passed the new picture is kept beside the old one.
const (
	fewLevels = 24    // of 255, in any channel
	fewPixels = 0.004 // share of the picture
)

func golden(t *testing.T, name string, got image.Image) {
	t.Helper()
	path := filepath.Join("testdata", name+".png")
	if *update {
		writeImage(t, path, got)
		return
	}
	want, err := readImage(path)
	if err != nil {
		t.Fatal(err)
	}
	beside := strings.TrimSuffix(path, ".png") + "_got.png"
	if want.Bounds() != got.Bounds() {
		writeImage(t, beside, got)
		t.Fatalf("%s: size %v instead of %v, see %s", name, got.Bounds(), want.Bounds(), beside)
	}
	if share := differing(want, got); share > fewPixels {
		writeImage(t, beside, got)
		t.Errorf("%s: %.2f %% of the pixels differ, see %s", name, 100*share, beside)
	}
}

// differing is the share of pixels that differ by more than fewLevels.
func differing(a, b image.Image) float64 {
	count := 0
	r := a.Bounds()
	for y := r.Min.Y; y < r.Max.Y; y++ {
		for x := r.Min.X; x < r.Max.X; x++ {
			r1, g1, b1, _ := a.At(x, y).RGBA()
			r2, g2, b2, _ := b.At(x, y).RGBA()
			for _, d := range [3]float64{float64(r1) - float64(r2), float64(g1) - float64(g2), float64(b1) - float64(b2)} {
				if math.Abs(d)/257 > fewLevels {
					count++
					break
				}
			}
		}
	}
	return float64(count) / float64(r.Dx()*r.Dy())
}

func writeImage(t *testing.T, path string, im image.Image) {
	t.Helper()
	if err := os.MkdirAll(filepath.Dir(path), 0o755); err != nil {
		t.Fatal(err)
	}
	f, err := os.Create(path)
	if err != nil {
		t.Fatal(err)
	}
	defer f.Close()
	if err := png.Encode(f, im); err != nil {
		t.Fatal(err)
	}
}

func readImage(path string) (image.Image, error) {
	f, err := os.Open(path)
	if err != nil {
		return nil, err
	}
	defer f.Close()
	return png.Decode(f)
}

func TestGoldenPicture(t *testing.T) {
	part := newPart(t, "shaft-shoulder", scf.Dims{"D": 60, "d": 40, "r": 5})
	im, err := Picture(solved(t, part, scf.Bending, 6), part, PictureOptions{Width: 800, DPI: 95})
	if err != nil {
		t.Fatal(err)
	}
	golden(t, "shaft_shoulder_bending", im)
}

func TestGoldenSketch(t *testing.T) {
	part := newPart(t, "bar-shoulder", scf.Dims{"D": 60, "d": 40, "r": 5, "c": 4})
	golden(t, "bar_shoulder_sketch", SketchFigure(part).Image(FigureOptions{Pixels: 480}))
}

func TestGoldenStudy(t *testing.T) {
	f, err := StudyFigure(geometric())
	if err != nil {
		t.Fatal(err)
	}
	golden(t, "study", f.Image(FigureOptions{Pixels: 480}))
}

// A comparison that would pass anything is none: a line moved by two pixels,
// or a ramp that is a tenth darker, is a difference.
func TestDifferingSees(t *testing.T) {
	draw := func(shift, shade float64) image.Image {
		s := newSheet(400, 600)
		for i := range 20 {
			s.pen(ink, 8)
			s.line(point{20, 20 + 5*float64(i) + shift}, point{200, 20 + 5*float64(i) + shift})
		}
		s.dc.SetColor(tone(0.5 + shade))
		s.dc.DrawRectangle(220, 20, 100, 100)
		s.dc.Fill()
		return s.im
	}
	if d := differing(draw(0, 0), draw(0, 0)); d != 0 {
		t.Errorf("equal pictures differ by %g", d)
	}
	if d := differing(draw(0, 0), draw(2, 0)); d <= fewPixels {
		t.Errorf("moved lines differ by only %g", d)
	}
	if d := differing(draw(0, 0), draw(0, 0.12)); d <= fewPixels {
		t.Errorf("another shade differs by only %g", d)
	}
}
