import { randomBytes, scryptSync } from 'node:crypto';
import { readFileSync } from 'node:fs';

const read = (name) => JSON.parse(readFileSync(new URL(name, import.meta.url), 'utf8'));

/** In the form that the server keeps: scheme, cost, salt, key. */
function hash(password) {
  const salt = randomBytes(16);
  const key = scryptSync(password.normalize('NFKC'), salt, 32, {
    N: 2 ** 15,
    r: 8,
    p: 3,
    maxmem: 256 * 2 ** 15 * 8,
  });
  return ['scrypt', 15, 8, 3, salt.toString('base64url'), key.toString('base64url')].join('$');
}

/**
 * The demo shop, once: people, machines, stocks and its wash, on an empty database and never in production.
 * @param {import('knex').Knex} knex
 */
export async function seed(knex) {
  if (process.env.NODE_ENV === 'production') return;
  const at = new Date().toISOString();
  await knex.transaction(async (trx) => {
    if (await trx('people').first('id')) return;
    for (const { password, ...person } of read('demo-people.json')) {
      await trx('people').insert({
        ...person,
        password_hash: hash(password),
        confirmed_at: at,
        created_at: at,
      });
    }
    for (const { presets, power_curve, ...machine } of read('demo-machines.json')) {
      const [machine_id] = await trx('machines').insert({
        ...machine,
        power_curve: JSON.stringify(power_curve),
      });
      await trx('spot_presets').insert(presets.map((preset) => ({ machine_id, ...preset })));
    }
    for (const { cautions, routes, forbidden = false, ...stock } of read('demo-stocks.json')) {
      await trx('stocks').insert({
        ...stock,
        cautions: JSON.stringify(cautions),
        routes: JSON.stringify(routes),
        forbidden: forbidden ? 1 : 0,
      });
    }
    await trx('shop_washes').insert({
      id: 1,
      product: 'The shop’s own borate wash',
      ratio: '1 part to 10 parts warm water by volume',
      drying_minutes: 35,
      sheet_url: 'https://quillfold.example/sheets/borate-wash.pdf',
      changed_at: at,
    });
    await trx('record').insert({
      at,
      person_id: null,
      by: 'Umberline',
      event: 'open-demo-shop',
      subject: 'shop',
      words: 'people, machines and stocks of the demo shop',
    });
  });
}
