import { describe, expect, test } from 'vitest';
import { stopwatch } from '../../src/lib/prepare/stopwatch';

describe('stopwatch', () => {
  const ticking = () => {
    let now = 0;
    return stopwatch(() => (now += 10));
  };

  test('adds up by name and gives back what the work gives', async () => {
    const watch = ticking();
    expect(watch.timeNow('tone', () => 7)).toBe(7);
    expect(await watch.time('tone', async () => 8)).toBe(8);
    watch.timeNow('screen', () => null);
    expect(watch.milliseconds).toEqual({ tone: 20, screen: 10 });
  });

  test('times work that fails, and lets it fail', async () => {
    const watch = ticking();
    const fail = (): never => {
      throw new Error('no');
    };
    expect(() => watch.timeNow('tone', fail)).toThrow('no');
    await expect(watch.time('tone', async () => fail())).rejects.toThrow('no');
    expect(watch.milliseconds).toEqual({ tone: 20 });
  });
});
