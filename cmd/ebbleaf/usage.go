package main

import (
	"errors"
	"fmt"
	"strings"

	"github.com/spf13/cobra"
	"github.com/spf13/pflag"
)

// badUsage returns a fault of the command line of a command.
func badUsage(cmd *cobra.Command, format string, args ...any) error {
	return &usageError{cmd.CommandPath(), fmt.Sprintf(format, args...)}
}

// flagFault puts what the library says of flags in words of our own.
func flagFault(cmd *cobra.Command, err error) error {
	var (
		unknown *pflag.NotExistError
		invalid *pflag.InvalidValueError
		missing *pflag.ValueRequiredError
	)
	switch {
	case errors.As(err, &unknown):
		name := unknown.GetSpecifiedName()
		if unknown.GetSpecifiedShortnames() != "" {
			return badUsage(cmd, "there is no flag -%s", name)
		}
		return badUsage(cmd, "there is no flag --%s%s", name, meant("--", flagsNear(cmd, name)))
	case errors.As(err, &invalid):
		return badUsage(cmd, "--%s is %q: %v", invalid.GetFlag().Name, invalid.GetValue(), invalid.Unwrap())
	case errors.As(err, &missing):
		return badUsage(cmd, "--%s needs a value after it", missing.GetFlag().Name)
	}
	return badUsage(cmd, "%v", err)
}

// flagsNear returns the flags of a command whose names are much like name. It
// lends them to a command tree, as the library can tell alike commands but not
// flags.
func flagsNear(cmd *cobra.Command, name string) []string {
	tree := &cobra.Command{SuggestionsMinimumDistance: 2}
	cmd.Flags().VisitAll(func(f *pflag.Flag) {
		tree.AddCommand(&cobra.Command{Use: f.Name, Run: func(*cobra.Command, []string) {}})
	})
	return tree.SuggestionsFor(name)
}

// meant asks whether one of some names was meant; nothing for none.
func meant(before string, names []string) string {
	if len(names) == 0 {
		return ""
	}
	return "; did you mean " + before + strings.Join(names, " or "+before) + "?"
}

// group makes a command that only has commands below it: alone it shows its
// help, and a word that it does not know is a fault.
func group(cmd *cobra.Command) *cobra.Command {
	cmd.Args = cobra.ArbitraryArgs
	cmd.SuggestionsMinimumDistance = 2
	cmd.RunE = func(cmd *cobra.Command, args []string) error {
		if len(args) == 0 {
			return cmd.Help()
		}
		return unknownCommand(cmd, args[0])
	}
	return cmd
}

func unknownCommand(cmd *cobra.Command, word string) error {
	what := "command"
	if cmd.HasParent() {
		what = "list"
	}
	if !cmd.HasAvailableSubCommands() {
		return badUsage(cmd, "%s has no commands below it", cmd.Name())
	}
	near := cmd.SuggestionsFor(word)
	hint := meant("", near)
	if len(near) == 0 {
		var names []string
		for _, c := range cmd.Commands() {
			if c.IsAvailableCommand() {
				names = append(names, c.Name())
			}
		}
		hint = ": there are " + and(names)
	}
	return badUsage(cmd, "there is no %s %q%s", what, word, hint)
}

// exactly takes so many arguments and says what is missing otherwise.
func exactly(n int, needs string) cobra.PositionalArgs {
	return func(cmd *cobra.Command, args []string) error {
		switch {
		case len(args) < n:
			return badUsage(cmd, "%s needs %s: %s", cmd.CommandPath(), needs, cmd.UseLine())
		case len(args) > n:
			return badUsage(cmd, "%q is one argument too many: %s", args[n], cmd.UseLine())
		}
		return nil
	}
}

// and joins words as a sentence does.
func and(words []string) string { return join(words, " and ") }

// or joins words as a sentence does.
func or(words []string) string { return join(words, " or ") }

func join(words []string, last string) string {
	n := len(words)
	if n < 2 {
		return strings.Join(words, "")
	}
	return strings.Join(words[:n-1], ", ") + last + words[n-1]
}
