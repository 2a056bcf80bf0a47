import { describe, expect, it } from 'vitest';
import {
  approvalRefusal,
  checklistRefusal,
  holdOnSubmit,
  openBlockers,
  waitsFor,
  waiverRefusal,
  type RuleFacts,
} from '@/lib/orders/rules';
import { ORDER_EVENTS } from '@/lib/orders/state';
import type { Finding } from '@/lib/preflight/finding';
import { settingsSchema, type Settings } from '@/lib/prepare/settings';
import type { Stock } from '@/lib/stock/stock';
import { CHECKLIST } from '@/lib/orders/checklist';
import { blank, fields } from './order-fixture';

const stock: Stock = {
  name: 'Birch plywood',
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
  routes: ['bare-burn', 'darkening-wash'],
  notes: '',
};
const hairline: Finding = {
  id: 'hairline',
  severity: 'blocker',
  title: 'Hairlines',
  count: 1,
  places: [],
  minMm: 0.02,
  limitMm: 0.07,
  measured: null,
  advice: '',
  waivable: true,
};
const outside: Finding = { ...hairline, id: 'outside', title: 'Outside the bed', waivable: false };
const settings: Settings = settingsSchema.parse({
  widthMm: 60,
  heightMm: 40,
  spot: { widthMm: 0.07, heightMm: 0.11 },
  treatment: 'solid',
  tone: {},
  label: 'U-1001',
  scan: { directionDeg: 0, linePitchMm: 0.11, alongPitchMm: 0.11 },
  recipe: { powerPercent: 30, speedMmPerS: 100, perpendicular: null, focusOffsetMm: 0, typedBy: 'Dora' },
});
const MANIFEST = 'a'.repeat(64);

/** Everything in order: nothing waits. */
const ready = (over: Partial<RuleFacts> = {}): RuleFacts => ({
  fields: fields({ withoutProof: true }),
  stock,
  customerConfirmed: true,
  washOffered: true,
  formerState: null,
  artwork: { version: 1, taskState: 'done', findings: [] },
  currentSettings: settings,
  preparation: {
    id: 1,
    artworkVersion: 1,
    taskState: 'done',
    manifestSha256: MANIFEST,
    settings: structuredClone(settings),
    findings: [],
  },
  waivers: [],
  passedManifestSha256: MANIFEST,
  approvedManifestSha256: MANIFEST,
  ...over,
});
const prepared = (over: Partial<NonNullable<RuleFacts['preparation']>>): Partial<RuleFacts> => ({
  preparation: { ...ready().preparation!, ...over },
});

