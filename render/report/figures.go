package report

import (
	"bytes"
	"crypto/sha256"
	"encoding/hex"
	"fmt"
	"image"
	"image/png"
	"math"
	"sync"

	"notchproof/render"
	"notchproof/render/number"
	"notchproof/verify"
)

// stressWidth is the width of a stress picture in pixels: 280 to the inch over
// the 144 mm that it has on a printed page. Line drawings are vectors, laid out
// for about the width that they have there.
const (
	stressWidth = 1600
	sketchWide  = 112 // mm
	ladderWide  = 150 // mm: below, its two diagrams stand one above the other
)

// A drawing is a figure that is still to be drawn.
type drawing struct {
	Figure
	draw func(d *drawing) error
	data []byte
	err  error
}

// Draw draws the figures of a content and enters them in it; the pictures come
// back in the order of Content.Figures.
func Draw(c *Content, r *verify.Result) ([][]byte, error) {
	list := []*drawing{{
		Figure: Figure{Kind: "sketch", Caption: "The part with its dimensions, to scale."},
		draw:   func(d *drawing) error { return d.vector(render.SketchFigure(r.Part), sketchWide, "sketch-") },
	}}
	for i := range r.Findings {
		list = append(list, drawingsOf(&c.Results[i], &r.Findings[i], r)...)
	}
	var group sync.WaitGroup
	for _, d := range list {
		group.Go(func() { d.err = d.draw(d) })
	}
	group.Wait()
	var data [][]byte
	for _, d := range list {
		if d.err != nil {
			return nil, d.err
		}
		d.SHA256 = digest(d.data)
		c.Figures = append(c.Figures, d.Figure)
		data = append(data, d.data)
	}
	return data, nil
}

// vector enters a line drawing.
func (d *drawing) vector(f *render.Figure, millimetres float64, prefix string) error {
	d.Media, d.data = mediaSVG, f.SVG(render.FigureOptions{Millimetres: millimetres, Prefix: prefix})
	return nil
}

// pixels enters an image.
func (d *drawing) pixels(im image.Image) error {
	var b bytes.Buffer
	encoder := png.Encoder{CompressionLevel: png.DefaultCompression}
	err := encoder.Encode(&b, im)
	size := im.Bounds().Size()
	d.Media, d.Width, d.Height, d.data = mediaPNG, size.X, size.Y, b.Bytes()
	return err
}

func digest(data []byte) string {
	sum := sha256.Sum256(data)
	return hex.EncodeToString(sum[:])
}

// drawingsOf are the pictures of one load: the ladder, and the stresses where
// there is a factor to show.
func drawingsOf(c *Finding, f *verify.Finding, r *verify.Result) []*drawing {
	var list []*drawing
	if study, ok := studyOf(c); ok {
		list = append(list, &drawing{
			Figure: Figure{Load: c.Load, Kind: "ladder",
				Caption: "The ladder in " + c.Load + ": the factor with its bar, and the signs of its error, over the unknowns."},
			draw: func(d *drawing) error {
				figure, err := render.StudyFigure(study)
				if err != nil {
					return err
				}
				return d.vector(figure, ladderWide, c.Load+"-ladder-")
			},
		})
	}
	if c.Computed.Settled {
		list = append(list, &drawing{
			Figure: Figure{Load: c.Load, Kind: "stress", Alt: stressAlt(c),
				Caption: "Stresses in " + c.Load + " ÷ nominal stress: contours, quills along the notch, the root magnified."},
			draw: func(d *drawing) error {
				im, err := render.Picture(f, r.Part, render.PictureOptions{Width: stressWidth})
				if err != nil {
					return err
				}
				return d.pixels(im)
			},
		})
	}
	return list
}

// studyOf is the ladder as it is plotted.
func studyOf(c *Finding) (render.Study, bool) {
	s := render.Study{Title: "ladder, " + c.Load, Note: "factor on the net nominal stress", Limit: math.NaN(), Uncertainty: math.NaN()}
	if c.Computed.Settled {
		s.Limit, s.Uncertainty = float64(c.Computed.Factor.Value), float64(c.Computed.Factor.Uncertainty)
	}
	for _, r := range c.Computed.Ladder {
		if r.Unknowns <= 0 || !r.Factor.finite() {
			return s, false
		}
		s.Points = append(s.Points, render.StudyPoint{
			Label: fmt.Sprintf("order %d", r.Order), Unknowns: r.Unknowns, Factor: float64(r.Factor), Change: math.Abs(float64(r.Change)), Traction: float64(r.Traction),
		})
	}
	return s, len(s.Points) > 0
}

// stressAlt says in words what the picture shows. Line drawings bring their own.
func stressAlt(c *Finding) string {
	p := c.Computed.At
	return fmt.Sprintf("Stress picture of the part in %s: the stress is highest on the %s, %s times the nominal stress, %s° %s.",
		c.Load, p.Side, c.Computed.Factor.String(), number.Decimal(p.ArcDegrees, 1), c.Computed.AngleFrom)
}

// String writes a value with its uncertainty. One below zero, which only a record that was tampered with has, reads as none.
func (v Value) String() string {
	bar := float64(v.Uncertainty)
	if bar < 0 {
		bar = math.NaN()
	}
	return number.Uncertain(float64(v.Value), bar)
}
