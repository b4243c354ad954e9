// Package state is the one state of the page and the one place where it
// changes. Start with First, which makes the state a page opens with, and
// State.Do, which takes an Action and gives back what the device is to do.
package state

import (
	"hillwright/physics/ask"
	"hillwright/wasm/keep"
)

// State is everything that the page shows.
type State struct {
	Shop     *keep.Shop
	Lang     string
	Question ask.Question
}

// First is the state with which the page opens: the shop's first bike, rider,
// load, day and hill, answered. lang is one of the shop's languages; an
// unknown or empty one gives the shop's first.
func First(shop *keep.Shop, lang string) *State {
	return &State{Shop: shop, Lang: lang, Question: ask.Default()}
}