describe('rules', () => {
  it.each(ORDER_EVENTS)('nothing stands in the way of %s when everything is in order', (event) => {
    expect(waitsFor(event, ready())).toBeNull();
  });

  it.each<[string, Partial<RuleFacts>, RegExp | null]>([
    ['address not confirmed', { customerConfirmed: false }, /not confirmed/],
    ['no artwork', { artwork: null }, /no artwork/],
    ['check waiting', { artwork: { version: 1, taskState: 'waiting', findings: [] } }, /still being checked/],
    [
      'check running',
      { artwork: { version: 1, taskState: 'running', findings: null } },
      /still being checked/,
    ],
    ['check failed', { artwork: { version: 1, taskState: 'failed', findings: [] } }, /could not be checked/],
    ['never checked', { artwork: { version: 1, taskState: 'done', findings: null } }, /still being checked/],
    ['no width', { fields: fields({ widthMm: null }) }, /size is missing/],
    ['no height', { fields: fields({ heightMm: null }) }, /size is missing/],
    ['no blank', { fields: fields({ blank: null }), stock: null }, /blank is missing/],
    ['no stock', { stock: null }, /stock is missing/],
    [
      'own blank, not identified',
      { stock: null, fields: fields({ blank: blank({ source: 'customer', stockId: null }) }) },
      null,
    ],
    [
      'own blank of forbidden stock',
      { stock: { ...stock, forbidden: true }, fields: fields({ blank: blank({ source: 'customer' }) }) },
      /never engraved/,
    ],
    ['forbidden stock', { stock: { ...stock, forbidden: true } }, /never engraved/],
    [
      'a route that the stock has not',
      { fields: fields({ route: 'paint-fill' }) },
      /not offered on Birch plywood/,
    ],
    ['wash for food', { fields: fields({ route: 'darkening-wash', use: 'touches-food' }) }, /not food-safe/],
    ['wash for a child', { fields: fields({ route: 'darkening-wash', use: 'for-a-child' }) }, /child/],
    ['wash outdoors', { fields: fields({ route: 'darkening-wash', use: 'outdoors' }) }, null],
    [
      'wash without its sheet',
      { fields: fields({ route: 'darkening-wash' }), washOffered: false },
      /safety data sheet/,
    ],
    [
      'wash for food on an unidentified own blank',
      {
        stock: null,
        fields: fields({
          blank: blank({ source: 'customer', stockId: null }),
          route: 'darkening-wash',
          use: 'touches-food',
        }),
      },
      /not food-safe/,
    ],
    ['blockers', { artwork: { version: 1, taskState: 'done', findings: [hairline, outside] } }, null],
  ])('submit with %s', (_, over, words) => {
    const said = waitsFor('submit', ready(over));
    if (words === null) expect(said).toBeNull();
    else expect(said).toMatch(words);
  });

  it('holds a customer’s own unidentified blank, and no other', () => {
    const own = fields({ blank: blank({ source: 'customer', stockId: null }) });
    expect(holdOnSubmit(ready({ stock: null, fields: own }))).toMatch(/not identified/);
    expect(holdOnSubmit(ready({ fields: own }))).toBeNull();
    expect(holdOnSubmit(ready({ stock: null }))).toBeNull();
    expect(holdOnSubmit(ready())).toBeNull();
  });

  it.each<[string, Partial<RuleFacts>, RegExp | null]>([
    ['nothing prepared', { preparation: null }, /Nothing is prepared/],
    ['no artwork', { artwork: null }, /Nothing is prepared/],
    ['preparation waiting', prepared({ taskState: 'waiting' }), /still being prepared/],
    ['preparation running', prepared({ taskState: 'running' }), /still being prepared/],
    ['preparation failed', prepared({ taskState: 'failed' }), /failed/],
    ['no manifest', prepared({ manifestSha256: null }), /still being prepared/],
    ['newer artwork', { artwork: { version: 2, taskState: 'done', findings: [] } }, /newer artwork/],
    ['another size since', { currentSettings: { ...settings, widthMm: 61 } }, /changed since/],
    ['choices missing since', { currentSettings: null }, /changed since/],
    [
      'no recipe',
      {
        ...prepared({ settings: { ...settings, recipe: null } }),
        currentSettings: { ...settings, recipe: null },
      },
      /Power and speed/,
    ],
    ['a blocker', prepared({ findings: [hairline] }), /Blockers are open: hairlines\..*waive/],
    [
      'two blockers',
      prepared({ findings: [outside, hairline] }),
      /outside the bed and one more\. Mend the artwork or change the size\.$/,
    ],
    ['four blockers', prepared({ findings: [hairline, outside, hairline, outside] }), /and 3 more/],
    [
      'a blocker waived',
      { ...prepared({ findings: [hairline] }), waivers: [{ findingId: 'hairline', artworkVersion: 1 }] },
      null,
    ],
    [
      'a blocker waived for older artwork',
      { ...prepared({ findings: [hairline] }), waivers: [{ findingId: 'hairline', artworkVersion: 0 }] },
      /open/,
    ],
    [
      'another finding waived',
      { ...prepared({ findings: [hairline] }), waivers: [{ findingId: 'fill-in', artworkVersion: 1 }] },
      /open/,
    ],
    [
      'what cannot be waived, waived',
      { ...prepared({ findings: [outside] }), waivers: [{ findingId: 'outside', artworkVersion: 1 }] },
      /open/,
    ],
    ['stock forbidden since', { stock: { ...stock, forbidden: true } }, /never engraved.*cannot be waived/],
    [
      'forbidden stock and a finding waived',
      {
        ...prepared({ findings: [hairline] }),
        stock: { ...stock, forbidden: true },
        waivers: [{ findingId: 'hairline', artworkVersion: 1 }],
      },
      /never engraved/,
    ],
    ['a warning', prepared({ findings: [{ ...hairline, severity: 'warning' }] }), null],
  ])('pass with %s', (_, over, words) => {
    const said = waitsFor('pass', ready(over));
    if (words === null) expect(said).toBeNull();
    else expect(said).toMatch(words);
  });

  it.each<[string, Partial<RuleFacts>, RegExp | null]>([
    ['no stock', { stock: null }, /stock is missing/],
    ['stock forbidden since', { stock: { ...stock, forbidden: true } }, /never engraved/],
    ['a route withdrawn since', { stock: { ...stock, routes: [] } }, /not offered/],
    [
      'a use that the route is not for',
      { fields: fields({ route: 'darkening-wash', use: 'for-a-child' }) },
      /child/,
    ],
    [
      'the sheet of the wash gone since',
      { fields: fields({ route: 'darkening-wash' }), washOffered: false },
      /safety data sheet/,
    ],
    ['another manifest approved', { approvedManifestSha256: 'b'.repeat(64) }, /not what was passed/],
    ['no pass', { passedManifestSha256: null, approvedManifestSha256: null }, /not what was passed/],
  ])('release with %s', (_, over, words) => {
    const said = waitsFor('release', ready(over));
    if (words === null) expect(said).toBeNull();
    else expect(said).toMatch(words);
  });

  it.each(['send-proof', 'approve-without-proof'] as const)(
    'holds %s back while the stock is forbidden',
    (event) => {
      expect(waitsFor(event, ready({ stock: { ...stock, forbidden: true } }))).toMatch(
        /^Birch plywood is never engraved here, and that cannot be waived\. Choose another stock\.$/,
      );
    },
  );

  it('goes without a proof only where the customer agreed', () => {
    expect(waitsFor('approve-without-proof', ready({ fields: fields({ withoutProof: false }) }))).toMatch(
      /wants a proof/,
    );
  });

  it('resumes an own blank only once it is identified, except as a draft', () => {
    const own = { stock: null, fields: fields({ blank: blank({ source: 'customer', stockId: null }) }) };
    expect(waitsFor('resume', ready({ ...own, formerState: 'submitted' }))).toMatch(
      /what the customer’s blank is made of/,
    );
    expect(waitsFor('resume', ready({ ...own, formerState: 'draft' }))).toBeNull();
  });

  it('takes an approval of the passed manifest alone', () => {
    expect(approvalRefusal(MANIFEST, MANIFEST)).toBeNull();
    expect(approvalRefusal('b'.repeat(64), MANIFEST)).toMatch(/has changed/);
    expect(approvalRefusal(MANIFEST, null)).toMatch(/has changed/);
  });

  it('wants every item of the checklist', () => {
    const all = CHECKLIST.map(({ id }) => id);
    expect(checklistRefusal(all)).toBeNull();
    expect(checklistRefusal([...all, 'coffee'])).toBeNull();
    for (const left of all) expect(checklistRefusal(all.filter((id) => id !== left))).toMatch(/Not ticked/);
    expect(checklistRefusal([])).toMatch(CHECKLIST[0].words);
  });

  it('waives only what is there and may be', () => {
    expect(waiverRefusal('hairline', [hairline])).toBeNull();
    expect(waiverRefusal('outside', [hairline, outside])).toMatch(/cannot be waived/);
    expect(waiverRefusal('speck', [hairline])).toMatch(/no such finding/);
    expect(waiverRefusal('hairline', [hairline, { ...hairline, waivable: false }])).toMatch(
      /cannot be waived/,
    );
  });

  it('lists open blockers in order and changes nothing', () => {
    const findings = Object.freeze([hairline, outside, { ...hairline, severity: 'note' as const }]);
    expect(openBlockers(findings, [{ findingId: 'hairline', artworkVersion: 3 }], 3)).toEqual([outside]);
    expect(openBlockers(findings, [], 3)).toEqual([hairline, outside]);
    expect(openBlockers([], [], 1)).toEqual([]);
  });
});
