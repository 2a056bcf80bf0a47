// Draws SVG in a process that may be killed at any moment. Speaks bytes on stdin and stdout, knows no file, opens no
// connection. Request: width, height, length (three uint32, big-endian), then the SVG. Answer: status (0 drawn, 1 not),
// length (uint32), then RGBA or the reason. One request at a time.
import sharp from 'sharp';

sharp.cache(false);
sharp.concurrency(1);

let pending = Buffer.alloc(0);
let chunks = [];
let busy = false;

function answer(status, payload) {
  const head = Buffer.alloc(5);
  head.writeUInt8(status, 0);
  head.writeUInt32BE(payload.length, 1);
  process.stdout.write(head);
  process.stdout.write(payload);
}

async function draw(widthPx, heightPx, svg) {
  const picture = sharp(svg, { limitInputPixels: widthPx * heightPx, unlimited: false, failOn: 'error' });
  const { data, info } = await picture
    .ensureAlpha()
    .toColourspace('srgb')
    .raw()
    .toBuffer({ resolveWithObject: true });
  if (info.width !== widthPx || info.height !== heightPx || info.channels !== 4) {
    throw new Error(
      `drawn ${info.width} x ${info.height} x ${info.channels}, asked ${widthPx} x ${heightPx} x 4`,
    );
  }
  return data;
}

async function serve() {
  if (busy) return;
  const waiting = chunks.reduce((sum, chunk) => sum + chunk.length, pending.length);
  const need = pending.length >= 12 ? 12 + pending.readUInt32BE(8) : 12;
  if (waiting < need) return;
  pending = Buffer.concat([pending, ...chunks]);
  chunks = [];
  const length = pending.readUInt32BE(8);
  if (pending.length < 12 + length) return;
  const [widthPx, heightPx] = [pending.readUInt32BE(0), pending.readUInt32BE(4)];
  const svg = Buffer.from(pending.subarray(12, 12 + length));
  pending = Buffer.from(pending.subarray(12 + length));
  busy = true;
  try {
    answer(0, await draw(widthPx, heightPx, svg));
  } catch (error) {
    answer(1, Buffer.from(String(error?.message ?? error).slice(0, 2000)));
  }
  busy = false;
  void serve();
}

process.stdin.on('data', (chunk) => {
  chunks.push(chunk);
  void serve();
});
process.stdin.on('end', () => process.exit(0));
