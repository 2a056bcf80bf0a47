import type { Finding } from '../../src/lib/preflight/finding';
import { sizeAcross } from '../../src/lib/machines/spot';
import type { Report } from '../../src/lib/prepare/report';
import { settingsSchema } from '../../src/lib/prepare/settings';
import {
  machineViewSchema,
  orderRowSchema,
  orderViewSchema,
  stockViewSchema,
  type Design,
  type MachineView,
  type OrderRow,
  type OrderView,
  type PreparationView,
  type StockView,
} from '../../src/lib/orders/views';

/** Orders for component tests, parsed by the schemas of the endpoints so that they cannot drift from them. */
export const machine: MachineView = machineViewSchema.parse({
  id: 1,
  name: 'Heron',
  retired: false,
  bedWidthMm: 600,
  bedHeightMm: 400,
  maxSpeedMmPerS: 500,
  accelerationMmPerS2: 3000,
  wattsAtFull: 40,
  powerCurve: [],
  lasingThresholdPercent: 8,
  powerLevels: 256,
  speedUnit: 'mm/s',
  firing: 'swept',
  scanning: 'two-way',
  spotPresets: [
    {
      id: 2,
      name: '50 mm lens',
      widthMm: 0.07,
      heightMm: 0.11,
      shape: 'ellipse',
      measuredBy: 'burned-line',
      measuredAtDoseJPerMm2: 0.8,
    },
    {
      id: 3,
      name: '100 mm lens',
      widthMm: 0.16,
      heightMm: 0.18,
      shape: 'ellipse',
      measuredBy: 'maker',
      measuredAtDoseJPerMm2: null,
    },
  ],
});

export const diode: MachineView = machineViewSchema.parse({
  ...machine,
  id: 4,
  name: 'Wren',
  bedWidthMm: 400,
  bedHeightMm: 400,
  maxSpeedMmPerS: 300,
  wattsAtFull: 10,
  speedUnit: 'mm/min',
  firing: 'pulsed',
  spotPresets: [
    {
      id: 5,
      name: 'As measured',
      widthMm: 0.09,
      heightMm: 0.14,
      shape: 'rectangle',
      measuredBy: 'burned-line',
      measuredAtDoseJPerMm2: null,
    },
  ],
});

export const stock: StockView = stockViewSchema.parse({
  id: 7,
  retired: false,
  name: 'Birch plywood 4 mm',
  species: 'birch plywood',
  thicknessMm: 4,
  finish: 'sanded',
  direction: 'darkens',
  groundColour: '#e0c49a',
  groundLstar: 81,
  markColour: '#4a2c17',
  markLstar: 22,
  cautions: ['machine-class', 'glued-board'],
  forbidden: false,
  routes: ['bare-burn'],
  notes: '',
});

