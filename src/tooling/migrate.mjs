// Brings the database up to date, and fills an empty one with the demo shop (never in production).
import { existsSync } from 'node:fs';
import path from 'node:path';
import knex from 'knex';

if (existsSync('.env')) process.loadEnvFile('.env');
const { default: config } = await import('../../knexfile.mjs');
const db = knex(config);
try {
  const [batch, applied] = await db.migrate.latest();
  for (const file of applied) console.log(`umberline: migration ${batch}: ${path.basename(file)}`);
  const production = process.env.NODE_ENV === 'production';
  const people = await db('people').count({ count: '*' }).first();
  if (!production && Number(people?.count) === 0) {
    console.log('umberline: seeding the demo shop');
    await db.seed.run();
  }
} catch (error) {
  console.error(`umberline: ${error.message}`);
  process.exitCode = 1;
} finally {
  await db.destroy();
}
