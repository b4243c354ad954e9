// Package draw makes the page's pictures: pure functions from an answer to SVG
// as a tree of dom nodes, and the same figures as text. Start with Section
// (the hill as a cut through the ground), Strip (what runs along under it), Balance (the wanted pull against the
// limits' pegs) PullDiagram (pull against speed)
// and Brakes (how warm they get). Hatches must stand once
// on a page that shows a Section; Legend explains the hatching.
//
// Pictures carry no colours and no style attributes, only classes. The
// stylesheet sets stroke, fill, stroke-width and font-weight for these, but
// never font-size, which the geometry relies on (figures may be tabular):
//
//	picture            every outermost svg (also picture-section, picture-balance, picture-pull)
//	words, figure      text: plain words; figures and what matters (bolder)
//	quiet              text: scales
//	stops              with figure: the words at the stake (accent)
//	on-ink             text that stands on an ink-filled body
//	halo               with words or figure: text over lines (paint-order stroke, stroke of the paper's colour)
//	hatches            the svg that holds the patterns: must not be display: none (position absolute will do)
//	hatch-ground       the ground between hatch lines (filled)
//	hatch-line         hatch lines (stroked), of open and close ground
//	hatch-solid        solid ground (filled), the accent
//	ground-open, ground-close, ground-solid   ground by headroom (the fill attribute is the pattern: leave fill alone)
//	ground-beyond      ground beyond a stall: not ridden (filled, not hatched)
//	road               the road's line (stroked, bold)
//	ordinate           lines from the road down to the base line at the ticks (thin)
//	base               base lines and axes (stroked)
//	level-mark         the mark beside a height (filled)
//	bracket            the surveyor's bracket and its leader (stroked)
//	stake              where the rig stops (stroked, bold, accent)
//	staff, staff-rod, staff-mark   the staff: group, rod (paper fill, ink stroke), its divisions and foot (filled)
//	band-frame, band-mark, band-line   of the strip: a band's frame (thin), its mark (dashed), what runs along (bold)
//	band-halo          the same under it where it crosses a hatching (wider, the paper's colour)
//	band-bad           where a band is beyond its mark (the fill attribute is the pattern: leave fill alone)
//	bar-mark           the caution on a brake's bar (stroked, bold)
//	plumb, plumb-line  the line under the staff through the strip: group, line
//	touch              what a finger takes (fill transparent, pointer-events all, cursor)
//	barrel, window     the spring balance's body (paper fill, ink stroke) and its slot (filled, faint)
//	spring, hook, tick hook, spring and scale (stroked)
//	leader             from a peg to its label (thin)
//	peg, peg-head      a limit's peg (stroked; head paper fill, ink stroke)
//	peg-binds          the head of the peg that binds (filled with ink)
//	peg-broken         a peg that the weight has passed (stroked, accent)
//	weight, weight-body, cord   the weight: group (focusable: give it a focus ring), body (filled with ink), cord
//	gap, gap-short     the dimension line between weight and first peg; gap-short where pull is missing (accent)
//	gear-curve, gear-used, envelope, load   pull by gear (thin), of the gear in use (medium), best pull (bold), road load (dashed)
//	grid, drop         lines across at the pulls (faint); from the crossing down to the speed (thin)
//	crossing           the point where the speed settles (filled, accent)
//	figures            tables of the text equivalents
//	hatch-key          the legend's list; swatch the small svg in it
package draw
