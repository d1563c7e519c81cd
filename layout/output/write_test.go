package output

import (
	"os"
	"path/filepath"
	"testing"
)

// Where the last step fails, because a folder has taken the name meanwhile,
// nothing is left beside it.
func TestWriteLeavesNothingOnFailure(t *testing.T) {
	dir := t.TempDir()
	target := filepath.Join(dir, "a.pdf")
	if err := os.MkdirAll(filepath.Join(target, "inside"), 0o755); err != nil {
		t.Fatal(err)
	}
	if err := write(target, []byte("x"), 0o644); err == nil {
		t.Fatal("a folder was written over")
	}
	entries, err := os.ReadDir(dir)
	if err != nil || len(entries) != 1 {
		t.Errorf("left behind: %v, %v", entries, err)
	}
}
