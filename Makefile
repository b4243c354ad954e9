# What can be done here. `make run` and `make pack` need only Go and make.

GO   ?= go
ADDR ?= 127.0.0.1:8080
SHOP ?=
OUT  ?= dist
FUZZTIME ?= 20s

SOURCES = build cmd physics site wasm
# The packages of the page that also run outside a browser.
NATIVE = $$($(GO) list ./wasm/... | grep -v /wasm/trial)

# What the full run of the tests needs of Debian.
TOOLS = chromium ffmpeg lame

.PHONY: run pack test check bench fuzz pictures binary tools

# Packs the demo shop (or SHOP=folder), serves it and prints its address.
run: pack
	bin/hillwright serve -dir $(OUT) -addr $(ADDR)

pack: binary
	bin/hillwright pack $(if $(SHOP),-shop $(SHOP)) -out $(OUT)

binary:
	$(GO) build -trimpath -o bin/hillwright ./cmd/hillwright

# The quick first, so that what is plainly wrong shows at once.
test: check tools testdata/node_modules/.package-lock.json
	HILLWRIGHT_FULL=1 $(GO) test -timeout 15m ./physics/... ./build/... ./cmd/... ./site/...
	$(GO) test $(NATIVE)
	HILLWRIGHT_FULL=1 $(GO) test -count=1 -timeout 15m ./wasm/trial/...

check:
	@wrong=$$(gofmt -l $(SOURCES)); if [ -n "$$wrong" ]; then echo "gofmt -w these:"; echo "$$wrong"; exit 1; fi
	$(GO) vet ./...
	GOOS=js GOARCH=wasm $(GO) vet ./wasm/...
	$(GO) build -o bin/staticcheck honnef.co/go/tools/cmd/staticcheck
	bin/staticcheck ./...
	GOOS=js GOARCH=wasm bin/staticcheck ./wasm/...

# The computation natively, then the page in the browser.
bench: tools
	$(GO) test -run '^$$' -bench . -benchmem ./physics/... ./build/... $(NATIVE)
	HILLWRIGHT_FULL=1 $(GO) test -run '^$$' -bench . -benchtime 5x -timeout 30m ./wasm/trial/...

# Every fuzz test in turn, FUZZTIME each.
fuzz:
	@set -e; for package in $$($(GO) list ./physics/... ./build/... ./cmd/...) $(NATIVE); do \
		for test in $$($(GO) test -list '^Fuzz' $$package | grep '^Fuzz' || true); do \
			echo "$$package $$test"; \
			$(GO) test -run '^$$' -fuzz "^$$test\$$" -fuzztime $(FUZZTIME) -fuzzminimizetime 1s $$package; \
		done; \
	done

# The README's pictures, taken from the page.
pictures: tools
	HILLWRIGHT_FULL=1 HILLWRIGHT_PICTURES=1 $(GO) test -count=1 -run Picture -v ./wasm/trial/...

# The browser, and coders and decoders of sound, for the tests.
tools:
	@missing=; for tool in $(TOOLS); do command -v $$tool >/dev/null || missing="$$missing $$tool"; done; \
	if [ -z "$$missing" ]; then exit 0; fi; \
	if [ "$$(id -u)" = 0 ] && command -v apt-get >/dev/null; then \
		apt-get update -q && apt-get install -y -q --no-install-recommends $$missing; \
	else \
		echo "the tests need$$missing; on Debian: apt-get install$$missing"; exit 1; \
	fi

# Recorded tracks and reference libraries for the tests.
testdata/node_modules/.package-lock.json: testdata/package-lock.json
	@command -v npm >/dev/null || { echo "the tests need npm; on Debian: apt-get install npm"; exit 1; }
	cd testdata && npm ci --ignore-scripts --no-audit --no-fund
	touch $@
