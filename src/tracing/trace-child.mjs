// SPDX-License-Identifier: GPL-2.0-only
// Traces luminance pictures in a process of its own; the protocol stands in README.md.
import { createRequire } from 'node:module';
import { decompose } from './decompose.mjs';

const require = createRequire(import.meta.url);
const Potrace = require('potrace/lib/Potrace.js');

const HEAD_BYTES = 32;
const THRESHOLD = 127;

const write = (value) => String(Math.round(value * 1000) / 1000);
const pair = (point) => `${write(point.x)} ${write(point.y)}`;

/** Path data of one closed curve, to a thousandth of a pixel. */
function pathData({ n, tag, c }) {
  let data = `M${pair(c[3 * n - 1])}`;
  for (let index = 0; index < n; index += 1) {
    const [a, b, end] = [c[3 * index], c[3 * index + 1], c[3 * index + 2]];
    data += tag[index] === 'CURVE' ? `C${pair(a)} ${pair(b)} ${pair(end)}` : `L${pair(b)}L${pair(end)}`;
  }
  return `${data}Z`;
}

function trace(head, grey) {
  const [width, height, smallest] = [0, 4, 8].map((at) => head.readUInt32BE(at));
  if (grey.length !== width * height)
    throw new Error(`expected ${width * height} bytes of luminance, got ${grey.length}`);
  const tracer = new Potrace({ alphaMax: head.readDoubleBE(12), optTolerance: head.readDoubleBE(20) });
  const parts = [];
  // The package's own first stage calls several functions for each pixel, and keeps every path until the end.
  for (const path of decompose(grey, width, height, THRESHOLD, smallest)) {
    tracer._pathlist = [path];
    tracer._processPath();
    parts.push(pathData(path.curve));
  }
  return parts.join('');
}

function answer(status, text) {
  const payload = Buffer.from(text, 'utf8');
  const head = Buffer.alloc(5);
  head.writeUInt8(status, 0);
  head.writeUInt32BE(payload.length, 1);
  process.stdout.write(head);
  process.stdout.write(payload);
}

let received = [];
let bytes = 0;

function serve() {
  if (bytes < HEAD_BYTES) return;
  if (received[0].length < HEAD_BYTES) received = [Buffer.concat(received)];
  const need = HEAD_BYTES + received[0].readUInt32BE(28);
  if (bytes < need) return;
  const whole = Buffer.concat(received);
  received = whole.length > need ? [whole.subarray(need)] : [];
  bytes = whole.length - need;
  try {
    answer(0, trace(whole.subarray(0, HEAD_BYTES), whole.subarray(HEAD_BYTES, need)));
  } catch (error) {
    answer(1, String(error?.message ?? error).slice(0, 2000));
  }
  if (bytes > 0) serve();
}

process.stdin.on('data', (chunk) => {
  received.push(chunk);
  bytes += chunk.length;
  serve();
});
process.stdin.on('end', () => process.exit(0));
