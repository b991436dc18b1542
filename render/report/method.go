package report

import (
	"notchproof/scf"
	"notchproof/verify"
)

// method tells in a few paragraphs how the factor came about, and the sources
// that are cited there.
func method(r *verify.Result) (paragraphs, sources []string) {
	bending, revolved := false, false
	for i := range r.Findings {
		revolved = r.Findings[i].Load.Model.Revolved()
		bending = bending || r.Findings[i].Load.Name == scf.Bending
	}
	model := "The part is a flat bar in plane stress"
	if revolved {
		model = "The part is a body of revolution"
		if bending {
			model += "; bending is its first harmonic, cos θ, on the half-plane where the bending stress is greatest"
		}
	}
	paragraphs = []string{
		"Small strain, linear elastic, isotropic. " + model + ". The load enters as the exact far-field traction at both ends, scaled so that the nominal stress on the net section is one; stresses are therefore factors.",
		"The part is meshed with triangles graded to the notch and bent to its true curves [1, 2]. Elements of rising order are solved on that mesh; each solve is a rung of the ladder. The factor is the largest first principal stress on the notch (in torsion the largest shear stress) over the nominal stress, sought on the curve itself and taken from the strains within the surface. The von Mises stress [3] is given beside it.",
		"The uncertainty adds three pieces of evidence: what the ladder has still to bring, by the contraction of its last differences; the distance to the factor that the last order gives on a second mesh, which shares no element with the first; and the traction that the solution leaves on the free surface at the peak, where there is none in truth, as far as the two others bear it out. Over random proportions of all families at least 99 of 100 true errors lie inside the sum.",
		"A handbook value is taken to be good for the share stated beside it; a claim for half a unit of its last digit and its reading tolerance (common practice: 3 %). Two factors agree when they differ by no more than what both are good for. Outside its range a handbook value is shown but never used to judge.",
	}
	sources = []string{
		"M. G. Blyth, C. Pozrikidis, A Lobatto interpolation grid over the triangle, IMA J. Appl. Math. 71 (2006) 153-169 (nodes of the elements)",
		"B. Szabó, I. Babuška, Finite Element Analysis, Wiley 1991 (blending of curved sides)",
		"R. von Mises, Mechanik der festen Körper im plastisch deformablen Zustand, Nachr. Ges. Wiss. Göttingen (1913) 582-592 (equivalent stress)",
	}
	return paragraphs, sources
}
