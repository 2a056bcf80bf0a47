import type { Facts, WidthFacts, WidthPlace } from '../../src/lib/preflight/facts';
import type { Limits } from '../../src/lib/preflight/limits';

const NO_WIDTHS: WidthFacts = { count: 0, places: [], worstRatio: null };
const NO_AREAS = { count: 0, places: [], limitMm: 0.1 };

/** Facts of a sound drawing of 60 × 40 mm: every check is silent on them. */
export const soundFacts: Facts = {
  placement: {
    widthMm: 60,
    heightMm: 40,
    beyondBlank: null,
    beyondRoundMm: null,
    runOffMm: 0,
    beyondBed: null,
  },
  linePitchMm: 0.1,
  hairlines: NO_WIDTHS,
  fillIns: NO_WIDTHS,
  specks: NO_AREAS,
  pinholes: NO_AREAS,
  sharpTips: { count: 0, places: [] },
  source: { pxPerMm: null, unresolved: { count: 0, places: [] } },
  tone: {
    tonalShare: 0,
    tintShare: 0,
    burnedShare: 0.3,
    meanCoverage: 0.3,
    darkLstar: 0,
    lightLstar: 100,
    borderLstar: 100,
    borderShare: 1,
    thinShare: 0,
  },
  measuredPxPerMm: 60,
  missingFonts: [],
  removed: [],
  severalFrames: false,
};

export const limits: Limits = {
  spot: { widthMm: 0.1, heightMm: 0.1, shape: 'ellipse' },
  treatment: 'solid',
  photograph: false,
};

export const widthPlace = (minMm: number, limitMm = 0.1): WidthPlace => ({
  xMm: 10,
  yMm: 20,
  widthMm: 5,
  heightMm: 0.2,
  minMm,
  limitMm,
});

export const widths = (...minMm: number[]): WidthFacts => ({
  count: minMm.length,
  places: minMm.map((width) => widthPlace(width)),
  worstRatio: Math.min(...minMm) / 0.1,
});
