import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import type { Design } from '../../../src/lib/orders/views';
import {
  angleWords,
  changedChoices,
  CHOICES,
  instructionParts,
  instructionSentence,
  pitchConsequence,
  putBack,
  speedWords,
  spotWords,
} from '../../../src/lib/orders/sentence';

const design: Design = {
  machineId: 1,
  spotPresetId: 2,
  treatment: 'halftone',
  screen: 'published:floyd-steinberg-1976',
  scan: { directionDeg: 0, linePitchMm: 0.11, alongPitchMm: 0.11 },
  perpendicular: null,
  tone: { mode: 'absolute', blackPoint: 0, whitePoint: 1, gamma: 1 },
  dividingLstar: 53.4,
  corners: 'kept',
  mirror: false,
  recipe: { powerPercent: 42, speedMmPerS: 320, perpendicular: null, focusOffsetMm: 0 },
};
const context = {
  machineName: 'Heron',
  spot: { widthMm: 0.07, heightMm: 0.11, shape: 'ellipse' as const },
  stockName: 'birch plywood 4 mm',
  speedUnit: 'mm/s' as const,
};

describe('instructionSentence', () => {
  it('says a halftone in one sentence', () => {
    expect(instructionSentence(design, context)).toBe(
      'Screen as halftone with Floyd–Steinberg 1976, lines 0.110 mm apart, scanning at 0°, one pass, tone absolute, not mirrored. Run on Heron with the 0.07 × 0.11 mm spot, on birch plywood 4 mm, at 42 % power, 320 mm/s, in focus.',
    );
  });
  it('names the perpendicular pass with its own pitch, power and speed', () => {
    const two: Design = {
      ...design,
      treatment: 'solid',
      perpendicular: { linePitchMm: 0.07, alongPitchMm: 0.07 },
      recipe: {
        powerPercent: 30,
        speedMmPerS: 400,
        perpendicular: { powerPercent: 25, speedMmPerS: 450 },
        focusOffsetMm: 1.5,
      },
    };
    expect(instructionSentence(two, { ...context, stockName: null })).toBe(
      'Fill as solid, parted at L* 53.4, lines 0.110 mm apart, scanning at 0°, two passes, the second perpendicular at 0.070 mm, not mirrored. Run on Heron with the 0.07 × 0.11 mm spot at 30 % power, 400 mm/s, then 25 %, 450 mm/s, 1.5 mm above focus.',
    );
  });
  it('follows linework without scan lines and says that no recipe was typed', () => {
    expect(
      instructionSentence({ ...design, treatment: 'linework', recipe: null, mirror: true }, context),
    ).toBe(
      'Follow as linework, parted at L* 53.4, corners kept, mirrored. Run on Heron with the 0.07 × 0.11 mm spot, on birch plywood 4 mm, at power and speed not yet typed.',
    );
  });
  it('offers the screen for halftone alone', () => {
    const choices = (treatment: Design['treatment']) =>
      instructionParts({ ...design, treatment }, context).flatMap((p) => (p.choice ? [p.choice] : []));
    expect(choices('halftone')).toContain('screen');
    expect(choices('continuous')).not.toContain('screen');
    expect(choices('linework')).toEqual([
      'treatment',
      'dividing-level',
      'corners',
      'mirror',
      'machine',
      'recipe',
    ]);
  });
});

describe('words of figures', () => {
  it('writes speeds in the machine’s own unit', () => {
    expect(speedWords(320, 'mm/s')).toBe('320 mm/s');
    expect(speedWords(320, 'mm/min')).toBe('19,200 mm/min');
    expect(speedWords(1.25, 'mm/s')).toBe('1.25 mm/s');
  });
  it('writes spots with at least two decimals and angles with a true minus', () => {
    expect(spotWords({ widthMm: 0.1, heightMm: 0.085 })).toBe('0.10 × 0.085 mm');
    expect(angleWords(-45)).toBe('−45°');
    expect(angleWords(22.5)).toBe('22.5°');
  });
});

describe('pitchConsequence', () => {
  const spot = { widthMm: 0.07, heightMm: 0.11, shape: 'ellipse' as const };
  it('says whether lines overlap, touch or part', () => {
    expect(pitchConsequence(spot, 0, 0.09)).toMatchObject({
      sizeAcrossMm: 0.11,
      words: 'lines overlap by 0.020 mm',
    });
    expect(pitchConsequence(spot, 0, 0.11).words).toBe('lines touch');
    expect(pitchConsequence(spot, 90, 0.09).words).toBe('lines part by 0.020 mm');
  });
});

describe('changedChoices and putBack', () => {
  const changed = fc.record({
    treatment: fc.constantFrom('linework', 'solid', 'halftone', 'continuous' as const),
    screen: fc.constantFrom('even-grain' as const, 'published:stucki-1981' as const),
    dividingLstar: fc.integer({ min: 1, max: 99 }),
    corners: fc.constantFrom('kept' as const, 'eased' as const),
    mirror: fc.boolean(),
    spotPresetId: fc.integer({ min: 2, max: 4 }),
    scan: fc.record({
      directionDeg: fc.constantFrom(0, 45, 90),
      linePitchMm: fc.constantFrom(0.09, 0.11),
      alongPitchMm: fc.constantFrom(0.09, 0.11),
    }),
    perpendicular: fc.constantFrom(null, { linePitchMm: 0.07, alongPitchMm: 0.07 }),
    tone: fc.record({
      mode: fc.constantFrom('absolute' as const, 'scaled' as const),
      blackPoint: fc.constant(0),
      whitePoint: fc.constant(1),
      gamma: fc.constantFrom(1, 1.4),
    }),
    recipe: fc.constantFrom(null, design.recipe),
  });
  it('putting every changed choice back gives the choices as they were', () => {
    fc.assert(
      fc.property(changed, (fields) => {
        let after: Design = { ...design, ...fields } as Design;
        for (const choice of changedChoices(design, after, context)) after = putBack(choice, design, after);
        expect(changedChoices(design, after, context)).toEqual([]);
        expect(after).toEqual(design);
      }),
    );
  });
  it('putting one back leaves the others as they are', () => {
    const after: Design = {
      ...design,
      mirror: true,
      scan: { directionDeg: 90, linePitchMm: 0.07, alongPitchMm: 0.07 },
    };
    expect(changedChoices(design, after, context)).toEqual(['line-pitch', 'direction', 'mirror']);
    const back = putBack('line-pitch', design, after);
    expect(back.scan).toEqual({ directionDeg: 90, linePitchMm: 0.11, alongPitchMm: 0.11 });
    expect(back.mirror).toBe(true);
  });
  it('covers every choice', () => {
    for (const choice of CHOICES) expect(putBack(choice, design, design)).toEqual(design);
  });
});
