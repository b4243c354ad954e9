package main

import (
	"context"
	"flag"
	"fmt"
	"io"
	"os"
	"path/filepath"
	"strings"

	"hillwright/build/serve"
)

func serveCommand(ctx context.Context, args []string, out, problems io.Writer) int {
	return exitCode("serve", servePage(ctx, args, out), problems)
}

func servePage(ctx context.Context, args []string, out io.Writer) error {
	set := flag.NewFlagSet("serve", flag.ContinueOnError)
	dir := set.String("dir", "dist", "the packed page's `folder`")
	addr := set.String("addr", "127.0.0.1:8080", "the `address` to listen at; port 0 takes a free one")
	prefix := set.String("prefix", "/", "serve below this `path`, such as /shop/bikes/")
	if err := parse(set, args, out); err != nil {
		return err
	}
	if !strings.HasPrefix(*prefix, "/") || !strings.HasSuffix(*prefix, "/") {
		return usageError{fmt.Errorf("-prefix: got %q, expected a path that begins and ends with a slash", *prefix)}
	}
	if _, err := os.Stat(filepath.Join(*dir, "index.html")); err != nil {
		return fmt.Errorf("%s: expected a packed page, there is none; make it with `hillwright pack -out %s`", *dir, *dir)
	}
	return serve.Run(ctx, *addr, *prefix, os.DirFS(*dir), out)
}
