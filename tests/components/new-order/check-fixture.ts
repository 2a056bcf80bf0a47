import { checkReportSchema } from '@/lib/prepare/report';

/** A check as the server answers it: a drawing of 140 × 70 mm with one hairline. */
export const CHECK = checkReportSchema.parse({
  reportVersion: 1,
  artwork: {
    sha256: 'a'.repeat(64),
    bytes: 1200,
    format: 'svg',
    kind: 'vector',
    widthPx: 529,
    heightPx: 265,
    ownWidthMm: 140,
    ownHeightMm: 70,
    remarks: [],
    suggestedTreatment: 'linework',
    suggestionReason: 'It is drawn in lines.',
    tonalShare: 0,
  },
  widthMm: 140,
  heightMm: 70,
  directionDeg: 0,
  sizeAcrossMm: 0.11,
  findings: [
    {
      id: 'hairline',
      severity: 'warning',
      title: 'Hairlines',
      count: 3,
      places: [{ xMm: 20, yMm: 30, widthMm: 4, heightMm: 0.07, minMm: 0.07 }],
      minMm: 0.07,
      limitMm: 0.11,
      measured: null,
      advice: 'Thicken the strokes.',
      waivable: true,
    },
  ],
  smallestSoundWidthMm: 220.03,
  measuredPxPerMm: 54,
});
