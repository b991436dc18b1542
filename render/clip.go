package render

// What lies far outside a window is cut away before it is drawn: at a large
// magnification the rest of the part is millions of pixels wide, more than the
// rasteriser's fixed point numbers can hold.

// clipPolygon cuts a closed polygon to a box (Sutherland & Hodgman, Comm. ACM
// 17 (1974) 32).
func clipPolygon(ps []point, b box) []point {
	sides := [4]func(p point) float64{ // distance inwards
		func(p point) float64 { return p.X - b.X0 },
		func(p point) float64 { return b.X1 - p.X },
		func(p point) float64 { return p.Y - b.Y0 },
		func(p point) float64 { return b.Y1 - p.Y },
	}
	for _, inside := range sides {
		var kept []point
		for i, p := range ps {
			q := ps[(i+1)%len(ps)]
			dp, dq := inside(p), inside(q)
			if dp >= 0 {
				kept = append(kept, p)
			}
			if dp*dq < 0 {
				kept = append(kept, between(p, q, dp/(dp-dq)))
			}
		}
		ps = kept
	}
	return ps
}

// clipLine cuts an open polyline to a box, which may leave several pieces
// (Liang & Barsky, ACM Trans. Graphics 3 (1984) 1, segment by segment).
func clipLine(ps []point, b box) [][]point {
	var pieces [][]point
	open := false
	for i := 1; i < len(ps); i++ {
		t0, t1, ok := clipSegment(ps[i-1], ps[i], b)
		if !ok {
			open = false
			continue
		}
		if !open || t0 > 0 {
			pieces = append(pieces, []point{between(ps[i-1], ps[i], t0)})
		}
		last := len(pieces) - 1
		pieces[last] = append(pieces[last], between(ps[i-1], ps[i], t1))
		open = t1 == 1
	}
	return pieces
}

// clipSegment gives the parameters between which the segment from p to q runs
// inside the box.
func clipSegment(p, q point, b box) (t0, t1 float64, ok bool) {
	t0, t1 = 0, 1
	for _, s := range [4][2]float64{ // −d·t ≤ gap, side by side
		{p.X - q.X, p.X - b.X0}, {q.X - p.X, b.X1 - p.X},
		{p.Y - q.Y, p.Y - b.Y0}, {q.Y - p.Y, b.Y1 - p.Y},
	} {
		speed, gap := s[0], s[1]
		switch {
		case speed == 0 && gap < 0:
			return 0, 0, false
		case speed < 0:
			t0 = max(t0, gap/speed)
		case speed > 0:
			t1 = min(t1, gap/speed)
		}
	}
	return t0, t1, t0 < t1
}

func between(p, q point, t float64) point {
	switch t {
	case 0:
		return p
	case 1:
		return q
	}
	return point{p.X + t*(q.X-p.X), p.Y + t*(q.Y-p.Y)}
}
