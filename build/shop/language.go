package shop

import "hillwright/wasm/words"

// Languages gives the tags of the languages that a page can speak.
func Languages() []string {
	var tags []string
	for _, l := range words.Langs() {
		tags = append(tags, l.Tag())
	}
	return tags
}
