import { describe, expect, it } from 'vitest';
import {
  blankLimits,
  checkSettingsFor,
  firstDesign,
  pitchRatio,
  placedSize,
  settingsFor,
} from '@/lib/orders/settings';
import { settingsSchema } from '@/lib/prepare/settings';
import { blank, fields } from './order-fixture';

const machine = {
  name: 'Kiln',
  bedWidthMm: 600,
  bedHeightMm: 400,
  maxSpeedMmPerS: 500,
  accelerationMmPerS2: 3000,
  wattsAtFull: 40,
  powerCurve: [],
  lasingThresholdPercent: 5,
  powerLevels: 256,
  speedUnit: 'mm/min',
  firing: 'pulsed',
  scanning: 'one-way',
} as const;
const spot = {
  name: 'Fine',
  widthMm: 0.07,
  heightMm: 0.11,
  shape: 'rectangle',
  measuredBy: 'maker',
  measuredAtDoseJPerMm2: null,
} as const;
const stock = {
  name: 'Birch',
  species: 'birch',
  thicknessMm: 4,
  finish: '',
  direction: 'darkens',
  groundColour: '#e3c9a0',
  groundLstar: 82,
  markColour: '#3b2414',
  markLstar: 20,
  cautions: [],
  forbidden: false,
  routes: [],
  notes: '',
} as const;
const turned = (quarterTurns: 0 | 1 | 2 | 3) =>
  fields({ placement: { datum: 'centre', xMm: 0, yMm: 0, quarterTurns, fixture: '' } });
const parts = (over = {}) => ({
  number: 'U-1001',
  fields: fields(),
  design: firstDesign({ machineId: 1, spotPresetId: 1 }, spot, 'halftone'),
  machine: { ...machine, powerCurve: [] },
  spot,
  stock: { ...stock, cautions: [], routes: [] },
  typedBy: 'Dora',
  ...over,
});

describe('an order’s settings', () => {
  it.each([
    [0, 60, 40],
    [1, 40, 60],
    [2, 60, 40],
    [3, 40, 60],
  ] as const)('after %d quarter turns the placed size is %d × %d', (turns, widthMm, heightMm) => {
    expect(placedSize(turned(turns))).toEqual({ widthMm, heightMm });
  });

  it('have no size while a side is missing', () => {
    expect(placedSize(fields({ widthMm: null }))).toBeNull();
    expect(placedSize(fields({ heightMm: null }))).toBeNull();
    expect(() => settingsFor(parts({ fields: fields({ heightMm: null }) }))).toThrow(
      'expected an order with a size, got U-1001 without one',
    );
  });

  it('place the artwork on its blank as it is turned', () => {
    expect(blankLimits(blank(), turned(0))).toEqual({
      outline: 'rectangle',
      widthMm: 100,
      heightMm: 80,
      leftMm: 20,
      topMm: 20,
    });
    expect(blankLimits(blank(), turned(1))).toEqual({
      outline: 'rectangle',
      widthMm: 100,
      heightMm: 80,
      leftMm: 30,
      topMm: 10,
    });
    expect(blankLimits(null, turned(0))).toBeNull();
    expect(blankLimits(blank(), fields({ widthMm: null }))).toBeNull();
  });

  it('carry the designer’s choices, the machine’s firing and the order’s number', () => {
    const settings = settingsFor(
      parts({
        design: {
          ...parts().design,
          recipe: { powerPercent: 30, speedMmPerS: 90, perpendicular: null, focusOffsetMm: 1 },
        },
      }),
    );
    expect(settingsSchema.parse(settings)).toEqual(settings);
    expect(settings).toMatchObject({
      widthMm: 60,
      heightMm: 40,
      spot: { widthMm: 0.07, heightMm: 0.11, shape: 'rectangle' },
      firing: 'pulsed',
      treatment: 'halftone',
      label: 'U-1001',
      scan: { directionDeg: 0, linePitchMm: 0.11, alongPitchMm: 0.11 },
      recipe: { powerPercent: 30, typedBy: 'Dora' },
      stock: { name: 'Birch', groundLstar: 82 },
      machine: { name: 'Kiln', scanning: 'one-way' },
    });
    expect(Object.keys(settings.spot).sort()).toEqual(['heightMm', 'shape', 'widthMm']);
  });

  it('are the same for the same order, whatever the order of its keys', () => {
    expect(JSON.stringify(settingsFor(parts()))).toBe(JSON.stringify(settingsFor(structuredClone(parts()))));
  });

  it('of a check follow the customer’s wish until a designer has chosen', () => {
    const wish = checkSettingsFor(fields({ treatment: 'linework', widthMm: null }), null, null, spot);
    expect(wish).toMatchObject({
      widthMm: null,
      heightMm: null,
      treatment: 'linework',
      directionDeg: 0,
      linePitchMm: null,
      machine: null,
      blank: null,
      firing: 'swept',
    });
    const design = { ...parts().design, scan: { directionDeg: 45, linePitchMm: 0.1, alongPitchMm: 0.09 } };
    expect(checkSettingsFor(turned(1), design, { ...machine, powerCurve: [] }, spot)).toMatchObject({
      widthMm: 40,
      heightMm: 60,
      quarterTurns: 1,
      treatment: 'halftone',
      directionDeg: 45,
      linePitchMm: 0.1,
      firing: 'pulsed',
      machine: { bedWidthMm: 600 },
    });
  });

  it('start at pitch ratio 1', () => {
    const { design } = parts();
    expect(pitchRatio(design, spot)).toBeCloseTo(1, 6);
    expect(pitchRatio({ scan: { ...design.scan, linePitchMm: 0.055 } }, spot)).toBeCloseTo(0.5, 6);
  });
});
