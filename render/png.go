package render

import (
	"bytes"
	"encoding/binary"
	"hash/crc32"
	"image"
	"image/png"
	"io"
	"math"
)

// WritePNG writes an image as PNG that says nothing of its size on paper.
func WritePNG(w io.Writer, im image.Image) error { return WritePNGAt(w, im, 0) }

// WritePNGAt writes an image as PNG of so many pixels an inch, which the file
// holds (chunk pHYs, in pixels a metre: PNG 3rd ed., W3C 2025, 11.3.5.3); 0:
// unknown.
func WritePNGAt(w io.Writer, im image.Image, dpi float64) error {
	if full, ok := im.(*image.RGBA); ok {
		if light := paletted(full); light != nil {
			im = light
		}
	}
	var b bytes.Buffer
	e := png.Encoder{CompressionLevel: png.BestSpeed}
	if err := e.Encode(&b, im); err != nil {
		return err
	}
	// The signature and the header chunk, which always come first, have a fixed
	// length; the size on paper may stand anywhere before the pixels.
	const head = 8 + 4 + 4 + 13 + 4
	parts := [][]byte{b.Bytes()[:head], nil, b.Bytes()[head:]}
	if dpi > 0 {
		parts[1] = physicalSize(dpi)
	}
	for _, part := range parts {
		if _, err := w.Write(part); err != nil {
			return err
		}
	}
	return nil
}

// physicalSize is a chunk pHYs.
func physicalSize(dpi float64) []byte {
	const metre = 1
	perMetre := uint32(math.Round(dpi / millimetresPerInch * 1000))
	var b []byte
	b = binary.BigEndian.AppendUint32(b, 9) // length of the data
	b = append(b, "pHYs"...)
	b = binary.BigEndian.AppendUint32(b, perMetre)
	b = binary.BigEndian.AppendUint32(b, perMetre)
	b = append(b, metre)
	return binary.BigEndian.AppendUint32(b, crc32.ChecksumIEEE(b[4:]))
}
