import { describe, expect, test } from 'vitest';
import { CHECKS, judge } from '../../src/lib/preflight/checks';
import type { Facts } from '../../src/lib/preflight/facts';
import { FINDING_IDS, findingSchema, type Finding, type FindingId } from '../../src/lib/preflight/finding';
import type { Limits } from '../../src/lib/preflight/limits';
import { limits, soundFacts, widths } from './facts';

const find = (id: FindingId, facts: Partial<Facts>, other: Partial<Limits> = {}): Finding | undefined =>
  judge({ ...soundFacts, ...facts }, { ...limits, ...other }).find((finding) => finding.id === id);
const tone = (change: Partial<Facts['tone']>): Partial<Facts> => ({
  tone: { ...soundFacts.tone, ...change },
});
const placed = (change: Partial<Facts['placement']>): Partial<Facts> => ({
  placement: { ...soundFacts.placement, ...change },
});

describe('the list of checks', () => {
  test('has every permanent id once', () => {
    expect(CHECKS.map(({ id }) => id).sort()).toEqual([...FINDING_IDS].sort());
  });

  test('is silent on sound artwork, whatever the treatment', () => {
    for (const treatment of ['linework', 'solid', 'halftone', 'continuous'] as const) {
      expect(judge(soundFacts, { ...limits, treatment })).toEqual([]);
    }
  });

  test('puts blockers first, then warnings, then notes', () => {
    const found = judge(
      {
        ...soundFacts,
        severalFrames: true,
        specks: { ...soundFacts.specks, count: 2 },
        hairlines: widths(0.03),
      },
      limits,
    );
    expect(found.map(({ severity }) => severity)).toEqual(['blocker', 'warning', 'note']);
    for (const finding of found) expect(() => findingSchema.parse(finding)).not.toThrow();
  });

  test('changes nothing in the facts', () => {
    const before = structuredClone({ ...soundFacts, hairlines: widths(0.03, 0.08) });
    const facts = structuredClone(before);
    judge(facts, limits);
    expect(facts).toEqual(before);
  });
});

describe.each([
  ['hairline', 'hairlines'],
  ['fill-in', 'fillIns'],
] as const)('%s', (id, key) => {
  test.each([
    [0.09, 'warning'],
    [0.05, 'warning'],
    [0.0499, 'blocker'],
    [0.01, 'blocker'],
  ])('%s mm of 0.1 is a %s', (width, severity) => {
    expect(find(id, { [key]: widths(width) })?.severity).toBe(severity);
  });

  test('advises the smallest sound width where it was found', () => {
    expect(find(id, { [key]: widths(0.06) }, { smallestSoundWidthMm: 137 })?.advice).toContain(
      'about 137 mm wide',
    );
  });

  test('gives smallest width, limit, count and places', () => {
    const found = find(id, { [key]: widths(0.06, 0.08) });
    expect(found).toMatchObject({ count: 2, minMm: 0.06, limitMm: 0.1, waivable: true });
    expect(found?.places[0]).toEqual({ xMm: 10, yMm: 20, widthMm: 5, heightMm: 0.2, minMm: 0.06 });
  });

  test('says by how much, and both ways out', () => {
    const advice = find(id, { [key]: widths(0.06, 0.08) })?.advice ?? '';
    expect(advice).toContain('0.04 mm');
    // 60 mm × 0.98 ÷ 0.6
    expect(advice).toContain('98 mm wide');
    expect(advice).toContain('to 0.1 mm');
  });

  test('one place below half its own extent blocks, though another is thinner', () => {
    const places = [
      { ...widths(0.06).places[0], limitMm: 0.07 },
      { ...widths(0.065).places[0], limitMm: 0.14 },
    ];
    const found = find(id, { [key]: { count: 2, places, worstRatio: 0.065 / 0.14 } });
    expect(found).toMatchObject({ severity: 'blocker', minMm: 0.06, limitMm: 0.07 });
  });
});

test.each([
  ['speck', 'specks'],
  ['pinhole', 'pinholes'],
] as const)('%s is a warning with its smallest diameter', (id, key) => {
  const place = { xMm: 1, yMm: 2, widthMm: 0.05, heightMm: 0.05, minMm: 0.05 };
  const found = find(id, { [key]: { count: 3, places: [place], limitMm: 0.1 } });
  expect(found).toMatchObject({ severity: 'warning', count: 3, minMm: 0.05, limitMm: 0.1, waivable: true });
});

