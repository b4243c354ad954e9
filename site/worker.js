// worker.js runs the page's program a second time, beside the page, for long
// work. The first message brings the compiled module and the address of Go's
// script. Messages that come before the program listens are kept in
// hillwrightEarly: listen, take those, then set it to null.
"use strict";

self.hillwrightWorker = true;
self.hillwrightEarly = [];
self.document = {}; // the program's UI library refuses to load where the name is unknown

self.addEventListener("message", function first({ data }) {
  self.removeEventListener("message", first);
  self.addEventListener("message", function keep(event) {
    if (self.hillwrightEarly) self.hillwrightEarly.push(event.data);
    else self.removeEventListener("message", keep);
  });
  importScripts(data.exec);
  const go = new Go();
  // A failure reaches the page as the worker's error event.
  const fail = (error) => setTimeout(() => { throw error; });
  WebAssembly.instantiate(data.module, go.importObject)
    .then((instance) => go.run(instance))
    .then(() => { throw new Error("the program beside the page has stopped"); })
    .catch(fail);
});
