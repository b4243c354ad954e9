// physics.js runs a Go test program in the page: ?run=NAME.wasm&in=FOLDER&flag=…
// What it prints is gathered in ran.text; ran.code is its exit code once it is
// over. Files that it reads come from the host, below /files.
"use strict";

globalThis.ran = { text: "", code: null };

(() => {
  const question = new URLSearchParams(location.search);
  const decoder = new TextDecoder();
  const opened = new Map();
  const missing = () => Object.assign(new Error("no such file"), { code: "ENOENT" });

  const told = (size) => ({
    dev: 0, ino: 0, mode: 0o100644, nlink: 1, uid: 0, gid: 0, rdev: 0, size, blksize: 4096, blocks: 0,
    atimeMs: 0, mtimeMs: 0, ctimeMs: 0, isDirectory: () => false,
  });

  // The values do not matter as long as they are apart: Go's library takes them from here.
  Object.assign(globalThis.fs.constants, { O_WRONLY: 1, O_RDWR: 2, O_CREAT: 64, O_EXCL: 128, O_TRUNC: 512, O_APPEND: 1024, O_DIRECTORY: 65536 });

  const hold = (bytes, callback) => {
    const fd = opened.size + 100;
    opened.set(fd, { bytes, at: 0 });
    callback(null, fd);
  };

  Object.assign(globalThis.fs, {
    writeSync(fd, bytes) {
      ran.text += decoder.decode(bytes);
      return bytes.length;
    },
    // Examples write what they print to a file and read it again.
    write(fd, bytes, offset, length, position, callback) {
      const part = bytes.subarray(offset, offset + length);
      if (fd < 100) {
        this.writeSync(fd, part);
      } else {
        const file = opened.get(fd);
        const from = position === null ? file.at : position;
        const grown = new Uint8Array(Math.max(file.bytes.length, from + length));
        grown.set(file.bytes);
        grown.set(part, from);
        file.bytes = grown;
        file.at = from + length;
      }
      callback(null, length);
    },
    unlink(path, callback) { callback(null); },
    open(path, flags, mode, callback) {
      if (flags & 64) return hold(new Uint8Array(), callback);
      fetch("/files" + new URL(path, location.origin + question.get("in") + "/").pathname)
        .then(async (answer) => {
          if (!answer.ok) return callback(missing());
          hold(new Uint8Array(await answer.arrayBuffer()), callback);
        }, () => callback(missing()));
    },
    fstat(fd, callback) { callback(null, told(opened.get(fd).bytes.length)); },
    stat(path, callback) { callback(missing()); },
    lstat(path, callback) { callback(missing()); },
    read(fd, buffer, offset, length, position, callback) {
      const file = opened.get(fd);
      const from = position === null ? file.at : position;
      const part = file.bytes.subarray(from, from + length);
      buffer.set(part, offset);
      if (position === null) file.at += part.length;
      callback(null, part.length);
    },
    close(fd, callback) { callback(null); },
  });
  globalThis.process.cwd = () => question.get("in");

  const go = new Go();
  go.argv = ["test", ...question.getAll("flag")];
  go.exit = (code) => { ran.code = code; };
  WebAssembly.instantiateStreaming(fetch(question.get("run")), go.importObject)
    .then(({ instance }) => go.run(instance))
    .catch((error) => { ran.text += "\n" + error; ran.code = -1; });
})();
