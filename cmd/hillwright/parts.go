package main

import (
	"flag"
	"fmt"
	"os"
	"strings"

	"hillwright/build/shop"
	"hillwright/physics/ask"
	"hillwright/site"
	"hillwright/wasm/keep"
	"hillwright/wasm/words"
)

// parts are the flags that put a question together, the same for every command
// that asks one.
type parts struct {
	bike, rider, load, day string
	shopDir                string
	lang, units            string
	sets                   []string
}

func (o *parts) flags(f *flag.FlagSet) {
	f.StringVar(&o.bike, "bike", "", "a bike of the shop, by its `id` (default: the shop's first)")
	f.StringVar(&o.rider, "rider", "", "a rider of the shop, by its `id` (default: the shop's first)")
	f.StringVar(&o.load, "load", "", "a load of the shop, by its `id` (default: the shop's first)")
	f.StringVar(&o.day, "day", "", "a day of the shop, by its `id` (default: the shop's first)")
	f.StringVar(&o.shopDir, "shop", "", "the `folder` of a shop (default: the demo shop)")
	f.StringVar(&o.lang, "lang", "en", "language of the answer, `en or de`")
	f.StringVar(&o.units, "units", "metric", "units of the answer, `metric or imperial`")
	f.Func("set", "override an input by its path, `PATH=VALUE`; may be given again", func(s string) error {
		o.sets = append(o.sets, s)
		return nil
	})
}

// asked reads the voice, the shop and the question that the flags mean.
func (o *parts) asked() (v words.Voice, s shop.Copy, q ask.Question, err error) {
	if v, err = voiceOf(o.lang, o.units); err != nil {
		return v, s, q, err
	}
	if s, err = o.shop(); err != nil {
		return v, s, q, err
	}
	q, err = o.question(&s.Shop)
	return v, s, q, err
}

// shop reads the shop that is meant.
func (o *parts) shop() (shop.Copy, error) {
	if o.shopDir != "" {
		return shop.Read(os.DirFS(o.shopDir))
	}
	return shop.Read(site.DemoShop())
}

func voiceOf(lang, units string) (words.Voice, error) {
	var v words.Voice
	switch lang {
	case "en":
	case "de":
		v.Lang, v.Comma = words.German, true
	default:
		return v, fmt.Errorf("-lang %q is not known; expected en or de", lang)
	}
	switch units {
	case "metric":
	case "imperial":
		v.Units = words.Imperial
	default:
		return v, fmt.Errorf("-units %q is not known; expected metric or imperial", units)
	}
	return v, nil
}

// question puts the chosen things together and overrides what -set says.
func (o *parts) question(s *keep.Shop) (ask.Question, error) {
	q := ask.Default()
	if err := q.Set("ride.law", s.LawID); err != nil {
		return q, err
	}
	for _, choice := range []struct {
		kind keep.Kind
		id   string
	}{{keep.Bike, o.bike}, {keep.Rider, o.rider}, {keep.Load, o.load}, {keep.Day, o.day}} {
		thing, err := pick(s, choice.kind, choice.id)
		if err != nil {
			return q, err
		}
		if err := thing.Put(&q); err != nil {
			return q, fmt.Errorf("%s %s: %w", choice.kind, thing.ID, err)
		}
	}
	for _, set := range o.sets {
		path, value, ok := strings.Cut(set, "=")
		if !ok {
			return q, fmt.Errorf("-set %s: expected PATH=VALUE, such as rider.mass_kg=82", set)
		}
		if err := q.Set(strings.TrimSpace(path), value); err != nil {
			return q, fmt.Errorf("-set %w", err)
		}
	}
	return q, nil
}

// pick finds a thing of the shop, the first of its kind when id is empty.
func pick(s *keep.Shop, kind keep.Kind, id string) (keep.Thing, error) {
	var ids []string
	for _, t := range s.Things {
		if t.Kind != kind {
			continue
		}
		if id == "" || t.ID == id {
			return t, nil
		}
		ids = append(ids, t.ID)
	}
	return keep.Thing{}, fmt.Errorf("-%s %q: the shop has no such %s; it has %s", kind, id, kind, strings.Join(ids, ", "))
}
