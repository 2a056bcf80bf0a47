// Makes a fresh clone runnable. Node built-ins only: it runs before anything is installed.
//   --migrate     brings the database up to date and seeds the demo shop on an empty one
//   --build       builds when sources, packages or the public address changed
//   --test-tools  installs the Debian programs that the tests call
import { spawnSync } from 'node:child_process';
import { createHash, randomBytes } from 'node:crypto';
import { existsSync, mkdirSync, readdirSync, readFileSync, writeFileSync } from 'node:fs';
import path from 'node:path';
import { TEST_PACKAGES } from './test-tools.mjs';

const root = path.resolve(import.meta.dirname, '../..');
const at = (...parts) => path.join(root, ...parts);
const say = (line) => console.log(`umberline: ${line}`);
const stop = (line) => {
  console.error(`umberline: ${line}`);
  process.exit(1);
};

const [major, minor] = process.versions.node.split('.').map(Number);
if (major < 20 || (major === 20 && minor < 19) || major === 21 || (major === 22 && minor < 12)) {
  stop(`Node 20.19 or newer (or 22.12 or newer) is needed; this is ${process.version}.`);
}
if (process.platform === 'win32') stop('This runs on Debian or another Unix; start it inside one.');

function run(command, args, env = {}) {
  const result = spawnSync(command, args, {
    cwd: root,
    stdio: 'inherit',
    env: { ...process.env, ASTRO_TELEMETRY_DISABLED: '1', ...env },
  });
  return result.status === 0;
}

const has = (command) => spawnSync('sh', ['-c', `command -v ${command}`], { stdio: 'ignore' }).status === 0;

function digest(files) {
  const hash = createHash('sha256');
  for (const file of files)
    hash.update(path.relative(root, file)).update('\0').update(readFileSync(file)).update('\0');
  return hash;
}

function filesBelow(folder) {
  if (!existsSync(folder)) return [];
  return readdirSync(folder, { withFileTypes: true, recursive: true })
    .filter((entry) => entry.isFile())
    .map((entry) => path.join(entry.parentPath ?? entry.path, entry.name))
    .sort();
}

const readStamp = (file) => (existsSync(file) ? readFileSync(file, 'utf8').trim() : '');

function install() {
  const stampFile = at('node_modules/.umberline-lock');
  const stamp = digest([at('package-lock.json')])
    .update(process.versions.modules)
    .digest('hex');
  if (readStamp(stampFile) === stamp) return;
  say('installing packages (a few minutes the first time)');
  // Also in production: what only tests need stays, so that one clone can do both.
  if (!run('npm', ['ci', '--include=dev', '--no-audit', '--no-fund'])) {
    if (!has('c++') && !has('g++') && !has('clang++')) {
      stop(
        'The packages could not be installed. better-sqlite3 may have found no ready-made binary for this machine, and ' +
          'there is no C++ compiler here to build one. Install one (on Debian: apt-get install g++ make python3), then ' +
          'run the same command again.',
      );
    }
    stop(
      'The packages could not be installed; the reason stands above. Check the network and run the same command again.',
    );
  }
  writeFileSync(stampFile, stamp);
}

function developmentSecret() {
  if (process.env.SESSION_SECRET) return;
  // The prefix lets the server refuse it in production.
  const line = `SESSION_SECRET=development-${randomBytes(32).toString('base64url')}\n`;
  const own = existsSync(at('.env')) ? readFileSync(at('.env'), 'utf8').replace(/\n?$/, '\n') : '';
  writeFileSync(at('.env'), `${own}${line}`, { mode: 0o600 });
  say('wrote a development secret into .env (ignored by git)');
}

function build() {
  const sources = [
    ...filesBelow(at('src')),
    ...filesBelow(at('public')),
    ...['astro.config.mjs', 'tailwind.config.js', 'tsconfig.json', 'knexfile.mjs', 'package-lock.json'].map(
      (name) => at(name),
    ),
  ].filter((file) => existsSync(file));
  const stamp = digest(sources)
    .update(process.env.PUBLIC_ADDRESS ?? '')
    .update(process.version)
    .update(root)
    .digest('hex');
  const stampFile = at('dist/.umberline-build');
  if (readStamp(stampFile) === stamp) return;
  say('building');
  if (!run(process.execPath, [at('node_modules/astro/astro.js'), 'build']))
    stop('The build failed; the reason stands above.');
  mkdirSync(at('dist'), { recursive: true });
  writeFileSync(stampFile, stamp);
}

function testTools() {
  if (!has('dpkg-query')) {
    say('this is not Debian: reference programs that are absent are counted by name at the end');
    return;
  }
  const missing = TEST_PACKAGES.filter(
    (name) =>
      !spawnSync('dpkg-query', ['-W', '-f', '${Status}', name], { encoding: 'utf8' }).stdout?.includes(
        'install ok installed',
      ),
  );
  if (missing.length === 0) return;
  if (process.getuid?.() !== 0) {
    say(`not root, so these are not installed: ${missing.join(' ')}`);
    return;
  }
  say(`installing for the tests: ${missing.join(' ')}`);
  const env = { DEBIAN_FRONTEND: 'noninteractive' };
  if (!run('apt-get', ['update', '-qq'], env))
    say('the package lists could not be refreshed; trying with those at hand');
  const args = ['install', '-y', '-qq', '--no-install-recommends', ...missing];
  if (!run('apt-get', args, env)) {
    stop('The programs that the tests call could not be installed; the reason stands above.');
  }
}

// The public address is baked in when building, so the build must see what the server will be started with.
if (existsSync(at('.env'))) process.loadEnvFile(at('.env'));

const wants = (flag) => process.argv.includes(flag);
install();
developmentSecret();
if (wants('--test-tools')) testTools();
if (wants('--build')) build();
if (wants('--migrate') && !run(process.execPath, [at('src/tooling/migrate.mjs')])) {
  stop('The database could not be brought up to date; the reason stands above. Nothing was changed.');
}
