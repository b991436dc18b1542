package render

import (
	"bytes"
	"encoding/binary"
	"hash/crc32"
	"image"
	"image/color"
	"image/png"
	"math"
	"testing"

	"notchproof/scf"
)

// chunks reads the chunks of a PNG by their names, in order, and holds their
// checksums.
func chunks(t *testing.T, file []byte) (names []string, data map[string][]byte) {
	t.Helper()
	data = make(map[string][]byte)
	for at := 8; at < len(file); {
		n := int(binary.BigEndian.Uint32(file[at:]))
		body := file[at+4 : at+8+n]
		if got := binary.BigEndian.Uint32(file[at+8+n:]); got != crc32.ChecksumIEEE(body) {
			t.Fatalf("chunk %s: checksum %x", body[:4], got)
		}
		names = append(names, string(body[:4]))
		data[string(body[:4])] = body[4:]
		at += 12 + n
	}
	return names, data
}

// 80 mm at 300 pixels an inch are 945 pixels; a reader finds 300 again to within
// half a pixel a metre.
func TestPhysicalSize(t *testing.T) {
	im := blank(945, 20)
	im.SetRGBA(3, 3, color.RGBA{168, 32, 38, 255})
	var b bytes.Buffer
	if err := WritePNGAt(&b, im, 300); err != nil {
		t.Fatal(err)
	}
	names, data := chunks(t, b.Bytes())
	if names[0] != "IHDR" || names[1] != "pHYs" {
		t.Fatalf("chunks %v", names)
	}
	size := data["pHYs"]
	if len(size) != 9 || size[8] != 1 || !bytes.Equal(size[:4], size[4:8]) {
		t.Fatalf("pHYs holds %v", size)
	}
	perMetre := float64(binary.BigEndian.Uint32(size))
	if dpi := perMetre * 0.0254; math.Abs(dpi-300) > 0.5*0.0254 {
		t.Errorf("%g pixels an inch", dpi)
	}
	back, err := png.Decode(&b)
	if err != nil {
		t.Fatal(err)
	}
	if r, g, bl, _ := back.At(3, 3).RGBA(); back.Bounds() != im.Bounds() || r>>8 != 168 || g>>8 != 32 || bl>>8 != 38 {
		t.Errorf("the picture came back as %v with %d %d %d", back.Bounds(), r>>8, g>>8, bl>>8)
	}
	b.Reset()
	if err := WritePNG(&b, im); err != nil {
		t.Fatal(err)
	}
	if names, _ := chunks(t, b.Bytes()); names[1] == "pHYs" {
		t.Error("a size on paper that nobody gave")
	}
}

// In 256 colours no pixel is off by more than mostOff, surfaces not by more than
// four levels (which side by side is hardly seen), and all of the picture by half a level on average: what differs
// are softened edges.
func TestPaletteIsFaithful(t *testing.T) {
	part := newPart(t, "shaft-shoulder", scf.Dims{"D": 60, "d": 40, "r": 5})
	f := solved(t, part, scf.Bending, 4)
	for _, o := range []PictureOptions{{Width: 800}, {Width: 800, DPI: 95, Whole: true, Mesh: true}, {Width: 800, DPI: 95, Field: FieldAxial, Whole: true}, {Width: 800, DPI: 95, Style: StyleFringe}} {
		im, err := Picture(f, part, o)
		if err != nil {
			t.Fatal(err)
		}
		full := im.(*image.RGBA)
		light := paletted(full)
		if light == nil {
			t.Errorf("%+v: no palette will do", o)
			continue
		}
		ids, colours := numbered(full)
		sum := 0
		for i := range light.Pix {
			c := light.Palette[light.Pix[i]].(color.RGBA)
			for k, v := range [3]uint8{c.R, c.G, c.B} {
				d := int(v) - int(full.Pix[4*i+k])
				if max(d, -d) > mostOff {
					t.Fatalf("%+v: pixel %d is off by %d", o, i, d)
				}
				if colours[ids[i]].smooth >= surfacePixels && max(d, -d) > 4 {
					t.Fatalf("%+v: pixel %d of a surface is off by %d", o, i, d)
				}
				sum += max(d, -d)
			}
		}
		if mean := float64(sum) / float64(3*len(light.Pix)); mean > 0.5 {
			t.Errorf("%+v: off by %.2f levels on average", o, mean)
		}
	}
}

// Pictures of too many colours are written in full.
func TestTooManyColours(t *testing.T) {
	im := blank(300, 300)
	for i := range 300 * 300 {
		im.SetRGBA(i%300, i/300, color.RGBA{uint8(i), uint8(i >> 3), uint8(i * 7), 255})
	}
	if paletted(im) != nil {
		t.Error("noise was put into 256 colours")
	}
}
