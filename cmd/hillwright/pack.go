package main

import (
	"context"
	"errors"
	"flag"
	"fmt"
	"io"
	"io/fs"
	"os"
	"path/filepath"

	"hillwright/build"
	"hillwright/build/shop"
	"hillwright/site"
)

func packCommand(ctx context.Context, args []string, out, problems io.Writer) int {
	return exitCode("pack", packPage(ctx, args, out), problems)
}

func packPage(ctx context.Context, args []string, out io.Writer) error {
	set := flag.NewFlagSet("pack", flag.ContinueOnError)
	shopDir := set.String("shop", "", "the shop's `folder` (default: the demo shop)")
	outDir := set.String("out", "dist", "the `folder` to make; a page packed before is replaced")
	if err := parse(set, args, out); err != nil {
		return err
	}
	own, err := readShop(*shopDir)
	if err != nil {
		return err
	}
	source, err := build.FindSource(".")
	if err != nil {
		return err
	}
	program, err := build.Compile(ctx, source)
	if err != nil {
		return err
	}
	parts := build.Parts{Site: site.Files(), Shop: own, Program: program, Budget: build.DefaultBudget()}
	// Where a person has no folder for caches, packing takes longer, no more.
	if cache, err := os.UserCacheDir(); err == nil {
		parts.Cache = filepath.Join(cache, "hillwright")
	}
	report, err := build.Pack(parts, *outDir)
	if report != nil {
		err = errors.Join(report.Write(out), err)
	}
	return err
}

// readShop reads a shop's folder, or the demo shop when dir is empty.
func readShop(dir string) (shop.Copy, error) {
	folder, name := site.DemoShop(), "the demo shop"
	if dir != "" {
		info, err := os.Stat(dir)
		if errors.Is(err, fs.ErrNotExist) || err == nil && !info.IsDir() {
			return shop.Copy{}, fmt.Errorf("%s: expected the shop's folder, there is none; mend -shop", dir)
		}
		folder, name = os.DirFS(dir), dir
	}
	own, err := shop.Read(folder)
	var mistakes shop.Mistakes
	if errors.As(err, &mistakes) {
		return own, fmt.Errorf("%d to mend in %s:\n%w", len(mistakes), name, err)
	}
	return own, err
}