export const design: Design = {
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

const place = (xMm: number, yMm: number, minMm: number | null, size = 0.4) => ({
  xMm,
  yMm,
  widthMm: size,
  heightMm: size,
  minMm,
});

export const findings: Finding[] = [
  {
    id: 'hairline',
    severity: 'blocker',
    title: 'Hairlines',
    count: 14,
    places: [place(18, 14, 0.04), place(71, 40, 0.06), place(52, 8, 0.07)],
    minMm: 0.04,
    limitMm: 0.11,
    measured: null,
    advice:
      'Some strokes are thinner than the laser’s spot and will come out wider or broken. Make them at least 0.11 mm wide.',
    waivable: true,
  },
  {
    id: 'fill-in',
    severity: 'warning',
    title: 'Gaps that close up',
    count: 3,
    places: [place(40, 30, 0.08)],
    minMm: 0.08,
    limitMm: 0.11,
    measured: null,
    advice: 'Some gaps are narrower than the spot and will fill in. Open them to at least 0.11 mm.',
    waivable: true,
  },
  {
    id: 'background',
    severity: 'note',
    title: 'Background not quite white',
    count: 1,
    places: [],
    minMm: null,
    limitMm: null,
    measured: { value: 97.2, limit: 100, unit: 'L*' },
    advice: 'The background is slightly grey and will burn as a faint tint.',
    waivable: true,
  },
];

const sha = 'a'.repeat(64);
const done = { state: 'done' as const, stage: 'Done', progress: 1, problem: '' };
const sizes = { widthMm: 90, heightMm: 60 };

const settings = settingsSchema.parse({
  ...sizes,
  spot: machine.spotPresets[0],
  treatment: 'halftone',
  screen: design.screen,
  scan: design.scan,
  tone: design.tone,
  recipe: { ...design.recipe, typedBy: 'Ines Okafor' },
  label: 'U-1004',
});

const checkReport = {
  reportVersion: 1 as const,
  artwork: {
    sha256: sha,
    bytes: 184_220,
    format: 'png' as const,
    kind: 'raster' as const,
    widthPx: 1800,
    heightPx: 1200,
    ownWidthMm: null,
    ownHeightMm: null,
    remarks: [],
    suggestedTreatment: 'halftone' as const,
    suggestionReason: 'It holds many tones.',
    tonalShare: 0.7,
  },
  ...sizes,
  directionDeg: 0,
  sizeAcrossMm: sizeAcross(machine.spotPresets[0], 0),
  findings,
  smallestSoundWidthMm: 142,
  measuredPxPerMm: 54.5,
};

const file = {
  name: 'U-1004-pass1-0.110mm-0deg-1a2b3c4d.png',
  role: 'raster' as const,
  mediaType: 'image/png',
  bytes: 41_233,
  sha256: sha,
  pass: 1 as const,
  directionDeg: 0,
  linePitchMm: 0.11,
  alongPitchMm: 0.11,
  widthPx: 818,
  heightPx: 545,
  ...sizes,
};

export const report: Report = {
  ...checkReport,
  settings,
  passes: [
    {
      pass: 1,
      directionDeg: 0,
      linePitchMm: 0.11,
      alongPitchMm: 0.11,
      sizeAcrossMm: 0.11,
      pitchRatio: 1,
      lines: 545,
      pixelsAlong: 818,
      scanFrame: null,
      doseJPerMm2: 0.477,
      assumesLinearPower: true,
      scanSeconds: 262,
      runOffMm: 17.1,
      meanBurn: 0.38,
    },
  ],
  trace: null,
  totalDoseJPerMm2: 0.477,
  totalSeconds: 262,
  files: [file],
  preparationKey: '1a2b3c4d'.repeat(8),
  manifestSha256: sha,
};

export const preparation: PreparationView = {
  id: 31,
  key: report.preparationKey,
  manifestSha256: sha,
  artworkVersion: 2,
  startedBy: 'Ines Okafor',
  startedAt: '2026-11-30T09:40:00.000Z',
  task: done,
  design,
  report,
  files: [
    {
      name: file.name,
      role: 'raster',
      mediaType: 'image/png',
      bytes: file.bytes,
      sha256: sha,
      url: `/api/orders/U-1004/preparations/31/files/${file.name}`,
    },
  ],
  pictures: Object.fromEntries(
    ['sent', 'sized', 'toned', 'screened', 'burned'].map((name) => [
      name,
      `/api/orders/U-1004/preparations/31/pictures/${name}`,
    ]),
  ),
  timings: { ingest: 30, screen: 120 },
};

export function orderView(changes: Partial<OrderView> = {}): OrderView {
  return orderViewSchema.parse({
    number: 'U-1004',
    state: 'in-preparation',
    version: 12,
    customer: { id: 9, name: 'Maren Holt', email: 'maren@example.org' },
    createdAt: '2026-11-27T08:00:00.000Z',
    submittedAt: '2026-11-27T08:12:00.000Z',
    fields: {
      title: 'Harbour at dusk, wall piece',
      quantity: 3,
      dueOn: '2026-12-04',
      ...sizes,
      blank: {
        outline: 'rectangle',
        widthMm: 120,
        heightMm: 80,
        thicknessMm: 4,
        stockId: 7,
        side: 'front',
        grainDeg: 0,
        source: 'shop',
        condition: '',
        spare: false,
      },
      placement: { datum: 'centre', xMm: 0, yMm: 0, quarterTurns: 0, fixture: 'pin board, two pins left' },
      treatment: 'halftone',
      shadeLstar: 38,
      route: 'bare-burn',
      use: 'decoration',
      notes: 'Please keep the rigging visible.',
      withoutProof: false,
    },
    stock,
    rightsConfirmedAt: '2026-11-27T08:12:00.000Z',
    artworks: [
      {
        version: 2,
        fileName: 'harbour-2.png',
        mediaType: 'image/png',
        bytes: 184_220,
        sha256: sha,
        uploadedAt: '2026-11-29T16:00:00.000Z',
        uploadedBy: 'Maren Holt',
        task: done,
        check: checkReport,
        pictureUrl: '/api/orders/U-1004/artwork/2/picture',
        originalUrl: '/api/orders/U-1004/artwork/2/original',
      },
    ],
    design,
    preparations: [preparation],
    passed: null,
    approved: null,
    waivers: [
      {
        findingId: 'fill-in',
        artworkVersion: 2,
        reason: 'The gaps are decoration and may close.',
        by: 'Ines Okafor',
        at: '2026-11-30T10:00:00.000Z',
      },
    ],
    heldBecause: '',
    outcomes: [],
    history: [
      {
        at: '2026-11-27T08:12:00.000Z',
        by: 'Maren Holt',
        event: 'submit',
        from: 'draft',
        to: 'submitted',
        words: '',
      },
      {
        at: '2026-11-28T09:00:00.000Z',
        by: 'Ines Okafor',
        event: 'take',
        from: 'submitted',
        to: 'in-preparation',
        words: '',
      },
    ],
    events: ['pass', 'prepare-again', 'new-artwork', 'hold', 'cancel'],
    waitsFor: {
      pass: 'Blockers are open: hairlines. Mend the artwork or change the size, or waive with a reason.',
    },
    cautions: [
      {
        id: 'glued-board',
        title: 'Glued board',
        text: 'Plywood glues give off irritating smoke. Extraction on. Source: makers’ data sheets. Follow the machine’s manual and local codes.',
      },
    ],
    ...changes,
  });
}

export const orderRow = (changes: Partial<OrderRow> = {}): OrderRow =>
  orderRowSchema.parse({
    number: 'U-1004',
    title: 'Harbour at dusk, wall piece',
    state: 'in-preparation',
    customerName: 'Maren Holt',
    machineName: 'Heron',
    stockName: 'Birch plywood 4 mm',
    quantity: 3,
    dueOn: '2026-12-04',
    updatedAt: '2026-11-30T09:40:00.000Z',
    blockers: 1,
    warnings: 1,
    pictureUrl: '/api/orders/U-1004/artwork/2/picture',
    scanSeconds: 262,
    ...changes,
  });
