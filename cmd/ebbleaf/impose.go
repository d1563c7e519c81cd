package main

import (
	"errors"
	"fmt"
	"strconv"
	"strings"

	"github.com/spf13/cobra"

	"ebbleaf/layout"
	"ebbleaf/layout/face"
	"ebbleaf/layout/pdf"
	"ebbleaf/templates"
)

// imposing holds the flags that say how pages are put on paper.
type imposing struct {
	how       choice
	sheet     choice
	thickness thickness
}

// plainPages leaves every page on paper of its own size.
const plainPages = "plain"

// flags gives a command the flags of imposition.
func (im *imposing) flags(cmd *cobra.Command) {
	im.how = choice{plainPages, []string{plainPages, "fold", "two-up"}}
	im.sheet = choice{"", nil}
	for _, p := range layout.Papers() {
		im.sheet.allowed = append(im.sheet.allowed, p.Name)
	}
	im.thickness.mm = pdf.UsualThickness
	flags := cmd.Flags()
	flags.Var(&im.how, "impose", "pages one by one, a booklet to fold and staple, or two pages side by side")
	flags.VarP(&paperName{&im.sheet}, "sheet", "", "paper for --impose fold and two-up (default: the next larger than the pages)")
	flags.Var(&im.thickness, "thickness", "of the paper in millimetres, for --impose fold")
}

// check returns the fault of flags that do not go together.
func (im *imposing) check(cmd *cobra.Command) error {
	if im.how.value == plainPages && cmd.Flags().Changed("sheet") {
		return badUsage(cmd, "--sheet is for --impose fold and --impose two-up: plain pages come on the paper of the almanac file")
	}
	if im.how.value != "fold" && cmd.Flags().Changed("thickness") {
		return badUsage(cmd, "--thickness is for --impose fold: other pages are not moved")
	}
	return nil
}

// fileName returns the name for a print, where that of its plain pages is given.
func (im *imposing) fileName(name string) string {
	if im.how.value == plainPages {
		return name
	}
	return strings.TrimSuffix(name, ".pdf") + "-" + im.how.value + ".pdf"
}

// typeset makes the PDF of an almanac with its pages put on paper as asked.
func (im *imposing) typeset(a *layout.Almanac) (*printed, error) {
	if im.how.value == plainPages {
		return typeset(a)
	}
	sheet, err := a.Paper.Opening(im.sheet.value)
	if err != nil {
		return nil, err
	}
	faces, err := face.Load(templates.Fonts())
	if err != nil {
		return nil, err
	}
	fold := im.how.value == "fold"
	turned := *a // not to change what belongs to others
	turned.ToFold = fold
	doc, err := layout.Make(&turned, faces)
	if err != nil {
		return nil, err
	}
	told := layout.Imposed{Sheet: sheet, Pages: len(doc.Pages), Fold: fold, Thickness: im.thickness.mm}
	put := &pdf.Imposition{
		Arrangement: pdf.TwoUp,
		Width:       sheet.Height, Height: sheet.Width,
		Thickness: im.thickness.mm,
		Front:     layout.PrintingPage(&turned, faces, told),
	}
	on := fmt.Sprintf("two by two on %d sides of %s", told.Sheets(), sheet.Name)
	if fold {
		put.Arrangement = pdf.Fold
		on = fmt.Sprintf("on %d sheets of %s", told.Sheets(), sheet.Name)
	}
	data, err := pdf.Write(*doc, faces, pdf.Options{TrueSize: true, Impose: put})
	if err != nil {
		return nil, err
	}
	return &printed{data, len(doc.Pages), on}, nil
}

// paperName is the choice of a paper, with a short name for it in the help.
type paperName struct{ *choice }

func (*paperName) Type() string { return "PAPER" }

// thickness is that of paper.
type thickness struct{ mm float64 }

func (t *thickness) Type() string { return "MM" }

func (t *thickness) String() string { return strconv.FormatFloat(t.mm, 'g', -1, 64) }

func (t *thickness) Set(s string) error {
	v, err := strconv.ParseFloat(s, 64)
	if err != nil || !(v >= 0 && v <= 1) {
		return errors.New("a number of millimetres from 0 to 1 is wanted, such as 0.1")
	}
	t.mm = v
	return nil
}
