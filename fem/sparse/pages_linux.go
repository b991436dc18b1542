package sparse

import (
	"syscall"
	"unsafe"
)

// adviseLargePages tells the kernel that a block may be backed by large pages:
// it then comes in a few pieces of 2 MB and not in thousands of 4 kB, each of
// which would cost a fault. It is advice; whether it is taken changes nothing
// but the time.
func adviseLargePages(block []float64) {
	const page = 2 << 20
	start := uintptr(unsafe.Pointer(unsafe.SliceData(block)))
	skip := (page - start%page) % page
	size := uintptr(len(block)) * 8
	if size < skip+page {
		return
	}
	bytes := unsafe.Slice((*byte)(unsafe.Pointer(unsafe.SliceData(block))), size)
	_ = syscall.Madvise(bytes[skip:skip+(size-skip)/page*page], syscall.MADV_HUGEPAGE)
}
