import '../setup/database';
import { readFileSync } from 'node:fs';
import { afterEach, describe, expect, it, vi } from 'vitest';
import { lstarOfLuminance } from '@/lib/imaging/cie-lightness';
import { linearOfHex, LUMINANCE_WEIGHTS } from '@/lib/imaging/srgb';
import { machineSchema, spotPresetSchema } from '@/lib/machines/machine';
import { passwordMatches } from '@/lib/server/auth/password';
import { database } from '@/lib/server/db';
import { allMachines } from '@/lib/server/tables/machines';
import { personByEmail } from '@/lib/server/tables/people';
import { readWash } from '@/lib/server/tables/shop-washes';
import { allStocks } from '@/lib/server/tables/stocks';
import { washSchema } from '@/lib/stock/wash';
import { stockSchema } from '@/lib/stock/stock';

const people = JSON.parse(readFileSync('db/seeds/demo-people.json', 'utf8')) as {
  role: string;
  email: string;
  password: string;
}[];

function lstarOfHex(colour: string): number {
  const [red, green, blue] = linearOfHex(colour);
  return lstarOfLuminance(
    red * LUMINANCE_WEIGHTS.red + green * LUMINANCE_WEIGHTS.green + blue * LUMINANCE_WEIGHTS.blue,
  );
}

afterEach(() => vi.unstubAllEnvs());

describe('the demo shop', () => {
  it('does not open in production', async () => {
    vi.stubEnv('NODE_ENV', 'production');
    await database().seed.run();
    expect(await database()('people')).toEqual([]);
  });

  it('opens once on an empty database', async () => {
    await database().seed.run();
    const count = (await database()('people')).length;
    expect(count).toBe(people.length);
    await database()('people').where({ email: people[0].email }).update({ name: 'Renamed' });
    await database().seed.run();
    expect(await database()('people')).toHaveLength(count);
    expect((await personByEmail(database(), people[0].email))?.name).toBe('Renamed');
  });

  it('has one person per role, each with the password that is printed at start', async () => {
    expect(people.map(({ role }) => role).sort()).toEqual(['admin', 'customer', 'designer', 'operator']);
    for (const { email, password, role } of people) {
      const row = await personByEmail(database(), email);
      expect(row).toMatchObject({ role, disabled_at: null });
      expect(row?.confirmed_at).not.toBeNull();
      expect(await passwordMatches(password, row?.password_hash ?? '')).toBe(true);
    }
  });

  it('has machines and spot presets that fit their schemas', async () => {
    const machines = await allMachines(database());
    expect(machines.length).toBeGreaterThanOrEqual(2);
    for (const machine of machines) {
      machineSchema.parse(machine);
      expect(machine.spotPresets.length).toBeGreaterThan(0);
      for (const preset of machine.spotPresets) spotPresetSchema.parse(preset);
    }
    expect(new Set(machines.flatMap((machine) => machine.spotPresets.map(({ shape }) => shape)))).toEqual(
      new Set(['rectangle', 'ellipse']),
    );
  });

  it('has stocks whose colours have the lightness that is written beside them', async () => {
    const stocks = await allStocks(database());
    expect(stocks.map(({ direction }) => direction)).toContain('lightens');
    expect(stocks.filter(({ forbidden }) => forbidden).map(({ cautions }) => cautions)).toEqual([
      ['chlorinated'],
    ]);
    for (const stock of stocks) {
      stockSchema.parse(stock);
      expect(lstarOfHex(stock.groundColour)).toBeCloseTo(stock.groundLstar, 1);
      expect(lstarOfHex(stock.markColour)).toBeCloseTo(stock.markLstar, 1);
      expect(stock.markLstar > stock.groundLstar, stock.name).toBe(stock.direction === 'lightens');
    }
  });

  it('offers the wash only because its own wash has a sheet', async () => {
    washSchema.parse(await readWash(database()));
    const offering = (await allStocks(database())).filter(({ routes }) => routes.includes('darkening-wash'));
    expect(offering.length).toBeGreaterThan(0);
    expect(offering.every(({ forbidden }) => !forbidden)).toBe(true);
  });
});
