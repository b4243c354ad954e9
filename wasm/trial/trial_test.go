//go:build !js

// Package trial tries the packed page in a real browser, as a person with a
// phone does: it touches, types, drags, picks files, cuts the network. It has
// tests only. Start with job_test.go, which goes the whole way once.
//
// The tests run with HILLWRIGHT_FULL=1 and need chromium. Each has a server
// and a profile of its own. They never sleep: they wait until the page shows
// what it must show, or the test's time is over.
package trial

import (
	"os"
	"os/exec"
	"testing"
	"time"
)

// most is how long one test may take, on a machine that is busy with other
const most = 2 * time.Minute

// patience is how long the page may take to show one thing.
const patience = 30 * time.Second

// browserPath is chromium, or a failed test; without HILLWRIGHT_FULL the test
// is skipped.
func browserPath(t testing.TB) string {
	t.Helper()
	if os.Getenv("HILLWRIGHT_FULL") == "" {
		t.Skip("tries the page in a browser, which takes minutes: HILLWRIGHT_FULL=1 runs it")
	}
	path, err := exec.LookPath("chromium")
	if err != nil {
		t.Fatal("chromium is not installed, and the page is tried in it; on Debian, as root: apt-get install chromium")
	}
	return path
}

func TestMain(m *testing.M) {
	code := m.Run()
	closeBrowser()
	removePacked()
	os.Exit(code)
}
