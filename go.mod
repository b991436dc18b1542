module notchproof

go 1.26

require (
	github.com/fogleman/gg v1.3.0
	github.com/golang/freetype v0.0.0-20170609003504-e2365dfdc4a0
	github.com/spf13/pflag v1.1.0
	golang.org/x/image v0.25.0
	gonum.org/v1/gonum v0.17.0
)
