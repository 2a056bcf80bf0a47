// Serves the built site: checks what production asks for, waits until it answers, stops cleanly.
import { existsSync, readFileSync } from 'node:fs';
import path from 'node:path';

const root = path.resolve(import.meta.dirname, '../..');
process.chdir(root);
if (existsSync('.env')) process.loadEnvFile('.env');

const refuse = (line) => {
  console.error(`umberline: ${line}`);
  process.exit(1);
};

const production = process.env.NODE_ENV === 'production';
const publicAddress = process.env.PUBLIC_ADDRESS ?? '';
if (production) {
  if (!publicAddress)
    refuse('In production PUBLIC_ADDRESS must say where the site is reached, such as https://shop.example.');
  const secret = process.env.SESSION_SECRET ?? '';
  if (secret === '' || secret.startsWith('development-')) {
    refuse(
      'In production SESSION_SECRET must be your own, not the generated one. Set it to 32 or more random characters.',
    );
  }
  if (secret.length < 32) refuse(`SESSION_SECRET has ${secret.length} characters; 32 or more are needed.`);
  if (!process.env.SMTP_URL || !process.env.MAIL_FROM) {
    refuse(
      'In production SMTP_URL and MAIL_FROM must name the mail server and the address that mails come from.',
    );
  }
}

process.env.ASTRO_NODE_AUTOSTART = 'disabled';
process.env.ASTRO_TELEMETRY_DISABLED = '1';
process.env.PORT ||= '4380';
process.env.HOST ||= production ? '0.0.0.0' : '127.0.0.1';

const started = performance.now();
const { startServer } = await import(new URL('../../dist/server/entry.mjs', import.meta.url).href);
const originalLog = console.log;
// The adapter announces itself on its own; the lines below say the same in ours.
console.log = (...words) =>
  String(words[0]).includes('[@astrojs/node]') ? undefined : originalLog(...words);
const { server } = startServer();
const http = server.server;
// Node's five minutes would cut slow uploads of large artwork.
http.requestTimeout = 30 * 60_000;
http.headersTimeout = 30_000;
http.on('error', (error) => {
  if (error.code === 'EADDRINUSE') {
    refuse(
      `Port ${process.env.PORT} is taken by another program. Stop it, or start with another: PORT=4381 npm start`,
    );
  }
  refuse(error.message);
});

let stopping = false;
for (const signal of ['SIGTERM', 'SIGINT']) {
  process.on(signal, () => {
    if (stopping) process.exit(1);
    stopping = true;
    const overdue = setTimeout(() => process.exit(0), 10_000);
    overdue.unref();
    // The queue registers this when it starts: it lets go of its tasks, so that the next start takes them up at once.
    const stopQueue = globalThis[Symbol.for('umberline.stop')];
    http.closeIdleConnections();
    // Answers under way are finished; event streams would never end by themselves.
    setTimeout(() => http.closeAllConnections(), 3_000).unref();
    Promise.all([new Promise((done) => http.close(done)), stopQueue?.()]).finally(() => process.exit(0));
  });
}

const address = `http://${process.env.HOST === '0.0.0.0' ? 'localhost' : process.env.HOST.replace('127.0.0.1', 'localhost')}:${process.env.PORT}`;

/** Waits for the site's own word that it is well; a refusal is said once, with its reason in the log above it. */
async function waitUntilHealthy() {
  const probe = `http://127.0.0.1:${process.env.PORT}/health`;
  let problem = '';
  for (let attempt = 0; attempt < 20; attempt += 1) {
    try {
      const response = await fetch(probe);
      const text = await response.text();
      if (response.ok && JSON.parse(text).ok) return;
      problem = `it answers ${response.status}: ${text.slice(0, 300)}`;
    } catch (error) {
      problem = error.message;
    }
    await new Promise((done) => setTimeout(done, 250));
  }
  refuse(`The site does not come up well: ${problem}`);
}

await waitUntilHealthy();
console.log = originalLog;
console.log(
  `\nUmberline serves at ${production ? publicAddress : address} (ready in ${((performance.now() - started) / 1000).toFixed(1)} s)`,
);
if (!production) {
  const demo = path.join(root, 'db/seeds/demo-people.json');
  if (existsSync(demo)) {
    console.log('\nSign in as:');
    for (const person of JSON.parse(readFileSync(demo, 'utf8'))) {
      console.log(`  ${person.role.padEnd(9)} ${person.email.padEnd(34)} ${person.password}`);
    }
    console.log(`\nMails that would be sent are shown at ${address}/outbox`);
  }
}
