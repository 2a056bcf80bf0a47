import { mkdirSync } from 'node:fs';
import path from 'node:path';

// process.cwd(), not import.meta.url: the build inlines this file into dist.
const root = process.cwd();
const dataDir = path.resolve(root, process.env.DATA_DIR ?? 'data');
const filename = process.env.DATABASE_FILE ?? path.join(dataDir, 'umberline.sqlite');
if (filename !== ':memory:') mkdirSync(path.dirname(filename), { recursive: true });

/** @type {import('knex').Knex.Config} */
const config = {
  client: 'better-sqlite3',
  connection: { filename },
  useNullAsDefault: true,
  pool: {
    min: 1,
    max: 1,
    afterCreate(connection, done) {
      connection.pragma('journal_mode = WAL');
      connection.pragma('synchronous = FULL');
      connection.pragma('foreign_keys = ON');
      connection.pragma('busy_timeout = 5000');
      connection.pragma('journal_size_limit = 67108864');
      done(null, connection);
    },
  },
  migrations: { directory: path.join(root, 'db/migrations'), loadExtensions: ['.mjs'] },
  seeds: { directory: path.join(root, 'db/seeds'), loadExtensions: ['.mjs'] },
};
export default config;
