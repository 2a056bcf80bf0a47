import { describe, expect, it } from 'vitest';
import { dayWords, dueWords, durationWords, momentWords } from '../../src/components/time-words';

describe('durationWords', () => {
  it.each([
    [0.4, '0 s'],
    [59.4, '59 s'],
    [60, '1 min'],
    [262, '4 min 22 s'],
    [754, '13 min'],
    [3590, '1 h'],
    [4980, '1 h 23 min'],
    [86_400, '24 h'],
  ])('%f s: %s', (seconds, words) => expect(durationWords(seconds)).toBe(words));
});

describe('dates', () => {
  it('are the same wherever they are read', () => {
    expect(dayWords('2026-12-04')).toBe('4 Dec 2026');
    expect(momentWords('2026-12-04T23:59:10.000Z')).toBe('4 Dec 2026, 23:59 UTC');
  });
  it.each([
    ['2026-12-01', 'due today'],
    ['2026-12-02', 'due tomorrow'],
    ['2026-12-31', 'in 30 days'],
    ['2026-11-30', '1 day late'],
    ['2026-11-20', '11 days late'],
    [null, 'no date'],
  ])('due %s on 1 December: %s', (due, words) =>
    expect(dueWords(due, '2026-12-01T23:30:00.000Z')).toBe(words),
  );
});
