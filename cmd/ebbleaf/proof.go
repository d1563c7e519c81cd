package main

import (
	"fmt"
	"strings"

	"github.com/spf13/cobra"

	"ebbleaf/layout"
	"ebbleaf/layout/document"
	"ebbleaf/templates"
)

// proof returns the command that reads files and says what is in them.
func (p *program) proof() *cobra.Command {
	cmd := &cobra.Command{
		Use:   "proof FILE...",
		Short: "Look for mistakes in harbour and almanac files",
		Long: `Read harbour files, almanac files and files of words, and say what they contain
and every mistake in them, by file and line. Nothing is printed and no file is
changed. A line with the word "note" is no mistake, but worth a look.

An almanac file is read with all it names and set in type, so that what passes
here prints. What no program can tell is whether the constants are those of your
harbour: compare a few days with a table you trust.`,
		Example: `  ebbleaf proof almanac.yaml
  ebbleaf proof *.yaml`,
		DisableFlagsInUseLine: true,

		Args: func(cmd *cobra.Command, args []string) error {
			if len(args) == 0 {
				return badUsage(cmd, "%s needs a harbour or almanac file: %s", cmd.CommandPath(), cmd.UseLine())
			}
			return nil
		},
	}
	cmd.RunE = func(_ *cobra.Command, args []string) error {
		var result error
		for i, name := range args {
			if i > 0 {
				if _, err := fmt.Fprintln(p.stdout); err != nil {
					return err
				}
			}
			facts, err := p.proofFile(name)
			if len(facts) > 0 {
				if _, err := fmt.Fprint(p.stdout, facts); err != nil {
					return err
				}
			}
			if err != nil {
				p.report(err)
				result = errSaid
			}
		}
		return result
	}
	return cmd
}

// facts are what is said of a file, pairs of heading and text.
type facts [][2]string

func (f *facts) add(heading, format string, args ...any) {
	*f = append(*f, [2]string{heading, fmt.Sprintf(format, args...)})
}

// String writes the facts in two columns below the first, which is a title.
func (f facts) String() string {
	var b strings.Builder
	for i, fact := range f {
		if i == 0 {
			fmt.Fprintf(&b, "%s: %s\n", fact[0], fact[1])
			continue
		}
		fmt.Fprintf(&b, "  %-13s %s\n", fact[0], fact[1])
	}
	return b.String()
}

// proofFile reads a file of any kind, says what seems odd in it and returns
// what it contains, or its faults.
func (p *program) proofFile(name string) (facts, error) {
	file := document.OnDisk(name)
	kind, err := document.KindOf(file)
	if err != nil {
		return nil, err
	}
	f := facts{{name, kind.String()}}
	switch kind {
	case document.HarbourFile:
		h, err := p.harbour(name)
		if err != nil {
			return nil, err
		}
		f.harbour(h)
		f.windows(h)
		from, to := p.comingYear(h.Zone)
		if err := p.doubtWindows(name, h, from, to); err != nil {
			return nil, err
		}
		if err := p.doubtLevels(name, h, p.now().Year()); err != nil {
			return nil, err
		}
	case document.AlmanacFile:
		a, err := p.almanac(file)
		if err != nil {
			return nil, err
		}
		f.almanac(a)
		for _, h := range a.Harbours {
			if err := p.doubtWindows(name, h, a.From, a.To); err != nil {
				return nil, err
			}
			if err := p.doubtLevels(name, h, a.From.Year); err != nil {
				return nil, err
			}
		}
		made, err := typeset(a)
		if err != nil {
			return f, document.Faults{{File: name, Message: err.Error()}}
		}
		f.add("pages", "%d", made.pages)
	case document.LanguageFile:
		if err := p.words(&f, file); err != nil {
			return nil, err
		}
	}
	f.add("faults", "none")
	return f, nil
}

// words says what a file of words contains.
func (p *program) words(f *facts, file document.File) error {
	w, err := document.ReadWords(file)
	if err != nil {
		return err
	}
	english, err := document.ReadWords(document.In(templates.Languages(), "en.yaml"))
	if err != nil {
		return err
	}
	// What is left out is no fault: it is taken from the English texts.
	all := map[string]string{}
	own := w.Keys()
	for _, key := range english.Keys() {
		all[key] = english.Say(key)
	}
	left := len(all)
	for _, key := range own {
		if _, known := all[key]; known {
			left--
		}
		all[key] = w.Say(key)
	}
	var faults document.Faults
	for _, sentence := range document.CheckWords(english, layout.NewWords(w.Tag, w.Name, all)) {
		faults = append(faults, document.Fault{File: file.String(), Message: sentence})
	}
	if len(faults) > 0 {
		return faults
	}
	f.add("language", "%s (%s)", w.Name, w.Tag)
	f.add("texts", "%d; %d more are taken from the English ones", len(own), left)
	return nil
}
