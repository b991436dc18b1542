package report

// Content is all that a sheet says, in the order in which it says it. Its JSON
// is embedded in the page; Schema counts the changes that would break a reader.
// Factors and stresses are multiples of the nominal stress, uncertainties are
// absolute, differences are (other − computed) ÷ computed, lengths carry
// Part.Unit.
type Content struct {
	Schema   int       `json:"schema"`
	Program  string    `json:"program"` // with its version
	Sheet    Sheet     `json:"sheet"`
	Question string    `json:"question"`
	Part     Part      `json:"part"`
	Results  []Finding `json:"results"` // one a load
	Method   []string  `json:"method"`
	Sources  []string  `json:"sources"` // of the method
	Input    Input     `json:"input"`
	Figures  []Figure  `json:"figures"`
	Caution  string    `json:"caution"`
}

const schema = 1

// Sheet is what its author wrote on it.
type Sheet struct {
	Title string `json:"title"`
	By    string `json:"by,omitempty"`
	Date  string `json:"date,omitempty"`
}

// Input is what the check can be run from again.
type Input struct {
	// Arguments are the words of the command line behind "report", without
	// those that name files to be written or label the sheet.
	Arguments []string `json:"arguments"`
	// File is the part as a part file: as it was read, or made of the words.
	File string `json:"file"`
	// Read tells that File was read, under the name that Arguments begin with.
	Read bool `json:"read"`
}

// Part is what was checked.
type Part struct {
	Name       string      `json:"name"`
	Shape      string      `json:"shape"` // in words
	Dimensions []Dimension `json:"dimensions"`
	Unit       string      `json:"unit"` // "" when unnamed
	Nu         float64     `json:"nu"`
}

// Dimension is one of a family's.
type Dimension struct {
	Name    string  `json:"name"`
	Meaning string  `json:"meaning"`
	Value   float64 `json:"value"`
	Unit    string  `json:"unit"`
	Default bool    `json:"default,omitempty"` // not given, taken as usual
}

// Finding is the answer under one load.
type Finding struct {
	Load        string       `json:"load"`
	Carries     string       `json:"carries"` // the load in words: "bending, moment M"
	Symbol      string       `json:"symbol"`  // Kt, in torsion Kts
	Nominal     Nominal      `json:"nominal"`
	Computed    Computed     `json:"computed"`
	Verdict     Verdict      `json:"verdict"`
	Sentence    string       `json:"sentence"` // the verdict in one
	Because     []string     `json:"because"`
	Warnings    []string     `json:"warnings"`
	Handbook    []Handbook   `json:"handbook"`
	Claim       *Claim       `json:"claim,omitempty"`
	ClaimMesh   *ClaimMesh   `json:"claimMesh,omitempty"`
	Misreadings []Misreading `json:"misreadings"`
	Checks      []Check      `json:"checks"`
}

// Nominal is the stress that the factor is referred to.
type Nominal struct {
	Formula string   `json:"formula"`
	Section string   `json:"section"`
	Notes   []string `json:"notes"`
}

// Computed is what the ladder gave. Without Settled its numbers mean nothing.
type Computed struct {
	Settled     bool    `json:"settled"`
	Status      string  `json:"status"` // of the evidence: converged, undecided, diverging …
	Trend       string  `json:"trend"`  // of the ladder's values
	Signals     Signals `json:"signals"`
	Factor      Value   `json:"factor"`
	VonMises    Value   `json:"vonMises"`
	Gross       Value   `json:"gross"`
	At          Place   `json:"at"`
	AngleFrom   string  `json:"angleFrom"` // what At.ArcDegrees is counted from
	Others      []Place `json:"others"`
	Ladder      []Rung  `json:"ladder"`
	TargetShare float64 `json:"target"` // uncertainty wished for, relative
}

// Signals are what each piece of evidence leaves open, absolute.
type Signals struct {
	Ladder     Number `json:"ladder"`
	SecondMesh Number `json:"secondMesh"`
	Traction   Number `json:"surfaceTraction"`
}

// Value is a number with its uncertainty.
type Value struct {
	Value       Number `json:"value"`
	Uncertainty Number `json:"uncertainty"`
}

// Place is a local maximum on the surface.
type Place struct {
	Side       string  `json:"side"`
	X          float64 `json:"x"`
	Y          float64 `json:"y"`
	ArcDegrees float64 `json:"arcDegrees"`
	Factor     Number  `json:"factor"`
}

// Rung is one solve of the ladder.
type Rung struct {
	Order     int    `json:"order"`
	Triangles int    `json:"triangles"`
	Unknowns  int    `json:"unknowns"`
	Factor    Number `json:"factor"`
	Change    Number `json:"change"`   // from the rung before, null in the first
	Traction  Number `json:"traction"` // left on the free surface at the peak
}

// Handbook is a published factor held against the computed one.
type Handbook struct {
	ID         string   `json:"id"`
	Factor     float64  `json:"factor"`
	InRange    bool     `json:"inRange"`
	Hint       bool     `json:"hint,omitempty"` // of a neighbouring shape
	Range      string   `json:"range"`
	Outside    []string `json:"outside"`
	Accuracy   float64  `json:"accuracy"`
	Source     string   `json:"source"`
	Difference Number   `json:"difference"`
	Verdict    Verdict  `json:"verdict"`
	Unsafe     bool     `json:"unsafe"`
	Remarks    []string `json:"remarks"`
}

// Claim is the user's own factor held against the computed one.
type Claim struct {
	Factor     float64 `json:"factor"`
	Source     string  `json:"source"`
	Tolerance  float64 `json:"tolerance"` // absolute
	Difference Number  `json:"difference"`
	Verdict    Verdict `json:"verdict"`
	Unsafe     bool    `json:"unsafe"`
}

// ClaimMesh is what meshes as the one that the claim came from give.
type ClaimMesh struct {
	Mesh     string        `json:"mesh"` // in words
	Matches  string        `json:"matches"`
	Readings []MeshReading `json:"readings"`
}

// MeshReading is one way of reading the stress off such a mesh.
type MeshReading struct {
	What       string `json:"what"`
	Factor     Value  `json:"factor"` // with the scatter of such meshes
	Difference Number `json:"difference"`
	Claimed    bool   `json:"claimed"` // the claim lies within it
}

// Misreading is a slip that would explain the claim.
type Misreading struct {
	What   string  `json:"what"`
	Factor float64 `json:"factor"`
	From   string  `json:"from"`   // the chart that gives it, or "computed"
	Chance float64 `json:"chance"` // share of claims wrong for no such reason that are met as well
}

// Check is a condition without which no factor is judged.
type Check struct {
	Name   string `json:"name"`
	Value  Number `json:"value"`
	Limit  Number `json:"limit"`
	Above  bool   `json:"above,omitempty"` // the value must be above the limit
	Passed bool   `json:"passed"`
}

// Figure is a picture of the sheet. The picture itself is beside the content;
// SHA256 ties the two together.
type Figure struct {
	Load    string `json:"load,omitempty"`  // "": of the part
	Kind    string `json:"kind"`            // sketch, stress or ladder
	Media   string `json:"media"`           // image/png or image/svg+xml
	Width   int    `json:"width,omitempty"` // of an image, in pixels
	Height  int    `json:"height,omitempty"`
	Alt     string `json:"alt,omitempty"` // of an image; a drawing has its own
	Caption string `json:"caption"`
	SHA256  string `json:"sha256"`
}
