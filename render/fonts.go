package render

import (
	"sync"

	"github.com/golang/freetype/truetype"
	"golang.org/x/image/font"
	"golang.org/x/image/font/gofont/gobold"
	"golang.org/x/image/font/gofont/goregular"
)

// lettering is one cut and size of type. The zero size is not valid.
type lettering struct {
	Size float64 // units; the height of a line of text
	Bold bool
}

// Sizes of lettering on a sheet, in units.
var (
	small  = lettering{Size: 17}
	normal = lettering{Size: 19}
	strong = lettering{Size: 19, Bold: true}
	head   = lettering{Size: 23, Bold: true}
	figure = lettering{Size: 34, Bold: true}
)

// parsed gives the two cuts of the Go fonts, which are part of the program.
var parsed = sync.OnceValue(func() [2]*truetype.Font {
	var cuts [2]*truetype.Font
	for i, data := range [][]byte{goregular.TTF, gobold.TTF} {
		f, err := truetype.Parse(data)
		if err != nil {
			panic("render: embedded font is damaged")
		}
		cuts[i] = f
	}
	return cuts
})

func (l lettering) font() *truetype.Font {
	if l.Bold {
		return parsed()[1]
	}
	return parsed()[0]
}

// face gives the glyphs of l at a scale of pixels per unit. Faces keep the
// glyphs that they have drawn and serve one goroutine.
func (l lettering) face(scale float64) font.Face {
	return truetype.NewFace(l.font(), &truetype.Options{Size: l.Size * scale, DPI: 72, Hinting: font.HintingNone})
}

// drawable tells whether the font has a shape for every rune of a text.
func (l lettering) drawable(text string) bool {
	for _, r := range text {
		if l.font().Index(r) == 0 {
			return false
		}
	}
	return true
}