describe('empty', () => {
  const blank = tone({ burnedShare: 0, meanCoverage: 0 });

  test('a blank picture blocks under every treatment', () => {
    for (const treatment of ['solid', 'linework', 'halftone', 'continuous'] as const) {
      expect(find('empty', blank, { treatment })?.severity).toBe('blocker');
    }
  });

  test('pale greys are nothing when burned solid, and something as a halftone', () => {
    const pale = tone({ burnedShare: 0, meanCoverage: 0.2, darkLstar: 70 });
    expect(find('empty', pale)?.advice).toContain('too light');
    expect(find('empty', pale, { treatment: 'halftone' })).toBeUndefined();
  });
});

describe('outside', () => {
  const beyond = { leftMm: 0, rightMm: 0, topMm: 0, bottomMm: 0 };

  test.each<[string, Partial<Facts['placement']>, string]>([
    [
      'the blank on two sides',
      { beyondBlank: { ...beyond, leftMm: 2, bottomMm: 0.5 } },
      '2 mm on the left and 0.5 mm on the bottom',
    ],
    ['a round blank', { beyondRoundMm: 1.25, beyondBlank: beyond }, '1.25 mm beyond the round edge'],
    ['the bed', { beyondBed: { xMm: 30, yMm: 0 } }, '30 mm in width'],
    ['the bed with its run-off', { beyondBed: { xMm: 4, yMm: 0 }, runOffMm: 15 }, '15 mm of run-off'],
  ])('%s: blocks and cannot be waived', (_name, change, words) => {
    const found = find('outside', placed(change));
    expect(found).toMatchObject({ severity: 'blocker', waivable: false });
    expect(found?.advice).toContain(words);
  });

  test('touching an edge is inside', () => {
    expect(find('outside', placed({ beyondBlank: { ...beyond, leftMm: 0.004 } }))).toBeUndefined();
    expect(find('outside', placed({ beyondBlank: beyond, beyondBed: { xMm: 0, yMm: 0 } }))).toBeUndefined();
  });

  test('a round blank is judged by what is burned, not by the corners of the picture', () => {
    expect(
      find('outside', placed({ beyondRoundMm: 0, beyondBlank: { ...beyond, leftMm: 3 } })),
    ).toBeUndefined();
  });
});

describe('resolution', () => {
  const source = (pxPerMm: number, count = 0): Partial<Facts> => ({
    source: { pxPerMm, unresolved: { count, places: [] } },
  });

  test.each([
    [10, undefined],
    [6, 'note'],
    [2, 'warning'],
  ])('%s px/mm of drawn artwork at a pitch of 0.1 mm: %s', (pxPerMm, severity) => {
    expect(find('resolution', source(pxPerMm))?.severity).toBe(severity);
  });

  test('a photograph needs fewer', () => {
    const other = { treatment: 'halftone', photograph: true } as const;
    expect(find('resolution', source(5), other)).toBeUndefined();
    expect(find('resolution', source(3), other)?.severity).toBe('note');
  });

  test('lines that the pixels do not resolve are a warning, whatever their number', () => {
    expect(find('resolution', source(20, 4))).toMatchObject({
      severity: 'warning',
      count: 4,
      limitMm: 1.5 / 20,
    });
  });

  test('a drawing has no pixels to count', () => {
    expect(
      find('resolution', { source: { pxPerMm: null, unresolved: { count: 0, places: [] } } }),
    ).toBeUndefined();
  });
});

describe('tones', () => {
  const photograph = { treatment: 'halftone', photograph: true } as const;

  test('a flat photograph is a warning, a drawing of two greys is not', () => {
    const flat = tone({ darkLstar: 40, lightLstar: 70 });
    expect(find('tonal-range', flat, photograph)).toMatchObject({
      severity: 'warning',
      measured: { value: 30, unit: 'L*' },
    });
    expect(find('tonal-range', flat)).toBeUndefined();
    expect(find('tonal-range', tone({ darkLstar: 10, lightLstar: 90 }), photograph)).toBeUndefined();
  });

  test.each([
    [97, 0.9, 'halftone', 'warning'],
    [97, 0.9, 'solid', 'note'],
    [99.5, 0.9, 'halftone', undefined],
    [97, 0.3, 'halftone', undefined],
    [60, 0.9, 'halftone', undefined],
  ] as const)('a border of L* %s over %s of it, %s: %s', (borderLstar, borderShare, treatment, severity) => {
    expect(find('background', tone({ borderLstar, borderShare }), { treatment })?.severity).toBe(severity);
  });
});

test('fonts, parts left out and further frames are said by name', () => {
  expect(find('missing-font', { missingFonts: ['Alder', 'Birch'] })?.advice).toContain('Alder and Birch');
  expect(find('unsafe-content', { removed: ['a script'] })).toMatchObject({ severity: 'note', count: 1 });
  expect(find('first-frame', { severalFrames: true })?.severity).toBe('note');
  expect(find('sharp-tip', { sharpTips: { count: 2, places: [] } })).toMatchObject({
    severity: 'note',
    count: 2,
  });
});
