// Command hillwright makes a shop's page and serves it, and answers the same
// questions in the terminal.
package main

import (
	"context"
	"errors"
	"flag"
	"fmt"
	"io"
	"os"
	"os/signal"
	"syscall"
)

func main() {
	ctx, stop := signal.NotifyContext(context.Background(), os.Interrupt, syscall.SIGTERM)
	code := run(ctx, os.Args[1:], os.Stdout, os.Stderr)
	stop()
	os.Exit(code)
}

// command is one of the things that hillwright does. run gets the arguments
// after its name and gives the exit code.
type command struct {
	name string
	does string
	run  func(ctx context.Context, args []string, out, problems io.Writer) int
}

// commands lists what hillwright does, in the order in which it is told.
func commands() []command {
	return []command{
		{"ask", "answer a question in the terminal", func(_ context.Context, args []string, out, problems io.Writer) int {
			return runAsk(args, out, problems)
		}},
		{"coast", "work out a bike's drag from the sound of its freehub", func(_ context.Context, args []string, out, problems io.Writer) int {
			return runCoast(args, out, problems)
		}},
		{"pack", "make a shop's page, a folder of static files", packCommand},
		{"serve", "serve a packed page to try it", serveCommand},
	}
}

// Exit codes: the work failed, the command line is off.
const (
	exitFailed = 1
	exitUsage  = 2
)

func run(ctx context.Context, args []string, out, problems io.Writer) int {
	if len(args) == 0 {
		usage(problems)
		return exitUsage
	}
	switch args[0] {
	case "help", "-h", "-help", "--help":
		usage(out)
		return 0
	}
	for _, c := range commands() {
		if c.name == args[0] {
			return c.run(ctx, args[1:], out, problems)
		}
	}
	fmt.Fprintf(problems, "hillwright: there is no command %q\n", args[0])
	usage(problems)
	return exitUsage
}

func usage(to io.Writer) {
	fmt.Fprintln(to, "hillwright tells whether a bike, a rider and a load get up a hill, and why.")
	fmt.Fprintln(to, "\nusage: hillwright COMMAND [flags]")
	for _, c := range commands() {
		fmt.Fprintf(to, "  %-8s %s\n", c.name, c.does)
	}
	fmt.Fprintln(to, "\n`hillwright COMMAND -help` tells a command's flags.")
}

// usageError is a wrong command line.
type usageError struct{ error }

// parse reads a command's flags. Nothing may stand behind them.
func parse(set *flag.FlagSet, args []string, out io.Writer) error {
	set.SetOutput(io.Discard)
	err := set.Parse(args)
	if errors.Is(err, flag.ErrHelp) {
		set.SetOutput(out)
		fmt.Fprintf(out, "usage: hillwright %s [flags]\n", set.Name())
		set.PrintDefaults()
		return err
	}
	if err != nil {
		return usageError{err}
	}
	if set.NArg() > 0 {
		return usageError{fmt.Errorf("got %q, expected flags only", set.Arg(0))}
	}
	return nil
}

// exitCode tells what went wrong and gives the exit code for it.
func exitCode(name string, err error, problems io.Writer) int {
	var wrong usageError
	switch {
	case err == nil, errors.Is(err, flag.ErrHelp):
		return 0
	case errors.As(err, &wrong):
		fmt.Fprintf(problems, "hillwright %s: %v; `hillwright %s -help` tells what it takes\n", name, err, name)
		return exitUsage
	}
	fmt.Fprintf(problems, "hillwright %s: %v\n", name, err)
	return exitFailed
}
