// Starts the built site on a free port with a data folder of its own; for browser tests and the proof of `npm start`.
import { spawn, spawnSync } from 'node:child_process';
import { randomBytes } from 'node:crypto';
import { mkdtempSync, rmSync } from 'node:fs';
import { createServer } from 'node:net';
import { tmpdir } from 'node:os';
import path from 'node:path';

export async function freePort() {
  const probe = createServer();
  await new Promise((done) => probe.listen(0, '127.0.0.1', done));
  const { port } = probe.address();
  await new Promise((done) => probe.close(done));
  return port;
}

/** Waits for a line of a program's output; fails with all that it said when it ends or takes too long. */
export function waitForLine(child, pattern, seconds) {
  return new Promise((resolve, reject) => {
    let said = '';
    const finish = (settle, value) => {
      clearTimeout(timer);
      settle(value);
    };
    const timer = setTimeout(
      () => finish(reject, new Error(`no ${pattern} within ${seconds} s:\n${said}`)),
      seconds * 1000,
    );
    const read = (chunk) => {
      said += chunk;
      const found = pattern.exec(said);
      if (found) finish(resolve, found);
    };
    child.stdout.on('data', read);
    child.stderr.on('data', read);
    child.on('exit', (code) => finish(reject, new Error(`ended with ${code} before it served:\n${said}`)));
  });
}

export async function serve(env = {}) {
  const root = path.resolve(import.meta.dirname, '../..');
  const dataDir = env.DATA_DIR ?? mkdtempSync(path.join(tmpdir(), 'umberline-data-'));
  const port = await freePort();
  const childEnv = {
    ...process.env,
    NODE_ENV: 'development',
    // The demo shop's own orders would stand in the queue before those of a test.
    DEMO_ORDERS: 'no',
    SESSION_SECRET: `development-${randomBytes(32).toString('base64url')}`,
    ...env,
    PORT: String(port),
    DATA_DIR: dataDir,
  };
  const migrated = spawnSync(process.execPath, ['src/tooling/migrate.mjs'], {
    cwd: root,
    env: childEnv,
    encoding: 'utf8',
  });
  if (migrated.status !== 0) throw new Error(`the database could not be made: ${migrated.stderr}`);
  const child = spawn(process.execPath, ['src/tooling/start.mjs'], {
    cwd: root,
    env: childEnv,
    stdio: ['ignore', 'pipe', 'pipe'],
  });
  await waitForLine(child, /serves at \S+/, 60);
  return {
    base: `http://localhost:${port}`,
    dataDir,
    pid: child.pid,
    async stop({ keepData = false } = {}) {
      const ended = new Promise((done) => child.once('exit', done));
      child.kill('SIGTERM');
      await ended;
      if (!keepData && !env.DATA_DIR) rmSync(dataDir, { recursive: true, force: true });
    },
  };
}
