// boot.js starts the page's program and does what must happen before it runs.
//
// What it leaves on window for the Go side:
//   hillwrightTaps    taps and inputs on [data-act] elements that came before the
//                     program was ready, oldest first: {type, act, arg, value}.
//                     Take them, then set it to null: that ends the recording.
//   hillwrightShop    the text of shop.json.
//   hillwrightStartWorker  a function that starts a worker with the same program.
//   hillwrightRecorder  the address of the script that takes the microphone's
//                     samples.
//   hillwrightDatabase  a function that opens the database of a name and a
//                     version and gives the request, or null where the browser
//                     refuses: there even looking at window.indexedDB may throw,
//                     which the program cannot catch.
//   hillwrightUpdate  a function that changes to a new build; there is one once
//                     the window has had the event "hillwright-update".
"use strict";

(() => {
  const files = document.currentScript.dataset;

  const words = {
    en: {
      missing: "This browser cannot run the page's program (WebAssembly). A newer browser can.",
      failed: "The page's program could not be loaded. Check the connection and load the page again.",
      stopped: "The page's program has stopped. What was saved is kept; load the page again.",
    },
    de: {
      missing: "Dieser Browser kann das Programm der Seite (WebAssembly) nicht ausführen. Ein neuerer kann es.",
      failed: "Das Programm der Seite konnte nicht geladen werden. Verbindung prüfen und Seite neu laden.",
      stopped: "Das Programm der Seite wurde beendet. Gespeichertes bleibt erhalten; Seite neu laden.",
    },
  };

  function tell(what, error) {
    if (error) console.error(error);
    const say = () => {
      const note = document.getElementById("boot-note");
      note.textContent = (words[document.documentElement.lang] || words.en)[what];
      note.hidden = false;
    };
    if (document.getElementById("boot-note")) say();
    else document.addEventListener("DOMContentLoaded", say);
  }

  window.hillwrightDatabase = (name, version) => {
    try {
      return window.indexedDB.open(name, version);
    } catch (refused) {
      return null;
    }
  };

  window.hillwrightTaps = [];
  for (const type of ["click", "input"]) {
    document.addEventListener(type, function keep(event) {
      if (!window.hillwrightTaps) {
        document.removeEventListener(type, keep, true);
        return;
      }
      const element = event.target.closest && event.target.closest("[data-act]");
      if (!element) return;
      window.hillwrightTaps.push({
        type,
        act: element.dataset.act,
        arg: element.dataset.arg || "",
        value: "value" in element ? element.value : "",
      });
    }, true);
  }

  // Streaming needs a host that serves the right type; any other gets by with
  // the whole file, but only if it is the file and not a page about an error.
  async function compile(url) {
    const response = await fetch(url);
    if (!response.ok) throw new Error(url + ": " + response.status);
    const type = response.headers.get("content-type") || "";
    if (WebAssembly.compileStreaming && type.startsWith("application/wasm")) {
      return WebAssembly.compileStreaming(response);
    }
    return WebAssembly.compile(await response.arrayBuffer());
  }

  function script(url) {
    return new Promise((resolve, reject) => {
      const element = document.createElement("script");
      element.src = url;
      element.onload = resolve;
      element.onerror = () => reject(new Error(url + ": could not be loaded"));
      document.head.append(element);
    });
  }

  async function text(url) {
    const response = await fetch(url);
    if (!response.ok) throw new Error(url + ": " + response.status);
    return response.text();
  }

  const parsed = new Promise((resolve) => {
    if (document.readyState !== "loading") resolve();
    else document.addEventListener("DOMContentLoaded", resolve);
  });

  async function start() {
    if (typeof WebAssembly !== "object") return tell("missing");
    let go, instance;
    try {
      const [module, shop] = await Promise.all([compile(files.wasm), text(files.shop), script(files.exec), parsed]);
      window.hillwrightShop = shop;
      window.hillwrightRecorder = files.recorder;
      window.hillwrightStartWorker = () => {
        const worker = new Worker(files.worker);
        worker.postMessage({ module, exec: files.exec });
        return worker;
      };
      go = new Go();
      instance = await WebAssembly.instantiate(module, go.importObject);
    } catch (error) {
      return tell("failed", error);
    }
    try {
      await go.run(instance);
      tell("stopped");
    } catch (error) {
      tell("stopped", error);
    }
  }

  // A new build waits until the person says so; then every open page of this
  // shop loads again, so that no page runs on files of two builds.
  async function keepForOffline() {
    if (!navigator.serviceWorker) return;
    const container = navigator.serviceWorker;
    // The first one of ours takes over without a word; the page may have been
    // held by that of a folder above until then.
    const ours = new URL("sw.js", location.href).href;
    const held = () => Boolean(container.controller) && container.controller.scriptURL === ours;
    let before = held();
    container.addEventListener("controllerchange", () => {
      if (before) location.reload();
      before = held();
    });
    const registration = await container.register("sw.js", { scope: "./", updateViaCache: "none" });
    const offer = () => {
      if (!registration.waiting || !registration.active) return;
      window.hillwrightUpdate = () => registration.waiting && registration.waiting.postMessage({ type: "use-new" });
      window.dispatchEvent(new Event("hillwright-update"));
    };
    const watch = () => registration.installing && registration.installing.addEventListener("statechange", offer);
    registration.addEventListener("updatefound", watch);
    watch();
    offer();
  }

  start();
  if (document.readyState === "complete") keepForOffline().catch(console.warn);
  else window.addEventListener("load", () => keepForOffline().catch(console.warn));
})();
