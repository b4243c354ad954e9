package build

import (
	"bytes"
	"context"
	"errors"
	"fmt"
	"os"
	"os/exec"
	"path/filepath"
	"strings"
)

// Program is the compiled page: the wasm file, and the script of the Go that
// compiled it, without which it does not run.
type Program struct {
	Wasm []byte
	Exec []byte
}

// smaller has all but the computation and what it leans on compiled without
// inlining: a tenth less to fetch. It costs 10 to 15 % in reading a track and
// up to 70 % in work on many small strings; the physics runs as fast as before.
var smaller = []string{
	"-gcflags=all=-l",
	"-gcflags=hillwright/physics/...=", "-gcflags=github.com/hajimehoshi/go-mp3/...=",
	"-gcflags=math=", "-gcflags=math/...=", "-gcflags=bytes=", "-gcflags=cmp=", "-gcflags=slices=", "-gcflags=sort=",
	"-gcflags=strconv=", "-gcflags=internal/strconv=", "-gcflags=unicode/utf8=",
}

// Compile builds ./wasm of the module in dir for the browser. It needs the go
// command; the same tree gives the same bytes wherever it lies.
func Compile(ctx context.Context, dir string) (Program, error) {
	tmp, err := os.MkdirTemp("", "hillwright-wasm-")
	if err != nil {
		return Program{}, err
	}
	defer os.RemoveAll(tmp)
	out := filepath.Join(tmp, "hillwright.wasm")
	args := append([]string{"build", "-trimpath", "-buildvcs=false", "-ldflags=-s -w"}, smaller...)
	if _, err := goCommand(ctx, dir, append(args, "-o", out, "./wasm")...); err != nil {
		return Program{}, fmt.Errorf("compile the page: %w", err)
	}
	var p Program
	if p.Wasm, err = os.ReadFile(out); err != nil {
		return Program{}, err
	}
	root, err := goCommand(ctx, dir, "env", "GOROOT")
	if err != nil {
		return Program{}, err
	}
	p.Exec, err = os.ReadFile(filepath.Join(root, "lib", "wasm", "wasm_exec.js"))
	if err != nil {
		return Program{}, fmt.Errorf("the Go installation lacks its browser script: %w", err)
	}
	return p, nil
}

func goCommand(ctx context.Context, dir string, args ...string) (string, error) {
	cmd := exec.CommandContext(ctx, "go", args...)
	cmd.Dir = dir
	// GOWASM and GOFLAGS of the person's own would make another file.
	cmd.Env = append(os.Environ(), "GOOS=js", "GOARCH=wasm", "GOWASM=", "GOFLAGS=")
	var out, problems bytes.Buffer
	cmd.Stdout, cmd.Stderr = &out, &problems
	if err := cmd.Run(); err != nil {
		if errors.Is(err, exec.ErrNotFound) {
			return "", errors.New("the go command is not installed or not in PATH; pack needs it to compile the page")
		}
		return "", fmt.Errorf("go %s: %w\n%s", args[0], err, problems.String())
	}
	return strings.TrimSpace(out.String()), nil
}

// FindSource finds the folder of this module, from dir upwards. Packing
// compiles the page and so needs its source.
func FindSource(dir string) (string, error) {
	from, err := filepath.Abs(dir)
	if err != nil {
		return "", err
	}
	for at := from; ; at = filepath.Dir(at) {
		mod, err := os.ReadFile(filepath.Join(at, "go.mod"))
		if err == nil && strings.HasPrefix(string(mod), "module hillwright\n") {
			return at, nil
		}
		if at == filepath.Dir(at) {
			return "", fmt.Errorf("%s: expected the source of hillwright here or above; change to its folder, pack compiles the page from it", from)
		}
	}
}
