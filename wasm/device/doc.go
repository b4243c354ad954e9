// Package device is all that the page asks of the browser besides its tree:
// storage, files, the worker, sharing, language, the new version. Start with
// New. Nothing here blocks: what takes time comes back by a function. It
// builds for the browser only.
//
// Storage is a thin layer of its own over IndexedDB: the library that DESIGN.md
// names waits inside goroutines and brings fmt, log and io/fs with it, a fifth
// of the whole program, for three calls.
package device
