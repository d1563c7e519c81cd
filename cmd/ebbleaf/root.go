package main

import (
	"runtime/debug"
	"strings"

	"github.com/spf13/cobra"
)

// caution stands in the help and under every list of tides. It cannot be
// switched off.
const caution = "Predictions are for average weather: wind and air pressure change times and heights. " +
	"Official tables, local notices and what you see come first."

// root returns the whole tree of commands.
func (p *program) root() *cobra.Command {
	root := group(&cobra.Command{
		Use:   "ebbleaf",
		Short: "Tide tables with the Sun and Moon, as PDF booklets and as lists",
		Long: `Ebbleaf works out the tides of a harbour from its harmonic constants, with the
times of Sun and Moon, and prints them as a booklet (PDF) or as lists.

Two kinds of text file tell it what to do. A harbour file says where a harbour
lies and holds its constants; an almanac file says what to print. Start with
"ebbleaf start", which writes a folder with one of each.

` + wrap(caution, 78),
		Example: `  ebbleaf start my-almanac                   a folder to start from
  ebbleaf proof my-almanac/almanac.yaml      look for mistakes
  ebbleaf press my-almanac/almanac.yaml      make the booklet
  ebbleaf list tides my-almanac/skerrow-haven.yaml`,
		Version:           version(),
		SilenceErrors:     true,
		SilenceUsage:      true,
		CompletionOptions: cobra.CompletionOptions{DisableDefaultCmd: true},
	})
	root.SetFlagErrorFunc(flagFault)
	root.SetVersionTemplate("{{.Name}} {{.Version}}\n")
	root.SetHelpCommand(helpCommand(root))
	root.AddCommand(p.start(), p.proof(), p.press(), p.list(), p.levels(), p.seek())
	root.AddCommand(p.fit(), p.compare())
	return root
}

// helpCommand returns "ebbleaf help COMMAND".
func helpCommand(root *cobra.Command) *cobra.Command {
	return &cobra.Command{
		Use:   "help [COMMAND]",
		Short: "Show how a command is used",
		Long:  "Show how a command is used: the same as the flag --help after it.",
		Example: `  ebbleaf help press
  ebbleaf help list tides`,
		RunE: func(_ *cobra.Command, args []string) error {
			at := root
			for _, word := range args {
				next, _, _ := at.Find([]string{word})
				if next == nil || next == at {
					return unknownCommand(at, word)
				}
				at = next
			}
			at.InitDefaultHelpFlag()
			at.InitDefaultVersionFlag()
			return at.Help()
		},
	}
}

// version returns the version of the module this program was built from.
func version() string {
	info, ok := debug.ReadBuildInfo()
	if !ok || info.Main.Version == "" || info.Main.Version == "(devel)" {
		return "development"
	}
	return info.Main.Version
}

// wrap breaks a text into lines of at most so many characters.
func wrap(text string, width int) string {
	out, column := "", 0
	for _, word := range strings.Fields(text) {
		switch n := len([]rune(word)); {
		case column == 0:
			column = n
		case column+1+n > width:
			out += "\n"
			column = n
		default:
			out += " "
			column += 1 + n
		}
		out += word
	}
	return out
}
