import { scryptSync } from 'node:crypto';
import { describe, expect, it, vi } from 'vitest';
import * as settings from '@/lib/server/config';
import { hashPassword, needsNewHash, passwordMatches, pretendToCheck } from '@/lib/server/auth/password';

const CHEAP = { ln: 4, r: 8, p: 1 };
const median = (values: number[]): number => values.sort((a, b) => a - b)[Math.floor(values.length / 2)];
async function milliseconds(work: () => Promise<unknown>): Promise<number> {
  const times: number[] = [];
  for (let run = 0; run < 7; run += 1) {
    const began = performance.now();
    await work();
    times.push(performance.now() - began);
  }
  return median(times);
}

describe('hashPassword', () => {
  it('keeps scheme, cost, salt and key, and never twice the same', async () => {
    const [one, two] = await Promise.all([
      hashPassword('rye-and-ember', CHEAP),
      hashPassword('rye-and-ember', CHEAP),
    ]);
    expect(one).toMatch(/^scrypt\$4\$8\$1\$[\w-]{22}\$[\w-]{43}$/);
    expect(one).not.toBe(two);
    expect(one).not.toContain('rye');
  });

  it('is scrypt as another caller computes it', async () => {
    const [, , , , salt, key] = (await hashPassword('rye-and-ember', CHEAP)).split('$');
    expect(
      scryptSync('rye-and-ember', Buffer.from(salt, 'base64url'), 32, { N: 16, r: 8, p: 1 }).toString(
        'base64url',
      ),
    ).toBe(key);
  });

  it('costs 32 MiB and three rounds unless set higher', async () => {
    const [, ln, r, p] = (await hashPassword('rye-and-ember')).split('$').map(Number);
    expect(ln).toBe(settings.readConfig({}).passwordCost);
    expect(128 * 2 ** ln * r).toBe(32 * 1024 * 1024);
    expect(p).toBe(3);
  });
});

describe('passwordMatches', () => {
  it('knows the right one and no other', async () => {
    const stored = await hashPassword('rye-and-ember', CHEAP);
    expect(await passwordMatches('rye-and-ember', stored)).toBe(true);
    for (const wrong of ['', 'Rye-and-ember', 'rye-and-ember ', 'rye-and-embe', 'ember-and-rye'])
      expect(await passwordMatches(wrong, stored)).toBe(false);
  });

  it('reads the cost that is stored, not today’s', async () => {
    expect(await passwordMatches('rye', await hashPassword('rye', { ln: 6, r: 4, p: 2 }))).toBe(true);
  });

  it('takes the same letters however they were typed', async () => {
    const stored = await hashPassword('r\u00f6stbrot', CHEAP);
    expect(await passwordMatches('ro\u0308stbrot', stored)).toBe(true);
  });

  it.each([
    '',
    'plain',
    'scrypt$4$8$1$salt',
    'scrypt$40$8$1$c2FsdA$a2V5',
    'scrypt$x$8$1$c2FsdA$a2V5',
    'bcrypt$4$8$1$c2FsdA$a2V5',
  ])('refuses what is no hash: %s', async (stored) => {
    await expect(passwordMatches('rye', stored)).rejects.toThrow('expected a stored scrypt hash');
  });
});

describe('needsNewHash', () => {
  it('is so when the cost is another than today’s', async () => {
    expect(needsNewHash(await hashPassword('rye', CHEAP))).toBe(true);
    expect(needsNewHash(await hashPassword('rye'))).toBe(false);
  });
});

describe('pretendToCheck', () => {
  it('never matches and takes about as long as a real check', async () => {
    vi.spyOn(settings, 'config').mockReturnValue({ ...settings.readConfig({}), passwordCost: 12 });
    const stored = await hashPassword('rye-and-ember');
    await pretendToCheck('warm');
    const real = await milliseconds(() => passwordMatches('wrong', stored));
    const pretended = await milliseconds(() => pretendToCheck('wrong'));
    expect(await pretendToCheck('rye-and-ember')).toBe(false);
    expect(pretended / real).toBeGreaterThan(0.3);
    expect(pretended / real).toBeLessThan(3);
    vi.restoreAllMocks();
  });
});
