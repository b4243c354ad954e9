// recorder.js takes the microphone's samples beside the page: it gathers them
// into parts of 16-bit numbers and sends each with its loudest sample (full
// scale 1) to the page's program.
"use strict";

registerProcessor("hillwright-recorder", class extends AudioWorkletProcessor {
  constructor() {
    super();
    this.part = new Int16Array(4096);
    this.have = 0;
    this.peak = 0;
    this.port.onmessage = () => this.send();
  }

  send() {
    const samples = this.part.slice(0, this.have);
    this.port.postMessage({ samples, peak: this.peak }, [samples.buffer]);
    this.have = 0;
    this.peak = 0;
  }

  process([input]) {
    for (const x of input[0] || []) {
      this.peak = Math.max(this.peak, Math.abs(x));
      this.part[this.have++] = Math.max(-32768, Math.min(32767, Math.round(x * 32767)));
      if (this.have === this.part.length) this.send();
    }
    return true;
  }
});
