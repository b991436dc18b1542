package number

import (
	"fmt"
	"time"
)

// Duration writes a time span with two or three digits: "840 µs", "12 ms",
// "1.3 s", "42 s", "2 min 05 s", "1 h 02 min". Each is rounded first and named
// after, so that 59.96 s is a minute and 999.7 ms a second.
func Duration(d time.Duration) string {
	sign := ""
	if d < 0 {
		sign, d = minus, -d
		if d < 0 { // the smallest duration has no opposite
			d = 1<<63 - 1
		}
	}
	switch {
	case d < time.Microsecond:
		if d == 0 {
			sign = ""
		}
		return sign + fmt.Sprintf("%d%sns", d, noBreak)
	case d.Round(time.Microsecond) < time.Millisecond:
		return sign + fmt.Sprintf("%d%sµs", d.Round(time.Microsecond)/time.Microsecond, noBreak)
	case d.Round(time.Millisecond) < time.Second:
		return sign + fmt.Sprintf("%d%sms", d.Round(time.Millisecond)/time.Millisecond, noBreak)
	case d.Round(100*time.Millisecond) < 10*time.Second:
		tenths := d.Round(100*time.Millisecond) / (100 * time.Millisecond)
		return sign + fmt.Sprintf("%d.%d%ss", tenths/10, tenths%10, noBreak)
	case d.Round(time.Second) < time.Minute:
		return sign + fmt.Sprintf("%d%ss", d.Round(time.Second)/time.Second, noBreak)
	case d.Round(time.Second) < time.Hour:
		s := d.Round(time.Second) / time.Second
		return sign + fmt.Sprintf("%d%[3]smin%[3]s%02[2]d%[3]ss", s/60, s%60, noBreak)
	}
	m := d.Round(time.Minute) / time.Minute
	return sign + fmt.Sprintf("%d%[3]sh%[3]s%02[2]d%[3]smin", m/60, m%60, noBreak)
}
