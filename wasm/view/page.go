// Package view turns a state into the page as a tree of dom nodes. Views are
// pure functions: they compute no physics and touch no browser. Start with
// Page, which gives the whole page; Regions gives it part by part.
package view

import (
	"hillwright/wasm/dom"
	"hillwright/wasm/state"
)

// Page is the whole page: what stands inside <div id="app">.
func Page(s *state.State) *dom.Node {
	return dom.El("div", dom.Class("page"), dom.Text(s.Shop.Name))
}
