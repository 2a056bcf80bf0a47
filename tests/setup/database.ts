import {
  copyFileSync,
  existsSync,
  mkdirSync,
  mkdtempSync,
  readdirSync,
  readFileSync,
  renameSync,
  rmSync,
} from 'node:fs';
import { createHash } from 'node:crypto';
import { tmpdir } from 'node:os';
import path from 'node:path';
import { afterAll } from 'vitest';

// Set before anything reads the settings: config() and database() read them on first use.
export const dataDir = mkdtempSync(path.join(tmpdir(), 'umberline-data-'));
process.env.DATA_DIR = dataDir;
delete process.env.DATABASE_FILE;
// What a password costs is tested by itself; elsewhere it would only make people wait.
process.env.PASSWORD_COST = '8';

const { openDatabase, closeDatabase } = await import('@/lib/server/db');
const { config } = await import('@/lib/server/config');
if (config().dataDir !== dataDir)
  throw new Error('import tests/setup/database before anything of src/lib/server');

function templateName(): string {
  const folder = path.resolve('db/migrations');
  const hash = createHash('sha256');
  for (const name of readdirSync(folder).sort())
    hash.update(name).update(readFileSync(path.join(folder, name)));
  return path.join(
    tmpdir(),
    `umberline-template-${process.getuid?.() ?? 0}`,
    `${hash.digest('hex').slice(0, 16)}.sqlite`,
  );
}

/** Every test file works on its own copy of one migrated database, made anew when a migration changes. */
async function copyOfTemplate(): Promise<void> {
  const template = templateName();
  if (!existsSync(template)) {
    mkdirSync(path.dirname(template), { recursive: true });
    const draft = `${template}.${process.pid}`;
    const db = openDatabase(draft);
    await db.migrate.latest();
    await db.raw('pragma wal_checkpoint(truncate)');
    await db.destroy();
    renameSync(draft, template);
  }
  copyFileSync(template, path.join(dataDir, 'umberline.sqlite'));
}

await copyOfTemplate();

afterAll(async () => {
  await closeDatabase();
  rmSync(dataDir, { recursive: true, force: true });
});
