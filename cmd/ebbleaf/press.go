package main

import (
	"bytes"
	"fmt"
	"io"
	"os"
	"path/filepath"
	"strings"

	"github.com/spf13/cobra"

	"ebbleaf/layout"
	"ebbleaf/layout/document"
	"ebbleaf/layout/face"
	"ebbleaf/layout/output"
	"ebbleaf/layout/pdf"
	"ebbleaf/templates"
)

// press returns the command that makes a PDF.
func (p *program) press() *cobra.Command {
	cmd := &cobra.Command{
		Use:   "press [ALMANAC]",
		Short: "Make the booklet of an almanac file, as a PDF",
		Long: `Make the booklet that an almanac file describes, as a PDF in the current folder.
It is named after the almanac file unless -o says otherwise. Without an almanac
file the example is made that comes with the program, whose tides are invented.

Nothing is written when a file has a fault. A file that is there already is kept
unless --replace is given; one that would not change is left alone. The same
files always give the same booklet, to the byte.

With --impose fold the pages come two by two on the next larger paper, in the
order that makes a booklet when the sheets are printed on both sides, folded
together and stapled; with --impose two-up, pages that face each other come side
by side. A page in front tells how to print.`,
		Example: `  ebbleaf press almanac.yaml
  ebbleaf press almanac.yaml -o tides-2027.pdf --replace
  ebbleaf press almanac.yaml --impose fold   to print, fold and staple
  ebbleaf press                              the example, to see what comes out`,
		Args: func(cmd *cobra.Command, args []string) error {
			if len(args) > 1 {
				return badUsage(cmd, "%q is one argument too many: %s", args[1], cmd.UseLine())
			}
			return nil
		},
	}
	flags := cmd.Flags()
	flags.SortFlags = false
	out := flags.StringP("output", "o", "", "name of the PDF; - for standard output (default: the almanac file's name)")
	replace := flags.Bool("replace", false, "replace a PDF that is there already")
	var on imposing
	on.flags(cmd)
	cmd.RunE = func(cmd *cobra.Command, args []string) error {
		if cmd.Flags().Changed("output") && *out == "" {
			return badUsage(cmd, "--output is empty: give the name of the PDF")
		}
		if err := on.check(cmd); err != nil {
			return err
		}
		file, name := document.In(templates.Starter(), demoAlmanac), ""
		if len(args) == 1 {
			file = document.OnDisk(args[0])
			name = pdfName(args[0])
		}
		a, err := p.almanac(file)
		if err != nil {
			return err
		}
		if name == "" {
			name = demoName(a)
			p.say("This is the example that comes with Ebbleaf: its harbour and its tides are invented.")
		}
		name = on.fileName(name)
		if *out != "" {
			name = *out
		}
		made, err := on.typeset(a)
		if err != nil {
			return fmt.Errorf("%s: %w", file, err)
		}
		return p.deliver(made, name, *replace)
	}
	return cmd
}

// demoAlmanac is the almanac among the starter's files.
const demoAlmanac = "almanac.yaml"

// pdfName returns the name of the PDF of an almanac file, without its folder.
func pdfName(almanac string) string {
	base := filepath.Base(almanac)
	return strings.TrimSuffix(base, filepath.Ext(base)) + ".pdf"
}

// demoName returns the name of the example's PDF: skerrow-haven-2027.pdf.
func demoName(a *layout.Almanac) string {
	place := strings.ToLower(strings.ReplaceAll(a.Harbours[0].Name, " ", "-"))
	return fmt.Sprintf("%s-%d.pdf", place, a.From.Year)
}

// almanac reads an almanac file and says what seems odd in it.
func (p *program) almanac(file document.File) (*layout.Almanac, error) {
	kind, err := document.KindOf(file)
	if err != nil {
		return nil, err
	}
	if kind != document.AlmanacFile {
		return nil, fmt.Errorf("%s: this is %s, and a booklet is made from an almanac file, which names a harbour file and a year", file, article(kind.String()))
	}
	a, reading, err := document.ReadAlmanac(file, templates.Languages())
	p.notes(reading)
	return a, err
}

// printed is a finished print.
type printed struct {
	data  []byte
	pages int
	on    string // what they stand on, where that is not paper of their size
}

// typeset makes the PDF of an almanac.
func typeset(a *layout.Almanac) (*printed, error) {
	faces, err := face.Load(templates.Fonts())
	if err != nil {
		return nil, err
	}
	doc, err := layout.Make(a, faces)
	if err != nil {
		return nil, err
	}
	data, err := pdf.Write(*doc, faces, pdf.Options{Spreads: true, TrueSize: true})
	if err != nil {
		return nil, err
	}
	return &printed{data, len(doc.Pages), ""}, nil
}

// deliver writes a print to a file, or to standard output for the name -.
func (p *program) deliver(made *printed, name string, replace bool) error {
	size := fmt.Sprintf("%d pages, %d kB", made.pages, (len(made.data)+999)/1000)
	if made.on != "" {
		size = fmt.Sprintf("%d pages %s, %d kB", made.pages, made.on, (len(made.data)+999)/1000)
	}
	if name == "-" {
		if _, err := p.stdout.Write(made.data); err != nil {
			return fmt.Errorf("the PDF could not be written: %w", err)
		}
		p.say("standard output: written, %s", size)
		return nil
	}
	if replace {
		if err := mayReplace(name); err != nil {
			return err
		}
	}
	result, err := output.Save(name, made.data, replace)
	if err != nil {
		if info, there := os.Stat(name); there == nil && info.Mode().IsRegular() && !replace {
			return fmt.Errorf("%w with --replace", err)
		}
		return err
	}
	p.say("%s: %s, %s", name, result, size)
	return nil
}

// mayReplace refuses to replace what is no PDF: a slip of the fingers may have
// named the almanac file itself.
func mayReplace(name string) error {
	f, err := os.Open(name)
	if err != nil {
		return nil // Save tells what is wrong, if anything
	}
	defer f.Close()
	const mark = "%PDF-" // ISO 32000-1, 7.5.2
	head := make([]byte, len(mark))
	if n, _ := io.ReadFull(f, head); n > 0 && !bytes.Equal(head[:n], []byte(mark)) {
		return fmt.Errorf("%s is there and is no PDF: it is not replaced", name)
	}
	return nil
}
