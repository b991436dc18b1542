package specimen

import (
	"bytes"
	"slices"
	"strings"

	"notchproof/scf"
)

// A File is what a part file says.
type File struct {
	Part     *Part
	Loads    []scf.Load // to be checked: all that the part carries unless the file names some
	Claims   []Claim    // at most one a load, in the order of the file
	Material Material
	Forces   Forces
}

// A Claim is a factor that the file's author got from elsewhere.
type Claim struct {
	Load      scf.Load
	Factor    float64
	LastDigit float64 // one unit of its last digit, as it was written
	Tolerance float64 // of the reading, relative; 0: the default
	From      string
	Mesh      *Density // of the finite element mesh it came from; nil: not from one
}

// Over is what the command line says over the file's head.
type Over struct {
	Nu        *float64 // nil: the file's
	ForceLine string   // empty: the file's
	// Open lets dimensions of a family be missing. A part of a family is then not
	// drawn: it has its Family, Given, Unit and Options, and the names of its loads.
	Open bool
}

// The keys of a part file.
var (
	fileKeys     = []string{"title", "shape", "loads", "material", "claims", "forces", "thickness", "safety"}
	materialKeys = []string{"name", "nu", "E", "yield", "tensile", "elongation", "brittle", "metal"}
	forceKeys    = []string{"axial", "bending", "torque"}
	claimKeys    = []string{"load", "factor", "from", "tolerance", "mesh"}
)

// ReadPart reads a part file:
//
//	{
//	  "title": "…",
//	  "shape": {"family": "shaft-shoulder", "D": "72mm", "d": "48mm", "r": "3mm"},
//	  "loads": ["bending"],
//	  "material": {"name": "…", "nu": 0.3, "E": "210 GPa", "yield": "355 MPa"},
//	  "claims": [{"load": "bending", "factor": 1.85, "from": "chart", "tolerance": "3%",
//	              "mesh": {"order": 2, "arc": 6}}],
//	  "forces": {"axial": "12 kN", "bending": "300 N·m", "torque": "450 N·m"},
//	  "thickness": "8 mm", "safety": 1.8
//	}
//
// Only the shape must be there. It is a family with its dimensions, as above,
// or an outline (see Drawing):
//
//	{"model": "bar", "unit": "mm", "outline": "M 0 0 H 90 …", "holes": ["M …"],
//	 "names": {"A4": "fillet"}, "notch": ["fillet", "hole 1"],
//	 "nominal": {"x": 12.5, "fibre": 20}, "mirror": true, "forceLine": "net"}
//
// Lengths are numbers or texts with a unit; moduli and stresses are numbers in
// MPa or texts with a unit; forces and moments are texts with a unit. A claim's factor may be a text
// so that its last digit counts as written. name is the file's name, for
// errors, which are *FileError throughout.
func ReadPart(data []byte, name string, over Over) (*File, error) {
	d := &document{name: name, data: bytes.TrimPrefix(data, []byte("\ufeff"))}
	top, err := d.readTree()
	if err != nil {
		return nil, err
	}
	if err := d.object(top, fileKeys...); err != nil {
		return nil, err
	}
	f := &File{Material: Material{Nu: defaultNu}}
	title := ""
	if n := top.member("title"); n != nil {
		if title, err = d.label(n); err != nil {
			return nil, err
		}
	}
	if n := top.member("material"); n != nil {
		if f.Material, err = d.material(n); err != nil {
			return nil, err
		}
	}
	if over.Nu != nil {
		f.Material.Nu = *over.Nu
	}
	shape := top.member("shape")
	if shape == nil {
		return nil, d.fail(top.at, InputError{What: "shape", Reason: "missing", Hint: `give {"family": …} with its dimensions, or {"model": …, "outline": …}`})
	}
	if f.Part, err = d.shape(shape, f.Material.Nu, over); err != nil {
		return nil, err
	}
	f.Part.Title = title
	if f.Loads, err = d.loads(top.member("loads"), f.Part); err != nil {
		return nil, err
	}
	if f.Claims, err = d.claims(top.member("claims"), f.Loads); err != nil {
		return nil, err
	}
	if f.Forces, err = d.forces(top); err != nil {
		return nil, err
	}
	return f, nil
}

const defaultNu = 0.3

// shape draws the part.
func (d *document) shape(n *node, nu float64, over Over) (*Part, error) {
	if n.kind != isObject {
		return nil, d.refuse(n, "not an object", `give {"family": …} with its dimensions, or {"model": …, "outline": …}`)
	}
	o := scf.Options{Nu: nu, ForceLine: over.ForceLine}
	if line := n.member("forceLine"); line != nil {
		s, err := d.text(line)
		if err != nil {
			return nil, err
		}
		if s != scf.ForceLineNet && s != scf.ForceLineGross {
			return nil, d.refuse(line, "no such line", "net (middle of the nominal section) or gross (middle of the end section)")
		}
		if o.ForceLine == "" {
			o.ForceLine = s
		}
	}
	if n.member("family") != nil {
		return d.family(n, o, over.Open)
	}
	return d.outline(n, o)
}

// loads lists what is to be checked.
func (d *document) loads(n *node, p *Part) ([]scf.Load, error) {
	var all []scf.Load
	for _, l := range p.Loads {
		all = append(all, l.Name)
	}
	if n == nil {
		return all, nil
	}
	items, err := d.list(n, `write ["tension", "bending"], or leave it out for all loads`)
	if err != nil {
		return nil, err
	}
	if len(items) == 0 {
		return nil, d.refuse(n, "no loads", "name some, or leave the key out for all loads")
	}
	var loads []scf.Load
	for _, item := range items {
		load, err := d.load(item, all)
		if err != nil {
			return nil, err
		}
		if slices.Contains(loads, load) {
			return nil, d.refuse(item, "given twice", "name each load once")
		}
		loads = append(loads, load)
	}
	return loads, nil
}

// load reads the name of one of the given loads.
func (d *document) load(n *node, among []scf.Load) (scf.Load, error) {
	s, err := d.text(n)
	if err != nil {
		return "", err
	}
	var names []string
	for _, l := range among {
		if string(l) == s {
			return l, nil
		}
		names = append(names, string(l))
	}
	hint := "the loads here are " + strings.Join(names, ", ")
	if near := Nearest(s, names, 3); near != "" {
		hint = "did you mean " + near + "?"
	}
	return "", d.refuse(n, "no such load here", hint)
}
