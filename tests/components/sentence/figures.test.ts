import { describe, expect, it } from 'vitest';
import { designOf, figuresOf, figuresSchema } from '../../../src/components/sentence/figures';
import { completeRecipe, draftOf } from '../../../src/components/sentence/recipe-draft';
import type { Design } from '../../../src/lib/orders/views';
import { design } from '../order-fixtures';

const two: Design = {
  ...design,
  perpendicular: { linePitchMm: 0.07, alongPitchMm: 0.09 },
  recipe: {
    powerPercent: 30,
    speedMmPerS: 400,
    perpendicular: { powerPercent: 25, speedMmPerS: 450 },
    focusOffsetMm: 1.5,
  },
};

describe('figures', () => {
  it.each([design, two, { ...design, recipe: null }])('go to the form and back unchanged', (choices) => {
    expect(designOf(figuresSchema.parse(figuresOf(choices)), choices)).toEqual(choices);
  });
  it('name the field that is missing or out of range', () => {
    const faults = (part: object) =>
      figuresSchema.safeParse({ ...figuresOf(two), ...part }).error?.issues.map((i) => i.path[0]);
    expect(faults({ linePitchMm: 0.001 })).toEqual(['linePitchMm']);
    expect(faults({ blackPoint: 0.9, whitePoint: 0.5 })).toEqual(['blackPoint']);
    expect(faults({ speedMmPerS: null })).toEqual(['speedMmPerS']);
    expect(faults({ secondPowerPercent: null })).toEqual(['secondPowerPercent']);
    expect(faults({})).toBeUndefined();
  });
});

describe('completeRecipe', () => {
  const draft = draftOf(two.recipe);
  it('is there once every figure of its passes is', () => {
    expect(completeRecipe(draft, two.perpendicular, 500)).toEqual(two.recipe);
    expect(completeRecipe(draft, null, 500)).toEqual({ ...two.recipe, perpendicular: null });
    expect(completeRecipe({ ...draft, powerPercent: null }, two.perpendicular, 500)).toBeNull();
    expect(completeRecipe({ ...draft, secondSpeedMmPerS: null }, two.perpendicular, 500)).toBeNull();
  });
  it('is not there beyond the machine’s highest speed', () => {
    expect(completeRecipe(draft, two.perpendicular, 420)).toBeNull();
  });
  it('takes 0 for a figure, and null for none', () => {
    expect(completeRecipe({ ...draftOf(design.recipe), focusOffsetMm: 0 }, null, 500)?.focusOffsetMm).toBe(0);
    expect(completeRecipe({ ...draftOf(design.recipe), focusOffsetMm: null }, null, 500)).toBeNull();
  });
});
