// Package usermesh tells what a finite element mesh of a stated density would
// say about a part: the largest stress on the notch as such meshes are usually
// read, averaged at the nodes or at the elements' sample points; and, the other
// way round, how many elements per 90° of the root such a mesh needs for an
// error of 5, 2 or 1 %.
//
// The meshes are of order 1 with straight sides, or of order 2 with mid-nodes on
// the true curve (isoparametric). Away from the root the length of edges grows
// by a share of the distance to it, up to an eighth of the part's width or
// diameter. Growth by 0.2, every row of elements a fifth larger than the row
// before, is what mesh generators commonly do when nothing else is asked (common
// practice); meshes that grow faster are met as well.
//
// Loads are scaled to unit nominal stress: readings are factors.
package usermesh
