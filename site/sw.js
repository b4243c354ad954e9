// sw.js keeps one whole build of the page on the device, so that it opens
// without a network. The pack step fills in the build and its files.
"use strict";

const BUILD = "%BUILD%";
// Every file's address, seen from the page's folder, and its SHA-256.
const FILES = { "%FILES%": "" };

// One cache for each build and each folder: copies of the page beside each
// other on one host never touch one another's.
const SCOPE = self.registration.scope;
const OURS = "hillwright-" + SCOPE + " ";
const CACHE = OURS + BUILD;

// The host may name types wrongly; we know them.
const TYPES = {
  css: "text/css; charset=utf-8",
  html: "text/html; charset=utf-8",
  js: "text/javascript; charset=utf-8",
  json: "application/json",
  png: "image/png",
  svg: "image/svg+xml",
  wasm: "application/wasm",
  webmanifest: "application/manifest+json",
};

async function sha256(bytes) {
  const digest = await crypto.subtle.digest("SHA-256", bytes);
  return Array.from(new Uint8Array(digest), (b) => b.toString(16).padStart(2, "0")).join("");
}

async function fetchChecked([path, sum]) {
  const url = new URL(path, SCOPE).href;
  const response = await fetch(url, { cache: "no-cache" });
  if (!response.ok) throw new Error(url + ": " + response.status);
  const bytes = await response.arrayBuffer();
  if ((await sha256(bytes)) !== sum) throw new Error(url + ": not the file of build " + BUILD);
  const ending = path === "./" ? "html" : path.split(".").pop();
  return [url, new Response(bytes, { headers: { "content-type": TYPES[ending] } })];
}

// All files or none: nothing is kept before everything is here and right.
async function install() {
  const all = await Promise.all(Object.entries(FILES).map(fetchChecked));
  const cache = await caches.open(CACHE);
  try {
    await Promise.all(all.map(([url, response]) => cache.put(url, response)));
  } catch (error) {
    await caches.delete(CACHE);
    throw error;
  }
}

async function activate() {
  for (const name of await caches.keys()) {
    if (name.startsWith(OURS) && name !== CACHE) await caches.delete(name);
  }
  await self.clients.claim();
}

async function answer(request, url) {
  const cache = await caches.open(CACHE);
  const page = url.pathname === new URL("index.html", SCOPE).pathname ? SCOPE : url.origin + url.pathname;
  const held = await cache.match(page);
  if (held) return held;
  try {
    return await fetch(request);
  } catch (error) {
    const elsewhere = request.mode === "navigate" && page !== SCOPE && !/\.(js|wasm)$/.test(url.pathname);
    if (elsewhere) return Response.redirect(SCOPE);
    throw error;
  }
}

self.addEventListener("install", (event) => event.waitUntil(install()));
self.addEventListener("activate", (event) => event.waitUntil(activate()));
self.addEventListener("message", (event) => {
  if (event.data && event.data.type === "use-new") self.skipWaiting();
});
self.addEventListener("fetch", (event) => {
  const url = new URL(event.request.url);
  const ours = url.origin === self.location.origin && url.href.startsWith(SCOPE);
  if (ours && event.request.method === "GET") event.respondWith(answer(event.request, url));
});
