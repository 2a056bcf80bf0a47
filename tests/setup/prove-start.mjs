// Proves the first command: clones the project into a temporary folder, types `npm start`, carries one order through the
// JSON endpoints, stops it and starts it a second time, which must take seconds and keep the data.
import { spawn, spawnSync } from 'node:child_process';
import { mkdtempSync, readFileSync, rmSync } from 'node:fs';
import { tmpdir } from 'node:os';
import path from 'node:path';
import { ApiClient } from './api-client.mjs';
import { carryOneOrder } from './one-order.mjs';
import { freePort, waitForLine } from './serve.mjs';

const root = path.resolve(import.meta.dirname, '../..');
const scratch = mkdtempSync(path.join(tmpdir(), 'umberline-clone-'));
const clone = path.join(scratch, 'clone');
const port = await freePort();
const env = { ...process.env, PORT: String(port), NODE_ENV: '' };
let running;

async function start(seconds) {
  const began = performance.now();
  running = spawn('npm', ['start'], { cwd: clone, env, stdio: ['ignore', 'pipe', 'pipe'], detached: true });
  await waitForLine(running, /serves at \S+/, seconds);
  return (performance.now() - began) / 1000;
}

async function stop() {
  const ended = new Promise((done) => running.once('exit', done));
  process.kill(-running.pid, 'SIGTERM');
  await ended;
  running = undefined;
}

try {
  const cloned = spawnSync('git', ['clone', '-q', '--no-hardlinks', root, clone], { stdio: 'inherit' });
  if (cloned.status !== 0) throw new Error('the clone failed');
  console.log(`npm start in a fresh clone: ${(await start(1500)).toFixed(0)} s until it served`);
  const base = `http://localhost:${port}`;
  const people = JSON.parse(readFileSync(path.join(clone, 'db/seeds/demo-people.json'), 'utf8'));
  const artwork = {
    name: 'bakery-mark.svg',
    mediaType: 'image/svg+xml',
    widthMm: 60,
    heightMm: 60,
    bytes: Buffer.from(
      '<svg xmlns="http://www.w3.org/2000/svg" width="60mm" height="60mm" viewBox="0 0 60 60"><circle cx="30" cy="30" r="24" fill="none" stroke="#000" stroke-width="3"/><path d="M18 34h24v6H18z"/></svg>',
    ),
  };
  const { order, files } = await carryOneOrder({ base, people, artwork, treatment: 'solid' });
  console.log(
    `order ${order.number} went from upload to handed over; ${files.length} files arrived with the passed hashes`,
  );
  await stop();
  const seconds = await start(60);
  console.log(`second start: ${seconds.toFixed(1)} s`);
  const admin = people.find((person) => person.role === 'admin');
  const client = new ApiClient(base);
  await client.signIn(admin.email, admin.password);
  const kept = (await client.get(`/api/orders/${order.number}`)).order;
  if (kept.state !== 'handed-over') throw new Error('the second start lost the order');
  if (seconds > 20) throw new Error(`the second start took ${seconds.toFixed(1)} s; it must take seconds`);
  await stop();
  console.log('npm start is proved');
} finally {
  if (running) process.kill(-running.pid, 'SIGKILL');
  rmSync(scratch, { recursive: true, force: true });
}
