// Package page hangs views into the browser: it turns trees of dom nodes into
// components of the UI library, region by region, takes touches and keys by one
// listener for each kind of event, and runs the loop action → state → view →
// effects. Start with Start. It builds for the browser only.
package page
