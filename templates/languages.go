package templates

import (
	"embed"
	"io/fs"
)

//go:embed languages/*.yaml
var languages embed.FS

// Languages returns the language files, named after their languages: en.yaml
// has the English texts, and every key there is.
func Languages() fs.FS { return within(languages, "languages") }
