package build

import (
	"bytes"
	"crypto/sha256"
	"encoding/hex"
	"encoding/json"
	"fmt"
	"io/fs"
)

// workerName is the service worker's file. Browsers find a new build by it, so
// its name bears no hash.
const workerName = "sw.js"

// cachePrefix begins the names of the page's caches, in sw.js too.
const cachePrefix = "hillwright-"

// addServiceWorker fills the service worker with the build's name and the list
// of files. The build is named by all that is in it, the worker's own text
// included: any change makes a new build with a new cache.
func (p *Page) addServiceWorker(site fs.FS) error {
	script, err := fs.ReadFile(site, workerName)
	if err != nil {
		return err
	}
	list, err := json.Marshal(p.precache())
	if err != nil {
		return err
	}
	sum := sha256.New()
	sum.Write(script)
	sum.Write(list)
	p.build = hex.EncodeToString(sum.Sum(nil))[:hashDigits]
	for _, blank := range []struct{ mark, value string }{
		{`"%BUILD%"`, `"` + p.build + `"`},
		{`{ "%FILES%": "" }`, string(list)},
	} {
		if bytes.Count(script, []byte(blank.mark)) != 1 {
			return fmt.Errorf("%s: expected %s once, to be filled in", workerName, blank.mark)
		}
		script = bytes.Replace(script, []byte(blank.mark), []byte(blank.value), 1)
	}
	return p.addPlain(workerName, script, false)
}

// precache lists what the service worker holds: each file's SHA-256 by its
// address. The page itself goes by its folder's address, since some hosts
// answer "index.html" by sending the browser there.
func (p *Page) precache() map[string]string {
	list := map[string]string{}
	for _, f := range p.Files() {
		if !f.Precached {
			continue
		}
		address := f.Name
		if address == "index.html" {
			address = "./"
		}
		list[address] = f.Sum()
	}
	return list
}
